// What the history of one workspace folder tells: read after the survey, without anybody waiting for it.
import type { PastEdits } from '../mining/pastEdits.js';
import type { ServerHost } from './host.js';
import type { FolderSettings, TrustParams } from './protocol.js';

/** Whose history, and what to do with it. */
export interface HistoryReader {
  readonly folder: string;
  /** Whether the user trusts the workspace, and where findings are kept. */
  trust(): TrustParams;
  /** Takes in what was read; undefined where nothing is to be known. */
  take(edits: PastEdits | undefined): void;
  log(message: string): void;
}

/** The reading of one folder's history: at most one at a time, a later one in the place of an earlier one. */
export class FolderHistory {
  private reading: AbortController | undefined;
  /** Which commits were taken in last. */
  private taken: string | undefined;

  constructor(
    private readonly host: ServerHost,
    private readonly reader: HistoryReader,
  ) {}

  /** Reads what is new, or forgets what is known where history is not wanted, and never fails. */
  async read(settings: FolderSettings): Promise<void> {
    this.callOff();
    const { trusted, cacheFolder } = this.reader.trust();
    if (settings.history === false || !trusted) {
      if (this.taken !== undefined) this.reader.take(undefined);
      this.taken = undefined;
      return;
    }
    const mine = new AbortController();
    this.reading = mine;
    try {
      const history = await this.host.readHistory(this.reader.folder, cacheFolder, mine.signal);
      if (this.reading !== mine || history?.key === this.taken) return;
      this.taken = history?.key;
      this.reader.take(history?.edits);
    } catch (error) {
      if (!mine.signal.aborted) this.reader.log(`The history could not be read: ${String((error as Error).stack)}`);
    } finally {
      if (this.reading === mine) this.reading = undefined;
    }
  }

  callOff(): void {
    this.reading?.abort();
    this.reading = undefined;
  }
}
