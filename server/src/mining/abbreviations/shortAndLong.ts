// A short form and its one expansion, both in free use: asked where the long form goes on after it was explained.
import type { Corpus } from '../../corpus/corpus.js';
import { countDocuments, examplePlacesOf } from '../places.js';
import type { Use } from '../places.js';
import { questionId } from '../question.js';
import type { Question, QuestionTerm, Reason } from '../question.js';
import { byUses, displayText, makeTerm, pages, times } from '../wording.js';
import type { Explained, Expansion } from './explained.js';
import { framesOf, sharedFrames } from './frames.js';
import { freeUses, isCapitalised } from './freeUses.js';
import type { FreeUse } from './freeUses.js';
import { formsOfLong, formsOfShort } from './longForms.js';
import type { FormUses } from './longForms.js';

/**
 * The least that is asked about. *Alternating*: so many pages go on with the long form so often, and of the pages with the
 * short form such a share is mixed, that is goes on or leaves it unexplained; *widely* where so many pages spell it out.
 * *Unexplained*: such a share of pages is mixed while so many, and so many others, spell it out; *plainly* where it is more of both. *Falling back*: such
 * a share of the pages goes on, so often, with so many short forms beside. *Seldom*: so few pages are mixed, and so few spell it out.
 */
const LEAST = {
  short: 2,
  widely: 6,
  alternating: { pages: 2, uses: 6, share: 0.35 },
  unexplained: { pages: 3, share: 0.35, free: 3, freePages: 3, otherPages: 2 },
  plainly: { share: 0.55, freePages: 8 },
  fallingBack: { share: 0.25, uses: 3, beside: 2 },
  seldom: { pages: 2, free: 2, freePages: 2 },
} as const;

/** On so many pages the documents explain a short form where it has no other meaning for their readers. */
const WELL_KNOWN = 3;

/** How sure it is that the two forms are mixed and not explained where they need be. */
const CONFIDENCE = {
  widely: 0.92,
  plainly: 0.8,
  alternating: 0.75,
  unexplained: 0.6,
  fallingBack: 0.5,
  seldom: 0.5,
} as const;

/** What the least mixes are worth: maintainers do decide them, but after all else. */
const LAST = 0.1;

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
  const mix = mixOf(corpus, shortUses, written, free, expansion);
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

/**
 * How sure a mix is, and what an answer would settle; undefined where the forms are right as they are. A short form beside its
 * long form is seldom a mistake: the root of the uses is what it is worth, and one page where few pages mix them.
 */
function mixOf(
  corpus: Corpus,
  short: readonly Use[],
  long: readonly Use[],
  { all, onItsPages, goingOn }: FreeUse,
  expansion: Expansion,
): { readonly confidence: number; readonly settles: number } | undefined {
  const pageOf = ({ row }: Use): number => corpus.stream.documentOf(row);
  const shortPages = new Set(short.map(pageOf));
  const longPages = new Set(long.map(pageOf));
  const mixed = [...shortPages].filter((page) => goingOn.has(page) || !longPages.has(page)).length;
  const share = mixed / shortPages.size;
  const uses = onItsPages.filter((use) => goingOn.has(pageOf(use))).length;
  const freePages = new Set(all.map(pageOf)).size;
  const settles = Math.sqrt(Math.min(all.length, short.length));
  const { alternating, unexplained, plainly, fallingBack, seldom } = LEAST;
  if (goingOn.size >= alternating.pages && uses >= alternating.uses && share >= alternating.share)
    return { confidence: freePages >= LEAST.widely ? CONFIDENCE.widely : CONFIDENCE.alternating, settles };
  const areLeft = mixed >= unexplained.pages && share >= unexplained.share;
  const otherPages = new Set(all.map(pageOf).filter((page) => !shortPages.has(page))).size;
  const isSpelledOut =
    all.length >= unexplained.free && freePages >= unexplained.freePages && otherPages >= unexplained.otherPages;
  const isOne = goingOn.size > 0 || areOne(corpus, short, all, expansion);
  if (areLeft && isSpelledOut && isOne)
    return share >= plainly.share && freePages >= plainly.freePages
      ? { confidence: CONFIDENCE.plainly, settles }
      : { confidence: CONFIDENCE.unexplained, settles: 1 };
  const beside = short.filter((use) => goingOn.has(pageOf(use))).length;
  const isFallingBack = uses >= fallingBack.uses && beside >= fallingBack.beside;
  if (isFallingBack && goingOn.size >= fallingBack.share * shortPages.size)
    return { confidence: CONFIDENCE.fallingBack, settles: 1 };
  const isSeldom = mixed >= seldom.pages && all.length >= seldom.free && freePages >= seldom.freePages;
  return isSeldom && isOne ? { confidence: CONFIDENCE.seldom, settles: LAST } : undefined;
}

/**
 * Where no page has both, the long form may mean another thing: not so where many pages explain one by the other, where the long
 * form is a name in capitals, or where both stand beside a like word.
 */
function areOne(corpus: Corpus, short: readonly Use[], long: readonly Use[], { definitions }: Expansion): boolean {
  const explaining = new Set(definitions.map(({ longRow }) => corpus.stream.documentOf(longRow)));
  if (explaining.size >= WELL_KNOWN || long.every((use) => isCapitalised(corpus, use))) return true;
  return sharedFrames(corpus, framesOf(corpus, short, true), framesOf(corpus, long, true)).kinds.length > 0;
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
  if (free.goingOn.size > 0) {
    const mixed = free.goingOn.size;
    reasons.push({
      kind: 'mixed-page',
      text: `${pages(mixed)} ${mixed === 1 ? 'writes' : 'write'} “${short}” and then “${long}” again`,
      value: free.onItsPages.filter((use) => free.goingOn.has(stream.documentOf(use.row))).length,
    });
  }
  return reasons;
}
