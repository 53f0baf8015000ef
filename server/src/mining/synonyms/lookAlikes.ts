// Questions on request: pairs that a source speaks for, but too weakly to ask unasked, and terms alike in use alone.
import type { Work } from '../../base/work.js';
import { THRESHOLD_ON_REQUEST } from './judge.js';
import type { Judge, JudgedPair } from './judge.js';
import type { Pair } from './evidence.js';
import { confidenceOf } from './score.js';

/** Below so many uses, likeness in use is chance. */
const FEWEST_USES = 100;
/** All pairs of terms are compared, of the most used ones. */
const MOST_TERMS = 120;
/** Each must be among so many nearest neighbours of the other. */
const NEAREST = 2;
/** Least share of the similarity that two names of one thing have. */
const LEAST_SHARE = 0.6;
/** Questions at most for likeness alone, … */
const MOST_ALIKE = 12;
/** … and for pairs that another source speaks for. */
const MOST_WEAK = 60;

/** The pairs that are not sure: those with some evidence that are most worth, then those most alike in use. */
export function* pairByLooks(
  judge: Judge,
  judged: readonly JudgedPair[],
  sure: readonly JudgedPair[],
): Work<JudgedPair[]> {
  const isSure = new Set(sure);
  const strongestFirst = (x: JudgedPair, y: JudgedPair): number => y.score - x.score || x.a - y.a || x.b - y.b;
  const worth = ({ score, known }: JudgedPair): number => confidenceOf(score) * known.fewest;
  const weak = judged
    .filter((pair) => !isSure.has(pair) && pair.score >= THRESHOLD_ON_REQUEST)
    .sort((x, y) => worth(y) - worth(x) || strongestFirst(x, y))
    .slice(0, MOST_WEAK);
  const alike = yield* judge.judge(yield* findAlike(judge, judged));
  const unparted = alike.filter(({ known: { sideBySide, siblings, properNames } }) => {
    return sideBySide.coordinated + sideBySide.contrasted + siblings + properNames === 0;
  });
  return [...weak, ...unparted.sort(strongestFirst).slice(0, MOST_ALIKE)];
}

/** Mutual nearest neighbours among the most used terms. */
function* findAlike(judge: Judge, judged: readonly JudgedPair[]): Work<Pair[]> {
  const known = new Set(judged.map(({ a, b }) => `${a} ${b}`));
  const { uses } = judge.segments;
  const frequent = Array.from(uses.keys())
    .filter((term) => uses[term]! >= FEWEST_USES)
    .sort((a, b) => uses[b]! - uses[a]! || a - b)
    .slice(0, MOST_TERMS);
  const nearest = yield* judge.nearestAmong(frequent, NEAREST);
  const pairs: Pair[] = [];
  for (const a of frequent) {
    for (const b of nearest.get(a) ?? []) {
      if (a >= b || nearest.get(b)?.includes(a) !== true || known.has(`${a} ${b}`)) continue;
      if (judge.shareOf(a, b) < LEAST_SHARE) continue;
      const text = 'no other source speaks for it: they are merely used alike';
      pairs.push({ a, b, evidence: [{ kind: 'neighbours', strength: 0, text, value: NEAREST }] });
    }
  }
  return pairs;
}
