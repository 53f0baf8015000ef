// How often decided and asked names are used, and where, in all their inflected forms.
import type { Corpus } from '../corpus/corpus.js';
import { findUses } from '../corpus/concordance.js';
import { ObjectSet } from '../findings/objectOfVerb.js';
import { termForms, type Form, type PartOfSpeech } from '../rewrite/inflect.js';
import type { TermEntry, TermRef } from '../termbase/termbase.js';
import { termKey, termText } from '../termbase/termKey.js';
import { TAG, TokenFlag } from '../tokens/tokens.js';
import type { Relations } from './relations.js';

export { conditionalEntropy, entropy, mutualInformation, perplexity } from '../corpus/statistics/probability.js';

/** A name whose uses are counted. */
export interface CountedTerm {
  /** Unlike that of any other counted term. */
  readonly id: string;
  readonly text: string;
  /** Further spellings that count as this name. */
  readonly forms?: readonly string[];
  readonly partOfSpeech?: PartOfSpeech;
  /** True where only these very capitals are meant. */
  readonly exact?: boolean;
  /** For verbs: only uses with one of these objects count. */
  readonly objects?: readonly string[];
  /** The language that the name belongs to (BCP 47 primary subtag); every language where it is missing. */
  readonly language?: string;
}

/** The names of a decided concept, to be counted under ids by their place in it. */
export function countedNames(
  terms: readonly TermEntry[],
  objects: readonly TermRef[],
  idOf: (index: number) => string,
): CountedTerm[] {
  return terms.map((entry, index) => ({
    ...{ id: idOf(index), text: entry.text },
    ...(entry.partOfSpeech && { partOfSpeech: entry.partOfSpeech }),
    // Names that differ in capitals alone: the first takes what is written in no one's capitals.
    exact: entry.caseSensitive || terms.slice(0, index).some((other) => other.key === entry.key),
    ...(objects.length > 0 && { objects: objects.map(({ text }) => text) }),
  }));
}

/** The uses of one name. */
export interface TermUsage {
  readonly uses: number;
  /** Uses by URI of the document; documents without any are left out. In order of the URIs within a language. */
  readonly byDocument: ReadonlyMap<string, number>;
}

/** One spelling that names are known by. */
interface Spelling {
  readonly words: number;
  readonly owners: { readonly term: CountedTerm; readonly form: Form; readonly text: string }[];
}

interface Match {
  readonly row: number;
  readonly words: number;
  readonly owners: readonly CountedTerm[];
}

/**
 * Counts the uses of names in open text, blocks of the same prose once, by the id of each term. The leftmost, then the
 * longest match of all names together holds its words, so that a name inside a longer counted name is not counted.
 * One place counts for every name that claims it with the same spelling.
 */
export function countUses(relations: Relations, terms: readonly CountedTerm[]): ReadonlyMap<string, TermUsage> {
  const counts = new Map(terms.map(({ id }) => [id, { uses: 0, byDocument: new Map<string, number>() }]));
  const objects = new Map(terms.flatMap(({ id, objects: some }) => (some ? [[id, new ObjectSet(some)] as const] : [])));
  for (const { language, corpus } of relations.languages) {
    const own = terms.filter((term) => term.language === undefined || term.language === language);
    const matches = [...spellingsOf(own, language === 'en')].flatMap(([key, spelling]) =>
      matchesOf(corpus, key, spelling, objects),
    );
    matches.sort((a, b) => a.row - b.row || b.words - a.words);
    let free = 0;
    for (const { row, words, owners } of matches) {
      if (row < free) continue;
      free = row + words;
      const { uri } = corpus.documents[corpus.stream.documentOf(row)]!;
      for (const { id } of owners) {
        const count = counts.get(id)!;
        count.uses++;
        count.byDocument.set(uri, (count.byDocument.get(uri) ?? 0) + 1);
      }
    }
  }
  return counts;
}

