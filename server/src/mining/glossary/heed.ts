// What the documents' own glossary says to questions: two entries are two concepts, and its headwords are preferred.
import type { Corpus } from '../../corpus/corpus.js';
import type { Question, QuestionTerm, Reason } from '../question.js';
import type { Glossary, GlossaryLink } from './glossary.js';

/** From this confidence up a glossary's own word is believed. */
const STATED = 0.9;

/**
 * The questions that a glossary leaves, with what it says to them. Two names with an entry each are never asked about; where an
 * entry sends from one name to another, or one name alone has an entry, that name is preferred.
 */
export function heedGlossary(corpus: Corpus, glossary: Glossary, questions: readonly Question[]): Question[] {
  if (glossary.isEmpty) return [...questions];
  return questions
    .filter((question) => !asksAboutTwo(question, glossary))
    .map((question) => withGlossary(corpus, glossary, question));
}

function asksAboutTwo({ kind, terms }: Question, glossary: Glossary): boolean {
  // One short form with two meanings, or verbs with an object, are about something else than the entries.
  if (kind === 'ambiguous-abbreviation' || kind === 'verb-object') return false;
  return terms.some((a, index) => terms.slice(index + 1).some((b) => glossary.areTwo(a.text, b.text)));
}

function withGlossary(corpus: Corpus, glossary: Glossary, question: Question): Question {
  if (question.kind === 'ambiguous-abbreviation' || question.kind === 'verb-object') return question;
  const { terms } = question;
  const link = glossary.links.find(
    ({ kind, fromKey, toKey }) =>
      (kind === 'see' || kind === 'also') && keysOf(terms, glossary).has(fromKey) && keysOf(terms, glossary).has(toKey),
  );
  if (link !== undefined) {
    const preferred = termOfKey(terms, glossary, preferredKey(link))!;
    const reason = reasonOf(corpus, link);
    const confidence = Math.max(question.confidence, STATED);
    return {
      ...question,
      confidence,
      worth: (question.worth / question.confidence) * confidence,
      reasons: [reason, ...question.reasons],
      preferred: {
        text: preferred.text,
        reason: { ...reason, text: `the glossary on ${pageOf(corpus, link.document)} prefers it` },
      },
    };
  }
  const explained = terms.filter(({ text }) => glossary.entryOf(text) !== undefined);
  if (explained.length !== 1) return question;
  const [{ text }] = explained as [QuestionTerm];
  const page = pageOf(corpus, glossary.entryOf(text)!.document);
  const says = (name: string): Reason => ({
    kind: 'glossary',
    text: `${name} has an entry in the glossary on ${page}`,
    value: 1,
  });
  return {
    ...question,
    reasons: [...question.reasons, says(`“${text}”`)],
    preferred: { text, reason: says('it') },
  };
}

/** The key of the name that an entry prefers: its headword, save where it sends the reader elsewhere. */
export function preferredKey({ kind, fromKey, toKey }: GlossaryLink): string {
  return kind === 'see' ? toKey : fromKey;
}

/** What an entry says of two names, for a writer. */
export function reasonOf(corpus: Corpus, { kind, from, to, document }: GlossaryLink): Reason {
  const page = pageOf(corpus, document);
  const text =
    kind === 'see'
      ? `the glossary on ${page} sends “${from}” to “${to}”`
      : `the glossary on ${page} also calls “${from}” “${to}”`;
  return { kind: 'glossary', text, value: 1 };
}

function pageOf(corpus: Corpus, document: number): string {
  const { uri } = corpus.documents[document]!;
  return uri.slice(uri.lastIndexOf('/') + 1);
}

function keysOf(terms: readonly QuestionTerm[], glossary: Glossary): ReadonlySet<string> {
  return new Set(terms.map(({ text }) => glossary.keyOf(text)));
}

function termOfKey(terms: readonly QuestionTerm[], glossary: Glossary, key: string): QuestionTerm | undefined {
  return terms.find(({ text }) => glossary.keyOf(text) === key);
}
