// The companions of a term as a snapshot tells them: what goes with it, each with its figures and a sentence.
import { findCompanions } from '../mining/companions/companions.js';
import type {
  CoOccurring,
  CompanionRelation,
  Floor,
  RelatedCompanion,
  SegmentKind,
  Wholeness,
} from '../mining/companions/companions.js';
import { isRunningText } from '../mining/places.js';
import { ExampleFinder } from './examples.js';
import type { Example } from './examples.js';
import { languageOf, spellingsOf, unknownTerm } from './knownTerms.js';
import type { UnknownTerm } from './knownTerms.js';
import type { LanguageRelations } from './relations.js';
import type { Snapshot } from './snapshot.js';

export { COMPANION_RELATIONS, SEGMENT_KINDS } from '../mining/companions/companions.js';

/** A companion with a sentence in which it goes with the term. */
export type WithExample<T> = Omit<T, 'rows'> & { readonly example: Example | undefined };

/** What goes with one term. */
export interface TermCompanions {
  readonly kind: 'known';
  readonly term: string;
  /** BCP 47 primary subtag. */
  readonly language: string;
  /** Uses on their own, in every inflected form, and the documents that hold them. */
  readonly uses: number;
  readonly documents: number;
  readonly related: readonly WithExample<RelatedCompanion>[];
  /** What all of the `related` reach, however many are shown. */
  readonly floor: Floor;
  readonly segments: {
    readonly kind: SegmentKind;
    readonly all: number;
    readonly withTerm: number;
    readonly floor: Floor;
    readonly companions: readonly WithExample<CoOccurring>[];
  };
  readonly whole: Wholeness | undefined;
  readonly heldIn: readonly Wholeness[];
}

/** What is asked for. */
export interface CompanionWishes {
  readonly segment: SegmentKind;
  /** The relations that are wanted; all where missing. */
  readonly relations?: readonly CompanionRelation[];
  /** The most companions of each relation, and of the segments. */
  readonly most: number;
}

/** The companions of a term in the language that uses it most, or what names come near where nothing uses it. */
export function companionsOfTerm(
  snapshot: Snapshot,
  term: string,
  { segment, relations, most }: CompanionWishes,
): TermCompanions | UnknownTerm {
  const forms = spellingsOf(snapshot, term);
  const language = languageOf(snapshot, forms);
  if (language === undefined) return unknownTerm(snapshot, term);
  const found = findCompanions(language.corpus, forms, segment);
  const examples = new ExampleFinder(snapshot);
  const shown = <T extends { readonly rows: readonly number[] }>(companion: T): WithExample<T> => {
    const { rows, ...rest } = companion;
    return { ...rest, example: exampleAt(language, examples, term, rows, found.uses) };
  };
  const counts = new Map<CompanionRelation, number>();
  const related = found.related.filter(({ relation }) => {
    if (relations?.includes(relation) === false) return false;
    counts.set(relation, (counts.get(relation) ?? 0) + 1);
    return counts.get(relation)! <= most;
  });
  return {
    ...{ kind: 'known', term, language: language.language, uses: found.uses.length, documents: found.documents },
    ...{ related: related.map(shown), floor: found.floor },
    segments: {
      ...{ kind: segment, all: found.segments.all, withTerm: found.segments.withTerm, floor: found.segmentFloor },
      companions: found.segments.companions.slice(0, most).map(shown),
    },
    ...{ whole: found.whole, heldIn: found.heldIn },
  };
}

/** Relations whose companion stands behind the term: “___ expires”; all others stand before it: “rotate ___”. */
export function isBehind(relation: CompanionRelation): boolean {
  return relation === 'modifies' || relation === 'subject-of' || relation === 'has-object';
}

/** The sentence of the first of some uses that stands in running text. */
function exampleAt(
  { corpus }: LanguageRelations,
  examples: ExampleFinder,
  term: string,
  rows: readonly number[],
  uses: readonly { readonly row: number; readonly length: number }[],
): Example | undefined {
  const row = rows.find((each) => isRunningText(corpus.stream, each)) ?? rows[0];
  if (row === undefined) return undefined;
  const length = uses[indexOfRow(uses, row)]?.length ?? 1;
  const document = corpus.stream.documentOf(row);
  const { uri, facts } = corpus.documents[document]!;
  const first = row - corpus.stream.documentFirst[document]!;
  return examples.at(term, { uri, span: { start: facts.start[first]!, end: facts.end[first + length - 1]! } });
}

/** Where a row stands in a list that rises by rows. */
function indexOfRow(uses: readonly { readonly row: number }[], row: number): number {
  let low = 0;
  let high = uses.length - 1;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if (uses[middle]!.row < row) low = middle + 1;
    else high = middle;
  }
  return low;
}
