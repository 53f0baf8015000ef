// One match that is truly a use of its term: what the rules turn into findings.
import type { BlockContent } from '../prose/prose.js';
import { isOpen, Zone, type ZoneSet } from '../prose/zones.js';
import type { Form } from '../rewrite/inflect.js';
import { startsSentence } from '../rewrite/sentence.js';
import { isMention } from './mention.js';
import { standsAlone } from './surroundings.js';
import type { CompiledTerm, TermSet } from './termSet.js';
import { useAt, type TagAt } from './useOfWord.js';

/** A use of a term in a block; offsets count UTF-16 units of the block's text. */
export interface TermUse {
  readonly term: CompiledTerm;
  readonly start: number;
  readonly end: number;
  readonly surface: string;
  readonly form: Form;
  readonly zones: ZoneSet;
}

/** Zones in which a capital at the start of a word says nothing of the term's own case. */
const CAPITALISED_ZONES = Zone.heading | Zone.tableCell | Zone.definedTerm;

/** All zones that a range of a block's text touches, the block's own among them. */
function zonesOf(content: BlockContent, start: number, end: number): ZoneSet {
  let zones = content.zones;
  for (const mark of content.marks) {
    if (mark.start >= end) break;
    if (mark.end > start) zones |= mark.zones;
  }
  return zones;
}

/** The use at a match, or undefined where the words there are closed to checking, part of something else, or another word. */
export function useOfMatch(
  content: BlockContent,
  terms: TermSet,
  term: CompiledTerm,
  start: number,
  end: number,
  form: Form,
  tagAt?: TagAt,
): TermUse | undefined {
  const { text } = content;
  const { checked } = term;
  const zones = zonesOf(content, start, end);
  if (!isOpen(zones, terms.closed)) return undefined;
  if (!standsAlone(text, start, end, checked.text) || isMention(text, start, end)) return undefined;
  const surface = text.slice(start, end);
  if (term.caseSensitive && hasForcedCapital(content, start, surface, zones)) return undefined;
  if (term.objects && !term.objects.isObjectOf(text, start, end, form)) return undefined;
  if (!isUsedAs(text, start, end, form, term, tagAt)) return undefined;
  if (terms.overlapsTermInUse(text, start, end)) return undefined;
  return { term, start, end, surface, form, zones };
}

function isUsedAs(text: string, start: number, end: number, form: Form, term: CompiledTerm, tagAt?: TagAt): boolean {
  // With an object that the decision names behind it, a particle is no preposition: "turn on the light".
  const governs = term.objects !== undefined;
  if (term.as === 'verb') return useAt(text, start, end, form, tagAt, governs) === 'verb';
  if (term.as === 'none' || /\s/.test(term.checked.text)) return true;
  const use = useAt(text, start, end, form, tagAt);
  if (term.ambiguous) return use === 'noun';
  // A term without a stated part of speech may well be a verb in its base form; a stated noun may not.
  return term.checked.partOfSpeech === undefined || use !== 'verb';
}

/** The capital may come from the place alone: a sentence's start, a heading, a table cell. */
function hasForcedCapital(content: BlockContent, start: number, surface: string, zones: ZoneSet): boolean {
  if (!/^\p{Lu}/u.test(surface)) return false;
  const named = content.kind === 'heading' || content.kind === 'title' || (zones & CAPITALISED_ZONES) !== 0;
  return named || startsSentence(content.text, start);
}
