// The language server end to end: a real JSON-RPC client over stdio, and what an editor would show.
import { readFile, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import type { CodeAction, Hover, TextDocumentEdit, TextEdit } from 'vscode-languageserver-protocol';
import { DiagnosticSeverity } from 'vscode-languageserver-protocol';
import { applyEdits } from '../../server/src/text/edits.js';
import { LineIndex } from '../../server/src/text/lineIndex.js';
import { TestClient, eventually, temporaryFolder } from '../support/languageServer.js';
import { PAGES, TERMBASE } from '../support/mixedPages.js';

type Folder = Awaited<ReturnType<typeof temporaryFolder>>;
const ending: (() => Promise<void>)[] = [];
afterEach(async () => {
  for (const end of ending.splice(0).reverse()) await end();
});

async function workspace(
  files: Record<string, string | Uint8Array> = { ...PAGES, 'termbase.yaml': TERMBASE },
): Promise<Folder> {
  const folder = await temporaryFolder(files);
  ending.push(folder.dispose);
  return folder;
}

async function start(...folders: Folder[]): Promise<TestClient> {
  const client = await TestClient.start(folders.map(({ path }) => path));
  ending.push(() => client.end());
  return client;
}

const surveyed = (client: TestClient): Promise<unknown> =>
  eventually('the survey', () => client.states.some(({ state }) => state === 'ready'));

const codes = (client: TestClient, uri: string): unknown[] => client.shown(uri).map(({ code }) => code);

function applied(text: string, edits: readonly TextEdit[]): string {
  const lines = new LineIndex(text);
  return applyEdits(
    text,
    edits.map(({ range, newText }) => ({
      span: { start: lines.offsetAt(range.start), end: lines.offsetAt(range.end) },
      newText,
    })),
  );
}

async function actionsAt(client: TestClient, uri: string, text: string, word: string): Promise<CodeAction[]> {
  const start = new LineIndex(text).positionAt(text.indexOf(word) + 1);
  const params = { textDocument: { uri }, range: { start, end: start }, context: { diagnostics: [] } };
  return (await client.connection.sendRequest<CodeAction[] | null>('textDocument/codeAction', params)) ?? [];
}

describe('diagnostics', () => {
  it('mark a deprecated term as a warning in prose alone, and an undecided mix as a hint', async () => {
    const folder = await workspace();
    const client = await start(folder);
    await client.open(folder.uri('connecting.md'), PAGES['connecting.md']!);
    await client.open(folder.uri('installing.md'), PAGES['installing.md']!);
    await surveyed(client);
    const warnings = await eventually('two warnings', () => {
      const shown = client.shown(folder.uri('connecting.md'));
      return shown.length === 2 && shown;
    });
    expect(warnings.map(({ severity, code, source }) => [severity, code, source])).toEqual([
      [DiagnosticSeverity.Warning, 'deprecated-term', 'Evenword'],
      [DiagnosticSeverity.Warning, 'deprecated-term', 'Evenword'],
    ]);
    expect(warnings[0]!.range).toEqual({ start: { line: 2, character: 3 }, end: { line: 2, character: 10 } });
    await eventually('hints', () => codes(client, folder.uri('installing.md')).includes('mixed-terms'));
    for (const { severity } of client.shown(folder.uri('installing.md')))
      expect(severity).toBe(DiagnosticSeverity.Hint);
  });

  it('follow each keystroke, and a page that keeps to the decisions shows nothing', async () => {
    const folder = await workspace();
    const client = await start(folder);
    const uri = folder.uri('quiet.md');
    await client.open(uri, PAGES['quiet.md']!);
    await surveyed(client);
    expect(client.shown(uri)).toEqual([]);
    await client.change(uri, 'API key ', { start: { line: 2, character: 0 }, end: { line: 2, character: 0 } });
    await eventually('a warning', () => codes(client, uri).includes('deprecated-term'));
    await client.change(uri, '', { start: { line: 2, character: 0 }, end: { line: 2, character: 8 } });
    await eventually('quiet again', () => client.shown(uri).length === 0);
  });

  it('are taken back when a document is closed', async () => {
    const folder = await workspace();
    const client = await start(folder);
    const uri = folder.uri('connecting.md');
    await client.open(uri, PAGES['connecting.md']!);
    await eventually('warnings', () => client.shown(uri).length === 2);
    await client.connection.sendNotification('textDocument/didClose', { textDocument: { uri } });
    await eventually('nothing shown', () => client.shown(uri).length === 0);
  });

  it('name the line of a broken termbase, and keep the last good decisions in force', async () => {
    const folder = await workspace();
    const client = await start(folder);
    const page = folder.uri('connecting.md');
    const termbase = folder.uri('termbase.yaml');
    await client.open(page, PAGES['connecting.md']!);
    await eventually('warnings', () => client.shown(page).length === 2);
    await client.open(termbase, TERMBASE, 'yaml');
    await client.change(termbase, TERMBASE.replace('[API key]', '[API key'));
    const [problem] = await eventually('a problem', () => client.shown(termbase).length > 0 && client.shown(termbase));
    expect(problem!.severity).toBe(DiagnosticSeverity.Error);
    expect(problem!.range.start.line).toBeGreaterThanOrEqual(4);
    expect(client.shown(page)).toHaveLength(2);
    await client.change(termbase, TERMBASE);
    await eventually('no problem', () => client.shown(termbase).length === 0);
  });

  it('are the same for documents edited step by step and opened whole', async () => {
    const folder = await workspace();
    const client = await start(folder);
    await surveyed(client);
    const uri = folder.uri('installing.md');
    const text = PAGES['installing.md']!;
    await client.open(uri, '');
    for (let at = 0; at < text.length; at += 40) {
      const end = new LineIndex(text.slice(0, at)).positionAt(at);
      await client.change(uri, text.slice(at, at + 40), { start: end, end });
    }
    const typed = await eventually('hints', () => codes(client, uri).length >= 3 && client.shown(uri));
    const other = await start(folder);
    await other.open(uri, text);
    const whole = await eventually('hints', () => codes(other, uri).length >= 3 && other.shown(uri));
    expect(typed).toEqual(whole);
  });
});

describe('the hover', () => {
  it("shows the term's card", async () => {
    const folder = await workspace();
    const client = await start(folder);
    const uri = folder.uri('connecting.md');
    await client.open(uri, PAGES['connecting.md']!);
    await surveyed(client);
    const hover = await client.connection.sendRequest<Hover | null>('textDocument/hover', {
      textDocument: { uri },
      position: { line: 2, character: 5 },
    });
    const { value } = hover!.contents as { value: string };
    expect(value).toContain('**API key** is a deprecated term. Preferred: **access key**.');
    expect(value).toContain('| access key | preferred | 1 | 1 |');
    expect(value).toContain('| API key | deprecated | 2 | 1 |');
  });
});

describe('quick fixes', () => {
  it('use the preferred term with its article', async () => {
    const folder = await workspace();
    const client = await start(folder);
    const uri = folder.uri('connecting.md');
    const text = PAGES['connecting.md']!;
    await client.open(uri, text);
    await eventually('warnings', () => client.shown(uri).length === 2);
    const fix = (await actionsAt(client, uri, text, 'API key')).find(({ title }) => title === 'Use “access key” here')!;
    const [change] = fix.edit!.documentChanges as TextDocumentEdit[];
    expect(change!.textDocument).toEqual({ uri, version: 1 });
    expect(applied(text, change!.edits as TextEdit[])).toContain('An access key lets a station');
  });

  it('answer a question by an edit of the termbase that touches nothing else in it', async () => {
    const folder = await workspace();
    const client = await start(folder);
    const uri = folder.uri('installing.md');
    const text = PAGES['installing.md']!;
    await client.open(uri, text);
    await eventually('hints', () => codes(client, uri).includes('mixed-terms'));
    const actions = await actionsAt(client, uri, text, 'datalogger');
    expect(actions.map(({ title }) => title)).toEqual([
      expect.stringMatching(/^Prefer “data ?logger”$/),
      expect.stringMatching(/^Prefer “data ?logger”$/),
      expect.stringMatching(/^Either is fine: /),
      expect.stringMatching(/^Two concepts: /),
      expect.stringMatching(/^Not now: /),
    ]);
    const chosen = actions.find(({ title }) => title === 'Prefer “data logger”')!;
    const resolved = await client.connection.sendRequest<CodeAction>('codeAction/resolve', chosen);
    const [change] = resolved.edit!.documentChanges as TextDocumentEdit[];
    const after = applied(TERMBASE, change!.edits as TextEdit[]);
    expect(after.startsWith(TERMBASE)).toBe(true);
    expect(after).toMatch(/preferred: data logger\n\s+deprecated:\s*\[?[\s-]*datalogger/);
    // As the editor would: the file is written, the server told, and the hints become warnings.
    await writeFile(join(folder.path, 'termbase.yaml'), after);
    await client.connection.sendNotification('workspace/didChangeWatchedFiles', {
      changes: [{ uri: folder.uri('termbase.yaml'), type: 2 }],
    });
    await eventually(
      'warnings',
      () => codes(client, uri).every((code) => code === 'deprecated-term') && codes(client, uri).length === 3,
    );
  });

  it('refuse an answer to a question that was answered meanwhile', async () => {
    const folder = await workspace();
    const client = await start(folder);
    const uri = folder.uri('installing.md');
    await client.open(uri, PAGES['installing.md']!);
    await eventually('hints', () => codes(client, uri).includes('mixed-terms'));
    const [action] = await actionsAt(client, uri, PAGES['installing.md']!, 'datalogger');
    await client.open(
      folder.uri('termbase.yaml'),
      `${TERMBASE}  - preferred: data logger\n    deprecated: [datalogger]\n`,
      'yaml',
    );
    await eventually('warnings', () => codes(client, uri).includes('deprecated-term'));
    const resolved = await client.connection.sendRequest<CodeAction>('codeAction/resolve', action!);
    expect(resolved.edit).toBeUndefined();
    expect(client.messages.some((message) => message.includes('no longer open'))).toBe(true);
  });
});

describe('folders', () => {
  it('are kept apart, each with its own decisions', async () => {
    const decided = await workspace();
    const undecided = await workspace({ ...PAGES });
    const client = await start(decided, undecided);
    await client.open(decided.uri('connecting.md'), PAGES['connecting.md']!);
    await client.open(undecided.uri('connecting.md'), PAGES['connecting.md']!);
    await eventually('warnings', () => codes(client, decided.uri('connecting.md')).includes('deprecated-term'));
    await eventually('both surveys', () => client.states.filter(({ state }) => state === 'ready').length >= 2);
    expect(codes(client, undecided.uri('connecting.md'))).not.toContain('deprecated-term');
  });

  it('follow files that are deleted', async () => {
    const folder = await workspace();
    const client = await start(folder);
    await surveyed(client);
    const before = client.states.at(-1)!.documents;
    await rm(join(folder.path, 'quiet.md'));
    await client.connection.sendNotification('workspace/didChangeWatchedFiles', {
      changes: [{ uri: folder.uri('quiet.md'), type: 3 }],
    });
    await eventually('one page less', () => client.states.at(-1)!.documents === before - 1);
  });

  it('are surveyed past files that cannot be read, which are named', async () => {
    const folder = await workspace({
      ...PAGES,
      'latin.md': Uint8Array.from([0x63, 0x61, 0x66, 0xe9, 0x0a]),
      'binary.md': Uint8Array.from([0x50, 0x4b, 0x00, 0x00]),
      'line.md': 'QUJD'.repeat(25_000),
    });
    const client = await start(folder);
    await surveyed(client);
    expect(client.messages.some((message) => /latin\.md.*UTF-8 \(line 1/.test(message))).toBe(true);
    expect(client.messages.some((message) => /binary\.md.*binary/.test(message))).toBe(true);
    expect(client.states.at(-1)!.documents).toBe(Object.keys(PAGES).length + 1);
  });
});

describe('the protocol', () => {
  it('cancels a survey in its midst and goes on serving', async () => {
    const folder = await workspace(
      Object.fromEntries(Array.from({ length: 400 }, (_, page) => [`page${page}.md`, PAGES['service.md']!.repeat(5)])),
    );
    const client = await start(folder);
    const token = await new Promise((resolve) =>
      client.connection.onUnhandledProgress((progress) => resolve(progress.token)),
    );
    await client.connection.sendNotification('window/workDoneProgress/cancel', { token });
    await eventually('the end of the survey', () => client.states.some(({ state }) => state === 'failed'));
    expect(client.states.at(-1)!.message).toBe('The survey was cancelled.');
    await client.open(folder.uri('page1.md'), PAGES['service.md']!);
    const hover = await client.connection.sendRequest('textDocument/hover', {
      textDocument: { uri: folder.uri('page1.md') },
      position: { line: 0, character: 3 },
    });
    expect(hover).toBeNull();
  });

  it('survives a message that is none, and ends when the client says exit without shutdown', async () => {
    const folder = await workspace();
    const client = await TestClient.start([folder.path]);
    await client.connection.sendNotification('textDocument/didChange', { nonsense: true });
    await client.connection.sendNotification('no/such/method', {});
    await surveyed(client);
    const exit = new Promise<number | null>((resolve) => client.process.once('exit', resolve));
    await client.connection.sendNotification('exit');
    expect(await exit).toBe(1);
    client.connection.dispose();
  });

  it('gives the report of a folder', async () => {
    const folder = await workspace();
    const client = await start(folder);
    await surveyed(client);
    const report = await client.connection.sendRequest<{ files: Record<string, string> }>('evenword/report', {
      uri: folder.uri('x'),
    });
    expect(Object.keys(report.files).sort()).toEqual(['report.html', 'report.json', 'report.md']);
    expect(report.files['report.html']).toContain('data logger');
    expect(await readFile(join(folder.path, 'termbase.yaml'), 'utf8')).toBe(TERMBASE);
  });
});
