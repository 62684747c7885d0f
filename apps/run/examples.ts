/**
 * Runs every @example of the libraries. An example is plain code; a line `// → value` says what the expression before it
 * gives. Every export of the library is in scope, and of the file itself. Numbers are compared to the digits that are printed, so that
 * `// → 2.84` holds for 2.8401 and fails for 2.85; `// → throws Name` holds when that error is thrown.
 * Names of libraries behind the command limit the run to them.
 */
import { readFileSync, readdirSync, existsSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { tsImport } from 'tsx/esm/api';
import ts from 'typescript';

const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');
const ARROW = /^\s*\/\/\s*→\s*(.+?)\s*$/;

interface Example {
  file: string;
  line: number;
  code: string;
}

function filesUnder(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) return filesUnder(path);
    return /\.ts$/.test(entry.name) && !/\.(spec|d)\.ts$/.test(entry.name) ? [path] : [];
  });
}

/** The text of each @example: up to the next tag or the end of its comment. */
function examplesIn(file: string): Example[] {
  const found: Example[] = [];
  let open: Example | undefined;
  let inComment = false;
  readFileSync(file, 'utf8')
    .split('\n')
    .forEach((text, index) => {
      if (/^\s*\/\*\*/.test(text)) inComment = true;
      if (!inComment) return;
      const ends = text.includes('*/');
      const inner = text.replace(/\*\/.*$/, '').replace(/^\s*(\/\*\*|\*) ?/, '');
      if (/^\s*@\w+/.test(inner)) {
        open = undefined;
        const rest = /^\s*@example\b(.*)$/.exec(inner);
        if (rest) {
          open = { file, line: index + 1, code: /^\s*[A-Z][^(]*$/.test(rest[1] ?? '') ? '' : (rest[1] ?? '') };
          found.push(open);
        }
      } else if (open && !/^\s*```/.test(inner)) open.code += `\n${inner}`;
      if (ends) {
        inComment = false;
        open = undefined;
      }
    });
  return found;
}

/** Turns the last statement into a return, so that an expression of several lines may be an example too. */
function withReturn(code: string): string {
  const source = ts.createSourceFile('example.ts', code, ts.ScriptTarget.ES2023, true);
  const last = source.statements.at(-1);
  if (!last || !ts.isExpressionStatement(last)) throw new Error('the line before → is not an expression');
  const body = `${code.slice(0, last.getStart())}return (${last.expression.getText()});`;
  return ts.transpileModule(`function example() {${body}\n}`, { compilerOptions: { target: ts.ScriptTarget.ES2023 } }).outputText;
}

const decimals = (text: string) => (/^[^.eE]*\.(\d+)/.exec(text)?.[1] ?? '').length;

function sameNumber(actual: unknown, printed: string): boolean {
  if (typeof actual !== 'number') return false;
  const expected = Number(printed);
  if (!Number.isFinite(expected)) return Object.is(actual, expected);
  const power = Number(/[eE]([+-]?\d+)$/.exec(printed)?.[1] ?? 0);
  const half = 0.5 * 10 ** (power - decimals(printed));
  return Math.abs(actual - expected) <= half * (1 + 1e-9);
}

/** Compares a value with what is printed, piece by piece, each number to its own digits. */
function agrees(actual: unknown, printed: ts.Expression): boolean {
  if (ts.isParenthesizedExpression(printed)) return agrees(actual, printed.expression);
  if (ts.isNumericLiteral(printed)) return sameNumber(actual, printed.getText());
  if (ts.isPrefixUnaryExpression(printed)) return sameNumber(actual, printed.getText().replace(/^\+/, ''));
  if (ts.isIdentifier(printed) && (printed.text === 'Infinity' || printed.text === 'NaN')) return Object.is(actual, Number(printed.text));
  if (ts.isIdentifier(printed) && printed.text === 'undefined') return actual === undefined;
  if (ts.isStringLiteralLike(printed)) return actual === printed.text;
  if (printed.kind === ts.SyntaxKind.TrueKeyword) return actual === true;
  if (printed.kind === ts.SyntaxKind.FalseKeyword) return actual === false;
  if (printed.kind === ts.SyntaxKind.NullKeyword) return actual === null;
  if (ts.isArrayLiteralExpression(printed)) {
    return Array.isArray(actual) && actual.length === printed.elements.length && printed.elements.every((e, i) => agrees(actual[i], e));
  }
  if (ts.isObjectLiteralExpression(printed)) {
    if (typeof actual !== 'object' || actual === null) return false;
    const wanted = printed.properties.filter(ts.isPropertyAssignment);
    const present = Object.entries(actual).filter(([, value]) => value !== undefined);
    return (
      wanted.length === printed.properties.length &&
      wanted.length === present.length &&
      wanted.every((p) => agrees((actual as Record<string, unknown>)[ts.isIdentifier(p.name) || ts.isStringLiteral(p.name) ? p.name.text : p.name.getText()], p.initializer))
    );
  }
  throw new Error(`cannot compare with ${printed.getText()}`);
}

function printedExpression(text: string): ts.Expression {
  const source = ts.createSourceFile('printed.ts', `(${text})`, ts.ScriptTarget.ES2023, true);
  const statement = source.statements[0];
  if (source.statements.length !== 1 || !statement || !ts.isExpressionStatement(statement)) throw new Error(`→ ${text} is not a value`);
  return statement.expression;
}

function check(example: Example, scope: Record<string, unknown>): string[] {
  const problems: string[] = [];
  let code = '';
  let arrows = 0;
  for (const line of example.code.split('\n')) {
    const printed = ARROW.exec(line)?.[1];
    if (printed === undefined) {
      code += `${line}\n`;
      continue;
    }
    arrows += 1;
    const throws = /^throws(?:\s+(\w+))?$/.exec(printed);
    try {
      const run = new Function(...Object.keys(scope), `${withReturn(code)}\nreturn example();`) as (...values: unknown[]) => unknown;
      const actual = run(...Object.values(scope));
      if (throws) problems.push(`should throw, gave ${JSON.stringify(actual)}`);
      else if (!agrees(actual, printedExpression(printed))) problems.push(`→ ${printed}, but it gives ${JSON.stringify(actual)}`);
    } catch (error) {
      const named = error instanceof Error ? error.name : String(error);
      if (!throws || (throws[1] !== undefined && throws[1] !== named)) problems.push(`${named}: ${error instanceof Error ? error.message : ''}`);
    }
  }
  if (arrows === 0) problems.push('has no line `// → value`');
  return problems;
}

// the aliases @libs and @shared stand in tsconfig.base.json, which the bare loader does not read
const open = async (door: string) =>
  (await tsImport(pathToFileURL(door).href, { parentURL: import.meta.url, tsconfig: join(root, 'tsconfig.base.json') })) as Record<string, unknown>;

const only = process.argv.slice(2);
let run = 0;
let failed = 0;
for (const library of readdirSync(join(root, 'libs')).sort()) {
  const door = join(root, 'libs', library, 'src', 'index.ts');
  if (!existsSync(door) || (only.length > 0 && !only.includes(library))) continue;
  const examples = filesUnder(dirname(door)).flatMap(examplesIn);
  if (examples.length === 0) continue;
  run += examples.length;
  try {
    const scope = await open(door);
    for (const example of examples) {
      const problems = check(example, { ...scope, ...(await open(example.file)) });
      if (problems.length > 0) failed += 1;
      for (const problem of problems) console.error(`${relative(root, example.file)}:${example.line} ${problem}`);
    }
  } catch (error) {
    failed += examples.length;
    console.error(`libs/${library} cannot be loaded: ${error instanceof Error ? error.message : String(error)}`);
  }
}
console.log(`examples: ${run} run${failed > 0 ? `, ${failed} failed` : ''}`);
if (failed > 0 || run === 0) process.exitCode = 1;
