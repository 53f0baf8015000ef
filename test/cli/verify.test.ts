// evenword verify: exit codes, places of findings, broken termbases; and it says what the editor shows.
import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import { evenword } from '../support/commandLine.js';
import { TestClient, eventually, temporaryFolder } from '../support/languageServer.js';
import { PAGES, TERMBASE } from '../support/mixedPages.js';

type Folder = Awaited<ReturnType<typeof temporaryFolder>>;
const ending: (() => Promise<void>)[] = [];
afterEach(async () => {
  for (const end of ending.splice(0).reverse()) await end();
});

async function folderOf(files: Record<string, string | Uint8Array>): Promise<Folder> {
  const folder = await temporaryFolder(files);
  ending.push(folder.dispose);
  return folder;
}

describe('evenword verify', () => {
  it('ends with 1 where a page breaks a decision, and names the place', async () => {
    const folder = await folderOf({ ...PAGES, 'termbase.yaml': TERMBASE });
    const { code, out, err } = await evenword(['verify', '.'], folder.path);
    expect(code).toBe(1);
    expect(out.split('\n').map((line) => line.split(': ')[0])).toEqual(['connecting.md:3:4', 'connecting.md:3:71', '']);
    expect(out).toContain('this documentation says “access key”');
    expect(err).toContain('2 findings on 1 of 5 pages.');
  });

  it('ends with 0 where every page keeps to the decisions, or nothing is decided', async () => {
    const kept = await folderOf({ 'quiet.md': PAGES['quiet.md']!, 'termbase.yaml': TERMBASE });
    expect(await evenword(['verify', kept.path])).toMatchObject({ code: 0, out: '' });
    const undecided = await folderOf({ ...PAGES });
    const { code, err } = await evenword(['verify', undecided.path]);
    expect(code).toBe(0);
    expect(err).toContain('No termbase.yaml was found');
  });

  it('ends with 2 on a broken termbase, with file, line and column', async () => {
    const folder = await folderOf({ ...PAGES, 'termbase.yaml': TERMBASE.replace('preferred:', 'preferd:') });
    const { code, out, err } = await evenword(['verify', '.'], folder.path);
    expect({ code, out }).toEqual({ code: 2, out: '' });
    expect(err).toMatch(/^termbase\.yaml:4:5: (error|warning): /m);
    const latin = Uint8Array.from([...Buffer.from(TERMBASE), 0x23, 0xe9, 0x0a]);
    const other = await folderOf({ ...PAGES, 'termbase.yaml': latin });
    expect(await evenword(['verify', '.'], other.path)).toMatchObject({
      ...{ code: 2, out: '' },
      err: expect.stringMatching(/termbase\.yaml: is not in UTF-8 \(line 6/) as string,
    });
    // Silence is for notes: why nothing was checked is said all the same.
    const broken = await folderOf({ ...PAGES, 'termbase.yaml': 'concepts: [broken\n' });
    const quiet = await evenword(['verify', '.', '--quiet'], broken.path);
    expect(quiet).toMatchObject({ code: 2, out: '' });
    expect(quiet.err).toMatch(/^termbase\.yaml:\d+:\d+: error: /);
  });

  it('says what it could not read or understand of a page, with its place', async () => {
    const folder = await folderOf({
      'openapi.json': '{ "openapi": "3.1.0",\n  "info": { "title" "Buoys" } }',
      'page.md': 'A buoy.\n\n<!-- evenword: hush -->\n',
      'termbase.yaml': TERMBASE,
    });
    const { code, err } = await evenword(['verify', '.'], folder.path);
    expect(code).toBe(0);
    expect(err).toMatch(/^openapi\.json:2:\d+: note: /m);
    expect(err).toMatch(/^page\.md:3:1: note: “evenword: hush” is not understood/m);
  });

  it('holds single pages and parts of a tree to the termbases above them', async () => {
    const page = PAGES['connecting.md']!;
    const folder = await folderOf({
      ...{ 'termbase.yaml': TERMBASE, 'a/page.md': page, 'b/page.md': page, 'b/c/page.md': page },
      'b/termbase.yaml': 'evenword: 1\nconcepts:\n  - preferred: API key\n    deprecated: [access key]\n',
    });
    const places = async (...words: string[]): Promise<string[]> => {
      const { out } = await evenword(['verify', ...words], folder.path);
      return out.split('\n').map((line) => line.split(': ')[0]!);
    };
    const nearest = ['b/c/page.md:8:12', 'b/page.md:8:12'];
    expect(await places('a/page.md')).toEqual(['']);
    expect(await places('b/page.md')).toEqual([nearest[1], '']);
    expect(await places('a', 'b/c')).toEqual(['a/page.md:3:4', 'a/page.md:3:71', nearest[0], '']);
    await mkdir(join(folder.path, '.git'));
    expect(await places('a/page.md')).toEqual(['a/page.md:3:4', 'a/page.md:3:71', '']);
    expect(await places('b/c')).toEqual([nearest[0], '']);
  });

  it('finds what the editor shows, place by place', async () => {
    const folder = await folderOf({ ...PAGES, 'termbase.yaml': TERMBASE });
    const { out } = await evenword(['verify', folder.path, '--format', 'json']);
    const { findings } = JSON.parse(out) as {
      findings: { uri: string; line: number; column: number; endLine: number; endColumn: number; message: string }[];
    };
    const client = await TestClient.start([folder.path]);
    ending.push(() => client.end());
    await eventually('the survey', () => client.states.some(({ state }) => state === 'ready'));
    const shown = [];
    for (const [name, text] of Object.entries(PAGES)) {
      await client.open(folder.uri(name), text);
    }
    await client.connection.sendRequest('textDocument/hover', {
      textDocument: { uri: folder.uri('quiet.md') },
      position: { line: 0, character: 0 },
    });
    for (const name of Object.keys(PAGES).sort()) {
      for (const { range, message, severity } of client.shown(folder.uri(name))) {
        if (severity !== 2) continue;
        shown.push({
          line: range.start.line + 1,
          column: range.start.character + 1,
          endLine: range.end.line + 1,
          endColumn: range.end.character + 1,
          message,
        });
      }
    }
    expect(
      findings.map(({ line, column, endLine, endColumn, message }) => ({ line, column, endLine, endColumn, message })),
    ).toEqual(shown);
  });
});
