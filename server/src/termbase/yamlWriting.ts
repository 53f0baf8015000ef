// Writing small values as YAML: quotes only where they are needed or where the neighbours have them.

/** What an answer adds to the file: texts, numbers, lists of these and mappings of these. */
export type Value = string | number | readonly Value[] | { readonly [key: string]: Value };

/** How a text is quoted where plain would do. */
export type Quoting = 'plain' | 'single' | 'double';

/** The style of the place that is written to. */
export interface Style {
  /** For texts. */
  readonly quoting: Quoting;
  /** For keys. */
  readonly keyQuoting: Quoting;
  /** Whether lists inside a block mapping stand in brackets or on lines of their own. */
  readonly lists: 'flow' | 'block';
  /** Spaces from a dash to the text of its item. */
  readonly afterDash: number;
  /** Spaces from a key to the dashes of its list. */
  readonly beforeDash: number;
}

/** The style of a file that shows none. */
export const PLAIN_STYLE: Style = {
  quoting: 'plain',
  keyQuoting: 'plain',
  lists: 'flow',
  afterDash: 2,
  beforeDash: 2,
};

/** Characters that mean nothing to YAML wherever they stand after the first, in block and flow alike. */
const PLAIN_TEXT = /^[\p{L}_][\p{L}\p{M}\p{N}_ ./+()'&$%=*?^;-]*$/u;

/** Words that YAML 1.2 or, in older readers, YAML 1.1 takes for truth values or nothing. */
const TAKEN_WORDS = /^(?:y|yes|n|no|on|off|true|false|null)$/iu;

/** Writes one text on one line; it reads back as the same string in YAML 1.1 and 1.2, in block and in flow. */
export function writeText(text: string, quoting: Quoting): string {
  const plain = PLAIN_TEXT.test(text) && !TAKEN_WORDS.test(text) && !text.endsWith(' ');
  if (quoting === 'plain' && plain) return text;
  // Without unassigned or control characters a single-quoted text needs no escapes but its own quotes.
  if (quoting === 'single' && !/[\p{C}\p{Zl}\p{Zp}]/u.test(text)) return `'${text.replaceAll("'", "''")}'`;
  // JSON strings are YAML strings; the characters that only YAML counts as unprintable or as line breaks are escaped too.
  return JSON.stringify(text).replace(
    /[\u007f-\u009f\u2028\u2029\ufeff\ufffe\uffff]/gu,
    (character) => `\\u${character.charCodeAt(0).toString(16).padStart(4, '0')}`,
  );
}

/** Writes a value on one line, lists and mappings in brackets. */
export function writeFlow(value: Value, style: Style): string {
  if (typeof value === 'string') return writeText(value, style.quoting);
  if (typeof value === 'number') return String(value);
  if (isList(value)) return `[${value.map((item) => writeFlow(item, style)).join(', ')}]`;
  return `{${writePairs(value, style).join(', ')}}`;
}

function writePairs(map: { readonly [key: string]: Value }, style: Style): string[] {
  return Object.entries(map).map(([key, value]) => `${writeText(key, style.keyQuoting)}: ${writeFlow(value, style)}`);
}

/** Writes `key: value` as lines of a block mapping, without their indentation to the key's column. */
export function writePairLines(key: string, value: Value, style: Style): string[] {
  const name = `${writeText(key, style.keyQuoting)}:`;
  // Brackets are for lists of texts: a list of concepts or of groups always takes a line for each.
  if (!isList(value) || (style.lists === 'flow' && !value.some((item) => typeof item === 'object'))) {
    return [`${name} ${writeFlow(value, style)}`];
  }
  return [name, ...value.flatMap((item) => indented(writeItemLines(item, style), style.beforeDash))];
}

/** Writes one item of a block list, from its dash on, without the indentation to the dash's column. */
export function writeItemLines(item: Value, style: Style): string[] {
  const dash = '-'.padEnd(Math.max(2, style.afterDash));
  if (!isMap(item)) return [dash + writeFlow(item, style)];
  const lines = Object.entries(item).flatMap(([key, value]) => writePairLines(key, value, style));
  return lines.map((line, index) => (index === 0 ? dash : ' '.repeat(dash.length)) + line);
}

/** Moves lines to the right by a number of spaces. */
export function indented(lines: readonly string[], spaces: number): string[] {
  return lines.map((line) => ' '.repeat(spaces) + line);
}

function isList(value: Value): value is readonly Value[] {
  return Array.isArray(value);
}

function isMap(value: Value): value is { readonly [key: string]: Value } {
  return typeof value === 'object' && !Array.isArray(value);
}