/** @param inflects false in languages of which no inflection is known: names count as they are written */
function spellingsOf(terms: readonly CountedTerm[], inflects: boolean): ReadonlyMap<string, Spelling> {
  const spellings = new Map<string, Spelling>();
  for (const term of terms) {
    const given = (term.forms ?? []).map((text) => ({ form: 'base' as const, text }));
    const seen = new Set<string>();
    for (const { form, text } of [...termForms(term.text, inflects ? term.partOfSpeech : 'other'), ...given]) {
      const key = termKey(text);
      if (key === '' || seen.has(termText(text))) continue;
      seen.add(termText(text));
      const known = spellings.get(key) ?? { words: key.split(' ').length, owners: [] };
      spellings.set(key, known);
      known.owners.push({ term, form, text: termText(text) });
    }
  }
  return spellings;
}

function matchesOf(
  corpus: Corpus,
  key: string,
  { words, owners }: Spelling,
  objects: ReadonlyMap<string, ObjectSet>,
): Match[] {
  const matches: Match[] = [];
  const needsCase = owners.some(({ term }) => term.exact);
  for (const row of findUses(corpus, key).rows) {
    const meant = (needsCase ? ownersBySpelling(corpus, row, words, owners) : owners).filter(
      ({ term, form }) =>
        (corpus.language !== 'en' || fitsPartOfSpeech(corpus, row, words, term)) &&
        (!objects.has(term.id) || hasObject(corpus, row, words, form, objects.get(term.id)!)),
    );
    const claiming = [...new Set(meant.map(({ term }) => term))];
    if (claiming.length > 0) matches.push({ row, words, owners: claiming });
  }
  return matches;
}

/** Those meant by the capitals in the text; at a sentence's start a capital says nothing, so lower case is meant if known. */
function ownersBySpelling(corpus: Corpus, row: number, words: number, owners: Spelling['owners']): Spelling['owners'] {
  const { stream, vocabulary } = corpus;
  const written = Array.from({ length: words }, (_, i) => vocabulary.textOf(stream.spelling[row + i]!)).join(' ');
  const sentenceStart = (stream.flags[row]! & TokenFlag.sentenceStart) !== 0;
  const lowered = written.slice(0, 1).toLowerCase() + written.slice(1);
  for (const text of sentenceStart ? [lowered, written] : [written]) {
    const same = owners.filter((owner) => owner.text === text);
    if (same.length > 0) return same;
  }
  return owners.filter(({ term }) => term.exact !== true);
}

/** A single word stated to be a verb counts only as one, and a noun never as a verb, as far as the tagger tells. */
function fitsPartOfSpeech({ stream }: Corpus, row: number, words: number, { partOfSpeech }: CountedTerm): boolean {
  if (words > 1 || (partOfSpeech !== 'verb' && partOfSpeech !== 'noun')) return true;
  const isVerb = stream.tag[row] === TAG.VERB || stream.tag[row] === TAG.AUX;
  return isVerb === (partOfSpeech === 'verb');
}

function hasObject(corpus: Corpus, row: number, words: number, form: Form, objects: ObjectSet): boolean {
  const { stream, vocabulary } = corpus;
  const block = stream.blockOf(row);
  let from = row;
  while (from > stream.blockFirst[block]! && (stream.flags[from]! & TokenFlag.sentenceStart) === 0) from--;
  let until = row + 1;
  while (until < stream.blockFirst[block + 1]! && (stream.flags[until]! & TokenFlag.sentenceStart) === 0) until++;
  let text = '';
  let start = 0;
  let end = 0;
  for (let at = from; at < until; at++) {
    if (at > from && (stream.flags[at]! & TokenFlag.spaceBefore) !== 0) text += ' ';
    if (at === row) start = text.length;
    text += vocabulary.textOf(stream.spelling[at]!);
    if (at === row + words - 1) end = text.length;
  }
  return objects.isObjectOf(text, start, end, form);
}
