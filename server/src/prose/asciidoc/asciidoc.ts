// Reads AsciiDoc: the document's title, then its blocks.
import type { SourceText } from '../../text/sourceText.js';
import { readFrontMatter } from '../markdown/frontMatter.js';
import { normalise } from '../normalise.js';
import { keepContents, type Reading } from '../reading.js';
import { Zone } from '../zones.js';
import { BlockReader } from './blocks.js';
import { attributeEntry, isAttributeLine, linesOf, sectionTitle, type Line } from './lines.js';

/**
 * Reads an AsciiDoc document by its lines, after the AsciiDoc documentation (docs.asciidoctor.org/asciidoc). Every branch of a
 * preprocessor conditional is read; included files are documents of their own; attribute references stay opaque.
 */
export function readAsciidoc(source: SourceText): Reading {
  const text = normalise(source.text);
  const textStart = text.charCodeAt(0) === 0xfeff ? 1 : 0;
  const frontMatter = readFrontMatter(text, textStart);
  const lines = linesOf(text, frontMatter?.end ?? textStart);
  const reader = new BlockReader(text);
  if (frontMatter) reader.blocks.push(...frontMatter.blocks);
  const body = readHeader(reader, text, lines);
  reader.read(lines, body, lines.length, { zones: Zone.prose, kind: 'paragraph', depth: 0 });
  const language = frontMatter?.language ?? reader.language;
  return { source, prose: { blocks: reader.blocks, problems: reader.problems, language } };
}

/** Reads again; equal blocks at either end keep their content objects. */
export function rereadAsciidoc(previous: Reading, source: SourceText): Reading {
  const reading = readAsciidoc(source);
  return { source, prose: { ...reading.prose, blocks: keepContents(previous.prose.blocks, reading.prose.blocks) } };
}

/** Reads the title and steps over the lines of author and revision below it; the index of the first line behind them. */
function readHeader(reader: BlockReader, text: string, lines: readonly Line[]): number {
  const to = lines.length;
  let at = 0;
  while (at < to) {
    const line = lines[at]!;
    const next = line.start === line.end || isAttributeLine(text, line) ? at + 1 : reader.behindSilent(lines, at, to);
    if (next === at) break;
    at = next;
  }
  const title = at < to ? sectionTitle(text, lines[at]!) : undefined;
  if (title?.level !== 1) return 0;
  reader.add([title], { kind: 'heading', level: 1, zones: Zone.heading });
  at++;
  if (at >= to) return at;
  const first = written(text, lines[at]!);
  const entryFollows = at + 1 < to && attributeEntry(text, lines[at + 1]!) !== undefined;
  if (!AUTHORS.test(first) && !(entryFollows && /^[\p{L}\p{N}]/u.test(first))) return at;
  return at + 1 < to && REVISION.test(written(text, lines[at + 1]!)) ? at + 2 : at + 1;
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
