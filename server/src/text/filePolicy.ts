// Which files of a folder a user wants read, beyond what every folder leaves out.

/** What is read and what is left out by choice. */
export interface FilePolicy {
  /** Globs of paths relative to the folder, `/` between their parts, that are left out with all that lies below them. */
  readonly exclude: readonly string[];
  /** True where change logs are read: they tell of the past in the words of the past. */
  readonly changeLogs: boolean;
}

/** Nothing is chosen. */
export const DEFAULT_FILES: FilePolicy = { exclude: [], changeLogs: false };
