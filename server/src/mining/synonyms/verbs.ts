// Two verbs for one operation on the same object: candidates by list and dictionary, confirmed by the objects they share.
import { compareCodeUnits } from '../../base/order.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { pmi } from '../../corpus/statistics/association.js';
import { usageMeasures } from '../options.js';
import type { MiningOptions } from '../options.js';
import type { Question, Reason } from '../question.js';
import { times } from '../wording.js';
import { clusterPairs } from './clusters.js';
import { forEachPair } from './lexical.js';
import { Meanings } from './links.js';
import type { Nouns } from './nouns.js';
import { countVerbSubstitutions } from './parallel/evidence.js';
import { makeQuestion } from './question.js';
import { confidenceOf } from './score.js';
import { compareVerbs } from './verbLikeness.js';
import { compareObjects } from './verbPhrases.js';
import { linkVerbs, scoreOfVerbs } from './verbLinks.js';
import type { VerbLink } from './verbLinks.js';
import { readVerbUses } from './verbUses.js';
import type { VerbUse, VerbUses } from './verbUses.js';

/** Fewest uses of a verb with the object. */
const FEWEST_USES = 3;
/** From so many uses of each verb with the object on, … */
const ENOUGH_USES = 5;
/** … or so many pages on which both have the very same object, … */
const ENOUGH_PAGES = 2;
/** … and so large a share of the rarer verb's uses with such objects, the object is proof enough of one operation. */
const ENOUGH_SHARED = 0.6;
/** Least attraction between a verb and the object, PMI in bits. */
const LEAST_PMI = 0.3;
/** Verbs that are set side by side so often ("create or update") are two operations. */
const MOST_COORDINATED = 2;
/** What being set side by side once takes from the strength of a link. */
const COORDINATED = 0.15;
/** The best that comparisons can yield. */
const BEST = {
  likeness: { similarity: 1, rankOfA: 1, rankOfB: 1 },
  fewest: FEWEST_USES + 1,
  sharedPhrases: 1,
  substitutions: 3,
};
/** Least share of the rarer verb's uses whose object has the same modifiers as with the other verb. */
const LEAST_SHARED = 1 / 3;
/** Verbs that have the object in one sentence more often are steps of one procedure. */
const MOST_IN_ONE_SENTENCE = 1;
/** Least score of a pair that is asked about. */
const THRESHOLD = 0.5;

/** A verb as it is used with one object. */
interface VerbWithObject {
  readonly verb: number;
  readonly text: string;
  readonly uses: readonly VerbUse[];
}

interface Operation {
  readonly verbs: readonly VerbWithObject[];
  readonly object: string;
  readonly score: number;
  readonly links: readonly VerbLink[];
  /** Whether the object alone is proof enough; if not, the verbs have one that is. */
  readonly isSure: boolean;
}

interface JudgedVerbs {
  readonly link: VerbLink;
  readonly score: number;
  readonly isSure: boolean;
}

/** Asks about verbs that are said of the same object. */
export function* askVerbs(
  corpus: Corpus,
  uses: Uint8Array,
  { substitutions, siblings }: Nouns,
  options: MiningOptions,
): Work<Question[]> {
  const read = yield* readVerbUses(corpus, uses);
  const substituted = countVerbSubstitutions(corpus, substitutions);
  const objects = byObject(read);
  yield;
  const candidates = new Map<number, { a: number; b: number }>();
  const meanings = new Meanings(['verb']);
  const linked = objects.map(({ object, verbs }) => {
    const links = new Map<number, VerbLink>();
    const texts = verbs.map(({ text }) => text);
    meanings.forEachRelated(texts, (i, j) => {
      const [left, right] = [verbs[i]!, verbs[j]!];
      const link = linkVerbs(left.text, right.text, object);
      const coordinated = read.coordinated(left.text, right.text);
      if (link === undefined || coordinated >= MOST_COORDINATED) return;
      // A dictionary's word is taken for verbs that the documents themselves put for one another.
      if (link.kind === 'dictionary' && substituted(left.text, right.text) === 0) return;
      if (siblings.ofVerbs(left.text, right.text) > 0) return;
      const isCoordinated = coordinated > 0;
      if (scoreOfVerbs(left.text, right.text, object, { link, ...BEST }) < THRESHOLD) return;
      const key = keyOf(left.verb, right.verb, read.verbs.size);
      links.set(key, isCoordinated ? { ...link, strength: link.strength - COORDINATED } : link);
      candidates.set(key, { a: Math.min(left.verb, right.verb), b: Math.max(left.verb, right.verb) });
    });
    return { object, verbs, links };
  });
  yield;
  const likeness = yield* compareVerbs(corpus, read, [...candidates.values()], usageMeasures(options));
  const operations: Operation[] = [];
  for (const { object, verbs, links } of linked) {
    if (links.size === 0) continue;
    const judge = (one: VerbWithObject, other: VerbWithObject): JudgedVerbs | undefined => {
      const key = keyOf(one.verb, other.verb, read.verbs.size);
      const link = links.get(key);
      if (link === undefined) return undefined;
      const { share, sameSentence, pages } = compareObjects(corpus, one.uses, other.uses);
      if (share < LEAST_SHARED || sameSentence > MOST_IN_ONE_SENTENCE) return undefined;
      const fewest = Math.min(one.uses.length, other.uses.length);
      const score = scoreOfVerbs(one.text, other.text, object, {
        link,
        likeness: likeness.get(key)!,
        fewest,
        sharedPhrases: share,
        substitutions: substituted(one.text, other.text),
      });
      const isSure = share >= ENOUGH_SHARED && (fewest >= ENOUGH_USES || pages >= ENOUGH_PAGES);
      return { link, score, isSure };
    };
    operations.push(...operationsOn(object, verbs, judge));
  }
  yield;
  return groupByVerbs(operations)
    .filter((same) => same.some(({ isSure }) => isSure))
    .map((same) => questionOf(corpus, same));
}

