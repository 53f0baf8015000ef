// The slot of a use in its sentence, told from its neighbours: before a noun, after "is", as a noun, as a verb.
import type { Corpus } from '../../corpus/corpus.js';
import type { TokenStream } from '../../corpus/stream.js';
import type { Vocabulary } from '../../corpus/vocabulary.js';
import { FactFlag } from '../../facts/flags.js';
import { Zone } from '../../prose/zones.js';
import { TAG, TokenFlag } from '../../tokens/tokens.js';
import { endRowOfBlock, firstRowOfBlock, followsOn, isContent } from '../../corpus/stream.js';
import { singularKey } from '../wording.js';

/** The slots, by code. `lone`: nothing but the form stands there; `unclear`: its neighbours do not tell. */
export const SLOTS = ['attributive', 'predicate', 'noun', 'verb', 'unclear', 'lone'] as const;
export type Slot = (typeof SLOTS)[number];

const LISTS = {
  determiner: `a an the this that these those some any each every no all both either neither another other its their
    your our my his her whose which what such several many few one two three more most same multiple new`,
  preposition: `of in on at by for with from into onto over under between among through during via per about without
    within upon across against like using including`,
  modal: `can could may might must shall should will would cannot can't don't doesn't didn't won't shouldn't let lets
    let's please do does did`,
  pronoun: `i you we they it he she who which that users`,
  leadsToInfinitive: `need needs needed want wants how have has having able used use required allow allows allowed
    enable enables order going try tries trying attempt attempts fail fails failed possible easy ready necessary
    configured designed likely you users them us ability way time used ready whether when where what attempting
    wish wishes choose decide forget forgot sure`,
  be: `is are was were be been being as not becomes become remains remain stays stay seems`,
  object: `it them him us me`,
  objectStart: `a an the this that these those your its their our my all any each every some it them both`,
} as const;
type WordClass = keyof typeof LISTS;

/** Tells the slots of uses in one corpus. */
export class SlotReader {
  private readonly classes: Readonly<Record<WordClass, ReadonlySet<number>>>;
  private readonly to: number | undefined;
  private readonly comma: number | undefined;
  private readonly opening: number | undefined;
  private readonly stream: TokenStream;
  private readonly vocabulary: Vocabulary;

  constructor(corpus: Corpus) {
    this.stream = corpus.stream;
    this.vocabulary = corpus.vocabulary;
    this.to = corpus.vocabulary.find('to');
    this.comma = corpus.vocabulary.find(',');
    this.opening = corpus.vocabulary.find('(');
    this.classes = Object.fromEntries(
      Object.entries(LISTS).map(([name, words]) => [name, idsOf(corpus.vocabulary, words)]),
    ) as Record<WordClass, ReadonlySet<number>>;
  }

  /** The slot of a use of `length` rows from `row` on. */
  slotOf(row: number, length: number): Slot {
    const { stream } = this;
    const end = row + length;
    const blockStart = firstRowOfBlock(stream, row);
    const blockEnd = endRowOfBlock(stream, row);
    const starts = row === blockStart || (stream.flags[row]! & TokenFlag.sentenceStart) !== 0;
    if (row === blockStart && (end === blockEnd || this.isColon(end, blockEnd))) return 'lone';
    if (this.isLabel(row, blockStart, blockEnd)) return 'lone';
    if (this.isCounted(row, end, blockEnd)) return 'lone';
    if (this.isEnclosed(row, end, blockStart, blockEnd)) return 'unclear';
    if (this.isVerb(row, end, starts, blockEnd)) return 'verb';
    if (end < blockEnd) {
      const next = this.afterwards(end);
      if (next !== undefined) return next;
    }
    if (!starts && this.follows(row) && this.is('be', row - 1)) return 'predicate';
    return 'noun';
  }

  /** True where a determiner stands right before. */
  hasDeterminer(row: number): boolean {
    return row > firstRowOfBlock(this.stream, row) && this.follows(row) && this.is('determiner', row - 1);
  }

  /** True where a determiner or a word of content that it follows on stands right before: it is used as a noun. */
  isDetermined(row: number): boolean {
    if (row === firstRowOfBlock(this.stream, row) || !this.follows(row)) return false;
    return this.hasDeterminer(row) || isContent(this.stream, row - 1);
  }

