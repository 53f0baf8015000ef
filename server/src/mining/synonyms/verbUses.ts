// Verbs with what they act on: “start the job”, “the job is started”, read off the tags around each verb.
import { Interner } from '../../base/interner.js';
import { PairTable } from '../../base/pairTable.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import type { TokenStream } from '../../corpus/stream.js';
import { isFunctionWord } from '../../lexicon/functionWords.js';
import { isKnown } from '../../lexicon/synonyms.js';
import { singularOf } from '../../lexicon/plurals.js';
import { TAG, TokenFlag } from '../../tokens/tokens.js';

/** Particles that belong to the verb before them wherever they stand, … */
const ALWAYS = new Set(['up', 'out', 'off', 'down', 'away', 'back']);
/** … and those that do where a dictionary or our list has the verb with them. */
const SOMETIMES = new Set(['on', 'in', 'over', 'through']);
/** The class of nouns. */
const NOUN = 0;
const BE = new Set(['is', 'are', 'was', 'were', 'be', 'been', 'being', 'gets', 'get']);
/** Most words between a verb and the head of its object. */
const REACH = 6;

/** One use of a verb with an object: rows `[row, row + length)` are the verb, with its particle where it has one. */
export interface VerbUse {
  readonly row: number;
  readonly length: number;
  /** The row of the object's head. */
  readonly object: number;
}

/** All verbs with their objects. Verbs and objects are numbered in order of arrival; texts are dictionary forms. */
export interface VerbUses {
  readonly verbs: Interner;
  readonly objects: Interner;
  /** The number of each (verb, object) that was met. */
  readonly pairs: PairTable;
  /** The uses of each pair. */
  readonly uses: readonly (readonly VerbUse[])[];
  /** "create or update", "find and fix": how often two verbs are set side by side, by their texts in order. */
  coordinated(one: string, other: string): number;
}

/**
 * Reads every verb of a corpus.
 * @param classes the class of each row, by `readUses`
 */
export function* readVerbUses(corpus: Corpus, classes: Uint8Array): Work<VerbUses> {
  const { stream, vocabulary } = corpus;
  const verbs = new Interner();
  const objects = new Interner();
  const pairs = new PairTable();
  const uses: VerbUse[][] = [];
  const sideBySide = new Map<string, number>();
  const textAt = (row: number): string => vocabulary.textOf(stream.fold[row]!);
  const put = (verb: string, object: number, use: Omit<VerbUse, 'object'>): void => {
    const pair = pairs.idOf(verbs.idOf(verb), objects.idOf(singularOf(textAt(object))));
    if (pair === uses.length) uses.push([{ ...use, object }]);
    else uses[pair]!.push({ ...use, object });
  };
  for (let row = 0; row < stream.length; row++) {
    if (row % 50_000 === 0) yield;
    if (stream.tag[row] !== TAG.VERB || classes[row] === NOUN || !isWord(stream, row)) continue;
    const lemma = vocabulary.textOf(stream.lemma[row]!);
    const particle = row + 1 < stream.length && joins(stream, row + 1) && isParticle(lemma, textAt(row + 1));
    const verb = particle ? `${lemma} ${textAt(row + 1)}` : lemma;
    const use = { row, length: particle ? 2 : 1 };
    const other = coordinatedVerb(stream, textAt, row + use.length);
    if (other !== undefined) count(sideBySide, lemma, vocabulary.textOf(stream.lemma[other]!));
    const after = objectAfter(stream, classes, textAt, row + use.length);
    if (after !== undefined) put(verb, after, use);
    else {
      const before = subjectOfPassive(stream, classes, textAt, row);
      if (before !== undefined) put(verb, before, use);
    }
  }
  const coordinated = (one: string, other: string): number =>
    sideBySide.get(keyOf(one.split(' ')[0]!, other.split(' ')[0]!)) ?? 0;
  return { verbs, objects, pairs, uses, coordinated };
}

function isParticle(verb: string, word: string): boolean {
  return ALWAYS.has(word) || (SOMETIMES.has(word) && isKnown(`${verb} ${word}`, 'verb'));
}

function keyOf(one: string, other: string): string {
  return one < other ? `${one} ${other}` : `${other} ${one}`;
}

function count(counts: Map<string, number>, one: string, other: string): void {
  if (one === other) return;
  const key = keyOf(one, other);
  counts.set(key, (counts.get(key) ?? 0) + 1);
}

/** The head of the noun phrase that begins at a row, or undefined where none does. */
function objectAfter(
  stream: TokenStream,
  classes: Uint8Array,
  textAt: (row: number) => string,
  from: number,
): number | undefined {
  let head: number | undefined;
  for (let row = from; row < Math.min(stream.length, from + REACH); row++) {
    if (!joins(stream, row)) break;
    const tag = stream.tag[row]!;
    if (classes[row] === NOUN) {
      if (isWord(stream, row)) head = row;
      else if (head !== undefined) break;
    } else if (head !== undefined) break;
    else if (!isPhrasePart(tag) && !(tag === TAG.VERB && row > from && /(ed|ing)$/.test(textAt(row)))) break;
  }
  return head !== undefined && !isFunctionWord(textAt(head)) ? head : undefined;
}

/** "The job is started": the noun before the auxiliaries of a participle. */
function subjectOfPassive(
  stream: TokenStream,
  classes: Uint8Array,
  textAt: (row: number) => string,
  verb: number,
): number | undefined {
  let row = verb - 1;
  let passive = false;
  for (; row >= 0 && row >= verb - 4; row--) {
    if (!joins(stream, row + 1)) return undefined;
    const tag = stream.tag[row]!;
    if (tag === TAG.AUX || BE.has(textAt(row))) passive ||= BE.has(textAt(row)) && row >= verb - 2;
    else if (tag !== TAG.ADV && tag !== TAG.PART) break;
  }
  if (!passive || row < 0 || !/(ed|en|t|n|d|wn|un|ung|uck|ut)$/.test(textAt(verb))) return undefined;
  return classes[row] === NOUN && isWord(stream, row) ? row : undefined;
}

/** The verb that a conjunction at a row joins to the one before it. */
function coordinatedVerb(stream: TokenStream, textAt: (row: number) => string, from: number): number | undefined {
  let row = from;
  let joined = false;
  for (; row < Math.min(stream.length - 1, from + 3); row++) {
    if ((stream.flags[row]! & TokenFlag.sentenceStart) !== 0) return undefined;
    const text = textAt(row);
    if (text === 'and' || text === 'or' || text === ',' || text === '/') joined = true;
    else break;
  }
  return joined && stream.tag[row] === TAG.VERB ? row : undefined;
}

function isWord(stream: TokenStream, row: number): boolean {
  return stream.counted[row] === 1 && (stream.flags[row]! & (TokenFlag.word | TokenFlag.identifier)) === TokenFlag.word;
}

/** True where a row belongs to the sentence of the row before. */
function joins(stream: TokenStream, row: number): boolean {
  return (stream.flags[row]! & TokenFlag.sentenceStart) === 0;
}

function isPhrasePart(tag: number): boolean {
  return tag === TAG.DET || tag === TAG.ADJ || tag === TAG.NUM || tag === TAG.PRON || tag === TAG.OPAQUE;
}
