// Phrasal verbs and the nouns made of them (log in, login): two words with two uses, never variants of one.
import { verbNounPairsText } from './data/verbNounPairs.js';

interface Pairs {
  readonly nouns: ReadonlyMap<string, readonly string[]>;
  readonly verbs: ReadonlyMap<string, string>;
}

let table: Pairs | undefined;

/** The nouns of a phrasal verb given as "log in", in lower case; empty for any other word. */
export function nounsOfVerb(verb: string): readonly string[] {
  return read().nouns.get(verb) ?? [];
}

/** The phrasal verb of a noun given as "login" or "log-in", in lower case. */
export function verbOfNoun(noun: string): string | undefined {
  return read().verbs.get(noun);
}

/** Whether one of two lower-case terms is the phrasal verb and the other the noun made of it, in either order. */
export function isVerbNounPair(a: string, b: string): boolean {
  return verbOfNoun(b) === a || verbOfNoun(a) === b;
}

function read(): Pairs {
  if (table !== undefined) return table;
  const nouns = new Map<string, readonly string[]>();
  const verbs = new Map<string, string>();
  for (const line of verbNounPairsText.split('\n')) {
    const [verb = '', right = ''] = line.split(' = ');
    // Whether the noun is written with or without a hyphen is a question of its own.
    const forms = new Set([...right.split(', '), verb.replace(' ', ''), verb.replace(' ', '-')]);
    nouns.set(verb, [...forms]);
    for (const form of forms) verbs.set(form, verb);
  }
  table = { nouns, verbs };
  return table;
}
