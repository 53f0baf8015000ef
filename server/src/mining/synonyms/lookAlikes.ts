// Terms alike in use alone: mutual nearest neighbours that no other source speaks for; asked only on request.
import type { Work } from '../../base/work.js';
import type { Judge, JudgedPair } from './judge.js';
import type { Pair } from './evidence.js';

/** Below so many uses, likeness in use is chance. */
const FEWEST_USES = 100;
/** All pairs of terms are compared, of the most used ones. */
const MOST_TERMS = 200;
/** Each must be among so many nearest neighbours of the other. */
const NEAREST = 2;
/** Least share of the similarity that two names of one thing have. */
const LEAST_SHARE = 0.6;
/** Questions at most. */
const MOST = 12;

/** The pairs most alike in use that `judged` does not hold, strongest first. */
export function* pairByLooks(judge: Judge, judged: readonly JudgedPair[]): Work<JudgedPair[]> {
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
      if (
        a < b &&
        nearest.get(b)?.includes(a) === true &&
        !known.has(`${a} ${b}`) &&
        judge.shareOf(a, b) >= LEAST_SHARE
      ) {
        const text = 'no other source speaks for it: they are merely used alike';
        pairs.push({ a, b, evidence: [{ kind: 'neighbours', strength: 0, text, value: NEAREST }] });
      }
    }
  }
  const found = yield* judge.judge(pairs);
  return found
    .filter(({ known: { sideBySide, siblings, properNames } }) => {
      return sideBySide.coordinated + sideBySide.contrasted + siblings + properNames === 0;
    })
    .sort((x, y) => y.score - x.score || x.a - y.a || x.b - y.b)
    .slice(0, MOST);
}
