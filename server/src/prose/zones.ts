// The zones of a document, named once: a token carries a set of them, and findings and rewriting decide by that set.

/** One bit a zone. A set of zones is the bitwise or of its members; the empty set is plain prose. */
export const Zone = {
  prose: 0,
  heading: 1 << 0,
  code: 1 << 1,
  uiLabel: 1 << 2,
  quotation: 1 << 3,
  linkText: 1 << 4,
  linkTarget: 1 << 5,
  definedTerm: 1 << 6,
  tableCell: 1 << 7,
  alternativeText: 1 << 8,
  safetyMessage: 1 << 9,
  frontMatter: 1 << 10,
} as const;

/** A set of {@link Zone} bits. */
export type ZoneSet = number;

/** Zones in which nothing is counted, asked or fixed. */
export const CLOSED_ZONES: ZoneSet = Zone.code | Zone.uiLabel | Zone.quotation | Zone.linkTarget;

/** True where words of these zones are counted, asked about and fixed. */
export function isOpen(zones: ZoneSet): boolean {
  return (zones & CLOSED_ZONES) === 0;
}