  private isVerb(row: number, end: number, starts: boolean, blockEnd: number): boolean {
    const { stream } = this;
    const takesObject = end < blockEnd && followsOn(stream, end) && this.is('objectStart', end);
    // The tagger knows a verb by more than its neighbours; participles it takes for verbs before their nouns as well.
    if (end === row + 1 && stream.tag[row] === TAG.VERB && !this.isParticiple(row)) {
      return starts || !this.follows(row) || !this.isBeforeNouns(row - 1);
    }
    if (starts) return takesObject;
    // "… and bulk-loads them": nothing but a verb stands before a pronoun.
    if (end < blockEnd && followsOn(stream, end) && this.is('object', end)) return true;
    if (!this.follows(row)) return false;
    const before = stream.fold[row - 1]!;
    if (this.is('modal', row - 1) || this.is('pronoun', row - 1)) return true;
    if (before !== this.to) return false;
    return takesObject || (this.follows(row - 1) && this.is('leadsToInfinitive', row - 2));
  }

  /** In a heading without a capital, or in a link that opens an entry of a list: the name of a command or a page. */
  private isLabel(row: number, blockStart: number, blockEnd: number): boolean {
    const { stream } = this;
    const zones = stream.zones[row]!;
    if ((zones & (Zone.heading | Zone.frontMatter)) !== 0) {
      for (let at = blockStart; at < blockEnd; at++) if (stream.spelling[at] !== stream.fold[at]) return false;
      return true;
    }
    if ((zones & Zone.linkText) === 0) return false;
    for (let at = blockStart; at <= row; at++) if ((stream.zones[at]! & Zone.linkText) === 0) return false;
    let end = row;
    while (end < blockEnd && (stream.zones[end]! & Zone.linkText) !== 0) end++;
    return end === blockEnd || (stream.flags[end]! & TokenFlag.word) === 0;
  }

  /** Of several words, the first a single letter, before a plural: how many there are (the top k nearest neighbors). */
  private isCounted(row: number, end: number, blockEnd: number): boolean {
    const { stream, vocabulary } = this;
    if (end === row + 1 || end >= blockEnd || !followsOn(stream, end)) return false;
    if (vocabulary.textOf(stream.fold[row]!).length !== 1) return false;
    const next = vocabulary.textOf(stream.fold[end]!);
    return singularKey(next) !== next;
  }

  /** All that stands in a parenthesis may be a noun or what is said of one. */
  private isEnclosed(row: number, end: number, blockStart: number, blockEnd: number): boolean {
    const { stream, vocabulary } = this;
    if (row === blockStart || end >= blockEnd || stream.fold[row - 1] !== this.opening) return false;
    return /^[),;]/.test(vocabulary.textOf(stream.fold[end]!));
  }

  /** What the following word makes of a use, or undefined where it leaves the question open. */
  private afterwards(end: number): Slot | undefined {
    const { stream } = this;
    if (stream.tag[end] === TAG.OPAQUE && (stream.flags[end]! & TokenFlag.spaceBefore) !== 0) return 'unclear';
    if (!followsOn(stream, end)) {
      const sign = stream.flags[end]! & TokenFlag.word;
      return sign === 0 && this.isComma(end) ? 'unclear' : undefined;
    }
    const flags = stream.flags[end]!;
    const tag = stream.tag[end]!;
    if ((flags & FactFlag.functionWord) !== 0) return tag === TAG.CCONJ ? 'unclear' : undefined;
    if (tag === TAG.AUX || tag === TAG.ADV || tag === TAG.ADP || tag === TAG.PART) return undefined;
    if (tag === TAG.VERB) return 'unclear';
    return 'attributive';
  }

  private follows(row: number): boolean {
    return row > 0 && followsOn(this.stream, row);
  }

  private is(name: WordClass, row: number): boolean {
    return this.classes[name].has(this.stream.fold[row]!);
  }

  /** A determiner, preposition or adjective: what it stands before is no verb, whatever the tagger takes it for. */
  private isBeforeNouns(row: number): boolean {
    const tag = this.stream.tag[row]!;
    return tag === TAG.DET || tag === TAG.ADJ || (tag === TAG.ADP && this.stream.fold[row] !== this.to);
  }

  private isParticiple(row: number): boolean {
    return /(?:ed|ing|en)$/.test(this.vocabulary.textOf(this.stream.fold[row]!));
  }

  private isComma(row: number): boolean {
    return this.stream.fold[row] === this.comma;
  }

  private isColon(row: number, blockEnd: number): boolean {
    return (
      row === blockEnd - 1 && (this.stream.flags[row]! & TokenFlag.word) === 0 && this.stream.tag[row] === TAG.PUNCT
    );
  }
}

function idsOf(vocabulary: Vocabulary, words: string): ReadonlySet<number> {
  const ids = words.split(/\s+/).map((word) => vocabulary.find(word));
  return new Set(ids.filter((id) => id !== undefined));
}
