// Which words two readings of a text have in common, in order: the shortest edit script between two lists.

/**
 * The places in `a` and in `b` that are in no longest common subsequence found by the greedy algorithm of E. W. Myers,
 * "An O(ND) Difference Algorithm and Its Variations", Algorithmica 1 (1986), section 4.
 */
export function commonWords(a: readonly string[], b: readonly string[]): { missed: number[]; added: number[] } {
  const most = a.length + b.length;
  const furthest = new Map<number, number>([[1, 0]]);
  const trace: Map<number, number>[] = [];
  for (let d = 0; d <= most; d++) {
    const before = new Map<number, number>();
    for (let k = -d - 1; k <= d + 1; k++) {
      const x = furthest.get(k);
      if (x !== undefined) before.set(k, x);
    }
    trace.push(before);
    for (let k = -d; k <= d; k += 2) {
      let x = goesDown(before, k, d) ? before.get(k + 1)! : before.get(k - 1)! + 1;
      while (x < a.length && x - k < b.length && a[x] === b[x - k]) x++;
      furthest.set(k, x);
      if (x >= a.length && x - k >= b.length) return backtrack(trace, a.length, b.length);
    }
  }
  return { missed: [], added: [] };
}

function goesDown(furthest: ReadonlyMap<number, number>, k: number, d: number): boolean {
  return k === -d || (k !== d && (furthest.get(k - 1) ?? -1) < (furthest.get(k + 1) ?? -1));
}

function backtrack(trace: readonly ReadonlyMap<number, number>[], endA: number, endB: number) {
  const missed: number[] = [];
  const added: number[] = [];
  let [x, y] = [endA, endB];
  for (let d = trace.length - 1; d > 0; d--) {
    const furthest = trace[d]!;
    const k = x - y;
    const previous = goesDown(furthest, k, d) ? k + 1 : k - 1;
    x = furthest.get(previous)!;
    y = x - previous;
    if (previous === k + 1) added.push(y);
    else missed.push(x);
  }
  return { missed: missed.reverse(), added: added.reverse() };
}
