// One workspace folder in the server: its engine, its survey, and the two phases of an edit.
import type { TextDocument } from 'vscode-languageserver-textdocument';
import { Engine, DEFAULT_SETTINGS } from '../engine/engine.js';
import type { DocumentUpdate } from '../engine/engine.js';
import type { Profiles } from '../engine/factsOf.js';
import type { Snapshot } from '../engine/snapshot.js';
import { LineIndex } from '../text/lineIndex.js';
import type { SourceText } from '../text/sourceText.js';
import { canonicalUri } from '../text/uri.js';
import { findingToDiagnostic, problemToDiagnostic } from './conversion.js';
import type { ServerHost } from './host.js';
import { CalledOff, drive } from './pace.js';
import { TERMBASE_NAME } from './protocol.js';
import type { FolderSettings, FolderStateParams } from './protocol.js';
import type { Publisher } from './publisher.js';

/** Pause in typing, in milliseconds, after which relations are settled. */
const IDLE = 500;

/** What a session tells the editor. */
export interface SessionEditor {
  /** Shows a task's progress while it runs; the signal is aborted where the user cancels it. */
  withProgress<T>(
    title: string,
    task: (report: (message: string, percent: number) => void, signal: AbortSignal) => Promise<T>,
  ): Promise<T>;
  state(state: FolderStateParams): void;
  log(message: string): void;
}

/** A workspace folder, or (with an empty URI) the open documents outside all folders. */
export class FolderSession {
  readonly engine: Engine;
  private readonly open = new Map<string, TextDocument>();
  private readonly lines = new WeakMap<SourceText, LineIndex>();
  private settings: FolderSettings = {};
  private idle: NodeJS.Timeout | undefined;
  private settling = new AbortController();
  private readonly ended = new AbortController();

  constructor(
    /** Canonical, without a closing slash. */
    readonly uri: string,
    profiles: Profiles,
    private readonly host: ServerHost,
    private readonly publisher: Publisher,
    private readonly editor: SessionEditor,
  ) {
    this.engine = new Engine(profiles);
  }

  get snapshot(): Snapshot {
    return this.engine.snapshot;
  }

  /** Where a new termbase is made. */
  get newTermbaseUri(): string {
    return `${this.uri}/${TERMBASE_NAME}`;
  }

  /** A URI that stands for the folder itself when decisions are looked up. */
  get rootUri(): string {
    return `${this.uri}/`;
  }

  configure(settings: FolderSettings): void {
    this.settings = settings;
    const least = settings.questions?.leastConfidence;
    this.engine.apply({ settings: { ...DEFAULT_SETTINGS, ...(least !== undefined && { leastConfidence: least }) } });
    this.publishAll();
  }

  /** Reads the folder and settles its relations, with progress shown. Open documents count as the editor has them. */
  async survey(): Promise<void> {
    if (this.uri === '') return;
    this.tellState('surveying');
    try {
      await this.editor.withProgress('Evenword: surveying the documentation', async (report, cancelled) => {
        const signal = AbortSignal.any([cancelled, this.ended.signal]);
        const { sources, termbases, leftOut } = await this.host.readFolder(this.uri, signal);
        for (const { path, reason } of leftOut) this.editor.log(`Left out: ${path}: ${reason}`);
        const closed = sources.filter(({ uri }) => !this.open.has(uri));
        this.engine.apply({ termbases: termbases.filter(({ uri }) => !this.open.has(uri)) });
        this.publishAll();
        const facts = await this.host.gather(
          closed,
          (done, all) => report(`${done} of ${all} pages`, (80 * done) / all),
          signal,
        );
        const updates = closed.map((source, index): DocumentUpdate => ({
          uri: source.uri,
          source,
          facts: facts[index]!,
        }));
        this.engine.apply({ documents: updates.filter(({ uri }) => !this.open.has(uri)) });
        report('comparing terms', 85);
        await this.settle(signal);
      });
    } catch (error) {
      if (this.ended.signal.aborted) return;
      const cancelled = error instanceof CalledOff || (error as Error).name === 'AbortError';
      this.tellState('failed', cancelled ? 'The survey was cancelled.' : (error as Error).message);
      if (!cancelled) throw error;
    }
  }

  /** A document was opened or edited: its findings are renewed at once, relations when typing rests. */
  edited(document: TextDocument): void {
    const uri = canonicalUri(document.uri);
    this.open.set(uri, document);
    const text = document.getText();
    if (isTermbase(uri)) {
      this.engine.apply({ termbases: [{ uri, text }] });
      this.publishAll();
      return;
    }
    this.engine.apply({ documents: [{ uri, source: { uri, format: formatOf(document), text }, open: true }] });
    this.publish(uri);
    this.settleWhenIdle();
  }

