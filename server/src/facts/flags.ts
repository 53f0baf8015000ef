// Bits that the facts add to a token's own.
/** Bits of a token beside {@link TokenFlag}'s. */
export const FactFlag = {
  /** A word of grammar (article, preposition, pronoun, auxiliary …) that no term begins or ends with. */
  functionWord: 1 << 7,
} as const;
