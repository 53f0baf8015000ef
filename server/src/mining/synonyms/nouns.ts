// Synonymous noun terms: candidates from every source, refused, confirmed by their contexts, scored and joined.
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import type { Question, Reason } from '../question.js';
import { isRefused, readSeparations } from './apart.js';
import { clusterPairs } from './clusters.js';
import { pairByComponents } from './components.js';
import { gatherContexts } from './contexts.js';
import type { Contexts } from './contexts.js';
import { countSideBySide } from './coordination.js';
import { pairByStatements } from './definitions.js';
import { PairCollector } from './evidence.js';
import type { Pair } from './evidence.js';
import { pairByLists } from './lexical.js';
import { selfSimilarity, termsToHalve } from './likeness.js';
import { pairByLinkTargets } from './linkTargets.js';
import { compareTerms } from './neighbours.js';
import { indexOccurrences } from './occurrences.js';
import { properShare } from './properNames.js';
import { makeQuestion } from './question.js';
import { confidenceOf, scoreOf } from './score.js';
import type { Shape } from './score.js';
import type { Term } from './terms.js';
import { isGeneralNoun } from './generalWords.js';
import { segment } from './segment.js';
import { sharedFrames } from './frames.js';
import { findNounTerms } from './terms.js';
import { countWordUses } from './wordUse.js';

/** Fewest uses of a term outside longer terms, … */
const FEWEST_USES = 3;
/** … as a share of all its uses. */
const LEAST_ALONE = 0.15;
/** Least score of a pair that is asked about. */
const THRESHOLD = 0;

export function* askNouns(corpus: Corpus): Work<Question[]> {
  const { stream } = corpus;
  const terms = yield* findNounTerms(corpus, countWordUses(corpus));
  const segments = yield* segment(corpus, terms);
  const occurrences = indexOccurrences(stream, segments);
  const collector = new PairCollector(terms.length);
  pairByLists(terms, collector);
  yield;
  pairByComponents(terms, collector);
  yield;
  pairByStatements(corpus, segments, collector);
  pairByLinkTargets(corpus, segments, collector);
  yield;
  const isOften = (term: number): boolean =>
    segments.uses[term]! >= Math.max(FEWEST_USES, LEAST_ALONE * terms[term]!.uses);
  const separations = readSeparations(corpus, segments);
  const pairs = collector
    .pairs()
    .filter(
      ({ a, b }) => isOften(a) && isOften(b) && !separations.bothDefined(a, b) && !isRefused(terms[a]!, terms[b]!),
    );
  yield;
  const halved = termsToHalve(segments.uses);
  const contexts = yield* gatherContexts(corpus, segments, terms.length, halved);
  const half = (at: number) => contexts.vectors[terms.length + at]!;
  const self = selfSimilarity(
    halved.map((term, at) => ({ one: half(2 * at), other: half(2 * at + 1), uses: segments.uses[term]! })),
  );
  const vectors = contexts.vectors.slice(0, terms.length);
  const { likeness } = yield* compareTerms(vectors, pairs, [], 0);
  const keyOf = ({ a, b }: { readonly a: number; readonly b: number }): number => a * terms.length + b;
  const sideBySide = countSideBySide(corpus, segments, terms, new Set(pairs.map(keyOf)));
  yield;
  const proper = new Map<number, number>();
  const isProper = (term: number): boolean => {
    let share = proper.get(term);
    if (share === undefined)
      proper.set(term, (share = properShare(stream, corpus.vocabulary, occurrences.usesOf(term))));
    return share >= 0.5;
  };
  const scored = pairs.map((pair) => {
    const known = {
      evidence: pair.evidence,
      likeness: likeness.get(keyOf(pair))!,
      self: self(Math.min(segments.uses[pair.a]!, segments.uses[pair.b]!)),
      sideBySide: sideBySide.get(keyOf(pair)) ?? { coordinated: 0, contrasted: 0 },
      siblings: separations.siblings(pair.a, pair.b),
      shape: shapeOf(terms[pair.a]!, terms[pair.b]!),
      general: Number(isGeneral(terms[pair.a]!)) + Number(isGeneral(terms[pair.b]!)),
      properNames: Number(isProper(pair.a)) + Number(isProper(pair.b)),
      fewest: Math.min(segments.uses[pair.a]!, segments.uses[pair.b]!),
    };
    return { ...pair, known, score: scoreOf(known) };
  });
  const holding = scored.filter(({ score }) => score >= THRESHOLD);
  const byKey = new Map(holding.map((pair) => [keyOf(pair), pair]));
  const questions: Question[] = [];
  for (const cluster of clusterPairs(holding, terms.length)) {
    const within: (typeof holding)[number][] = [];
    cluster.members.forEach((a, i) => {
      for (const b of cluster.members.slice(i + 1)) within.push(byKey.get(a * terms.length + b)!);
    });
    const reasons = reasonsOf(within, contexts, vectors);
    const named = cluster.members.map((term) => ({ uses: occurrences.usesOf(term), partOfSpeech: 'noun' as const }));
    questions.push(makeQuestion(corpus, 'synonym', named, confidenceOf(cluster.weakest), reasons));
    yield;
  }
  return questions;
}

function shapeOf({ words: a }: Term, { words: b }: Term): Shape {
  const [short, long] = a.length <= b.length ? [a, b] : [b, a];
  if (short.length < long.length && ` ${long.join(' ')} `.includes(` ${short.join(' ')} `)) return 'contained';
  return short.length > 1 ? 'multiword' : 'words';
}

function isGeneral({ words }: Term): boolean {
  return words.length === 1 && isGeneralNoun(words[0]!);
}

function reasonsOf(
  pairs: readonly (Pair & { readonly known: Parameters<typeof scoreOf>[0] })[],
  contexts: Contexts,
  vectors: Contexts['vectors'],
): Reason[] {
  const reasons: Reason[] = [];
  const said = new Set<string>();
  const say = (reason: Reason): void => {
    if (!said.has(reason.text)) reasons.push(reason);
    said.add(reason.text);
  };
  for (const { evidence } of pairs) for (const { kind, text, value } of evidence) say({ kind, text, value });
  for (const { a, b, known } of pairs) {
    const frames = sharedFrames(contexts, vectors[a]!, vectors[b]!);
    if (frames !== undefined) say(frames);
    const { rankOfA, rankOfB } = known.likeness;
    say({
      kind: 'likeness',
      text: `rank ${rankOfA}/${rankOfB} sim ${known.likeness.similarity.toFixed(3)} self ${known.self.toFixed(3)} co ${known.sideBySide.coordinated}+${known.sideBySide.contrasted} sib ${known.siblings} proper ${known.properNames}`,
      value: known.likeness.similarity / known.self,
    });
  }
  return reasons;
}
