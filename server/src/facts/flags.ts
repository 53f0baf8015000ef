// Bits that the facts add to a token's own.
import { isOpen } from '../prose/zones.js';

/** Bits of a token beside {@link TokenFlag}'s. */
export const FactFlag = {
  /** A word of grammar (article, preposition, pronoun, auxiliary …) that no term begins or ends with. */
  functionWord: 1 << 7,
} as const;

/** True where a token lies in zones that are counted, asked about and fixed. */
export function isCounted(facts: { readonly zones: Uint16Array }, row: number): boolean {
  return isOpen(facts.zones[row]!);
}
