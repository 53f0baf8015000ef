// What was mined: per language a corpus and its questions, settled from the documents' facts.
import { compareCodeUnits } from '../base/order.js';
import type { Work } from '../base/work.js';
import { Corpus } from '../corpus/corpus.js';
import type { DocumentFacts } from '../facts/documentFacts.js';
import { mine } from '../mining/mine.js';
import { DEFAULT_MINING, sameMining } from '../mining/options.js';
import type { MiningOptions } from '../mining/options.js';
import type { Question, UsePlace } from '../mining/question.js';
import type { Span } from '../base/span.js';
import { CLOSED_ZONES } from '../prose/zones.js';
import type { ZoneSet } from '../prose/zones.js';

/** A place in a document by its URI; offsets into its source. */
export interface SourcePlace {
  readonly uri: string;
  readonly span: Span;
}

/** The questions of one language and the corpus they were mined from. Languages are mined apart. */
export interface LanguageRelations {
  readonly language: string;
  readonly corpus: Corpus;
  readonly questions: readonly Question[];
}

/** Everything mined from a set of documents; immutable. */
export class Relations {
  static readonly none = new Relations([], DEFAULT_MINING);

  private constructor(
    readonly languages: readonly LanguageRelations[],
    /** What they were mined with. */
    readonly mining: MiningOptions,
  ) {}

  /** All questions, by worth, ties by code units of their ids. */
  get questions(): readonly Question[] {
    const all = this.languages.flatMap(({ questions }) => questions);
    return this.languages.length < 2 ? all : all.sort((a, b) => b.worth - a.worth || compareCodeUnits(a.id, b.id));
  }

  /** Number of documents and of counted words, over all languages. */
  get size(): { readonly documents: number; readonly words: number } {
    let words = 0;
    for (const { corpus } of this.languages) words += corpus.words;
    const [first, ...others] = this.languages;
    if (others.length === 0) return { documents: first?.corpus.documents.length ?? 0, words };
    const uris = new Set(this.languages.flatMap(({ corpus }) => corpus.documents.map(({ uri }) => uri)));
    return { documents: uris.size, words };
  }

  /** Where a use that a question of this mining names stands in its source. */
  placeOf(question: Question, place: UsePlace): SourcePlace | undefined {
    const relations = this.languages.find(({ language }) => language === question.language);
    const document = relations?.corpus.documents[place.document];
    if (document === undefined) return undefined;
    const start = document.facts.start[place.firstToken];
    const end = document.facts.end[place.lastToken];
    return start === undefined || end === undefined ? undefined : { uri: document.uri, span: { start, end } };
  }

  /**
   * The next state: facts by URI, undefined for a document that is gone. Only languages that changed are mined anew; all of
   * them where the options changed.
   */
  *settle(
    changes: ReadonlyMap<string, readonly DocumentFacts[] | undefined>,
    options: MiningOptions = this.mining,
  ): Work<Relations> {
    const minesAlike = sameMining(options, this.mining);
    const corpora = new Map(this.languages.map((each) => [each.language, each]));
    const languages = new Set(corpora.keys());
    for (const facts of changes.values()) for (const { language } of facts ?? []) languages.add(language);
    const next: LanguageRelations[] = [];
    for (const language of [...languages].sort(compareCodeUnits)) {
      const known = corpora.get(language);
      const own = [...changes]
        .map(([uri, facts]) => ({ uri, facts: facts?.find((each) => each.language === language) }))
        .filter(({ uri, facts }) => facts !== undefined || known?.corpus.has(uri) === true);
      if (own.length === 0 && (known === undefined || minesAlike)) {
        if (known !== undefined) next.push(known);
        continue;
      }
      const before = yield* countedIn(known?.corpus, options.closedZones);
      const corpus = own.length === 0 ? before : yield* before.apply(own);
      if (corpus.documents.length === 0) continue;
      const questions = yield* mine(corpus, options);
      next.push({ language, corpus, questions: questions.map((question) => ({ ...question, language })) });
    }
    return new Relations(next, options);
  }
}

/** A corpus of the same documents that counts the words of the zones that are open now. */
function* countedIn(corpus: Corpus | undefined, closed: ZoneSet = CLOSED_ZONES): Work<Corpus> {
  if (corpus?.closed === closed) return corpus;
  return yield* Corpus.create(closed).apply(corpus?.documents ?? []);
}
