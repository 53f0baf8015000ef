// The companions that two terms share, and those that one of them has alone.
import { compareCodeUnits } from '../../base/order.js';
import type { Corpus } from '../../corpus/corpus.js';
import { companionsByRelation } from '../companions/byRelation.js';
import type { RelatedCompanion } from '../companions/byRelation.js';
import { NO_ACCIDENT } from '../companions/companion.js';
import type { CompanionRelation } from '../companions/grammar.js';
import type { ComparedTerm } from './comparison.js';

/** A companion with its uses beside each of the two terms. */
export interface ComparedCompanion {
  readonly relation: CompanionRelation;
  readonly word: string;
  readonly counts: readonly [number, number];
  /** The log-likelihood ratios with each of the two, added up. */
  readonly strength: number;
  /** Rows of each term's uses with it. */
  readonly rows: readonly [readonly number[], readonly number[]];
}

/** What goes with both, and what goes with one alone; strongest first. */
export interface SharedCompanions {
  readonly shared: readonly ComparedCompanion[];
  readonly alone: readonly [readonly ComparedCompanion[], readonly ComparedCompanion[]];
}

/** The sum of two ratios above which both are no accident: χ² with two degrees of freedom at p = .001. */
const NO_ACCIDENT_OF_TWO = 13.82;
/** Fewest uses of a companion with either term that is told. */
const FEWEST_USES = 2;
/** If the other term had a companion as often, it would be expected at least this many times: its absence tells something. */
const EXPECTED = 3;

/** Compares the companions of two terms by grammatical relation. */
export function shareCompanions(corpus: Corpus, terms: readonly [ComparedTerm, ComparedTerm]): SharedCompanions {
  const found = new Map<string, [RelatedCompanion?, RelatedCompanion?]>();
  terms.forEach(({ uses }, side) => {
    for (const companion of companionsByRelation(corpus, uses)) {
      const key = `${companion.relation} ${companion.word}`;
      const both = found.get(key) ?? [];
      both[side] = companion;
      found.set(key, both);
    }
  });
  const shared: ComparedCompanion[] = [];
  const alone: [ComparedCompanion[], ComparedCompanion[]] = [[], []];
  for (const [a, b] of found.values()) {
    const either = (a ?? b)!;
    const strength = (a?.strength ?? 0) + (b?.strength ?? 0);
    const counts = [a?.count ?? 0, b?.count ?? 0] as const;
    const isShared = counts[0] > 0 && counts[1] > 0;
    if (strength < (isShared ? NO_ACCIDENT_OF_TWO : NO_ACCIDENT) || Math.max(...counts) < FEWEST_USES) continue;
    const compared: ComparedCompanion = {
      ...{ relation: either.relation, word: either.word, counts, strength },
      rows: [a?.rows ?? [], b?.rows ?? []],
    };
    if (isShared) shared.push(compared);
    else {
      const has = counts[0] > 0 ? 0 : 1;
      const expected = (counts[has] * terms[1 - has]!.uses.length) / terms[has].uses.length;
      if (expected >= EXPECTED) alone[has].push(compared);
    }
  }
  for (const list of [shared, ...alone]) list.sort(byStrength);
  return { shared, alone };
}

function byStrength(a: ComparedCompanion, b: ComparedCompanion): number {
  return b.strength - a.strength || compareCodeUnits(a.word, b.word) || compareCodeUnits(a.relation, b.relation);
}
