// Finds a line among the distinct lines of one long string, without a string of its own for each.

/** Where the lines of a text are. */
export interface LineIndex {
  readonly count: number;
  /** Number of the line that equals the text, or −1. */
  readonly find: (line: string) => number;
}

/**
 * Indexes the lines of a text that are all different: an open-addressed table of line numbers (Knuth, The Art of Computer
 * Programming, vol. 3, §6.4) at most half full, 12 bytes a line.
 */
export function indexLines(text: string): LineIndex {
  const starts = lineStarts(text);
  const count = starts.length - 1;
  const slots = new Int32Array(2 ** Math.ceil(Math.log2(2 * count + 2))).fill(-1);
  const mask = slots.length - 1;
  for (let line = 0; line < count; line++) {
    let slot = hash(text, starts[line]!, starts[line + 1]! - 1) & mask;
    while (slots[slot] !== -1) slot = (slot + 1) & mask;
    slots[slot] = line;
  }
  const find = (wanted: string): number => {
    for (let slot = hash(wanted, 0, wanted.length) & mask; slots[slot] !== -1; slot = (slot + 1) & mask) {
      const line = slots[slot]!;
      const start = starts[line]!;
      if (starts[line + 1]! - 1 - start === wanted.length && text.startsWith(wanted, start)) return line;
    }
    return -1;
  };
  return { count, find };
}

/** Where each line starts, and one past the end of the text and its absent last line break. */
function lineStarts(text: string): Uint32Array {
  const starts = [0];
  for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) starts.push(at + 1);
  starts.push(text.length + 1);
  return Uint32Array.from(starts);
}

/** FNV-1a over code units (Fowler, Noll & Vo 1991), its high bits mixed into the low ones. */
function hash(text: string, from: number, to: number): number {
  let value = 0x811c9dc5;
  for (let i = from; i < to; i++) value = Math.imul(value ^ text.charCodeAt(i), 0x01000193);
  return value ^ (value >>> 15);
}
