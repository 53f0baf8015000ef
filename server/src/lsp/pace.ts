// Driving long work in slices, so that messages are read in between and a cancelled request ends soon.
import type { Work } from '../base/work.js';

/** Length of a slice in milliseconds: short enough that a keystroke never waits noticeably. */
const SLICE = 8;

/** The work was called off. */
export class CalledOff extends Error {
  override readonly name = 'CalledOff';
}

/**
 * Runs work to its end, giving the event loop a turn after each slice.
 * @throws CalledOff as soon as one of the signals is aborted.
 */
export async function drive<T>(work: Work<T>, ...signals: readonly AbortSignal[]): Promise<T> {
  for (;;) {
    if (signals.some(({ aborted }) => aborted)) throw new CalledOff('called off');
    const until = performance.now() + SLICE;
    do {
      const step = work.next();
      if (step.done === true) return step.value;
    } while (performance.now() < until);
    await new Promise<void>((resolve) => setImmediate(resolve));
  }
}
