// Web and mail addresses as they stand in text.

const LONGEST_SCHEME = 20;
const LONGEST_LOCAL_PART = 64;
const ADDRESS = flags("-_.!~*'()[];/:@&=+$,%#?{}");
const TRAILING = flags(".,:;!?)]}'");

function flags(marks: string): Uint8Array {
  const table = new Uint8Array(128);
  for (const mark of marks) table[mark.charCodeAt(0)] = 1;
  return table;
}

function isAlphanumeric(unit: number): boolean {
  return (unit >= 97 && unit <= 122) || (unit >= 65 && unit <= 90) || (unit >= 48 && unit <= 57);
}

/** Where the scheme begins whose colon is at `colon`, not before `least`, or -1: `https://`, `mailto:`. */
export function schemeStart(text: string, colon: number, least: number): number {
  const slashes = text.charCodeAt(colon + 1) === 47 && text.charCodeAt(colon + 2) === 47;
  if (slashes && !isAddressUnit(text.charCodeAt(colon + 3))) return -1;
  let at = colon;
  while (at > least && colon - at < LONGEST_SCHEME && isSchemeUnit(text.charCodeAt(at - 1))) at--;
  while (at < colon && !isLetter(text.charCodeAt(at))) at++;
  if (at === colon) return -1;
  return slashes || (text.slice(at, colon) === 'mailto' && isAddressUnit(text.charCodeAt(colon + 1))) ? at : -1;
}

function isLetter(unit: number): boolean {
  return (unit | 32) >= 97 && (unit | 32) <= 122;
}

function isSchemeUnit(unit: number): boolean {
  return isAlphanumeric(unit) || unit === 43 || unit === 45 || unit === 46;
}

function isAddressUnit(unit: number): boolean {
  return unit < 128 && (isAlphanumeric(unit) || ADDRESS[unit] === 1);
}

/** Where the address ends that goes on at `from`; punctuation at its end belongs to the sentence. */
export function addressEnd(text: string, from: number): number {
  let end = from;
  while (end < text.length && isAddressUnit(text.charCodeAt(end))) end++;
  while (end > from && TRAILING[text.charCodeAt(end - 1)] === 1) end--;
  return end;
}

/** Where the local part before the `@` at `at` begins, not before `least`, or -1. */
export function mailStart(text: string, at: number, least: number): number {
  let start = at;
  while (start > least && at - start <= LONGEST_LOCAL_PART && isMailUnit(text.charCodeAt(start - 1))) start--;
  return start < at && at - start <= LONGEST_LOCAL_PART ? start : -1;
}

/** Where the domain at `from` ends, or -1 where there is none. */
export function mailEnd(text: string, from: number): number {
  let end = from;
  while (end < text.length && (isAlphanumeric(text.charCodeAt(end)) || '-.'.includes(text[end]!))) end++;
  while (end > from && '-.'.includes(text[end - 1]!)) end--;
  return end > from ? end : -1;
}

function isMailUnit(unit: number): boolean {
  return isAlphanumeric(unit) || unit === 95 || unit === 43 || unit === 45 || unit === 46;
}
