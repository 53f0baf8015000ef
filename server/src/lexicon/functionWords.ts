// The words of grammar: no term begins or ends with one. And the particles that make a verb another verb.
import { functionWordsText } from './data/functionWords.js';

let lists: { words: ReadonlySet<string>; particles: ReadonlySet<string> } | undefined;

/** True for a word of grammar (article, pronoun, auxiliary, conjunction, preposition …), given in lower case. */
export function isFunctionWord(word: string): boolean {
  return read().words.has(word);
}

/** True for a word that makes a phrasal verb ("up" in "set up"), given in lower case. Some are prepositions elsewhere. */
export function isParticle(word: string): boolean {
  return read().particles.has(word);
}

function read(): { words: ReadonlySet<string>; particles: ReadonlySet<string> } {
  if (lists === undefined) {
    const words = new Set<string>();
    const particles = new Set<string>();
    for (const line of functionWordsText.split('\n')) {
      const colon = line.indexOf(':');
      const into = line.slice(0, colon) === 'particles' ? particles : words;
      for (const word of line
        .slice(colon + 1)
        .trim()
        .split(' '))
        into.add(word);
    }
    lists = { words, particles };
  }
  return lists;
}
