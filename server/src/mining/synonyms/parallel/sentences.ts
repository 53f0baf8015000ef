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
  const frames = new FrameIndex((stream.length * 3) >> 3);
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
  private readonly frames: PairTable;
  /** By frame: its last filling plus one. */
  private last: Uint32Array<ArrayBuffer>;
  /** By filling: its unit, its row, and the filling of its frame before it, plus one. */
  private unit: Int32Array<ArrayBuffer>;
  private row: Uint32Array<ArrayBuffer>;
  private before: Uint32Array<ArrayBuffer>;
  private count = 0;

  /** @param expected about as many fillings as there will be */
  constructor(expected: number) {
    const size = Math.max(1024, expected);
    this.frames = new PairTable(size);
    this.last = new Uint32Array(size);
    this.unit = new Int32Array(size);
    this.row = new Uint32Array(size);
    this.before = new Uint32Array(size);
  }

  add(prefix: number, suffix: number, unit: number, row: number): void {
    if (this.count === this.unit.length) this.grow();
    const at = this.count++;
    const frame = this.frames.idOf(prefix >>> 1, suffix >>> 1);
    this.unit[at] = unit;
    this.row[at] = row;
    this.before[at] = this.last[frame]!;
    this.last[frame] = at + 1;
  }

  /** There are at most as many frames as fillings. */
  private grow(): void {
    const wide = (old: Uint32Array<ArrayBuffer>): Uint32Array<ArrayBuffer> => {
      const longer = new Uint32Array(old.length * 2);
      longer.set(old);
      return longer;
    };
    const unit = new Int32Array(this.unit.length * 2);
    unit.set(this.unit);
    this.unit = unit;
    this.last = wide(this.last);
    this.row = wide(this.row);
    this.before = wide(this.before);
  }

  substitutions(): Substitution[] {
    const found: Substitution[] = [];
    for (let frame = 0; frame < this.frames.size; frame++) {
      const last = this.last[frame]!;
      if (this.before[last - 1] === 0) continue;
      const rowOf = new Map<number, number>();
      for (let next = last; next > 0; next = this.before[next - 1]!)
        rowOf.set(this.unit[next - 1]!, this.row[next - 1]!);
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
