// Which real decisions are asked about, at what place; and which terms that are kept apart are asked about as one.
import type { Question } from '../../server/src/mining/question.js';
import type { Asked } from './asked.js';
import type { Loss, Stage } from './funnel.js';
import { PAIR_KINDS } from './gold.js';
import type { GoldNegative, GoldPair, GoldSet, PairKind } from './gold.js';
import { placeAsked } from './match.js';
import type { Hyphens } from './match.js';

/** How a pair fared. Places count from 1; 0 is not asked. */
export interface PairFate extends GoldPair {
  /** Among the questions of the default kinds. */
  readonly place: number;
  /** Among those and the look-alikes. */
  readonly placeWithLookAlikes: number;
  /** The question that asks about it, where there is one. */
  readonly question?: string;
  /** Where it was lost, for a pair that the default kinds do not ask about. */
  readonly stage?: Stage;
  readonly detail?: string;
}

/** A pair that must not be asked about and is. */
export interface NegativeAsked extends GoldNegative {
  readonly place: number;
  readonly placeWithLookAlikes: number;
  readonly question: string;
}

/** Looks up every positive pair of a set. `lossOf` is asked for those that the default kinds miss. */
export function fatesOf(set: GoldSet, asked: Asked, lossOf: (pair: GoldPair) => Loss): PairFate[] {
  return set.positives.map((pair) => {
    const places = placesOf(asked, pair.a, pair.b, hyphensOf(pair.kind));
    return { ...pair, ...places, ...(places.place === 0 && lossOf(pair)) };
  });
}

/** The negative pairs of a set that are asked about. */
export function negativesAsked(set: GoldSet, asked: Asked): NegativeAsked[] {
  return set.negatives.flatMap((pair) => {
    const { question, ...places } = placesOf(asked, pair.a, pair.b, 'open');
    return question === undefined ? [] : [{ a: pair.a, b: pair.b, basis: pair.basis, ...places, question }];
  });
}

/** Hyphens matter only in pairs that are about them. */
export function hyphensOf(kind: PairKind): Hyphens {
  return kind === 'spelling' || kind === 'hyphenation' ? 'kept' : 'open';
}

function placesOf(
  { byDefault, withLookAlikes }: Asked,
  a: string,
  b: string,
  hyphens: Hyphens,
): { place: number; placeWithLookAlikes: number; question?: string } {
  const place = placeAsked(byDefault, a, b, hyphens);
  const placeWithLookAlikes = placeAsked(withLookAlikes, a, b, hyphens);
  const question: Question | undefined = byDefault[place - 1] ?? withLookAlikes[placeWithLookAlikes - 1];
  return { place, placeWithLookAlikes, ...(question && { question: question.id }) };
}

/** The cuts at which recall is reported: the first so many questions of a set, and all. */
export const CUTS = [50, 100, 200, Number.POSITIVE_INFINITY] as const;

/** Recall of one kind: pairs in all and those found within each of {@link CUTS}. */
export interface RecallRow {
  readonly kind: PairKind | 'all';
  readonly pairs: number;
  readonly found: readonly number[];
  readonly foundWithLookAlikes: readonly number[];
}

/** Recall by kind, empty kinds left out, and of all kinds together. */
export function recallRows(fates: readonly PairFate[]): RecallRow[] {
  const rows = PAIR_KINDS.map((kind) =>
    recallRow(
      kind,
      fates.filter((fate) => fate.kind === kind),
    ),
  );
  return [...rows.filter(({ pairs }) => pairs > 0), recallRow('all', fates)];
}

/** Recall of a list of pairs. */
export function recallRow(kind: RecallRow['kind'], fates: readonly PairFate[]): RecallRow {
  const within = (place: (fate: PairFate) => number): number[] =>
    CUTS.map((cut) => fates.filter((fate) => place(fate) > 0 && place(fate) <= cut).length);
  return {
    kind,
    pairs: fates.length,
    found: within((fate) => fate.place),
    foundWithLookAlikes: within((fate) => fate.placeWithLookAlikes),
  };
}
