// The glossary entries of a document: their headwords, what is said of them, and the other names that they give.
import type { GlossaryPart } from '../prose/prose.js';
import { TokenFlag } from '../tokens/tokens.js';

/** Tokens `[firstToken, endToken)` of a document's facts. */
export interface TokenRange {
  readonly firstToken: number;
  readonly endToken: number;
}

/** One entry of a glossary, in token ranges of the facts that hold it. */
export interface GlossaryEntry {
  /** At least one; more where the entry stands under several names. */
  readonly headwords: readonly TokenRange[];
  /** The first block of its definition. */
  readonly definition: TokenRange | undefined;
  /** The one name that the entry, which says nothing else, sends the reader to. */
  readonly see: TokenRange | undefined;
  /** Further names that the entry gives its concept. */
  readonly alsoCalled: readonly TokenRange[];
  /** The full forms that the headword is said to be short for. */
  readonly shortFor: readonly TokenRange[];
}

/** What is read of a document's blocks: the part that each has in a glossary, and its tokens. */
export interface GlossaryBlocks {
  readonly parts: readonly (GlossaryPart | undefined)[];
  readonly blockFirst: Uint32Array;
  readonly flags: Uint8Array;
  /** The word of a token, as written. */
  readonly wordAt: (token: number) => string;
}

/** The entries, in order of the document. An entry begins with a headword after anything else and ends where prose outside begins. */
export function readGlossary(blocks: GlossaryBlocks): GlossaryEntry[] {
  const entries: GlossaryEntry[] = [];
  let open: OpenEntry | undefined;
  let before: GlossaryPart | undefined;
  const close = (): void => {
    if (open !== undefined) entries.push(finish(open, blocks));
    open = undefined;
  };
  blocks.parts.forEach((part, block) => {
    const range = { firstToken: blocks.blockFirst[block]!, endToken: blocks.blockFirst[block + 1]! };
    if (range.firstToken === range.endToken && part !== undefined) return;
    if (part === undefined || (part === 'headword' && before !== 'headword')) close();
    if (part === 'headword') (open ??= { headwords: [], said: [], names: [], see: [] }).headwords.push(range);
    else if (part === 'definition') open?.said.push(range);
    else if (part === 'alsoCalled') open?.names.push(range);
    else if (part === 'see') open?.see.push(range);
    before = part;
  });
  close();
  return entries;
}

interface OpenEntry {
  readonly headwords: TokenRange[];
  readonly said: TokenRange[];
  readonly names: TokenRange[];
  readonly see: TokenRange[];
}

function finish({ headwords, said, names, see }: OpenEntry, blocks: GlossaryBlocks): GlossaryEntry {
  const alsoCalled = names.flatMap((range) => namesAfter(blocks, skipCue(blocks, range, ALSO_CALLED), range.endToken));
  const shortFor: TokenRange[] = [];
  let sentTo = see.flatMap((range) => namesAfter(blocks, skipCue(blocks, range, SEE), range.endToken));
  const [definition] = said;
  for (const range of said) {
    for (const start of clausesOf(blocks, range)) {
      const also = skipCue(blocks, { ...range, firstToken: start }, ALSO_CALLED);
      if (also > start) alsoCalled.push(...namesAfter(blocks, also, range.endToken));
      const full = skipCue(blocks, { ...range, firstToken: start }, SHORT_FOR);
      if (full > start) shortFor.push(...namesAfter(blocks, full, range.endToken).slice(0, 1));
    }
  }
  if (definition !== undefined && said.length === 1 && see.length === 0) {
    const target = skipCue(blocks, definition, SEE);
    const found = target > definition.firstToken ? namesAfter(blocks, target, definition.endToken) : [];
    if (found.length === 1 && isRest(blocks, found[0]!.endToken, definition.endToken)) sentTo = found;
  } else if (said.length > 0) sentTo = [];
  return {
    headwords: headwords.map((range) => trimmed(blocks, range)),
    definition: sentTo.length === 1 && see.length === 0 ? undefined : definition,
    see: sentTo.length === 1 ? sentTo[0] : undefined,
    alsoCalled,
    shortFor,
  };
}

/** Phrases, in lower case, that an entry gives another name with. Longer ones first. */
const ALSO_CALLED = phrases(
  ...['also called', 'also known as', 'also referred to as', 'also named', 'otherwise known as', 'sometimes called'],
  ...['sometimes known as', 'sometimes referred to as', 'commonly called', 'commonly known as', 'often called'],
  ...['formerly called', 'formerly known as', 'formerly', 'previously called', 'previously known as', 'a synonym for'],
  ...['a synonym of', 'synonym for', 'synonym of', 'another name for', 'another word for', 'another term for', 'aka'],
);
const SHORT_FOR = phrases(
  ...['abbreviation for', 'abbreviation of', 'an abbreviation for', 'an abbreviation of', 'acronym for', 'acronym of'],
  ...['an acronym for', 'an acronym of', 'the acronym for', 'the abbreviation for', 'short for', 'stands for'],
);
const SEE = phrases('see under', 'see the entry for', 'see');

