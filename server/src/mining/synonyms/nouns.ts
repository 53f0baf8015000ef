// Synonymous noun terms: candidates from every source, refused, confirmed by their contexts, scored and joined.
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { usageMeasures } from '../options.js';
import type { MiningOptions } from '../options.js';
import type { Question } from '../question.js';
import { clusterPairs } from './clusters.js';
import { pairByComponents } from './components.js';
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
import { confidenceOf } from './score.js';
import { segment } from './segment.js';
import { findNounTerms } from './terms.js';
import { countWordUses } from './wordUse.js';

/** Asks about noun terms of one concept, and about terms that are alike in use alone. */
export function* askNouns(corpus: Corpus, uses: Uint8Array, options: MiningOptions): Work<Question[]> {
  const terms = yield* findNounTerms(corpus, countWordUses(corpus, uses));
  const segments = yield* segment(corpus, terms, uses);
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
  pairByPastEdits(terms, options.pastEdits, collector);
  const judge = new Judge(corpus, terms, segments, occurrences, usageMeasures(options));
  const judged = yield* judge.judge(collector.pairs());
  const looks = yield* pairByLooks(judge, judged);
  const questions: Question[] = [];
  for (const [kind, pairs] of [
    ['synonym', judged.filter(({ score }) => score >= THRESHOLD)],
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
