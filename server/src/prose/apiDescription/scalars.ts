// Strings of YAML 1.2.2 and JSON (RFC 8259) decoded with a map to their source.
import { EmbeddedBuilder, type Embedded } from '../embedded.js';

/** How a string is written. */
export type ScalarStyle = 'plain' | 'single' | 'double' | 'literal' | 'folded';

const ESCAPES: Partial<Record<string, string>> = {
  ...{ '0': '\uFFFD', a: '\u0007', b: '\b', t: '\t', '\t': '\t', n: '\n', v: '\v', f: '\f', r: '\r', e: '\u001B' },
  ...{ ' ': ' ', '"': '"', '/': '/', '\\': '\\', N: '\u0085', _: '\u00A0', L: '\u2028', P: '\u2029' },
};

/**
 * The text of a string at `[from, to)` of the source, quotation marks included; of a block scalar, its lines without the
 * header. Line breaks are `\n`. Blanks at the ends of lines and blank lines at the end of a
 * block scalar are left out, whatever its header says of them.
 * @param indent of a block scalar whose header gives one, the number of blanks that each line begins with
 */
export function decodeScalar(text: string, from: number, to: number, style: ScalarStyle, indent?: number): Embedded {
  const out = new EmbeddedBuilder(text);
  if (style === 'literal' || style === 'folded') decodeBlock(text, from, to, style === 'folded', indent, out);
  else if (style === 'plain') decodeFlow(text, from, to, style, out);
  else decodeFlow(text, from + 1, Math.max(from + 1, text[to - 1] === text[from] ? to - 1 : to), style, out);
  return out.finish();
}

/** A string that may go on over lines: a line break is a blank, n blank lines are n line breaks (YAML 1.2.2, § 6.5). */
function decodeFlow(text: string, from: number, to: number, style: ScalarStyle, out: EmbeddedBuilder): void {
  let at = from;
  while (at < to) {
    const stop = nextStop(text, at, to, style);
    if (stop < to && text[stop] === '\n') {
      const end = textEnd(text, at, stop);
      out.run(at, end);
      at = fold(text, end, to, out);
      continue;
    }
    out.run(at, stop);
    if (stop >= to) return;
    at = style === 'single' ? decodeQuote(text, stop, out) : decodeEscape(text, stop, to, out);
  }
}

function nextStop(text: string, from: number, to: number, style: ScalarStyle): number {
  for (let at = from; at < to; at++) {
    const unit = text[at]!;
    if (unit === '\n' || (style === 'double' && unit === '\\') || (style === 'single' && unit === "'")) return at;
  }
  return to;
}

function decodeQuote(text: string, at: number, out: EmbeddedBuilder): number {
  const end = at + (text[at + 1] === "'" ? 2 : 1);
  out.substitute("'", at, end);
  return end;
}

function decodeEscape(text: string, at: number, to: number, out: EmbeddedBuilder): number {
  const letter = text[at + 1] ?? '';
  if (letter === '\n') return skipBlanks(text, at + 2, to);
  const digits = letter === 'x' ? 2 : letter === 'u' ? 4 : letter === 'U' ? 8 : 0;
  const end = Math.min(at + 2 + digits, to);
  const code = Number.parseInt(text.slice(at + 2, end), 16);
  const decoded = digits === 0 ? ESCAPES[letter] : code <= 0x10ffff ? String.fromCodePoint(code) : undefined;
  out.substitute(decoded ?? '\uFFFD', at, end);
  return end;
}

/** Folds a line break, with the blanks around it and the blank lines behind it; returns where the next line's text begins. */
function fold(text: string, from: number, to: number, out: EmbeddedBuilder): number {
  let breaks = 0;
  let at = from;
  for (;;) {
    at = skipBlanks(text, at, to);
    if (text[at] !== '\n' || at >= to) break;
    breaks++;
    at++;
  }
  out.substitute(breaks === 1 ? ' ' : '\n'.repeat(breaks - 1), from, at);
  return at;
}

/** The end of a line's text before the blanks at its end. */
function textEnd(text: string, from: number, lineEnd: number): number {
  let end = lineEnd;
  while (end > from && (text[end - 1] === ' ' || text[end - 1] === '\t')) end--;
  return end;
}

function skipBlanks(text: string, from: number, to: number): number {
  let at = from;
  while (at < to && (text[at] === ' ' || text[at] === '\t')) at++;
  return at;
}

/** The lines of a block scalar without their indentation; folded, where that is asked for (YAML 1.2.2, § 8.1.3). */
function decodeBlock(
  text: string,
  from: number,
  to: number,
  folded: boolean,
  given: number | undefined,
  out: EmbeddedBuilder,
): void {
  let indent = given ?? -1;
  let blankLines = 0;
  let behind = from;
  let wasSpaced: boolean | undefined;
  for (let at = from; at < to;) {
    const found = text.indexOf('\n', at);
    const lineEnd = found < 0 || found > to ? to : found;
    let blanks = at;
    while (blanks < lineEnd && text[blanks] === ' ') blanks++;
    if (indent < 0 && blanks < lineEnd) indent = blanks - at;
    const start = Math.min(indent < 0 ? blanks : at + indent, lineEnd);
    const end = textEnd(text, start, lineEnd);
    if (start >= lineEnd) blankLines++;
    else {
      const spaced = text[start] === ' ' || text[start] === '\t';
      const kept = !folded || spaced || wasSpaced === true;
      const breaks = wasSpaced === undefined ? blankLines : kept ? blankLines + 1 : blankLines;
      out.substitute(breaks === 0 && wasSpaced !== undefined ? ' ' : '\n'.repeat(breaks), behind, start);
      out.run(start, end);
      [wasSpaced, blankLines, behind] = [spaced, 0, end];
    }
    at = lineEnd + 1;
  }
}
