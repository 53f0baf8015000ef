// Steps over ordinary prose in one go, so that the inline parsers are asked only where markup can begin.
import type { InlineContext } from '@lezer/markdown';

const SPECIAL = new Uint8Array(128);
for (const mark of '\\&`<_*![]~{$\n') SPECIAL[mark.charCodeAt(0)] = 1;
const SPACE = 32;
const COLON = 58;
const AT = 64;
const LONGEST_LOCAL_PART = 100;

/**
 * An inline parser's `parse` that consumes characters at which no markup can begin.
 * It returns the place where it stopped, or -1 where markup may begin at `pos` itself.
 */
export function parsePlainRun(cx: InlineContext, _next: number, pos: number): number {
  const { text, offset } = cx;
  const from = pos - offset;
  let i = from;
  for (; i < text.length; i++) {
    const unit = text.charCodeAt(i);
    if (unit > 127) continue;
    if (SPECIAL[unit] === 1) {
      if (unit !== 95) break;
      const local = localPartStart(text, i);
      if (local < 0 || local < from) break;
      if (local === from) return -1;
      return local + offset;
    }
    if (unit === SPACE) {
      let last = i;
      while (text.charCodeAt(last + 1) === SPACE) last++;
      if (text.charCodeAt(last + 1) === 10) break;
      i = last;
    } else if (unit === COLON) {
      const after = text.charCodeAt(i + 1);
      if (after >= 97 && after <= 122 && !isWord(text.charCodeAt(i - 1))) break;
    } else if (unit === AT) {
      const local = localPartStart(text, i);
      if (local === from) return -1;
      if (local > from) return local + offset;
    } else if (mayBeginLink(text, i, unit)) break;
  }
  return i > from ? i + offset : -1;
}

/** True where a bare link's scheme or `www.` begins (GFM, "Autolinks (extension)"). */
function mayBeginLink(text: string, i: number, unit: number): boolean {
  switch (unit) {
    case 104: // h
      return text.startsWith('http', i) && !isWord(text.charCodeAt(i - 1));
    case 119: // w
      return text.startsWith('www.', i) && !isWord(text.charCodeAt(i - 1));
    case 109: // m
      return text.startsWith('mailto:', i) && !isWord(text.charCodeAt(i - 1));
    case 120: // x
      return text.startsWith('xmpp:', i) && !isWord(text.charCodeAt(i - 1));
    default:
      return false;
  }
}

/** Where the local part of an e-mail address begins whose characters `at` lies in or right behind, or -1. */
function localPartStart(text: string, at: number): number {
  const sign = text.indexOf('@', at);
  if (sign < 0 || sign > at + LONGEST_LOCAL_PART) return -1;
  let end = at;
  while (end < text.length && end - at <= LONGEST_LOCAL_PART && isLocal(text.charCodeAt(end))) end++;
  if (text.charCodeAt(end) !== AT) return -1;
  let start = at;
  while (start > 0 && end - start <= LONGEST_LOCAL_PART && isLocal(text.charCodeAt(start - 1))) start--;
  return start < end ? start : -1;
}

function isLocal(unit: number): boolean {
  return isWord(unit) || unit === 43 || unit === 45 || unit === 46;
}

function isWord(unit: number): boolean {
  return (unit >= 97 && unit <= 122) || (unit >= 65 && unit <= 90) || (unit >= 48 && unit <= 57) || unit === 95;
}
