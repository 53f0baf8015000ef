// The language server over one long session: files that come, go and change, odd names and texts, nested and open termbases.
import { mkdir, rename, rm, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { CodeAction, Hover, TextDocumentEdit, TextEdit } from 'vscode-languageserver-protocol';
import { applyEdits } from '../../server/src/text/edits.js';
import { LineIndex } from '../../server/src/text/lineIndex.js';
import { TestClient, eventually, temporaryFolder } from '../support/languageServer.js';
import { PAGES, TERMBASE } from '../support/mixedPages.js';

const PAGE = PAGES['connecting.md']!;
const PAGE_COUNT = Object.keys(PAGES).length + 1;

let folder: Awaited<ReturnType<typeof temporaryFolder>>;
let client: TestClient;
beforeAll(async () => {
  folder = await temporaryFolder({
    ...PAGES,
    ...{ '.gitignore': 'build/\n', 'termbase.yaml': TERMBASE, 'sub/page.md': 'An API key and an access key.\n' },
    'sub/termbase.yaml': 'evenword: 1\nconcepts:\n  - preferred: API key\n    deprecated: [access key]\n',
  });
  // The first folder of the workspace is missing: the second one is surveyed all the same.
  client = await TestClient.start([join(folder.path, 'missing'), folder.path]);
  await eventually('the survey', () => client.states.some(({ state }) => state === 'ready'));
});
afterAll(async () => {
  await client.end();
  await folder.dispose();
});

const pages = (): number => client.states.at(-1)!.documents;
const codes = (uri: string): unknown[] => client.shown(uri).map(({ code }) => code);

async function write(name: string, text = PAGE): Promise<string> {
  await mkdir(dirname(join(folder.path, name)), { recursive: true });
  await writeFile(join(folder.path, name), text);
  return folder.uri(name);
}

const notify = (...changes: { uri: string; type: 1 | 2 | 3 }[]): Promise<void> =>
  client.connection.sendNotification('workspace/didChangeWatchedFiles', { changes });

const folders = (added: string[], removed: string[]): Promise<void> => {
  const named = (paths: string[]): object[] => paths.map((path) => ({ uri: pathToFileURL(path).href, name: path }));
  const event = { added: named(added), removed: named(removed) };
  return client.connection.sendNotification('workspace/didChangeWorkspaceFolders', { event });
};

const close = (uri: string): Promise<void> =>
  client.connection.sendNotification('textDocument/didClose', { textDocument: { uri } });

async function actionsAt(uri: string, text: string, word: string): Promise<CodeAction[]> {
  const start = new LineIndex(text).positionAt(text.indexOf(word) + 1);
  const params = { textDocument: { uri }, range: { start, end: start }, context: { diagnostics: [] } };
  return (await client.connection.sendRequest<CodeAction[] | null>('textDocument/codeAction', params)) ?? [];
}

function applied(text: string, { edit }: CodeAction): string {
  const lines = new LineIndex(text);
  const [change] = edit!.documentChanges!.slice(-1) as TextDocumentEdit[];
  const edits = (change!.edits as TextEdit[]).map(({ range, newText }) => ({
    span: { start: lines.offsetAt(range.start), end: lines.offsetAt(range.end) },
    newText,
  }));
  return applyEdits(text, edits);
}

describe('files on disk', () => {
  it('are surveyed though another folder of the workspace is missing', () => {
    expect(client.states.some(({ state }) => state === 'failed')).toBe(true);
    expect(pages()).toBe(PAGE_COUNT);
  });

  it('are taken in one step where 500 of them change, and a deleted folder takes its pages along', async () => {
    const names = Array.from({ length: 500 }, (_, n) => `many/page${n}.md`);
    const uris = await Promise.all(names.map((name, n) => write(name, `Page number ${n}.\n`)));
    const before = client.states.length;
    await notify(...uris.map((uri) => ({ uri, type: 1 as const })));
    await eventually('500 pages more', () => pages() === PAGE_COUNT + 500);
    expect(client.states.length - before).toBe(1);
    await rm(join(folder.path, 'many'), { recursive: true });
    await notify({ uri: folder.uri('many'), type: 3 });
    await eventually('500 pages less', () => pages() === PAGE_COUNT);
  });

  it('that are left out stay out when they change, and are checked but not counted when they are opened', async () => {
    const built = await write('build/page.md');
    const dependency = await write('node_modules/x/README.md');
    await notify({ uri: built, type: 1 }, { uri: dependency, type: 1 });
    await client.open(built, PAGE);
    await eventually('warnings', () => codes(built).length === 2);
    const other = await write('other.md', 'Another page.\n');
    await notify({ uri: other, type: 1 });
    await eventually('one page more', () => pages() > PAGE_COUNT);
    expect(pages()).toBe(PAGE_COUNT + 1);
    await close(built);
    await rm(join(folder.path, 'other.md'));
    await notify({ uri: other, type: 3 });
    await eventually('one page less', () => pages() === PAGE_COUNT);
    expect(codes(built)).toEqual([]);
  });

  it('are followed through a rename', async () => {
    const old = await write('old.md');
    await notify({ uri: old, type: 1 });
    await client.open(old, PAGE);
    await eventually('warnings', () => codes(old).length === 2);
    await rename(join(folder.path, 'old.md'), join(folder.path, 'new.md'));
    const uri = folder.uri('new.md');
    await close(old);
    await client.open(uri, PAGE);
    await notify({ uri: old, type: 3 }, { uri, type: 1 });
    await eventually('warnings under the new name', () => codes(uri).length === 2 && codes(old).length === 0);
    await eventually('one page more', () => pages() === PAGE_COUNT + 1);
    await close(uri);
  });

  it('that went unnoticed are forgotten by a new survey', async () => {
    await rm(join(folder.path, 'new.md'));
    await client.connection.sendRequest('evenword/survey', { uri: folder.uri('x') });
    expect(pages()).toBe(PAGE_COUNT);
  });
});

describe('texts and names', () => {
  it('with CRLF and characters of two units have exact ranges and fixes', async () => {
    const uri = folder.uri('crlf.md');
    const text = '# Keys 🔑🔑\r\n\r\n👩‍💻 writes *API\r\nkeys* 🙂, an API key 🔑.\r\n';
    await client.open(uri, text);
    const shown = await eventually('warnings', () => codes(uri).length === 2 && client.shown(uri));
    expect(shown.map(({ range }) => range)).toEqual([
      { start: { line: 2, character: 14 }, end: { line: 3, character: 4 } },
      { start: { line: 3, character: 13 }, end: { line: 3, character: 20 } },
    ]);
    const [fix] = await actionsAt(uri, text, 'API key ');
    expect(applied(text, fix!)).toBe(text.replace('API key 🔑', 'access key 🔑'));
    await close(uri);
  });

  it('are one document however its URI is escaped', async () => {
    const name = 'odd (1) é ü.md';
    const plain = await write(name);
    await notify({ uri: plain, type: 1 });
    // As VS Code escapes it.
    const escaped = plain.replace('(', '%28').replace(')', '%29');
    await client.open(escaped, PAGE);
    await eventually('one page more', () => pages() === PAGE_COUNT + 1);
    expect(codes(plain)).toHaveLength(2);
    await close(escaped);
    await rm(join(folder.path, name));
    await notify({ uri: escaped, type: 3 });
    await eventually('one page less', () => pages() === PAGE_COUNT && codes(plain).length === 0);
  });

  it('are read by the extension, whatever language an editor takes them for', async () => {
    const text = '<page><p>An API key.</p><code>API key</code></page>\n';
    const uri = await write('topic.page', text);
    await client.open(uri, text, 'plaintext');
    await eventually('a warning', () => codes(uri).length > 0);
    expect(codes(uri)).toHaveLength(1);
    await close(uri);
    await rm(join(folder.path, 'topic.page'));
  });
});

describe('termbases', () => {
  it('of a nested folder hold in it', async () => {
    const uri = folder.uri('sub/page.md');
    const text = 'An API key and an access key.\n';
    await client.open(uri, text);
    await eventually('a warning', () => codes(uri).length === 1);
    const params = { textDocument: { uri }, position: { line: 0, character: 20 } };
    const hover = await client.connection.sendRequest<Hover | null>('textDocument/hover', params);
    expect((hover!.contents as { value: string }).value).toContain('**access key** is a deprecated term.');
    const [fix] = await actionsAt(uri, text, 'access key');
    expect(applied(text, fix!)).toBe('An API key and an API key.\n');
    await close(uri);
  });

  it('that are open and not saved are what an answer edits, and the number of questions follows at once', async () => {
    const uri = folder.uri('installing.md');
    const termbase = folder.uri('termbase.yaml');
    const live = `# Not saved yet.\n${TERMBASE}`;
    await client.open(uri, PAGES['installing.md']!);
    await client.open(termbase, TERMBASE, 'yaml');
    await client.change(termbase, live);
    await eventually('hints', () => codes(uri).includes('mixed-terms'));
    const open = client.states.at(-1)!.openQuestions;
    const actions = await actionsAt(uri, PAGES['installing.md']!, 'datalogger');
    const [first, second] = await Promise.all(
      actions.slice(0, 2).map((action) => client.connection.sendRequest<CodeAction>('codeAction/resolve', action)),
    );
    const change = (action: CodeAction): TextDocumentEdit => action.edit!.documentChanges![0] as TextDocumentEdit;
    expect(change(first!).textDocument).toEqual({ uri: termbase, version: 2 });
    expect(applied(live, first!).startsWith(live)).toBe(true);
    await client.change(termbase, applied(live, first!));
    await eventually('a question less', () => client.states.at(-1)!.openQuestions === open - 1);
    // Of two answers given at once, the editor refuses the second by its version; given after the first, the server does.
    expect(change(second!).textDocument).toEqual({ uri: termbase, version: 2 });
    const late = await client.connection.sendRequest<CodeAction>('codeAction/resolve', actions[1]!);
    expect(late.edit).toBeUndefined();
    await close(termbase);
    await eventually('the question back', () => client.states.at(-1)!.openQuestions === open);
  });
});

describe('workspace folders', () => {
  it('that come and go take their open documents along; the first answer makes a termbase', async () => {
    const other = await temporaryFolder({ ...PAGES });
    try {
      const uri = other.uri('installing.md');
      const text = PAGES['installing.md']!;
      await client.open(uri, text);
      await folders([other.path], []);
      await eventually('hints', () => codes(uri).includes('mixed-terms'));
      const actions = await actionsAt(uri, text, 'datalogger');
      const chosen = actions.find(({ title }) => title === 'Prefer “data logger”')!;
      const resolved = await client.connection.sendRequest<CodeAction>('codeAction/resolve', chosen);
      const made = other.uri('termbase.yaml');
      expect(resolved.edit!.documentChanges![0]).toEqual({
        ...{ kind: 'create', uri: made },
        options: { ignoreIfExists: true },
      });
      expect(resolved.command).toMatchObject({ command: 'evenword.saveTermbase', arguments: [made] });
      // As the editor does: the empty file is opened, edited, saved and reported.
      await client.open(made, '', 'yaml');
      await client.change(made, applied('', resolved));
      await eventually('warnings', () => codes(uri).length === 3 && !codes(uri).includes('mixed-terms'));
      await writeFile(join(other.path, 'termbase.yaml'), applied('', resolved));
      await notify({ uri: made, type: 1 });
      await close(made);
      await folders([], [other.path]);
      await eventually('nothing shown', () => codes(uri).length === 0);
      await eventually('the end of the folder', () => client.states.at(-1)!.state === 'ended');
    } finally {
      await other.dispose();
    }
  });

  it('are held to the termbase above them in their repository, saved or not, as on the command line', async () => {
    const repository = await temporaryFolder({ '.git/HEAD': '', 'termbase.yaml': TERMBASE, 'docs/page.md': PAGE });
    try {
      const docs = join(repository.path, 'docs');
      const [uri, termbase] = [repository.uri('docs/page.md'), repository.uri('termbase.yaml')];
      await folders([docs], []);
      await client.open(uri, PAGE);
      await eventually('warnings', () => codes(uri).length === 2);
      await client.open(termbase, TERMBASE, 'yaml');
      await client.change(termbase, TERMBASE.replace('API key', 'API token'));
      await eventually('no warnings', () => codes(uri).length === 0);
      await client.connection.sendRequest('evenword/survey', { uri });
      expect(codes(uri)).toEqual([]);
      await close(termbase);
      await eventually('warnings again', () => codes(uri).length === 2);
      await folders([], [docs]);
      await eventually('nothing shown', () => codes(uri).length === 0);
    } finally {
      await repository.dispose();
    }
  });
});
