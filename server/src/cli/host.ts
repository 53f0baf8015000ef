// What the command line needs of the world outside: two streams, documents, and a place to write.
import type { FilePolicy } from '../text/filePolicy.js';
import type { Snapshot } from '../engine/snapshot.js';
import type { MiningOptions } from '../mining/options.js';

/** A file or folder that was not read, and why. */
export interface LeftOutFile {
  readonly path: string;
  readonly reason: string;
}

/** The documents of the named folders, read and (where asked for) mined. */
export interface Survey {
  readonly snapshot: Snapshot;
  /** URI of the folder that holds all named paths, with a closing slash. */
  readonly rootUri: string;
  readonly leftOut: readonly LeftOutFile[];
}

/** What is wanted of a survey. */
export interface SurveyRequest {
  /** True where questions are wanted, and not only decisions. */
  readonly mine: boolean;
  /** What is left out by choice. */
  readonly files: FilePolicy;
  readonly mining: MiningOptions;
  /** True where the history of the folders is read as well. */
  readonly history: boolean;
}

/** The world as the command line sees it. */
export interface CliHost {
  /** The version of this program, as Semantic Versioning writes it. */
  readonly version: string;
  /** Writes the result: standard output. */
  write(text: string): void;
  /** Writes a note to standard error; one of the weight `error` says why a run ends, and is written even where notes are not wanted. */
  note(text: string, weight?: 'error'): void;
  /** Shows how far a survey has come; overwrites itself on a terminal. */
  progress(text: string): void;
  /** Makes text stand out where the output is a terminal that can. */
  emphasise(text: string): string;
  faint(text: string): string;
  /**
   * Reads documents and termbases under the paths.
   * @throws CannotSurvey where a path is missing or cannot be read.
   */
  survey(paths: readonly string[], request: SurveyRequest): Promise<Survey>;
  /** A file's path as the user would write it: relative to the working folder where it lies below it. */
  pathOf(uri: string): string;
  /**
   * Writes files into a folder, made where it is missing.
   * @throws CannotSurvey where the folder cannot be written.
   */
  writeFiles(folder: string, files: ReadonlyMap<string, string>): Promise<void>;
  /** The date of today in local time, as `2024-05-31` (ISO 8601). */
  now(): string;
}

/** A named path cannot be read or written; the message names it and says why. */
export class CannotSurvey extends Error {
  override readonly name = 'CannotSurvey';
}

/** How a run ended, as the process's exit code. */
export const Exit = { clean: 0, findings: 1, cannotRun: 2 } as const;
