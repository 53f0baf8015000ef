// Word formation that makes another thing of a thing: negating and other prefixes, opposed prefixes, opposed endings.

/** Prefixes of which "x" and "prefix + x" are two things. */
const negating = ['un', 'non', 'in', 'im', 'il', 'ir', 'dis', 'de', 'mis', 'anti', 'counter', 'not', 'no'];
/** Those that stand alone, or part from the word by a hyphen. */
const standalone = ['non', 'not', 'no', 'un', 'anti'];

/** Prefixes that do not negate but make another thing. */
const distinguishing = [
  're',
  'pre',
  'post',
  'sub',
  'super',
  'meta',
  'multi',
  'inter',
  'micro',
  'over',
  'under',
  'semi',
  'pseudo',
];

/** Pairs of prefixes of which "first + x" and "second + x" are opposed. */
const opposed: readonly (readonly [string, string])[] = [
  ['up', 'down'],
  ['in', 'out'],
  ['in', 'ex'],
  ['im', 'ex'],
  ['in', 'de'],
  ['en', 'de'],
  ['en', 'dis'],
  ['em', 'dis'],
  ['pre', 'post'],
  ['over', 'under'],
  ['inter', 'intra'],
  ['multi', 'single'],
  ['macro', 'micro'],
  ['maxi', 'mini'],
  ['super', 'sub'],
  ['front', 'back'],
  ['fore', 'back'],
  ['pro', 'anti'],
  ['homo', 'hetero'],
  ['uni', 'bi'],
  ['uni', 'multi'],
  ['mono', 'poly'],
  ['intro', 'extro'],
  ['inner', 'outer'],
  ['north', 'south'],
  ['east', 'west'],
];

/** Endings of inflection and derivation that two opposites may share (encoder, decoder). */
const endings = [
  's',
  'es',
  'd',
  'ed',
  'ing',
  'r',
  'er',
  'or',
  'ion',
  'ation',
  'able',
  'ible',
  'ment',
  'ance',
  'ly',
  'ness',
];

/**
 * Says by which affix two lower-case words differ if that makes them two things: `negated`, `prefixed`, `opposed`; a lone
 * word against nothing counts when it is a negating word itself ("blocking call", "non-blocking call").
 */
export function differenceByAffix(a: string, b: string): 'negated' | 'prefixed' | 'opposed' | undefined {
  if (a === '' || b === '') return standalone.includes(a === '' ? b : a) ? 'negated' : undefined;
  const [short, long] = a.length <= b.length ? [a, b] : [b, a];
  const prefix = long.endsWith(short) && short.length >= 3 ? long.slice(0, long.length - short.length) : '';
  if (negating.includes(prefix)) return 'negated';
  if (distinguishing.includes(prefix)) return 'prefixed';
  const async = /^a(?=s)/.test(long) && long.slice(1) === short && short.startsWith('sync');
  if (async) return 'negated';
  if (isOpposed(a, b) || isOpposed(b, a)) return 'opposed';
  return undefined;
}

function isOpposed(a: string, b: string): boolean {
  if (/less$/.test(a) && a.slice(0, -4) === b.replace(/(ful|ed)$/, '') && /(ful|ed)$/.test(b)) return true;
  return opposed.some(([x, y]) => {
    if (!a.startsWith(x) || !b.startsWith(y) || a.slice(x.length) !== b.slice(y.length)) return false;
    // The prefixes alone are what differs in "pre-install hook" and "post-install hook".
    return a === x || a.length > x.length + 1;
  });
}

/** Pairs of base words that two words with the same ending may come from: "opening", "closing" → open, close. */
export function sharedEndings(a: string, b: string): (readonly [string, string])[] {
  const pairs: (readonly [string, string])[] = [];
  for (const ending of endings) {
    if (!a.endsWith(ending) || !b.endsWith(ending)) continue;
    for (const x of bases(a.slice(0, a.length - ending.length))) {
      for (const y of bases(b.slice(0, b.length - ending.length))) pairs.push([x, y]);
    }
  }
  return pairs;
}

/** A stem as it may stand alone: as it is, with a final e, with its last consonant single. */
function bases(stem: string): string[] {
  if (stem.length < 2) return [];
  const found = [stem, `${stem}e`];
  if (stem.length > 3 && stem.at(-1) === stem.at(-2)) found.push(stem.slice(0, -1));
  return found;
}
