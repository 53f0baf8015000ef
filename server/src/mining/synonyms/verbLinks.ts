// Whether two verbs may name one operation on an object: what list and dictionary say, and how sure that is.
import { areEquivalent } from '../../lexicon/equivalents.js';
import { mustStayApart } from '../../lexicon/opposites.js';
import { spellingKey } from '../../lexicon/spelling.js';
import { synonymy } from '../../lexicon/synonyms.js';
import { termKey } from '../../lexicon/termKey.js';
import { isGeneralNoun, isGeneralVerb } from './generalWords.js';
import type { Likeness } from './neighbours.js';

/** How two verbs are linked, for one object. */
export interface VerbLink {
  readonly kind: 'list' | 'dictionary';
  /** From 0 to 1: how far the source alone may be believed. */
  readonly strength: number;
  readonly text: string;
}

/** A dictionary's synonyms in rarer senses than this (sum of both places) say nothing of technical prose. */
const RAREST_SENSES = 5;

/** The link of two verbs, or undefined where there is none or they must stay apart. */
export function linkVerbs(one: string, other: string, object: string): VerbLink | undefined {
  if (spellingKey(one) === spellingKey(other) || mustStayApart(one, other) !== undefined) return undefined;
  const set = areEquivalent(one, other, 'verb');
  if (set !== undefined) {
    const fit = set.objects === undefined ? 0.8 : fitOf(object, set.objects);
    const strength = fit * (set.distinct === undefined ? 1 : 0.7);
    if (strength > 0.4)
      return { kind: 'list', strength, text: `the trade uses “${one}” and “${other}” for one operation` };
  }
  const relation = synonymy(one, other, 'verb');
  if (typeof relation !== 'object' || relation.rankSum > RAREST_SENSES) return undefined;
  return {
    kind: 'dictionary',
    strength: relation.rankSum <= 2 ? 0.8 : relation.rankSum === 3 ? 0.7 : 0.5,
    text: `a general dictionary gives “${one}” and “${other}” as synonyms`,
  };
}

/** How well an object is one of those that a set of verbs is for. */
function fitOf(object: string, objects: readonly string[]): number {
  const key = termKey(object);
  if (objects.some((each) => termKey(each) === key)) return 1;
  if (objects.some((each) => areEquivalent(each, object, 'noun') !== undefined)) return 0.85;
  return objects.some((each) => synonymy(each, object, 'noun') !== undefined) ? 0.6 : 0.3;
}

/** The score of two verbs with an object, in logits: 0 is as likely right as wrong. */
export function scoreOfVerbs(one: string, other: string, object: string, link: VerbLink, likeness: Likeness): number {
  let score = -1.6 + 3 * link.strength;
  score -= 0.25 * Math.log(Math.sqrt(likeness.rankOfA * likeness.rankOfB));
  if (isGeneralNoun(object)) score -= 0.8;
  if (isGeneralVerb(one) || isGeneralVerb(other)) score -= 1.2;
  return score;
}
