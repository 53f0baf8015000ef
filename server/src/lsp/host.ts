// What the language server needs of the world outside an editor: documents on disk and workers.
import type { DocumentFacts } from '../facts/documentFacts.js';
import type { SourceText } from '../text/sourceText.js';

/** The files of a workspace folder. */
export interface FolderFiles {
  readonly sources: readonly SourceText[];
  readonly termbases: readonly { readonly uri: string; readonly text: string }[];
  readonly leftOut: readonly { readonly path: string; readonly reason: string }[];
}

/** The server's world. */
export interface ServerHost {
  /** Reads all documents and termbases of a folder. */
  readFolder(uri: string, signal: AbortSignal): Promise<FolderFiles>;
  /** Reads one document again; undefined where it is gone, unreadable or left out. */
  readDocument(uri: string): Promise<SourceText | undefined>;
  /** Reads one termbase file again; undefined where it is gone. */
  readTermbase(uri: string): Promise<string | undefined>;
  /** Gathers facts, on workers where that pays. */
  gather(
    sources: readonly SourceText[],
    progress: (done: number, all: number) => void,
    signal: AbortSignal,
  ): Promise<readonly DocumentFacts[]>;
}
