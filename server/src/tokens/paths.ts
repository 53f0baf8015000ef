// Paths and addresses within running text: how far they reach, and how they differ from words with slashes between.
import { CharClass, classAt, isWordAt } from './charClass.js';

const AT = 0x40;
const PLUS = 0x2b;
const TILDE = 0x7e;

function isPathUnit(text: string, at: number): boolean {
  const found = classAt(text, at);
  if (found === CharClass.hyphen || found === CharClass.dot || found === CharClass.slash) return true;
  const unit = text.charCodeAt(at);
  return unit === AT || unit === PLUS || unit === TILDE || isWordAt(text, at);
}

/** The end of the stretch of path characters from an offset on, without trailing stops and hyphens. */
export function pathEnd(text: string, from: number, to: number): number {
  let end = from;
  while (end < to && isPathUnit(text, end)) end += classAt(text, end) === CharClass.pair ? 2 : 1;
  while (end > from + 1) {
    const last = classAt(text, end - 1);
    if (last !== CharClass.dot && last !== CharClass.hyphen) break;
    end--;
  }
  return end;
}

/** True where the stretch, which starts at `from` and has its first slash at `slash`, is a path: it ends in a slash, or has a stop, an underscore or an at sign among its letters. */
export function isPath(text: string, from: number, slash: number, end: number): boolean {
  if (end - slash >= 1 && classAt(text, end - 1) === CharClass.slash) return end - from >= 2;
  for (let at = from; at < end; at++) {
    const found = classAt(text, at);
    if (found === CharClass.underscore || text.charCodeAt(at) === AT) return true;
    if (found === CharClass.dot && at + 1 < end && isWordAt(text, at + 1)) return true;
  }
  return false;
}

/** The end of an address: the run's end without closing punctuation. */
export function trimmedEnd(text: string, from: number, to: number): number {
  let end = to;
  while (end > from && /[.,;:!?'"’”»)\]}>]/.test(text.charAt(end - 1))) end--;
  return end;
}
