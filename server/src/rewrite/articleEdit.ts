// The article right before a replaced term: *an API key* becomes *a service key*.
import type { Span } from '../base/span.js';
import type { TextEdit } from '../text/edits.js';
import { articlesFor } from './article.js';

const BEFORE = /(?<![\p{L}\p{N}'’.\-_/\uFFFC])(an?)(\s+["“‘'(]?)$/iu;

/** The edit that the article before `span` needs once `replacement` stands there; none where the present one may stay. */
export function articleEdit(text: string, span: Span, replacement: string): TextEdit[] {
  const from = Math.max(0, span.start - 24);
  const match = BEFORE.exec(text.slice(from, span.start));
  if (!match) return [];
  const present = match[1]!;
  // "option A is", "vitamin A": a capital inside a sentence, before no new word of its own, is a name.
  if (present === 'A' && /[\p{L}\p{N}]\s+$/u.test(text.slice(0, from + match.index))) return [];
  const allowed = articlesFor(replacement);
  const wanted = allowed.find((article) => article === present.toLowerCase()) ?? allowed[0]!;
  if (wanted === present.toLowerCase()) return [];
  const start = from + match.index;
  return [{ span: { start, end: start + present.length }, newText: casedLike(present, wanted, replacement) }];
}

function casedLike(present: string, wanted: string, replacement: string): string {
  const capital = present.charAt(0) === 'A';
  if (!capital) return wanted;
  const shouting =
    present === 'AN' ||
    (present === 'A' && replacement.length > 1 && !/\p{Ll}/u.test(replacement) && /\s/.test(replacement));
  return shouting ? wanted.toUpperCase() : 'A' + wanted.slice(1);
}
