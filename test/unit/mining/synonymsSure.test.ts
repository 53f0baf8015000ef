// What makes two names sure enough to be asked about by default, on pages about a network of weather buoys.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { askSynonyms } from '../../../server/src/mining/synonyms/ask.js';
import { formulaShare } from '../../../server/src/mining/synonyms/formulas.js';
import { readNouns } from '../../../server/src/mining/synonyms/nouns.js';
import { indexOccurrences } from '../../../server/src/mining/synonyms/occurrences.js';
import { readUses } from '../../../server/src/mining/synonyms/wordUse.js';
import { corpusOf } from '../../support/corpusOf.js';

function idsOf(kind: string, texts: readonly string[]): string[] {
  return finish(askSynonyms(corpusOf(texts)))
    .filter((question) => question.kind === kind)
    .map(({ id }) => id);
}

describe('two terms of a list', () => {
  const uses = (term: string): string[] => [
    `The page of a buoy has the ${term} at its top. Every ${term} has a frame.`,
    `Type the name of the buoy into the ${term}. Clear the ${term} in spring.`,
    `The ${term} finds hulls as well. When the ${term} is empty, all stations show.`,
  ];
  const formula = (term: string): string[] => [0, 1, 2, 3, 4, 5].map((minor) => `# Buoy 1.${minor} ${term}`);

  it('are asked about, but not where one stands in a formula alone', () => {
    const pages = [...uses('search bar'), ...uses('status line')];
    expect(idsOf('synonym', [...pages, ...uses('search box')])).toEqual(['synonym:search bar|search box']);
    expect(idsOf('synonym', [...pages, ...formula('search box')])).toEqual([]);
  });

  it('are held to the share of uses between the same two words', () => {
    const corpus = corpusOf([...formula('search box'), 'Clear the search box.', 'A search box is wide.']);
    const { terms, segments } = finish(readNouns(corpus, readUses(corpus)));
    const term = terms.findIndex(({ words }) => words.join(' ') === 'search box');
    expect(formulaShare(corpus, segments, indexOccurrences(segments).of(term))).toBe(6 / 8);
  });
});
