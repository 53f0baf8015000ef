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

describe('two verbs with one object', () => {
  const uses = (verb: string, object: string): string[] => [
    `Out at sea the loggers ${verb} the ${object} at once. The crew notes the time.`,
    `When the battery is flat, they ${verb} the ${object} and close the valve.`,
    `They ${verb} the ${object} while the storm shakes the mast.`,
    `Stations in the ice ${verb} the ${object} before they send the report.`,
    `At night none may ${verb} the ${object} twice. The watch reads the pressure.`,
  ];
  const few = (verb: string, object = 'error'): string[] => uses(verb, object).slice(0, 4);
  const RAISE = 'verb-object:raise|throw:error';

  it('are asked about from five uses each on', () => {
    expect(idsOf('verb-object', [...uses('throw', 'error'), ...uses('raise', 'error')])).toEqual([RAISE]);
    expect(idsOf('verb-object', [...uses('throw', 'error'), ...few('raise')])).toEqual([]);
  });

  it('are asked about with fewer uses where two pages have both', () => {
    const [first, second, ...rest] = few('throw');
    const [one, two, ...others] = few('raise');
    const apart = [...rest, ...others];
    expect(idsOf('verb-object', [`${first} ${one}`, `${second} ${two}`, ...apart])).toEqual([RAISE]);
    expect(idsOf('verb-object', [`${first} ${one}`, second!, two!, ...apart])).toEqual([]);
  });

  it('are two operations where what they act on is seldom the same', () => {
    const kinds = ['wave', 'wind', 'wave', 'wind', 'ice'];
    const others = ['wave', 'rain', 'wave', 'salt', 'rain'];
    const pages = (verb: string, of: readonly string[]): string[] =>
      of.flatMap((kind, at) => uses(verb, `${kind} error`).slice(at, at + 1));
    expect(idsOf('verb-object', [...pages('throw', kinds), ...pages('raise', others)])).toEqual([]);
    expect(idsOf('verb-object', [...pages('throw', kinds), ...pages('raise', kinds)])).toEqual([RAISE]);
  });

  it('take along another object that has few uses', () => {
    const pages = [...uses('throw', 'error'), ...uses('raise', 'error')];
    const more = [...few('throw', 'exception'), ...few('raise', 'exception')];
    const [question, ...rest] = finish(askSynonyms(corpusOf([...pages, ...more]))).filter(
      ({ kind }) => kind === 'verb-object',
    );
    expect(rest).toEqual([]);
    expect(question!.objects).toEqual(['error', 'exception']);
    expect(idsOf('verb-object', more)).toEqual([]);
  });
});

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
