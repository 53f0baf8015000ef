// A cluster of noun terms as a question: its terms with their forms, the reasons in plain words, the places to show.
import { byCountThenText } from '../../base/order.js';
import type { Corpus } from '../../corpus/corpus.js';
import { singularOf } from '../../lexicon/plurals.js';
import type { Use } from '../places.js';
import { questionId } from '../question.js';
import type { Question, QuestionKind, QuestionTerm, Reason } from '../question.js';
import { tellingPlaces } from './tellingPlaces.js';
import { byUses, displayText, makeTerm, spelledAt } from '../wording.js';

/** A term of a question before it is put in order. */
export interface NamedUses {
  readonly uses: readonly Use[];
  readonly partOfSpeech: 'noun' | 'verb';
  /** The dictionary form, where it is known. */
  readonly text?: string;
}

/** Puts a question together; reasons come in the order of their weight. */
export function makeQuestion(
  corpus: Corpus,
  kind: QuestionKind,
  named: readonly NamedUses[],
  confidence: number,
  reasons: readonly Reason[],
): Question {
  const terms = named.map((each) => ({ term: nounTerm(corpus, each), uses: each.uses }));
  terms.sort((x, y) => byUses(x.term, y.term));
  const places = tellingPlaces(
    corpus.stream,
    terms.map(({ uses }) => uses),
  );
  const outside = terms.slice(1).reduce((sum, { term }) => sum + term.uses, 0);
  return {
    id: questionId(
      kind,
      terms.map(({ term }) => term),
    ),
    kind,
    confidence,
    worth: confidence * outside,
    terms: terms.map(({ term }) => term),
    reasons,
    places,
  };
}

function nounTerm({ stream, vocabulary }: Corpus, { uses, partOfSpeech, text: lemma }: NamedUses): QuestionTerm {
  const forms = new Map<string, Use[]>();
  for (const use of uses) {
    const text = spelledAt(stream, vocabulary, use).toLowerCase();
    const same = forms.get(text);
    if (same === undefined) forms.set(text, [use]);
    else same.push(use);
  }
  const shown = [...forms].map(([lower, same]) => ({
    lower,
    text: displayText(stream, vocabulary, same),
    count: same.length,
  }));
  const lead = shown.filter(({ lower }) => isSingular(lower)).sort(byCountThenText)[0];
  const documents = new Set(uses.map((use) => stream.documentOf(use.row))).size;
  return { ...makeTerm(shown, documents, lemma ?? lead?.text), partOfSpeech };
}

function isSingular(text: string): boolean {
  const head = text.slice(text.lastIndexOf(' ') + 1);
  return singularOf(head) === head;
}
