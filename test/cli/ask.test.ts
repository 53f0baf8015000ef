// evenword ask: its JSON, its text, its choice of kinds, and what it says of files that it cannot read.
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { evenword } from '../support/commandLine.js';
import { temporaryFolder } from '../support/languageServer.js';
import { PAGES, TERMBASE } from '../support/mixedPages.js';

interface Answer {
  documents: number;
  words: number;
  questions: {
    id: string;
    kind: string;
    confidence: number;
    terms: { text: string; uses: number; documents: number; forms: string[] }[];
    reasons: { kind: string; text: string; value: number }[];
    examples: { term: string; uri: string; line: number; text: string }[];
  }[];
}

let folder: Awaited<ReturnType<typeof temporaryFolder>>;
beforeAll(async () => {
  folder = await temporaryFolder({
    ...PAGES,
    '.gitignore': 'drafts/\n',
    'drafts/draft.md': 'The datalogger of the draft.\n',
    'node_modules/x/README.md': 'The datalogger of a package.\n',
    'noise.md': Uint8Array.from([0x63, 0x0a, 0xff, 0x81, 0x8d, 0x9d]),
    'zip.md': Uint8Array.from([0x50, 0x4b, 0x03, 0x04, 0x00, 0x00]),
    'line.txt': 'QUJDREVG'.repeat(12_800),
    'empty.md': '',
  });
});
afterAll(() => folder.dispose());

describe('evenword ask', () => {
  it('prints questions as JSON, each with its evidence', async () => {
    const { code, out } = await evenword(['ask', folder.path, '--format', 'json']);
    expect(code).toBe(0);
    const answer = JSON.parse(out) as Answer;
    expect(answer.documents).toBe(Object.keys(PAGES).length + 2);
    const question = answer.questions.find(({ terms }) => terms.some(({ text }) => text === 'datalogger'))!;
    expect(question.kind).toBe('variant');
    expect(question.confidence).toBeGreaterThan(0.5);
    expect(question.terms.map(({ text }) => text).sort()).toEqual(['data logger', 'datalogger']);
    expect(question.terms.every(({ uses, documents, forms }) => uses >= 6 && documents >= 2 && forms.length >= 1)).toBe(
      true,
    );
    expect(question.reasons.length).toBeGreaterThan(0);
    for (const { term, uri, line, text } of question.examples) {
      expect(text.toLowerCase()).toContain(term);
      expect(
        PAGES[uri.slice(uri.lastIndexOf('/') + 1)]!.split('\n')
          .slice(line - 1, line + 1)
          .join(' '),
      ).toMatch(/data ?logger/i);
    }
  });

  it('prints the same for people, and nothing but the result on standard output', async () => {
    const { code, out, err } = await evenword(['ask', folder.path]);
    expect(code).toBe(0);
    expect(out).toMatch(/^7 pages, [\d,]+ words: \d+ open questions?\.\n/);
    expect(out).toMatch(/“data ?logger” or “data ?logger”\?/);
    expect(out).toMatch(/service\.md:5$/m);
    expect(err).toContain('noise.md');
    const quiet = await evenword(['ask', folder.path, '--quiet']);
    expect(quiet).toEqual({ code: 0, out, err: '' });
    expect(err).toContain('write the answers into termbase.yaml');
  });

  it('says how many questions are open where it lists fewer', async () => {
    const { out } = await evenword(['ask', 'samples/buoys', '--most', '2', '--quiet', '--no-history']);
    expect(out).toMatch(/: \d+ open questions, of which 2 are listed\.\n/);
    expect(out.match(/^ *\d+\. /gm)).toHaveLength(2);
  });

  it('says by name what it left out, and why', async () => {
    const { err } = await evenword(['ask', folder.path, '--explain-files']);
    expect(err).toMatch(/noise\.md: is not in UTF-8 \(line 2\)/);
    expect(err).toMatch(/zip\.md: is a binary file/);
    expect(err).toMatch(/drafts: ignored by \.gitignore/);
    expect(err).toMatch(/node_modules: a folder of dependencies/);
  });

  it('asks the kinds that are wanted alone', async () => {
    const { out } = await evenword(['ask', folder.path, '--format', 'json', '--kinds', 'abbreviation,synonym']);
    expect((JSON.parse(out) as Answer).questions.filter(({ kind }) => kind === 'variant')).toEqual([]);
    const wrong = await evenword(['ask', folder.path, '--kinds', 'rhyme']);
    expect(wrong.code).toBe(2);
    expect(wrong.err).toContain('There is no kind “rhyme”');
  });

  it('no longer asks what a termbase decides, here or in a folder above within the repository', async () => {
    const decided = `${TERMBASE}  - preferred: data logger\n    deprecated: [datalogger]\n`;
    const other = await temporaryFolder({
      '.git/HEAD': 'ref: refs/heads/main\n',
      'termbase.yaml': decided,
      ...Object.fromEntries(Object.entries(PAGES).map(([name, text]) => [`docs/${name}`, text])),
    });
    try {
      const { out } = await evenword(['ask', `${other.path}/docs`, '--format', 'json']);
      expect((JSON.parse(out) as Answer).questions.flatMap(({ terms }) => terms.map(({ text }) => text))).not.toContain(
        'datalogger',
      );
    } finally {
      await other.dispose();
    }
  });
});

describe('what cannot run', () => {
  it.each([
    [['ask', '/no/such/folder'], /\/no\/such\/folder: there is no such file or folder/],
    [['ask'], /Name a folder/],
    [['ask', '.', '--format', 'xml'], /--format takes text, json; “xml” is none of them/],
    [['ask', '.', '--most', 'ten'], /--most takes a whole number from 1, not “ten”/],
    [['ask', '--colour'], /There is no option --colour/],
    [['ask', '.', '--constructor'], /There is no option --constructor/],
    [['sing'], /There is no subcommand “sing”/],
  ])('%j ends with exit code 2 and says why', async (words, message) => {
    const { code, out, err } = await evenword(words);
    expect({ code, out }).toEqual({ code: 2, out: '' });
    expect(err).toMatch(message);
  });

  it('helps', async () => {
    for (const words of [['--help'], ['ask', '--help'], ['verify', '--help'], ['report', '--help']]) {
      const { code, out } = await evenword(words);
      expect(code).toBe(0);
      expect(out).toMatch(/evenword/);
    }
    const help = (await evenword(['ask', '--help'])).out;
    expect(help, 'a short option').toMatch(/^ {2}--most N {20}list no more/m);
    expect(help, 'one too long for its column').toMatch(/^ {2}--weighting \S+\n {30}how much a context/m);
    expect((await evenword(['--version'])).out).toMatch(/^\d+\.\d+\.\d+\n$/);
  });
});
