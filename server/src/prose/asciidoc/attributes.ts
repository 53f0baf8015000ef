// The attribute lists in square brackets: what a block is by its style, and what a macro says of itself.

/** What the lines before a block say of it. */
export interface BlockAttributes {
  /** The first attribute by position, such as `source`, `NOTE`, `quote`; empty where there is none. */
  readonly style: string;
  /** The written list, for looking up named attributes. */
  readonly written: string;
}

/** Of a block that no line says anything of. */
export const NO_ATTRIBUTES: BlockAttributes = { style: '', written: '' };

/** Beyond this length no more of what is written is kept: each look costs its length. */
const LONGEST_WRITTEN = 4096;
const STYLE = /^[ "']*([\p{L}\p{N}_-]*)/u;

/** The attributes with those of one more line, given without its brackets. */
export function withAttributes(before: BlockAttributes, list: string): BlockAttributes {
  if (list.startsWith('[')) return before;
  const behind = /^\s*,\s*([^,=]*)/.exec(list);
  const first = STYLE.exec(list)![1]!;
  const named = list.startsWith('=', list.indexOf(first) + first.length);
  const implied = behind?.[1]?.trim() ? 'source' : '';
  const style = (named ? '' : first) || implied || before.style;
  if (before.written.length > LONGEST_WRITTEN) return { style, written: before.written };
  return { style, written: before.written === '' ? list : `${before.written},${list}` };
}

/** The value of a named attribute in a written list, or undefined. The last one counts. */
export function namedAttribute(written: string, name: string): string | undefined {
  let value: string | undefined;
  for (let at = written.indexOf(name); at >= 0; at = written.indexOf(name, at + 1)) {
    let i = at + name.length;
    while (written[i] === ' ') i++;
    if (written[i] !== '=' || (at > 0 && !/[\s,]/.test(written[at - 1]!))) continue;
    i++;
    while (written[i] === ' ') i++;
    const quote = written[i] === '"' || written[i] === "'" ? written[i]! : undefined;
    const end = written.indexOf(quote ?? ',', quote === undefined ? i : i + 1);
    value = written.slice(quote === undefined ? i : i + 1, end < 0 ? written.length : end);
  }
  return value;
}

/**
 * Where the first attribute by position lies in the list `[from, to)` of a macro, or undefined where there is none. A list
 * without `=` is one text as a whole unless `split`.
 */
export function firstPositional(
  text: string,
  from: number,
  to: number,
  split: boolean,
): { start: number; end: number } | undefined {
  let start = from;
  while (start < to && /\s/.test(text[start]!)) start++;
  let end = to;
  const list = text.slice(start, to);
  if (split || list.includes('=')) {
    const quote = list[0] === '"' ? list.indexOf('"', 1) : -1;
    if (quote > 0) {
      start++;
      end = start + quote - 1;
    } else {
      const comma = list.indexOf(',');
      if (comma >= 0) end = start + comma;
      if (/^[\p{L}_][\p{L}\p{N}_-]*\s*=/u.test(text.slice(start, Math.min(end, start + 80)))) return undefined;
    }
  }
  while (end > start && /\s/.test(text[end - 1]!)) end--;
  return start < end ? { start, end } : undefined;
}
