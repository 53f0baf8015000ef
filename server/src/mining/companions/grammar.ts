// Grammatical relations of a noun phrase to the words around it, read off the tags: its verb, its preposition, its modifiers.
import type { Corpus } from '../../corpus/corpus.js';
import { isContent } from '../../corpus/stream.js';
import type { TokenStream } from '../../corpus/stream.js';
import { TAG, TokenFlag } from '../../tokens/tokens.js';
import { WORD_USES } from '../synonyms/wordUse.js';

/** How a companion stands to its term; the last two are those of a verb. */
export const COMPANION_RELATIONS = [
  'object-of',
  'subject-of',
  'modified-by',
  'modifies',
  'governed-by',
  'has-object',
  'has-subject',
] as const;
export type CompanionRelation = (typeof COMPANION_RELATIONS)[number];

/** A word in a relation: its row, with the rows of a particle and a preposition where it has them. */
export interface Partner {
  readonly row: number;
  readonly particle?: number | undefined;
  readonly preposition?: number | undefined;
}

/** The relations that the head of a noun phrase has to a verb, or to a word by a preposition. */
export type HeadRelation = 'object-of' | 'subject-of' | 'governed-by';

/** How far from a head its verb may stand, in words. */
export const REACH = 6;

const NOUN = WORD_USES.indexOf('noun');
/** Particles that make one verb with the verb before them, wherever they stand. */
const PARTICLES = new Set(['up', 'out', 'off', 'down', 'away', 'back']);
/** Words that are a particle where another preposition follows: log in to, sign on with. */
const BEFORE_PREPOSITION = new Set([...PARTICLES, 'in', 'on', 'over', 'through']);
const BE = new Set(['is', 'are', 'was', 'were', 'be', 'been', 'being', 'gets', 'get', 'got']);

/** Reads relations in one stream. */
export class Grammar {
  private readonly be: ReadonlySet<number>;
  private readonly particles: ReadonlySet<number>;
  private readonly beforePreposition: ReadonlySet<number>;

  private readonly stream: TokenStream;

  /** @param classes the class of each row, as an index into `WORD_USES` */
  constructor(
    corpus: Corpus,
    private readonly classes: Uint8Array,
  ) {
    const { vocabulary } = corpus;
    this.stream = corpus.stream;
    const known = (words: ReadonlySet<string>): Set<number> =>
      new Set([...words].map((word) => vocabulary.find(word)).filter((id) => id !== undefined));
    this.be = known(BE);
    this.particles = known(PARTICLES);
    this.beforePreposition = known(BEFORE_PREPOSITION);
  }

  /** True for the last noun of a noun phrase. */
  isHead(row: number): boolean {
    return this.isNoun(row) && this.endsPhrase(row);
  }

  /** True where no noun goes on after a row. */
  endsPhrase(row: number): boolean {
    return !(this.continues(row + 1) && this.isNoun(row + 1));
  }

  /** True where a word and the one behind it are parts of one noun phrase, the first one of content: remote + station. */
  isModifier(row: number): boolean {
    return this.isNominal(row) && isContent(this.stream, row) && this.continues(row + 1) && this.isNominal(row + 1);
  }

  /** True for a counted noun. */
  isNoun(row: number): boolean {
    return this.classes[row] === NOUN && this.stream.counted[row] === 1;
  }

  /** Visits the verb and the governor of a head, as far as they are words of content. */
  visitHead(head: number, visit: (relation: HeadRelation, partner: Partner) => void): void {
    this.lookLeft(head, visit);
    this.lookRight(head, visit);
  }

  /** Over the phrase's own words to the verb or preposition before it. */
  private lookLeft(head: number, visit: (relation: HeadRelation, partner: Partner) => void): void {
    const { stream } = this;
    let row = head;
    for (let steps = 0; steps < REACH; steps++) {
      if (row === 0 || this.starts(row)) return;
      row--;
      if (this.classes[row] !== NOUN && !isPhrasePart(stream.tag[row]!)) break;
    }
    if (this.isVerb(row)) {
      visit('object-of', { row });
      return;
    }
    if (row === 0 || this.starts(row) || !this.isPrepositionLike(row)) return;
    if (this.particles.has(stream.fold[row]!) && this.isVerb(row - 1)) {
      visit('object-of', { row: row - 1, particle: row });
    } else if (this.beforePreposition.has(stream.fold[row - 1]!) && !this.starts(row - 1) && this.isVerb(row - 2)) {
      visit('governed-by', { row: row - 2, particle: row - 1, preposition: row });
    } else if ((this.isVerb(row - 1) || this.isNominal(row - 1)) && isContent(stream, row - 1)) {
      visit('governed-by', { row: row - 1, preposition: row });
    }
  }

  /** Over auxiliaries and adverbs to the verb behind: “the key expires”, “the key must be rotated”. */
  private lookRight(head: number, visit: (relation: HeadRelation, partner: Partner) => void): void {
    const { stream } = this;
    let isPassive = false;
    for (let row = head + 1; row < Math.min(head + REACH, stream.length) && !this.starts(row); row++) {
      const tag = stream.tag[row]!;
      const isBe = this.be.has(stream.fold[row]!);
      if (isBe) isPassive = true;
      else if (this.isVerb(row)) {
        const particle = this.hasParticle(row) ? row + 1 : undefined;
        visit(isPassive ? 'object-of' : 'subject-of', { row, particle });
        return;
      } else if (tag !== TAG.AUX && tag !== TAG.ADV && tag !== TAG.PART) return;
    }
  }

  private hasParticle(verb: number): boolean {
    return this.continues(verb + 1) && this.particles.has(this.stream.fold[verb + 1]!);
  }

  /** True for a verb of content. */
  isVerb(row: number): boolean {
    return row >= 0 && this.stream.tag[row] === TAG.VERB && this.classes[row] !== NOUN && isContent(this.stream, row);
  }

  /** True for a counted noun or adjective. */
  isNominal(row: number): boolean {
    return this.isNoun(row) || (this.stream.tag[row] === TAG.ADJ && this.stream.counted[row] === 1);
  }

  private isPrepositionLike(row: number): boolean {
    const tag = this.stream.tag[row];
    return tag === TAG.ADP || tag === TAG.PART;
  }

  /** True where a row goes on the sentence of the row before it. */
  private continues(row: number): boolean {
    return row < this.stream.length && !this.starts(row);
  }

  private starts(row: number): boolean {
    return (this.stream.flags[row]! & TokenFlag.sentenceStart) !== 0;
  }
}

/** Words that stand between a verb or preposition and the head that it governs. */
function isPhrasePart(tag: number): boolean {
  switch (tag) {
    case TAG.DET:
    case TAG.ADJ:
    case TAG.NUM:
    case TAG.PRON:
      return true;
    default:
      return false;
  }
}
