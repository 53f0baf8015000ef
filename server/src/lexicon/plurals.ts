// Singular and plural of English nouns: a short table of irregular ones, and rules for the rest.
import { pluralsText } from './data/plurals.js';

interface Plurals {
  /** Irregular plural → singular, and each word that is a singular or has no plural → itself. */
  readonly singulars: ReadonlyMap<string, string>;
  readonly plurals: ReadonlyMap<string, readonly string[]>;
}

let table: Plurals | undefined;

/**
 * The singular of a lower-case noun: "indices" → "index", "policies" → "policy", "statuses" → "status"; words that are no
 * plural come back as they are. A word outside the table is judged by its ending alone.
 */
export function singularOf(noun: string): string {
  const known = read().singulars.get(noun);
  if (known !== undefined) return known;
  if (noun.length < 4 || !noun.endsWith('s') || /(ss|us|is)$/.test(noun)) return noun;
  if (noun.endsWith('ies')) return noun.length > 4 ? `${noun.slice(0, -3)}y` : noun.slice(0, -1);
  if (/(ss|x|z|ch|sh|o)es$/.test(noun) && !/(.[aeiou]z|size)es$/.test(noun)) return noun.slice(0, -2);
  return noun.slice(0, -1);
}

/** The plurals of a lower-case singular noun, the usual one first; the noun itself where it has none. */
export function pluralsOf(noun: string): readonly string[] {
  const known = read().plurals.get(noun);
  if (known !== undefined) return known;
  if (/[^aeiou]y$/.test(noun)) return [`${noun.slice(0, -1)}ies`];
  return [/(s|x|z|ch|sh)$/.test(noun) ? `${noun}es` : `${noun}s`];
}

function read(): Plurals {
  if (table !== undefined) return table;
  const singulars = new Map<string, string>();
  const plurals = new Map<string, readonly string[]>();
  for (const line of pluralsText.split('\n')) {
    const [singular = '', right] = line.split(' = ');
    if (right !== undefined) {
      plurals.set(singular, right.split(', '));
      for (const plural of right.split(', ')) if (!singulars.has(plural)) singulars.set(plural, singular);
    } else {
      for (const word of line
        .slice(line.indexOf(':') + 1)
        .trim()
        .split(' ')) {
        singulars.set(word, word);
        plurals.set(word, [word]);
      }
    }
  }
  for (const singular of plurals.keys()) singulars.set(singular, singular);
  table = { singulars, plurals };
  return table;
}
