// What a reader makes of a document: blocks of prose, each with its zones and an exact map back to the source.
import type { Span } from '../base/span.js';
import type { ZoneSet } from './zones.js';

/** What a block is in its document. The order is part of the facts' binary form: append only. */
export const BLOCK_KINDS = [
  'paragraph',
  'heading',
  'listItem',
  'tableCell',
  'caption',
  'definedTerm',
  'definition',
  'title',
  'description',
  'alternativeText',
] as const;
export type BlockKind = (typeof BLOCK_KINDS)[number];

/**
 * What a block is in a glossary, where its format says that there is one. An entry is one or more headwords and then what is
 * said of them, in the order of the document: its definition, the name that it sends the reader to (*see*), other names of it.
 */
export type GlossaryPart = 'headword' | 'definition' | 'see' | 'alsoCalled';

/** Stands in a block's text, one code unit each, for inline code, URLs, markup and other things that are no prose. */
export const OPAQUE = '\uFFFC';
const OPAQUE_UNIT = 0xfffc;

/** A stretch of a block's text that lies in further zones than the block itself; offsets into the block's text. */
export interface ZoneMark extends Span {
  readonly zones: ZoneSet;
}

/** A link whose text is `[start, end)` of the block's text; `target` is as written in the source. */
export interface LinkMark extends Span {
  readonly target: string;
}

/**
 * The prose of one block, independent of where the block stands: it can be kept while text above it changes.
 * `pieces` holds triples (offset in `text`, offset in the source from the block's start, length in the source), ascending
 * in the first two. A piece whose source is as long as its text runs in step with it, unit by unit; any other is a
 * substitute (an {@link OPAQUE} unit, a decoded character reference) and stands for its source as a whole.
 */
export interface BlockContent {
  readonly kind: BlockKind;
  /** The heading's level from 1, else 0. */
  readonly level: number;
  readonly text: string;
  readonly zones: ZoneSet;
  /** BCP 47 tag where the source gives this block a language of its own; else the document's holds. */
  readonly language?: string | undefined;
  readonly glossary?: GlossaryPart | undefined;
  /** Ascending, not overlapping. */
  readonly marks: readonly ZoneMark[];
  readonly links: readonly LinkMark[];
  readonly pieces: Uint32Array;
  /** Length of the source that the block covers, in UTF-16 units. */
  readonly sourceLength: number;
}

/** A block's content at its place: `start` is the source offset that the content's pieces count from. */
export interface ProseBlock {
  readonly start: number;
  readonly content: BlockContent;
}

/** Something a reader could not make sense of; reading goes on. */
export interface ReadingProblem {
  readonly span: Span;
  readonly message: string;
}

/** A document as its reader saw it; blocks in source order. */
export interface Prose {
  readonly blocks: readonly ProseBlock[];
  readonly problems: readonly ReadingProblem[];
  /** BCP 47 tag by the document's own statement, else undefined. */
  readonly language: string | undefined;
}

/** The source offset at which the text unit at `offset` begins. */
export function sourceStart(block: ProseBlock, offset: number): number {
  const { pieces, text } = block.content;
  if (pieces.length === 0) return block.start;
  const at = pieceAt(pieces, offset);
  return block.start + pieces[at + 1]! + (inStep(pieces, at, text) ? offset - pieces[at]! : 0);
}

/** The source offset at which a span of text that ends before `offset` ends. */
export function sourceEnd(block: ProseBlock, offset: number): number {
  const { pieces, text } = block.content;
  if (offset === 0 || pieces.length === 0) return sourceStart(block, 0);
  const at = pieceAt(pieces, offset - 1);
  return block.start + pieces[at + 1]! + (inStep(pieces, at, text) ? offset - pieces[at]! : pieces[at + 2]!);
}

/**
 * The same map for one walk through a block from its start to its end: offsets must not fall, and each step costs no search.
 */
export class SourceCursor {
  private at = 0;

  constructor(private readonly block: ProseBlock) {}

  /** {@link sourceStart} of an offset at or behind those asked before. */
  start(offset: number): number {
    const { pieces, text } = this.block.content;
    if (pieces.length === 0) return this.block.start;
    this.moveTo(offset);
    return this.block.start + pieces[this.at + 1]! + (inStep(pieces, this.at, text) ? offset - pieces[this.at]! : 0);
  }

  /** {@link sourceEnd} of an offset at or behind those asked before. */
  end(offset: number): number {
    const { pieces, text } = this.block.content;
    if (offset === 0 || pieces.length === 0) return sourceStart(this.block, 0);
    this.moveTo(offset - 1);
    const { at } = this;
    return this.block.start + pieces[at + 1]! + (inStep(pieces, at, text) ? offset - pieces[at]! : pieces[at + 2]!);
  }

  private moveTo(offset: number): void {
    const { pieces } = this.block.content;
    while (this.at + 3 < pieces.length && pieces[this.at + 3]! <= offset) this.at += 3;
  }
}

function inStep(pieces: Uint32Array, at: number, text: string): boolean {
  const textEnd = at + 3 < pieces.length ? pieces[at + 3]! : text.length;
  return textEnd - pieces[at]! === pieces[at + 2]! && text.charCodeAt(pieces[at]!) !== OPAQUE_UNIT;
}

/** Index into `pieces` of the triple that covers a text offset. */
export function pieceAt(pieces: Uint32Array, offset: number): number {
  let low = 0;
  let high = pieces.length / 3 - 1;
  while (low < high) {
    const middle = (low + high + 1) >>> 1;
    if (pieces[middle * 3]! <= offset) low = middle;
    else high = middle - 1;
  }
  return low * 3;
}
