// Names of code: the words that a document has outside its prose, in inline code and blocks of code.
import { OPAQUE, SourceCursor } from '../prose/prose.js';
import type { Prose, ProseBlock } from '../prose/prose.js';

/**
 * Calls `found` with each name in the parts of a source that are no prose: what lies between the blocks (blocks of code,
 * front matter, markup) and what an opaque unit stands for within one (inline code). Names may come more than once. A name
 * is letters, then letters, digits and single hyphens; tags, comments to the end of a line, paths, addresses, options and
 * parts of snake_case names are left out. Takes time in step with the text's length.
 * @param text the source that the prose was read from
 */
export function findCodeWords(prose: Prose, text: string, found: (word: string) => void): void {
  let end = 0;
  for (const block of prose.blocks) {
    if (block.start > end) new CodeScanner(text, block.start, found).scan(end);
    if (block.content.text.includes(OPAQUE)) namesInOpaque(block, text, found);
    end = Math.max(end, block.start + block.content.sourceLength);
  }
  new CodeScanner(text, text.length, found).scan(end);
}

function namesInOpaque(block: ProseBlock, text: string, found: (word: string) => void): void {
  const cursor = new SourceCursor(block);
  const { text: prose } = block.content;
  for (let at = prose.indexOf(OPAQUE); at >= 0; at = prose.indexOf(OPAQUE, at + 1)) {
    const start = cursor.start(at);
    new CodeScanner(text, cursor.end(at + 1), found).scan(start);
  }
}

/** Kinds of ASCII units; all others are {@link OTHER}. */
const OTHER = 0;
const LETTER = 1;
const DIGIT = 2;
const JOINT = 3;
const BREAK = 4;
const KIND = new Uint8Array(128);
for (let unit = 0; unit <= 0x20; unit++) KIND[unit] = BREAK;
for (const sign of `"'\`<>(){}[],;=`) KIND[sign.charCodeAt(0)] = BREAK;
for (const sign of '-_') KIND[sign.charCodeAt(0)] = JOINT;
for (let unit = 0x30; unit <= 0x39; unit++) KIND[unit] = DIGIT;
for (let unit = 0x41; unit <= 0x5a; unit++) KIND[unit] = KIND[unit + 0x20] = LETTER;

const LINE_END = 0x0a;
const HASH = 0x23;
const HYPHEN = 0x2d;
const SLASH = 0x2f;
const LESS = 0x3c;

/** Walks through one stretch of code up to `end`, chunk by chunk: what stands between white space, quotes and brackets. */
class CodeScanner {
  /** The last place at which the end of a tag was looked for, and found. */
  private tagEnd = -1;

  constructor(
    private readonly text: string,
    private readonly end: number,
    private readonly found: (word: string) => void,
  ) {}

  scan(from: number): void {
    let at = from;
    while (at < this.end) {
      if (this.kind(at) === BREAK) at = this.afterTag(at);
      else if (this.isComment(at)) at = this.lineEnd(at);
      else at = this.chunk(at);
    }
  }

  /** Reads a chunk, which is a path or an address if it has a slash; returns its end. */
  private chunk(from: number): number {
    let end = from;
    let hasSlash = false;
    for (; end < this.end && this.kind(end) !== BREAK; end++) {
      if (this.text.charCodeAt(end) === SLASH) hasSlash = true;
    }
    if (!hasSlash) this.names(from, end);
    return end;
  }

  private names(from: number, until: number): void {
    const { text } = this;
    let at = from;
    while (at < until) {
      if (this.kind(at) !== LETTER) {
        at++;
        continue;
      }
      const start = at++;
      while (at < until && this.isInside(at, until)) at++;
      const joined = (start > from && this.kind(start - 1) === JOINT) || (at < until && this.kind(at) === JOINT);
      if (!joined) this.found(text.slice(start, at));
    }
  }

  private isInside(at: number, until: number): boolean {
    const kind = this.kind(at);
    if (kind === LETTER || kind === DIGIT) return true;
    const next = at + 1 < until ? this.kind(at + 1) : OTHER;
    return this.text.charCodeAt(at) === HYPHEN && (next === LETTER || next === DIGIT);
  }

  /** One unit on, or past a tag that begins here and ends on its line. */
  private afterTag(at: number): number {
    const { text } = this;
    if (text.charCodeAt(at) !== LESS || at + 1 >= this.end) return at + 1;
    if (this.kind(at + 1) !== LETTER && text.charCodeAt(at + 1) !== SLASH) return at + 1;
    if (this.tagEnd < at) {
      this.tagEnd = at + 1;
      while (this.tagEnd < this.end && !/[>\n]/.test(text[this.tagEnd]!)) this.tagEnd++;
    }
    return text[this.tagEnd] === '>' ? this.tagEnd + 1 : at + 1;
  }

  /** True where "# " or "// " begins a chunk. */
  private isComment(at: number): boolean {
    const { text } = this;
    const unit = text.charCodeAt(at);
    if (unit === HASH) return text.charCodeAt(at + 1) <= 0x20;
    return unit === SLASH && text.charCodeAt(at + 1) === SLASH && text.charCodeAt(at + 2) <= 0x20;
  }

  private lineEnd(from: number): number {
    let at = from;
    while (at < this.end && this.text.charCodeAt(at) !== LINE_END) at++;
    return at;
  }

  private kind(at: number): number {
    const unit = this.text.charCodeAt(at);
    return unit < 128 ? KIND[unit]! : OTHER;
  }
}
