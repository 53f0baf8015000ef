// The documents' own glossaries, as one: which names have entries, which entries send the reader to others.
import type { Corpus } from '../../corpus/corpus.js';
import type { GlossaryEntry, TokenRange } from '../../facts/glossary.js';
import { singularKey } from '../wording.js';

/** A statement of a glossary that two names are of one concept. */
export interface GlossaryLink {
  /** The entry's headword and the other name, as written. */
  readonly from: string;
  readonly to: string;
  /** Keys of both names. */
  readonly fromKey: string;
  readonly toKey: string;
  /**
   * `see`: the entry sends on to the other, preferred name. `also`: the other is a further name of what the entry is about.
   * `short`: the headword is short for it. `beside`: both stand over one entry, which lists of entries without definitions do too.
   */
  readonly kind: 'see' | 'also' | 'short' | 'beside';
  /** Index of the document in the corpus. */
  readonly document: number;
}

/** A headword's entry and where it stands. */
export interface PlacedEntry {
  /** The headword that the entry was looked up by. */
  readonly name: string;
  readonly document: number;
  readonly entry: GlossaryEntry;
}

/** The glossaries of one corpus. Names are compared in lower case, in English by their singular. */
export class Glossary {
  /** Entries that explain what their headwords name, by key; of several the first in order of documents. */
  private readonly explained = new Map<string, PlacedEntry>();
  private readonly concept = new Map<string, string>();
  readonly links: readonly GlossaryLink[];

  constructor(private readonly corpus: Corpus) {
    const links: GlossaryLink[] = [];
    corpus.documents.forEach(({ facts }, document) => {
      for (const entry of facts.glossary) links.push(...this.take(entry, document));
    });
    this.links = links;
  }

  /** True where the documents have no glossary. */
  get isEmpty(): boolean {
    return this.explained.size === 0 && this.links.length === 0;
  }

  /** The names, as written, that have an entry which explains them, in order of documents. */
  get explainedNames(): readonly string[] {
    return [...this.explained.values()].map(({ name }) => name);
  }

  /** The key of a name. */
  keyOf(name: string): string {
    const words = name
      .toLowerCase()
      .split(/\s+/u)
      .filter((word) => word !== '');
    const last = words.length - 1;
    if (last >= 0 && this.corpus.language === 'en') words[last] = singularKey(words[last]!);
    return words.join(' ');
  }

  /** The entry that explains a name. An entry that only sends the reader to another explains nothing. */
  entryOf(name: string): PlacedEntry | undefined {
    return this.explained.get(this.keyOf(name));
  }

  /** The names, as written, of entries that only send the reader to another name, with that name. */
  get sentOn(): ReadonlyMap<string, string> {
    return new Map(this.links.flatMap(({ kind, from, to }) => (kind === 'see' ? [[from, to]] : [])));
  }

  /** True where each of two names has an entry that explains it, and no entry says that they are one concept. */
  areTwo(a: string, b: string): boolean {
    const [one, other] = [this.keyOf(a), this.keyOf(b)];
    return (
      one !== other && this.explained.has(one) && this.explained.has(other) && this.rootOf(one) !== this.rootOf(other)
    );
  }

  /** The text of some tokens of a document, one space between words. */
  textOf(document: number, { firstToken, endToken }: TokenRange): string {
    const { facts } = this.corpus.documents[document]!;
    const words: string[] = [];
    for (let token = firstToken; token < endToken; token++) words.push(facts.words[facts.word[token]!]!);
    return words.join(' ');
  }

  private take(entry: GlossaryEntry, document: number): GlossaryLink[] {
    const names = entry.headwords.map((range) => this.textOf(document, range));
    const [from] = names;
    const fromKey = this.keyOf(from!);
    if (entry.see === undefined) {
      for (const name of names) {
        const key = this.keyOf(name);
        if (!this.explained.has(key)) this.explained.set(key, { name, document, entry });
      }
    }
    const others: { kind: GlossaryLink['kind']; to: string }[] = names.slice(1).map((to) => ({ kind: 'beside', to }));
    if (entry.see !== undefined) others.push({ kind: 'see', to: this.textOf(document, entry.see) });
    for (const range of entry.alsoCalled) others.push({ kind: 'also', to: this.textOf(document, range) });
    for (const range of entry.shortFor) others.push({ kind: 'short', to: this.textOf(document, range) });
    return others.flatMap(({ kind, to }) => {
      const toKey = this.keyOf(to);
      if (toKey === fromKey) return [];
      this.concept.set(this.rootOf(fromKey), this.rootOf(toKey));
      return [{ from: from!, to, fromKey, toKey, kind, document }];
    });
  }

  /** The key that stands for all names of one concept, as far as entries join them. */
  private rootOf(key: string): string {
    let root = key;
    for (let next = this.concept.get(root); next !== undefined && next !== root; next = this.concept.get(root))
      root = next;
    return root;
  }
}
