// How our list of equivalents and the general dictionary relate two words or phrases.
import { areEquivalent } from '../../lexicon/equivalents.js';
import type { EquivalentPos } from '../../lexicon/equivalents.js';
import { synonymy } from '../../lexicon/synonyms.js';
import type { WordNetPos } from '../../lexicon/synonyms.js';

/** A lexical relation of two words or phrases. */
export interface LexicalLink {
  readonly source: 'list' | 'dictionary';
  /** From 0 to 1: how far the source alone may be believed. */
  readonly strength: number;
}

/** A dictionary's synonyms in rarer senses than this (sum of both places) say nothing of technical prose. */
const RAREST_SENSES = 3;

/** The stronger of the relations that the two sources know, or undefined. */
export function lexicalLink(a: string, b: string, pos: EquivalentPos & WordNetPos): LexicalLink | undefined {
  const set = areEquivalent(a, b, pos);
  if (set !== undefined) return { source: 'list', strength: set.distinct === undefined ? 1 : 0.7 };
  const relation = synonymy(a, b, pos);
  if (typeof relation !== 'object' || relation.rankSum > RAREST_SENSES) return undefined;
  return { source: 'dictionary', strength: relation.rankSum <= 2 ? 0.8 : 0.6 };
}
