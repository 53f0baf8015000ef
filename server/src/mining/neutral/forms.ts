// Ways of writing that have their letters in common, whatever the language: gathered by a key without hyphens and spaces.
import type { Corpus } from '../../corpus/corpus.js';
import { rowsOfSequence } from '../../corpus/concordance.js';
import { TokenFlag } from '../../tokens/tokens.js';

/** One way of writing a compound, in lower case. */
export interface NeutralForm {
  readonly shape: 'closed' | 'hyphened' | 'open';
  /** The lengths of its parts but the last, which set apart two ways of the same shape. */
  readonly parts: string;
  readonly folds: readonly number[];
  /** The rows of the token stream at which it stands, ascending. */
  readonly rows: readonly number[];
}

/** A word that may be a form or a part of one: letters, parts joined by hyphens. */
const CHUNK = /^\p{L}[\p{L}\p{M}]*(?:-[\p{L}\p{M}]+)*$/u;
/** Katakana with the sign of a long vowel at its end, which Japanese leaves out or writes as custom has it (サーバ, サーバー). */
const LAST_LONG_VOWEL = /(?<=\p{scx=Kana}{2,})ー$/u;
/** Shortest part of an open form and shortest key, in letters: shorter ones meet by chance. Characters of CJK say more. */
const SHORTEST_PART = 3;
const SHORTEST_KEY = 6;
/** Longer keys are no compounds that anyone would write in several ways. */
const LONGEST_KEY = 40;
/** From this share of all uses up, an open form may be another way of writing; below it the words have met by chance. */
const LEAST_OPEN_SHARE = 0.1;

/** The ways of writing of each key that has more than one. Open forms are of two or three words, and none of grammar at the ends. */
export function findForms(corpus: Corpus): ReadonlyMap<string, readonly NeutralForm[]> {
  const { vocabulary, stream } = corpus;
  const groups = new Map<string, NeutralForm[]>();
  for (let id = 0; id < vocabulary.size; id++) {
    if (vocabulary.foldOf(id) !== id) continue;
    const rows = stream.rowsOf(id);
    const text = vocabulary.textOf(id);
    if (rows.length === 0 || (stream.flags[rows[0]!]! & TokenFlag.word) === 0 || !CHUNK.test(text)) continue;
    const parts = text.split('-');
    const long = LAST_LONG_VOWEL.test(text) ? '+ー' : '';
    const shape = parts.length > 1 ? 'hyphened' : 'closed';
    add(groups, text.replaceAll('-', '').replace(LAST_LONG_VOWEL, ''), {
      ...{ shape, parts: lengthsOf(parts) + long, folds: [id], rows: [...rows] },
    });
  }
  for (const [key, forms] of groups) {
    if (key.length >= SHORTEST_KEY && key.length <= LONGEST_KEY) forms.push(...openForms(corpus, key, forms));
    if (forms.length < 2) groups.delete(key);
  }
  return groups;
}

function openForms(corpus: Corpus, key: string, joined: readonly NeutralForm[]): NeutralForm[] {
  const found: NeutralForm[] = [];
  const uses = joined.reduce((sum, { rows }) => sum + rows.length, 0);
  for (const parts of splits(key)) {
    const folds = parts.map((part) => corpus.vocabulary.find(part));
    if (folds.includes(undefined)) continue;
    const gram = corpus.grams.find(folds as number[]);
    if (gram === undefined || corpus.usesOfGram(gram) === 0) continue;
    const rows = rowsOfSequence(corpus.stream, folds as number[]);
    if (rows.length < LEAST_OPEN_SHARE * uses) continue;
    found.push({ shape: 'open', parts: lengthsOf(parts), folds: folds as number[], rows });
  }
  return found;
}

function lengthsOf(parts: readonly string[]): string {
  return parts
    .slice(0, -1)
    .map((part) => part.length)
    .join('+');
}

/** All ways to cut a key into two or three parts. */
function* splits(key: string): Generator<string[]> {
  for (let at = SHORTEST_PART; at <= key.length - SHORTEST_PART; at++) {
    const rest = key.slice(at);
    yield [key.slice(0, at), rest];
    for (let next = SHORTEST_PART; next <= rest.length - SHORTEST_PART; next++)
      yield [key.slice(0, at), rest.slice(0, next), rest.slice(next)];
  }
}

function add(groups: Map<string, NeutralForm[]>, key: string, form: NeutralForm): void {
  const group = groups.get(key);
  if (group === undefined) groups.set(key, [form]);
  else group.push(form);
}
