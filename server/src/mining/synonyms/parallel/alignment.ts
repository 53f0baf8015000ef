// Two passages aligned: where they differ in one term alone, one stands for the other.
import { areOfOneKind } from './passages.js';
import type { Parallel, PassageReader, Reading, Substitution } from './passages.js';

/** A name is looked for in a passage of at most so many units. */
const LONGEST = 60;

/** The one place at which two passages differ: the shorter, but for one unit, stands once in the other. */
export function align(reader: PassageReader, { source, one, other }: Parallel): Substitution | undefined {
  const left = reader.read(one);
  const right = reader.read(other);
  const isTurned = left.units.length > right.units.length;
  const [name, text] = isTurned ? [right, left] : [left, right];
  // Two bare names have nothing in common that says they are one.
  if (name.units.length < 2 || text.units.length > LONGEST) return undefined;
  const places: { at: number; gap: number }[] = [];
  for (let at = 0; at + name.units.length <= text.units.length; at++) {
    const gap = onlyDifference(name.units, text.units, at);
    if (gap === undefined) continue;
    // The name itself stands in the text.
    if (gap < 0) return undefined;
    if (areOfOneKind(name.units[gap]!, text.units[at + gap]!)) places.push({ at, gap });
  }
  const place = places[0];
  if (place === undefined || places.length > 1) return undefined;
  const inName = unitOf(name, place.gap);
  const inText = unitOf(text, place.at + place.gap);
  const [first, second] = isTurned ? [inText, inName] : [inName, inText];
  return { source, one: first.unit, other: second.unit, rowOfOne: first.row, rowOfOther: second.row };
}

function unitOf({ units, rows }: Reading, at: number): { unit: number; row: number } {
  return { unit: units[at]!, row: rows[at]! };
}

/** Where a name and a stretch of text differ, if they do in one unit alone; −1 where they do not. */
function onlyDifference(name: readonly number[], text: readonly number[], from: number): number | undefined {
  let gap = -1;
  for (let at = 0; at < name.length; at++) {
    if (name[at] === text[from + at]) continue;
    if (gap >= 0) return undefined;
    gap = at;
  }
  return gap;
}
