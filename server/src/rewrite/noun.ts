// Singular and plural of an English noun, one word at a time.
import { IRREGULAR_NOUNS, PLURAL_ONLY_NOUNS, UNCHANGED_NOUNS, UNCOUNTED_NOUNS } from './data/irregularNouns.js';

const PLURALS = new Map<string, readonly string[]>(
  IRREGULAR_NOUNS.map(([singular, ...plurals]) => [singular, plurals]),
);
const SINGULARS = new Map<string, string>();
for (const [singular, ...plurals] of IRREGULAR_NOUNS) {
  for (const plural of plurals) if (!SINGULARS.has(plural)) SINGULARS.set(plural, singular);
}

/** Endings that compounds written as one word share with an irregular noun: foreman, subindex, superset of nothing else. */
const COMPOUND_ENDINGS: readonly string[] =
  'woman man child person foot tooth mouse leaf shelf life knife wife self half vertex matrix schema analysis thesis index quiz'.split(
    ' ',
  );
const COMPOUND_PLURAL = /(?:men|children|people|feet|teeth|mice|ves|ices|xes|schemata|analyses)$/;
const NOT_COMPOUND = new Set('human german roman shaman talisman ottoman caiman norman'.split(' '));

/** Words in -s that are singular as they stand: class, status, basis, alias, chaos, lens. */
const SINGULAR_IN_S =
  /(?:ss|(?<!\b(?:men|gur|em|gn|cp|gp))us|(?:s|x|r|t|n|br|ll|pol|red)is|\bis|\bhis|alias|canvas|bias|atlas|\bgas|\bwas|\bhas|\bas|christmas|pancreas|chaos|cosmos|ethos|pathos|asbestos|\bos|\blens)$/;
const SINGULAR_IN_IE =
  /(?:cook|mov|zomb|calor|brown|hood|self|rook|gen|budg|coll|freeb|newb|smooth|junk|hipp|pixie|birdi|prair)ies$/;
const SINGULAR_IN_E =
  /(?:cach|nich|quich|(?:^|head|tooth|back|heart|stomach)ach|avalanch|clich|mustach|moustach|crech|poss|finess|crevass|impass|mouss|(?:^|pick)ax)es$/;

/**
 * Plural forms of a singular noun, the usual one first. Initialisms take a small s (APIs, OSes); nouns without a plural give themselves.
 * Rules: common practice of English spelling, no single source.
 */
export function pluralForms(noun: string): readonly string[] {
  const lower = noun.toLowerCase();
  if (isInitialism(noun)) return [noun + (/[SXZ]$/.test(noun) ? 'es' : 's')];
  if (UNCHANGED_NOUNS.has(lower) || UNCOUNTED_NOUNS.has(lower) || PLURAL_ONLY_NOUNS.has(lower)) return [noun];
  const known = PLURALS.get(lower);
  if (known) return known.map((plural) => likeFirst(noun, plural));
  for (const ending of COMPOUND_ENDINGS) {
    if (lower.length > ending.length + 2 && lower.endsWith(ending) && !NOT_COMPOUND.has(lower)) {
      const stem = noun.slice(0, noun.length - ending.length);
      return PLURALS.get(ending)?.map((plural) => stem + plural) ?? [noun + 's'];
    }
  }
  return [regularPlural(noun, lower)];
}

/** The usual plural of a singular noun. */
export function plural(noun: string): string {
  return pluralForms(noun)[0]!;
}

/** The singular of a plural noun; a word that is no plural comes back as it is. */
export function singular(noun: string): string {
  const lower = noun.toLowerCase();
  if (UNCHANGED_NOUNS.has(lower) || UNCOUNTED_NOUNS.has(lower) || PLURAL_ONLY_NOUNS.has(lower)) return noun;
  if (/[A-Z]s$/.test(noun)) return noun.slice(0, -1);
  if (/[A-Z][SXZ]es$/.test(noun)) return noun.slice(0, -2);
  if (isInitialism(noun)) return noun;
  const known = SINGULARS.get(lower);
  if (known !== undefined) return likeFirst(noun, known);
  if (!lower.endsWith('s') && !COMPOUND_PLURAL.test(lower)) return noun;
  for (const candidate of singularCandidates(noun, lower)) if (pluralForms(candidate).includes(noun)) return candidate;
  return noun;
}

/** What a noun's own shape says of its number: `plural` for credentials and keys, `uncounted` for software. */
export function numberOf(noun: string): 'singular' | 'plural' | 'uncounted' | 'unchanged' {
  const lower = noun.toLowerCase();
  if (PLURAL_ONLY_NOUNS.has(lower)) return 'plural';
  if (UNCOUNTED_NOUNS.has(lower)) return 'uncounted';
  if (UNCHANGED_NOUNS.has(lower)) return 'unchanged';
  return singular(noun) === noun ? 'singular' : 'plural';
}

function isInitialism(word: string): boolean {
  return word.length > 1 && /^[\p{Lu}\d]+$/u.test(word) && /\p{Lu}/u.test(word);
}

function regularPlural(noun: string, lower: string): string {
  if (/(?:[^aeiou]|qu)y$/.test(lower)) return noun.slice(0, -1) + 'ies';
  // After a "k" sound the bare s is right (stomachs, epochs, monarchs); after the others the word gains a syllable.
  if (/(?:stoma|epo|mona|patria|lo)ch$/.test(lower)) return noun + 's';
  return noun + (/(?:s|x|z|ch|sh)$/.test(lower) ? 'es' : 's');
}

/** What a plural may be cut back to, likeliest first; the caller keeps the first whose plural is the word. */
function* singularCandidates(noun: string, lower: string): Iterable<string> {
  for (const ending of COMPOUND_ENDINGS) {
    for (const irregular of PLURALS.get(ending) ?? []) {
      if (lower.endsWith(irregular)) yield noun.slice(0, noun.length - irregular.length) + ending;
    }
  }
  if (!lower.endsWith('s') || SINGULAR_IN_S.test(lower)) return;
  if (lower.endsWith('ies') && lower.length > 4 && !SINGULAR_IN_IE.test(lower)) yield noun.slice(0, -3) + 'y';
  if (/(?:ss|x|zz|tz|sh|ch)es$/.test(lower) && !SINGULAR_IN_E.test(lower)) yield noun.slice(0, -2);
  if (
    /(?:[^aeo]us|ias|canvas|atlas|lens|gas|iris)es$/.test(lower) &&
    !/(?:^|re|mis|ab|exc|ref)(?:[fmr]?uses)$/.test(lower)
  )
    yield noun.slice(0, -2);
  yield noun.slice(0, -1);
}

function likeFirst(model: string, word: string): string {
  const first = model.charAt(0);
  return first !== first.toLowerCase() ? word.charAt(0).toUpperCase() + word.slice(1) : word;
}
