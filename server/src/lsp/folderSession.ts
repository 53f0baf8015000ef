// One workspace folder in the server: its engine, its survey, and the two phases of an edit.
import type { TextDocument } from 'vscode-languageserver-textdocument';
import { Engine, DEFAULT_SETTINGS, closedZones } from '../engine/engine.js';
import type { DocumentUpdate } from '../engine/engine.js';
import type { Snapshot } from '../engine/snapshot.js';
import { LineIndex } from '../text/lineIndex.js';
import { DEFAULT_FILES } from '../text/filePolicy.js';
import type { FilePolicy } from '../text/filePolicy.js';
import { withPathLanguage } from '../text/language.js';
import { formatOf } from '../text/sourceText.js';
import type { SourceText } from '../text/sourceText.js';
import { canonicalUri, isBelow } from '../text/uri.js';
import { findingToDiagnostic, problemToDiagnostic, readingProblemToDiagnostic } from './conversion.js';
import { FolderHistory } from './folderHistory.js';
import { formatOfDocument, goneFrom, isTermbase } from './folderFiles.js';
import type { TermbaseText } from './folderFiles.js';
import type { ServerHost } from './host.js';
import { CalledOff, drive } from './pace.js';
import { TERMBASE_NAME } from './protocol.js';
import type { FolderSettings, FolderStateParams, TrustParams } from './protocol.js';
import type { Publisher } from './publisher.js';

/** Pause in typing, in milliseconds, after which relations are settled. */
const IDLE = 500;

/** Pause in typing in a termbase, in milliseconds, after which its decisions are renewed: a thousand concepts take a tenth of a second. */
const TERMBASE_IDLE = 100;

/** What a session tells the editor. */
export interface SessionEditor {
  /** Shows a task's progress while it runs; the signal is aborted where the user cancels it. */
  withProgress<T>(
    title: string,
    task: (report: (message: string, percent: number) => void, signal: AbortSignal) => Promise<T>,
  ): Promise<T>;
  state(state: FolderStateParams): void;
  log(message: string): void;
  /** Whether the user trusts the workspace. */
  trust(): TrustParams;
  /** True where no deeper workspace folder of its own holds a document of this folder. */
  owns(uri: string): boolean;
}

/** A workspace folder, or (with an empty URI) the open documents outside all folders. */
export class FolderSession {
  readonly engine: Engine;
  private readonly open = new Map<string, TextDocument>();
  /** Open documents that no survey would come to, or of which that is not known yet: they are checked, but do not count. */
  private readonly aside = new Set<string>();
  /** What was opened, edited or reported as changed since the survey began: what it has read of these is old. */
  private readonly renewed = new Set<string>();
  private readonly lines = new WeakMap<SourceText, LineIndex>();
  private settings: FolderSettings = {};
  private files: FilePolicy = DEFAULT_FILES;
  private idle: NodeJS.Timeout | undefined;
  private surveying: AbortController | undefined;
  private settling: AbortController | undefined;
  private readonly ended = new AbortController();
  /** Changed files are read one change after the other, so that the last text read is the last one written. */
  private reading: Promise<void> = Promise.resolve();
  private told: FolderStateParams | undefined;
  /** Open termbases that were edited since their decisions were taken. */
  private readonly waiting = new Set<string>();
  private pause: NodeJS.Timeout | undefined;
  private readonly history: FolderHistory;

  constructor(
    /** Canonical, without a closing slash. */
    readonly uri: string,
    private readonly host: ServerHost,
    private readonly publisher: Publisher,
    private readonly editor: SessionEditor,
  ) {
    this.engine = new Engine(host.profiles);
    this.history = new FolderHistory(host, {
      folder: uri,
      trust: () => editor.trust(),
      take: (pastEdits) => {
        this.engine.apply({ mining: { ...this.engine.snapshot.mining, pastEdits } });
        this.settleWhenIdle();
      },
      log: (message) => editor.log(message),
    });
  }

