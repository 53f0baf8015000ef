// Synonymous noun terms: candidates from every source, refused, confirmed by their contexts, scored and joined.
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { usageMeasures } from '../options.js';
import type { MiningOptions } from '../options.js';
import type { Question } from '../question.js';
import { clusterPairs } from './clusters.js';
import { pairByComponents } from './components.js';
import { pairByContainment } from './containment.js';
import { pairByStatements } from './definitions.js';
import { PairCollector } from './evidence.js';
import { Judge, THRESHOLD } from './judge.js';
import type { JudgedPair } from './judge.js';
import { pairByLists } from './lexical.js';
import { pairByLinkTargets } from './linkTargets.js';
import { pairByLooks } from './lookAlikes.js';
import { indexOccurrences } from './occurrences.js';
import { pairByPastEdits } from './pastEdits.js';
import { makeQuestion } from './question.js';
import { reasonsOf } from './reasons.js';
import { findSubstitutions, pairByParallels } from './parallel/evidence.js';
import type { Substitution } from './parallel/passages.js';
import { confidenceOf, isGrounded } from './score.js';
import { segment } from './segment.js';
import type { Segments } from './segment.js';
import { readSiblings } from './siblings.js';
import type { Siblings } from './siblings.js';
import { findNounTerms } from './terms.js';
import type { Term } from './terms.js';
import { countWordUses } from './wordUse.js';

/** The noun terms of a corpus, where they stand, and what the documents' parallel places and headings say of them. */
export interface Nouns {
  readonly terms: readonly Term[];
  readonly segments: Segments;
  readonly substitutions: readonly Substitution[];
  readonly siblings: Siblings;
}

/** Reads the noun terms and their places. */
export function* readNouns(corpus: Corpus, uses: Uint8Array): Work<Nouns> {
  const terms = yield* findNounTerms(corpus, countWordUses(corpus, uses));
  const segments = yield* segment(corpus, terms, uses);
  const substitutions = yield* findSubstitutions(corpus, segments);
  return { terms, segments, substitutions, siblings: readSiblings(corpus, segments) };
}

/** Gathers the evidence of every source for pairs of noun terms. */
export function* gatherEvidence(corpus: Corpus, nouns: Nouns, options: MiningOptions): Work<PairCollector> {
  const { terms, segments, substitutions } = nouns;
  const occurrences = indexOccurrences(segments);
  const collector = new PairCollector(terms.length);
  pairByLists(terms, collector);
  yield;
  pairByComponents(terms, collector);
  yield;
  pairByStatements(corpus, segments, collector);
  yield;
  pairByLinkTargets(corpus, segments, collector);
  yield;
  pairByParallels(corpus, terms, substitutions, collector);
  pairByContainment(corpus, terms, segments, occurrences, collector);
  yield;
  pairByPastEdits(terms, options.pastEdits, collector);
  return collector;
}

/** Asks about noun terms of one concept; those that too little speaks for are asked about on request alone. */
export function* askNouns(corpus: Corpus, nouns: Nouns, options: MiningOptions): Work<Question[]> {
  const { terms, segments, siblings } = nouns;
  const occurrences = indexOccurrences(segments);
  const collector = yield* gatherEvidence(corpus, nouns, options);
  const judge = new Judge(corpus, terms, segments, occurrences, siblings, usageMeasures(options));
  const judged = yield* judge.judge(collector.pairs());
  const sure = judged.filter((pair) => pair.score >= THRESHOLD && isGrounded(pair.known));
  const looks = yield* pairByLooks(judge, judged, sure);
  const questions: Question[] = [];
  for (const [kind, pairs] of [
    ['synonym', sure],
    ['look-alike', looks],
  ] as const) {
    const byKey = new Map<number, JudgedPair>(pairs.map((pair) => [pair.a * terms.length + pair.b, pair]));
    for (const { members, weakest } of clusterPairs(pairs, terms.length)) {
      const within = members.flatMap((a, i) => members.slice(i + 1).map((b) => byKey.get(a * terms.length + b)!));
      const named = members.map((term) => ({ uses: occurrences.usesOf(term), partOfSpeech: 'noun' as const }));
      const reasons = reasonsOf(within, judge.contexts);
      questions.push(makeQuestion(corpus, kind, named, confidenceOf(weakest), reasons));
      yield;
    }
  }
  return questions;
}
