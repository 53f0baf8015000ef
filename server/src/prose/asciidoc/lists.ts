// The marks that begin an item of a list: bullets, numbers, callouts, and the terms of description lists.
import { isBlank, visibleStart, type Line } from './lines.js';

/** An item whose text begins at `start`; a described term stands in `[term.start, term.end)` before it. */
export interface ListMark {
  readonly start: number;
  readonly term: Line | undefined;
}

const ITEM = /(?:-|\*+|\u2022|\.+|\d+\.|[a-zA-Z]\.|[ivxIVX]+\)|<(?:\d+|\.)>)[ \t]+(?=\S)/y;
const CHECK = /\[[ xX*]\][ \t]+(?=\S)/y;
const COLON = 58;
const SEMICOLON = 59;

/** What a line begins if it is an item of a list, else undefined. */
export function listMark(text: string, line: Line): ListMark | undefined {
  const from = visibleStart(text, line);
  ITEM.lastIndex = from;
  const item = mayBeginItem(text, from) ? ITEM.exec(text) : null;
  if (!item) return termMark(text, from, line.end);
  let start = from + item[0].length;
  CHECK.lastIndex = start;
  const check = item[0][0] === '*' || item[0][0] === '-' ? CHECK.exec(text) : null;
  if (check) start += check[0].length;
  return { start, term: undefined };
}

/** False for most lines of prose, whose first word has more than one letter. */
function mayBeginItem(text: string, from: number): boolean {
  const unit = text.charCodeAt(from) | 32;
  if (unit < 97 || unit > 122) return true;
  const next = text.charCodeAt(from + 1) | 32;
  return next < 97 || unit === 105 || unit === 118 || unit === 120;
}

/** `term::`, `term:::`, `term::::` or `term;;`, with a blank or the line's end behind it. */
function termMark(text: string, from: number, end: number): ListMark | undefined {
  if (text.startsWith('//', from)) return undefined;
  for (let at = from + 1; at < end - 1; at++) {
    const unit = text.charCodeAt(at);
    if ((unit !== COLON && unit !== SEMICOLON) || text.charCodeAt(at + 1) !== unit) continue;
    let behind = at + 2;
    while (behind < end && text.charCodeAt(behind) === unit) behind++;
    const most = unit === COLON ? 4 : 2;
    if (behind - at > most) at = behind - most;
    if (behind >= end || isBlank(text.charCodeAt(behind))) {
      let start = behind;
      while (start < end && isBlank(text.charCodeAt(start))) start++;
      let termEnd = at;
      while (termEnd > from && isBlank(text.charCodeAt(termEnd - 1))) termEnd--;
      return { start, term: { start: from, end: termEnd } };
    }
    at = behind - 1;
  }
  return undefined;
}
