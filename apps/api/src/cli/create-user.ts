import 'reflect-metadata';
import { parseArgs } from 'node:util';
import { createInterface } from 'node:readline';
import { NestFactory } from '@nestjs/core';
import { ROLES, permissionsOf, type Role } from '@shared/roles';
import { createUserSchema } from '@shared/session';
import { AppModule } from '../app.module.js';
import { house } from '../auth/actor.js';
import { readConfig } from '../config/config.js';
import { takeDataFolder } from '../database/data-folder.js';
import { migrate } from '../database/migrate.js';
import { UsersService } from '../users/users.service.js';

const USAGE = `create-user --name "Name" --email name@shop.example --roles manager[,technician]
Reads the password from the terminal, or from standard input. Roles: ${ROLES.join(', ')}.`;

/** Makes a user while the shop is not running: the way to the first manager. */
async function main(): Promise<void> {
  const { values } = parseArgs({ options: { name: { type: 'string' }, email: { type: 'string' }, roles: { type: 'string' }, help: { type: 'boolean' } } });
  if (values.help || !values.name || !values.email || !values.roles) {
    process.stdout.write(`${USAGE}\n`);
    process.exitCode = values.help ? 0 : 64;
    return;
  }
  const parsed = createUserSchema.safeParse({ name: values.name, email: values.email, roles: values.roles.split(',').map((r) => r.trim()), customerId: null, password: await readPassword() });
  if (!parsed.success) throw new Error(parsed.error.issues.map((i) => `${i.path.join('.')}: ${i.message}`).join('\n'));
  const config = readConfig(process.env);
  const folder = takeDataFolder(config.dataDir);
  try {
    await migrate(config.dataDir, new Date().toISOString());
    const app = await NestFactory.createApplicationContext(AppModule.register(config), { logger: false });
    const roles: Role[] = ['manager'];
    const user = await app.get(UsersService).create({ ...house('create-user'), roles, permissions: permissionsOf(roles) }, parsed.data);
    await app.close();
    process.stdout.write(`${user.name} may sign in with ${user.email} as ${user.roles.join(', ')}.\n`);
  } finally {
    folder.release();
  }
}

/** The first line of standard input; at a terminal the question is asked and what is typed is not shown. */
function readPassword(): Promise<string> {
  const asked = createInterface({ input: process.stdin, output: process.stdin.isTTY ? process.stdout : undefined, terminal: process.stdin.isTTY });
  return new Promise((done) => {
    if (process.stdin.isTTY) {
      asked.setPrompt('Password (at least 12 characters): ');
      asked.prompt();
      Object.assign(asked, { _writeToOutput: () => undefined });
    }
    asked.once('line', (line) => {
      done(line);
      asked.close();
    });
    asked.once('close', () => done(''));
  });
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
});
