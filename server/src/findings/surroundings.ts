// Whether a match stands in running text as a word of its own, or is part of an identifier, a path, a name or a longer compound.

const OPAQUE = '\uFFFC';
const NAME_BEFORE = /[@#$%\\/~=&?<{:.\uFFFC]/;
const NAME_AFTER = /[\\/=@[*+#%<>{™®©℠\uFFFC]/;
const LETTER = /[\p{L}\p{N}]/u;
const HYPHEN = /[-\u2010\u2011]/;

/** Second parts that leave the first part a term of its own: *API key-based*. */
const COMPOUND_TAIL =
  /^(?:based|like|specific|only|level|aware|side|wide|style|driven|related|compatible|enabled|managed|free|ready)\b/i;

/** True where the text around `[start, end)` lets the match be that term. `term` is its base form. */
export function standsAlone(text: string, start: number, end: number, term: string): boolean {
  return isFreeBefore(text, start) && isFreeAfter(text, end, term) && isPlainlyCased(text.slice(start, end), term);
}

function isFreeBefore(text: string, start: number): boolean {
  const before = text.charAt(start - 1);
  const further = text.charAt(start - 2);
  if (start === 0 || /\s/.test(before)) return true;
  if (NAME_BEFORE.test(before) && before !== '.') return false;
  // Three dots may run into a word; a single one makes it a file's extension or a member.
  if (before === '.') return further === '.';
  if (HYPHEN.test(before)) return before === '-' && further === '-' && LETTER.test(text.charAt(start - 3));
  if (/['’]/.test(before)) return !LETTER.test(further);
  return true;
}

function isFreeAfter(text: string, end: number, term: string): boolean {
  const after = text.charAt(end);
  if (after === '' || /\s/.test(after))
    return !/^\s?\((?:TM|R|C|SM)\)|^\s+(?:==?|:=|=>)\s/.test(text.slice(end, end + 6));
  const further = text.charAt(end + 1);
  if (NAME_AFTER.test(after)) return false;
  if (after === '.' || after === ':')
    return (
      !(LETTER.test(further) || further === after || further === '/' || further === OPAQUE) || isEllipsis(text, end)
    );
  if (after === '(') return /^\((?:s|es)\)/.test(text.slice(end, end + 4));
  if (HYPHEN.test(after)) {
    if (!LETTER.test(further)) return true;
    return /\s/.test(term) && COMPOUND_TAIL.test(text.slice(end + 1, end + 14));
  }
  if (/['’]/.test(after) && LETTER.test(further)) return /^['’]s(?![\p{L}\p{N}])/u.test(text.slice(end, end + 4));
  return true;
}

function isEllipsis(text: string, end: number): boolean {
  return text.startsWith('...', end);
}

/** False for camelCase and the like, unless the term itself is written so. */
function isPlainlyCased(surface: string, term: string): boolean {
  for (const [word] of surface.matchAll(/[\p{L}\p{M}\p{N}]+/gu)) {
    if (/^\p{Lu}?[^\p{Lu}]*$/u.test(word) || /^[^\p{Ll}]+(?:s|es)?$/u.test(word)) continue;
    if (!term.includes(word.replace(/(?:es|s)$/, ''))) return false;
  }
  return true;
}
