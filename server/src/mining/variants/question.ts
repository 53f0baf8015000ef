// A family of ways of writing as a question: its terms, the reasons in plain words, its worth.
import type { Corpus } from '../../corpus/corpus.js';
import { countDocuments, examplePlacesOf } from '../places.js';
import { questionId } from '../question.js';
import type { Question, QuestionTerm, Reason } from '../question.js';
import { byUses, displayText, makeTerm, pages, times } from '../wording.js';
import type { Form } from './candidates.js';
import type { Family, Side } from './families.js';
import type { Lane, Mix } from './judge.js';
import type { Slot } from './slots.js';
import type { SlottedUse } from './styles.js';

/** How often a mix was right when read, by what the ways differ in. */
const CONFIDENCE: Readonly<Record<Lane, number>> = {
  spelling: 0.97,
  joining: 0.93,
  hyphen: 0.9,
  space: 0.9,
  name: 0.75,
  kind: 0.45,
};

/** The least number of uses in which two ways could be exchanged. */
const LEAST_EXCHANGEABLE = 2;

/**
 * Two slips of the pen are found in any larger set of documents: so few places of a way with less uses than this are asked
 * about only where someone wants to see more. A plain spelling is excused by no position.
 */
const SLIPS = { words: 30_000, exchangeable: 2, uses: 5, confidence: 0.45 } as const;

interface SideTerm {
  readonly term: QuestionTerm;
  readonly side: Side;
  readonly uses: readonly SlottedUse[];
}

/** The question that a family asks, or undefined where there is too little of it to ask about. */
export function makeQuestion(corpus: Corpus, family: Family): Question | undefined {
  const { mix } = family;
  if (mix.exchangeable < LEAST_EXCHANGEABLE) return undefined;
  const sides = sideTerms(corpus, family);
  if (sides.some((side) => side.term.documents < 2 && mix.exchangeable < leastOnOnePage(mix.lane, side)))
    return undefined;
  const slot = commonSlot(sides);
  const terms = sides.map(({ term }) => term);
  const confidence = areSlips(corpus, mix, terms) ? SLIPS.confidence : confidenceOf(mix);
  const outside = terms.slice(1).reduce((sum, term) => sum + term.uses, 0);
  return {
    id: questionId('variant', terms),
    kind: 'variant',
    confidence,
    worth: confidence * Math.min(outside, mix.exchangeable),
    terms,
    reasons: reasonsOf(corpus, mix, sides, slot),
    places: examplePlacesOf(
      corpus.stream,
      sides.map(({ uses }) => inSlot(uses, slot)),
    ),
  };
}

/**
 * A way of writing that one page alone has may be that page's own: it takes more of it, save for a plain spelling, and still more
 * of a hyphen that stands before nouns only.
 */
function leastOnOnePage(lane: Lane, { side }: SideTerm): number {
  if (lane === 'spelling') return 2;
  const isBeforeNouns = slotCount(side, 'noun') + slotCount(side, 'predicate') === 0;
  return lane === 'hyphen' && side.name === 'hyphened' && isBeforeNouns ? 6 : 3;
}

function areSlips(corpus: Corpus, { lane, exchangeable }: Mix, terms: readonly QuestionTerm[]): boolean {
  const isRare = exchangeable <= SLIPS.exchangeable && Math.min(...terms.map(({ uses }) => uses)) < SLIPS.uses;
  return isRare && lane !== 'spelling' && corpus.stream.length > SLIPS.words;
}

function confidenceOf({ lane, exchangeable }: Mix): number {
  const base = CONFIDENCE[lane];
  return exchangeable >= 3 ? base : base - 0.05;
}

function sideTerms(corpus: Corpus, family: Family): SideTerm[] {
  const lead = commonInflection(family);
  const sides = family.sides.map((side) => {
    const uses = side.styles.flatMap((style) => style.uses).sort((a, b) => a.row - b.row);
    const forms = side.styles.flatMap((style) => style.forms).filter((form) => form.rows.length > 0);
    const texts = forms.map((form) => ({ text: textOf(corpus, form), count: form.rows.length }));
    const leading = forms.findIndex((form) => inflectionOf(form) === lead);
    const documents = countDocuments(corpus.stream, uses);
    return { side, uses, term: makeTerm(texts, documents, texts[leading]?.text) };
  });
  return sides.sort((a, b) => byUses(a.term, b.term));
}

