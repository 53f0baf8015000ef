// The words to the left and right of a place, as far as the sentence's punctuation lets them belong to it.

/** A word beside a place: lower case, with the offset of its nearer or farther end. */
export interface NearbyWord {
  readonly word: string;
  readonly start: number;
  readonly end: number;
}

const LEFT = /([\p{L}\p{N}][\p{L}\p{N}'’_-]*)\s+$/u;
const RIGHT = /^\s+([\p{L}\p{N}][\p{L}\p{N}'’_-]*)/u;
const REACH = 64;

/** The word before `offset` with nothing but white space between; undefined after punctuation or at the text's start. */
export function wordBefore(text: string, offset: number): NearbyWord | undefined {
  const window = text.slice(Math.max(0, offset - REACH), offset);
  const match = LEFT.exec(window);
  if (!match) return undefined;
  const start = offset - window.length + match.index;
  return { word: plain(match[1]!), start, end: start + match[1]!.length };
}

/** The word after `offset` with nothing but white space between. */
export function wordAfter(text: string, offset: number): NearbyWord | undefined {
  const match = RIGHT.exec(text.slice(offset, offset + REACH));
  if (!match) return undefined;
  const end = offset + match[0].length;
  return { word: plain(match[1]!), start: end - match[1]!.length, end };
}

/** Up to `most` words after `offset`, ending at punctuation. */
export function wordsAfter(text: string, offset: number, most: number): NearbyWord[] {
  const found: NearbyWord[] = [];
  for (let next = wordAfter(text, offset); next && found.length < most; next = wordAfter(text, next.end))
    found.push(next);
  return found;
}

/** Up to `most` words before `offset`, nearest first, ending at punctuation. */
export function wordsBefore(text: string, offset: number, most: number): NearbyWord[] {
  const found: NearbyWord[] = [];
  for (let next = wordBefore(text, offset); next && found.length < most; next = wordBefore(text, next.start))
    found.push(next);
  return found;
}

function plain(word: string): string {
  return word.toLowerCase().replace(/’/g, "'");
}
