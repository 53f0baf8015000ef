// Figures as the command line's JSON carries them.

/** A figure to three places: what stands behind them says nothing to a reader. */
export function rounded(value: number): number {
  return Math.round(value * 1000) / 1000;
}
