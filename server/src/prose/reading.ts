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

/** The one stretch that covers all differences between two texts, or undefined where they are equal. */
export function changeBetween(before: string, after: string): Change | undefined {
  if (before === after) return undefined;
  const shorter = Math.min(before.length, after.length);
  let start = 0;
  while (start < shorter && before.charCodeAt(start) === after.charCodeAt(start)) start++;
  let oldEnd = before.length;
  let newEnd = after.length;
  while (oldEnd > start && newEnd > start && before.charCodeAt(oldEnd - 1) === after.charCodeAt(newEnd - 1)) {
    oldEnd--;
    newEnd--;
  }
  return { start, oldEnd, newEnd };
}

/** The blocks of `next`, with the content objects of `previous` wherever equal ones stand at either end of the document. */
export function keepContents(previous: readonly ProseBlock[], next: readonly ProseBlock[]): ProseBlock[] {
  const kept = [...next];
  const shorter = Math.min(previous.length, next.length);
  let head = 0;
  for (; head < shorter && sameContent(previous[head]!.content, next[head]!.content); head++) {
    kept[head] = { start: next[head]!.start, content: previous[head]!.content };
  }
  for (let tail = 1; tail <= shorter - head; tail++) {
    const before = previous[previous.length - tail]!;
    const at = next.length - tail;
    if (!sameContent(before.content, next[at]!.content)) break;
    kept[at] = { start: next[at]!.start, content: before.content };
  }
  return kept;
}

/** True where two contents are the same in all their parts. */
export function sameContent(a: BlockContent, b: BlockContent): boolean {
  return (
    a === b ||
    (a.text === b.text &&
      a.kind === b.kind &&
      a.level === b.level &&
      a.zones === b.zones &&
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
