// The language that a document states in the field list at its top (docutils, "Bibliographic Fields").
import { textStart } from '../normalise.js';
import { isAdornment } from './markers.js';

const FIELD = /^:(?:lang|language): +([A-Za-z]{2}(?:[-_][A-Za-z0-9]{1,8})*)$/;
const MOST_LINES = 60;

/** The BCP 47 tag of a `:lang:` or `:language:` field in the list above the text, which only titles and comments stand above. */
export function docinfoLanguage(text: string): string | undefined {
  /** The lines since the last blank one: those of a title hold an adornment. */
  let title: string[] = [];
  let inFields = false;
  for (let at = textStart(text), line = 0; at < text.length && line < MOST_LINES; line++) {
    let end = text.indexOf('\n', at);
    if (end < 0) end = text.length;
    const written = text.slice(at, Math.min(end, at + 300)).trimEnd();
    at = end + 1;
    const field = written.startsWith(':');
    if (written === '' || field) {
      if (title.length > 0 && !title.some((one) => isAdornment(one, 0, one.length))) return undefined;
      title = [];
      if (inFields && !field) return undefined;
      inFields = field;
      const tag = field ? FIELD.exec(written)?.[1] : undefined;
      if (tag !== undefined) return tag.replaceAll('_', '-');
    } else if (!/^(?:\s|\.\.(?:\s|$))/.test(written)) {
      if (inFields) return undefined;
      title.push(written);
    }
  }
  return undefined;
}
