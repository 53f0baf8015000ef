// The shape of a word's letters: case, digits among letters, numbers with units.
import { CharClass, classAt } from './charClass.js';
import { UNITS } from './closedWords.js';

/** True where the unit at an offset is a capital letter. */
export function isUpper(text: string, at: number): boolean {
  const unit = text.charCodeAt(at);
  if (unit < 0x80) return unit >= 0x41 && unit <= 0x5a;
  const char = text.charAt(at);
  return char !== char.toLowerCase();
}

function isLower(text: string, at: number): boolean {
  const unit = text.charCodeAt(at);
  if (unit < 0x80) return unit >= 0x61 && unit <= 0x7a;
  const char = text.charAt(at);
  return char !== char.toUpperCase();
}

/** True where a capital follows a small letter within a part, or small letters other than a plural s follow two capitals. */
export function isCamel(text: string, from: number, to: number): boolean {
  let capitals = 0;
  let small = false;
  for (let at = from; at < to; at++) {
    if (isUpper(text, at)) {
      if (small) return true;
      capitals++;
    } else if (isLower(text, at)) {
      if (capitals >= 2 && !(text.charCodeAt(at) === 0x73 && (at + 1 === to || !isLower(text, at + 1)))) return true;
      small = true;
      capitals = 0;
    } else if (classAt(text, at) !== CharClass.mark && classAt(text, at) !== CharClass.invisible) {
      small = false;
      capitals = 0;
    }
  }
  return false;
}

/** True where a digit stands directly beside a letter, in other words than ordinals such as `2nd`. */
export function touchesDigit(text: string, from: number, to: number): boolean {
  if (/^\d+(?:st|nd|rd|th)$/i.test(text.slice(from, Math.min(to, from + 12)))) return false;
  for (let at = from + 1; at < to; at++) {
    const before = classAt(text, at - 1);
    const found = classAt(text, at);
    if (before === CharClass.letter && found === CharClass.digit) return true;
    if (before === CharClass.digit && found === CharClass.letter) return true;
  }
  return false;
}

/** True for a number with its unit: `10ms`, `1.5GB`. */
export function isQuantity(text: string, from: number, to: number): boolean {
  if (to - from > 24 || classAt(text, to - 1) !== CharClass.letter) return false;
  let at = to;
  while (at > from && classAt(text, at - 1) === CharClass.letter) at--;
  if (at === from || to - at > 5 || classAt(text, at - 1) !== CharClass.digit) return false;
  for (let k = from; k < at; k++) if (classAt(text, k) === CharClass.letter) return false;
  return text.charAt(at) !== 'D' && UNITS.has(text.slice(at, to).toLowerCase());
}
