// Inline markup of one block: what is text, what stands opaque in it, what vanishes (docutils, "Inline Markup").
import type { ContentBuilder } from '../content.js';
import { Zone } from '../zones.js';
import type { DocumentContext } from './context.js';
import { addressEnd, mailEnd, mailStart, schemeStart } from './addresses.js';
import { isEscaped, isQuoted, isSpace, isWord, mayBegin, mayEnd, nameStart } from './inlineRules.js';
import { JoinedText, type Joined } from './joined.js';
import { roleKind } from './roleKinds.js';
import { foldName } from './targets.js';

const NAME = '[\\p{L}\\p{N}]+(?:[-._+:][\\p{L}\\p{N}]+)*';
const ROLE = new RegExp(`:(${NAME}):`, 'yu');
const FOOTNOTE = new RegExp(`\\[(?:#(?:${NAME})?|\\*|${NAME})\\]_`, 'yu');

/** Units at which something may begin: in a block's text, and in the text of inline markup. */
const ANYWHERE = flags('*`|_[:\\@');
const IN_TEXT = flags(':\\@');
const IN_LABEL = flags(':\\@&');

function flags(marks: string): Uint8Array {
  const table = new Uint8Array(128);
  for (const mark of marks) table[mark.charCodeAt(0)] = 1;
  return table;
}

/** Reads a block's joined lines into the builder. */
export function readInline(cx: DocumentContext, joined: Joined, out: ContentBuilder): void {
  new InlineReader(cx, joined, out).scan(joined.text.length, ANYWHERE);
}

class InlineReader {
  private readonly text: string;
  private readonly joined: JoinedText;
  /** Start strings whose end string is nowhere in the rest of the text. */
  private readonly open = new Set<string>();

  constructor(
    private readonly cx: DocumentContext,
    joined: Joined,
    private readonly out: ContentBuilder,
  ) {
    this.text = joined.text;
    this.joined = new JoinedText(joined, out);
  }

  /** Reads from where the text has been written to, up to `end`. */
  scan(end: number, special: Uint8Array): void {
    const { text } = this;
    for (let i = this.joined.at; i < end;) {
      const unit = text.charCodeAt(i);
      if (unit > 127 || special[unit] === 0) i++;
      else i = Math.max(i + 1, Math.min(end, this.markup(i, unit, end)));
    }
    this.joined.write(end);
  }

  /** Reads what begins at `i`; where reading goes on. */
  private markup(i: number, unit: number, end: number): number {
    switch (unit) {
      case 92:
        return this.escape(i);
      case 42:
        return this.text.charCodeAt(i + 1) === 42 ? this.styled(i, '**') : this.styled(i, '*');
      case 96:
        return this.text.charCodeAt(i + 1) === 96 ? this.literal(i) : this.interpreted(i, i, '');
      case 124:
        return this.substitution(i);
      case 95:
        return this.reference(i);
      case 91:
        return this.footnote(i);
      case 58:
        return this.colon(i, end);
      case 64:
        return this.mail(i, end);
      default:
        // The mark of a label's access key.
        this.joined.write(i);
        this.joined.skip(i + 1);
        return this.text.charCodeAt(i + 1) === 38 ? i + 2 : i + 1;
    }
  }

  /** A backslash makes a mark text; before white space both vanish. */
  private escape(i: number): number {
    this.joined.write(i);
    const vanishes = i + 1 >= this.text.length || isSpace(this.text.charCodeAt(i + 1));
    this.joined.skip(Math.min(this.text.length, vanishes ? i + 2 : i + 1));
    return i + 2;
  }

  private begins(i: number, inner: number): boolean {
    const { text } = this;
    return mayBegin(text, i) && inner < text.length && !isSpace(text.charCodeAt(inner)) && !isQuoted(text, i, inner);
  }

  /** The place of the end string that closes what begins before `from`, or -1. `tail` gives the end of what it may carry. */
  private closing(kind: string, mark: string, from: number, tail: (at: number) => number): number {
    if (this.open.has(kind)) return -1;
    const { text } = this;
    for (let at = text.indexOf(mark, from + 1); at >= 0; at = text.indexOf(mark, at + 1)) {
      if (isSpace(text.charCodeAt(at - 1)) || (mark !== '``' && isEscaped(text, at))) continue;
      if (tail(at) >= 0) return at;
    }
    this.open.add(kind);
    return -1;
  }