function keyOf(one: number, other: number, verbs: number): number {
  return Math.min(one, other) * verbs + Math.max(one, other);
}

function operationsOn(
  object: string,
  verbs: readonly VerbWithObject[],
  judge: (one: VerbWithObject, other: VerbWithObject) => JudgedVerbs | undefined,
): Operation[] {
  const holding: (JudgedVerbs & { a: number; b: number })[] = [];
  forEachPair([...verbs.keys()], (a, b) => {
    const judged = judge(verbs[a]!, verbs[b]!);
    if (judged !== undefined && judged.score >= THRESHOLD) holding.push({ a, b, ...judged });
  });
  return clusterPairs(holding, verbs.length).map(({ members, weakest }) => {
    const within = holding.filter(({ a, b }) => members.includes(a) && members.includes(b));
    return {
      verbs: members.map((at) => verbs[at]!),
      object,
      score: weakest,
      links: within.map(({ link }) => link),
      isSure: within.every(({ isSure }) => isSure),
    };
  });
}

interface ObjectVerbs {
  readonly object: string;
  /** Most uses first, ties by code units. */
  readonly verbs: readonly VerbWithObject[];
}

/** Objects with at least two verbs that are used and attracted enough, in order of their texts. */
function byObject({ verbs, objects, pairs, timesOf, usesOf }: VerbUses): ObjectVerbs[] {
  const verbTotals = new Float64Array(verbs.size);
  const objectTotals = new Float64Array(objects.size);
  let all = 0;
  for (let pair = 0; pair < pairs.size; pair++) {
    verbTotals[pairs.leftOf(pair)]! += timesOf(pair);
    objectTotals[pairs.rightOf(pair)]! += timesOf(pair);
    all += timesOf(pair);
  }
  const found = new Map<number, VerbWithObject[]>();
  for (let pair = 0; pair < pairs.size; pair++) {
    if (timesOf(pair) < FEWEST_USES) continue;
    const verb = pairs.leftOf(pair);
    const object = pairs.rightOf(pair);
    if (pmi({ c1: verbTotals[verb]!, c2: objectTotals[object]!, c12: timesOf(pair), n: all }) < LEAST_PMI) continue;
    const list = found.get(object) ?? [];
    list.push({ verb, text: verbs.textOf(verb), uses: usesOf(pair) });
    found.set(object, list);
  }
  return [...found]
    .filter(([, list]) => list.length > 1)
    .map(([object, list]) => ({
      object: objects.textOf(object),
      verbs: list.sort((a, b) => b.uses.length - a.uses.length || compareCodeUnits(a.text, b.text)),
    }))
    .sort((a, b) => compareCodeUnits(a.object, b.object));
}

function questionOf(corpus: Corpus, operations: readonly Operation[]): Question {
  const usesOf = ({ verbs }: Operation): number => verbs.reduce((sum, { uses }) => sum + uses.length, 0);
  const ordered = [...operations].sort((a, b) => usesOf(b) - usesOf(a) || compareCodeUnits(a.object, b.object));
  const leading = ordered[0]!;
  const reasons: Reason[] = ordered.map((operation) => ({
    kind: 'shared-object',
    text: `the documents say ${operation.verbs.map(({ text, uses }) => `“${text} … ${operation.object}” ${times(uses.length)}`).join(' and ')}`,
    value: usesOf(operation),
  }));
  reasons.push(...leading.links.map(({ kind, text, strength }) => ({ kind, text, value: strength })));
  const named = leading.verbs.map(({ verb, text }) => ({
    text,
    uses: ordered.flatMap(({ verbs }) => verbs.find((each) => each.verb === verb)!.uses).sort((a, b) => a.row - b.row),
    partOfSpeech: 'verb' as const,
  }));
  const score = Math.max(...ordered.map((operation) => operation.score));
  const question = makeQuestion(corpus, 'verb-object', named, confidenceOf(score), reasons);
  return { ...question, id: `${question.id}:${leading.object}`, objects: ordered.map(({ object }) => object) };
}

/** Operations of the same verbs together, in order of their first. */
function groupByVerbs(operations: readonly Operation[]): Operation[][] {
  const groups = new Map<string, Operation[]>();
  for (const operation of operations) {
    const key = operation.verbs
      .map(({ text }) => text)
      .sort(compareCodeUnits)
      .join('|');
    const same = groups.get(key);
    if (same === undefined) groups.set(key, [operation]);
    else same.push(operation);
  }
  return [...groups.values()];
}
