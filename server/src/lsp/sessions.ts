// All workspace folders of a connection, and which of them a document belongs to.
import {
  DidChangeConfigurationNotification,
  DidChangeWatchedFilesNotification,
  WatchKind,
} from 'vscode-languageserver';
import type { ClientCapabilities, Connection } from 'vscode-languageserver';
import { canonicalUri, isBelow } from '../text/uri.js';
import { isTermbase } from './folderFiles.js';
import { FolderSession } from './folderSession.js';
import type { SessionEditor } from './folderSession.js';
import type { ServerHost } from './host.js';
import { STATE_NOTIFICATION, WATCHED_FILES } from './protocol.js';
import type { FolderSettings, TrustParams } from './protocol.js';
import { Publisher } from './publisher.js';

/** The editor's own setting for files that it does not show: an object from globs to true. */
const EXCLUDED = 'files.exclude';

/** The sessions of one connection. A document belongs to the deepest folder that holds it, or to none. */
export class Sessions {
  private readonly folders = new Map<string, FolderSession>();
  private readonly publisher: Publisher;
  private readonly loose: FolderSession;
  private client: ClientCapabilities = {};
  private trust: TrustParams = { trusted: false };

  constructor(
    private readonly connection: Connection,
    private readonly host: ServerHost,
  ) {
    this.publisher = new Publisher((uri, diagnostics, version) => {
      void connection.sendDiagnostics({ uri, diagnostics, ...(version !== undefined && { version }) });
    });
    this.loose = this.session('');
  }

  setClient(capabilities: ClientCapabilities): void {
    this.client = capabilities;
  }

  /** Takes in whether the user trusts the workspace; where that is new, the folders' history can be read. */
  setTrust(trust: TrustParams): void {
    this.trust = trust;
    for (const session of this.folders.values()) session.readHistory();
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

  /** The sessions that an open document matters to: its own and, for a termbase, folders below it that it holds for. */
  concernedBy(documentUri: string): FolderSession[] {
    const own = this.of(documentUri);
    const uri = canonicalUri(documentUri);
    const others = isTermbase(uri) ? [...this.folders.values()].filter((each) => each !== own && each.holds(uri)) : [];
    return [own, ...others];
  }

  /** Files on disk were made, changed or deleted (canonical URIs): each folder takes its own in one step. */
  async filesChanged(uris: readonly string[]): Promise<void> {
    const bySession = new Map<FolderSession, Set<string>>();
    for (const uri of uris) {
      for (const session of this.concernedBy(uri)) {
        const own = bySession.get(session);
        if (own === undefined) bySession.set(session, new Set([uri]));
        else own.add(uri);
      }
    }
    await Promise.all([...bySession].map(([session, own]) => session.filesChanged([...own])));
  }

  /** The first workspace folder, or undefined where no folder is open. */
  get first(): FolderSession | undefined {
    return this.folders.values().next().value;
  }

  /** Asks the client to report changes of files, settings and folders, as far as it can. */
  async register(): Promise<void> {
    const { workspace } = this.client;
    if (workspace?.didChangeWatchedFiles?.dynamicRegistration === true) {
      // Of a deleted folder the editor reports the folder alone, not the files in it.
      const deleted = { globPattern: '**/*', kind: WatchKind.Delete };
      const watchers = [...WATCHED_FILES.map((globPattern) => ({ globPattern })), deleted];
      await this.connection.client.register(DidChangeWatchedFilesNotification.type, { watchers });
    }
    if (workspace?.didChangeConfiguration?.dynamicRegistration === true) {
      await this.connection.client.register(DidChangeConfigurationNotification.type, {
        section: ['evenword', EXCLUDED],
      });
    }
    if (workspace?.workspaceFolders === true) {
      this.connection.workspace.onDidChangeWorkspaceFolders(({ added, removed }) => {
        for (const { uri } of removed) this.remove(uri);
        const sessions = added.map(({ uri }) => this.add(uri));
        this.moveDocuments([this.loose, ...this.folders.values()]);
        for (const session of sessions) void this.start(session);
        // What a folder inside another one takes or leaves behind changes the outer one's pages.
        for (const { uri } of [...removed, ...added]) {
          const outer = [...this.folders.values()].find((each) => isBelow(each.uri, canonicalUri(uri)));
          if (outer !== undefined && !sessions.includes(outer)) void outer.survey();
        }
      });
    }
  }

  async surveyAll(): Promise<void> {
    for (const session of this.folders.values()) await this.start(session);
  }

  /** Reads the settings of all folders anew. */
  async configureAll(): Promise<void> {
    for (const session of [this.loose, ...this.folders.values()]) {
      if (await this.configure(session)) void session.survey();
    }
  }

  end(): void {
    for (const session of [this.loose, ...this.folders.values()]) session.end();
  }

  private async start(session: FolderSession): Promise<void> {
    try {
      await this.configure(session);
    } catch (error) {
      this.connection.console.error(`Settings could not be read: ${String(error)}`);
    }
    await session.survey();
    // The survey has read a termbase above the folder as it is on disk.
    for (const document of this.loose.openDocuments) {
      if (session.holds(canonicalUri(document.uri))) session.edited(document);
    }
  }

  /** True where a session's settings choose other files than before. */
  private async configure(session: FolderSession): Promise<boolean> {
    if (this.client.workspace?.configuration !== true) return false;
    const scope = session.uri === '' ? {} : { scopeUri: session.uri };
    const [settings, excluded] = (await this.connection.workspace.getConfiguration(
      ['evenword', EXCLUDED].map((section) => ({ section, ...scope })),
    )) as [FolderSettings | null, Readonly<Record<string, unknown>> | null];
    const globs = Object.entries(excluded ?? {}).filter(([, value]) => value === true);
    return session.configure(
      settings ?? {},
      globs.map(([glob]) => glob),
    );
  }

  private remove(folderUri: string): void {
    const uri = canonicalUri(folderUri).replace(/\/$/, '');
    const session = this.folders.get(uri);
    if (session === undefined) return;
    this.folders.delete(uri);
    session.end();
    this.moveDocuments([session]);
  }

  /** Hands open documents over to the sessions that they belong to since folders came or went. */
  private moveDocuments(sessions: readonly FolderSession[]): void {
    for (const session of sessions) {
      for (const document of session.openDocuments) {
        const owner = this.of(document.uri);
        // A termbase above a folder is no document of the folder, but holds for it.
        const isAbove = session.uri !== '' && !isBelow(session.uri, canonicalUri(document.uri));
        if (owner === session || isAbove) continue;
        session.release(document);
        owner.edited(document);
      }
    }
  }

  private session(uri: string): FolderSession {
    return new FolderSession(uri, this.host, this.publisher, this.editor(uri));
  }

  private editor(folder: string): SessionEditor {
    const { connection } = this;
    return {
      owns: (uri) => this.of(uri).uri === folder,
      state: (state) => void connection.sendNotification(STATE_NOTIFICATION, state),
      log: (message) => connection.console.log(message),
      trust: () => this.trust,
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
