// Values of text in YAML 1.2.2 and TOML 1.0, read into a block with exact offsets. Each returns the offset behind the value.
import type { ContentBuilder } from '../content.js';

const ESCAPES: Partial<Record<string, string>> = {
  '"': '"',
  '\\': '\\',
  '/': '/',
  n: ' ',
  t: ' ',
  r: ' ',
  _: ' ',
  N: ' ',
};
const BLANKS = /[ \t\n]+/y;

/** A string in double quotes, of one line or more; `"""` opens and closes one in TOML. */
export function readBasicString(text: string, from: number, end: number, out: ContentBuilder): number {
  const quotes = text.startsWith('"""', from) ? '"""' : '"';
  let at = from + quotes.length;
  while (at < end) {
    const next = text[at]!;
    if (text.startsWith(quotes, at)) return at + quotes.length;
    if (next === '\\') at = readEscape(text, at, end, out);
    else at = readUntil(text, at, end, /["\\]/g, out);
    if (text[at] === '"' && quotes === '"""' && !text.startsWith(quotes, at)) {
      out.run(at, at + 1);
      at++;
    }
  }
  return end;
}

function readEscape(text: string, at: number, end: number, out: ContentBuilder): number {
  const letter = text[at + 1] ?? '';
  const digits = letter === 'x' ? 2 : letter === 'u' ? 4 : letter === 'U' ? 8 : 0;
  const to = Math.min(at + 2 + digits, end);
  if (digits > 0) {
    const code = Number.parseInt(text.slice(at + 2, to), 16);
    const known = code >= 0x20 && code <= 0x10ffff && !(code >= 0xd800 && code <= 0xdfff);
    if (known) out.substitute(String.fromCodePoint(code), at, to);
    else out.opaque(at, to);
    return to;
  }
  const simple = ESCAPES[letter];
  if (letter === '\n' || simple === ' ') out.space(at, to);
  else if (simple !== undefined) out.substitute(simple, at, to);
  else out.opaque(at, to);
  return to;
}

/** A string in single quotes; in YAML two of them stand for one, in TOML `'''` opens and closes one of several lines. */
export function readLiteralString(text: string, from: number, end: number, out: ContentBuilder, yaml: boolean): number {
  const quotes = !yaml && text.startsWith("'''", from) ? "'''" : "'";
  let at = from + quotes.length;
  while (at < end) {
    if (yaml && text.startsWith("''", at)) {
      out.substitute("'", at, at + 2);
      at += 2;
    } else if (text.startsWith(quotes, at)) return at + quotes.length;
    else if (text[at] === "'") {
      out.run(at, at + 1);
      at++;
    } else at = readUntil(text, at, end, /'/g, out);
  }
  return end;
}

/** A scalar without quotes: to the end of its line or a comment, and on over lines that are indented. */
export function readPlainScalar(text: string, from: number, end: number, out: ContentBuilder): number {
  let at = from;
  for (;;) {
    const lineEnd = Math.min(endOfLine(text, at), end);
    const line = text.slice(at, lineEnd);
    const comment = /(?:^|[ \t])#/.exec(line);
    readUntil(text, at, comment ? at + comment.index : lineEnd, undefined, out);
    const next = lineEnd + 1;
    if (comment || next >= end || !/^[ \t]+\S/.test(text.slice(next, endOfLine(text, next))))
      return Math.min(next, end);
    out.space(lineEnd, next);
    at = next;
  }
}

/** A block scalar, `|` or `>`: the lines below that are indented or blank. */
export function readBlockScalar(text: string, from: number, end: number, out: ContentBuilder): number {
  let at = endOfLine(text, from) + 1;
  while (at < end) {
    const lineEnd = Math.min(endOfLine(text, at), end);
    if (!/^[ \t]|^$/.test(text.slice(at, lineEnd))) break;
    readUntil(text, at, lineEnd, undefined, out);
    out.space(lineEnd, Math.min(lineEnd + 1, end));
    at = lineEnd + 1;
  }
  return Math.min(at, end);
}

/** Reads words and folds blanks and line breaks up to `end` or the stop; returns where it stopped. */
function readUntil(text: string, from: number, end: number, stop: RegExp | undefined, out: ContentBuilder): number {
  let to = end;
  if (stop) {
    stop.lastIndex = from;
    const found = stop.exec(text.slice(0, end));
    if (found) to = found.index;
  }
  for (let at = from; at < to;) {
    BLANKS.lastIndex = at;
    const blanks = BLANKS.exec(text);
    if (blanks) {
      const blanksEnd = Math.min(at + blanks[0].length, to);
      out.space(at, blanksEnd);
      at = blanksEnd;
    }
    let word = at;
    while (word < to && !/[ \t\n]/.test(text[word]!)) word++;
    out.run(at, word);
    at = word;
  }
  return to;
}

function endOfLine(text: string, at: number): number {
  const end = text.indexOf('\n', at);
  return end < 0 ? text.length : end;
}
