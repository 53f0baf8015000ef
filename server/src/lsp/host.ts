// What the language server needs of the world outside an editor: documents on disk and workers.
import type { Profiles } from '../engine/factsOf.js';
import type { DocumentFacts } from '../facts/documentFacts.js';
import type { FilePolicy } from '../text/filePolicy.js';
import type { PastEdits } from '../mining/pastEdits.js';
import type { SourceText } from '../text/sourceText.js';

/** The files of a workspace folder. */
export interface FolderFiles {
  readonly sources: readonly SourceText[];
  readonly termbases: readonly { readonly uri: string; readonly text: string }[];
  readonly leftOut: readonly { readonly path: string; readonly reason: string }[];
}

/** The server's world. */
export interface ServerHost {
  /** Language profiles, made once: the English one takes half a second and some megabytes. */
  readonly profiles: Profiles;
  /** Reads all documents and termbases of a folder. */
  readFolder(uri: string, files: FilePolicy, signal: AbortSignal): Promise<FolderFiles>;
  /** Reads one document of a folder again; undefined where it is gone, unreadable or left out. */
  readDocument(folder: string, uri: string, files: FilePolicy): Promise<SourceText | undefined>;
  /** Reads one termbase file again; undefined where it is gone or lies in a part of the folder that is left out. */
  readTermbase(folder: string, uri: string, files: FilePolicy): Promise<string | undefined>;
  /** Why a survey of the folder would not come to a document, or undefined where it would. */
  whyLeftOut(folder: string, uri: string, files: FilePolicy): Promise<string | undefined>;
  /**
   * Reads what the history of a folder tells, from the version control that it lies in; undefined where there is none. `key`
   * stands for what was read: equal keys, equal edits. What is found is kept in the cache folder, if one is given.
   */
  readHistory(
    folder: string,
    cacheFolder: string | undefined,
    signal: AbortSignal,
  ): Promise<{ readonly key: string; readonly edits: PastEdits } | undefined>;
  /** Gathers facts, on workers where that pays. */
  gather(
    sources: readonly SourceText[],
    progress: (done: number, all: number) => void,
    signal: AbortSignal,
  ): Promise<readonly (readonly DocumentFacts[])[]>;
}
