// Tells text in title case, where capitals do not mark names.
import { type TokenColumns, TokenKind } from './tokenColumns.js';

const SHORTEST_TELLING = 4;

/** True where nearly all longer words of the text begin with a capital, and there are two or more of them. */
export function isTitle(text: string, columns: TokenColumns): boolean {
  const { length, start, end, kind } = columns;
  if (length > 24) return false;
  let capitals = 0;
  let words = 0;
  for (let row = 0; row < length; row++) {
    if (kind[row] !== TokenKind.word || end[row]! - start[row]! < SHORTEST_TELLING) continue;
    const unit = text.charCodeAt(start[row]!);
    words++;
    if (unit >= 0x41 && unit <= 0x5a) capitals++;
  }
  return words >= 2 && capitals >= words * 0.8;
}
