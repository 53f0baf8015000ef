// The parts that closed-class words play for the mends, as bits, so that a mend asks no set.
import { BEFORE_BASE_FORM, CERTAIN_DETERMINERS, DETERMINERS, FULL_OR_AUXILIARY, OPENING_NOUNS } from './closedWords.js';

/** One bit a part. */
export const Role = {
  determiner: 1 << 0,
  certainDeterminer: 1 << 1,
  beforeBaseForm: 1 << 2,
  fullOrAuxiliary: 1 << 3,
  openingNoun: 1 << 4,
} as const;

/** The parts of a lower-case word. */
export function rolesOf(lower: string): number {
  return (
    (DETERMINERS.has(lower) ? Role.determiner : 0) |
    (CERTAIN_DETERMINERS.has(lower) ? Role.certainDeterminer : 0) |
    (BEFORE_BASE_FORM.has(lower) ? Role.beforeBaseForm : 0) |
    (FULL_OR_AUXILIARY.has(lower) ? Role.fullOrAuxiliary : 0) |
    (OPENING_NOUNS.has(lower) ? Role.openingNoun : 0)
  );
}
