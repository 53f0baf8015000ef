// evenword verify: exit codes, places of findings, broken termbases; and it says what the editor shows.
import { afterEach, describe, expect, it } from 'vitest';
import { evenword } from '../support/commandLine.js';
import { TestClient, eventually, temporaryFolder } from '../support/languageServer.js';
import { PAGES, TERMBASE } from '../support/mixedPages.js';

type Folder = Awaited<ReturnType<typeof temporaryFolder>>;
const ending: (() => Promise<void>)[] = [];
afterEach(async () => {
  for (const end of ending.splice(0).reverse()) await end();
});

async function folderOf(files: Record<string, string>): Promise<Folder> {
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
