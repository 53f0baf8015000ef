// How sure the evidence makes it that two terms name one concept.
import type { Evidence } from './evidence.js';
import type { SideBySide } from './coordination.js';
import type { Likeness } from './neighbours.js';

/** Everything that is known of a pair when it is judged. */
export interface Known {
  readonly evidence: readonly Evidence[];
  readonly likeness: Likeness;
  /** The similarity that two names of one thing have here, at the uses of the rarer term. */
  readonly self: number;
  readonly sideBySide: SideBySide;
  /** Lists, tables and pages in which each has an entry of its own. */
  readonly siblings: number;
  /** Whether each term has several words. */
  readonly multiword: boolean;
  /** How many of the two are proper names. */
  readonly properNames: number;
  /** Uses of the rarer term. */
  readonly fewest: number;
}

const WEIGHT = {
  list: { multiword: 2.6, single: 1.6 },
  dictionary: { multiword: 2, single: 1.2 },
  component: 2.2,
  definition: 2.4,
  'link-target': 1.4,
  neighbours: 0,
} as const;

/** The score of a pair, in logits around the threshold: 0 is as likely right as wrong. */
export function scoreOf(known: Known): number {
  const { likeness, sideBySide, fewest } = known;
  let score = -2.5;
  for (const { kind, strength } of known.evidence) {
    const weight =
      kind === 'list' || kind === 'dictionary' ? WEIGHT[kind][known.multiword ? 'multiword' : 'single'] : WEIGHT[kind];
    score += weight * strength;
  }
  score += 1.8 * Math.min(1, likeness.similarity / known.self);
  score -= 0.4 * Math.log(Math.sqrt(likeness.rankOfA * likeness.rankOfB));
  score -= 8 * Math.sqrt((sideBySide.coordinated + sideBySide.contrasted) / fewest);
  if (sideBySide.coordinated + sideBySide.contrasted >= 3) score -= 1;
  score -= 1.2 * Math.log1p(known.siblings);
  score -= known.properNames === 2 ? 2.5 : known.properNames;
  if (fewest < 12) score -= 0.3;
  return score;
}

/** The confidence, from 0 to 1, that a score stands for. */
export function confidenceOf(score: number): number {
  return 1 / (1 + Math.exp(-score));
}
