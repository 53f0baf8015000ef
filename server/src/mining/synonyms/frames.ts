// The places in sentences that two terms share, as a reason to show: “rotate your ___” and how many more.
import type { SparseVector } from '../../corpus/statistics/similarity.js';
import type { Reason } from '../question.js';
import type { Contexts } from './contexts.js';

/** How many frames are shown. */
const SHOWN = 3;

/** The most telling shared frames, or undefined where none can be shown. */
export function sharedFrames(contexts: Contexts, a: SparseVector, b: SparseVector): Reason | undefined {
  const found: { text: string; weight: number }[] = [];
  let i = 0;
  let j = 0;
  while (i < a.ids.length && j < b.ids.length) {
    if (a.ids[i] === b.ids[j]) {
      const text = contexts.describe(a.ids[i]!);
      if (text !== undefined && !found.some((each) => each.text === text)) {
        found.push({ text, weight: Math.min(a.weights[i]!, b.weights[j]!) });
      }
      i++;
      j++;
    } else if (a.ids[i]! < b.ids[j]!) i++;
    else j++;
  }
  if (found.length === 0) return undefined;
  found.sort((x, y) => y.weight - x.weight || (x.text < y.text ? -1 : 1));
  const shown = found.slice(0, SHOWN).map(({ text }) => `“${text}”`);
  const more = found.length - shown.length;
  const list = more > 0 ? `${shown.join(', ')} and ${more} more` : shown.join(', ');
  return { kind: 'shared-frames', text: `both are used in the same places: ${list}`, value: found.length };
}
