// The tagger's own lexicon, read from its language model: which words it knows, as what, and their dictionary forms.
import model from 'wink-eng-lite-web-model';
import type { Model } from 'wink-nlp';
import type { Tag } from './tokens.js';

/** A packed field: [word of the row, mask, shift, …], as the model (wink-eng-lite-web-model 1.8.1) lays it out. */
type Field = readonly [row: number, mask: number, shift: number];

interface Core {
  readonly packing: { readonly size: number; readonly layout: Readonly<Record<string, Field>> };
  readonly lexicon: Uint32Array;
  readonly pos: { readonly hash: Readonly<Record<string, number>> };
  readonly features: {
    readonly lexeme: { readonly hash: Readonly<Record<string, number>>; readonly list: readonly string[] };
    readonly posClusters: { readonly list: readonly ReadonlySet<number>[] };
  };
}

type Lemmatize = (word: string, tag: string, lexicon: { hasSamePOS(word: string, tag: string): boolean }) => string;

/** The words that the tagger knew when it was made; words it meets later do not change it. */
export class WinkLexicon {
  private readonly size: number;
  private readonly lemmatize = (model.addons as { lemmatize: Lemmatize }).lemmatize;
  private readonly asCache = { hasSamePOS: (word: string, tag: string) => this.isBaseForm(word, tag as Tag) };

  constructor(private readonly core: Core) {
    this.size = core.features.lexeme.list.length;
  }

  /** True where the word, in this very case, is in the lexicon as one token. */
  knows(word: string): boolean {
    return this.index(word) >= 0;
  }

  /** True where the lexicon has the word as a base form of this part of speech. */
  isBaseForm(word: string, tag: Tag): boolean {
    const at = this.index(word);
    return at >= 0 && this.field(at, 'isBaseForm') === 1 && this.isMember(at, tag);
  }

  /** True where the lexicon has the word in this part of speech, inflected or not. */
  canBe(word: string, tag: Tag): boolean {
    const at = this.index(word);
    return at >= 0 && this.isMember(at, tag);
  }

  /** The dictionary form of a lower-case word that the lexicon has; undefined where it has not. Spelling is kept as it is. */
  lemma(word: string, tag: Tag): string | undefined {
    const at = this.index(word);
    if (at < 0) return undefined;
    if (this.field(at, 'isSpellingMapped') === 0 && this.field(at, 'isSLemma') === 1) {
      return this.core.features.lexeme.list[this.field(at, 'lemma')];
    }
    return this.lemmatize(word, tag, this.asCache);
  }

  private index(word: string): number {
    const at = this.core.features.lexeme.hash[word];
    return at !== undefined && at < this.size && this.field(at, 'isContraction') === 0 ? at : -1;
  }

  private isMember(at: number, tag: Tag): boolean {
    const code = this.core.pos.hash[tag];
    const cluster = this.core.features.posClusters.list[this.field(at, 'lexemeCID')];
    return code !== undefined && cluster !== undefined && cluster.has(code);
  }

  private field(at: number, name: string): number {
    const [row, mask, shift] = this.core.packing.layout[name]!;
    return (this.core.lexicon[at * this.core.packing.size + row]! & mask) >>> shift;
  }
}

/** The language model, and the lexicon of the tagger that will be made with it. */
export function openModel(): { readonly model: Model; lexicon(): WinkLexicon } {
  const { core } = model as unknown as { readonly core: () => Core };
  let opened: WinkLexicon | undefined;
  const tapped = {
    ...model,
    core: () => {
      const loaded = core();
      opened = new WinkLexicon(loaded);
      return loaded;
    },
  };
  return {
    model: tapped,
    lexicon: () => (opened ??= new WinkLexicon(core())),
  };
}
