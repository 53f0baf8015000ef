// Quotations inside a block's text: four or more words between double quotation marks are somebody else's words.
import type { BlockContent, ZoneMark } from './prose.js';
import { Zone, type ZoneSet } from './zones.js';

/** Quoted words from which on a stretch counts as a quotation; fewer are usually a term. */
export const QUOTATION_WORDS = 4;

const ANY_MARK = /["“„«]/;
const BEFORE_OPENING = /[\s([{—–/\-:,;'‘]/;
const AFTER_CLOSING = /[\s)\]}.,;:!?—–/\-'’]/;
const WORDS = /[\p{L}\p{N}]\S*/gu;
const CLOSING: Record<string, string> = { '“': '”', '„': '“”', '«': '»' };

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
  for (let i = 0; i < text.length; i++) {
    const mark = text[i]!;
    let close = -1;
    if (mark === '"') {
      if (i === 0 || BEFORE_OPENING.test(text[i - 1]!)) close = straightClose(text, i + 1);
    } else {
      const closers = CLOSING[mark];
      if (closers !== undefined) close = closeOf(text, i + 1, closers);
    }
    if (close < 0) continue;
    const inner = text.slice(i + 1, close);
    if ((inner.match(WORDS)?.length ?? 0) >= QUOTATION_WORDS) found.push({ start: i, end: close + 1 });
    i = close;
  }
  return found;
}

/** The straight mark that ends a quotation that opened just before `from`, or -1. */
function straightClose(text: string, from: number): number {
  if (from >= text.length || /\s/.test(text[from]!)) return -1;
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
