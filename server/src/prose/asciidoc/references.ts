// Attribute references: `{name}` stands for something set elsewhere; some names stand for a character in every document.

/** Names that AsciiDoc itself defines ("Character replacement attributes"), with what they stand for. */
const CHARACTERS: Partial<Record<string, string>> = {
  empty: '',
  blank: '',
  zwsp: '',
  wj: '',
  sp: ' ',
  nbsp: '\u00A0',
  apos: "'",
  quot: '"',
  lsquo: '‘',
  rsquo: '’',
  ldquo: '“',
  rdquo: '”',
  deg: '°',
  plus: '+',
  brvbar: '¦',
  vbar: '|',
  amp: '&',
  lt: '<',
  gt: '>',
  startsb: '[',
  endsb: ']',
  caret: '^',
  asterisk: '*',
  tilde: '~',
  backslash: '\\',
  backtick: '`',
  'two-colons': '::',
  'two-semicolons': ';;',
};

const REFERENCE = /\{(?:(?:counter2?|set):[^{}\n]{1,200}|[\p{L}\p{N}_][\p{L}\p{N}_-]*)\}/uy;

/** Where the reference that begins at `at` ends and the text that it is known to stand for, or undefined. */
export function attributeReference(text: string, at: number): { end: number; stands: string | undefined } | undefined {
  REFERENCE.lastIndex = at;
  const found = REFERENCE.exec(text);
  if (!found) return undefined;
  const name = found[0].slice(1, -1);
  return { end: at + found[0].length, stands: Object.hasOwn(CHARACTERS, name) ? CHARACTERS[name] : undefined };
}
