// The engine's one writer: takes changes, hands out immutable snapshots, and settles relations as work that can rest.
import { LayeredMap } from '../base/layeredMap.js';
import type { Work } from '../base/work.js';
import type { DocumentFacts } from '../facts/documentFacts.js';
import { DEFAULT_MINING, sameMining } from '../mining/options.js';
import type { MiningOptions } from '../mining/options.js';
import { DEFAULT_KINDS } from '../mining/question.js';
import { reread, startReading } from '../prose/read.js';
import type { SourceText } from '../text/sourceText.js';
import { parseTermbase } from '../termbase/parse.js';
import { emptyTermbase } from '../termbase/termbase.js';
import { factsOfProse } from './factsOf.js';
import type { Profiles } from './factsOf.js';
import { Relations } from './relations.js';
import { Snapshot } from './snapshot.js';
import type { EngineDocument, EngineSettings, EngineState, LoadedTermbase, Scoped } from './snapshot.js';

/** One document's change: a new text, or undefined where the document is gone. */
export interface DocumentUpdate {
  readonly uri: string;
  readonly source: SourceText | undefined;
  /** Facts of exactly this text, one for each language, where a worker has gathered them already. */
  readonly facts?: readonly DocumentFacts[];
  /** True while an editor holds the document: its reading is kept for the next edit. */
  readonly open?: boolean;
  /** False for a document that is no part of the set: it is checked, but nothing is mined from it. */
  readonly counted?: boolean;
}

/** A change of the world outside, made in one step. */
export interface EngineChange {
  readonly documents?: readonly DocumentUpdate[];
  /** Texts of termbase files; undefined for one that is gone. */
  readonly termbases?: readonly { readonly uri: string; readonly text: string | undefined }[];
  readonly settings?: EngineSettings;
  /** What to mine with from the next settlement on. */
  readonly mining?: MiningOptions;
}

export { CONTEXT_KINDS, SIMILARITIES, WEIGHTINGS } from '../mining/options.js';
export { QUESTION_KINDS } from '../mining/question.js';
export { SWITCHED_ZONES, closedZones } from '../prose/zones.js';

/** What is asked unless settings say otherwise. */
export const DEFAULT_SETTINGS: EngineSettings = { kinds: DEFAULT_KINDS, leastConfidence: 0.5 };

/**
 * Holds the documents of one workspace folder. {@link apply} is immediate: texts and termbases are new at once, relations
 * are those last settled. {@link settle} brings the relations up to date with all texts applied before it began.
 * Findings after settling are a function of texts, settings and termbases, never of the order of changes.
 */
export class Engine {
  private state: EngineState;
  private scopes = new Map<string, Scoped>();
  /** Documents whose facts are not in the relations yet, with their facts where they came along. */
  private readonly unsettled = new Map<string, readonly DocumentFacts[] | undefined>();
  private settlement = 0;

  constructor(private readonly profiles: Profiles) {
    this.state = {
      revision: 0,
      settings: DEFAULT_SETTINGS,
      mining: DEFAULT_MINING,
      documents: LayeredMap.empty(),
      termbases: [],
      relations: Relations.none,
    };
  }

  /** The state now. Hold one snapshot for the length of a request. */
  get snapshot(): Snapshot {
    return new Snapshot(this.state, this.scopes);
  }

  /** True where {@link settle} has something to do. */
  get needsSettling(): boolean {
    return this.unsettled.size > 0 || !sameMining(this.state.mining, this.state.relations.mining);
  }

  /** Takes a change in and returns the snapshot after it. Applying a text that is there already changes nothing. */
  apply(change: EngineChange): Snapshot {
    const documents = this.changedDocuments(change.documents ?? []);
    const termbases = changedTermbases(this.state.termbases, change.termbases ?? []);
    const settings = change.settings ?? this.state.settings;
    const mining = change.mining ?? this.state.mining;
    const newAgenda =
      termbases !== this.state.termbases ||
      settings !== this.state.settings ||
      mining.closedZones !== this.state.mining.closedZones;
    this.commit({ documents, termbases, settings, mining }, newAgenda);
    return this.snapshot;
  }

