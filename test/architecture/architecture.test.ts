// The house keeps its plan: imports flow one way, files stay small, the engine stays pure.
import { readdirSync, readFileSync } from 'node:fs';
import { join, relative, resolve, sep } from 'node:path';
import ts from 'typescript';
import { describe, expect, it } from 'vitest';
import { LONGEST_FILE, MEDIAN_FILE, PURE_ROOMS, ROOMS } from './rooms.js';

const root = resolve(import.meta.dirname, '../..');
const serverRoot = join(root, 'server/src');
const BANNED_NAMES = /(^|\/)[^/]*(utils?|helpers?|manager|service|provider)[^/]*$/i;
const BANNED_GLOBALS = new Set([
  'process',
  'setTimeout',
  'setInterval',
  'setImmediate',
  'performance',
  'Date',
  'fetch',
  'Buffer',
  'require',
  'console',
]);

interface Import {
  readonly file: string;
  readonly target: string;
  readonly typeOnly: boolean;
}

function filesUnder(folder: string): string[] {
  return readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && entry.name.endsWith('.ts'))
    .map((entry) => join(entry.parentPath, entry.name))
    .sort();
}

function parse(file: string): ts.SourceFile {
  return ts.createSourceFile(file, readFileSync(file, 'utf8'), ts.ScriptTarget.ES2022, true);
}

function importsOf(file: string): Import[] {
  const found: Import[] = [];
  const visit = (node: ts.Node): void => {
    if ((ts.isImportDeclaration(node) || ts.isExportDeclaration(node)) && node.moduleSpecifier !== undefined) {
      const clause = ts.isImportDeclaration(node) ? node.importClause : undefined;
      const typeOnly = ts.isExportDeclaration(node)
        ? node.isTypeOnly
        : clause?.phaseModifier === ts.SyntaxKind.TypeKeyword;
      found.push({ file, target: (node.moduleSpecifier as ts.StringLiteral).text, typeOnly });
    } else if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
      found.push({ file, target: (node.arguments[0] as ts.StringLiteral).text, typeOnly: false });
    }
    ts.forEachChild(node, visit);
  };
  visit(parse(file));
  return found;
}

const roomOf = (file: string): string => relative(serverRoot, file).split(sep)[0]!;
const serverFiles = filesUnder(serverRoot);
const clientFiles = filesUnder(join(root, 'client/src'));
const isData = (file: string): boolean => file.includes(`${sep}data${sep}`);

describe('the import table', () => {
  it('knows every room', () => {
    expect([...new Set(serverFiles.map(roomOf))].filter((room) => ROOMS[room] === undefined)).toEqual([]);
  });

  it('is kept by the server', () => {
    const broken = serverFiles.flatMap(importsOf).flatMap(({ file, target, typeOnly }) => {
      const room = roomOf(file);
      const rule = ROOMS[room]!;
      if (!target.startsWith('.'))
        return rule.packages?.some((allowed) => allowed.test(target)) === true
          ? []
          : [`${relative(root, file)} imports ${target}`];
      const other = roomOf(resolve(file, '..', target));
      const allowed =
        other === room || rule.rooms.includes(other) || (typeOnly && rule.types?.includes(other) === true);
      return allowed ? [] : [`${relative(root, file)} (${room}) imports ${typeOnly ? 'types of ' : ''}${other}`];
    });
    expect(broken).toEqual([]);
  });

  it("lets the client import the server's protocol alone", () => {
    const broken = clientFiles.flatMap(importsOf).filter(({ file, target }) => {
      if (!target.startsWith('.')) return !/^(vscode|vscode-languageclient(\/.*)?|node:path)$/.test(target);
      const path = resolve(file, '..', target).replace(/\.js$/, '');
      return path.startsWith(join(root, 'server')) && path !== join(serverRoot, 'lsp/protocol');
    });
    expect(broken).toEqual([]);
  });
});

describe('files', () => {
  const code = [...serverFiles, ...clientFiles].filter((file) => !isData(file));
  const lines = code.map((file) => readFileSync(file, 'utf8').split('\n').length - 1);

  it(`have at most ${LONGEST_FILE} lines, and ${MEDIAN_FILE} in the median`, () => {
    expect(code.filter((_, index) => lines[index]! > LONGEST_FILE).map((file) => relative(root, file))).toEqual([]);
    expect([...lines].sort((a, b) => a - b)[lines.length >> 1]).toBeLessThanOrEqual(MEDIAN_FILE);
  });

  it('open with one comment line on their duty', () => {
    expect(
      code.filter((file) => !/^\/\/ \S.*[.:;]\n/.test(readFileSync(file, 'utf8'))).map((file) => relative(root, file)),
    ).toEqual([]);
  });

  it('have names that say what they are', () => {
    expect(code.map((file) => relative(root, file)).filter((file) => BANNED_NAMES.test(file))).toEqual([]);
  });
});

describe('the engine is pure', () => {
  const pure = serverFiles.filter((file) => PURE_ROOMS.includes(roomOf(file)));

  it('reads no clock, randomness, locale or process', () => {
    const broken: string[] = [];
    for (const file of pure) {
      const source = parse(file);
      const visit = (node: ts.Node): void => {
        const at = (): string =>
          `${relative(root, file)}:${source.getLineAndCharacterOfPosition(node.getStart()).line + 1} ${node.getText().slice(0, 40)}`;
        if (ts.isIdentifier(node) && BANNED_GLOBALS.has(node.text) && isFreeName(node)) broken.push(at());
        if (ts.isPropertyAccessExpression(node)) {
          if (/^(localeCompare|toLocale)/.test(node.name.text)) broken.push(at());
          if (node.name.text === 'random' && node.expression.getText() === 'Math') broken.push(at());
        }
        if (ts.isIdentifier(node) && node.text === 'Intl' && isFreeName(node) && roomOf(file) !== 'tokens')
          broken.push(at());
        ts.forEachChild(node, visit);
      };
      visit(source);
    }
    expect(broken).toEqual([]);
  });
});

/** True where an identifier is used as a variable, not as a property, a declared name or a type's member. */
function isFreeName(node: ts.Identifier): boolean {
  const parent = node.parent;
  if (ts.isPropertyAccessExpression(parent)) return parent.expression === node;
  if (ts.isPropertyAssignment(parent) || ts.isPropertySignature(parent) || ts.isMethodDeclaration(parent))
    return parent.name !== node;
  if (ts.isPropertyDeclaration(parent) || ts.isParameter(parent) || ts.isBindingElement(parent)) return false;
  return !ts.isVariableDeclaration(parent) && !ts.isTypeReferenceNode(parent);
}
