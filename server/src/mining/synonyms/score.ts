// How sure the evidence makes it that two terms name one concept, and whether it is of a kind that may be asked about unasked.
import type { SideBySide } from './coordination.js';
import type { Evidence, EvidenceKind } from './evidence.js';
import type { Likeness } from './neighbours.js';

/** How the words of two terms lie to one another. */
export type Shape = 'words' | 'multiword' | 'contained';

/** Everything that is known of a pair when it is judged. */
export interface Known {
  readonly evidence: readonly Evidence[];
  readonly likeness: Likeness;
  /** The similarity that two names of one thing have here, at the uses of the rarer term. */
  readonly self: number;
  readonly sideBySide: SideBySide;
  /** Lists, tables and pages in which each has an entry of its own, and headings alike but for them. */
  readonly siblings: number;
  /** At least one a single word; both of several words; or one term the other with a word more. */
  readonly shape: Shape;
  /** Whether they have a word in common. */
  readonly sharesWord: boolean;
  /** How many of the two are proper names. */
  readonly properNames: number;
  /** How many of the two differ from the other by a word of general English. */
  readonly general: number;
  /** Uses of the rarer term. */
  readonly fewest: number;
  /** Whether one of the two stands in one formula nearly always. */
  readonly formula: boolean;
}

/** Two unrelated terms, before any evidence. */
const BASE = -1.2;
/** What being set side by side costs, by the square root of its share of the rarer term's uses. */
const BESIDE = 8;
/** What each word of general English costs. */
const GENERAL = 0.8;
/** Uses below which chance plays along, and what that costs. */
const FEW = { uses: 4, cost: 0.5 };
/** From this strength up past edits are a habit that went one way. */
const HABIT = 0.5;
/** More places than this are those of a template, and say no more. */
const MOST_PLACES = 3;

/** Least share of the similarity that two names of one thing have, where a list or word of a renaming speaks alone. */
const LEAST_CONFIRMED = 0.5;
/** Fewest uses of the rarer term, where all lists that speak for it know the two as different things as well. */
const FEWEST_OF_DOUBTFUL = 10;

const LEXICAL: readonly EvidenceKind[] = ['list', 'dictionary', 'component'];

/** The score of a pair, in logits: 0 is as likely right as wrong. Weights fitted by reading; see the evaluation. */
export function scoreOf(known: Known): number {
  const { sideBySide, fewest } = known;
  let score = BASE + lexicalWeight(known) + statementWeight(known) + contextWeight(known);
  // A statement that one took the other's place sets them side by side itself.
  const told = known.evidence.find(({ kind }) => kind === 'renaming')?.value ?? 0;
  const beside = Math.max(0, sideBySide.coordinated + sideBySide.contrasted - told);
  score -= BESIDE * Math.sqrt(beside / fewest);
  if (beside >= 3) score -= 1;
  score -= 1.8 * Math.log1p(known.siblings);
  // Proper names are mostly names of different things, but for those of which one took the other's place.
  if (!isRenamed(known)) score -= known.properNames === 2 ? 2.5 : known.properNames;
  score -= GENERAL * known.general;
  if (fewest < FEW.uses) score -= FEW.cost;
  return score;
}

/** The most that a pair can score whose similarity is a share of `self`, whatever else is found. */
export function bestScoreOf(
  known: Pick<Known, 'evidence' | 'shape' | 'general' | 'sharesWord'>,
  share: number,
): number {
  const best = contextWeight({ likeness: { similarity: share, rankOfA: 1, rankOfB: 1 }, self: 1, shape: known.shape });
  return BASE + lexicalWeight(known) + statementWeight(known) + best - GENERAL * known.general;
}

/**
 * Whether a pair may be asked about by default. The documents say so outright in two places, or of a renaming that use
 * confirms; or a list agrees with them; or two terms of several words differ in words that a list calls one, which use
 * confirms. Single words of a list are as often sisters as twins.
 */
