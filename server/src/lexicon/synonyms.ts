// What a general dictionary, WordNet, says about two words: one meaning, wider and narrower, sisters, opposites.
import { wordNetParts, wordNetTable, type WordNetPos, type WordNetTable } from './wordnet.js';

export type { WordNetPos } from './wordnet.js';

/**
 * Two words share a sense (`rankSum`: the smallest sum of its places among the senses of each, counted from 1, so 2 means
 * the commonest of both), or one is directly wider than the other, or both are directly under one wider sense.
 */
export type Synonymy = { readonly kind: 'synonym'; readonly rankSum: number } | 'broader' | 'sister';

/** Sisterhood in a rare sense says nothing: only this many senses of each word are looked at. */
const sisterSenses = 3;

/** Opposition by way of other words is believed in the commonest senses only. */
const oppositeSenses = 2;

/**
 * How two lemmas of one part of speech are related in WordNet 3.1 (Fellbaum 1998), senses of animals, plants and food
 * left aside. Undefined when either is unknown, which proves nothing.
 * @param a lower-case lemma, parts separated by a space or hyphen
 */
export function synonymy(a: string, b: string, pos: WordNetPos): Synonymy | undefined {
  if (a === b) return undefined;
  const table = wordNetTable(pos);
  const left = sensesOf(table, a);
  const right = sensesOf(table, b);
  if (left.length === 0 || right.length === 0) return undefined;
  const rankSum = sharedRank(left, right);
  if (rankSum > 0) return { kind: 'synonym', rankSum };
  if (pos !== 'noun' && pos !== 'verb') return undefined;
  if (reaches(table, left, right) || reaches(table, right, left)) return 'broader';
  return haveCommonLink(table, left.subarray(0, sisterSenses), right.subarray(0, sisterSenses)) ? 'sister' : undefined;
}

/** Whether WordNet knows a lemma as that part of speech. */
export function isKnown(lemma: string, pos: WordNetPos): boolean {
  return wordNetTable(pos).numberOf(lemma) >= 0;
}

/**
 * Whether two lemmas are antonyms in any part of speech: by the dictionary's own word; by a synonym of each in their
 * two commonest senses; or, for adjectives, by the heads they are similar to (quick, like fast, is opposed to slow).
 */
export function areOpposites(a: string, b: string): boolean {
  return a !== b && wordNetParts.some((pos) => areOppositesAs(a, b, pos));
}

function areOppositesAs(a: string, b: string, pos: WordNetPos): boolean {
  const table = wordNetTable(pos);
  const left = table.numberOf(a);
  const right = table.numberOf(b);
  if (left < 0 || right < 0) return false;
  if (table.areAntonyms(left, right)) return true;
  const widen = pos === 'adjective';
  const rightSenses = around(table, table.sensesOf(right), widen);
  return around(table, table.sensesOf(left), widen).some((x) => rightSenses.some((y) => table.areOpposite(x, y)));
}

/** The commonest senses of a word, with the heads that they are similar to where that is wanted. */
function around(table: WordNetTable, senses: Uint32Array, widen: boolean): number[] {
  const common = [...senses.subarray(0, oppositeSenses)];
  return widen ? common.flatMap((sense) => [sense, ...table.linksOf(sense)]) : common;
}

function sensesOf(table: WordNetTable, lemma: string): Uint32Array {
  const number = table.numberOf(lemma);
  return number < 0 ? new Uint32Array(0) : table.sensesOf(number);
}

function sharedRank(left: Uint32Array, right: Uint32Array): number {
  let best = 0;
  left.forEach((sense, i) => {
    const j = right.indexOf(sense);
    if (j >= 0 && (best === 0 || i + j + 2 < best)) best = i + j + 2;
  });
  return best;
}

function reaches(table: WordNetTable, from: Uint32Array, to: Uint32Array): boolean {
  return from.some((sense) => table.linksOf(sense).some((wider) => to.includes(wider)));
}

function haveCommonLink(table: WordNetTable, left: Uint32Array, right: Uint32Array): boolean {
  return left.some((x) => right.some((y) => table.linksOf(x).some((wider) => table.linksOf(y).includes(wider))));
}