function phrases(...texts: string[]): readonly (readonly string[])[] {
  return texts.map((text) => text.split(' ')).sort((a, b) => b.length - a.length);
}

/** The token after a phrase that the range begins with, or its first token where it begins with none. */
function skipCue(
  blocks: GlossaryBlocks,
  { firstToken, endToken }: TokenRange,
  cues: readonly (readonly string[])[],
): number {
  const word = (token: number): string => (token < endToken ? blocks.wordAt(token).toLowerCase() : '');
  for (const cue of cues) {
    if (!cue.every((text, index) => word(firstToken + index) === text)) continue;
    const next = firstToken + cue.length;
    // “See also” names what is related, not what is the same.
    if (cue[0] === 'see' && (word(next) === 'also' || word(next) === 'https')) return firstToken;
    return word(next) === ':' ? next + 1 : next;
  }
  return firstToken;
}

/** So near to its start a parenthesis in a definition is about what is defined, further on about anything. */
const NEAR_START = 4;

/** Where clauses about the headword begin: at sentences, and near the start behind an opening bracket, a comma or a dash. */
function clausesOf({ flags, wordAt }: GlossaryBlocks, { firstToken, endToken }: TokenRange): number[] {
  const starts: number[] = [];
  for (let token = firstToken; token < endToken; token++) {
    const opens = token === firstToken || (flags[token]! & TokenFlag.sentenceStart) !== 0;
    const isNear = token - firstToken <= NEAR_START;
    if (opens || (isNear && /^[(,;–—]$/.test(wordAt(token - 1)))) starts.push(token);
  }
  return starts;
}

/** Longest name, in words. */
const LONGEST_NAME = 4;
const ARTICLE = /^(?:an?|the)$/i;

/** The names from a token on, as far as they are listed: “X”, “X or Y”, “X, Y”. What goes on as a sentence is no name. */
function namesAfter(blocks: GlossaryBlocks, from: number, until: number): TokenRange[] {
  const names: TokenRange[] = [];
  let token = from;
  while (token < until) {
    while (token < until && (ARTICLE.test(blocks.wordAt(token)) || isQuote(blocks.wordAt(token)))) token++;
    const firstToken = token;
    while (token < until && isPartOfName(blocks, token, firstToken)) token++;
    if (token === firstToken || token - firstToken > LONGEST_NAME) break;
    const range = { firstToken, endToken: token };
    while (token < until && isQuote(blocks.wordAt(token))) token++;
    const next = token < until ? blocks.wordAt(token).toLowerCase() : '';
    const starts = token < until && (blocks.flags[token]! & TokenFlag.sentenceStart) !== 0;
    if (next !== '' && !starts && !/^(?:[.,;:)(–—]|or|and)$/.test(next)) break;
    names.push(range);
    if (starts || !/^(?:,|or|and)$/.test(next)) break;
    token++;
    if (next === ',' && token < until && /^(?:or|and)$/i.test(blocks.wordAt(token))) token++;
    else if (next === ',' && names.length === 1 && !goesOn(blocks, token, until)) break;
  }
  return names;
}

/** True where what follows a comma is one more short name before the sentence ends, or before “or” and “and”. */
function goesOn(blocks: GlossaryBlocks, from: number, until: number): boolean {
  for (let token = from; token < until && token - from <= LONGEST_NAME; token++) {
    if (/^(?:or|and|,)$/i.test(blocks.wordAt(token))) return token > from;
    if (blocks.wordAt(token) === '.') return token > from;
    if (token > from && (blocks.flags[token]! & TokenFlag.sentenceStart) !== 0) return true;
  }
  return false;
}

function isPartOfName({ flags, wordAt }: GlossaryBlocks, token: number, first: number): boolean {
  if (
    (flags[token]! & TokenFlag.word) === 0 ||
    /^(?:or|and|which|that|when|if|in|is|are|how|what|where|why|above|below)$/i.test(wordAt(token))
  )
    return false;
  return token === first || (flags[token]! & TokenFlag.sentenceStart) === 0;
}

function isQuote(text: string): boolean {
  return /^["“”„‘’'«»]+$/.test(text);
}

/** True where nothing but a stop is left. */
function isRest({ wordAt }: GlossaryBlocks, from: number, until: number): boolean {
  for (let token = from; token < until; token++)
    if (!/^[.)\]]$/.test(wordAt(token)) && !isQuote(wordAt(token))) return false;
  return true;
}

/** A headword without the sign behind it, and without a parenthesis. */
function trimmed(blocks: GlossaryBlocks, { firstToken, endToken }: TokenRange): TokenRange {
  let end = firstToken;
  while (end < endToken && !/^[:(–—[]$/.test(blocks.wordAt(end))) end++;
  return { firstToken, endToken: Math.max(end, firstToken + 1) };
}
