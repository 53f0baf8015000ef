// Questions that a glossary itself raises: pages that use a name which an entry gives up for another.
import type { Corpus } from '../../corpus/corpus.js';
import { rowsOfSequence } from '../../corpus/concordance.js';
import { questionId } from '../question.js';
import type { Question, QuestionTerm } from '../question.js';
import { countDocuments, examplePlaces } from '../places.js';
import type { Use } from '../places.js';
import { byUses, displayText, makeTerm, numberForms } from '../wording.js';
import type { Glossary, GlossaryLink } from './glossary.js';
import { preferredKey, reasonOf } from './heed.js';

/** How sure a glossary's own word makes it. */
const CONFIDENCE = 0.9;
/** Fewest uses of each name outside the glossary. */
const FEWEST_USES = 2;

/** A question for each two names that an entry joins and pages use both, save those that are asked about already. */
export function askGlossary(corpus: Corpus, glossary: Glossary, asked: readonly Question[]): Question[] {
  if (glossary.links.length === 0) return [];
  const known = new Set(asked.flatMap(({ terms }) => pairsOf(terms.map(({ text }) => glossary.keyOf(text)))));
  const inEntries = rowsOfEntries(corpus);
  const questions = new Map<string, Question>();
  for (const link of glossary.links) {
    // A short form and what it is short for are no mix where they are explained; another engine asks about the rest.
    if (link.kind === 'short' || link.kind === 'beside' || known.has(pairKey(link.fromKey, link.toKey))) continue;
    known.add(pairKey(link.fromKey, link.toKey));
    const question = questionOf(corpus, link, inEntries);
    if (question !== undefined) questions.set(question.id, question);
  }
  return [...questions.values()];
}

function questionOf(corpus: Corpus, link: GlossaryLink, inEntries: ReadonlySet<number>): Question | undefined {
  const sides = [link.fromKey, link.toKey].map((key) => sideOf(corpus, key, inEntries));
  if (sides.includes(undefined)) return undefined;
  const [from, to] = sides as [Side, Side];
  const preferred = (preferredKey(link) === link.fromKey ? from : to).term.text;
  const ordered = [from, to].sort((a, b) => byUses(a.term, b.term));
  const terms = ordered.map(({ term }) => term);
  const reason = reasonOf(corpus, link);
  return {
    id: questionId('synonym', terms),
    kind: 'synonym',
    confidence: CONFIDENCE,
    worth: CONFIDENCE * terms[1]!.uses,
    terms,
    reasons: [reason],
    preferred: { text: preferred, reason },
    places: ordered.flatMap(({ uses }, index) => examplePlaces(corpus.stream, index, uses)),
  };
}

interface Side {
  readonly term: QuestionTerm;
  readonly uses: readonly Use[];
}

function sideOf(corpus: Corpus, key: string, inEntries: ReadonlySet<number>): Side | undefined {
  const { stream, vocabulary } = corpus;
  const words = key.split(' ');
  const last = words.pop()!;
  const forms = corpus.language === 'en' ? numberForms(last) : [last];
  const found = forms.flatMap((form) => {
    const folds = [...words, form].map((word) => vocabulary.find(word));
    if (folds.includes(undefined)) return [];
    const rows = rowsOfSequence(stream, folds as number[]).filter((row) => !inEntries.has(stream.blockOf(row)));
    const uses = rows.map((row) => ({ row, length: folds.length }));
    return uses.length === 0 ? [] : [{ text: displayText(stream, vocabulary, uses), uses }];
  });
  const uses = found.flatMap((form) => form.uses).sort((a, b) => a.row - b.row);
  if (uses.length < FEWEST_USES) return undefined;
  const texts = found.map((form) => ({ text: form.text, count: form.uses.length }));
  return { term: makeTerm(texts, countDocuments(stream, uses)), uses };
}

/** The blocks (numbered through) that entries name their concepts in: there a name is explained, not used. */
function rowsOfEntries({ stream, documents }: Corpus): ReadonlySet<number> {
  const blocks = new Set<number>();
  documents.forEach(({ facts }, document) => {
    const first = stream.documentFirst[document]!;
    for (const { headwords, see, alsoCalled, definition } of facts.glossary) {
      for (const range of [...headwords, ...alsoCalled, ...(see ? [see] : []), ...(definition ? [definition] : [])])
        blocks.add(stream.blockOf(first + range.firstToken));
    }
  });
  return blocks;
}

function pairsOf(keys: readonly string[]): string[] {
  return keys.flatMap((a, index) => keys.slice(index + 1).map((b) => pairKey(a, b)));
}

function pairKey(a: string, b: string): string {
  return a < b ? `${a}\n${b}` : `${b}\n${a}`;
}