  private bare(end: number): number {
    return mayEnd(this.text, end) ? end : -1;
  }

  private styled(i: number, mark: string): number {
    const inner = i + mark.length;
    if (!this.begins(i, inner)) return inner;
    const close = this.closing(mark, mark, inner, (at) => this.bare(at + mark.length));
    if (close < 0) return inner;
    this.inner(i, inner, close, close + mark.length, 0, IN_TEXT);
    return close + mark.length;
  }

  private literal(i: number): number {
    if (!this.begins(i, i + 2)) return i + 2;
    const close = this.closing('``', '``', i + 2, (at) => this.bare(at + 2));
    if (close < 0) return i + 2;
    return this.opaque(i, close + 2);
  }

  private substitution(i: number): number {
    if (this.text.charCodeAt(i + 1) === 124) return i + 2;
    if (!this.begins(i, i + 1)) return i + 1;
    const tail = (at: number): number => this.withReferenceMark(at + 1);
    const close = this.closing('|', '|', i + 1, tail);
    return close < 0 ? i + 1 : this.opaque(i, tail(close));
  }

  /** The end of `_`, `__` or nothing at `at` where markup may end behind it, or -1. */
  private withReferenceMark(at: number): number {
    let end = at;
    while (end < at + 2 && this.text.charCodeAt(end) === 95) end++;
    for (; end >= at; end--) if (mayEnd(this.text, end)) return end;
    return -1;
  }

  private opaque(from: number, to: number): number {
    this.joined.write(from);
    this.joined.opaque(to);
    return to;
  }

  /** Writes what stands before `from`, and `[inner, close)` in further zones; goes on at `to`. */
  private inner(from: number, inner: number, close: number, to: number, zones: number, special: Uint8Array): void {
    this.joined.write(from);
    this.joined.skip(inner);
    const before = this.out.currentZones;
    this.out.setZones(before | zones);
    this.scan(close, special);
    this.out.setZones(before);
    this.joined.skip(to);
  }

  private link(from: number, inner: number, close: number, to: number, target: string): void {
    this.joined.write(from);
    this.joined.skip(inner);
    const before = this.out.currentZones;
    this.out.setZones(before | Zone.linkText);
    const start = this.out.length;
    this.scan(close, IN_TEXT);
    this.out.link(start, target);
    this.out.setZones(before);
    this.joined.skip(to);
  }

  /** `name_`, `name__`, and the targets `` _`name` ``. */
  private reference(i: number): number {
    const { text } = this;
    if (text.charCodeAt(i + 1) === 96 && this.begins(i, i + 2)) {
      const close = this.closing('_`', '`', i + 2, (at) => this.bare(at + 1));
      if (close >= 0) {
        this.inner(i, i + 2, close, close + 1, 0, IN_TEXT);
        return close + 1;
      }
      return i + 2;
    }
    const end = text.charCodeAt(i + 1) === 95 ? i + 2 : i + 1;
    const start = mayEnd(text, end) ? nameStart(text, i, this.joined.at) : -1;
    if (start < 0 || !mayBegin(text, start) || (start > 0 && isWord(text, start - 1))) return end;
    this.link(start, start, i, end, this.targetOf(text.slice(start, i)));
    return end;
  }

  private targetOf(name: string): string {
    return this.cx.targets.get(foldName(name)) ?? name;
  }

  private footnote(i: number): number {
    if (!mayBegin(this.text, i)) return i + 1;
    FOOTNOTE.lastIndex = i;
    const match = FOOTNOTE.exec(this.text);
    if (!match || !mayEnd(this.text, i + match[0].length)) return i + 1;
    this.joined.write(i);
    this.joined.skip(i + match[0].length);
    return i + match[0].length;
  }

