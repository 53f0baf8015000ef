// Whether two ways of writing are a mix to ask about: how often they stand in the same slot, and what speaks against it.
import { isVerbNounPair } from '../../lexicon/verbNounPairs.js';
import { SLOTS } from './slots.js';
import type { Slot } from './slots.js';
import type { Style } from './styles.js';

/** What the two ways differ in. */
export type Lane = 'spelling' | 'joining' | 'hyphen' | 'space' | 'name' | 'kind';

/** A mix of two ways of writing. */
export interface Mix {
  readonly lane: Lane;
  /** Uses in which the ways could be exchanged: the smaller count in each slot, added up. */
  readonly exchangeable: number;
}

/** The particles of phrasal verbs: written apart from a verb, together in the noun made of it. */
const PARTICLES = new Set(
  'up out off down in on over away back through around along by about across under together ahead forward apart to'.split(
    ' ',
  ),
);
/** Words inside a phrase that make its open form a phrase of grammar (end to end, out of date, left to right). */
const LINKS = new Set('to of and or the a an in on by for with from at as per vs not no than'.split(' '));

/** Words that count or grade the noun at a phrase's end rather than the one after them: a single node failure. */
const QUANTIFIERS = new Set(
  `one two three four five six seven eight nine ten single multiple several many few more less most least first second third
  last next same other different various higher lower larger smaller longer shorter faster slower better best
  worst new old`.split(/\s+/),
);

/** Slots in which an open and a joined form are the same part of speech. */
const LIKE_SLOTS: readonly Slot[] = ['attributive', 'predicate', 'noun', 'verb'];

/** An open form that begins with a quantifier must be as frequent before a noun as 1 / this of the joined one. */
const QUANTIFIED_SHARE = 4;

/** At most so many places, and less than such a share of the rarer way's uses, are slips. */
const SLIPS = { most: 4, share: 0.3 } as const;

/**
 * A hyphen that stands before nouns in at least such a share of its uses, while the open form does in at most such a share of its
 * own, is grammar (command-line options on the command line). Common practice, no source.
 */
const GRAMMAR = { hyphened: 0.75, open: 0.5 } as const;

/**
 * A camel name with articles or a plural in this share of its uses is a kind or class; from the second share on it is used as a
 * noun like any other.
 */
const KIND = { least: 0.1, noun: 0.5 } as const;

/** A form that is mostly a name of code must stand in so many places that are none. */
const LEAST_OF_NAME = 4;

/** Judges two ways of writing one key, or returns undefined where they are right as they are. */
export function judge(a: Style, b: Style): Mix | undefined {
  if (a.uses.length === 0 || b.uses.length === 0) return undefined;
  const open = a.shape === 'open' ? a : b.shape === 'open' ? b : undefined;
  const chunk = open === a ? b : a;
  if (open === undefined) return judgeChunks(a, b);
  if (chunk.shape === 'open') return undefined;
  return judgeOpen(chunk, open);
}

function judgeChunks(a: Style, b: Style): Mix | undefined {
  if (isLowerCamel(a) || isLowerCamel(b)) return undefined;
  if (isShouted(a) !== isShouted(b)) return undefined;
  const sameShape = a.shape === b.shape;
  const byPart = sameShape && differsByPartOfSpeech(a.text, b.text);
  const particle = !sameShape && endsInParticle(a.shape === 'hyphened' ? a : b);
  const exchangeable = byPart
    ? shared(a, b, ['attributive', 'predicate', 'noun', 'unclear', 'verb'])
    : particle
      ? shared(a, b, ['attributive', 'predicate', 'noun'])
      : Math.min(counted(a), counted(b));
  if (exchangeable === 0) return undefined;
  if (!sameShape && (a.isMostlyName || b.isMostlyName) && exchangeable < LEAST_OF_NAME) return undefined;
  if (!sameShape && (isCamel(a) || isCamel(b))) return undefined;
  return { lane: sameShape ? 'spelling' : 'joining', exchangeable };
}

