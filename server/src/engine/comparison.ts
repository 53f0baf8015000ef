// Two terms side by side, as a snapshot tells it: what speaks for one concept and what against, with sentences and figures.
import { compareCodeUnits } from '../base/order.js';
import { finish } from '../base/work.js';
import type { Relation } from '../decisions/decisions.js';
import { mustStayApart } from '../lexicon/opposites.js';
import { usesOfForms } from '../mining/companions/companions.js';
import { compareInCorpus } from '../mining/comparison/comparison.js';
import type { ComparedTerm, Comparison } from '../mining/comparison/comparison.js';
import type { MiningOptions } from '../mining/options.js';
import type { Question, Reason } from '../mining/question.js';
import type { Use } from '../mining/places.js';
import { tellingPlaces } from '../mining/synonyms/tellingPlaces.js';
import { termKey, termText } from '../termbase/termKey.js';
import { pointsOf } from './comparisonPoints.js';
import { verdictOf } from './comparisonVerdict.js';
import type { Verdict } from './comparisonVerdict.js';
import { ExampleFinder } from './examples.js';
import type { Example } from './examples.js';
import { languageOf, spellingsOf, unknownTerm } from './knownTerms.js';
import type { UnknownTerm } from './knownTerms.js';
import type { LanguageRelations } from './relations.js';
import type { Snapshot } from './snapshot.js';

/** Two terms as a reader sees them who must decide. */
export interface TermComparison {
  readonly kind: 'known';
  /** BCP 47 primary subtag. */
  readonly language: string;
  readonly terms: readonly [ComparedTerm, ComparedTerm];
  /** In plain words, with the figure behind each. */
  readonly speaksFor: readonly Reason[];
  readonly speaksAgainst: readonly Reason[];
  /** Sentences in which either stands in the other's place, and sentences that hold both. */
  readonly alternating: readonly Example[];
  readonly together: readonly Example[];
  readonly verdict: Verdict;
  /** Everything that was counted. */
  readonly figures: Comparison;
}

/** The two cannot be compared: one is unknown or stands within the other alone, they are one term, or no language has both. */
export type NoComparison =
  | UnknownTerm
  | { readonly kind: 'within'; readonly term: string; readonly whole: string }
  | { readonly kind: 'same' }
  | { readonly kind: 'two-languages' };

/** Sentences that are shown of those that hold both. */
const SHOWN_TOGETHER = 4;

/**
 * Compares two terms in the language that uses both. Takes about as long as mining for synonyms.
 * @param uri where the decisions are looked up: of a document or folder
 * @param options in the place of those that the snapshot was mined with
 */
export function compareTwoTerms(
  snapshot: Snapshot,
  uri: string,
  one: string,
  other: string,
  options: MiningOptions = snapshot.relations.mining,
): TermComparison | NoComparison {
  const [a, b] = [termText(one), termText(other)];
  if (termKey(a) === termKey(b)) return { kind: 'same' };
  const forms = [spellingsOf(snapshot, a), spellingsOf(snapshot, b)] as const;
  for (const [side, text] of [a, b].entries())
    if (languageOf(snapshot, forms[side]!) === undefined) return unknownTerm(snapshot, text);
  const language = languageOf(snapshot, ...forms);
  if (language === undefined) return { kind: 'two-languages' };
  const pair = [
    { text: a, forms: withoutSharedForms(forms[0], b, forms[1]) },
    { text: b, forms: withoutSharedForms(forms[1], a, forms[0]) },
  ] as const;
  if (pair.some((term) => usesOfForms(language.corpus, term.forms).length === 0)) return { kind: 'same' };
  const figures = finish(compareInCorpus(language.corpus, pair, options));
  const inner = figures.terms.findIndex(({ uses }) => uses.length === 0);
  if (inner >= 0) return { kind: 'within', term: pair[inner]!.text, whole: pair[1 - inner]!.text };
  const question = questionAbout(snapshot.relations.questions, a, b);
  const apart = mustStayApart(a.toLowerCase(), b.toLowerCase());
  const { speaksFor, speaksAgainst } = pointsOf(figures, apart, question?.reasons ?? []);
  const examples = new ExampleFinder(snapshot);
  return {
    ...{ kind: 'known', language: language.language, terms: figures.terms, speaksFor, speaksAgainst, figures },
    ...examplesOf(language, examples, figures),
    verdict: verdictOf(figures, {
      decided: decisionAbout(snapshot, uri, figures),
      question,
      settings: snapshot.settings,
    }),
  };
}

/** Spellings of a term that are not the other's as well: “log in” and “login” share none, “data” and “datum” might. */
function withoutSharedForms(own: readonly string[], other: string, others: readonly string[]): readonly string[] {
  return own.filter((form) => form !== other.toLowerCase() && (form === own[0] || !others.includes(form)));
}

function decisionAbout(snapshot: Snapshot, uri: string, { terms }: Comparison): Relation | undefined {
  const [a, b] = terms.map(({ text }) => ({ text, uses: 0, documents: 0, forms: [] }));
  return snapshot.agendaAt(uri).decisions.relationOf(a!, b!);
}

/** The surest question of any kind that asks about both. */
function questionAbout(questions: readonly Question[], a: string, b: string): Question | undefined {
  const named = ({ terms }: Question, text: string): number[] =>
    terms.flatMap((term, at) => ([term, ...term.forms].some((form) => termKey(form.text) === termKey(text)) ? at : []));
  // Two forms of one of its terms, such as singular and plural, are not what a question asks about.
  const asking = questions.filter((question) =>
    named(question, a).some((at) => named(question, b).some((other) => other !== at)),
  );
  return asking.sort((x, y) => y.confidence - x.confidence || compareCodeUnits(x.id, y.id))[0];
}

function examplesOf(
  { corpus }: LanguageRelations,
  examples: ExampleFinder,
  { terms, together }: Comparison,
): { alternating: Example[]; together: Example[] } {
  const { stream } = corpus;
  const spanOf = (
    document: number,
    first: number,
    last: number,
  ): { uri: string; span: { start: number; end: number } } => {
    const { uri, facts } = corpus.documents[document]!;
    return { uri, span: { start: facts.start[first]!, end: facts.end[last]! } };
  };
  const exampleOf = (term: ComparedTerm, { row, length }: Use): Example | undefined => {
    const document = stream.documentOf(row);
    const first = row - stream.documentFirst[document]!;
    return examples.at(term.text, spanOf(document, first, first + length - 1));
  };
  const places = tellingPlaces(
    stream,
    terms.map(({ uses }) => uses),
  );
  const rows = new Set(together.rows);
  const shared = terms[0].uses.filter(({ row }) => rows.has(row)).flatMap((use) => exampleOf(terms[0], use) ?? []);
  const sentences = new Map(shared.map((example) => [example.text, example]));
  return {
    alternating: places.flatMap(
      ({ term, document, firstToken, lastToken }) =>
        examples.at(terms[term]!.text, spanOf(document, firstToken, lastToken)) ?? [],
    ),
    together: [...sentences.values()].slice(0, SHOWN_TOGETHER),
  };
}
