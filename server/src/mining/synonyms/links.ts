// How our list of equivalents and the general dictionary relate two words or phrases.
import { equivalentByKeys, equivalentSets } from '../../lexicon/equivalents.js';
import type { EquivalentPos } from '../../lexicon/equivalents.js';
import { synonymy } from '../../lexicon/synonyms.js';
import { termKey } from '../../lexicon/termKey.js';
import { wordNetTable } from '../../lexicon/wordnet.js';

/** A lexical relation of two words or phrases. */
export interface LexicalLink {
  readonly source: 'list' | 'dictionary';
  /** From 0 to 1: how far the source alone may be believed. */
  readonly strength: number;
}

/** A dictionary's synonyms in rarer senses than this (sum of both places) say nothing of technical prose. */
export const RAREST_SENSES = 3;

/**
 * The relation that our list knows, else the dictionary's, or undefined.
 * @param keyOf gives a term's key; who asks about many pairs of the same words keeps them
 */
export function lexicalLink(
  a: string,
  b: string,
  pos: EquivalentPos,
  keyOf: (word: string) => string = termKey,
): LexicalLink | undefined {
  const set = equivalentByKeys(keyOf(a), keyOf(b), pos);
  if (set !== undefined) return { source: 'list', strength: set.distinct === undefined ? 1 : 0.65 };
  const relation = synonymy(a, b, pos);
  if (typeof relation !== 'object' || relation.rankSum > RAREST_SENSES) return undefined;
  return { source: 'dictionary', strength: relation.rankSum <= 2 ? 0.8 : 0.6 };
}

/** Meanings of words by number: two words that share none have no {@link lexicalLink}. */
export class Meanings {
  private readonly known = new Map<string, readonly number[]>();
  private readonly setsOf = new Map<string, number[]>();
  private readonly keys = new Map<string, string>();

  constructor(private readonly parts: readonly EquivalentPos[]) {
    equivalentSets().forEach(({ pos, terms }, index) => {
      if (!parts.includes(pos)) return;
      for (const key of new Set(terms.map(termKey))) {
        const sets = this.setsOf.get(key);
        if (sets === undefined) this.setsOf.set(key, [index]);
        else sets.push(index);
      }
    });
  }

  /** A word's {@link termKey}, found once. */
  readonly keyOf = (word: string): string => {
    let key = this.keys.get(word);
    if (key === undefined) this.keys.set(word, (key = termKey(word)));
    return key;
  };

  of(word: string): readonly number[] {
    let found = this.known.get(word);
    if (found === undefined) this.known.set(word, (found = this.find(word)));
    return found;
  }

  /** Groups the indexes of words by meaning and visits every two of one group, each two once. */
  forEachRelated(words: readonly string[], visit: (a: number, b: number) => void): void {
    const groups = new Map<number, number[]>();
    words.forEach((word, index) => {
      for (const meaning of this.of(word)) {
        const members = groups.get(meaning);
        if (members === undefined) groups.set(meaning, [index]);
        else members.push(index);
      }
    });
    const seen = new Set<number>();
    for (const members of groups.values()) {
      for (let i = 0; i < members.length; i++) {
        for (let j = i + 1; j < members.length; j++) {
          const pair = members[i]! * words.length + members[j]!;
          if (!seen.has(pair)) visit(members[i]!, members[j]!);
          seen.add(pair);
        }
      }
    }
  }

  private find(word: string): number[] {
    const found = [...(this.setsOf.get(this.keyOf(word)) ?? [])];
    this.parts.forEach((part, place) => {
      const table = wordNetTable(part);
      const lemma = table.numberOf(word);
      // Senses of each part of speech, after the sets, in numbers of their own.
      if (lemma >= 0)
        for (const sense of table.sensesOf(lemma).subarray(0, RAREST_SENSES))
          found.push(BEYOND_SETS * (place + 1) + sense);
    });
    return found;
  }
}

/** More than there are sets, or senses of one part of speech. */
const BEYOND_SETS = 2 ** 20;
