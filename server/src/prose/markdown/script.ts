// Steps over JavaScript inside MDX to where it ends: brackets, strings, templates, comments; no more of the language is known.

/** Brackets nested deeper are taken for ones that nothing closes, and so are longer comments. */
const DEEPEST = 32;
const LONGEST_COMMENT = 8192;
const LETTER = /[\p{L}\p{N}_$]/u;
const BEFORE_REGEXP = '(,=:[!&|?{;';

/**
 * Says that what was looked for is not there, as a number less than 0. It depends on the text up to `at`; at the text's end or
 * behind it, on what may follow too.
 */
export function failure(at: number): number {
  return ~at;
}

/** How far the text was looked at before a {@link failure} showed. */
export function failedAt(result: number): number {
  return ~result;
}

/** The offset behind the braces that open at `from`, or a {@link failure} at the text's end where nothing closes them. */
export function expressionEnd(text: string, from: number): number {
  const open: string[] = [];
  for (let i = from; i < text.length;) {
    i = step(text, i, open);
    if (i < 0) return i;
    if (open.length === 0) return i;
  }
  return failure(text.length);
}

/** The end of the module code that begins at `from`: the first blank line outside brackets, or the end of the text; or a {@link failure}. */
export function moduleEnd(text: string, from: number): number {
  const open: string[] = [];
  let last = from;
  for (let i = from; i < text.length;) {
    if (open.length === 0 && text.charCodeAt(i) === 10) {
      if (isBlankLine(text, i + 1)) return last;
    }
    i = step(text, i, open);
    if (i < 0) return i;
    last = i;
  }
  return open.length === 0 ? text.length : failure(text.length);
}

function isBlankLine(text: string, at: number): boolean {
  while (at < text.length && (text[at] === ' ' || text[at] === '\t')) at++;
  return at >= text.length || text[at] === '\n';
}

/** Steps over one thing; `open` holds the opening signs that nothing has closed yet. */
function step(text: string, i: number, open: string[]): number {
  const top = open[open.length - 1];
  const sign = text[i]!;
  if (top === '`') return stepInTemplate(text, i, sign, open);
  switch (sign) {
    case '{':
    case '(':
    case '[':
    case '`':
      open.push(sign);
      return open.length > DEEPEST ? failure(text.length) : i + 1;
    case '}':
      // What is open inside braces does not outlive them: it was text of an element.
      while (open.length > 0 && open.pop() !== '{');
      return i + 1;
    case ')':
      if (top === '(') open.pop();
      return i + 1;
    case ']':
      if (top === '[') open.pop();
      return i + 1;
    case "'":
      return LETTER.test(text[i - 1] ?? '') ? i + 1 : stringEnd(text, i, sign);
    case '"':
      return stringEnd(text, i, sign);
    case '/':
      return slashEnd(text, i);
    default:
      return i + 1;
  }
}

function stepInTemplate(text: string, i: number, sign: string, open: string[]): number {
  if (sign === '\\') return i + 2;
  if (sign === '`') open.pop();
  else if (sign === '$' && text[i + 1] === '{') {
    open.push('{');
    return open.length > DEEPEST ? failure(text.length) : i + 2;
  }
  return i + 1;
}

/** Behind the string; behind its mark alone where the line ends first, since then it is an apostrophe in text. */
function stringEnd(text: string, from: number, mark: string): number {
  for (let i = from + 1; i < text.length; i++) {
    const sign = text[i];
    if (sign === mark) return i + 1;
    if (sign === '\\') i++;
    else if (sign === '\n') break;
  }
  return from + 1;
}

/** Behind a comment or a regular expression, else behind the slash. */
function slashEnd(text: string, i: number): number {
  const next = text[i + 1];
  if (next === '*') {
    const end = text.slice(i + 2, i + LONGEST_COMMENT).indexOf('*/');
    return end < 0 ? failure(text.length) : i + end + 4;
  }
  if (next === '/') {
    // In an address, or in text of an element, it is none.
    if (text[i - 1] === ':') return i + 2;
    const end = text.indexOf('\n', i);
    return end < 0 ? text.length : end;
  }
  let before = i - 1;
  while (before >= 0 && (text[before] === ' ' || text[before] === '\t')) before--;
  return before >= 0 && BEFORE_REGEXP.includes(text[before]!) ? regExpEnd(text, i) : i + 1;
}

function regExpEnd(text: string, from: number): number {
  let inClass = false;
  for (let i = from + 1; i < text.length; i++) {
    const sign = text[i];
    if (sign === '\n') break;
    if (sign === '\\') i++;
    else if (sign === '[') inClass = true;
    else if (sign === ']') inClass = false;
    else if (sign === '/' && !inClass) return i + 1;
  }
  return from + 1;
}