  /** A role before interpreted text, or the scheme of an address. */
  private colon(i: number, end: number): number {
    const { text } = this;
    if (end === text.length && mayBegin(text, i)) {
      ROLE.lastIndex = i;
      const match = ROLE.exec(text);
      const quote = match ? i + match[0].length : -1;
      if (match && text.charCodeAt(quote) === 96 && text.charCodeAt(quote + 1) !== 96) {
        return this.interpreted(i, quote, match[1]!.toLowerCase());
      }
    }
    const start = schemeStart(text, i, this.joined.at);
    return start < 0 ? i + 1 : this.opaque(start, Math.min(end, addressEnd(text, i + 1)));
  }

  private mail(i: number, end: number): number {
    const start = mailStart(this.text, i, this.joined.at);
    const stop = start < 0 ? -1 : mailEnd(this.text, i + 1);
    return stop < 0 || stop > end ? i + 1 : this.opaque(start, stop);
  }

  /** `` `text` ``, with a role before or behind it, or a reference's mark behind it. */
  private interpreted(from: number, quote: number, prefix: string): number {
    const { text } = this;
    const inner = quote + 1;
    if (!this.begins(from, inner)) return inner;
    const close = this.closing('`', '`', inner, (at) => this.behindQuote(at + 1));
    if (close < 0) return inner;
    const to = this.behindQuote(close + 1);
    const behind = text.slice(close + 1, to);
    if (behind.startsWith('_')) this.phrase(from, inner, close, to);
    else this.role(prefix || behind.slice(1, -1).toLowerCase(), from, inner, close, to);
    return to;
  }

  private behindQuote(at: number): number {
    if (this.text.charCodeAt(at) === 58) {
      ROLE.lastIndex = at;
      const match = ROLE.exec(this.text);
      if (match && mayEnd(this.text, at + match[0].length)) return at + match[0].length;
    }
    return this.withReferenceMark(at);
  }

  /** `` `text <target>`_ `` or `` `name`_ ``. */
  private phrase(from: number, inner: number, close: number, to: number): void {
    const parts = this.titleAndTarget(inner, close);
    if (!parts) this.link(from, inner, close, to, this.targetOf(this.text.slice(inner, close)));
    else if (parts.titleEnd <= inner) this.opaque(from, to);
    else this.link(from, inner, parts.titleEnd, to, this.aliased(parts.target));
  }

  /** The target between angle brackets; `name_` stands for what the name does. */
  private aliased(target: string): string {
    return target.endsWith('_') ? this.targetOf(target.slice(0, -1)) : target;
  }

  private titleAndTarget(inner: number, close: number): { titleEnd: number; target: string } | undefined {
    const { text } = this;
    if (text.charCodeAt(close - 1) !== 62) return undefined;
    const angle = text.lastIndexOf('<', close - 1);
    if (angle < inner || isEscaped(text, angle)) return undefined;
    let titleEnd = angle;
    while (titleEnd > inner && isSpace(text.charCodeAt(titleEnd - 1))) titleEnd--;
    return { titleEnd, target: text.slice(angle + 1, close - 1).replace(/\s+/g, ' ') };
  }

  private role(name: string, from: number, inner: number, close: number, to: number): void {
    const words = this.text.slice(inner, close);
    // Without a role a single word is most often meant as code.
    const kind = name === '' ? (/\s/.test(words) ? 'text' : 'code') : roleKind(name);
    const parts = kind === 'code' || kind === 'text' || kind === 'work' ? undefined : this.titleAndTarget(inner, close);
    switch (kind) {
      case 'text':
        this.inner(from, inner, close, to, 0, IN_TEXT);
        return;
      case 'work':
        this.inner(from, inner, close, to, Zone.quotation, IN_TEXT);
        return;
      case 'uiLabel':
        this.inner(from, inner, close, to, Zone.uiLabel, name === 'kbd' ? IN_TEXT : IN_LABEL);
        return;
      case 'definedTerm':
        this.inner(from, inner, close, to, Zone.definedTerm, IN_TEXT);
        return;
      default:
    }
    const titled = parts !== undefined && parts.titleEnd > inner;
    const read = titled && (kind !== 'object' || /\s/.test(this.text.slice(inner, parts.titleEnd)));
    if (read) this.link(from, inner, parts.titleEnd, to, parts.target);
    else if (kind === 'term') this.link(from, inner, close, to, words.replace(/\s+/g, ' '));
    else this.opaque(from, to);
  }
}
