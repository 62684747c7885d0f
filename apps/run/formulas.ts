/**
 * Writes docs/formulas/formulas.md from the comments of the libraries: every function behind a library's door that names its source, with what it
 * says, its equation, its symbols and where they come from. `--check` writes nothing and fails when the page is not what the comments say.
 */
import { existsSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import ts from 'typescript';

const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');
const page = join(root, 'docs', 'formulas', 'formulas.md');

interface Formula {
  name: string;
  file: string;
  says: string;
  equations: string[];
  symbols: string[];
  source: string;
}

const parsed = (file: string) => ts.createSourceFile(file, readFileSync(file, 'utf8'), ts.ScriptTarget.ES2023, true);

/** What a door lets out: each name with the file it comes from. */
function exportsOf(door: string): { name: string; file: string }[] {
  return parsed(door).statements.flatMap((statement) => {
    if (!ts.isExportDeclaration(statement) || !statement.moduleSpecifier || !statement.exportClause || !ts.isNamedExports(statement.exportClause) || statement.isTypeOnly) return [];
    const file = join(dirname(door), (statement.moduleSpecifier as ts.StringLiteral).text.replace(/\.js$/, '.ts'));
    return statement.exportClause.elements.filter((e) => !e.isTypeOnly).map((e) => ({ name: (e.propertyName ?? e.name).text, file }));
  });
}

/** The comment straight above a declaration, without its stars. */
function commentOf(source: ts.SourceFile, name: string): string | undefined {
  const statement = source.statements.find(
    (s) =>
      ((ts.isFunctionDeclaration(s) || ts.isClassDeclaration(s)) && s.name?.text === name) ||
      (ts.isVariableStatement(s) && s.declarationList.declarations.some((d) => ts.isIdentifier(d.name) && d.name.text === name)),
  );
  const last = statement && ts.getLeadingCommentRanges(source.text, statement.getFullStart())?.at(-1);
  const text = last && source.text.slice(last.pos, last.end);
  if (!text?.startsWith('/**')) return undefined;
  return text
    .slice(3, -2)
    .split('\n')
    .map((line) => line.replace(/^\s*\* ?/, '').trimEnd())
    .join('\n')
    .trim();
}

/** A comment in pieces: what stands between empty lines, before the first tag and after it. */
function formulaIn(name: string, file: string, comment: string): Formula | undefined {
  const [body = ''] = comment.split(/^@/m);
  const paragraphs = body.split(/\n\s*\n/).map((p) => p.trim());
  const isTable = (p: string) => p.startsWith('|');
  const isSource = (p: string) => /^(Source|Standing):/.test(p);
  // the source often stands behind @returns and @throws
  const source = /^(?:Source|Standing):[\s\S]*?(?=\n\s*\n|\n@|$(?![\s\S]))/m.exec(comment)?.[0] ?? '';
  if (source === '') return undefined;
  return {
    name,
    file,
    says: paragraphs.find((p) => p !== '' && !isTable(p) && !isSource(p) && !p.startsWith('`'))?.replace(/\s*\n\s*/g, ' ') ?? '',
    equations: paragraphs.filter((p) => p.startsWith('`') && p.includes('=')).map((p) => p.replace(/\s*\n\s*/g, ' ')),
    symbols: paragraphs.filter(isTable).flatMap((p) => p.split('\n').map((line) => line.trim())),
    source: source.replace(/\s*\n\s*/g, ' ').replace(/ (Standing:)/, '  \n$1'),
  };
}

const written = ({ name, file, says, equations, symbols, source }: Formula) =>
  [`### ${name}`, `\`${file}\``, says, ...equations, ...(symbols.length > 0 ? [symbols.join('\n')] : []), source].join('\n\n');

const byName = (a: { name: string }, b: { name: string }) => (a.name < b.name ? -1 : a.name > b.name ? 1 : 0);

function libraryPage(library: string, door: string): string | undefined {
  const formulas = exportsOf(door)
    .flatMap(({ name, file }) => {
      const comment = existsSync(file) ? commentOf(parsed(file), name) : undefined;
      const formula = comment === undefined ? undefined : formulaIn(name, relative(root, file).split('\\').join('/'), comment);
      return formula && !/^Source: own drawing/.test(formula.source) ? [formula] : [];
    })
    .sort(byName);
  return formulas.length === 0 ? undefined : [`## ${library}`, ...formulas.map(written)].join('\n\n');
}

const libraries = readdirSync(join(root, 'libs')).sort();
const pages = libraries.flatMap((library) => {
  const door = join(root, 'libs', library, 'src', 'index.ts');
  const text = existsSync(door) ? libraryPage(library, door) : undefined;
  return text === undefined ? [] : [text];
});
const count = pages.join('\n').match(/^### /gm)?.length ?? 0;
const text = `# Formulas

Written by \`npx tsx apps/run/formulas.ts\` from the comments in \`libs/\`; change it there. What each standing means, and what was checked against what, is on
[sources.md](sources.md). Every limit is a shop setting that the shop's engineer confirms.

${pages.join('\n\n')}
`;

if (process.argv.includes('--check')) {
  const same = existsSync(page) && readFileSync(page, 'utf8') === text;
  console.log(same ? `formulas: ${count}, the page is up to date` : 'docs/formulas/formulas.md is not what the comments say: run npx tsx apps/run/formulas.ts');
  if (!same) process.exitCode = 1;
} else {
  writeFileSync(page, text);
  console.log(`formulas: ${count} written to docs/formulas/formulas.md`);
}
