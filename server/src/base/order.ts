// The one order of the engine: counts first, then code units, never a locale and never an interned id.

/** Compares two strings by UTF-16 code units: negative, zero or positive. */
export function compareCodeUnits(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

/** Larger counts first, ties by code units of the text. */
export function byCountThenText(a: { count: number; text: string }, b: { count: number; text: string }): number {
  return b.count - a.count || compareCodeUnits(a.text, b.text);
}
