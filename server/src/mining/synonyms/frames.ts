// The places in sentences that two terms share, as a reason to show: “rotate your ___” and how many more.
import type { SparseVector } from '../../corpus/statistics/similarity.js';
import type { Reason } from '../question.js';
import type { Contexts } from './contexts.js';

/** How many frames are shown. */
const SHOWN = 3;

/** The most telling frames that all of some terms share, or undefined where none can be shown. */
export function sharedFrames(contexts: Contexts, vectors: readonly SparseVector[]): Reason | undefined {
  const found: { text: string; weight: number }[] = [];
  const shown = new Set<string>();
  for (const [feature, weight] of inAll(vectors)) {
    const text = contexts.describe(feature);
    if (text === undefined || shown.has(text)) continue;
    shown.add(text);
    found.push({ text, weight });
  }
  if (found.length === 0) return undefined;
  found.sort((x, y) => y.weight - x.weight || (x.text < y.text ? -1 : 1));
  const told = found.slice(0, SHOWN).map(({ text }) => `“${text}”`);
  const more = found.length - told.length;
  const list = more > 0 ? `${told.join(', ')} and ${more} more` : told.join(', ');
  const which = vectors.length > 2 ? 'all' : 'both';
  return { kind: 'shared-frames', text: `${which} are used in the same places: ${list}`, value: found.length };
}

/** The features that all vectors have, in order, each with its least weight. */
function inAll(vectors: readonly SparseVector[]): Map<number, number> {
  let common: Map<number, number> | undefined;
  for (const { ids, weights } of vectors) {
    const next = new Map<number, number>();
    ids.forEach((id, at) => {
      const least = common === undefined ? Infinity : common.get(id);
      if (least !== undefined) next.set(id, Math.min(least, weights[at]!));
    });
    common = next;
  }
  return common ?? new Map<number, number>();
}
