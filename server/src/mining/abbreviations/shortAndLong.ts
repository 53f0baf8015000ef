// A short form and its one expansion, both in free use: asked where the long form goes on after it was explained.
import type { Corpus } from '../../corpus/corpus.js';
import { Zone } from '../../prose/zones.js';
import { countDocuments, examplePlacesOf } from '../places.js';
import type { Use } from '../places.js';
import { questionId } from '../question.js';
import type { Question, QuestionTerm, Reason } from '../question.js';
import { byUses, displayText, makeTerm, pages, times } from '../wording.js';
import type { Explained, Expansion } from './explained.js';
import { framesOf, sharedFrames } from './frames.js';
import { formsOfLong, formsOfShort } from './longForms.js';
import type { FormUses } from './longForms.js';

/**
 * The least that is asked about: uses of the short form, and free uses of the long one or the
 * pages that have them. A mix is plain where so many of the
 * pages with the short form, and such a share of them, either never explain it or go on with the long form; or where half of
 * them go on with the long form so often, and in such a share of what they say; else slips on a few pages, which are
 * worth no more than these pages, are left.
 */
const LEAST = {
  short: 2,
  free: 3,
  freePages: 2,
  mixed: { pages: 3, share: 0.55 },
  goingOn: { uses: 6, share: 0.3 },
  slips: { uses: 3, pages: 2 },
} as const;

/** How sure it is that the two forms are mixed and not explained where they need be. */
const CONFIDENCE = { onItsPages: 0.92, onOtherPages: 0.8, onFewPages: 0.75, slips: 0.5 } as const;

/** How the long form is used beside the short one. */
export interface FreeUse {
  /** Free uses on pages that use the short form, and the number of these pages. */
  readonly onItsPages: readonly Use[];
  /** Free uses on any page. */
  readonly all: readonly Use[];
}

/** The question about a short form and its expansion, or undefined where the documents explain it and go on with it. */
export function askExplained(
  corpus: Corpus,
  { short, expansions }: Explained,
  others: readonly Explained[],
): Question | undefined {
  const expansion = expansions[0]!;
  const shortForms = formsOfShort(corpus, short);
  const shortUses = usesOf(shortForms);
  if (shortUses.length < LEAST.short) return undefined;
  const longForms = formsOfLong(corpus, expansion.words);
  const written = usesOf(longForms);
  const longUses = withoutLonger(corpus, written, expansion, others);
  const free = freeUses(corpus, longUses, shortUses, expansion);
  const mix = mixOf(corpus, shortUses, written, free);
  if (mix === undefined) return undefined;
  const kept = new Set(longUses.map((use) => use.row));
  const shortRows = new Set(expansion.definitions.map((definition) => definition.shortRow));
  const unexplained = shortUses.filter((use) => !shortRows.has(use.row));
  const sides = [
    { term: termOf(corpus, shortForms, short), uses: unexplained.length > 0 ? unexplained : shortUses },
    {
      term: termOf(
        corpus,
        longForms.map((form) => ({ ...form, uses: form.uses.filter((use) => kept.has(use.row)) })),
        expansion.words.join(' '),
      ),
      uses: free.all,
    },
  ].sort((a, b) => byUses(a.term, b.term));
  const { confidence } = mix;
  return {
    id: questionId(
      'abbreviation',
      sides.map(({ term }) => term),
    ),
    kind: 'abbreviation',
    confidence,
    worth: confidence * mix.settles,
    terms: sides.map(({ term }) => term),
    reasons: reasonsOf(corpus, short, expansion, free, longUses),
    places: examplePlacesOf(
      corpus.stream,
      sides.map(({ uses }) => uses),
    ),
  };
}

/** How sure a mix is, and the uses that an answer would settle; undefined where the forms are right as they are. */
function mixOf(
  corpus: Corpus,
  short: readonly Use[],
  long: readonly Use[],
  free: FreeUse,
): { readonly confidence: number; readonly settles: number } | undefined {
  const { stream } = corpus;
  const pageOf = ({ row }: Use): number => stream.documentOf(row);
  const shortPages = new Set(short.map(pageOf));
  const longPages = new Set(long.map(pageOf));
  const goingOn = new Set(free.onItsPages.map(pageOf));
  const mixed = [...shortPages].filter((page) => goingOn.has(page) || !longPages.has(page)).length;
  const slips = free.onItsPages.length;
  const isPlain = mixed >= LEAST.mixed.pages && mixed >= LEAST.mixed.share * shortPages.size;
  const freePages = new Set(free.all.map(pageOf)).size;
  const isFree = free.all.length >= LEAST.free || freePages >= LEAST.freePages;
  if (isPlain && isFree && (goingOn.size > 0 || areAlike(corpus, short, free.all))) {
    const confidence = goingOn.size > 1 ? CONFIDENCE.onItsPages : CONFIDENCE.onOtherPages;
    return { confidence, settles: Math.min(free.all.length, short.length) };
  }
  const beside = short.filter((use) => goingOn.has(pageOf(use))).length;
  const isFallingBack = slips >= LEAST.goingOn.uses && slips >= LEAST.goingOn.share * (slips + beside);
  if (isFallingBack && goingOn.size * 2 >= shortPages.size)
    return { confidence: CONFIDENCE.onFewPages, settles: Math.min(slips, beside) };
  const areSeveral = slips >= LEAST.slips.uses && goingOn.size >= LEAST.slips.pages;
  return areSeveral ? { confidence: CONFIDENCE.slips, settles: goingOn.size } : undefined;
}

