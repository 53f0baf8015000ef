// Writing HTML safely: a template in which every inserted text is escaped unless it is markup already.

/** A piece of finished markup. */
export class Markup {
  constructor(readonly html: string) {}
}

type Insert = Markup | string | number | readonly Insert[] | undefined | false;

/** Markup from a template. Texts are escaped for element content and quoted attributes; lists are joined; undefined and false vanish. */
export function html(parts: TemplateStringsArray, ...inserts: readonly Insert[]): Markup {
  let result = parts[0]!;
  inserts.forEach((insert, index) => (result += written(insert) + parts[index + 1]!));
  return new Markup(result);
}

function written(insert: Insert): string {
  if (insert === undefined || insert === false) return '';
  if (insert instanceof Markup) return insert.html;
  if (typeof insert === 'object') return insert.map(written).join('');
  return escapeHtml(String(insert));
}

/** Escapes text for element content and for quoted attributes; what HTML cannot hold (control characters) becomes U+FFFD. */
export function escapeHtml(text: string): string {
  return text
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;')
    .replace(/"/g, '&quot;')
    .replace(/'/g, '&#39;')
    .replace(NOT_IN_HTML, '\uFFFD');
}

/** Controls, noncharacters and lone surrogates: parse errors of the HTML standard. */
const NOT_IN_HTML = /[^\P{Cc}\t\n\f\r]|\p{Cs}|\p{Noncharacter_Code_Point}/gu;
