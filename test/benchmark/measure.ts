// How the benchmark times: processor time of this thread's work, medians over interleaved rounds, ratios within one run.

/** One goal: what was measured, in which unit, against what, and whether it is reached. */
export interface Row {
  readonly goal: string;
  readonly ours: string;
  readonly reference: string;
  readonly figure: string;
  readonly target: string;
  /** Undefined for a figure without a goal. */
  readonly reached?: boolean;
}

/** Processor milliseconds (user and system) that a piece of work takes. */
export function cpuMs(work: () => void): number {
  const before = process.cpuUsage();
  work();
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1000;
}

/** Elapsed milliseconds of asynchronous work. */
export async function wallMs(work: () => Promise<unknown>): Promise<number> {
  const before = performance.now();
  await work();
  return performance.now() - before;
}

/** The value below which the share `q` (0 to 1) of the values lies. */
export function quantile(values: readonly number[], q: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(q * sorted.length))]!;
}

export const median = (values: readonly number[]): number => quantile(values, 0.5);

/** Milliseconds for a table. */
export const ms = (value: number): string => `${value < 10 ? value.toFixed(2) : value.toFixed(0)} ms`;
