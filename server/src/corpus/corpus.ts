// The corpus: all documents' facts added up in whole numbers; an immutable snapshot, from which a change makes the next.
import { compareCodeUnits } from '../base/order.js';
import { PagedColumn } from '../base/pagedColumn.js';
import type { Work } from '../base/work.js';
import type { DocumentFacts } from '../facts/documentFacts.js';
import { CLOSED_ZONES } from '../prose/zones.js';
import type { ZoneSet } from '../prose/zones.js';
import { TokenFlag } from '../tokens/tokens.js';
import type { CorpusDocument } from './corpusDocument.js';
import { countBlock } from './counting.js';
import { GramTable } from './grams.js';
import { makeStream } from './stream.js';
import type { TokenStream } from './stream.js';
import { Vocabulary } from './vocabulary.js';

/** A document to put in, or to take out where `facts` is undefined. */
export interface DocumentChange {
  readonly uri: string;
  readonly facts: DocumentFacts | undefined;
}

/** Tables that only grow: shared by all snapshots of one corpus, and written by its one writer alone. */
interface Tables {
  readonly closed: ZoneSet;
  readonly vocabulary: Vocabulary;
  readonly grams: GramTable;
  readonly blockIds: Map<number, number>;
}

/**
 * Counts over a set of documents. Blocks with the same prose count once, however many documents hold them; only words in
 * open zones count. Every count is a function of the set of documents alone, whatever the order of changes was.
 */
export class Corpus {
  /** An empty corpus that counts no words in the given zones. */
  static create(closed: ZoneSet = CLOSED_ZONES): Corpus {
    const tables = {
      closed,
      vocabulary: new Vocabulary(),
      grams: new GramTable(),
      blockIds: new Map<number, number>(),
    };
    return new Corpus(tables, [], PagedColumn.empty, PagedColumn.empty, PagedColumn.empty);
  }

  private cachedStream: TokenStream | undefined;

  private constructor(
    private readonly tables: Tables,
    /** In order of their URIs' code units. */
    readonly documents: readonly CorpusDocument[],
    private readonly blockUses: PagedColumn,
    private readonly wordUses: PagedColumn,
    private readonly gramUses: PagedColumn,
  ) {}

  /** The language of its documents, as a BCP 47 primary subtag; English while it has none. */
  get language(): string {
    return this.documents[0]?.facts.language ?? 'en';
  }

  get vocabulary(): Vocabulary {
    return this.tables.vocabulary;
  }

  /** The zones whose words do not count. */
  get closed(): ZoneSet {
    return this.tables.closed;
  }

  get grams(): GramTable {
    return this.tables.grams;
  }

  /** Uses of a spelling, as written. */
  usesOfWord(id: number): number {
    return this.wordUses.get(id);
  }

  /** Uses of an n-gram of lower-case words that begins and ends with a content word. */
  usesOfGram(id: number): number {
    return this.gramUses.get(id);
  }

  /** All tokens in one row of columns, in document order; made when first asked for. */
  get stream(): TokenStream {
    this.cachedStream ??= makeStream(this.documents, this.vocabulary, this.closed);
    return this.cachedStream;
  }

  /** Number of counted words: those in open zones, blocks of the same prose once. */
  get words(): number {
    const { stream } = this;
    let words = 0;
    for (let row = 0; row < stream.length; row++) {
      if (stream.counted[row] === 1 && (stream.flags[row]! & TokenFlag.word) !== 0) words++;
    }
    return words;
  }

  has(uri: string): boolean {
    return this.find(uri) !== undefined;
  }

  /** The document of a URI, by binary search. */
  find(uri: string): CorpusDocument | undefined {
    let low = 0;
    let high = this.documents.length - 1;
    while (low <= high) {
      const middle = (low + high) >>> 1;
      const document = this.documents[middle]!;
      const order = compareCodeUnits(document.uri, uri);
      if (order === 0) return document;
      if (order < 0) low = middle + 1;
      else high = middle - 1;
    }
    return undefined;
  }

  /** The next snapshot; this one stays as it is. A later change of the same URI in one list wins. */
  *apply(changes: readonly DocumentChange[]): Work<Corpus> {
    const changed = new Map(changes.map((change) => [change.uri, change.facts]));
    const blockUses = this.blockUses.edit();
    const columns = { words: this.wordUses.edit(), grams: this.gramUses.edit() };
    const count = (document: CorpusDocument, sign: 1 | -1): void => {
      const { blocks } = document;
      for (let index = 0; index < blocks.length; index++) {
        const uses = blockUses.add(blocks[index]!, sign);
        if (uses === (sign === 1 ? 1 : 0)) countBlock(document, index, sign, this.tables, columns);
      }
    };
    const documents: CorpusDocument[] = [];
    for (const document of this.documents) {
      if (changed.has(document.uri)) count(document, -1);
      else documents.push(document);
    }
    for (const [uri, facts] of changed) {
      if (facts === undefined) continue;
      const document = this.number(uri, facts);
      count(document, 1);
      documents.push(document);
      yield;
    }
    documents.sort((a, b) => compareCodeUnits(a.uri, b.uri));
    return new Corpus(this.tables, documents, blockUses.finish(), columns.words.finish(), columns.grams.finish());
  }

  private number(uri: string, facts: DocumentFacts): CorpusDocument {
    const { vocabulary, blockIds } = this.tables;
    const ids = new Uint32Array(facts.words.length);
    // The vocabulary's own strings: documents share them, and let go of those that came with the facts.
    const words = facts.words.map((word, index) => vocabulary.textOf((ids[index] = vocabulary.idOf(word))));
    const blocks = new Uint32Array(facts.blockHash.length);
    for (let index = 0; index < blocks.length; index++) {
      const hash = facts.blockHash[index]!;
      let id = blockIds.get(hash);
      if (id === undefined) blockIds.set(hash, (id = blockIds.size));
      blocks[index] = id;
    }
    return { uri, facts: { ...facts, words }, ids, blocks };
  }
}