  /**
   * Gathers the facts of changed documents, counts and mines. Rests between documents and inside mining. Changes applied
   * while it rests are left for the next settlement; a settlement that was started later makes this one return undone.
   */
  *settle(): Work<Snapshot> {
    const mine = ++this.settlement;
    const changes = new Map<string, readonly DocumentFacts[] | undefined>();
    const began = new Map<string, EngineDocument | undefined>();
    for (const uri of [...this.unsettled.keys()]) {
      // Read anew after each rest: an edit meanwhile has thrown away facts that came with the text before it.
      const document = this.state.documents.get(uri);
      const facts = document?.counted === true ? (this.unsettled.get(uri) ?? this.factsOf(document)) : undefined;
      this.unsettled.set(uri, facts);
      began.set(uri, document);
      changes.set(uri, facts);
      yield;
      if (mine !== this.settlement) return this.snapshot;
    }
    const { relations, mining } = this.state;
    const work = relations.settle(changes, mining);
    let step = work.next();
    while (step.done !== true) {
      yield;
      if (mine !== this.settlement) return this.snapshot;
      step = work.next();
    }
    for (const [uri, document] of began) {
      if (this.state.documents.get(uri)?.source === document?.source) this.unsettled.delete(uri);
    }
    if (changes.size > 0 || !sameMining(mining, relations.mining)) this.commit({ relations: step.value }, true);
    return this.snapshot;
  }

  private factsOf({ source, reading }: EngineDocument): readonly DocumentFacts[] {
    return factsOfProse((reading ?? startReading(source)).prose, this.profiles, source);
  }

  private changedDocuments(updates: readonly DocumentUpdate[]): LayeredMap<string, EngineDocument> {
    const before = this.state.documents;
    const changes = new Map<string, EngineDocument | undefined>();
    for (const { uri, source, facts, open, counted = true } of updates) {
      const known = changes.has(uri) ? changes.get(uri) : before.get(uri);
      if (source === undefined) {
        changes.set(uri, undefined);
        if (known?.counted === true) this.unsettled.set(uri, undefined);
        continue;
      }
      const same =
        known?.source.text === source.text &&
        known.source.format === source.format &&
        known.source.pathLanguage === source.pathLanguage;
      changes.set(uri, {
        source: same ? known.source : source,
        reading: readingAfter(known, source, same, open === true),
        counted,
      });
      if (counted ? !same || !known.counted || facts !== undefined : known?.counted === true)
        this.unsettled.set(uri, facts);
    }
    return before.with(changes);
  }

  private commit(parts: Partial<EngineState>, newAgenda: boolean): void {
    this.state = {
      ...this.state,
      ...parts,
      revision: this.state.revision + 1,
    };
    if (newAgenda) this.scopes = new Map();
  }
}

function readingAfter(
  known: EngineDocument | undefined,
  source: SourceText,
  same: boolean,
  open: boolean,
): EngineDocument['reading'] {
  if (!open) return undefined;
  if (known?.reading === undefined) return startReading(source);
  return same ? known.reading : reread(known.reading, source);
}

function changedTermbases(
  known: readonly LoadedTermbase[],
  changes: readonly { readonly uri: string; readonly text: string | undefined }[],
): readonly LoadedTermbase[] {
  if (changes.every(({ uri, text }) => known.find((loaded) => loaded.uri === uri)?.text === text)) return known;
  const next = new Map(known.map((loaded) => [loaded.uri, loaded]));
  for (const { uri, text } of changes) {
    if (text === undefined) next.delete(uri);
    else next.set(uri, load(uri, text, next.get(uri)));
  }
  return [...next.values()].sort((a, b) => (a.uri < b.uri ? -1 : 1));
}

/** Reads a termbase file; where it is broken the last good decisions stay in force. */
function load(uri: string, text: string, before: LoadedTermbase | undefined): LoadedTermbase {
  const { termbase, problems, usable } = parseTermbase(text, uri);
  return { uri, text, problems, usable, termbase: usable ? termbase : (before?.termbase ?? emptyTermbase(uri)) };
}
