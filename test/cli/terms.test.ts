// evenword companions and evenword compare, through the front door: text, JSON, unknown terms, wrong options.
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { runCli } from '../../server/src/cli/main.js';
import { nodeHost } from '../../server/src/node/cliHost.js';
import { temporaryFolder } from '../support/languageServer.js';

const THINGS = ['mast', 'hull', 'anchor', 'battery', 'antenna', 'hatch', 'winch', 'lamp'];
const PAGES: Record<string, string> = Object.fromEntries(
  THINGS.flatMap((thing, at) => [
    [
      `guides/${thing}.md`,
      `# The ${thing}\n\nRestart the data logger before you open the ${thing}. You restart the data logger ${at} times. The data logger records the ${thing}.\n`,
    ],
    [
      `reference/${thing}.md`,
      `# Care of the ${thing}\n\nRestart the datalogger before you close the ${thing}. The datalogger records what the ${thing} does in storm ${at}.\n`,
    ],
  ]),
);

let folder: Awaited<ReturnType<typeof temporaryFolder>>;
beforeAll(async () => {
  folder = await temporaryFolder(PAGES);
});
afterAll(() => folder.dispose());

async function run(...words: string[]): Promise<{ code: number; out: string; notes: string }> {
  const real = nodeHost('0.0.0');
  let out = '';
  let notes = '';
  const host = {
    ...real,
    write: (text: string) => void (out += text),
    note: (text: string) => void (notes += text),
    progress: () => undefined,
    emphasise: (text: string) => text,
    faint: (text: string) => text,
  };
  const code = await runCli(words, host);
  return { code, out, notes };
}

describe('evenword companions', () => {
  it('lists by relation and by segment, each with figures and a sentence', async () => {
    const { code, out } = await run('companions', 'data logger', folder.path);
    expect(code).toBe(0);
    expect(out).toMatch(/^“data logger”: 24 uses on 8 pages\.\n/);
    expect(out).toMatch(
      /Verbs that act on it \(\d+ times or more, on \d+ pages?[^)]*\)\n {2}restart … data logger {2}16 times on 8 pages/,
    );
    expect(out).toMatch(/guides\/\w+\.md:3\n.*Restart the data logger before you open the/);
    expect(out).toContain('Words that share its sentences');
  });

  it('gives the same as JSON, in the segment and the relations asked for', async () => {
    const words = ['companions', 'data logger', folder.path, '--format', 'json', '--segment', 'window', '--most', '1'];
    const { code, out } = await run(...words, '--relation', 'object-of');
    expect(code).toBe(0);
    const found = JSON.parse(out) as {
      related: { relation: string; word: string; count: number; strength: number; example: { line: number } }[];
      segments: {
        kind: string;
        companions: { mutualInformation: number; conditionalEntropy: number; entropy: number }[];
      };
    };
    expect(found.related.map(({ relation, word, count }) => [relation, word, count])).toEqual([
      ['object-of', 'restart', 16],
    ]);
    expect(found.related[0]!.strength).toBeGreaterThan(10.83);
    expect(found.related[0]!.example.line).toBe(3);
    expect(found.segments).toMatchObject({ kind: 'window', companions: [expect.anything()] });
    const [{ mutualInformation, entropy, conditionalEntropy }] = found.segments.companions as [
      (typeof found.segments.companions)[0],
    ];
    expect(mutualInformation).toBeCloseTo(entropy - conditionalEntropy, 9);
  });

  it('says what is near where no page uses the term', async () => {
    const unknown = await run('companions', 'data loger', folder.path, '--quiet');
    expect(unknown).toEqual({
      ...{ code: 2, out: '' },
      notes: 'evenword companions: no page uses “data loger” in open text. Did you mean “data logger”?\n',
    });
    expect((await run('companions', 'xylophone', folder.path)).notes).toMatch(
      /no page uses “xylophone” in open text\.\n$/,
    );
  });
});

