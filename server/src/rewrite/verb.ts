// The forms of an English verb: third person, past, participle, -ing form; alternatives where usage has several.
import {
  DOUBLING_ENDINGS,
  IRREGULAR_VERBS,
  NEVER_DOUBLING,
  REGULAR_DESPITE_PREFIX,
  STRESSED_LAST,
} from './data/irregularVerbs.js';

/** Every form with its alternatives, the usual one first. */
export interface VerbForms {
  readonly thirdPerson: readonly string[];
  readonly past: readonly string[];
  readonly participle: readonly string[];
  readonly gerund: readonly string[];
}

/** First parts behind which a verb keeps its own forms: rerun, overwrite, hot-swap. Longer ones before those they begin with. */
const PREFIXES: readonly string[] = (
  'under un over out mis fore pre re de co auto hot cross up down back off by sub super multi dis inter with proof hand self side live fast cold ' +
  'double pod web type rough in way leap'
).split(' ');

/** The verb behind each first part that the word may have. */
function* behindPrefix(base: string): Iterable<{ prefix: string; rest: string }> {
  for (const prefix of PREFIXES) {
    if (!base.startsWith(prefix)) continue;
    const at = base.charAt(prefix.length) === '-' ? prefix.length + 1 : prefix.length;
    if (base.length - at >= 2) yield { prefix: base.slice(0, at), rest: base.slice(at) };
  }
}

/** The forms of a verb given in its base form, one lower-case word. Spelling rules: common practice, American first. */
export function verbForms(base: string): VerbForms {
  const irregular = irregularForms(base);
  const doubled = doubledStem(base);
  const past = doubled.map((stem) =>
    /[^e]e$/.test(stem) || stem.endsWith('ee')
      ? stem + 'd'
      : /[^aeiou]y$/.test(stem)
        ? stem.slice(0, -1) + 'ied'
        : stem + 'ed',
  );
  return {
    thirdPerson: [thirdPerson(base)],
    past: irregular?.past ?? past,
    participle: irregular?.participle ?? past,
    gerund: gerunds(base, doubled),
  };
}

function thirdPerson(base: string): string {
  if (base === 'be') return 'is';
  if (base === 'have') return 'has';
  if (/^(?:quiz|whiz)$/.test(base)) return base + 'zes';
  if (/(?:[^aeiou]|qu)y$/.test(base)) return base.slice(0, -1) + 'ies';
  if (/(?:s|x|z|ch|sh)$/.test(base) || /[^aeiou]o$/.test(base)) return base + 'es';
  return base + 's';
}

function gerunds(base: string, doubled: readonly string[]): readonly string[] {
  if (base.endsWith('ie')) return [base.slice(0, -2) + 'ying'];
  if (/(?:queue|cue)$/.test(base)) return [base.slice(0, -1) + 'ing', base + 'ing'];
  if (/^(?:singe|tinge|binge|springe|whinge|swinge|routeing|dye)$/.test(base)) return [base + 'ing'];
  if (/(?:[^eoy]e|ye)$/.test(base) && base.length > 2 && !/(?:dye|eye)$/.test(base)) return [base.slice(0, -1) + 'ing'];
  return doubled.map((stem) => stem + 'ing');
}

function irregularForms(base: string): { past: readonly string[]; participle: readonly string[] } | undefined {
  const own = IRREGULAR_VERBS.get(base);
  if (own || REGULAR_DESPITE_PREFIX.has(base)) return own;
  for (const { prefix, rest } of behindPrefix(base)) {
    const forms = IRREGULAR_VERBS.get(rest);
    if (!forms) continue;
    const withPrefix = (form: string): string => prefix + form;
    return { past: forms.past.map(withPrefix), participle: forms.participle.map(withPrefix) };
  }
  return undefined;
}

/** The stem before -ed and -ing: the last consonant doubled, as it is, or both where British and American usage differ. */
function doubledStem(base: string): readonly string[] {
  if (/[^aeiou]?[aeiou]c$/.test(base) && !/^(?:sync|arc|zinc|talc)$|sync$/.test(base)) return [base + 'k'];
  if (/^(?:quiz|whiz)$/.test(base)) return [base + 'z'];
  const last = base.charAt(base.length - 1);
  if (/^(?:focus|bias|benefit|catalog|target|worship|telegram)$/.test(base)) return [base, base + last];
  if (!/(?:^|[^aeiou]|qu)[aeiou][bdfgklmnprstvz]$/.test(base) || NEVER_DOUBLING.has(base)) return [base];
  const rests = [...behindPrefix(base)].map(({ rest }) => rest);
  if (rests.some((rest) => NEVER_DOUBLING.has(rest))) return [base];
  if (isOneSyllable(base) || STRESSED_LAST.has(base) || DOUBLING_ENDINGS.some((end) => isCompoundOf(base, end)))
    return [base + last];
  if (rests.some((rest) => STRESSED_LAST.has(rest) || (isOneSyllable(rest) && rest.length > 2))) return [base + last];
  if (/[aeiou]l$/.test(base)) return [base, base + 'l'];
  return [base];
}

function isCompoundOf(base: string, end: string): boolean {
  return base.length >= end.length + 3 && base.endsWith(end) && /[aeiouy]/.test(base.slice(0, -end.length));
}

function isOneSyllable(word: string): boolean {
  return (
    /^(?:[^aeiou]*|[^aeiou]*qu)[aeiou][^aeiou]$/.test(word) &&
    word.length > 1 &&
    !/^[^aeiou]+y[^aeiou]*[aeiou]/.test(word)
  );
}
