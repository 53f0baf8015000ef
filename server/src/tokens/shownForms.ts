// What the tagger is shown for each word: itself where its lexicon has it, else a stand-in that is tagged alike.
// So every shown word is one token to the tagger, its memory does not grow with the documents, and no result hangs on what it read before.
import { CHUNK_PARTICLES } from './closedWords.js';
import { lemmaOf } from './lemma.js';
import { rolesOf } from './roles.js';
import { TAG, TAGS } from './tokens.js';
import type { WinkLexicon } from './winkLexicon.js';

/** Stand-ins; no word of the lexicon begins so. */
const UNKNOWN_NAME = 'Zqx';
const UNKNOWN_NOUN = 'zqx';
const A_NUMBER = '7';
const PREFIX = /^(?:re|un|de|pre|auto|over|under|mis|sub|super|multi|inter)(?=.{4})/;
const LONGEST_REMEMBERED = 40;
const MOST_REMEMBERED = 1 << 16;

/** One spelling of a word as the profile knows it. */
export interface WordForm {
  /** The spelling itself: one string object for all its uses, so that it is hashed once. */
  readonly written: string;
  /** What the tagger is shown. */
  readonly shown: string;
  /** What it is shown at a sentence's start and in titles, where a capital says nothing. */
  readonly shownUncapitalised: string;
  /** Tokens that either shown form makes. */
  readonly count: number;
  readonly lower: string;
  /** {@link Role} bits. */
  readonly roles: number;
  /** Capitals and a plural s: `APIs`. */
  readonly isAcronymPlural: boolean;
  /** Lemmas by tag code, filled on demand. */
  readonly lemmas: (string | undefined)[];
}

/** Finds the forms of words; remembers a bounded number of them. */
export class ShownForms {
  private readonly remembered = new Map<string, WordForm>();

  constructor(private readonly lexicon: WinkLexicon) {}

  /** The form of a word as it stands in the text. */
  of(word: string): WordForm {
    const found = this.remembered.get(word);
    if (found !== undefined) return found;
    const made = this.make(word);
    if (word.length <= LONGEST_REMEMBERED) {
      if (this.remembered.size >= MOST_REMEMBERED) this.remembered.clear();
      this.remembered.set(word, made);
    }
    return made;
  }

  /** The dictionary form of a word tagged so. */
  lemma(form: WordForm, tag: number): string {
    return (form.lemmas[tag] ??= this.makeLemma(form, tag));
  }

  private makeLemma({ lower, isAcronymPlural }: WordForm, tag: number): string {
    if (lower.length > LONGEST_REMEMBERED) return lower;
    if (isAcronymPlural && (tag === TAG.PROPN || tag === TAG.NOUN)) return lower.slice(0, -1);
    return lemmaOf(lower, TAGS[tag]!, this.lexicon);
  }

  private make(written: string): WordForm {
    const word = written
      .replace(/\p{Cf}+/gu, '')
      .replace(/[’]/g, "'")
      .replace(/[\u2010\u2011]/g, '-');
    const lower = word.toLowerCase();
    const isAcronymPlural = /^[A-Z]{2,}s$/.test(word);
    const split = splitContraction(lower);
    const shown = split ?? this.single(word, lower);
    return {
      written,
      shown,
      shownUncapitalised: split ?? this.uncapitalised(word, lower, shown),
      count: split === undefined ? 1 : 2,
      lower,
      roles: rolesOf(lower),
      isAcronymPlural,
      lemmas: [],
    };
  }

  private single(word: string, lower: string): string {
    if (word.length > LONGEST_REMEMBERED) return UNKNOWN_NOUN;
    if (this.lexicon.knows(word)) return word;
    const hyphen = word.lastIndexOf('-');
    if (hyphen > 0) return this.chunk(word.slice(hyphen + 1));
    if (/^\d+(?:st|nd|rd|th)$/.test(lower)) return 'first';
    if (/^\d/.test(word)) return UNKNOWN_NAME;
    if (word !== lower) {
      // The tagger looks a capitalised word up in lower case by itself; any other mixture of cases is a name.
      return this.lexicon.knows(lower) && isTitleOrUpper(word) ? word : UNKNOWN_NAME;
    }
    const rest = lower.replace(PREFIX, '');
    if (rest !== lower && this.lexicon.knows(rest)) return rest;
    return this.standIn(lower);
  }

