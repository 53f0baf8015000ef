// What must hold for the prose of any text, in every format: offsets are exact, and reading again equals reading whole.
import { OPAQUE, sourceEnd, sourceStart, type Prose, type ProseBlock } from '../../server/src/prose/prose.js';
import { read, reread, startReading } from '../../server/src/prose/read.js';
import type { Format, SourceText } from '../../server/src/text/sourceText.js';

/** White space, or markup that parts two words where it vanishes. */
const PARTING = /^[\s[\]{}<>&%\\]/;
const ODD = new Set(['\0', '\uFFFC', '\uFFFD']);
const PLAIN = /^[A-Za-z0-9]$/;

/** A text to read. */
export function sourceOf(text: string, format: Format): SourceText {
  return { uri: 'file:///page', format, text };
}

/** What is wrong with the prose of a text, or undefined. */
export function unsound(text: string, prose: Prose): string | undefined {
  const failed = prose.problems.find(({ message }) => message.includes('could not be read'));
  if (failed) return failed.message;
  const outside = prose.problems.find(({ span }) => span.start < 0 || span.end > text.length || span.start > span.end);
  if (outside) return `a problem lies outside the text: ${outside.message}`;
  let before = 0;
  for (const block of prose.blocks) {
    if (block.start < before) return `the block at ${block.start} stands behind one at ${before}`;
    before = block.start;
    const wrong = unsoundMap(text, block) ?? unsoundMarks(block);
    if (wrong !== undefined) return `${wrong} in “${block.content.text.slice(0, 80)}” at ${block.start}`;
  }
  return undefined;
}

function unsoundMap(text: string, block: ProseBlock): string | undefined {
  const { start, content } = block;
  const { pieces, text: shown, sourceLength } = content;
  if (start + sourceLength > text.length) return 'the source ends before the block';
  if (pieces.length === 0 || pieces[0] !== 0) return 'the map does not begin with the text';
  for (let at = 0; at < pieces.length; at += 3) {
    const next = at + 3 < pieces.length ? pieces[at + 3]! : shown.length;
    if (next <= pieces[at]!) return `piece ${at / 3} is empty`;
    if (pieces[at + 2]! === 0) return `piece ${at / 3} has no source`;
    if (at > 0 && pieces[at + 1]! < pieces[at - 2]! + pieces[at - 1]!) return `piece ${at / 3} goes back`;
    if (pieces[at + 1]! + pieces[at + 2]! > sourceLength) return `piece ${at / 3} leaves the block`;
    const said = shown.slice(pieces[at], next);
    const written = text.slice(sourceStart(block, pieces[at]!), sourceEnd(block, next));
    if (written.length !== pieces[at + 2]!) return `piece ${at / 3} has another source`;
    if (said === OPAQUE || said.length !== written.length) continue;
    for (let i = 0; i < said.length; i++) {
      if (!mayStandFor(said[i]!, written[i]!, said.length)) return `“${written[i]!}” reads “${said[i]!}”`;
    }
  }
  return undefined;
}

/** A unit stands for itself. White space is a blank; one unit alone may be replaced, but no plain letter is. */
function mayStandFor(said: string, written: string, length: number): boolean {
  if (said === written || (said === ' ' && PARTING.test(written)) || (said === '\uFFFD' && ODD.has(written)))
    return true;
  return length === 1 && !PLAIN.test(said) && !PLAIN.test(written);
}

function unsoundMarks({ content }: ProseBlock): string | undefined {
  let at = 0;
  for (const { start, end } of content.marks) {
    if (start < at || end <= start || end > content.text.length) return `a mark at ${start} is not in order`;
    at = end;
  }
  const link = content.links.find(({ start, end }) => start >= end || end > content.text.length);
  return link && `a link at ${link.start} is not in the text`;
}

/** An edit: at a part of the text (0 to 1), so many units give way to others. */
export interface Edit {
  readonly at: number;
  readonly remove: number;
  readonly insert: string;
}

/** The text after an edit. */
export function edited(text: string, { at, remove, insert }: Edit): string {
  const offset = Math.floor(at * text.length);
  return text.slice(0, offset) + insert + text.slice(offset + remove);
}

/** The first of some edits after which reading again gives something else than reading whole, or undefined. */
export function unlikeWhole(start: string, edits: readonly Edit[], format: Format): string | undefined {
  let text = start;
  let reading = startReading(sourceOf(text, format));
  for (const edit of edits) {
    const before = text;
    text = edited(text, edit);
    reading = reread(reading, sourceOf(text, format));
    if (JSON.stringify(reading.prose) !== JSON.stringify(read(sourceOf(text, format)))) {
      return JSON.stringify({ before, after: text });
    }
  }
  return undefined;
}
