// The possessive ending behind a replaced term: *the keys'* and *the key's* go with the new word's last letter and number.
import type { Span } from '../base/span.js';
import type { TextEdit } from '../text/edits.js';

/** The edit of the ending behind `span`; none where the present ending fits. */
export function possessiveEdit(text: string, span: Span, surface: string, replacement: string): TextEdit[] {
  const after = text.slice(span.end, span.end + 3);
  const bare = /^['’](?![\p{L}\p{N}])/u.test(after);
  // "the process' exit" needs its s once the word no longer ends in one; "the criteria's" keeps its own.
  if (!bare || !/s$/i.test(surface) || /s$/i.test(replacement) || isQuoted(text, span)) return [];
  return [{ span: { start: span.end + 1, end: span.end + 1 }, newText: 's' }];
}

/** The apostrophe may be a closing quotation mark. */
function isQuoted(text: string, span: Span): boolean {
  return (
    /['‘](?=[^'’‘]*$)/.test(text.slice(0, span.start)) && !/[\p{L}]['’](?=[^'’‘]*$)/u.test(text.slice(0, span.start))
  );
}
