// Names of code: the words that a document has outside its prose, in inline code and blocks of code.
import { OPAQUE, SourceCursor } from '../prose/prose.js';
import type { Prose, ProseBlock } from '../prose/prose.js';

/** A name as code writes it, with hyphens inside; option dashes and parts of snake_case names are told by their neighbours. */
const NAME = /[A-Za-z][A-Za-z0-9]*(?:-[A-Za-z0-9]+)*/g;

/** White space, and tags, comments to the end of a line, paths and addresses: what is between the names or no name. */
const NO_NAMES = /<\/?[A-Za-z][^<>\n]*>|(?:^|\s)(?:#|\/\/)\s.*$|[^\s"'`<>(){}[\],;=]*\/[^\s"'`<>(){}[\],;=]*/gm;

/**
 * Calls `found` with each name in the parts of a source that are no prose: what lies between the blocks (blocks of code,
 * front matter, markup) and what an opaque unit stands for within one (inline code). Names may come more than once.
 * @param text the source that the prose was read from
 */
export function findCodeWords(prose: Prose, text: string, found: (word: string) => void): void {
  let end = 0;
  for (const block of prose.blocks) {
    if (block.start > end) namesIn(text.slice(end, block.start), found);
    if (block.content.text.includes(OPAQUE)) namesInOpaque(block, text, found);
    end = Math.max(end, block.start + block.content.sourceLength);
  }
  if (end < text.length) namesIn(text.slice(end), found);
}

function namesInOpaque(block: ProseBlock, text: string, found: (word: string) => void): void {
  const cursor = new SourceCursor(block);
  const { text: prose } = block.content;
  for (let at = prose.indexOf(OPAQUE); at >= 0; at = prose.indexOf(OPAQUE, at + 1)) {
    const start = cursor.start(at);
    namesIn(text.slice(start, cursor.end(at + 1)), found);
  }
}

function namesIn(code: string, found: (word: string) => void): void {
  const names = code.replace(NO_NAMES, ' ');
  for (const { 0: name, index } of names.matchAll(NAME)) {
    if (!isJoined(names[index - 1]) && !isJoined(names[index + name.length])) found(name);
  }
}

/** True for a sign that makes a name a part of a longer one (snake_case) or an option (--dry-run). */
function isJoined(sign: string | undefined): boolean {
  return sign === '_' || sign === '-';
}