  /** The state with everything that was edited so far. */
  get snapshot(): Snapshot {
    this.takeEditedTermbases();
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

  /** The documents that an editor holds, as they are now. */
  get openDocuments(): readonly TextDocument[] {
    return [...this.open.values()];
  }

  /** True where a termbase is loaded, be it one above the folder. */
  holds(termbaseUri: string): boolean {
    return this.open.has(termbaseUri) || this.engine.snapshot.termbases.some(({ uri }) => uri === termbaseUri);
  }

  /** Takes settings in. True where they choose other files than before: a survey must find them. */
  configure(settings: FolderSettings, excluded: readonly string[] = []): boolean {
    const otherHistory = settings.history !== this.settings.history;
    this.settings = settings;
    const files = { exclude: excluded, changeLogs: settings.read?.changeLogs === true };
    const otherFiles =
      files.changeLogs !== this.files.changeLogs || files.exclude.join('\n') !== this.files.exclude.join('\n');
    this.files = files;
    const least = settings.questions?.leastConfidence;
    const zones = settings.read?.zones;
    this.engine.apply({
      settings: { ...DEFAULT_SETTINGS, ...(least !== undefined && { leastConfidence: least }) },
      mining: { ...this.engine.snapshot.mining, closedZones: zones ? closedZones(zones) : undefined },
    });
    this.showDecisions();
    this.settleWhenIdle();
    if (otherHistory) this.readHistory();
    return otherFiles;
  }

  /**
   * Reads the folder and settles its relations, with progress shown. Open documents count as the editor has them; documents
   * and termbases that are gone are forgotten. A survey that is started later takes the place of this one.
   */
  async survey(): Promise<void> {
    if (this.uri === '') return;
    this.surveying?.abort();
    const mine = new AbortController();
    this.surveying = mine;
    this.renewed.clear();
    this.callOffSettling();
    this.tellState('surveying');
    try {
      await this.editor.withProgress('Evenword: surveying the documentation', async (report, cancelled) => {
        const signal = AbortSignal.any([cancelled, mine.signal]);
        await this.readAll(report, signal);
        report('comparing terms', 85);
        await this.settle(signal);
      });
      if (this.surveying !== mine) return;
      this.surveying = undefined;
      this.settleWhenIdle();
      this.readHistory();
    } catch (error) {
      if (this.surveying !== mine || this.ended.signal.aborted) return;
      this.surveying = undefined;
      const cancelled = error instanceof CalledOff || (error as Error).name === 'AbortError';
      this.tellState('failed', cancelled ? 'The survey was cancelled.' : (error as Error).message);
      if (!cancelled) this.editor.log(`The survey of ${this.uri} failed: ${String((error as Error).stack)}`);
    }
  }

  private async readAll(report: (message: string, percent: number) => void, signal: AbortSignal): Promise<void> {
    const { sources, termbases, leftOut } = await this.host.readFolder(this.uri, this.files, signal);
    signal.throwIfAborted();
    for (const { path, reason } of leftOut) this.editor.log(`Left out: ${path}: ${reason}`);
    const isOld = ({ uri }: { uri: string }): boolean => !this.open.has(uri) && !this.renewed.has(uri);
    this.takeTermbases([...termbases, ...goneFrom(this.snapshot.termbases, termbases)].filter(isOld));
    const closed = sources
      .filter(({ uri }) => !this.open.has(uri) && this.editor.owns(uri))
      .map((source) => withPathLanguage(source, this.uri));
    const facts = await this.host.gather(
      closed,
      (done, all) => report(`${done} of ${all} pages`, (80 * done) / all),
      signal,
    );
    const updates = closed.map((source, at): DocumentUpdate => ({ uri: source.uri, source, facts: facts[at]! }));
    const known = [...this.snapshot.documents.keys()].map((uri) => ({ uri }));
    const gone = goneFrom(known, closed).map(({ uri }) => ({ uri, source: undefined }));
    this.engine.apply({ documents: [...updates, ...gone].filter(isOld) });
  }

  /** A document was opened or edited: its findings are renewed at once, relations when typing rests. */
  edited(document: TextDocument): void {
    const uri = canonicalUri(document.uri);
    const isNew = !this.open.has(uri);
    this.open.set(uri, document);
    if (this.surveying !== undefined) this.renewed.add(uri);
    if (isTermbase(uri)) {
      this.waiting.add(uri);
      clearTimeout(this.pause);
      this.pause = setTimeout(() => {
        try {
          this.takeEditedTermbases();
        } catch (error) {
          this.editor.log(`${uri}: ${String((error as Error).stack)}`);
        }
      }, TERMBASE_IDLE);
      return;
    }
    const text = document.getText();
    if (isNew && !this.snapshot.documents.has(uri)) this.setAside(uri);
    const source = withPathLanguage({ uri, format: formatOfDocument(document), text }, this.uri);
    this.engine.apply({ documents: [{ uri, source, open: true, counted: !this.aside.has(uri) }] });
    this.publish(uri);
    this.settleWhenIdle();
  }

  /** A document was closed: what is on disk counts again. */
  async closed(document: TextDocument): Promise<void> {
    const uri = canonicalUri(document.uri);
    this.open.delete(uri);
    this.aside.delete(uri);
    if (!isTermbase(uri)) this.publisher.clear(uri);
    await this.filesChanged([uri]);
  }

  /** A document belongs to another session now. */
  release(document: TextDocument): void {
    const uri = canonicalUri(document.uri);
    this.open.delete(uri);
    this.aside.delete(uri);
    if (isTermbase(uri)) this.takeTermbases([{ uri, text: undefined }]);
    else this.engine.apply({ documents: [{ uri, source: undefined }] });
    this.settleWhenIdle();
  }

  /** Files on disk were made, changed or deleted, or a folder with files in it was deleted. All are taken in one step. */
  async filesChanged(uris: readonly string[]): Promise<void> {
    for (const uri of uris) this.renewed.add(uri);
    const done = this.reading.then(() => this.readChanged(uris));
    this.reading = done.catch(() => undefined);
    return done;
  }

  private async readChanged(changed: readonly string[]): Promise<void> {
    const termbases: TermbaseText[] = [];
    const documents: DocumentUpdate[] = [];
    for (const uri of new Set(changed.flatMap((each) => this.filesAt(each)))) {
      this.renewed.add(uri);
      if (this.open.has(uri)) continue;
      // Outside all folders only what is open counts: nothing there is surveyed.
      const isLoose = this.uri === '';
      if (isTermbase(uri)) {
        termbases.push({ uri, text: isLoose ? undefined : await this.host.readTermbase(this.uri, uri, this.files) });
      } else {
        const source = isLoose ? undefined : await this.host.readDocument(this.uri, uri, this.files);
        documents.push({ uri, source: source && withPathLanguage(source, this.uri) });
      }
    }
    if (this.ended.signal.aborted) return;
    const isClosed = ({ uri }: { uri: string }): boolean => !this.open.has(uri);
    this.engine.apply({ documents: documents.filter(isClosed) });
    if (termbases.some(isClosed)) this.takeTermbases(termbases.filter(isClosed));
    this.settleWhenIdle();
  }

  /** The files that a report of a change is about: of a deleted folder, all that is known below it. */
  private filesAt(uri: string): readonly string[] {
    const { documents, termbases } = this.snapshot;
    if (documents.has(uri) || isTermbase(uri) || formatOf(uri) !== undefined) return [uri];
    return [...documents.keys(), ...termbases.map((termbase) => termbase.uri)].filter((each) => isBelow(uri, each));
  }

  private takeEditedTermbases(): void {
    if (this.waiting.size === 0) return;
    clearTimeout(this.pause);
    const edited = [...this.waiting].flatMap((uri) => {
      const text = this.open.get(uri)?.getText();
      return text === undefined ? [] : [{ uri, text }];
    });
    this.waiting.clear();
    this.takeTermbases(edited);
  }

  private takeTermbases(termbases: readonly TermbaseText[]): void {
    this.engine.apply({ termbases });
    for (const { uri, text } of termbases) if (text === undefined) this.publisher.clear(uri);
    this.showDecisions();
  }

  /** Keeps a document that was opened from counting until its folder is found to hold it. */
  private setAside(uri: string): void {
    this.aside.add(uri);
    if (this.uri === '') return;
    this.host.whyLeftOut(this.uri, uri, this.files).then(
      (reason) => {
        const document = this.open.get(uri);
        if (reason === undefined && this.aside.delete(uri) && document !== undefined) this.edited(document);
      },
      (error: unknown) => this.editor.log(`${uri}: ${String(error)}`),
    );
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
    this.history.callOff();
    this.surveying?.abort();
    this.callOffSettling();
    clearTimeout(this.pause);
    for (const uri of this.open.keys()) this.publisher.clear(uri);
    for (const { uri } of this.snapshot.termbases) this.publisher.clear(uri);
    if (this.uri !== '') this.tellState('ended');
  }

  /** Reads the folder's history where that is wanted; a survey that is under way does so when it is done. */
  readHistory(): void {
    if (this.uri === '' || this.told === undefined || this.told.state !== 'ready') return;
    void this.history.read(this.settings);
  }

  private settleWhenIdle(): void {
    // A survey settles what comes in while it reads, and what comes in later is settled after it.
    if (this.surveying !== undefined || !this.engine.needsSettling || this.ended.signal.aborted) return;
    this.callOffSettling();
    this.idle = setTimeout(() => {
      this.settle(this.ended.signal).catch((error: unknown) => {
        if (!(error instanceof CalledOff)) this.editor.log(`Settling failed: ${String((error as Error).stack)}`);
      });
    }, IDLE);
  }

  private callOffSettling(): void {
    clearTimeout(this.idle);
    this.settling?.abort();
    this.settling = undefined;
  }

  private async settle(signal: AbortSignal): Promise<void> {
    const mine = new AbortController();
    this.settling = mine;
    try {
      await drive(this.engine.settle(), signal, mine.signal);
    } catch (error) {
      // An edit came in between: the settlement that follows it does this one's work too.
      if (error instanceof CalledOff && mine.signal.aborted && !signal.aborted) return;
      throw error;
    } finally {
      if (this.settling === mine) this.settling = undefined;
    }
    this.publishAll();
    this.tellState('ready');
  }

  private tellState(state: FolderStateParams['state'], message?: string): void {
    const { snapshot } = this;
    this.told = {
      ...{ folder: this.uri, state, documents: snapshot.relations.size.documents },
      openQuestions: snapshot.agendaAt(this.rootUri).open.length,
      ...(message !== undefined && { message }),
    };
    this.editor.state(this.told);
  }

  /** Decisions or settings changed: shows what follows from them, on pages and in the number of open questions. */
  private showDecisions(): void {
    this.publishAll();
    if (this.told?.state !== 'ready') return;
    if (this.told.openQuestions !== this.snapshot.agendaAt(this.rootUri).open.length) this.tellState('ready');
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
    if (this.ended.signal.aborted) return;
    const { snapshot } = this;
    const document = snapshot.documents.get(uri);
    if (document === undefined) return;
    const shown = snapshot
      .findingsIn(uri)
      .filter(({ code }) => code !== 'mixed-terms' || this.settings.hints?.mixedTerms !== false)
      .filter(({ code }) => code !== 'odd-companion' || this.settings.hints?.oddCompanions !== false);
    const problems = snapshot.problemsIn(uri);
    const lines = shown.length + problems.length === 0 ? undefined : this.linesOf(document.source);
    this.publisher.publish(
      uri,
      lines === undefined
        ? []
        : [
            ...shown.map((finding) => findingToDiagnostic(finding, lines)),
            ...problems.map((problem) => readingProblemToDiagnostic(problem, lines)),
          ],
      this.open.get(uri)?.version,
    );
  }
}
