// Near-duplicate sentences: two that are alike but for one term put one for the other.
import { PairTable } from '../../../base/pairTable.js';
import type { Work } from '../../../base/work.js';
import type { TokenStream } from '../../../corpus/stream.js';
import { TAG, TokenFlag } from '../../../tokens/tokens.js';
import { areOfOneKind } from './passages.js';
import type { PassageReader, Reading, Substitution } from './passages.js';

/** Fewest units that two sentences have in common. */
const FEWEST_COMMON = 3;
/** Longest sentence that is looked at, in units. */
const LONGEST = 25;
/** A sentence in which more terms stand by turns is a template for several things. */
const MOST_FILLERS = 2;

/**
 * Finds sentences, headings and cells that differ in one term or verb. Each sentence is filed under the frames that leaving
 * out one unit makes; two that share a frame differ there alone.
 */
export function* findNearSentences(reader: PassageReader): Work<Substitution[]> {
  const { stream } = reader.corpus;
  const frames = new FrameIndex();
  for (let first = 0; first < stream.length;) {
    let end = first + 1;
    while (end < stream.length && (stream.flags[end]! & TokenFlag.sentenceStart) === 0) end++;
    if (stream.counted[first] === 1) fileUnder(stream, reader.read({ first, end }), frames);
    if (first >> 14 !== end >> 14) yield;
    first = end;
  }
  return frames.substitutions();
}

function fileUnder(stream: TokenStream, { units, rows }: Reading, frames: FrameIndex): void {
  const n = units.length;
  if (n <= FEWEST_COMMON || n > LONGEST) return;
  suffix[n] = 0;
  for (let at = n - 1; at >= 0; at--) suffix[at] = mix(suffix[at + 1]!, units[at]!);
  let prefix = n;
  for (let at = 0; at < n; at++) {
    const row = rows[at]!;
    if (units[at]! >= 0 || stream.tag[row] === TAG.VERB) frames.add(mix(prefix, at), suffix[at + 1]!, units[at]!, row);
    prefix = mix(prefix, units[at]!);
  }
}

/** The hashes of what stands from each unit of a sentence to its end; one column for all sentences, read from the last unit on. */
const suffix = new Int32Array(LONGEST + 1);

/** Units by the frame that they fill, in order of their rows; columns, since there are as many as words. */
class FrameIndex {
  /** Frames by two hashes of 31 bits, of what stands before and behind the gap. */
  private readonly frames = new PairTable();
  private readonly last: number[] = [];
  private readonly unit: number[] = [];
  private readonly row: number[] = [];
  private readonly before: number[] = [];

  add(prefix: number, suffix: number, unit: number, row: number): void {
    const frame = this.frames.idOf(prefix >>> 1, suffix >>> 1);
    const before = frame < this.last.length ? this.last[frame]! : -1;
    this.last[frame] = this.unit.length;
    this.unit.push(unit);
    this.row.push(row);
    this.before.push(before);
  }

  substitutions(): Substitution[] {
    const found: Substitution[] = [];
    for (const last of this.last) {
      if (this.before[last]! < 0) continue;
      const rowOf = new Map<number, number>();
      for (let at = last; at >= 0; at = this.before[at]!) rowOf.set(this.unit[at]!, this.row[at]!);
      if (rowOf.size < 2 || rowOf.size > MOST_FILLERS) continue;
      const fillers = [...rowOf].sort((x, y) => x[1] - y[1]);
      const [[one, rowOfOne], [other, rowOfOther]] = fillers as [[number, number], [number, number]];
      if (areOfOneKind(one, other)) found.push({ source: 'sentence', one, other, rowOfOne, rowOfOther });
    }
    return found;
  }
}

/** Multiplicative mixing of 32 bits (after MurmurHash3, Appleby 2011). */
function mix(hash: number, value: number): number {
  let h = Math.imul(hash ^ value, 0x85ebca6b);
  h = Math.imul(h ^ (h >>> 13), 0xc2b2ae35);
  return h ^ (h >>> 16);
}
