// Inline content of one leaf block: what is text, what stands opaque in it, what vanishes.
import type { TreeCursor } from '@lezer/common';
import { decodeReference } from '../characterReferences.js';
import { ContentBuilder } from '../content.js';
import type { ProseBlock, ReadingProblem } from '../prose.js';
import { markQuotations } from '../quotations.js';
import { Zone } from '../zones.js';
import { bareTarget, foldLabel } from './definitions.js';
import { InlineHtml } from './inlineHtml.js';
import { attributeBlocks } from './jsxProse.js';
import { scanTag } from './jsxTag.js';
import { Role, ROLE_OF } from './roles.js';

const BROKEN = 'A tag or an expression begins here and does not end: the rest of the line is not read.';

/** What reading inline content needs to know of the document, and what it leaves behind. */
export interface InlineContext {
  /** The text that the tree was parsed from: as long as the source, with its odd characters replaced. */
  readonly text: string;
  /** Folded label → target. */
  readonly definitions: ReadonlyMap<string, string>;
  /** Blocks that lie in the block being read: images' alternative texts, attributes. */
  readonly inner: ProseBlock[];
  readonly problems: ReadingProblem[];
}

/** Reads the children of the cursor's node between `from` and `to` into the builder. The cursor comes back to its node. */
export function readInline(cx: InlineContext, cursor: TreeCursor, out: ContentBuilder, from: number, to: number): void {
  new InlineReader(cx, cursor, out, from, to).read();
}

class InlineReader {
  private at: number;
  private html: InlineHtml | undefined;

  constructor(
    private readonly cx: InlineContext,
    private readonly cursor: TreeCursor,
    private readonly out: ContentBuilder,
    from: number,
    private readonly end: number,
  ) {
    this.at = from;
  }

  read(): void {
    this.children(this.end);
    this.html?.close();
  }

  /** Reads the children of the cursor's node, and the text between and after them up to `end`. */
  private children(end: number): void {
    const { cursor } = this;
    if (cursor.firstChild()) {
      do {
        if (cursor.from >= end) break;
        if (cursor.to > this.at) this.node(cursor);
      } while (cursor.nextSibling());
      cursor.parent();
    }
    this.plain(end);
  }

  private node(cursor: TreeCursor): void {
    const { from, to } = cursor;
    const role = ROLE_OF[cursor.type.id];
    if (from < this.at) {
      // A hidden HTML element ended inside this node.
      if (role === Role.styled || role === Role.link) this.children(to);
      else this.at = to;
      return;
    }
    this.plain(from);
    switch (role) {
      case Role.styled:
        this.children(to);
        return;
      case Role.link:
        this.link(from, to);
        return;
      case Role.image:
        this.image(from, to);
        break;
      case Role.opaque:
      case Role.url:
        this.out.opaque(from, to);
        break;
      case Role.escape:
        this.out.substitute(this.cx.text.slice(from + 1, to), from, to);
        break;
      case Role.reference:
        this.reference(from, to);
        break;
      case Role.lineBreak:
        this.out.space(from, to);
        break;
      case Role.htmlTag:
        this.html ??= new InlineHtml(this.cx.text, this.out, this.end);
        this.at = this.html.tag(from, to);
        return;
      case Role.jsxTag:
        this.jsx(from);
        return;
      case Role.expression:
        this.expression(from, to);
        break;
      case Role.brokenInline:
        this.out.opaque(from, to);
        this.cx.problems.push({ span: { start: from, end: to }, message: BROKEN });
        break;
      default:
    }
    this.at = to;
  }

  private jsx(from: number): void {
    const { text } = this.cx;
    const tag = scanTag(text, from);
    if (typeof tag === 'number') return;
    for (const block of attributeBlocks(text, tag)) this.cx.inner.push(block);
    this.html ??= new InlineHtml(text, this.out, this.end);
    this.at = this.html.jsx(tag, from);
  }

