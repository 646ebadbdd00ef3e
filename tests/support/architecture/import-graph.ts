import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import ts from 'typescript';
import { ROOT } from '../started-product.ts';

/** One import, as it stands in the sources; `to` is a path from the checkout, or a package's name. */
export interface Edge {
  readonly from: string;
  readonly to: string;
  readonly line: number;
  readonly typeOnly: boolean;
  readonly ours: boolean;
}

const SOURCE = /\.(ts|tsx|mjs|js|astro|css)$/;
const FRONTMATTER = /^---\n(.*?)\n---/s;
const SCRIPT = /<script[^>]*>(.*?)<\/script>/gs;

/** Every file below a folder of the checkout, as paths from the checkout. */
export function filesBelow(folder: string): string[] {
  const path = join(ROOT, folder);
  if (!existsSync(path)) return [];
  return readdirSync(path, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => relative(ROOT, join(entry.parentPath, entry.name)))
    .sort();
}

/** The text of a file of the checkout. */
export function readSource(file: string): string {
  return readFileSync(join(ROOT, file), 'utf8');
}

/** The scripts of a file with the line each starts on: the file itself, or an Astro file's own parts. */
function scriptsOf(file: string): { text: string; offset: number }[] {
  const text = readSource(file);
  if (!file.endsWith('.astro')) return [{ text, offset: 0 }];
  const frontmatter = FRONTMATTER.exec(text);
  const parts = [frontmatter, ...text.matchAll(SCRIPT)].filter((match) => match !== null);
  return parts.map((match) => {
    const before = match.index + match[0].indexOf(match[1] ?? '');
    return { text: match[1] ?? '', offset: text.slice(0, before).split('\n').length - 1 };
  });
}

function resolve(from: string, specifier: string): { to: string; ours: boolean } {
  if (!specifier.startsWith('.')) return { to: specifier, ours: false };
  const path = join(dirname(from), specifier);
  const found = [path, `${path}.ts`, `${path}.tsx`, join(path, 'index.ts')].find((candidate) => {
    const whole = join(ROOT, candidate);
    return existsSync(whole) && statSync(whole).isFile();
  });
  return { to: found ?? path, ours: true };
}

function isTypeOnly(node: ts.ImportDeclaration | ts.ExportDeclaration): boolean {
  if (ts.isExportDeclaration(node)) return node.isTypeOnly;
  const clause = node.importClause;
  if (!clause) return false;
  const names = clause.namedBindings;
  return (
    clause.isTypeOnly ||
    (!clause.name && !!names && ts.isNamedImports(names) && names.elements.every((name) => name.isTypeOnly))
  );
}

/** Static and dynamic imports, re-exports and `import('…')` types alike. */
function specifierOf(node: ts.Node): { text: string; typeOnly: boolean } | undefined {
  if ((ts.isImportDeclaration(node) || ts.isExportDeclaration(node)) && node.moduleSpecifier) {
    if (ts.isStringLiteral(node.moduleSpecifier))
      return { text: node.moduleSpecifier.text, typeOnly: isTypeOnly(node) };
  }
  if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
    const [first] = node.arguments;
    if (first && ts.isStringLiteralLike(first)) return { text: first.text, typeOnly: false };
  }
  if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) {
    const { literal } = node.argument;
    if (ts.isStringLiteral(literal)) return { text: literal.text, typeOnly: true };
  }
  return undefined;
}

function edgesOf(file: string): Edge[] {
  if (file.endsWith('.css')) return [];
  return scriptsOf(file).flatMap(({ text, offset }) => {
    const kind = file.endsWith('.tsx') ? ts.ScriptKind.TSX : ts.ScriptKind.TS;
    const source = ts.createSourceFile(file, text, ts.ScriptTarget.Latest, false, kind);
    const edges: Edge[] = [];
    const visit = (node: ts.Node): void => {
      const specifier = specifierOf(node);
      if (specifier) {
        const { line } = source.getLineAndCharacterOfPosition(node.getStart(source));
        const { typeOnly } = specifier;
        edges.push({ from: file, ...resolve(file, specifier.text), line: offset + line + 1, typeOnly });
      }
      ts.forEachChild(node, visit);
    };
    visit(source);
    return edges;
  });
}

/** The sources below some folders and every import in them. */
export function readImportGraph(folders: readonly string[]): { files: string[]; edges: Edge[] } {
  const files = folders.flatMap(filesBelow).filter((file) => SOURCE.test(file));
  return { files, edges: files.flatMap(edgesOf) };
}

/** An edge as one can click on it. */
export function sayEdge({ from, line, to, typeOnly }: Edge): string {
  return `${from}:${String(line)} imports ${to}${typeOnly ? ' (types only)' : ''}`;
}
