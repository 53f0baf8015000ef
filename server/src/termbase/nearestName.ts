// The known name that a mistyped one most likely means.
import { compareCodeUnits } from '../base/order.js';

/**
 * The known name within a third of its length of edits from the given one (at least one edit, capitals not counted), or
 * undefined. The distance is that of optimal string alignment (Damerau 1964; Boytsov 2011): insertions, deletions,
 * substitutions and swaps of neighbours.
 */
export function nearestName(name: string, known: readonly string[]): string | undefined {
  let best: { name: string; distance: number } | undefined;
  for (const candidate of [...known].sort(compareCodeUnits)) {
    const allowed = Math.max(1, Math.floor(candidate.length / 3));
    if (Math.abs(candidate.length - name.length) > allowed) continue;
    const distance = alignmentDistance(name.toLowerCase(), candidate.toLowerCase());
    if (distance <= allowed && (best === undefined || distance < best.distance)) best = { name: candidate, distance };
  }
  return best?.name;
}

function alignmentDistance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const cost = a[i - 1] === b[j - 1] ? 0 : 1;
      let least = Math.min(last[j]! + 1, row[j - 1]! + 1, last[j - 1]! + cost);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1])
        least = Math.min(least, beforeLast[j - 2]! + 1);
      row.push(least);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length]!;
}
