// A companion: a word that goes with a term more often than chance would have it, with the figures that say so.
import { compareCodeUnits } from '../../base/order.js';
import type { Cells } from '../../corpus/statistics/association.js';
import { logLikelihoodRatio } from '../../corpus/statistics/association.js';

/** What companions have in common, however they were found. */
export interface CompanionFigures {
  /** The word in its dictionary form, with its particle or preposition: “set up”, “store in”. */
  readonly word: string;
  /** How often it goes with the term: relations, or segments that hold both. */
  readonly count: number;
  /** Documents in which it does. */
  readonly documents: number;
  /** Log-likelihood ratio G² against independence (Dunning 1993): 10.83 is p = .001 with one degree of freedom. */
  readonly strength: number;
  /** Rows of the stream at which the term stands with it, ascending; some of them where there are many. */
  readonly rows: readonly number[];
}

/** What a companion must reach to be told. */
export interface Floor {
  readonly count: number;
  readonly documents: number;
}

/** From the floor that the measure needs to be trusted, down to what a small documentation set can offer. */
const FLOORS: readonly Floor[] = [
  { count: 5, documents: 3 },
  { count: 3, documents: 2 },
  { count: 2, documents: 1 },
];
/** A floor under which fewer companions than this are left gives way to the next. */
const FEWEST = 3;
/** G² above which a pair is no accident: χ² with one degree of freedom at p = .001. */
export const NO_ACCIDENT = 10.83;

/** Companions by strength, ties by code units, with the floor that they all reach. */
export function ranked<T extends CompanionFigures>(all: readonly T[]): { floor: Floor; companions: T[] } {
  const told = all.filter(({ strength }) => strength >= NO_ACCIDENT);
  const reaching = (floor: Floor): T[] =>
    told.filter(({ count, documents }) => count >= floor.count && documents >= floor.documents);
  const floor = FLOORS.find((each) => reaching(each).length >= FEWEST) ?? FLOORS[FLOORS.length - 1]!;
  return { floor, companions: reaching(floor).sort(byStrength) };
}

/** Strongest first, ties by code units. */
export function byStrength(a: CompanionFigures, b: CompanionFigures): number {
  return b.strength - a.strength || compareCodeUnits(a.word, b.word);
}

/** G² where both go together more often than chance, else 0: words that avoid one another are no companions. */
export function attraction(cells: Cells): number {
  const { both, onlyFirst, onlySecond, neither } = cells;
  const attracts = both * neither > onlyFirst * onlySecond;
  return attracts ? logLikelihoodRatio(cells) : 0;
}
