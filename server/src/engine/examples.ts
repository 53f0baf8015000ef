// Example sentences of a question, with file, line and the place of the term in the sentence.
import type { Span } from '../base/span.js';
import { overlaps } from '../base/span.js';
import type { Question, UsePlace } from '../mining/question.js';
import { sourceEnd, sourceStart } from '../prose/prose.js';
import type { ProseBlock } from '../prose/prose.js';
import type { Reading } from '../prose/read.js';
import { LineIndex } from '../text/lineIndex.js';
import type { SourcePlace } from './relations.js';
import type { Snapshot } from './snapshot.js';

/** Longer sentences are cut around the term, in UTF-16 units. */
const LONGEST_EXAMPLE = 240;

/** One use of a question's term. */
export interface Example {
  /** The term's text, as the question names it. */
  readonly term: string;
  readonly uri: string;
  /** Counted from 1. */
  readonly line: number;
  /** The sentence as a reader sees it, without markup, on one line. */
  readonly text: string;
  /** Where the term stands in `text`. */
  readonly highlight: Span;
  /** Where the term stands in the source. */
  readonly source: Span;
}

/** Finds example sentences; keeps what it has read, for as long as the finder lives. */
export class ExampleFinder {
  private readonly documents = new Map<string, { reading: Reading; lines: LineIndex }>();

  constructor(private readonly snapshot: Snapshot) {}

  /** The examples of a question, in the order of its places. */
  of(question: Question): Example[] {
    return question.places.flatMap((place) => this.example(question, place) ?? []);
  }

  /** The sentence around a use of a term; undefined where no block of the document holds the place. */
  at(term: string, { uri, span }: SourcePlace): Example | undefined {
    const document = this.document(uri);
    const block = document?.reading.prose.blocks.find((each) => holds(each, span));
    if (document === undefined || block === undefined) return undefined;
    const { text, highlight } = sentenceAround(block, span, document.reading.source.text);
    const line = document.lines.positionAt(span.start).line + 1;
    return { term, uri, line, text, highlight, source: span };
  }

  private example(question: Question, place: UsePlace): Example | undefined {
    const found = this.snapshot.relations.placeOf(question, place);
    return found && this.at(question.terms[place.term]!.text, found);
  }

  private document(uri: string): { reading: Reading; lines: LineIndex } | undefined {
    let known = this.documents.get(uri);
    if (known === undefined) {
      const reading = this.snapshot.readingOf(uri);
      if (reading === undefined) return undefined;
      known = { reading, lines: new LineIndex(reading.source.text) };
      this.documents.set(uri, known);
    }
    return known;
  }
}

function holds(block: ProseBlock, span: Span): boolean {
  return overlaps({ start: block.start, end: block.start + block.content.sourceLength }, span);
}

/** The sentence of a block that holds a span of the source, made readable on one line. */
function sentenceAround(block: ProseBlock, span: Span, source: string): { text: string; highlight: Span } {
  const { text } = block.content;
  const start = textOffset(block, span.start, sourceStart);
  const end = Math.max(start, textOffset(block, span.end, sourceEnd));
  let from = 0;
  let until = text.length;
  for (const { index, 0: mark } of text.matchAll(/[.!?:][)"”’]*\s+(?=[^\sa-z])/gu)) {
    if (index + mark.length <= start) from = index + mark.length;
    else if (index >= end) {
      until = index + mark.trimEnd().length;
      break;
    }
  }
  const before = readable(block, from, start, source).trimStart();
  const term = readable(block, start, end, source);
  const after = readable(block, end, until, source).trimEnd();
  const room = Math.max(40, (LONGEST_EXAMPLE - term.length) / 2);
  const cutBefore = before.length > room ? `… ${before.slice(before.indexOf(' ', before.length - room) + 1)}` : before;
  const lastSpace = after.lastIndexOf(' ', room);
  const cutAfter = after.length > room ? `${after.slice(0, lastSpace > 0 ? lastSpace : room)} …` : after;
  return {
    text: cutBefore + term + cutAfter,
    highlight: { start: cutBefore.length, end: cutBefore.length + term.length },
  };
}

/** The smallest text offset whose place in the source is at or past an offset of the source, by binary search. */
function textOffset(block: ProseBlock, source: number, place: (block: ProseBlock, offset: number) => number): number {
  let low = 0;
  let high = block.content.text.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if (place(block, middle) < source) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** A stretch of a block for reading: short inline code as it reads, other opaque things as …, white space folded. */
export function readable(block: ProseBlock, from: number, until: number, source: string): string {
  return block.content.text
    .slice(from, until)
    .replace(/\uFFFC/g, (_, at: number) => {
      const written = source.slice(sourceStart(block, from + at), sourceEnd(block, from + at + 1));
      return INLINE_CODE.exec(written)?.[2]?.trim() ?? '…';
    })
    .replace(/\s+/g, ' ');
}

/** Code of at most 40 units between backticks, as Markdown, reStructuredText and AsciiDoc write it. */
const INLINE_CODE = /^(`+)([^`\n]{1,40})\1$/;
