// Quotations inside a block's text: four or more words between double quotation marks are somebody else's words.
import type { BlockContent, ZoneMark } from './prose.js';
import { Zone, type ZoneSet } from './zones.js';

/** Quoted words from which on a stretch counts as a quotation; fewer are usually a term. */
const QUOTATION_WORDS = 4;

const ANY_MARK = /["“„«]/;
const BEFORE_OPENING = /[\s([{—–/\-:,;'‘]/;
const AFTER_CLOSING = /[\s)\]}.,;:!?—–/\-'’]/;
const WORDS = /[\p{L}\p{N}]\S*/gu;
const OPENING = '"“„«';
const CLOSING: Partial<Record<string, string>> = { '“': '”', '„': '“”', '«': '»' };

/** The content with its inline quotations marked as {@link Zone.quotation}; the same object where it has none. */
export function markQuotations(content: BlockContent): BlockContent {
  if (!ANY_MARK.test(content.text)) return content;
  const found = quotations(content.text);
  if (found.length === 0) return content;
  let marks = content.marks;
  for (const { start, end } of found) marks = addZone(marks, start, end, Zone.quotation);
  return { ...content, marks };
}

function quotations(text: string): { start: number; end: number }[] {
  const found: { start: number; end: number }[] = [];
  /** Marks that nothing closes in the rest of the text. */
  let unclosed = '';
  for (let i = 0; i < text.length; i++) {
    const mark = text[i]!;
    if (!OPENING.includes(mark) || unclosed.includes(mark) || !opens(text, i, mark)) continue;
    const close = mark === '"' ? straightClose(text, i + 1) : closeOf(text, i + 1, CLOSING[mark]!);
    if (close < 0) {
      unclosed += mark;
      continue;
    }
    const inner = text.slice(i + 1, close);
    if ((inner.match(WORDS)?.length ?? 0) >= QUOTATION_WORDS) found.push({ start: i, end: close + 1 });
    i = close;
  }
  return found;
}

/** A straight mark opens a quotation where it stands before a word and not behind one; the others always do. */
function opens(text: string, i: number, mark: string): boolean {
  if (mark !== '"') return true;
  const before = text[i - 1];
  const after = text[i + 1];
  return (before === undefined || BEFORE_OPENING.test(before)) && after !== undefined && !/\s/.test(after);
}

/** The straight mark at or behind `from` that ends a quotation, or -1. */
function straightClose(text: string, from: number): number {
  for (let at = text.indexOf('"', from); at >= 0; at = text.indexOf('"', at + 1)) {
    const after = text[at + 1];
    const ends = after === undefined || AFTER_CLOSING.test(after);
    if (ends && !/\s/.test(text[at - 1]!)) return at;
  }
  return -1;
}

function closeOf(text: string, from: number, closers: string): number {
  for (let i = from; i < text.length; i++) if (closers.includes(text[i]!)) return i;
  return -1;
}

/** Marks with a zone added to `[start, end)`; marks that cross its edges are split. */
export function addZone(marks: readonly ZoneMark[], start: number, end: number, zone: ZoneSet): ZoneMark[] {
  const result: ZoneMark[] = [];
  let at = start;
  for (const mark of marks) {
    if (mark.end <= start || mark.start >= end) {
      if (mark.start >= end && at < end) {
        result.push({ start: at, end, zones: zone });
        at = end;
      }
      result.push(mark);
      continue;
    }
    if (mark.start < start) result.push({ ...mark, end: start });
    if (mark.start > at) result.push({ start: at, end: mark.start, zones: zone });
    const until = Math.min(mark.end, end);
    result.push({ start: Math.max(mark.start, start), end: until, zones: mark.zones | zone });
    if (mark.end > end) result.push({ ...mark, start: end });
    at = until;
  }
  if (at < end) result.push({ start: at, end, zones: zone });
  return result;
}
