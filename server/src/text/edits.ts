// Edits of a text: replacements of spans, applied together.
import type { Span } from '../base/span.js';

/** Replaces `span` of the text before the edit by `newText`. */
export interface TextEdit {
  readonly span: Span;
  readonly newText: string;
}

/**
 * Applies edits whose spans refer to the same original text.
 * @throws RangeError where two edits overlap or one lies outside the text.
 */
export function applyEdits(text: string, edits: readonly TextEdit[]): string {
  const sorted = [...edits].sort((a, b) => a.span.start - b.span.start || a.span.end - b.span.end);
  const parts: string[] = [];
  let at = 0;
  for (const { span, newText } of sorted) {
    if (span.start < at || span.end < span.start || span.end > text.length) {
      throw new RangeError(`edit [${span.start}, ${span.end}) overlaps another or lies outside the text`);
    }
    parts.push(text.slice(at, span.start), newText);
    at = span.end;
  }
  parts.push(text.slice(at));
  return parts.join('');
}
