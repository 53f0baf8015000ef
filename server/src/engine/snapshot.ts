// What everyone reads: the state of the engine at one revision; it never changes.
import type { LayeredMap } from '../base/layeredMap.js';
import type { Span } from '../base/span.js';
import { decide } from '../decisions/decide.js';
import type { Agenda } from '../decisions/decide.js';
import { scopeOf } from '../decisions/scope.js';
import type { PlacedTermbase } from '../decisions/scope.js';
import type { Finding } from '../findings/finding.js';
import type { MiningOptions } from '../mining/options.js';
import type { QuestionKind } from '../mining/question.js';
import { readKept } from '../findings/suppression.js';
import type { ReadingProblem } from '../prose/prose.js';
import { startReading } from '../prose/read.js';
import type { Reading } from '../prose/read.js';
import type { SourceText } from '../text/sourceText.js';
import { emptyTermbase } from '../termbase/termbase.js';
import type { Termbase, TermbaseProblem } from '../termbase/termbase.js';
import { Checker } from './checker.js';
import type { Relations } from './relations.js';

/** A document as the engine holds it. */
export interface EngineDocument {
  readonly source: SourceText;
  /** Kept for documents that are open in an editor, so that an edit is read at the cost of the edit. */
  readonly reading: Reading | undefined;
  /** True where its words count and are mined. */
  readonly counted: boolean;
}

/** A termbase file: its text and problems now, and the decisions of its last sound text, which stay in force. */
export interface LoadedTermbase {
  readonly uri: string;
  readonly text: string;
  readonly problems: readonly TermbaseProblem[];
  readonly usable: boolean;
  readonly termbase: Termbase;
}

/** What is asked. */
export interface EngineSettings {
  /** Kinds of question that are asked. */
  readonly kinds: readonly QuestionKind[];
  /** Least confidence, from 0 to 1, of a question that is asked. */
  readonly leastConfidence: number;
}

/** The parts of a state; {@link Snapshot} adds what is derived from them. */
export interface EngineState {
  readonly revision: number;
  readonly settings: EngineSettings;
  /** What the next settlement mines with. */
  readonly mining: MiningOptions;
  readonly documents: LayeredMap<string, EngineDocument>;
  readonly termbases: readonly LoadedTermbase[];
  readonly relations: Relations;
}

/** One revision of the engine, with everything that can be asked of it. */
export class Snapshot {
  constructor(
    private readonly state: EngineState,
    /** Agendas and checkers by scope: shared by all snapshots of equal relations, termbases and settings. */
    private readonly scopes: Map<string, Scoped>,
  ) {}

  get revision(): number {
    return this.state.revision;
  }

  get documents(): ReadonlyMap<string, EngineDocument> {
    return this.state.documents;
  }

  get termbases(): readonly LoadedTermbase[] {
    return this.state.termbases;
  }

  get relations(): Relations {
    return this.state.relations;
  }

  get mining(): MiningOptions {
    return this.state.mining;
  }

  get settings(): EngineSettings {
    return this.state.settings;
  }

  /** A document's prose, read anew where it is not kept; undefined for an unknown URI. */
  readingOf(uri: string): Reading | undefined {
    const document = this.state.documents.get(uri);
    return document && (document.reading ?? startReading(document.source));
  }

  /** The same state, asking other kinds of question. */
  asking(kinds: readonly QuestionKind[]): Snapshot {
    return new Snapshot({ ...this.state, settings: { ...this.state.settings, kinds } }, new Map());
  }

  /** What is decided and what is asked where the URI (of a document, existing or not) stands. */
  agendaAt(uri: string): Agenda {
    return this.scopeAt(uri).agenda;
  }

  /** The checker for the decisions where the URI stands. */
  checkerAt(uri: string): Checker {
    return this.scopeAt(uri).checker;
  }

  /** The URI of the nearest termbase in force at a URI, or undefined where there is none. */
  termbaseAt(uri: string): LoadedTermbase | undefined {
    const id = scopeOf(uri, this.placed()).id;
    return this.state.termbases.find((loaded) => loaded.uri === id);
  }

  /** The findings of a document, in order of their places; empty for an unknown URI. */
  findingsIn(uri: string): readonly Finding[] {
    const reading = this.readingOf(uri);
    return reading === undefined ? [] : this.checkerAt(uri).check(reading);
  }

  /** What could not be read of a document, and comments to us that say nothing we know; in order of their places. */
  problemsIn(uri: string): readonly ReadingProblem[] {
    const reading = this.readingOf(uri);
    if (reading === undefined) return [];
    const problems = [...reading.prose.problems, ...readKept(reading.source).problems];
    return problems.sort((a, b) => a.span.start - b.span.start);
  }

  /** The text of a span of a document, or undefined where the document is unknown. */
  textOf(uri: string, span: Span): string | undefined {
    return this.state.documents.get(uri)?.source.text.slice(span.start, span.end);
  }

  private placed(): PlacedTermbase[] {
    return this.state.termbases.map(({ uri, termbase }) => ({ uri, termbase }));
  }

  private scopeAt(uri: string): Scoped {
    const scope = scopeOf(uri, this.placed());
    let scoped = this.scopes.get(scope.id);
    if (scoped === undefined) {
      const { kinds, leastConfidence } = this.state.settings;
      const asked = this.state.relations.questions.filter(
        // Look-alikes are weak by nature: whoever asks for the kind wants to see them.
        ({ kind, confidence }) => kinds.includes(kind) && (kind === 'look-alike' || confidence >= leastConfidence),
      );
      const agenda = decide(scope.chain.length > 0 ? scope.chain : [emptyTermbase('')], asked);
      scoped = { agenda, checker: new Checker(agenda, this.state.relations, this.state.mining.closedZones) };
      this.scopes.set(scope.id, scoped);
    }
    return scoped;
  }
}

/** What is derived for one scope of termbases. */
export interface Scoped {
  readonly agenda: Agenda;
  readonly checker: Checker;
}
