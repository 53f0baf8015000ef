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
  /** How often a pair was met. */
  readonly timesOf: (pair: number) => number;
  /** The uses of a pair, in order. */
  readonly usesOf: (pair: number) => VerbUse[];
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
  const met = new UseColumns();
  const sideBySide = new Map<string, number>();
  const textAt = (row: number): string => vocabulary.textOf(stream.fold[row]!);
  const singulars = new Int32Array(vocabulary.size);
  const objectAt = (row: number): number => {
    const word = stream.fold[row]!;
    if (singulars[word] === 0) singulars[word] = objects.idOf(singularOf(vocabulary.textOf(word))) + 1;
    return singulars[word]! - 1;
  };
  const put = (verb: string, row: number, length: number, object: number): void =>
    met.add(pairs.idOf(verbs.idOf(verb), objectAt(object)), row, length, object);
  for (let row = 0; row < stream.length; row++) {
    if (row % 50_000 === 0) yield;
    if (stream.tag[row] !== TAG.VERB || classes[row] === NOUN || !isWord(stream, row)) continue;
    const lemma = vocabulary.textOf(stream.lemma[row]!);
    const particle = row + 1 < stream.length && joins(stream, row + 1) && isParticle(lemma, textAt(row + 1));
    const verb = particle ? `${lemma} ${textAt(row + 1)}` : lemma;
    const length = particle ? 2 : 1;
    const other = coordinatedVerb(stream, textAt, row + length);
    if (other !== undefined) count(sideBySide, lemma, vocabulary.textOf(stream.lemma[other]!));
    const after = objectAfter(stream, classes, textAt, row + length);
    if (after !== undefined) put(verb, row, length, after);
    else {
      const before = subjectOfPassive(stream, classes, textAt, row);
      if (before !== undefined) put(verb, row, length, before);
    }
  }
  const coordinated = (one: string, other: string): number =>
    sideBySide.get(keyOf(one.split(' ')[0]!, other.split(' ')[0]!)) ?? 0;
  return { verbs, objects, pairs, ...met.byPair(pairs.size), coordinated };
}

/** Uses in the order in which they are met, then sorted by their pair. */
class UseColumns {
  private count = 0;
  private pair = new Uint32Array(1024);
  private row = new Uint32Array(1024);
  private object = new Uint32Array(1024);
  private length = new Uint8Array(1024);

  add(pair: number, row: number, length: number, object: number): void {
    if (this.count === this.pair.length) this.grow();
    const at = this.count++;
    this.pair[at] = pair;
    this.row[at] = row;
    this.object[at] = object;
    this.length[at] = length;
  }

  byPair(pairs: number): Pick<VerbUses, 'timesOf' | 'usesOf'> {
    const { row, object, length } = this;
    const first = new Uint32Array(pairs + 1);
    for (let at = 0; at < this.count; at++) first[this.pair[at]! + 1]!++;
    for (let pair = 0; pair < pairs; pair++) first[pair + 1]! += first[pair]!;
    const next = first.slice();
    const sorted = new Uint32Array(this.count);
    for (let at = 0; at < this.count; at++) sorted[next[this.pair[at]!]!++] = at;
    return {
      timesOf: (pair) => first[pair + 1]! - first[pair]!,
      usesOf: (pair) =>
        Array.from(sorted.subarray(first[pair], first[pair + 1]), (at) => {
          return { row: row[at]!, length: length[at]!, object: object[at]! };
        }),
    };
  }

  private grow(): void {
    const size = this.count * 2;
    const wide = (old: Uint32Array<ArrayBuffer>): Uint32Array<ArrayBuffer> => {
      const longer = new Uint32Array(size);
      longer.set(old);
      return longer;
    };
    const length = new Uint8Array(size);
    length.set(this.length);
    this.length = length;
    this.pair = wide(this.pair);
    this.row = wide(this.row);
    this.object = wide(this.object);
  }
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