  /** A document was closed: what is on disk counts again. */
  async closed(document: TextDocument): Promise<void> {
    const uri = canonicalUri(document.uri);
    this.open.delete(uri);
    if (!isTermbase(uri)) this.publisher.clear(uri);
    await this.fileChanged(uri);
  }

  /** A file on disk was made, changed or deleted. */
  async fileChanged(uri: string): Promise<void> {
    if (this.open.has(uri)) return;
    if (isTermbase(uri)) {
      const text = await this.host.readTermbase(uri);
      if (this.open.has(uri)) return;
      this.engine.apply({ termbases: [{ uri, text }] });
      if (text === undefined) this.publisher.clear(uri);
      this.publishAll();
      return;
    }
    const source = this.uri === '' ? undefined : await this.host.readDocument(uri);
    if (this.open.has(uri)) return;
    this.engine.apply({ documents: [{ uri, source }] });
    if (source === undefined) this.publisher.clear(uri);
    this.settleWhenIdle();
  }

  /** The version of an open document, for edits that must not hit another text. */
  versionOf(uri: string): number | undefined {
    return this.open.get(uri)?.version;
  }

  /** Line starts of a document's text, kept as long as the text is. */
  linesOf(source: SourceText): LineIndex {
    let lines = this.lines.get(source);
    if (lines === undefined) this.lines.set(source, (lines = new LineIndex(source.text)));
    return lines;
  }

  /** Ends the session and takes back what it published. */
  end(): void {
    this.ended.abort();
    clearTimeout(this.idle);
    this.settling.abort();
    for (const uri of this.open.keys()) this.publisher.clear(uri);
    for (const { uri } of this.snapshot.termbases) this.publisher.clear(uri);
  }

  private settleWhenIdle(): void {
    // Single documents outside all folders are checked, but make no documentation set to be mined.
    if (this.uri === '' || !this.engine.needsSettling) return;
    clearTimeout(this.idle);
    this.settling.abort();
    this.idle = setTimeout(() => {
      this.settle(this.ended.signal).catch((error: unknown) => {
        if (!(error instanceof CalledOff)) this.editor.log(`Settling failed: ${String(error)}`);
      });
    }, IDLE);
  }

  private async settle(signal: AbortSignal): Promise<void> {
    this.settling.abort();
    this.settling = new AbortController();
    const superseded = this.settling.signal;
    try {
      await drive(this.engine.settle(), AbortSignal.any([signal, superseded]));
    } catch (error) {
      // An edit came in between: the settlement that follows it does this one's work too.
      if (error instanceof CalledOff && superseded.aborted && !signal.aborted) return;
      throw error;
    }
    this.publishAll();
    this.tellState('ready');
  }

  private tellState(state: FolderStateParams['state'], message?: string): void {
    const { snapshot } = this;
    this.editor.state({
      ...{ folder: this.uri, state, documents: snapshot.relations.size.documents },
      openQuestions: snapshot.agendaAt(this.rootUri).open.length,
      ...(message !== undefined && { message }),
    });
  }

  private publishAll(): void {
    for (const { uri, text, problems } of this.snapshot.termbases) {
      const lines = new LineIndex(text);
      this.publisher.publish(
        uri,
        problems.map((problem) => problemToDiagnostic(problem, lines)),
      );
    }
    for (const uri of this.open.keys()) if (!isTermbase(uri)) this.publish(uri);
  }

  private publish(uri: string): void {
    const { snapshot } = this;
    const document = snapshot.documents.get(uri);
    if (document === undefined) return;
    const lines = this.linesOf(document.source);
    const shown = snapshot
      .findingsIn(uri)
      .filter(({ code }) => code !== 'mixed-terms' || this.settings.hints?.mixedTerms !== false);
    this.publisher.publish(
      uri,
      shown.map((finding) => findingToDiagnostic(finding, lines)),
      this.open.get(uri)?.version,
    );
  }
}

function isTermbase(uri: string): boolean {
  return uri.endsWith(`/${TERMBASE_NAME}`);
}

function formatOf(document: TextDocument): SourceText['format'] {
  if (document.languageId === 'html') return 'html';
  if (['xml', 'dita', 'docbook'].includes(document.languageId)) return 'xml';
  const markdown =
    document.languageId === 'markdown' || document.languageId === 'mdx' || /\.(md|mdx|markdown)$/i.test(document.uri);
  if (document.languageId === 'restructuredtext' || /\.(rst|rest)$/i.test(document.uri)) return 'restructuredtext';
  if (document.languageId === 'asciidoc' || /\.(adoc|asciidoc|asc)$/i.test(document.uri)) return 'asciidoc';
  return markdown ? 'markdown' : 'plaintext';
}
