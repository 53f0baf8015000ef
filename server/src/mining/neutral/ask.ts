// Questions in a language of which no grammar is known: one compound joined, hyphened and open, or with and without a last long vowel.
import { compareCodeUnits } from '../../base/order.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { questionId } from '../question.js';
import type { Question } from '../question.js';
import { countDocuments, examplePlaces } from '../places.js';
import { byUses, displayText, makeTerm, pages, times } from '../wording.js';
import { findForms } from './forms.js';
import type { NeutralForm } from './forms.js';

/** How often such a mix is right, by reading; ways of writing that have no space need less grammar to judge. */
const CONFIDENCE = { joined: 0.85, open: 0.7 } as const;
/** Fewest uses of each way of writing, … */
const FEWEST_USES = 2;
/** … and fewest pages that hold any of them. */
const FEWEST_PAGES = 2;
/** Two keys that differ in no more letters at the end are taken for inflections of one compound. */
const LONGEST_ENDING = 2;
const SHORTEST_STEM = 5;

/** One compound with its inflections: the forms by their shape. */
interface Family {
  readonly key: string;
  readonly sides: Map<string, NeutralForm[]>;
}

/** All questions about a corpus in a language without a grammar; the worthiest first. */
export function* askNeutral(corpus: Corpus): Work<Question[]> {
  const groups = findForms(corpus);
  yield;
  const questions = joinInflections(groups).flatMap((family) => questionOf(corpus, family) ?? []);
  return questions.sort((a, b) => b.worth - a.worth || compareCodeUnits(a.id, b.id));
}

function joinInflections(groups: ReadonlyMap<string, readonly NeutralForm[]>): Family[] {
  const families: Family[] = [];
  for (const [key, forms] of [...groups].sort(([a], [b]) => compareCodeUnits(a, b))) {
    const sides = new Map<string, NeutralForm[]>();
    for (const form of forms.filter(({ rows }) => rows.length >= FEWEST_USES)) {
      const name = `${form.shape}${form.parts}`;
      sides.set(name, [...(sides.get(name) ?? []), form]);
    }
    if (sides.size < 2) continue;
    const last = families[families.length - 1];
    if (
      last !== undefined &&
      isInflectionOf(last.key, key) &&
      [...sides.keys()].every((name) => last.sides.has(name))
    ) {
      for (const [name, more] of sides) last.sides.get(name)!.push(...more);
    } else families.push({ key, sides });
  }
  return families;
}

/** Keys come in order, so that a stem stands before its inflections. */
function isInflectionOf(stem: string, key: string): boolean {
  return stem.length >= SHORTEST_STEM && key.startsWith(stem) && key.length - stem.length <= LONGEST_ENDING;
}

function questionOf(corpus: Corpus, { sides }: Family): Question | undefined {
  const { stream, vocabulary } = corpus;
  const terms = [...sides.values()].map((forms) => {
    const usesOf = ({ rows, folds }: NeutralForm) => rows.map((row) => ({ row, length: folds.length }));
    const uses = forms.flatMap(usesOf);
    const texts = forms.map((form) => ({
      text: displayText(stream, vocabulary, usesOf(form)),
      count: form.rows.length,
    }));
    return { uses, open: forms[0]!.shape === 'open', term: makeTerm(texts, countDocuments(stream, uses)) };
  });
  terms.sort((a, b) => byUses(a.term, b.term));
  if (
    countDocuments(
      stream,
      terms.flatMap(({ uses }) => uses),
    ) < FEWEST_PAGES
  )
    return undefined;
  const names = terms.map(({ term }) => term);
  const confidence = terms.some(({ open }) => open) ? CONFIDENCE.open : CONFIDENCE.joined;
  const ways = names.map(({ text, uses, documents }) => `“${text}” ${times(uses)} on ${pages(documents)}`);
  return {
    id: questionId('variant', names),
    kind: 'variant',
    confidence,
    worth: confidence * names.slice(1).reduce((sum, { uses }) => sum + uses, 0),
    terms: names,
    reasons: [
      {
        kind: 'compound',
        text: `written ${ways.slice(0, -1).join(', ')} and ${ways[ways.length - 1]!}`,
        value: names[names.length - 1]!.uses,
      },
    ],
    places: terms.flatMap(({ uses }, index) => examplePlaces(stream, index, uses)),
  };
}
