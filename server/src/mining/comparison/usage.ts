// How alike two terms are used, against the yardstick of one term's own halves, with the evidence that mining sees.
import { compareCodeUnits } from '../../base/order.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import type { SparseVector } from '../../corpus/statistics/similarity.js';
import { isFunctionWord } from '../../lexicon/functionWords.js';
import { usageMeasures } from '../options.js';
import type { MiningOptions } from '../options.js';
import type { Reason } from '../question.js';
import type { Contexts } from '../synonyms/contexts.js';
import { Judge, THRESHOLD } from '../synonyms/judge.js';
import type { Refusal } from '../synonyms/judge.js';
import { gatherEvidence, readNouns } from '../synonyms/nouns.js';
import type { Nouns } from '../synonyms/nouns.js';
import { indexOccurrences } from '../synonyms/occurrences.js';
import { confidenceOf, isGrounded } from '../synonyms/score.js';
import { readUses } from '../synonyms/wordUse.js';
import { withTerms } from './placedTerms.js';
import type { ComparedTerm } from './comparison.js';

/** The places of sentences in which terms stand, most telling first: “rotate the ___”. */
export interface Frames {
  readonly shared: readonly string[];
  readonly alone: readonly [readonly string[], readonly string[]];
}

/** How alike two terms are used. */
export interface UsageComparison {
  /** From 0 to 1, by the chosen measure. */
  readonly similarity: number;
  /** The similarity that two halves of one term have here, at the uses of the rarer term. */
  readonly yardstick: number;
  /** Place of the second among the terms used most like the first, from 1, and the other way round. */
  readonly rankOfB: number;
  readonly rankOfA: number;
  /** “A and B”, “A or B”; “A instead of B”, “unlike A”. */
  readonly coordinated: number;
  readonly contrasted: number;
  /** Lists, tables and headings that give each a place of its own. */
  readonly siblings: number;
  readonly frames: Frames;
  /** What each source says for one concept. */
  readonly evidence: readonly Reason[];
  /** How sure mining is, from 0 to 1, that both name one concept, and the least that it asks from. */
  readonly confidence: number;
  readonly leastConfidence: number;
  /** Why mining does not even judge the two; undefined where it does. */
  readonly refusal: Refusal | undefined;
  /** True where a source speaks that may make a question: mere likeness in use does not. */
  readonly isGrounded: boolean;
}

/** How many frames are told of each kind. */
const TOLD = 8;

/** Compares the use of two terms among all noun terms of a corpus. */
export function* compareUsage(
  corpus: Corpus,
  pair: readonly [ComparedTerm, ComparedTerm],
  options: MiningOptions,
): Work<UsageComparison> {
  const read = yield* readNouns(corpus, readUses(corpus));
  const { terms, segments, places } = withTerms(corpus, read, pair);
  const nouns: Nouns = { ...read, terms, segments };
  const [a, b] = places[0] < places[1] ? places : [places[1], places[0]];
  const collected = yield* gatherEvidence(corpus, nouns, options);
  const known = collected.pairs().find((each) => each.a === a && each.b === b) ?? { a, b, evidence: [] };
  const occurrences = indexOccurrences(segments);
  const judge = new Judge(corpus, terms, segments, occurrences, read.siblings, usageMeasures(options));
  const [judged] = yield* judge.weighUp([known]);
  const { likeness, self, sideBySide, siblings } = judged!.known;
  const isTurned = places[0] !== a;
  const vector = (at: number): SparseVector => judge.contexts.vectors[at]!;
  return {
    ...{ similarity: likeness.similarity, yardstick: self },
    rankOfB: isTurned ? likeness.rankOfA : likeness.rankOfB,
    rankOfA: isTurned ? likeness.rankOfB : likeness.rankOfA,
    ...{ ...sideBySide, siblings },
    frames: framesOf(judge.contexts, vector(places[0]), vector(places[1])),
    evidence: known.evidence.map(({ kind, text, value }) => ({ kind, text, value })),
    ...{ confidence: confidenceOf(judged!.score), leastConfidence: confidenceOf(THRESHOLD) },
    refusal: judge.refusalOf(known),
    isGrounded: isGrounded(judged!.known),
  };
}

/** True for a frame that has more than words of grammar. */
function saysSomething(frame: string): boolean {
  return frame.split(' ').some((word) => /\p{L}/u.test(word) && !isFunctionWord(word));
}

function framesOf(contexts: Contexts, a: SparseVector, b: SparseVector): Frames {
  const weightOf = (vector: SparseVector) => new Map(Array.from(vector.ids, (id, at) => [id, vector.weights[at]!]));
  const [ofA, ofB] = [weightOf(a), weightOf(b)];
  const tell = (some: readonly (readonly [id: number, weight: number])[]): string[] => {
    const texts = new Map<string, number>();
    for (const [id, weight] of some) {
      const text = contexts.describe(id);
      if (text !== undefined && saysSomething(text)) texts.set(text, Math.max(weight, texts.get(text) ?? 0));
    }
    return [...texts]
      .sort(([x, m], [y, n]) => n - m || compareCodeUnits(x, y))
      .slice(0, TOLD)
      .map(([text]) => text);
  };
  const shared = [...ofA]
    .filter(([id]) => ofB.has(id))
    .map(([id, weight]) => [id, Math.min(weight, ofB.get(id)!)] as const);
  return {
    shared: tell(shared),
    alone: [tell([...ofA].filter(([id]) => !ofB.has(id))), tell([...ofB].filter(([id]) => !ofA.has(id)))],
  };
}
