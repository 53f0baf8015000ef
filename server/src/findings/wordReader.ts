// Cuts text into words for the matcher, chunk by chunk over UTF-8 bytes, into typed arrays that are used again and again.
import { ASCII_FOLD, foldSlow, isWordPoint } from './foldWord.js';
import { hashStep, SHARED, spread, type WordTable } from './wordTable.js';

/** Kinds of gap before a word, as far as a single character tells. */
export const Gap = { space: 0, hyphen: 1, other: 2 } as const;

const CHUNK = 8192;
const GAP_OF = new Uint8Array(256).fill(Gap.other);
for (const unit of [9, 10, 11, 12, 13, 32]) GAP_OF[unit] = Gap.space;
GAP_OF[45] = Gap.hyphen;

// A byte that begins or continues a character beyond ASCII folds to 1: it may belong to a word, and the slow path decides.
const FOLD = new Uint8Array(256).fill(1);
FOLD.set(ASCII_FOLD);
const BEYOND = 1;

/** The words in hand: number in the table (−1: in no term), range in UTF-16 units, and the gap before each. */
export class WordReader {
  ids = new Int32Array(CHUNK);
  starts = new Int32Array(CHUNK);
  ends = new Int32Array(CHUNK);
  gaps = new Uint8Array(CHUNK);
  count = 0;
  private bytes = new Uint8Array(CHUNK * 3 + 1);
  private readonly encoder = new TextEncoder();

  constructor(private readonly table: WordTable) {}

  /** Forgets all words but those from index `k` on. */
  drop(k: number): void {
    this.ids.copyWithin(0, k, this.count);
    this.starts.copyWithin(0, k, this.count);
    this.ends.copyWithin(0, k, this.count);
    this.gaps.copyWithin(0, k, this.count);
    this.count -= k;
  }

  /** Appends the words of the next chunk of `text` from `from`, never beyond `end`; returns the chunk's end. */
  read(text: string, from: number, end: number): number {
    const stop = chunkEnd(text, from, end);
    const length = stop - from;
    if (this.bytes.length <= length * 3) this.bytes = new Uint8Array(length * 3 + 1);
    const chunk = from === 0 && stop === text.length ? text : text.slice(from, stop);
    const { written } = this.encoder.encodeInto(chunk, this.bytes);
    this.reserve(this.count + (length >>> 1) + 2);
    this.bytes[written] = 0;
    this.cut(text, from, written);
    return stop;
  }

  /** A zero byte stands behind the chunk and ends its last word. `base` turns a byte's index into an offset of the text; it shrinks with every character of several bytes. */
  private cut(text: string, from: number, length: number): void {
    const { bytes, ids, starts, ends, gaps } = this;
    const { slots, mask } = this.table;
    let count = this.count;
    let base = from;
    let i = 0;
    let previousEnd = -1;
    while (i < length) {
      let folded = FOLD[bytes[i]!]!;
      if (folded === 0) {
        i++;
        continue;
      }
      const begin = i;
      const start = base + i;
      let hash = 0;
      while (folded > BEYOND) {
        hash = hashStep(hash, folded);
        folded = FOLD[bytes[++i]!]!;
      }
      let id = -1;
      let beyond = false;
      while (folded !== 0) {
        // A word with characters beyond ASCII: followed to its end here, looked up as a string below.
        const point = pointAt(bytes, i);
        const size = point < 0x80 ? 1 : point < 0x800 ? 2 : point < 0x10000 ? 3 : 4;
        if (point >= 0x80 && !isWordPoint(point)) break;
        if (point >= 0x80) beyond = true;
        i += size;
        base -= size === 4 ? 2 : size - 1;
        folded = FOLD[bytes[i]!]!;
      }
      if (i === begin) {
        // A sign beyond ASCII, such as a dash.
        const point = pointAt(bytes, i);
        const size = point < 0x800 ? 2 : point < 0x10000 ? 3 : 4;
        i += size;
        base -= size === 4 ? 2 : size - 1;
        continue;
      }
      const stop = base + i;
      if (beyond) id = this.table.find(foldSlow(text.slice(start, stop)));
      else {
        let slot = spread(hash) & mask;
        let number = slots[slot * 2 + 1]!;
        while (number !== 0) {
          if (slots[slot * 2] === hash) {
            id = number === SHARED ? this.table.find(foldSlow(text.slice(start, stop))) : number - 1;
            break;
          }
          slot = (slot + 1) & mask;
          number = slots[slot * 2 + 1]!;
        }
      }
      ids[count] = id;
      starts[count] = start;
      ends[count] = stop;
      gaps[count] = begin - previousEnd === 1 && previousEnd >= 0 ? GAP_OF[bytes[previousEnd]!]! : Gap.other;
      count++;
      previousEnd = i;
    }
    this.count = count;
  }

  private reserve(size: number): void {
    if (size <= this.ids.length) return;
    const grow = (column: Int32Array): Int32Array<ArrayBuffer> => {
      const wider = new Int32Array(size * 2);
      wider.set(column);
      return wider;
    };
    this.ids = grow(this.ids);
    this.starts = grow(this.starts);
    this.ends = grow(this.ends);
    const gaps = new Uint8Array(size * 2);
    gaps.set(this.gaps);
    this.gaps = gaps;
  }
}

/** Chunks end before white space, so that no word and no surrogate pair is cut; a longer run stays whole. */
function chunkEnd(text: string, from: number, end: number): number {
  if (end - from <= CHUNK) return end;
  for (let at = from + CHUNK; at > from + CHUNK / 2; at--) if (isAsciiSpace(text.charCodeAt(at))) return at;
  for (let at = from + CHUNK + 1; at < end; at++) if (isAsciiSpace(text.charCodeAt(at))) return at;
  return end;
}

function isAsciiSpace(unit: number): boolean {
  return unit === 32 || (unit >= 9 && unit <= 13);
}

/** The code point whose UTF-8 form begins at `at`. */
function pointAt(bytes: Uint8Array, at: number): number {
  const lead = bytes[at]!;
  if (lead < 0x80) return lead;
  if (lead < 0xe0) return ((lead & 0x1f) << 6) | (bytes[at + 1]! & 0x3f);
  if (lead < 0xf0) return ((lead & 0x0f) << 12) | ((bytes[at + 1]! & 0x3f) << 6) | (bytes[at + 2]! & 0x3f);
  return (
    ((lead & 0x07) << 18) | ((bytes[at + 1]! & 0x3f) << 12) | ((bytes[at + 2]! & 0x3f) << 6) | (bytes[at + 3]! & 0x3f)
  );
}
