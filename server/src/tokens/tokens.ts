// Tokens of a block as columns: one row a token, offsets into the block's text.
import type { BlockContent } from '../prose/prose.js';

/** Universal parts of speech (Petrov, Das & McDonald 2012; UD v2), by code. Append only: the codes are stored. */
export const TAGS = [
  'X',
  'NOUN',
  'PROPN',
  'VERB',
  'AUX',
  'ADJ',
  'ADV',
  'PRON',
  'DET',
  'ADP',
  'PART',
  'CCONJ',
  'SCONJ',
  'NUM',
  'INTJ',
  'PUNCT',
  'SYM',
  'OPAQUE',
] as const;
export type Tag = (typeof TAGS)[number];

/** The code of each part of speech. */
export const TAG = Object.fromEntries(TAGS.map((tag, code) => [tag, code])) as Record<Tag, number>;

/** Bits of a token. */
export const TokenFlag = {
  /** The first token of a sentence. */
  sentenceStart: 1 << 0,
  /** White space stands before the token. */
  spaceBefore: 1 << 1,
  /** A possessive ending follows the token and is left out of it. */
  possessive: 1 << 2,
  /** A word of letters (with digits, hyphens, apostrophes inside), not a number, sign or opaque thing. */
  word: 1 << 3,
  /** Looks like an identifier, path or file name (snake_case, camelCase, dots inside, slashes, digits among letters). */
  identifier: 1 << 4,
  /** A ™, ® or © sign follows the token without a space. */
  trademark: 1 << 5,
  /** Soft hyphens or zero-width characters stand inside: {@link tokenText} leaves them out. */
  invisible: 1 << 6,
} as const;

/**
 * The tokens of one block. Words are whole as a writer sees them: hyphenated chunks (`command-line`), identifiers
 * (`foo_bar`, `node.js`, `C++`) and contractions (`don't`) are one token each; a possessive `'s` belongs to none;
 * edge punctuation stands apart; an opaque unit is one token tagged OPAQUE.
 */
export interface BlockTokens {
  readonly start: Uint32Array;
  readonly end: Uint32Array;
  readonly tag: Uint8Array;
  readonly flags: Uint8Array;
  /** Each token as it reads: its text without soft hyphens and zero-width characters. */
  readonly word: readonly string[];
  /** Dictionary form in lower case by the tagger (never the identity of a term: it maps behaviour to behavior). */
  readonly lemma: readonly string[];
}

const INVISIBLE_CHARACTERS = /[\p{Cf}]+/gu;

/** The text of one token as it reads, without soft hyphens and zero-width characters. */
export function tokenText(text: string, tokens: BlockTokens, row: number): string {
  return tokenSlice(text, tokens.start[row]!, tokens.end[row]!, tokens.flags[row]!);
}

/** The same for a token of which the place and the flags are at hand. */
export function tokenSlice(text: string, start: number, end: number, flags: number): string {
  const slice = text.slice(start, end);
  return (flags & TokenFlag.invisible) === 0 ? slice : slice.replace(INVISIBLE_CHARACTERS, '');
}

/** How the words of a language are read. */
export interface LanguageProfile {
  /** BCP 47 primary subtag, such as `en`; `und` for the neutral profile. */
  readonly language: string;
  /** Tokens of each content, in order. A block's tokens depend on its own text alone, whichever blocks come along. */
  tokens(contents: readonly BlockContent[]): BlockTokens[];
}
