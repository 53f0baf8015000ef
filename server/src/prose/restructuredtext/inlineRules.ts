// Where inline markup may begin and end (docutils, "Inline markup recognition rules").

const OPENING = /[\p{Ps}\p{Pi}\p{Pf}\p{Pd}\p{Po}]/u;
const CLOSING = /[\p{Pe}\p{Pi}\p{Pf}\p{Pd}\p{Po}]/u;
const BEFORE = flags('\'"([{<-/:');
const BEHIND = flags('\'")]}>-/\\:.,;!?');
const QUOTES: Readonly<Record<string, string>> = {
  '"': '"',
  "'": "'",
  '(': ')',
  '[': ']',
  '{': '}',
  '<': '>',
  '“': '”',
  '‘': '’',
  '«': '»',
  '„': '“',
};

function flags(marks: string): Uint8Array {
  const table = new Uint8Array(128);
  for (const mark of ` \t\n\f\v${marks}`) table[mark.charCodeAt(0)] = 1;
  return table;
}

/** True where inline markup may begin at `at`, by what stands before it. */
export function mayBegin(text: string, at: number): boolean {
  if (at === 0) return true;
  const unit = text.charCodeAt(at - 1);
  return unit < 128 ? BEFORE[unit] === 1 : isSpace(unit) || OPENING.test(text[at - 1]!);
}

/** True where inline markup may end before `at`, by what stands there. */
export function mayEnd(text: string, at: number): boolean {
  if (at >= text.length) return true;
  const unit = text.charCodeAt(at);
  return unit < 128 ? BEHIND[unit] === 1 : isSpace(unit) || CLOSING.test(text[at]!);
}

/** True where a mark `[at, end)` stands between quotation marks or brackets, and hence for itself. */
export function isQuoted(text: string, at: number, end: number): boolean {
  return at > 0 && end < text.length && QUOTES[text[at - 1]!] === text[end];
}

/** True for white space. */
export function isSpace(unit: number): boolean {
  return (
    unit === 32 || (unit >= 9 && unit <= 13) || unit === 0xa0 || (unit >= 0x2000 && unit <= 0x200a) || unit === 0x3000
  );
}

/** True where an odd number of backslashes stands before `at`. */
export function isEscaped(text: string, at: number): boolean {
  let from = at;
  while (from > 0 && text.charCodeAt(from - 1) === 92) from--;
  return (at - from) % 2 === 1;
}

const WORD = /[\p{L}\p{N}_]/u;

/** True for letters, digits and the low line. */
export function isWord(text: string, at: number): boolean {
  const unit = text.charCodeAt(at);
  if (unit < 128)
    return (unit >= 97 && unit <= 122) || (unit >= 65 && unit <= 90) || (unit >= 48 && unit <= 57) || unit === 95;
  return unit >= 128 && WORD.test(text[at]!);
}

/** Where the simple reference name begins that ends at `end`, or -1: words between single marks `-._+:`. */
export function nameStart(text: string, end: number, least: number): number {
  let at = end;
  while (at > least) {
    const before = at - 1;
    if (isWord(text, before) && text.charCodeAt(before) !== 95) at--;
    else if (
      at < end &&
      '-._+:'.includes(text[before]!) &&
      before > least &&
      isWord(text, before - 1) &&
      text.charCodeAt(before - 1) !== 95
    )
      at -= 2;
    else break;
  }
  return at < end ? at : -1;
}
