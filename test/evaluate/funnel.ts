// Where a pair that nobody asks about was lost, as far as the public functions of the engine rooms tell.
import { findUses } from '../../server/src/corpus/concordance.js';
import type { Corpus } from '../../server/src/corpus/corpus.js';
import { clippedSide } from '../../server/src/lexicon/clippings.js';
import { mustStayApart } from '../../server/src/lexicon/opposites.js';
import { singularOf } from '../../server/src/lexicon/plurals.js';
import { termKey } from '../../server/src/lexicon/termKey.js';
import { findDefinitions } from '../../server/src/mining/abbreviations/definitions.js';
import { groupDefinitions } from '../../server/src/mining/abbreviations/explained.js';
import type { Explained } from '../../server/src/mining/abbreviations/explained.js';
import { formsOfLong, formsOfShort } from '../../server/src/mining/abbreviations/longForms.js';
import { freeUses } from '../../server/src/mining/abbreviations/freeUses.js';
import { usesOf as formUses } from '../../server/src/mining/abbreviations/shortAndLong.js';
import { lexicalLink } from '../../server/src/mining/synonyms/links.js';
import { numberForms } from '../../server/src/mining/wording.js';
import { verbForms } from '../../server/src/rewrite/verb.js';
import type { Asked } from './asked.js';
import { FEWEST_USES } from './gold.js';
import type { GoldPair } from './gold.js';
import { knownTermsOf } from './knownTerms.js';
import type { KnownTerms } from './knownTerms.js';
import { nounKey, placeAsked, verbKey } from './match.js';
import { hyphensOf } from './recall.js';

/** The stages at which a pair can be lost, in order, with what each means. */
export const STAGES = {
  'not used': 'a form does not stand in the counted text',
  rare: 'a form is used less than five times in the counted text',
  threshold: 'mined, but its confidence is below the default threshold',
  'look-alike': 'asked among the look-alikes only',
  explained: 'the short form is explained with its long form, and asking was held needless',
  'not linked': 'no explanation and no clipping joins short and long form',
  'other key': 'the two do not fold to one key',
  judged: 'one key, but judged right as it is or too weak',
  'no term': 'a form is neither a noun term nor a verb with objects',
  swallowed: 'a noun term stands almost only inside longer terms',
  'parts of speech': 'one is a noun term, the other a verb',
  refused: 'refused outright: opposites, a closed set, an affix, digits',
  'no link': 'both are terms, but no list and no dictionary joins them, and no other source was enough',
  'weak in use': 'a list or dictionary joins them, but their use did not confirm it',
} as const;
export type Stage = keyof typeof STAGES;

/** A stage, and what was seen there: counts, the form that is no term, why a pair is refused. */
export interface Loss {
  readonly stage: Stage;
  readonly detail?: string;
}

/** Fewest uses outside longer terms below which a noun term counts as swallowed. */
const FEWEST_OUTSIDE = 3;

/** Says of a pair that the default kinds miss where it was lost. Heavy parts are made when first needed. */
export function createFunnel(asked: Asked): (pair: GoldPair) => Loss {
  const { corpus } = asked;
  if (corpus === undefined) return () => ({ stage: 'not used' });
  const terms = once(() => knownTermsOf(corpus));
  const explained = once(() => groupDefinitions(findDefinitions(corpus)));
  return ({ a, b, kind }) => {
    const uses = [usesOf(corpus, a), usesOf(corpus, b)];
    const detail = `${uses[0]!} and ${uses[1]!} uses counted`;
    if (Math.min(...uses) < FEWEST_USES) return { stage: Math.min(...uses) === 0 ? 'not used' : 'rare', detail };
    const hyphens = hyphensOf(kind);
    const mined = asked.mined.filter((question) => question.kind !== 'look-alike');
    if (placeAsked(mined, a, b, hyphens) > 0) return { stage: 'threshold' };
    if (placeAsked(asked.withLookAlikes, a, b, hyphens) > 0) return { stage: 'look-alike' };
    if (kind === 'abbreviation') return abbreviationLoss(corpus, explained(), a, b);
    if (kind === 'spelling' || kind === 'hyphenation')
      return { stage: termKey(a) === termKey(b) ? 'judged' : 'other key', detail };
    return synonymLoss(terms(), a, b);
  };
}

function abbreviationLoss(corpus: Corpus, explained: readonly Explained[], a: string, b: string): Loss {
  const keys = [nounKey(a, 'open'), nounKey(b, 'open')];
  const same = explained.find(({ short }) => keys.includes(nounKey(short, 'open')));
  const expansion = same?.expansions.find(({ words }) => keys.includes(nounKey(words.join(' '), 'open')));
  if (same === undefined || expansion === undefined)
    return { stage: clippedSide(a.toLowerCase(), b.toLowerCase()) === undefined ? 'not linked' : 'judged' };
  const long = formUses(formsOfLong(corpus, expansion.words));
  const free = freeUses(corpus, long, formUses(formsOfShort(corpus, same.short)), expansion);
  const others = same.expansions.length - 1;
  return {
    stage: 'explained',
    detail:
      `${expansion.definitions.length} explanations; ${free.all.length} of ${long.length} long forms free, ` +
      `${free.onItsPages.length} on pages with the short form${others > 0 ? `; ${others} other expansions` : ''}`,
  };
}

function synonymLoss({ outside, verbs }: KnownTerms, a: string, b: string): Loss {
  const nouns = [a, b].map((form) => outside.get(nounKey(form, 'open')));
  const areVerbs = [a, b].map((form) => verbs.has(verbKey(form, 'open')));
  const bothNouns = nouns.every((count) => count !== undefined);
  const bothVerbs = areVerbs.every(Boolean);
  if (!bothNouns && !bothVerbs) {
    const unknown = [a, b].filter((_, index) => nouns[index] === undefined && areVerbs[index] === false);
    return unknown.length === 0 ? { stage: 'parts of speech' } : { stage: 'no term', detail: unknown.join(', ') };
  }
  if (!bothVerbs && nouns.some((count) => count! < FEWEST_OUTSIDE))
    return { stage: 'swallowed', detail: `${nouns.join(' and ')} uses outside longer terms` };
  const apart = mustStayApart(a, b);
  if (apart !== undefined) return { stage: 'refused', detail: apart.detail };
  const linked =
    (bothNouns && lexicalLink(singularPhrase(a), singularPhrase(b), 'noun') !== undefined) ||
    (bothVerbs && lexicalLink(verbKey(a, 'open'), verbKey(b, 'open'), 'verb') !== undefined);
  return { stage: linked ? 'weak in use' : 'no link' };
}

function singularPhrase(term: string): string {
  const words = term.toLowerCase().split(/\s+/);
  return [...words.slice(0, -1), singularOf(words.at(-1)!)].join(' ');
}

/** Counted uses of a term in its singular and plural, and with its first word inflected as a verb. */
export function usesOf(corpus: Corpus, term: string): number {
  const words = term.toLowerCase().split(/\s+/);
  const last = words.at(-1)!;
  const before = words.slice(0, -1);
  const forms = new Set(numberForms(last).map((form) => [...before, form].join(' ')));
  forms.add(words.join(' '));
  const { thirdPerson, past, participle, gerund } = verbForms(words[0]!);
  for (const form of [...thirdPerson, ...past, ...participle, ...gerund])
    forms.add([form, ...words.slice(1)].join(' '));
  return [...forms].reduce((sum, form) => sum + findUses(corpus, form).rows.length, 0);
}

function once<T>(make: () => T): () => T {
  let made: { readonly value: T } | undefined;
  return () => (made ??= { value: make() }).value;
}
