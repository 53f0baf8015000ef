// The known name that a mistyped one most likely means.
import { alignmentDistance } from '../base/editDistance.js';
import { compareCodeUnits } from '../base/order.js';

/**
 * The known name within a third of its length of edits from the given one (at least one edit, capitals not counted), or
 * undefined.
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
