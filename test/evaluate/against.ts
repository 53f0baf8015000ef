// What changed since an earlier evaluation: questions gained and lost by set, pairs found and lost, figures before and after.
import { recallGroups } from './table.js';
import { keyFigures } from './summary.js';
import type { Evaluation, SetResult } from './result.js';

/** Lists the differences of two evaluations; sets that only one of them holds are named and left aside. */
export function showChanges(before: Evaluation, after: Evaluation): string {
  const lines = ['', 'Changed since the earlier evaluation'];
  const both: [SetResult, SetResult][] = [];
  for (const set of after.sets) {
    const known = before.sets.find(({ name }) => name === set.name);
    if (known === undefined) lines.push(`  ${set.name}: not in the earlier evaluation`);
    else both.push([known, set]);
  }
  for (const { name } of before.sets)
    if (!after.sets.some((set) => set.name === name)) lines.push(`  ${name}: not in this evaluation`);
  lines.push(...showFigures(both));
  for (const [old, now] of both) lines.push(...showSet(old, now));
  return `${lines.join('\n')}\n`;
}

function showFigures(both: readonly (readonly [SetResult, SetResult])[]): string[] {
  const [before, after] = [both.map(([old]) => old), both.map(([, now]) => now)];
  const old = figuresOf(before);
  return [...figuresOf(after)].flatMap(([name, value]) => {
    const earlier = old.get(name);
    return earlier === value ? [] : [`  ${name}: ${earlier ?? '–'} → ${value}`];
  });
}

/** The figures of some sets together, by name, as they are shown. */
export function figuresOf(sets: readonly SetResult[]): Map<string, string> {
  const figures = new Map<string, string>();
  for (const { title, rows } of recallGroups(sets.flatMap(({ pairs }) => pairs))) {
    for (const { kind, pairs, found, foundWithLookAlikes } of rows) {
      figures.set(`recall, ${title}, ${kind}`, `${found.at(-1)!} of ${pairs}`);
      figures.set(`recall with look-alikes, ${title}, ${kind}`, `${foundWithLookAlikes.at(-1)!} of ${pairs}`);
    }
  }
  for (const [name, value] of keyFigures(sets)) figures.set(name, value);
  figures.set('negatives asked with look-alikes', String(sets.flatMap((set) => set.negativesAsked).length));
  return figures;
}

function showSet(old: SetResult, now: SetResult): string[] {
  const gained = missingFrom(now, old);
  const lost = missingFrom(old, now);
  const pairs = now.pairs.flatMap((pair) => {
    const earlier = old.pairs.find(({ a, b, kind }) => a === pair.a && b === pair.b && kind === pair.kind);
    if (earlier === undefined || earlier.place > 0 === pair.place > 0) return [];
    return [`    ${pair.place > 0 ? 'found' : 'no longer found'}: ${pair.a} | ${pair.b} (${pair.kind})`];
  });
  const seconds = (set: SetResult): string => (set.readingSeconds + set.miningSeconds).toFixed(1);
  return [
    `  ${now.name}: ${old.questions.length} → ${now.questions.length} questions, ${gained.length} gained, ${lost.length} lost, ` +
      `${seconds(old)} → ${seconds(now)} s, ${old.peakMegabytes.toFixed(0)} → ${now.peakMegabytes.toFixed(0)} MB`,
    ...pairs,
    ...gained.map((id) => `    + ${id}`),
    ...lost.map((id) => `    - ${id}`),
  ];
}

/** Ids of questions of one set that another has not, look-alikes included. */
function missingFrom(one: SetResult, other: SetResult): string[] {
  const known = new Set([...other.questions, ...other.lookAlikes].map(({ id }) => id));
  return [...one.questions, ...one.lookAlikes].map(({ id }) => id).filter((id) => !known.has(id));
}
