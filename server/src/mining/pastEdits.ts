// Edits of the past that replaced one term by another in an otherwise unchanged sentence, counted by direction.

/** How often writers replaced one term by another. Terms are folded to lower case, their words one space apart. */
export interface ReplacementCount {
  readonly from: string;
  readonly to: string;
  /** Commits in which it was done. */
  readonly commits: number;
  /** Sentences in which it was done, over all commits. */
  readonly sentences: number;
}

/** All replacements that the history of a documentation set holds. */
export interface PastEdits {
  readonly replacements: readonly ReplacementCount[];
}
