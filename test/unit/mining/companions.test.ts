// The words that go with a term more often than chance: strongest first, accidents left out.
import { describe, expect, it } from 'vitest';
import { companionsOf } from '../../../server/src/mining/companions.js';
import { corpusOf } from '../../support/corpusOf.js';

const filler = Array.from(
  { length: 60 },
  (_, at) => `Station ${at} sends readings of wind and water. The crew reads them at noon.`,
);
const pages = Array.from(
  { length: 8 },
  (_, at) => `Rotate the access key of buoy ${at}. You must rotate the access key twice. The access key expires.`,
);
const corpus = corpusOf([...pages, ...filler]);

describe('companions', () => {
  it('name the verb that governs a term and the verb that follows it', () => {
    const found = companionsOf(corpus, ['access key', 'access keys'], 5).map(({ word, place, count }) => ({
      word,
      place,
      count,
    }));
    expect(found[0]).toEqual({ word: 'rotate', place: 'verb', count: 16 });
    expect(found).toContainEqual({ word: 'expire', place: 'after', count: 8 });
  });

  it('are none for a term that is not used, and no more than were asked for', () => {
    expect(companionsOf(corpus, ['anchor chain'], 5)).toEqual([]);
    expect(companionsOf(corpus, ['access key'], 1)).toHaveLength(1);
  });
});
