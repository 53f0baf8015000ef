// What is known of one document by its text alone: its tokens and blocks as columns.
import { hashText } from '../base/hash.js';
import { isStopWord } from '../lexicon/stopWords.js';
import { BLOCK_KINDS, SourceCursor } from '../prose/prose.js';
import type { BlockContent, GlossaryPart, Prose, ProseBlock } from '../prose/prose.js';
import type { BlockTokens, LanguageProfile } from '../tokens/tokens.js';
import { findCodeWords } from './codeWords.js';
import { FactFlag } from './flags.js';
import { readGlossary } from './glossary.js';
import type { GlossaryEntry } from './glossary.js';

/** A link of the document: the tokens of its text and its target as written. */
export interface LinkFact {
  readonly firstToken: number;
  /** One after the last token. */
  readonly endToken: number;
  readonly target: string;
}

/**
 * The facts of one document in one language, a function of its text, format, the language that its path names and the engine's
 * version alone. A document with blocks in several languages has facts for each, of those blocks alone.
 * One row a token; `word` and `lemma` are indexes into `words`; `start` and `end` are UTF-16 offsets into the source.
 * Block `b` holds the tokens `[blockFirst[b], blockFirst[b + 1])`.
 */
export interface DocumentFacts {
  readonly language: string;
  readonly words: readonly string[];
  /** 1 for each of `words` that, spelled so, is a name in the document's code as well. */
  readonly inCode: Uint8Array;
  readonly word: Uint32Array;
  readonly lemma: Uint32Array;
  readonly tag: Uint8Array;
  readonly flags: Uint8Array;
  readonly zones: Uint16Array;
  readonly start: Uint32Array;
  readonly end: Uint32Array;
  readonly blockFirst: Uint32Array;
  readonly blockKind: Uint8Array;
  readonly blockLevel: Uint8Array;
  /** Identity of the block's prose: equal texts in equal zones have equal hashes, wherever they stand. */
  readonly blockHash: Float64Array;
  readonly links: readonly LinkFact[];
  /** Entries of glossaries, in order. */
  readonly glossary: readonly GlossaryEntry[];
}

/**
 * Gathers the facts of a document that a reader has read.
 * @param source the text that it was read from; without it no word is known to stand in code
 * @param isOwn whether a block (by its index) is in the profile's language; without it all are
 */
export function gatherFacts(
  prose: Prose,
  profile: LanguageProfile,
  source = '',
  isOwn: (block: number) => boolean = () => true,
): DocumentFacts {
  const blocks = prose.blocks.filter((_, index) => isOwn(index));
  const tokens = profile.tokens(blocks.map((block) => block.content));
  const facts = new FactsBuilder(
    profile.language,
    tokens.reduce((sum, block) => sum + block.start.length, 0),
    blocks.length,
  );
  blocks.forEach((block, index) => facts.add(block, tokens[index]!));
  if (source !== '') findCodeWords(prose, source, (word) => facts.addCodeWord(word));
  return facts.finish();
}

class FactsBuilder {
  private readonly localIds = new Map<string, number>();
  private readonly words: string[] = [];
  private readonly inCode = new Set<number>();
  private readonly isFunction: boolean[] = [];
  private readonly word: Uint32Array;
  private readonly lemma: Uint32Array;
  private readonly tag: Uint8Array;
  private readonly flags: Uint8Array;
  private readonly zones: Uint16Array;
  private readonly start: Uint32Array;
  private readonly end: Uint32Array;
  private readonly blockFirst: Uint32Array;
  private readonly blockKind: Uint8Array;
  private readonly blockLevel: Uint8Array;
  private readonly blockHash: Float64Array;
  private readonly links: LinkFact[] = [];
  private readonly parts: (GlossaryPart | undefined)[] = [];
  private row = 0;
  private block = 0;

  constructor(
    private readonly language: string,
    tokenCount: number,
    blockCount: number,
  ) {
    this.word = new Uint32Array(tokenCount);
    this.lemma = new Uint32Array(tokenCount);
    this.tag = new Uint8Array(tokenCount);
    this.flags = new Uint8Array(tokenCount);
    this.zones = new Uint16Array(tokenCount);
    this.start = new Uint32Array(tokenCount);
    this.end = new Uint32Array(tokenCount);
    this.blockFirst = new Uint32Array(blockCount + 1);
    this.blockKind = new Uint8Array(blockCount);
    this.blockLevel = new Uint8Array(blockCount);
    this.blockHash = new Float64Array(blockCount);
  }

  add(block: ProseBlock, tokens: BlockTokens): void {
    const { content } = block;
    const first = this.row;
    this.tag.set(tokens.tag, first);
    this.flags.set(tokens.flags, first);
    let mark = 0;
    const cursor = new SourceCursor(block);
    for (let i = 0; i < tokens.start.length; i++) {
      const start = tokens.start[i]!;
      const end = tokens.end[i]!;
      while (mark < content.marks.length && content.marks[mark]!.end <= start) mark++;
      const marked = content.marks[mark];
      const row = this.row++;
      this.zones[row] = content.zones | (marked !== undefined && marked.start < end ? marked.zones : 0);
      const word = this.localId(tokens.word[i]!);
      if (this.isFunction[word]) this.flags[row]! |= FactFlag.functionWord;
      this.word[row] = word;
      this.lemma[row] = this.localId(tokens.lemma[i]!);
      this.start[row] = cursor.start(start);
      this.end[row] = cursor.end(end);
    }
    this.addLinks(content, tokens, first);
    this.parts.push(content.glossary);
    this.blockKind[this.block] = BLOCK_KINDS.indexOf(content.kind);
    this.blockLevel[this.block] = content.level;
    this.blockHash[this.block] = hashOf(content);
    this.blockFirst[++this.block] = this.row;
  }

  addCodeWord(text: string): void {
    const id = this.localIds.get(text);
    if (id !== undefined) this.inCode.add(id);
  }

  finish(): DocumentFacts {
    const inCode = new Uint8Array(this.words.length);
    for (const id of this.inCode) inCode[id] = 1;
    const { words, word, lemma, tag, flags, zones, start, end, blockFirst, blockKind, blockLevel, blockHash, links } =
      this;
    return {
      language: this.language,
      words,
      inCode,
      word,
      lemma,
      tag,
      flags,
      zones,
      start,
      end,
      blockFirst,
      blockKind,
      blockLevel,
      blockHash,
      links,
      glossary: this.parts.some((part) => part !== undefined)
        ? readGlossary({ parts: this.parts, blockFirst, flags, wordAt: (token) => words[word[token]!]! })
        : [],
    };
  }

  private addLinks(content: BlockContent, tokens: BlockTokens, first: number): void {
    for (const link of content.links) {
      const from = tokens.start.findIndex((start) => start >= link.start);
      const past = tokens.start.findIndex((start) => start >= link.end);
      const until = past < 0 ? tokens.start.length : past;
      if (from >= 0 && from < until) {
        this.links.push({ firstToken: first + from, endToken: first + until, target: link.target });
      }
    }
  }

  private localId(text: string): number {
    let id = this.localIds.get(text);
    if (id === undefined) {
      id = this.words.length;
      this.localIds.set(text, id);
      this.words.push(text);
      this.isFunction.push(isStopWord(text.toLowerCase(), this.language));
    }
    return id;
  }
}

function hashOf(content: BlockContent): number {
  let zones = content.zones;
  for (const mark of content.marks) zones = Math.imul(zones ^ (mark.start * 31 + mark.end), 0x01000193) ^ mark.zones;
  return hashText(content.text, zones);
}
