// A short form that the documents explain in two ways: two concepts under one abbreviation, or one name gone astray.
import type { Corpus } from '../../corpus/corpus.js';
import { examplePlaces } from '../places.js';
import type { Question } from '../question.js';
import { byUses, times } from '../wording.js';
import type { Explained, Expansion } from './explained.js';
import { formsOfLong, formsOfShort } from './longForms.js';
import { termOf, usesOf } from './shortAndLong.js';

const CONFIDENCE = 0.9;

/** The least uses that a second expansion must have, explanations included. */
const LEAST_USES = 2;

/** The question about a short form with several expansions, or undefined where there is one that counts. */
export function askAmbiguous(corpus: Corpus, { short, expansions }: Explained): Question | undefined {
  const counted = expansions
    .map((expansion) => ({ expansion, forms: formsOfLong(corpus, expansion.words) }))
    .filter(({ forms, expansion }) => usesOf(forms).length >= LEAST_USES || expansion.definitions.length >= LEAST_USES);
  const distinct = counted.filter(({ expansion }, i) =>
    counted.slice(0, i).every((earlier) => !sameWords(earlier.expansion, expansion)),
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
    id: `ambiguous-abbreviation:${sides.map(({ term }) => term.text).join('|')}`,
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
    places: sides.flatMap(({ uses }, index) => examplePlaces(corpus.stream, index, uses)),
  };
}

/** True where two expansions differ in spacing, number, or an added word alone. */
function sameWords(a: Expansion, b: Expansion): boolean {
  const fold = ({ words }: Expansion): string => words.map((word) => word.replace(/s$/, '')).join('');
  const [x, y] = [fold(a), fold(b)];
  return x.includes(y) || y.includes(x);
}
