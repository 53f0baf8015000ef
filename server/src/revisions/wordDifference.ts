// Where two sequences of words differ, by their longest common subsequence.

/** A stretch in which two sequences differ: `[start, end)` in each; one of the two may be empty. */
export interface Stretch {
  readonly start: number;
  readonly end: number;
  readonly otherStart: number;
  readonly otherEnd: number;
}

/**
 * The stretches in which two sequences differ, in order. Between them stands a longest common subsequence (Wagner & Fischer
 * 1974), after what both begin and end with. Takes time and memory in proportion to the product of what is left.
 */
export function differingStretches(one: readonly string[], other: readonly string[]): Stretch[] {
  let first = 0;
  while (first < one.length && first < other.length && one[first] === other[first]) first++;
  let last = 0;
  const most = Math.min(one.length, other.length) - first;
  while (last < most && one[one.length - 1 - last] === other[other.length - 1 - last]) last++;
  const a = one.slice(first, one.length - last);
  const b = other.slice(first, other.length - last);
  const width = b.length + 1;
  const common = new Uint16Array((a.length + 1) * width);
  for (let i = a.length - 1; i >= 0; i--) {
    for (let j = b.length - 1; j >= 0; j--) {
      common[i * width + j] =
        a[i] === b[j]
          ? common[(i + 1) * width + j + 1]! + 1
          : Math.max(common[(i + 1) * width + j]!, common[i * width + j + 1]!);
    }
  }
  const stretches: Stretch[] = [];
  let [i, j] = [0, 0];
  let [start, otherStart] = [0, 0];
  const close = (): void => {
    if (i > start || j > otherStart)
      stretches.push({ start: first + start, end: first + i, otherStart: first + otherStart, otherEnd: first + j });
  };
  while (i < a.length && j < b.length) {
    if (a[i] === b[j]) {
      close();
      i++;
      j++;
      [start, otherStart] = [i, j];
    } else if (common[(i + 1) * width + j]! >= common[i * width + j + 1]!) i++;
    else j++;
  }
  [i, j] = [a.length, b.length];
  close();
  return stretches;
}
