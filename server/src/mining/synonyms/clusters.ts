// Pairs joined into concepts by complete link: every two members must hold, so that one bad pair chains nothing.

/** A pair that holds, with its score. */
export interface ScoredPair {
  readonly a: number;
  readonly b: number;
  readonly score: number;
}

/** A concept: its terms, ascending, and the score of its weakest pair. */
export interface Cluster {
  readonly members: readonly number[];
  readonly weakest: number;
}

/**
 * Agglomerates the strongest pairs first, ties by index; two clusters join only where all pairs across them hold. A pair
 * whose clusters may not join is left out: no term is asked about twice.
 */
export function clusterPairs(pairs: readonly ScoredPair[], terms: number): Cluster[] {
  const scores = new Map(pairs.map(({ a, b, score }) => [a * terms + b, score]));
  const holds = (x: number, y: number): number | undefined => scores.get(Math.min(x, y) * terms + Math.max(x, y));
  const clusterOf = new Map<number, number[]>();
  for (const { a, b } of [...pairs].sort((x, y) => y.score - x.score || x.a - y.a || x.b - y.b)) {
    const left = clusterOf.get(a) ?? [a];
    const right = clusterOf.get(b) ?? [b];
    if (left === right) continue;
    if (left.every((x) => right.every((y) => holds(x, y) !== undefined))) {
      const joined = [...left, ...right];
      for (const member of joined) clusterOf.set(member, joined);
    }
  }
  const clusters = [...new Set(clusterOf.values())];
  return clusters.map((members) => {
    members.sort((x, y) => x - y);
    let weakest = Infinity;
    members.forEach((x, i) => {
      for (const y of members.slice(i + 1)) weakest = Math.min(weakest, holds(x, y)!);
    });
    return { members, weakest };
  });
}
