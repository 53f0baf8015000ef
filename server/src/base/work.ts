// Long work as a generator: the work says where it may pause; whoever drives it owns the clock and the cancellation.

/** A computation that yields at its resting points and returns its result. It reads no clock. */
export type Work<T> = Generator<void, T, void>;

/** Runs the work to its end without a pause. */
export function finish<T>(work: Work<T>): T {
  for (;;) {
    const step = work.next();
    if (step.done === true) return step.value;
  }
}