function judgeOpen(chunk: Style, open: Style): Mix | undefined {
  const parts = open.forms[0]!.parts;
  if (parts.some((part, i) => i > 0 && PARTICLES.has(part)) || PARTICLES.has(parts[0]!)) return undefined;
  if (isVerbNounPair(open.text, chunk.text)) return undefined;
  if (isLowerCamel(chunk) || isShouted(chunk)) return undefined;
  if (namesOf(open) > 0.6 && namesOf(chunk) < 0.6) return undefined;
  if (isCamel(chunk)) return judgeCamel(chunk, open);
  const phrase = parts.some((part) => LINKS.has(part));
  const slots = phrase ? (['attributive'] as const) : isMostlyVerb(chunk) ? (['verb'] as const) : LIKE_SLOTS;
  if (QUANTIFIERS.has(parts[0]!) && open.slots.attributive * QUANTIFIED_SHARE < chunk.slots.attributive)
    return undefined;
  // Lone uses in two slots are as easily two misread sentences.
  if (Math.max(...slots.map((slot) => shared(chunk, open, [slot]))) < 2) return undefined;
  const exchangeable = shared(chunk, open, slots);
  if (chunk.isMostlyName && exchangeable < LEAST_OF_NAME) return undefined;
  if (chunk.shape === 'hyphened' && (isGrammar(chunk, open) || areSlips(exchangeable, chunk, open))) return undefined;
  return { lane: chunk.shape === 'hyphened' ? 'hyphen' : 'space', exchangeable };
}

/** A hyphen before a noun and none elsewhere is the rule: a few places where it is not kept are slips of it, no mix. */
function areSlips(exchangeable: number, a: Style, b: Style): boolean {
  return exchangeable <= SLIPS.most && exchangeable < SLIPS.share * Math.min(a.uses.length, b.uses.length);
}

/** The hyphen is kept before nouns and left elsewhere, save for strays. */
function isGrammar(chunk: Style, open: Style): boolean {
  return attributiveShare(chunk) >= GRAMMAR.hyphened && attributiveShare(open) <= GRAMMAR.open;
}

function attributiveShare({ slots: { attributive, predicate, noun } }: Style): number {
  return attributive / Math.max(1, attributive + predicate + noun);
}

/** A verb made of two words (to bulk-load) is no way of writing the noun, wherever a reading of its slot goes wrong. */
function isMostlyVerb({ shape, slots: { attributive, predicate, noun, verb } }: Style): boolean {
  return shape === 'hyphened' && verb > 0 && verb >= attributive + predicate + noun;
}

/** A kind or class beside the concept it stands for: a mix only where prose uses the joined form as a noun of its own. */
function judgeCamel(chunk: Style, open: Style): Mix | undefined {
  const plurals = chunk.forms
    .filter((form) => form.text !== form.style)
    .reduce((sum, form) => sum + form.rows.length, 0);
  const asName = open.inside > 0 && open.capitalised / open.inside >= 0.6;
  const leads = chunk.uses.length >= 10 && chunk.uses.length >= 4 * open.uses.length;
  if (!asName && !leads) return undefined;
  if (!asName && plurals * 20 < chunk.uses.length) return undefined;
  // A part of one longer name beside a name of its own: Horizontal Pod Autoscaler, PodAutoscaler.
  if (open.afterName > 0.5 * open.inside && chunk.afterName < 0.25 * chunk.inside) return undefined;
  const exchangeable = shared(chunk, open, ['predicate', 'noun']);
  if (exchangeable < 2) return undefined;
  // A kind beside a component that is named alike, or told by a name; what takes no articles at all is one proper name.
  const { predicate, noun, unclear } = chunk.slots;
  const asNoun = chunk.determined / Math.max(1, predicate + noun + unclear);
  const isKind = asNoun >= KIND.least && (open.beginsWithName || (asName && asNoun < KIND.noun));
  const together = exchangeable + shared(chunk, open, ['attributive']);
  return { lane: isKind ? 'kind' : 'name', exchangeable: together };
}

function shared(a: Style, b: Style, slots: readonly Slot[]): number {
  return slots.reduce((sum, slot) => sum + Math.min(a.slots[slot], b.slots[slot]), 0);
}

function counted(style: Style): number {
  return SLOTS.reduce((sum, slot) => sum + (slot === 'lone' ? 0 : style.slots[slot]), 0);
}

function endsInParticle(style: Style): boolean {
  const { parts } = style.forms[0]!;
  return PARTICLES.has(parts[parts.length - 1]!);
}

/** licence and license, practice and practise, indexes and indices: one spelling may be the verb's. */
function differsByPartOfSpeech(a: string, b: string): boolean {
  return a.replace(/s/g, 'c') === b.replace(/s/g, 'c') || a.endsWith('s') || b.endsWith('s');
}

function isCamel(style: Style): boolean {
  return style.inside > 0 ? style.camel / style.inside >= 0.5 : false;
}

function isLowerCamel(style: Style): boolean {
  return style.lowerCamel > 0 && style.lowerCamel * 2 >= style.inside;
}

function isShouted(style: Style): boolean {
  return style.shouted > 0 && style.shouted * 2 >= style.inside;
}

/** The share of uses inside sentences with a capital anywhere. */
function namesOf(style: Style): number {
  return style.inside === 0 ? 0 : style.withCapital / style.inside;
}