/** True where both stand beside a like word: where no page has both, the long form may mean another thing. */
function areAlike(corpus: Corpus, short: readonly Use[], long: readonly Use[]): boolean {
  return sharedFrames(corpus, framesOf(corpus, short, true), framesOf(corpus, long, true)).kinds.length > 0;
}

/** Uses that are no explanation, nor right after a parenthesis, not the first on a page with the short form, in no heading. */
export function freeUses(corpus: Corpus, long: readonly Use[], short: readonly Use[], expansion: Expansion): FreeUse {
  const { stream } = corpus;
  const explained = new Set(expansion.definitions.map((definition) => definition.longRow));
  const shortPages = new Set(short.map((use) => stream.documentOf(use.row)));
  const opening = corpus.vocabulary.find('(');
  const introduced = new Set<number>();
  const onItsPages: Use[] = [];
  const all: Use[] = [];
  for (const use of long) {
    if ((stream.zones[use.row]! & (Zone.heading | Zone.frontMatter)) !== 0) continue;
    const page = stream.documentOf(use.row);
    const first = shortPages.has(page) && !introduced.has(page);
    introduced.add(page);
    if (first || explained.has(use.row) || stream.spelling[use.row - 1] === opening) continue;
    all.push(use);
    if (shortPages.has(page)) onItsPages.push(use);
  }
  return { onItsPages, all };
}

/** Uses that are not part of a longer long form that has a short form of its own (custom resource definition). */
function withoutLonger(
  corpus: Corpus,
  uses: readonly Use[],
  expansion: Expansion,
  others: readonly Explained[],
): Use[] {
  const text = ` ${expansion.words.join(' ')} `;
  const inside = new Set<number>();
  for (const other of others) {
    for (const { words } of other.expansions) {
      if (words.length <= expansion.words.length || !` ${words.join(' ')} `.includes(text)) continue;
      for (const { row, length } of usesOf(formsOfLong(corpus, words))) {
        for (let i = 0; i < length; i++) inside.add(row + i);
      }
    }
  }
  return uses.filter((use) => !inside.has(use.row));
}

/** All uses of several forms, in document order. */
export function usesOf(forms: readonly FormUses[]): Use[] {
  return forms.flatMap((form) => form.uses).sort((a, b) => a.row - b.row);
}

/** A term over several forms, named by the form that reads as `lead` (capitals and hyphens apart) where there is one. */
export function termOf(corpus: Corpus, forms: readonly FormUses[], lead?: string): QuestionTerm {
  const texts = forms
    .filter((form) => form.uses.length > 0)
    .map((form) => ({ text: displayText(corpus.stream, corpus.vocabulary, form.uses), count: form.uses.length }));
  const documents = countDocuments(corpus.stream, usesOf(forms));
  const leading = texts.find(
    ({ text }) => text.toLowerCase().replace(/-/g, ' ') === lead?.toLowerCase().replace(/-/g, ' '),
  );
  return makeTerm(texts, documents, leading?.text);
}

function reasonsOf(
  corpus: Corpus,
  short: string,
  expansion: Expansion,
  free: FreeUse,
  longUses: readonly Use[],
): Reason[] {
  const { stream } = corpus;
  const long = displayText(stream, corpus.vocabulary, longUses);
  const explained = expansion.definitions.length;
  const reasons: Reason[] = [
    { kind: 'explained', text: `the documents explain “${short}” as “${long}” ${times(explained)}`, value: explained },
    {
      kind: 'free-use',
      text: `“${long}” is spelled out ${times(free.all.length)} on ${pages(countDocuments(stream, free.all))} where it is no explanation`,
      value: free.all.length,
    },
  ];
  if (free.onItsPages.length > 0) {
    const mixed = countDocuments(stream, free.onItsPages);
    reasons.push({
      kind: 'mixed-page',
      text: `${pages(mixed)} ${mixed === 1 ? 'writes' : 'write'} “${short}” and then “${long}” again`,
      value: free.onItsPages.length,
    });
  }
  return reasons;
}
