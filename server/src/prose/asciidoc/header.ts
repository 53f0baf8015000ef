// The header of a document: its title, and the lines of author and revision below it.
import { isGlossaryTitle } from '../glossary.js';
import { Zone } from '../zones.js';
import type { BlockReader } from './blocks.js';
import { attributeEntry, isAttributeLine, sectionTitle, type Line } from './lines.js';

/** A header: the index of the first line behind it, that of the last line looked at, and whether its title names a glossary. */
export interface Header {
  readonly behind: number;
  readonly looked: number;
  readonly isGlossary: boolean;
}

/** Reads the title and steps over the lines of author and revision below it; nothing where no title stands. */
export function readHeader(reader: BlockReader, text: string, lines: readonly Line[], from: number): Header {
  const to = lines.length;
  let at = from;
  while (at < to) {
    const line = lines[at]!;
    const next = line.start === line.end || isAttributeLine(text, line) ? at + 1 : reader.behindSilent(lines, at, to);
    if (next === at) break;
    at = next;
  }
  const title = at < to ? sectionTitle(text, lines[at]!) : undefined;
  if (title?.level !== 1) return { behind: from, looked: at, isGlossary: false };
  const isGlossary = isGlossaryTitle(text.slice(title.start, title.end));
  reader.add([title], { kind: 'heading', level: 1, zones: Zone.heading });
  at++;
  const header = (behind: number): Header => ({ behind, looked: at + 1, isGlossary });
  if (at >= to) return header(at);
  const first = written(text, lines[at]!);
  const entryFollows = at + 1 < to && attributeEntry(text, lines[at + 1]!) !== undefined;
  if (!AUTHORS.test(first) && !(entryFollows && /^[\p{L}\p{N}]/u.test(first))) return header(at);
  return header(at + 1 < to && REVISION.test(written(text, lines[at + 1]!)) ? at + 2 : at + 1);
}

/**
 * Up to three names and an address, for each author. Whatever else stands below a title begins the text, unless an attribute
 * entry follows: many a document is only ever included, where nobody expects an author.
 */
const AUTHORS = /^[\p{L}\p{N}_][^\s<>;]{0,60}(?: +[^\s<>;]{1,60}){0,2}(?: +<[^<>]{1,200}>)?(?:; |$)/u;
const REVISION = /^v?\d|^v?\{|^[\p{L} ]{0,20}\d[\d.]*, /u;

function written(text: string, line: Line): string {
  return text.slice(line.start, Math.min(line.end, line.start + 600));
}