  /** A comment vanishes, a blank in quotation marks is one, all else is code. */
  private expression(from: number, to: number): void {
    const body = this.cx.text.slice(from + 1, to - 1).trim();
    if (/^(["'`])\s+\1$/.test(body)) this.out.space(from, to);
    else if (!/^(?:\/\*[^]*\*\/)?$/.test(body)) this.out.opaque(from, to);
  }

  /** Text as written up to `to`. Line breaks and the blanks around them fold, and so do blanks at markup. */
  private plain(to: number): void {
    const { text } = this.cx;
    let at = this.at;
    if (to <= at) return;
    this.at = to;
    while (at < to) {
      let newline = text.indexOf('\n', at);
      if (newline < 0 || newline > to) newline = to;
      let start = at;
      while (start < newline && isBlank(text.charCodeAt(start))) start++;
      let end = newline;
      while (end > start && isBlank(text.charCodeAt(end - 1))) end--;
      // A hard break before `\r\n` reaches the parser as a backslash before a blank, and is none to it.
      if (newline < to && end > start && end < newline && text.charCodeAt(end - 1) === BACKSLASH) end--;
      if (start > at) this.out.space(at, start);
      this.out.run(start, end);
      at = newline < to ? newline + 1 : to;
      if (at > end) this.out.space(end, at);
    }
  }

  private reference(from: number, to: number): void {
    const decoded = decodeReference(this.cx.text.slice(from, to));
    if (decoded === undefined) this.out.run(from, to);
    else this.out.substitute(decoded, from, to);
  }

  /** `[text](target)`, `[text][label]`, `[label][]`, `[label]`; a footnote's mark vanishes. */
  private link(from: number, to: number): void {
    const { text } = this.cx;
    const inline = text.charCodeAt(to - 1) === 41;
    if (!inline && text.charCodeAt(from + 1) === 94) {
      this.at = to;
      return;
    }
    const parts = this.linkParts();
    const target = inline ? parts.target : this.cx.definitions.get(foldLabel(parts.label));
    if (target === undefined) {
      // Nothing defines the label, so the brackets are text.
      this.out.run(from, from + 1);
      this.at = from + 1;
      this.children(parts.textEnd);
      this.plain(to);
      return;
    }
    this.at = from + 1;
    const zones = this.out.currentZones;
    this.out.setZones(zones | Zone.linkText);
    const start = this.out.length;
    this.children(parts.textEnd);
    this.out.link(start, target);
    this.out.setZones((this.out.currentZones & ~Zone.linkText) | (zones & Zone.linkText));
    this.at = to;
  }

  private image(from: number, to: number): void {
    const parts = this.linkParts();
    const defined = this.cx.text.charCodeAt(to - 1) === 41 || this.cx.definitions.has(foldLabel(parts.label));
    if (!defined) {
      this.out.run(from, from + 2);
      this.at = from + 2;
      this.children(parts.textEnd);
      this.plain(to);
      return;
    }
    this.out.opaque(from, to);
    const start = from + 2;
    const builder = new ContentBuilder(this.cx.text, start);
    readInline(this.cx, this.cursor, builder, start, parts.textEnd);
    const role = { kind: 'alternativeText', level: 0, zones: Zone.alternativeText } as const;
    const content = builder.finish(role, parts.textEnd);
    if (content) this.cx.inner.push({ start, content: markQuotations(content) });
  }

  /** Where a link's or image's text ends, its inline target, and the label that it refers by. */
  private linkParts(): { textEnd: number; target: string | undefined; label: string } {
    const { cursor } = this;
    const { text } = this.cx;
    const { from, to } = cursor;
    let marks = 0;
    let textStart = from;
    let textEnd = to;
    let target = text.charCodeAt(to - 1) === 41 ? '' : undefined;
    let label: string | undefined;
    cursor.firstChild();
    do {
      const role = ROLE_OF[cursor.type.id];
      if (role === Role.linkMark && ++marks === 1) textStart = cursor.to;
      else if (role === Role.linkMark && marks === 2) textEnd = cursor.from;
      else if (role === Role.url && marks > 2) target = bareTarget(text.slice(cursor.from, cursor.to));
      else if (role === Role.linkLabel) label = text.slice(cursor.from + 1, cursor.to - 1);
    } while (cursor.nextSibling());
    cursor.parent();
    return { textEnd, target, label: label !== undefined && label !== '' ? label : text.slice(textStart, textEnd) };
  }
}

const BACKSLASH = 92;

function isBlank(unit: number): boolean {
  return unit === 32 || unit === 9;
}
