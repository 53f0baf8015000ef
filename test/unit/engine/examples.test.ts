// Example sentences: one sentence on one line, the term marked, code readable, everything else opaque as dots.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { Engine } from '../../../server/src/engine/engine.js';
import { ExampleFinder } from '../../../server/src/engine/examples.js';
import { Profiles } from '../../../server/src/engine/factsOf.js';
import { PAGES } from '../../support/mixedPages.js';

const root = 'file:///docs/';
const page = `# Settings

Nothing here. Run \`strand init\` before the datalogger
starts, see ![the mast](mast.png). The datalogger is off. ${'Far from it, '.repeat(40)}the datalogger ends${' and so on'.repeat(40)}.
`;
const engine = new Engine(new Profiles());
const texts: Record<string, string> = { ...PAGES, 'a.md': page };
engine.apply({
  documents: Object.entries(texts).map(([name, text]) => ({
    uri: root + name,
    source: { uri: root + name, format: 'markdown', text },
  })),
});
const { snapshot } = (finish(engine.settle()), engine);

describe('examples', () => {
  const question = snapshot.agendaAt(root).open.find(({ id }) => id === 'variant:data logger|datalogger')!;
  const { corpus } = snapshot.relations.languages[0]!;
  const document = corpus.documents.findIndex(({ uri }) => uri === `${root}a.md`);
  const { facts } = corpus.documents[document]!;
  const uses = [...facts.word.keys()].filter((row) => facts.words[facts.word[row]!] === 'datalogger');
  const places = uses.map((row) => ({ term: 0, document, firstToken: row, lastToken: row }));
  const examples = new ExampleFinder(snapshot).of({ ...question, places });

  it('are whole sentences with their line, code as it reads', () => {
    expect(examples.slice(0, 2).map(({ line, text }) => [line, text])).toEqual([
      [3, 'Run strand init before the datalogger starts, see ….'],
      [4, 'The datalogger is off.'],
    ]);
  });

  it('are cut around the term where they are long', () => {
    const { text } = examples[2]!;
    expect(text.length).toBeLessThan(300);
    expect(text).toMatch(/^… .*the datalogger ends and so on.* …$/);
  });

  it('mark the term in the text and in the source', () => {
    for (const { text, highlight, source } of examples) {
      expect(text.slice(highlight.start, highlight.end)).toBe('datalogger');
      expect(page.slice(source.start, source.end)).toBe('datalogger');
    }
  });
});
