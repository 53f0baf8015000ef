// A short form that the documents explain in two ways: two concepts under one abbreviation, or one name gone astray.
import type { Corpus } from '../../corpus/corpus.js';
import { spellingKey } from '../../lexicon/spelling.js';
import { examplePlacesOf } from '../places.js';
import { questionId } from '../question.js';
import type { Question } from '../question.js';
import { byUses, singularKey, times } from '../wording.js';
import type { Explained, Expansion } from './explained.js';
import { formsOfLong, formsOfShort } from './longForms.js';
import { termOf, usesOf } from './shortAndLong.js';

const CONFIDENCE = 0.9;

/** Words that begin with so many like letters are taken for inflections of one. */
const ALIKE = 4;

/** The question about a short form with several expansions, or undefined where there is one that counts. */
export function askAmbiguous(corpus: Corpus, { short, expansions }: Explained): Question | undefined {
  const counted = expansions
    .map((expansion) => ({ expansion, forms: formsOfLong(corpus, expansion.words) }))
    .filter(({ forms }) => forms.length > 0);
  const distinct = counted.filter(({ expansion, forms }, i) =>
    counted.slice(0, i).every((earlier) => !isSame(earlier.expansion, expansion, usesOf(forms).length)),
  );
  if (distinct.length < 2) return undefined;
  const shortForms = formsOfShort(corpus, short);
  const sides = [shortForms, ...distinct.map(({ forms }) => forms)]
    .map((forms, index) => ({ term: termOf(corpus, forms, index === 0 ? short : undefined), uses: usesOf(forms) }))
    .sort((a, b) => byUses(a.term, b.term));
  const explanations = distinct.map(
    ({ expansion, forms }) => `“${termOf(corpus, forms).text}” ${times(expansion.definitions.length)}`,
  );
  const second = distinct[1]!;
  return {
    id: questionId(
      'ambiguous-abbreviation',
      sides.map(({ term }) => term),
    ),
    kind: 'ambiguous-abbreviation',
    confidence: CONFIDENCE,
    worth: CONFIDENCE * usesOf(second.forms).length,
    terms: sides.map(({ term }) => term),
    reasons: [
      {
        kind: 'explained',
        text: `the documents explain “${short}” as ${explanations.join(' and as ')}`,
        value: distinct.length,
      },
    ],
    places: examplePlacesOf(
      corpus.stream,
      sides.map(({ uses }) => uses),
    ),
  };
}

/**
 * True where two expansions are one: other spacing, an added word, or inflections (general availability, generally
 * available). Where a single word has a like beginning, a lone use of it is a slip.
 */
function isSame({ words: a }: Expansion, { words: b }: Expansion, usesOfB: number): boolean {
  const joined = (words: readonly string[]): string => words.map(singularKey).map(spellingKey).join('');
  const [x, y] = [joined(a), joined(b)];
  if (x.includes(y) || y.includes(x)) return true;
  if (a.length !== b.length || !a.every((word, i) => word.slice(0, ALIKE) === b[i]!.slice(0, ALIKE))) return false;
  return usesOfB < 2 || a.filter((word, i) => word !== b[i]).length > 1;
}
