// Companions by grammatical relation: the verbs, modifiers, heads and prepositions of a term, ranked by log-likelihood ratio.
import type { Corpus } from '../../corpus/corpus.js';
import { cellsOf } from '../../corpus/statistics/association.js';
import type { Use } from '../places.js';
import { attraction } from './companion.js';
import type { CompanionFigures } from './companion.js';
import { REACH } from './grammar.js';
import type { CompanionRelation, Partner } from './grammar.js';
import { relationCounts } from './relationCounts.js';
import type { CountedRelation, RelationMargins } from './relationCounts.js';
import { shownWord } from './shownWord.js';

/** A word that stands in a grammatical relation to a term. */
export interface RelatedCompanion extends CompanionFigures {
  readonly relation: CompanionRelation;
}

/** Rows that are kept of one companion, for showing. */
const KEPT_ROWS = 200;

/** One relation of the term to one word, as it is counted. */
interface Found {
  readonly relation: CompanionRelation;
  readonly key: number;
  count: number;
  readonly rows: number[];
  readonly documents: Set<number>;
}

/** Every word in a relation to the uses of a term, in no order; a use tagged as a verb has the relations of a verb. */
export function companionsByRelation(
  corpus: Corpus,
  uses: readonly Use[],
  counts: RelationMargins = relationCounts(corpus),
): RelatedCompanion[] {
  const { stream } = corpus;
  const found = new Map<string, Found>();
  const totals = new Map<CompanionRelation, number>();
  const visitAt = (use: Use) => (relation: CompanionRelation, key: number) => {
    totals.set(relation, (totals.get(relation) ?? 0) + 1);
    const name = `${relation} ${key}`;
    let known = found.get(name);
    if (known === undefined) found.set(name, (known = { relation, key, count: 0, rows: [], documents: new Set() }));
    known.count++;
    known.documents.add(stream.documentOf(use.row));
    if (known.rows.length < KEPT_ROWS) known.rows.push(use.row);
  };
  for (const use of uses) {
    if (counts.grammar.isVerb(use.row)) visitVerb(corpus, counts, use, visitAt(use));
    else visitNoun(corpus, counts, use, visitAt(use));
  }
  return [...found.values()].map(({ relation, key, count, rows, documents }) => {
    const margin = MARGIN[relation];
    const isNounSide = relation === 'modifies' || relation === 'has-object' || relation === 'has-subject';
    const c2 = isNounSide ? counts.ofNoun(margin, key) : counts.ofPartner(margin, key);
    const n = counts.all(margin);
    // A term of several words can end in a word that another reading of the phrase pairs otherwise: margins never fall short.
    const cells = cellsOf({ c1: totals.get(relation)!, c2: Math.max(c2, count), c12: count, n: Math.max(n, c2) });
    const strength = attraction(cells);
    const word = isNounSide ? shownWord(corpus, key) : counts.keys.textOf(key);
    return { relation, word, count, documents: documents.size, strength, rows };
  });
}

const MARGIN: Readonly<Record<CompanionRelation, CountedRelation>> = {
  'object-of': 'object-of',
  'subject-of': 'subject-of',
  'governed-by': 'governed-by',
  'modified-by': 'pair',
  modifies: 'pair',
  'has-object': 'object-of',
  'has-subject': 'subject-of',
};

type Visit = (relation: CompanionRelation, key: number) => void;

function visitNoun({ stream }: Corpus, counts: RelationMargins, use: Use, visit: Visit): void {
  const { grammar } = counts;
  const last = use.row + use.length - 1;
  if (use.row > 0 && grammar.isModifier(use.row - 1)) visit('modified-by', counts.keys.of({ row: use.row - 1 }));
  if (grammar.isModifier(last) && grammar.isNoun(last + 1)) visit('modifies', stream.lemma[last + 1]!);
  if (!counts.isHead(last)) return;
  grammar.visitHead(last, (relation, partner) => {
    // The verb of a term that holds a verb (“run time”) is no companion.
    if (partner.row < use.row || partner.row > last) visit(relation, counts.keys.of(partner));
  });
}

/** Finds the heads around a verb whose verb it is. */
function visitVerb({ stream }: Corpus, counts: RelationMargins, use: Use, visit: Visit): void {
  const { grammar } = counts;
  const from = Math.max(0, use.row - REACH);
  const until = Math.min(stream.length, use.row + use.length + REACH);
  for (let row = from; row < until; row++) {
    if (!grammar.isHead(row)) continue;
    grammar.visitHead(row, (relation, partner) => {
      if (partner.row !== use.row || !fitsParticle(partner, use)) return;
      if (relation === 'object-of') visit('has-object', stream.lemma[row]!);
      else if (relation === 'subject-of') visit('has-subject', stream.lemma[row]!);
    });
  }
}

/** “Start up the logger” is a use of “start up”, not of “start”. */
function fitsParticle({ particle }: Partner, { length }: Use): boolean {
  return particle === undefined || length > 1;
}
