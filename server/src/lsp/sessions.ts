// All workspace folders of a connection, and which of them a document belongs to.
import { DidChangeConfigurationNotification, DidChangeWatchedFilesNotification } from 'vscode-languageserver';
import type { ClientCapabilities, Connection } from 'vscode-languageserver';
import type { Profiles } from '../engine/factsOf.js';
import { canonicalUri, isBelow } from '../text/uri.js';
import { FolderSession } from './folderSession.js';
import type { SessionEditor } from './folderSession.js';
import type { ServerHost } from './host.js';
import { STATE_NOTIFICATION, WATCHED_FILES } from './protocol.js';
import type { FolderSettings } from './protocol.js';
import { Publisher } from './publisher.js';

/** The sessions of one connection. A document belongs to the deepest folder that holds it, or to none. */
export class Sessions {
  private readonly folders = new Map<string, FolderSession>();
  private readonly publisher: Publisher;
  private readonly loose: FolderSession;
  private client: ClientCapabilities = {};

  constructor(
    private readonly connection: Connection,
    private readonly host: ServerHost,
    private readonly profiles: Profiles,
  ) {
    this.publisher = new Publisher((uri, diagnostics, version) => {
      void connection.sendDiagnostics({ uri, diagnostics, ...(version !== undefined && { version }) });
    });
    this.loose = this.session('');
  }

  setClient(capabilities: ClientCapabilities): void {
    this.client = capabilities;
  }

  /** Adds a workspace folder; its survey is started apart. */
  add(folderUri: string): FolderSession {
    const uri = canonicalUri(folderUri).replace(/\/$/, '');
    const session = this.folders.get(uri) ?? this.session(uri);
    this.folders.set(uri, session);
    return session;
  }

  /** The session of a document: that of the deepest folder above it; documents outside all folders share one. */
  of(documentUri: string): FolderSession {
    const uri = canonicalUri(documentUri);
    let best = this.loose;
    for (const session of this.folders.values()) {
      if (isBelow(session.uri, uri) && session.uri.length > best.uri.length) best = session;
    }
    return best;
  }

  /** The first workspace folder, or undefined where no folder is open. */
  get first(): FolderSession | undefined {
    return this.folders.values().next().value;
  }

  /** Asks the client to report changes of files, settings and folders, as far as it can. */
  async register(): Promise<void> {
    const { workspace } = this.client;
    if (workspace?.didChangeWatchedFiles?.dynamicRegistration === true) {
      const watchers = WATCHED_FILES.map((globPattern) => ({ globPattern }));
      await this.connection.client.register(DidChangeWatchedFilesNotification.type, { watchers });
    }
    if (workspace?.didChangeConfiguration?.dynamicRegistration === true) {
      await this.connection.client.register(DidChangeConfigurationNotification.type, { section: 'evenword' });
    }
    if (workspace?.workspaceFolders === true) {
      this.connection.workspace.onDidChangeWorkspaceFolders(({ added, removed }) => {
        for (const { uri } of removed) this.remove(uri);
        for (const { uri } of added) void this.start(this.add(uri));
      });
    }
  }

  async surveyAll(): Promise<void> {
    for (const session of this.folders.values()) await this.start(session);
  }

  /** Reads the settings of all folders anew. */
  async configureAll(): Promise<void> {
    for (const session of [this.loose, ...this.folders.values()]) await this.configure(session);
  }

  end(): void {
    for (const session of [this.loose, ...this.folders.values()]) session.end();
  }

  private async start(session: FolderSession): Promise<void> {
    await this.configure(session);
    await session.survey();
  }

  private async configure(session: FolderSession): Promise<void> {
    if (this.client.workspace?.configuration !== true) return;
    const scope = session.uri === '' ? {} : { scopeUri: session.uri };
    const settings = (await this.connection.workspace.getConfiguration({
      section: 'evenword',
      ...scope,
    })) as FolderSettings | null;
    session.configure(settings ?? {});
  }

  private remove(folderUri: string): void {
    const uri = canonicalUri(folderUri).replace(/\/$/, '');
    this.folders.get(uri)?.end();
    this.folders.delete(uri);
  }

  private session(uri: string): FolderSession {
    return new FolderSession(uri, this.profiles, this.host, this.publisher, this.editor());
  }

  private editor(): SessionEditor {
    const { connection } = this;
    return {
      state: (state) => void connection.sendNotification(STATE_NOTIFICATION, state),
      log: (message) => connection.console.log(message),
      withProgress: async (title, task) => {
        const none = new AbortController().signal;
        if (this.client.window?.workDoneProgress !== true) return task(() => undefined, none);
        const progress = await connection.window.createWorkDoneProgress();
        const cancelled = new AbortController();
        progress.token.onCancellationRequested(() => cancelled.abort());
        progress.begin(title, 0, undefined, true);
        try {
          return await task((message, percent) => progress.report(Math.round(percent), message), cancelled.signal);
        } finally {
          progress.done();
        }
      },
    };
  }
}
