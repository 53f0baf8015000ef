// Everything the documents, the lists and the past say for and against two terms being one concept.
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { lexicalLink } from '../synonyms/links.js';
import { replacedBetween } from '../pastEdits.js';
import type { ReplacementCount } from '../pastEdits.js';
import type { MiningOptions } from '../options.js';
import { countDocuments } from '../places.js';
import type { Use } from '../places.js';
import { usesOfForms } from '../companions/companions.js';
import { relationCounts } from '../companions/relationCounts.js';
import { choiceByPlace } from './choice.js';
import type { Choice } from './choice.js';
import { shareCompanions } from './sharedCompanions.js';
import type { SharedCompanions } from './sharedCompanions.js';
import { readTogether } from './together.js';
import type { Together } from './together.js';
import { compareUsage } from './usage.js';
import type { UsageComparison } from './usage.js';

/** A term to compare: its text and its lower-case spellings. */
export interface TermToCompare {
  readonly text: string;
  readonly forms: readonly string[];
}

/** One of the two, as the documents use it. */
export interface ComparedTerm {
  readonly text: string;
  readonly uses: readonly Use[];
  readonly documents: number;
  /** What most of its uses are. */
  readonly partOfSpeech: 'noun' | 'verb';
}

/** What is known of two terms; figures are explained where they are made. */
export interface Comparison {
  readonly terms: readonly [ComparedTerm, ComparedTerm];
  readonly choice: Choice;
  readonly companions: SharedCompanions;
  readonly together: Together;
  readonly usage: UsageComparison;
  /** What our list or a general dictionary says, from 0 to 1. */
  readonly lexicalLink: { readonly source: 'list' | 'dictionary'; readonly strength: number } | undefined;
  /** Past edits in both directions, where a history was read. */
  readonly pastEdits: { readonly aByB: ReplacementCount; readonly bByA: ReplacementCount } | undefined;
}

/** Compares two terms in one corpus; both must be used. The result depends on the documents and the options alone. */
export function* compareInCorpus(
  corpus: Corpus,
  pair: readonly [TermToCompare, TermToCompare],
  options: MiningOptions,
): Work<Comparison> {
  const uses = ownUses(pair.map(({ forms }) => usesOfForms(corpus, forms)) as [Use[], Use[]]);
  const terms = [0, 1].map((side): ComparedTerm => {
    const own = uses[side as 0 | 1];
    const documents = countDocuments(corpus.stream, own);
    return { text: pair[side]!.text, uses: own, documents, partOfSpeech: partOfSpeechOf(corpus, own) };
  }) as [ComparedTerm, ComparedTerm];
  yield;
  const companions = shareCompanions(corpus, terms);
  yield;
  const usage = yield* compareUsage(corpus, terms, options);
  const partOfSpeech = terms[0].partOfSpeech === terms[1].partOfSpeech ? terms[0].partOfSpeech : 'noun';
  const { pastEdits } = options;
  return {
    ...{ terms, companions, usage, choice: choiceByPlace(corpus, terms), together: readTogether(corpus, terms) },
    lexicalLink: lexicalLink(pair[0].text.toLowerCase(), pair[1].text.toLowerCase(), partOfSpeech),
    pastEdits: pastEdits && replacedBetween(pastEdits, pair[0].forms, pair[1].forms),
  };
}

/** The uses of each outside the other: of “key” and “access key”, the uses of “key” in “access key” are the latter's. */
function ownUses([a, b]: readonly [Use[], Use[]]): [Use[], Use[]] {
  const outside = (uses: readonly Use[], others: readonly Use[]): Use[] => {
    const held = new Set<number>();
    for (const { row, length } of others) for (let at = row; at < row + length; at++) held.add(at);
    return uses.filter(({ row, length }) => !others.some((other) => other.length > length) || !held.has(row));
  };
  return [outside(a, b), outside(b, a)];
}

function partOfSpeechOf(corpus: Corpus, uses: readonly Use[]): 'noun' | 'verb' {
  const { grammar } = relationCounts(corpus);
  const verbs = uses.filter(({ row }) => grammar.isVerb(row)).length;
  return verbs * 2 > uses.length ? 'verb' : 'noun';
}
