import { spawn, spawnSync } from 'node:child_process';
import { createServer } from 'node:net';
import { root } from './paths.mjs';

/** Runs a program to its end and shows what it says. */
export function run(command, args, options = {}) {
  return new Promise((done) => {
    const child = spawn(command, args, { cwd: root, stdio: 'inherit', ...options });
    child.on('error', () => done(127));
    child.on('exit', (code, signal) => done(code ?? (signal ? 1 : 0)));
  });
}

/** Runs a program quietly and keeps what it says. */
export function runQuietly(command, args, options = {}) {
  return new Promise((done) => {
    const child = spawn(command, args, { cwd: root, stdio: ['ignore', 'pipe', 'pipe'], ...options });
    let output = '';
    child.stdout.on('data', (d) => (output += d));
    child.stderr.on('data', (d) => (output += d));
    child.on('error', (error) => done({ code: 127, output: String(error) }));
    child.on('exit', (code) => done({ code: code ?? 1, output }));
  });
}

export const isThere = (program) => spawnSync('sh', ['-c', `command -v ${program}`]).status === 0;
export const isRoot = () => typeof process.getuid === 'function' && process.getuid() === 0;

/** A port nobody listens on: the wished one when it is free, else any. */
export function freePort(wished = 0, host = '127.0.0.1') {
  return new Promise((done, failed) => {
    const server = createServer();
    server.once('error', () => (wished === 0 ? failed(new Error('no free port')) : freePort(0, host).then(done, failed)));
    server.listen(wished, host, () => {
      const { port } = server.address();
      server.close(() => done(port));
    });
  });
}

/** Starts a program that says `{"ready":true,…}` on a line of its own once it answers. */
export function startAndWait(name, args, env, { onLine, timeoutMs = 60_000 } = {}) {
  return new Promise((done, failed) => {
    const child = spawn(process.execPath, args, { cwd: root, env: { ...process.env, ...env }, stdio: ['ignore', 'pipe', 'pipe'] });
    let tail = '';
    let ready = false;
    const timer = setTimeout(() => {
      child.kill('SIGKILL');
      failed(new Error(`${name} did not answer within ${timeoutMs / 1000} s.\n${tail}`));
    }, timeoutMs);
    const take = (line) => {
      tail = `${tail}${line}\n`.slice(-4000);
      if (!ready && line.startsWith('{"ready":true')) {
        ready = true;
        clearTimeout(timer);
        done({ child, ready: JSON.parse(line) });
      } else onLine?.(line);
    };
    lines(child.stdout, take);
    lines(child.stderr, take);
    child.on('exit', (code) => {
      clearTimeout(timer);
      if (!ready) failed(new Error(`${name} ended (${code}).\n${tail}`));
    });
  });
}

function lines(stream, take) {
  let rest = '';
  stream.on('data', (chunk) => {
    const parts = (rest + chunk).split('\n');
    rest = parts.pop();
    for (const line of parts) if (line.trim()) take(line);
  });
}

/** Asks a child to end, and waits for it. */
export function end(child, graceMs = 12_000) {
  return new Promise((done) => {
    if (child.exitCode !== null || child.signalCode !== null) return done();
    const timer = setTimeout(() => child.kill('SIGKILL'), graceMs);
    child.once('exit', () => {
      clearTimeout(timer);
      done();
    });
    child.kill('SIGTERM');
  });
}
