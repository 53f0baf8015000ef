// The evaluation in a dozen figures: recall by family of kinds, set by set and in all, false alarms, load, cost.
import type { PairKind } from './gold.js';
import type { PairFate } from './recall.js';
import type { SetResult } from './result.js';

/** Kinds of decision that one family of questions answers. */
export const FAMILIES: Readonly<Record<string, readonly PairKind[]>> = {
  'spelling, hyphenation': ['spelling', 'hyphenation'],
  abbreviation: ['abbreviation'],
  'synonym, phrase, rename': ['synonym', 'phrase-verb', 'rename'],
};

/** Plain pairs of some kinds: how many there are, and how many are found in each way of counting. */
export interface FamilyRecall {
  readonly pairs: number;
  readonly found: number;
  /** With all look-alikes, at all and within the first 100 questions of the set. */
  readonly withLookAlikes: number;
  readonly inFirst100: number;
}

/** Recall of a family among pairs, flagged and rare ones left aside. */
export function familyRecall(pairs: readonly PairFate[], kinds: readonly PairKind[]): FamilyRecall {
  const plain = pairs.filter(({ kind, flags }) => flags.length === 0 && kinds.includes(kind));
  return {
    pairs: plain.length,
    found: plain.filter(({ place }) => place > 0).length,
    withLookAlikes: plain.filter(({ placeWithLookAlikes }) => placeWithLookAlikes > 0).length,
    inFirst100: plain.filter(({ placeWithLookAlikes: place }) => place > 0 && place <= 100).length,
  };
}

/** Rows of a table: recall of plain pairs by set and family, the last row for all sets. */
export function recallBySet(sets: readonly SetResult[]): string[][] {
  const row = (name: string, pairs: readonly PairFate[]): string[] => [
    name,
    ...Object.values(FAMILIES).map((kinds) => {
      const { found, pairs: all } = familyRecall(pairs, kinds);
      return all === 0 ? '–' : `${found} of ${all}`;
    }),
  ];
  return [
    ['set', ...Object.keys(FAMILIES)],
    ...sets.map(({ name, pairs }) => row(name, pairs)),
    row(
      'all',
      sets.flatMap(({ pairs }) => pairs),
    ),
  ];
}

/** The figures by which a version is judged, by name, as they are shown. */
export function keyFigures(sets: readonly SetResult[]): [string, string][] {
  const pairs = sets.flatMap((set) => set.pairs);
  const sum = (figure: (set: SetResult) => number): number => sets.reduce((total, set) => total + figure(set), 0);
  const negatives = sum((set) => set.negatives);
  const asked = sum((set) => set.negativesAsked.filter(({ place }) => place > 0).length);
  const words = sum((set) => set.words);
  const figures: [string, string][] = Object.entries(FAMILIES).map(([name, kinds]) => {
    const { found, pairs: all } = familyRecall(pairs, kinds);
    return [`recall, ${name}`, ratio(found, all)];
  });
  const last = familyRecall(pairs, FAMILIES['synonym, phrase, rename']!);
  figures.push(
    ['the last with look-alikes, first 100', ratio(last.inFirst100, last.pairs)],
    ['terms kept apart that are asked about', ratio(asked, negatives)],
    ['questions per 100,000 words', ((sum((set) => set.questions.length) / Math.max(1, words)) * 1e5).toFixed(1)],
    ['antonyms asked about', String(sum(({ agreement }) => agreement.antonyms.length))],
  );
  const largest = [...sets].sort((a, b) => b.words - a.words)[0];
  if (largest !== undefined) {
    const seconds = (largest.readingSeconds + largest.miningSeconds).toFixed(1);
    figures.push([`${largest.name}, the largest`, `${seconds} s, ${largest.peakMegabytes.toFixed(0)} MB`]);
  }
  return figures;
}

function ratio(part: number, whole: number): string {
  return whole === 0 ? '–' : `${(part / whole).toFixed(2)} (${part} of ${whole})`;
}
