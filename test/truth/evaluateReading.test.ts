// The evaluation's own readings: how pairs are matched with questions, how the glossary's pairs are read, how uses are renamed.
import { describe, expect, it } from 'vitest';
import { Profiles, factsOf } from '../../server/src/engine/factsOf.js';
import type { Question } from '../../server/src/mining/question.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import { figuresOf, showChanges } from '../evaluate/against.js';
import { readEntries, readPairs } from '../evaluate/glossary.js';
import { asks, verbKey } from '../evaluate/match.js';
import { inventWord } from '../evaluate/pseudo.js';
import { recallRow } from '../evaluate/recall.js';
import type { PairFate } from '../evaluate/recall.js';
import { rename } from '../evaluate/renaming.js';
import type { Evaluation } from '../evaluate/result.js';

function question(kind: Question['kind'], ...terms: readonly string[]): Question {
  return {
    ...{ id: `${kind}:${terms.join('|')}`, kind, confidence: 1, worth: 1, reasons: [], places: [] },
    terms: terms.map((text) => ({ text, uses: 5, documents: 2, forms: [{ text, uses: 5 }] })),
  };
}

describe('matching', () => {
  it('takes plural and case as nothing, hyphens as told', () => {
    const asked = question('variant', 'config map', 'ConfigMaps');
    expect(asks(asked, 'configmap', 'Config Map', 'kept')).toBe(true);
    expect(asks(asked, 'configmap', 'config-map', 'kept')).toBe(false);
    expect(asks(asked, 'configmap', 'config-map', 'open')).toBe(true);
  });

  it('wants two terms, not one twice', () => {
    expect(asks(question('synonym', 'folder', 'directory'), 'folder', 'folders', 'open')).toBe(false);
    expect(asks(question('synonym', 'folder', 'directory'), 'folder', 'path', 'open')).toBe(false);
  });

  it('takes inflected verbs as their base where the question is about verbs or spelling', () => {
    expect(asks(question('variant', 'customise', 'customize'), 'customising', 'customizing', 'kept')).toBe(true);
    expect(asks(question('verb-object', 'run', 'execute'), 'running', 'executed', 'open')).toBe(true);
    expect(asks(question('synonym', 'set', 'group'), 'setting', 'grouping', 'open')).toBe(false);
    expect(verbKey('rating planned applied string', 'open')).toBe('rate plan apply string');
  });
});

describe('recall', () => {
  it('counts places within the cuts, and 0 as not asked', () => {
    const fate = (place: number): PairFate => ({
      ...{ a: 'a', b: 'b', countA: 9, countB: 9, kind: 'synonym', flags: [] },
      ...{ place, placeWithLookAlikes: place },
    });
    expect(recallRow('all', [0, 1, 50, 51, 150, 900].map(fate)).found).toEqual([2, 3, 4, 5]);
  });
});

describe('the glossary', () => {
  // Made up after the layout of RFC 4949 (Shirey 2007), whose own text is not part of the project.
  const rfc = `
4. Definitions

   $ barrier
      1. (I) /noun/ Synonym for "wall". (Compare: fence.)

      2. (D) Synonym for "obstacle" or "hurdle".

      Deprecated Definition: IDOCs SHOULD NOT use this term as a synonym
      for "hurdle", because that is jumped over.

Shirey                       Informational                     [Page 29]
\f
RFC 4949         Internet Security Glossary, Version 2       August 2007

   $ barricade (BRC)
      (O) A wall in a hurry. It is not simply a synonym for "wall".

5. Security Considerations
`;

  it('reads entries across pages', () => {
    expect(readEntries(rfc).map(({ head }) => head)).toEqual(['barrier', 'barricade (BRC)']);
  });

  it('tells synonyms from what must not be used as one', () => {
    expect(readPairs(readEntries(rfc))).toEqual({
      synonyms: [
        { a: 'barrier', b: 'wall', status: 'recommended' },
        { a: 'barrier', b: 'obstacle', status: 'deprecated' },
      ],
      apart: [{ a: 'barrier', b: 'hurdle', status: 'recommended' }],
    });
  });
});

describe('renaming', () => {
  const profiles = new Profiles();
  const sources: SourceText[] = [12, 7, 4].map((sentences, at) => ({
    uri: `file:///${at}.md`,
    format: 'markdown',
    text: Array.from(
      { length: sentences },
      (_, i) => `Page ${at} says that widget ${i} turns. Use \`widget\` here.`,
    ).join('\n\n'),
  }));
  const facts = sources.map((source) => factsOf(source, profiles)[0]!);
  const renamings = [{ term: 'widget', forms: new Map([['widget', 'gomp']]) }];
  const uses = (mode: 'document' | 'occurrence'): number[] =>
    rename(sources, facts, renamings, mode).map(({ text }) => text.match(/gomp/g)?.length ?? 0);

  it('renames whole documents that hold about half of the uses, and never code', () => {
    expect(uses('document')).toEqual([12, 0, 0]);
  });

  it('renames about half of the occurrences, the same ones each time', () => {
    const renamed = uses('occurrence');
    expect(renamed.reduce((sum, count) => sum + count, 0)).toBeGreaterThan(5);
    expect(renamed.reduce((sum, count) => sum + count, 0)).toBeLessThan(18);
    expect(uses('occurrence')).toEqual(renamed);
  });

  it('invents words that begin as the term does and that are not taken', () => {
    const first = inventWord('item', () => false);
    expect(first).toMatch(/^[aeiou]/);
    expect(inventWord('item', (word) => word === first)).not.toBe(first);
    expect(inventWord('widget', () => false)).toMatch(/^[^aeiou]/);
  });
});

describe('comparing evaluations', () => {
  const evaluation = (...ids: readonly string[]): Evaluation => {
    const agreement = { antonyms: [], pairs: 0, known: 0, synonyms: 0 };
    const questions = ids.map((id) => ({ id, kind: 'variant' as const, terms: [] }));
    const set = { name: 'one', format: 'markdown', asPlainText: false, documents: 1, leftOut: 0, words: 1000 };
    const cost = { readingSeconds: 1, miningSeconds: 1, peakMegabytes: 100 };
    const rest = { lookAlikes: [], hiddenLookAlikes: 0, pairs: [], negatives: 0, negativesAsked: [], agreement };
    return { sets: [{ ...set, ...cost, ...rest, questions, agreementOfLookAlikes: agreement }], skipped: [] };
  };

  it('names what came and what went', () => {
    const shown = showChanges(
      evaluation('variant:a|b', 'variant:c|d'),
      evaluation('variant:a|b', 'variant:e|f', 'variant:g|h'),
    );
    expect(shown).toContain('+ variant:e|f');
    expect(shown).toContain('- variant:c|d');
    expect(shown).not.toContain('variant:a|b');
    expect(shown).toContain('questions per 100,000 words: 200.0 → 300.0');
    expect(figuresOf(evaluation('variant:a|b').sets).get('antonyms asked about')).toBe('0');
  });
});