  /** A hyphenated chunk is shown by its last part, the head, unless that is a particle. */
  private chunk(last: string): string {
    const lower = last.toLowerCase();
    if (lower === '' || /\d/.test(last)) return UNKNOWN_NAME;
    return CHUNK_PARTICLES.has(lower) ? UNKNOWN_NOUN : this.single(last, lower);
  }

  private uncapitalised(word: string, lower: string, shown: string): string {
    if (word === lower) return shown;
    const hyphen = lower.lastIndexOf('-');
    if (hyphen > 0 && shown !== word) return this.chunk(lower.slice(hyphen + 1));
    if (this.lexicon.knows(lower)) return lower;
    const rest = lower.replace(PREFIX, '');
    if (rest !== lower && this.lexicon.knows(rest)) return rest;
    return /^[A-Z][a-z]+(?:ing|ed)$/.test(word) ? this.standIn(lower) : shown;
  }

  /** An unknown word shows its ending, by which the tagger guesses. */
  private standIn(lower: string): string {
    const ending = /[a-z]{1,4}$/.exec(lower)?.[0] ?? '';
    const head = /^(?:anti|post|non)/.test(lower) ? 'nonzqx' : UNKNOWN_NOUN;
    return head + ending;
  }
}

/** What is shown for a number, an identifier or an opaque unit. */
export const SHOWN_NUMBER = A_NUMBER;
export const SHOWN_IDENTIFIER = UNKNOWN_NOUN;
export const SHOWN_OPAQUE = UNKNOWN_NOUN;

/** What is shown for a sign that starts with this unit. */
export function shownSign(unit: number, isSymbol: boolean): string {
  if (isSymbol) return unit < 0x80 ? (SIGNS[unit] ?? '%') : '%';
  if (unit < 0x80) return SIGNS[unit] ?? ',';
  if (unit === 0x2013 || unit === 0x2014) return '—';
  if (unit === 0x2018 || unit === 0x2019 || unit === 0x201c || unit === 0x201d || unit === 0xab || unit === 0xbb)
    return '"';
  return unit === 0x2026 ? '.' : ',';
}

const SIGNS: readonly (string | undefined)[] = Array.from({ length: 0x80 }, (_, unit) => {
  const char = String.fromCharCode(unit);
  if (char === "'" || char === '`') return '"';
  if (char === '-') return '—';
  return '!"%&(),./:;?[]{}+=*|<>#@^~'.includes(char) ? char : undefined;
});

const ENDINGS: Readonly<Record<string, string>> = {
  "'ll": 'will',
  "'re": 'are',
  "'ve": 'have',
  "'d": 'would',
  "'m": 'am',
  "'s": 'is',
};
const NEGATED: Readonly<Record<string, string>> = { ca: 'can', wo: 'will', sha: 'shall', ai: 'is', can: 'can' };

/** The two words of a contraction, space between, or undefined. */
function splitContraction(lower: string): string | undefined {
  if (lower === 'cannot') return 'can not';
  if (lower === "let's") return 'let us';
  const at = lower.indexOf("'");
  if (at <= 0) return undefined;
  if (lower.endsWith("n't") && /^[a-z]+n't$/.test(lower)) {
    const base = lower.slice(0, -3);
    return `${NEGATED[base] ?? base} not`;
  }
  const ending = ENDINGS[lower.slice(at)];
  return ending !== undefined && /^[a-z]+$/.test(lower.slice(0, at)) ? `${lower.slice(0, at)} ${ending}` : undefined;
}

function isTitleOrUpper(word: string): boolean {
  return /^[A-Z](?:[a-z]*|[A-Z]*)$/.test(word);
}
