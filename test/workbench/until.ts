// Waits for what comes a little later: the survey of the workspace, a settled diagnostic, a file on disk.

/** How long to wait at most, and between two looks (milliseconds). */
const limit = 30_000;
const interval = 100;

/**
 * Looks again and again until `look` gives a value that is neither undefined nor false. A look that throws is one that
 * failed: the first requests after the start may be refused.
 * @throws after half a minute, naming `what` and, if it threw, the last error.
 */
export async function until<T>(
  what: string,
  look: () => T | undefined | false | PromiseLike<T | undefined | false>,
): Promise<T> {
  const end = performance.now() + limit;
  let last: unknown;
  while (performance.now() < end) {
    try {
      const seen = await look();
      if (seen !== undefined && seen !== false) return seen;
    } catch (error) {
      last = error;
    }
    await new Promise((resolve) => setTimeout(resolve, interval));
  }
  throw new Error(`waited in vain for ${what}`, { cause: last });
}
