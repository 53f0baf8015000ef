// Broken promises inside the program: an error of its own kind, never used for bad input.

/** A promise that the program makes to itself did not hold. */
export class BrokenInvariant extends Error {
  override readonly name = 'BrokenInvariant';
}

/** Throws {@link BrokenInvariant} where the condition does not hold. */
export function invariant(condition: boolean, what: string): asserts condition {
  if (!condition) throw new BrokenInvariant(what);
}