describe('evenword compare', () => {
  it('tells in plain words what speaks for one thing, with folders, sentences and figures, and ends with the verdict', async () => {
    const { code, out } = await run('compare', 'data logger', 'datalogger', folder.path);
    expect(code).toBe(0);
    expect(out).toMatch(/^“data logger” and “datalogger”: one thing, or two\?\n/);
    expect(out).toMatch(/both go with .*“restart ___” \(16 and 8 times\)/);
    expect(out).toMatch(/guides\/ +data logger 24, datalogger 0\n/);
    expect(out).toMatch(/reference\/ +data logger 0, datalogger 16\n/);
    expect(out).toContain('    No page has both.\n');
    expect(out).toContain('The folder settles 100 % of the choice');
    expect(out).toContain('H(term | folder)');
    expect(out).toMatch(/Evenword asks about them \(variant, \d+ % sure\)\.\n$/);
  });

  it('takes no question about one term for a question about two forms of it', async () => {
    const own = await temporaryFolder({
      ...PAGES,
      'spares.md':
        '# Spares\n\nTwo data loggers lie in the hut. The data loggers are charged. Count the data loggers.\n',
    });
    try {
      expect((await run('compare', 'data loggers', 'datalogger', own.path)).out).toContain('Evenword asks about them');
      const { code, out } = await run('compare', 'data logger', 'data loggers', own.path);
      expect(code).toBe(0);
      expect(out).not.toContain('Evenword asks');
    } finally {
      await own.dispose();
    }
  });

  it('says of two ways of writing, one of them a name in code, why they are not asked about', async () => {
    const own = await temporaryFolder({
      ...PAGES,
      ...Object.fromEntries(
        THINGS.map((thing) => [`reference/${thing}.md`, `${PAGES[`reference/${thing}.md`]!}Run \`datalogger\`.\n`]),
      ),
    });
    try {
      const { out } = await run('compare', 'data logger', 'datalogger', own.path);
      expect(out).toMatch(/Evenword does not ask: they are two ways of writing/);
    } finally {
      await own.dispose();
    }
  });

  it('gives everything as JSON', async () => {
    const { out } = await run('compare', 'data logger', 'datalogger', folder.path, '--format', 'json');
    const found = JSON.parse(out) as {
      terms: { text: string; uses: number }[];
      verdict: { stage: string; question: { kind: string } };
      figures: { folders: object[]; entropyWithinFolders: number; similarity: number };
    };
    expect(found.terms.map(({ text, uses }) => [text, uses])).toEqual([
      ['data logger', 24],
      ['datalogger', 16],
    ]);
    expect(found.verdict).toMatchObject({ stage: 'asked', question: { kind: 'variant' } });
    expect(found.figures.folders).toEqual([
      { folder: 'guides/', uses: [24, 0] },
      { folder: 'reference/', uses: [0, 16] },
    ]);
    expect(found.figures.entropyWithinFolders).toBe(0);
  });

  it('compares by the weight, likeness and contexts asked for', async () => {
    const similarity = async (...words: string[]): Promise<number> => {
      const { code, out } = await run(
        'compare',
        'data logger',
        'datalogger',
        folder.path,
        '--format',
        'json',
        ...words,
      );
      expect(code).toBe(0);
      return (JSON.parse(out) as { figures: { similarity: number } }).figures.similarity;
    };
    const usual = await similarity();
    expect(await similarity('--weighting', 'tf-idf', '--similarity', 'lin', '--context', 'all')).toBe(usual);
    for (const words of [
      ['--weighting', 'ppmi'],
      ['--weighting', 'bm25'],
      ['--weighting', 'log-likelihood'],
      ['--similarity', 'cosine'],
      ['--similarity', 'jaccard'],
      ['--context', 'syntactic'],
      ['--context', 'window', '--window', '3'],
    ]) {
      const other = await similarity(...words);
      expect(other).toBeGreaterThan(0);
      expect(other).toBeLessThanOrEqual(1);
      expect(other).not.toBe(usual);
    }
  });
});

describe('what cannot run', () => {
  it.each([
    [['companions'], /Name a term, then a folder/],
    [['companions', 'logger'], /Name a term, then a folder/],
    [['companions', 'logger', '.', '--segment', 'page'], /--segment takes window, sentence/],
    [['companions', 'logger', '.', '--relation', 'rhyme'], /There is no relation “rhyme”/],
    [['companions', 'logger', '.', '--most', '0'], /--most takes a whole number from 1/],
    [['compare', 'logger'], /Name two terms/],
    [['compare', 'logger', 'recorder'], /Name two terms, then a folder/],
    [['compare', 'a', 'b', '.', '--weighting', 'heavy'], /--weighting takes tf-idf, ppmi/],
    [['compare', 'a', 'b', '.', '--window', '3'], /--window goes with --context window/],
    [['ask', '.', '--context', 'window', '--window', '0'], /--window takes a whole number from 1 to 50/],
    [['compare', 'a', 'b', '/no/such/folder'], /there is no such file or folder/],
  ])('%j ends with exit code 2 and says why', async (words, message) => {
    const { code, out, notes } = await run(...words);
    expect({ code, out }).toEqual({ code: 2, out: '' });
    expect(notes).toMatch(message);
  });

  it('one term given twice', async () => {
    const { code, notes } = await run('compare', 'data logger', 'Data  Logger', folder.path);
    expect(code).toBe(2);
    expect(notes).toContain('are forms of one term');
  });

  it('helps', async () => {
    expect((await run('compare', '--help')).out).toMatch(/evenword compare A B DIR…/);
    expect((await run('companions', '--help')).out).toMatch(/evenword companions TERM DIR…/);
  });
});
