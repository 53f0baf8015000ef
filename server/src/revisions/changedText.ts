// A cheap look at two versions of a text: whether one term can have been replaced, so that reading both is worth the time.

/** A change that leaves fewer words of its lines as they were is a new text rather than another wording. */
const LEAST_KEPT = 0.4;
/** Changes of more lines than this are no edit of wording. */
const MOST_LINES = 4000;

/**
 * False where no sentence of the text can have had one term replaced by another: nothing but additions, removals, or lines that
 * have little in common.
 */
export function mayReplaceTerm(before: string, after: string): boolean {
  const { removed, added } = changedLines(before, after);
  if (removed.length === 0 || added.length === 0 || removed.length + added.length > MOST_LINES) return false;
  const gone = countWords(removed);
  const come = countWords(added);
  let kept = 0;
  let all = 0;
  let lost = 0;
  let gained = 0;
  for (const [word, count] of gone) {
    const shared = Math.min(count, come.get(word) ?? 0);
    kept += shared;
    all += count;
    lost += count - shared;
  }
  for (const [word, count] of come) gained += Math.max(0, count - (gone.get(word) ?? 0));
  return lost > 0 && gained > 0 && kept >= LEAST_KEPT * all;
}

/** The lines that one version has more often than the other, each as often as it has more. */
function changedLines(before: string, after: string): { removed: string[]; added: string[] } {
  const start = commonStart(before, after);
  const end = commonEnd(before, after, start);
  const balance = new Map<string, number>();
  for (const line of before.slice(start, before.length - end).split('\n'))
    balance.set(line, (balance.get(line) ?? 0) + 1);
  for (const line of after.slice(start, after.length - end).split('\n'))
    balance.set(line, (balance.get(line) ?? 0) - 1);
  const removed: string[] = [];
  const added: string[] = [];
  for (const [line, count] of balance) {
    for (let i = 0; i < count; i++) removed.push(line);
    for (let i = 0; i < -count; i++) added.push(line);
  }
  return { removed, added };
}

/** The length of what both texts begin with, to the last whole line. */
function commonStart(one: string, other: string): number {
  const most = Math.min(one.length, other.length);
  let at = 0;
  while (at < most && one.charCodeAt(at) === other.charCodeAt(at)) at++;
  return one.lastIndexOf('\n', at - 1) + 1;
}

/** The length of what both texts end with, from the first whole line, outside the common start. */
function commonEnd(one: string, other: string, start: number): number {
  const most = Math.min(one.length, other.length) - start;
  let length = 0;
  while (length < most && one.charCodeAt(one.length - 1 - length) === other.charCodeAt(other.length - 1 - length))
    length++;
  const line = one.indexOf('\n', one.length - length);
  return line < 0 ? 0 : one.length - line;
}

function countWords(lines: readonly string[]): Map<string, number> {
  const counts = new Map<string, number>();
  for (const line of lines) {
    for (const word of line.toLowerCase().match(/[\p{L}\p{N}-]+/gu) ?? [])
      counts.set(word, (counts.get(word) ?? 0) + 1);
  }
  return counts;
}