/** The inflection that leads in all sides, so that the terms' texts compare: the one whose least-used form is used most. */
function commonInflection(family: Family): string | undefined {
  const counts = family.sides.map((side) => {
    const bySide = new Map<string, number>();
    for (const form of side.styles.flatMap((style) => style.forms)) {
      bySide.set(inflectionOf(form), (bySide.get(inflectionOf(form)) ?? 0) + form.rows.length);
    }
    return bySide;
  });
  let best: string | undefined;
  let most = 0;
  for (const inflection of [...counts[0]!.keys()].sort()) {
    const least = Math.min(...counts.map((side) => side.get(inflection) ?? 0));
    if (least > most) [best, most] = [inflection, least];
  }
  return best;
}

function inflectionOf(form: Form): string {
  return form.key + (form.plural ? '+' : '');
}

function textOf(corpus: Corpus, form: Form): string {
  const uses = form.rows.map((row) => ({ row, length: form.folds.length }));
  return displayText(corpus.stream, corpus.vocabulary, uses);
}

function reasonsOf(corpus: Corpus, mix: Mix, sides: readonly SideTerm[], slot: Slot | undefined): Reason[] {
  const ways = sides.map(
    ({ term, side }) => `${wayOf(side, term.text)} ${times(term.uses)} on ${pages(term.documents)}`,
  );
  const reasons: Reason[] = [];
  // Where the ways stand alike is the point of a question about joining; the totals count other positions too.
  if (slot !== undefined && mix.lane !== 'spelling') {
    const counts = sides.map(({ term, side }) => `“${term.text}” ${times(slotCount(side, slot))}`);
    reasons.push({
      kind: 'same-slot',
      text: `all stand ${SLOT_WORDS[slot]}: ${listed(counts)}`.replace('all', sides.length === 2 ? 'both' : 'all'),
      value: Math.min(...sides.map(({ side }) => slotCount(side, slot))),
    });
  }
  reasons.push({ kind: kindOf(mix.lane), text: `written ${listed(ways)}`, value: mix.exchangeable });
  const mixed = pagesWithAll(corpus, sides);
  if (mixed > 0)
    reasons.push({
      kind: 'mixed-page',
      text: `${pages(mixed)} mix them`.replace('1 page mix', '1 page mixes'),
      value: mixed,
    });
  return reasons;
}

const SLOT_WORDS: Readonly<Record<Slot, string>> = {
  attributive: 'right before another noun',
  predicate: 'after “is”, “are” or “as”',
  noun: 'where a noun stands (after “the”, “of” and the like)',
  verb: 'where a verb stands (after “to”, “can” and the like)',
  unclear: 'in like places',
  lone: 'alone',
};

function kindOf(lane: Lane): string {
  return lane === 'spelling' ? lane : lane === 'name' || lane === 'kind' ? 'name' : 'compound';
}

function wayOf({ name, styles }: Side, text: string): string {
  if (name === 'closed') return `as one word (“${text}”)`;
  if (name === 'hyphened') return `with a hyphen (“${text}”)`;
  if (name !== 'open') return `as “${text}”`;
  return `as ${['two', 'three', 'four'][styles[0]!.forms[0]!.folds.length - 2]!} words (“${text}”)`;
}

function listed(items: readonly string[]): string {
  return items.length < 2 ? items.join('') : `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]!}`;
}

function slotCount(side: Side, slot: Slot): number {
  return side.styles.reduce((sum, style) => sum + style.slots[slot], 0);
}

/** The uses that show the mix best: those in the slot that all sides share. */
function inSlot(uses: readonly SlottedUse[], slot: Slot | undefined): readonly SlottedUse[] {
  return slot === undefined ? uses : uses.filter((use) => use.slot === slot);
}

/** The slot that the sides share most, where they share one. */
function commonSlot(sides: readonly SideTerm[]): Slot | undefined {
  let best: Slot | undefined;
  let most = 0;
  for (const slot of ['noun', 'attributive', 'verb', 'predicate'] as const) {
    const least = Math.min(...sides.map(({ side }) => slotCount(side, slot)));
    if (least > most) [best, most] = [slot, least];
  }
  return best;
}

function pagesWithAll(corpus: Corpus, sides: readonly SideTerm[]): number {
  const sets = sides.map(({ uses }) => new Set(uses.map((use) => corpus.stream.documentOf(use.row))));
  return [...sets[0]!].filter((document) => sets.every((set) => set.has(document))).length;
}
