// What a comparison with another reader found, in one form for all formats: printed, and gathered by `npm run oracles`.
import { appendFileSync } from 'node:fs';

/** One set of documents read by both. Speeds in megabytes (of UTF-16 units) a second, measured in the same run. */
export interface OracleRow {
  readonly format: string;
  readonly oracle: string;
  readonly set: string;
  /** Prose words by the oracle, ours, and those in common. */
  readonly theirs: number;
  readonly ours: number;
  readonly found: number;
  readonly right: number;
  readonly misplaced: number;
  readonly units: number;
  /** Milliseconds that each took for the units; undefined where they were not measured. */
  readonly ourTime?: number | undefined;
  readonly theirTime?: number | undefined;
}

/** Prints the row, and adds it to the file that ORACLE_TABLE names. */
export function tell(row: OracleRow): void {
  const { format, oracle, set, theirs, found, right, ours, misplaced, units, ourTime, theirTime } = row;
  console.info(
    `${format}, ${set}: ${theirs} words, recall ${(found / theirs).toFixed(4)}, precision ${(right / ours).toFixed(4)}, ` +
      `${misplaced} misplaced; ${speedOf(units, ourTime)}, ${oracle} ${speedOf(units, theirTime)}`,
  );
  const table = process.env.ORACLE_TABLE;
  if (table === undefined) return;
  const plain: OracleRow = { format, oracle, set, theirs, ours, found, right, misplaced, units, ourTime, theirTime };
  appendFileSync(table, `${JSON.stringify(plain)}\n`);
}

/** A speed for reading. */
export function speedOf(units: number, milliseconds: number | undefined): string {
  return milliseconds === undefined || milliseconds === 0 ? '–' : `${(units / 1000 / milliseconds).toFixed(2)} MB/s`;
}
