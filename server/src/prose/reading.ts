// A document read once and kept, so that it can be read again after an edit at the cost of the edit.
import type { SourceText } from '../text/sourceText.js';
import type { BlockContent, Prose, ProseBlock } from './prose.js';

/** A document and its prose, immutable. Readers add what they need for {@link Prose} to be made anew after an edit. */
export interface Reading {
  readonly source: SourceText;
  readonly prose: Prose;
}

/** The stretch in which two texts differ: `[start, oldEnd)` of the one became `[start, newEnd)` of the other. */
export interface Change {
  readonly start: number;
  readonly oldEnd: number;
  readonly newEnd: number;
}

/** Units that are compared at once: comparing slices costs far less than comparing units one by one. */
const STRIDE = 512;

/** The one stretch that covers all differences between two texts, or undefined where they are equal. */
export function changeBetween(before: string, after: string): Change | undefined {
  if (before === after) return undefined;
  const shorter = Math.min(before.length, after.length);
  let start = 0;
  while (start + STRIDE <= shorter && before.slice(start, start + STRIDE) === after.slice(start, start + STRIDE)) {
    start += STRIDE;
  }
  while (start < shorter && before.charCodeAt(start) === after.charCodeAt(start)) start++;
  const most = shorter - start;
  let same = 0;
  while (same + STRIDE <= most && tail(before, same) === tail(after, same)) same += STRIDE;
  while (same < most && before.charCodeAt(before.length - same - 1) === after.charCodeAt(after.length - same - 1))
    same++;
  return { start, oldEnd: before.length - same, newEnd: after.length - same };
}

/** The stride of a text that ends `skip` units before its end. */
function tail(text: string, skip: number): string {
  return text.slice(text.length - skip - STRIDE, text.length - skip);
}

/** The blocks of `next`, with the content objects of `previous` wherever equal ones stand at either end of the document. */
export function keepContents(previous: readonly ProseBlock[], next: readonly ProseBlock[]): ProseBlock[] {
  const kept = [...next];
  const shorter = Math.min(previous.length, next.length);
  const keep = (old: ProseBlock, at: number): boolean => {
    const { start, content } = next[at]!;
    if (content === old.content) return true;
    if (!sameContent(content, old.content)) return false;
    kept[at] = { start, content: old.content };
    return true;
  };
  let head = 0;
  while (head < shorter && keep(previous[head]!, head)) head++;
  let tail = 0;
  while (tail < shorter - head && keep(previous[previous.length - tail - 1]!, next.length - tail - 1)) tail++;
  return kept;
}

/** True where two contents are the same in all their parts. */
function sameContent(a: BlockContent, b: BlockContent): boolean {
  return (
    a === b ||
    (a.text === b.text &&
      a.kind === b.kind &&
      a.level === b.level &&
      a.zones === b.zones &&
      a.language === b.language &&
      a.glossary === b.glossary &&
      a.sourceLength === b.sourceLength &&
      a.pieces.length === b.pieces.length &&
      a.marks.length === b.marks.length &&
      a.links.length === b.links.length &&
      a.pieces.every((value, i) => value === b.pieces[i]) &&
      a.marks.every(
        (m, i) => m.start === b.marks[i]!.start && m.end === b.marks[i]!.end && m.zones === b.marks[i]!.zones,
      ) &&
      a.links.every(
        (l, i) => l.start === b.links[i]!.start && l.end === b.links[i]!.end && l.target === b.links[i]!.target,
      ))
  );
}
