// Plain text in LaTeX: the units that mean themselves, and the addresses among them.

/** Units that can mean something else than themselves. */
const SPECIAL = new Uint8Array(128);
for (const unit of '\\{}$&%~#-`\'"] \t\n\f') SPECIAL[unit.charCodeAt(0)] = 1;

const SCHEME = /[A-Za-z][A-Za-z0-9+.]{0,20}$/;
const LOCAL_PART = /[\w.+]{1,64}$/;
const URL_REST = /(?:\\[_%#&~]|[^\s<>"'`|\\^{}$%])*/y;
const DOMAIN = /[A-Za-z0-9-]{1,63}(?:\.[A-Za-z0-9-]{1,63}){1,10}/y;
const TRAILING = '.,;:!?)]';

/** True where the unit at `at` means itself; so does a single blank between two that do. */
export function isPlainUnit(text: string, at: number): boolean {
  const unit = text.charCodeAt(at);
  if (unit > 127) return true;
  if (SPECIAL[unit] === 0) return true;
  if (unit !== 32 || at === 0) return false;
  const before = text.charCodeAt(at - 1);
  const after = text.charCodeAt(at + 1);
  return isLetterOrDigit(before) && isLetterOrDigit(after);
}

function isLetterOrDigit(unit: number): boolean {
  return unit > 127 || (unit >= 97 && unit <= 122) || (unit >= 65 && unit <= 90) || (unit >= 48 && unit <= 57);
}

/** The first address that begins in the plain text `[from, to)`; it can reach beyond its end. */
export function addressAt(text: string, from: number, to: number): { start: number; end: number } | undefined {
  for (let at = from; at < to; at++) {
    const unit = text.charCodeAt(at);
    if (unit === 58 && text.startsWith('://', at)) {
      const scheme = SCHEME.exec(text.slice(Math.max(from, at - 21), at))?.[0];
      const end = urlEnd(text, at + 3);
      if (scheme !== undefined && end > at + 3) return { start: at - scheme.length, end };
    } else if (unit === 64) {
      const local = LOCAL_PART.exec(text.slice(Math.max(from, at - 64), at))?.[0];
      DOMAIN.lastIndex = at + 1;
      if (local !== undefined && DOMAIN.test(text)) return { start: at - local.length, end: DOMAIN.lastIndex };
    } else if (
      unit === 119 &&
      text.startsWith('www.', at) &&
      (at === from || !isLetterOrDigit(text.charCodeAt(at - 1)))
    ) {
      const end = urlEnd(text, at + 4);
      if (end > at + 4) return { start: at, end };
    }
  }
  return undefined;
}

function urlEnd(text: string, from: number): number {
  URL_REST.lastIndex = from;
  URL_REST.exec(text);
  let end = URL_REST.lastIndex;
  while (end > from && TRAILING.includes(text[end - 1]!)) end--;
  return end;
}
