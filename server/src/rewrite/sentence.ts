// Where sentences begin, as far as punctuation tells.

const ABBREVIATION =
  /(?:^|[\s(])(?:e\.g|i\.e|etc|vs|cf|approx|incl|excl|no|nos|fig|figs|eq|sec|ch|vol|pp?|ed|eds|mr|mrs|ms|dr|prof|st|inc|ltd|co|corp|al|min|max|resp)\.$/i;

/** True where a sentence begins at `offset`, opening brackets and quotation marks aside. */
export function startsSentence(text: string, offset: number): boolean {
  let at = offset;
  while (at > 0 && /["'“‘([*_]/.test(text.charAt(at - 1))) at--;
  const before = text.slice(Math.max(0, at - 40), at);
  const trimmed = before.trimEnd();
  if (trimmed === '') return at <= 40 || before === '';
  if (trimmed.length === before.length) return false;
  const closed = trimmed.replace(/["'”’)\]]+$/, '');
  if (!/[.!?…]$/.test(closed)) return false;
  return !ABBREVIATION.test(closed);
}
