// Companions are a function of the documents: batch equals incremental, whatever came and went; their figures agree with counting by hand.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { finish } from '../../server/src/base/work.js';
import { Corpus } from '../../server/src/corpus/corpus.js';
import { Profiles, factsOf } from '../../server/src/engine/factsOf.js';
import { SEGMENT_KINDS, findCompanions } from '../../server/src/mining/companions/companions.js';
import type { SegmentKind } from '../../server/src/mining/companions/companions.js';

const profiles = new Profiles();
const THINGS = ['logger', 'mast', 'cold start', 'access key', 'station'];
const VERBS = ['restart', 'check', 'rotate', 'paint', 'open'];
const sentence = fc
  .record({ verb: fc.constantFrom(...VERBS), thing: fc.constantFrom(...THINGS), other: fc.constantFrom(...THINGS) })
  .map(({ verb, thing, other }) => `You must ${verb} the ${thing} with the ${other}.`);
const page = fc
  .array(fc.array(sentence, { minLength: 1, maxLength: 4 }), { minLength: 1, maxLength: 4 })
  .map((paragraphs) => `# Page\n\n${paragraphs.map((some) => some.join(' ')).join('\n\n')}\n`);

const change = (at: number, text: string | undefined) => {
  const uri = `file:///${at}.md`;
  return { uri, facts: text === undefined ? undefined : factsOf({ uri, format: 'markdown', text }, profiles)[0]! };
};

describe('companions', () => {
  it('are those of the documents, whatever their history', () => {
    const edit = fc.record({ at: fc.nat(5), text: fc.option(page, { nil: undefined, freq: 5 }) });
    fc.assert(
      fc.property(
        fc.array(edit, { minLength: 1, maxLength: 10 }),
        fc.constantFrom(...THINGS, ...VERBS),
        fc.constantFrom<SegmentKind>(...SEGMENT_KINDS),
        (edits, term, kind) => {
          let corpus = Corpus.create();
          const last = new Map<number, string>();
          for (const { at, text } of edits) {
            corpus = finish(corpus.apply([change(at, text)]));
            if (text === undefined) last.delete(at);
            else last.set(at, text);
          }
          const whole = finish(Corpus.create().apply([...last].map(([at, text]) => change(at, text))));
          expect(findCompanions(corpus, [term, `${term}s`], kind)).toEqual(
            findCompanions(whole, [term, `${term}s`], kind),
          );
        },
      ),
      { numRuns: 40 },
    );
  }, 60_000);

  it('count the sentences that hold both words, as reading them one by one does', () => {
    fc.assert(
      fc.property(fc.array(page, { minLength: 1, maxLength: 4 }), fc.constantFrom(...VERBS), (pages, verb) => {
        const texts = pages.map((text, at) => text.replace('# Page', `# Page ${at}`));
        const corpus = finish(Corpus.create().apply(texts.map((text, at) => change(at, text))));
        // Paragraphs of the same prose count once.
        const paragraphs = new Set(texts.flatMap((text) => text.trim().split('\n\n').slice(1)));
        const sentences = [...paragraphs].flatMap((text) => text.match(/[^.]+\./g) ?? []);
        const withTerm = sentences.filter((text) => /\blogger\b/.test(text));
        const { segments } = findCompanions(corpus, ['logger'], 'sentence');
        expect(segments.withTerm).toBe(withTerm.length);
        const both = withTerm.filter((text) => text.includes(` ${verb} `)).length;
        const told = segments.companions.find(({ word }) => word === verb);
        if (told !== undefined) expect(told.count).toBe(both);
      }),
      { numRuns: 40 },
    );
  }, 60_000);
});
