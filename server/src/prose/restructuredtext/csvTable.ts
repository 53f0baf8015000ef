// The records of a `csv-table` directive, on lines of their own: fields between commas, which may be quoted.
import { Zone } from '../zones.js';
import { roleOf, type DocumentContext, type Setting } from './context.js';
import { readPhrase } from './leaf.js';
import { isBlank, type Lines } from './lines.js';

/** Reads each field as a cell. A quoted field that goes on over a line's end is read line by line. */
export function readRecords(cx: DocumentContext, lines: Lines, from: number, to: number, setting: Setting): void {
  const { text } = cx;
  const role = roleOf(setting, 'tableCell', Zone.tableCell);
  let quoted = false;
  for (let line = from; line < to; line++) {
    const lineEnd = lines.end[line]!;
    let start = lines.at[line]!;
    let fresh = !quoted;
    for (let at = start; at <= lineEnd; at++) {
      const unit = at < lineEnd ? text.charCodeAt(at) : 44;
      if (unit === 34 && (quoted || fresh)) {
        if (quoted && text.charCodeAt(at + 1) === 34) {
          at++;
          continue;
        }
        if (quoted) readPhrase(cx, start, at, role);
        else start = at + 1;
        if (quoted) start = at + 1;
        quoted = !quoted;
      } else if (unit === 44 && (!quoted || at === lineEnd)) {
        readPhrase(cx, start, trimmed(text, start, at), role);
        start = at + 1;
        fresh = true;
        while (start < lineEnd && isBlank(text.charCodeAt(start))) start++;
        if (start > at + 1) at = start - 1;
        continue;
      }
      fresh = false;
    }
  }
}

function trimmed(text: string, start: number, end: number): number {
  let to = end;
  while (to > start && isBlank(text.charCodeAt(to - 1))) to--;
  return to;
}
