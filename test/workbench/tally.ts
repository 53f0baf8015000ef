// What a run of tests came to, and how one process hands it to another.
import { readFileSync } from 'node:fs';

/** Numbers of tests by their end. */
export interface Tally {
  readonly passed: number;
  readonly failed: number;
}

/** The environment variable that tells the tests in the extension host where to write their tally as JSON. */
export const tallyVariable = 'WORKBENCH_TALLY';

/** The environment variable with a text that the titles of the tests to run have in them. */
export const grepVariable = 'WORKBENCH_GREP';

/** Reads the tally that a run has written. A run that wrote none has failed as a whole, whatever it answered. */
export function readTally(file: string): Tally {
  try {
    return JSON.parse(readFileSync(file, 'utf8')) as Tally;
  } catch {
    return { passed: 0, failed: 1 };
  }
}

/** The sum of two tallies. */
export function add(a: Tally, b: Tally): Tally {
  return { passed: a.passed + b.passed, failed: a.failed + b.failed };
}