export function isGrounded(
  known: Pick<Known, 'evidence' | 'shape' | 'general' | 'likeness' | 'self' | 'fewest' | 'formula'>,
): boolean {
  const { evidence, shape, general, likeness, self, fewest } = known;
  if (strongest(evidence, ['past-edit']) >= HABIT) return true;
  const isConfirmed = likeness.similarity / self >= LEAST_CONFIRMED;
  // A name that was given up is free for another thing: use tells whether it still means the first.
  if (isRenamed(known) && isConfirmed) return true;
  // A choice between two words of general English is one of style; use in a formula confirms nothing.
  if (general === 2 || known.formula) return false;
  if (evidence.some(({ kind, strength }) => kind === 'definition' && strength >= (shape === 'multiword' ? 0.9 : 1)))
    return true;
  if (strongest(evidence, LEXICAL) === 0) return false;
  const isDoubtful = evidence.every(({ kind, value }) => !LEXICAL.includes(kind) || value < 1);
  if (isDoubtful && fewest < FEWEST_OF_DOUBTFUL) return false;
  if (shape === 'multiword') return isConfirmed;
  return evidence.some(
    ({ kind, value }) => isOfDocuments(kind) && ((kind !== 'near-sentence' && !isDoubtful) || value > 1),
  );
}

function isOfDocuments(kind: EvidenceKind): boolean {
  return ['definition', 'link-target', 'parallel-place', 'near-sentence', 'past-edit'].includes(kind);
}

/** List, dictionary and differing parts say the same of a pair: the strongest counts. */
function lexicalWeight({ evidence, shape }: Pick<Known, 'evidence' | 'shape'>): number {
  const strength = strongest(evidence, LEXICAL);
  if (strength === 0) return shape === 'contained' ? (strongest(evidence, ['containment']) > 0 ? -0.3 : -1.3) : 0;
  // A general dictionary calls the terms of a field by one name that the field tells apart (alarm, alert).
  if (shape === 'words') return -0.8 + 1.6 * strength - (strongest(evidence, ['list']) > 0 ? 0 : 0.3);
  return 0.3 + 1.8 * strength - (shape === 'contained' ? 1.3 : 0);
}

/** What the documents themselves say and do: statements, links to one place, passages that differ in the pair alone. */
function statementWeight({ evidence, sharesWord }: Pick<Known, 'evidence' | 'sharesWord'>): number {
  let weight = 0;
  // What says little by itself (a mere parenthesis, a sentence that may be a template) says more where a list agrees.
  const agrees = strongest(evidence, LEXICAL) > 0;
  for (const { kind, strength, value } of evidence) {
    const places = Math.min(MOST_PLACES, value);
    if (kind === 'definition') {
      weight += (strength >= 1 ? 2.7 : strength >= 0.8 ? 1.7 : agrees ? 0.7 : 0.4) + 0.3 * Math.min(4, value - 1);
    } else if (kind === 'renaming') weight += 3.2 + 0.3 * Math.min(4, value - 1);
    else if (kind === 'link-target') weight += 0.5 * Math.min(2, value);
    else if (kind === 'parallel-place') weight += 0.5 * Math.log1p(places);
    // Terms that share a word are siblings in a template (login form, password reset form).
    else if (kind === 'near-sentence' && (agrees || !sharesWord)) weight += (agrees ? 0.6 : 0.4) * Math.log1p(places);
    else if (kind === 'containment') weight += 2 * strength;
    // Editors also correct one thing to another: of single edits one pair in five is right, of habits nearly all.
    else if (kind === 'past-edit') weight += strength >= HABIT ? 2.6 * strength : agrees ? 0.3 : 0;
  }
  return weight;
}

function isRenamed({ evidence }: Pick<Known, 'evidence'>): boolean {
  return evidence.some(({ kind }) => kind === 'renaming');
}

/** Usage confirms or refuses: against the yardstick of one term's own halves, and by mutual rank. */
function contextWeight({ likeness, self, shape }: Pick<Known, 'likeness' | 'self' | 'shape'>): number {
  const share = Math.min(1, likeness.similarity / self);
  const rank = Math.log(Math.sqrt(likeness.rankOfA * likeness.rankOfB));
  // Terms of several words are rarer, and their contexts say less.
  return shape === 'words' ? 1.8 * (share - 0.7) - 0.35 * (rank - 1.1) : 1.2 * (share - 0.5) - 0.3 * (rank - 1.6);
}

function strongest(evidence: readonly Evidence[], kinds: readonly EvidenceKind[]): number {
  return evidence.reduce((most, { kind, strength }) => (kinds.includes(kind) ? Math.max(most, strength) : most), 0);
}

/** The confidence, from 0 to 1, that a score stands for. */
export function confidenceOf(score: number): number {
  return 1 / (1 + Math.exp(-score));
}
