// evenword report and verify --format sarif, through the front door, over a world of the test's own and over real folders.
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import type { CliHost } from '../../server/src/cli/host.js';
import { CannotSurvey } from '../../server/src/cli/host.js';
import { runCli } from '../../server/src/cli/main.js';
import { nodeHost } from '../../server/src/node/cliHost.js';
import { ROOT, snapshotOf } from '../unit/report/workspace.js';

const folder = mkdtempSync(join(tmpdir(), 'ew-report-'));
afterAll(() => rmSync(folder, { recursive: true }));

const PAGES = {
  'a.md': 'Choose the data set. The data set is kept.',
  'b.md': 'The dataset is large. Load the dataset. Use an API key.',
};
const SOUND = 'concepts:\n  - preferred: access key\n    deprecated: [API key]\n';

/** Runs a command line over pages in memory; files are written by the real host. */
async function run(words: readonly string[], termbase?: string): Promise<{ code: number; out: string; notes: string }> {
  const real = nodeHost('0');
  let out = '';
  let notes = '';
  const host: CliHost = {
    ...real,
    write: (text) => void (out += text),
    note: (text) => void (notes += text),
    progress: () => undefined,
    pathOf: (uri) => uri.slice(ROOT.length),
    survey: (paths) =>
      paths[0] === 'missing'
        ? Promise.reject(new CannotSurvey('missing: no such file or folder'))
        : Promise.resolve({ snapshot: snapshotOf(PAGES, termbase), rootUri: ROOT, leftOut: [] }),
    now: () => '2024-05-31',
  };
  const code = await runCli(words, host);
  return { code, out, notes };
}

describe('evenword report', () => {
  it('writes three files, says where on standard error, and nothing on standard output', async () => {
    const out = join(folder, 'new', 'deep');
    const ended = await run(['report', 'docs', '--out', out]);
    expect(ended).toEqual({
      ...{ code: 0, out: '' },
      notes: ['html', 'md', 'json'].map((kind) => `wrote ${out}/report.${kind}\n`).join(''),
    });
    expect(readdirSync(out).sort()).toEqual(['report.html', 'report.json', 'report.md']);
    expect(readFileSync(join(out, 'report.html'), 'utf8')).toContain('2024-05-31');
    expect(JSON.parse(readFileSync(join(out, 'report.json'), 'utf8'))).toMatchObject({
      version: 1,
      generatedAt: '2024-05-31',
    });
  });

  it('keeps quiet when asked to', async () => {
    expect(await run(['report', 'docs', '--quiet', '--out', folder])).toEqual({ code: 0, out: '', notes: '' });
  });

  it.each([
    ['no --out', ['report', 'docs'], /evenword report DIR --out FOLDER/],
    ['no folder', ['report', '--out', 'x'], /Name a folder/],
    ['a folder that is missing', ['report', 'missing', '--out', 'x'], /^evenword report: missing: no such/],
  ])('cannot run with %s, and says what to do', async (_, words, message) => {
    const { code, out, notes } = await run(words);
    expect([code, out]).toEqual([2, '']);
    expect(notes).toMatch(message);
  });

  it('cannot run where the folder cannot be written', async () => {
    const file = join(folder, 'a-file');
    writeFileSync(file, 'x');
    for (const out of [file, join(file, 'below')]) {
      const { code, notes } = await run(['report', 'docs', '--out', out]);
      expect(code).toBe(2);
      expect(notes).toMatch(/^evenword report: .*a-file.*: .+/);
    }
  });

  it('cannot run under a broken termbase: file, line and column are named', async () => {
    const { code, notes } = await run(['report', 'docs', '--out', folder], 'concepts:\n  - preferred: [a\n');
    expect(code).toBe(2);
    expect(notes).toMatch(/^termbase\.yaml:3:1: error: /);
  });
});

describe('evenword verify --format sarif', () => {
  it('writes the log alone on standard output and ends with 1 where a page breaks a decision', async () => {
    const { code, out } = await run(['verify', 'docs', '--format', 'sarif'], SOUND);
    expect(code).toBe(1);
    const log = JSON.parse(out) as { version: string; runs: { results: { message: { text: string } }[] }[] };
    expect(log.version).toBe('2.1.0');
    expect(log.runs[0]!.results.map(({ message }) => message.text)).toEqual([expect.stringContaining('API key')]);
  });
});
