// Batch equals incremental: the counts of a corpus are a function of its documents, whatever the order of edits was.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { finish } from '../../server/src/base/work.js';
import { Corpus } from '../../server/src/corpus/corpus.js';
import type { DocumentFacts } from '../../server/src/facts/documentFacts.js';
import { gatherFacts } from '../../server/src/facts/documentFacts.js';
import { Zone } from '../../server/src/prose/zones.js';
import type { ProseBlock } from '../../server/src/prose/prose.js';
import { TAG, TokenFlag } from '../../server/src/tokens/tokens.js';
import type { BlockTokens, LanguageProfile } from '../../server/src/tokens/tokens.js';

/** Words at white space, commas apart: enough grammar for counting, with no tagger to wait for. */
const plainProfile: LanguageProfile = {
  language: 'en',
  tokens: (contents) =>
    contents.map(({ text }): BlockTokens => {
      const found = [...text.matchAll(/[^\s,]+|,/g)];
      return {
        start: Uint32Array.from(found, (match) => match.index),
        end: Uint32Array.from(found, (match) => match.index + match[0].length),
        tag: Uint8Array.from(found, (match) => (match[0] === ',' ? TAG.PUNCT : TAG.NOUN)),
        flags: Uint8Array.from(found, (match, index) => {
          const word = match[0] === ',' ? 0 : TokenFlag.word;
          return word | (index === 0 ? TokenFlag.sentenceStart : TokenFlag.spaceBefore);
        }),
        word: found.map((match) => match[0]),
        lemma: found.map((match) => match[0].toLowerCase()),
      };
    }),
};

function factsOf(blocks: readonly { text: string; quoted: boolean }[]): DocumentFacts {
  let start = 0;
  const prose = blocks.map(({ text, quoted }): ProseBlock => {
    const zones = quoted ? Zone.quotation : Zone.prose;
    const pieces = Uint32Array.of(0, 0, text.length);
    const content = {
      kind: 'paragraph',
      level: 0,
      text,
      zones,
      marks: [],
      links: [],
      pieces,
      sourceLength: text.length,
    } as const;
    const block = { start, content };
    start += text.length + 2;
    return block;
  });
  return gatherFacts({ blocks: prose, problems: [], language: undefined }, plainProfile);
}

/** Everything countable, by text: interned ids differ between histories and must not matter. */
function countsOf(corpus: Corpus): Record<string, number> {
  const counts: [string, number][] = [];
  for (let id = 0; id < corpus.vocabulary.size; id++) {
    if (corpus.usesOfWord(id) !== 0) counts.push([corpus.vocabulary.textOf(id), corpus.usesOfWord(id)]);
  }
  for (let id = 0; id < corpus.grams.size; id++) {
    if (corpus.usesOfGram(id) === 0) continue;
    const words = corpus.grams.wordsOf(id).map((word) => corpus.vocabulary.textOf(word));
    expect(corpus.grams.find(corpus.grams.wordsOf(id))).toBe(id);
    counts.push([words.join(' '), corpus.usesOfGram(id)]);
  }
  return Object.fromEntries(counts.sort(([a], [b]) => (a < b ? -1 : 1)));
}

const word = fc.constantFrom('buoy', 'Buoy', 'mast', 'light', 'the', 'of', 'battery', 'cell', 'data-link', ',');
const block = fc.record({
  text: fc.array(word, { maxLength: 7 }).map((words) => words.join(' ')),
  quoted: fc.boolean(),
});
const edit = fc.record({
  uri: fc.constantFrom('a', 'b', 'c', 'd'),
  blocks: fc.option(fc.array(block, { maxLength: 5 }), { nil: undefined }),
});
const history = fc.array(fc.array(edit, { minLength: 1, maxLength: 3 }), { maxLength: 12 });

describe('a corpus', () => {
  it('counts the same in one batch and over any history of edits', () => {
    fc.assert(
      fc.property(history, (steps) => {
        let incremental = Corpus.create();
        const texts = new Map<string, DocumentFacts>();
        for (const step of steps) {
          const changes = step.map(({ uri, blocks }) => ({ uri, facts: blocks && factsOf(blocks) }));
          incremental = finish(incremental.apply(changes));
          for (const { uri, facts } of changes) {
            if (facts === undefined) texts.delete(uri);
            else texts.set(uri, facts);
          }
        }
        const batch = finish(Corpus.create().apply([...texts].map(([uri, facts]) => ({ uri, facts }))));
        expect(countsOf(incremental)).toEqual(countsOf(batch));
        expect(incremental.documents.map(({ uri }) => uri)).toEqual(batch.documents.map(({ uri }) => uri));
      }),
      { numRuns: 300 },
    );
  });

  it('has a stream whose index agrees with its counts', () => {
    fc.assert(
      fc.property(fc.uniqueArray(edit, { selector: ({ uri }) => uri }), (documents) => {
        const corpus = finish(
          Corpus.create().apply(documents.map(({ uri, blocks }) => ({ uri, facts: factsOf(blocks ?? []) }))),
        );
        const { stream, vocabulary } = corpus;
        const counted = new Map<number, number>();
        for (let id = 0; id < vocabulary.size; id++) {
          for (const row of stream.rowsOf(id)) {
            expect(stream.fold[row]).toBe(id);
            counted.set(stream.spelling[row]!, (counted.get(stream.spelling[row]!) ?? 0) + 1);
            const document = stream.documentOf(row);
            expect(row).toBeGreaterThanOrEqual(stream.documentFirst[document]!);
            expect(row).toBeLessThan(stream.documentFirst[document + 1]!);
          }
        }
        for (let id = 0; id < vocabulary.size; id++) expect(counted.get(id) ?? 0).toBe(corpus.usesOfWord(id));
      }),
    );
  });

  it('leaves an earlier snapshot as it was', () => {
    const first = finish(
      Corpus.create().apply([{ uri: 'a', facts: factsOf([{ text: 'mast light', quoted: false }]) }]),
    );
    const before = countsOf(first);
    finish(
      first.apply([
        { uri: 'a', facts: factsOf([{ text: 'buoy buoy', quoted: false }]) },
        { uri: 'b', facts: factsOf([]) },
      ]),
    );
    expect(countsOf(first)).toEqual(before);
    expect(before).toEqual({ light: 1, mast: 1, 'mast light': 1 });
  });
});
