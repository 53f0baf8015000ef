// Whether two verbs may name one operation on an object: what list and dictionary say, and how sure that is.
import { clippedSide } from '../../lexicon/clippings.js';
import { areEquivalent } from '../../lexicon/equivalents.js';
import { mustStayApart } from '../../lexicon/opposites.js';
import { spellingKey } from '../../lexicon/spelling.js';
import { synonymy } from '../../lexicon/synonyms.js';
import { termKey } from '../../lexicon/termKey.js';
import { isGeneralNoun, isGeneralVerb } from './generalWords.js';
import { RAREST_SENSES } from './links.js';
import type { Likeness } from './neighbours.js';

/** How two verbs are linked, for one object. */
export interface VerbLink {
  readonly kind: 'list' | 'dictionary';
  /** From 0 to 1: how far the source alone may be believed. */
  readonly strength: number;
  readonly text: string;
}

/** Fewer uses than this with one object may be chance. */
const FEW = 4;
/** More places than this are those of a template, and say no more. */
const MOST_PLACES = 3;

/** The link of two verbs, or undefined where there is none or they must stay apart. */
export function linkVerbs(one: string, other: string, object: string): VerbLink | undefined {
  const link = lexicalLinkOfVerbs(one, other, object);
  if (link === undefined || spellingKey(one) === spellingKey(other)) return undefined;
  return clippedSide(one, other) === undefined && mustStayApart(one, other) === undefined ? link : undefined;
}

function lexicalLinkOfVerbs(one: string, other: string, object: string): VerbLink | undefined {
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
    strength: relation.rankSum <= 2 ? 0.8 : 0.7,
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

/** Everything that is known of two verbs with an object when they are judged. */
export interface KnownVerbs {
  readonly link: VerbLink;
  readonly likeness: Likeness;
  /** Uses of the rarer verb with the object. */
  readonly fewest: number;
  /** The share, from 0 to 1, of its uses in which the object has the same modifiers as with the other verb. */
  readonly sharedPhrases: number;
  /** Passages of the documents that differ in these two verbs alone. */
  readonly substitutions: number;
}

/** The score of two verbs with an object, in logits: 0 is as likely right as wrong. */
export function scoreOfVerbs(one: string, other: string, object: string, known: KnownVerbs): number {
  const { link, likeness, fewest, sharedPhrases, substitutions } = known;
  let score = -1.6 + 3 * link.strength;
  const rank = Math.sqrt(likeness.rankOfA * likeness.rankOfB);
  score -= 0.45 * Math.log(rank);
  score += 0.6 * (sharedPhrases - 0.5) + 0.3 * Math.log1p(Math.min(MOST_PLACES, substitutions));
  if (fewest < FEW) score -= 0.3;
  if (isGeneralNoun(object)) score -= 1.2;
  score -= 1.2 * (Number(isGeneralVerb(one)) + Number(isGeneralVerb(other)));
  return score;
}
