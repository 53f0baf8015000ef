// Whether a word is used as a noun or as a verb at its place, by the closed words beside it and, where given, by the tagger.
import { startsSentence } from '../rewrite/sentence.js';
import type { Form } from '../rewrite/inflect.js';
import type { Tag } from '../tokens/tokens.js';
import {
  BE_FORMS,
  BEFORE_BASE_VERB,
  BEFORE_THIRD_PERSON,
  DETERMINERS,
  OBJECT_STARTS,
  PREPOSITIONAL_TO,
  PREPOSITIONS,
} from './closedWords.js';
import { wordAfter, wordBefore } from './nearbyWords.js';

/** The part of speech of the token that begins at an offset of the block's text, where one is known. */
export type TagAt = (offset: number) => Tag | undefined;

/** `unknown` wherever the evidence does not decide: then nothing is reported of an ambiguous word. */
export type Use = 'noun' | 'verb' | 'unknown';

/** Particles that are as often the preposition of a following noun phrase: *check the log in the console*. */
const PREPOSITION_LIKE = /\s(?:in|on|over|off|through|down|by|to)$/i;

/**
 * How the word or particle verb at `[start, end)` is used.
 * @param governs true where its object is known to follow, so that a particle before a noun phrase is in no doubt
 */
export function useAt(text: string, start: number, end: number, form: Form, tagAt?: TagAt, governs = false): Use {
  const left = wordBefore(text, start)?.word;
  const right = wordAfter(text, end)?.word;
  const surface = text.slice(start, end);
  // "log in the console": particle or preposition, only a reader can say.
  if (!governs && PREPOSITION_LIKE.test(surface) && right !== undefined && OBJECT_STARTS.has(right)) return 'unknown';
  const rule = byNeighbours(text, start, form, left, right);
  if (rule !== 'unknown') return rule;
  const tag = tagAt?.(start);
  if (tag === 'VERB') return 'verb';
  return tag === 'NOUN' || tag === 'PROPN' || tag === 'ADJ' ? 'noun' : 'unknown';
}

function byNeighbours(
  text: string,
  start: number,
  form: Form,
  left: string | undefined,
  right: string | undefined,
): Use {
  const beforeObject = right !== undefined && OBJECT_STARTS.has(right);
  if (form === 'past' || form === 'participle') return 'verb';
  if (left !== undefined && DETERMINERS.has(left)) return 'noun';
  if (form === 'gerund') {
    if (beforeObject) return 'verb';
    return left !== undefined && BE_FORMS.has(left) ? 'verb' : 'unknown';
  }
  if (form === 'base') {
    if (left === 'to') {
      const further = wordBefore(text, wordBefore(text, start)!.start)?.word;
      return further !== undefined && PREPOSITIONAL_TO.has(further) ? 'noun' : 'verb';
    }
    if (left !== undefined && BEFORE_BASE_VERB.has(left)) return 'verb';
    if (left !== undefined && PREPOSITIONS.has(left)) return 'noun';
    return beforeObject ? 'verb' : isImperativeParticle(text, start, right) ? 'verb' : 'unknown';
  }
  if (left !== undefined && BEFORE_THIRD_PERSON.has(left)) return 'verb';
  if (left !== undefined && (PREPOSITIONS.has(left) || /^(?:all|most|more|other|multiple|two|three)$/.test(left)))
    return 'noun';
  return beforeObject && left !== undefined ? 'verb' : 'unknown';
}

/** "Log in to …", "Sign in with …" at the start of a sentence. */
function isImperativeParticle(text: string, start: number, right: string | undefined): boolean {
  if (!/^\p{L}+\s+(?:in|out|up|on|off|down|back|over)\b/u.test(text.slice(start, start + 32))) return false;
  if (!startsSentence(text, start)) return false;
  return right === undefined || /^(?:to|with|as|using|again|and|at|from|by|before|first|via)$/.test(right);
}
