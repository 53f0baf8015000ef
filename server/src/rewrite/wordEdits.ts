// The smallest edits, word by word, that turn a stretch of text into a replacement; line breaks inside it stay.
import type { Span } from '../base/span.js';
import type { TextEdit } from '../text/edits.js';

/** Edits of the words at `span` that differ from the replacement's; where the numbers of words differ, one edit of the whole. */
export function wordEdits(text: string, span: Span, replacement: string): TextEdit[] {
  const surface = text.slice(span.start, span.end);
  const old = [...surface.matchAll(/\S+/g)];
  const now = replacement.split(/\s+/);
  if (surface === replacement) return [];
  if (old.length === now.length) {
    return old.flatMap((match, k) => {
      const start = span.start + match.index;
      return match[0] === now[k] ? [] : [{ span: { start, end: start + match[0].length }, newText: now[k]! }];
    });
  }
  // A wrapped line keeps its break: it is set at the first gap of the replacement that can take it.
  const broken = /\s*\n\s*/.exec(surface)?.[0];
  const newText = broken === undefined || now.length < 2 ? replacement : now[0]! + broken + now.slice(1).join(' ');
  return [{ span, newText }];
}
