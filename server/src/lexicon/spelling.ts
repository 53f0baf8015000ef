// Folds the spellings of one word, British or American or other, to one key.
import { iseWordsText } from './data/iseWords.js';
import { spellingText } from './data/spelling.js';

/** Directions that are written with and without a final s (towards, toward); verbs such as "forwards" fold alike. */
const wards = /^(after|back|down|east|for|home|in|north|on|out|sea|side|sky|south|to|up|west)wards$/;

/** What follows the s of -ise beside -ize. */
const afterIs = new Set(['e', 'es', 'ed', 'ing', 'er', 'ers', 'able', 'ation', 'ations', 'ational']);

let table: Map<string, string> | undefined;
/** Words that end in -ise everywhere, without that ending. */
let alwaysIse: ReadonlySet<string> | undefined;

/**
 * The key that all spellings of a word share: "colour" and "color" → "color", "organise" → "organize". Words of several
 * senses of which only some are spelled so (check and cheque, meter and metre) keep keys of their own. Words that differ by
 * part of speech in some countries (licence and license) share a key: whoever asks must compare like uses.
 * From VarCon, for words a dictionary has; -ise and -wards by rule.
 * @param lowerWord one lower-case word, inflected or not, with or without hyphens
 */
export function spellingKey(lowerWord: string): string {
  table ??= parse();
  if (lowerWord.includes('-')) return lowerWord.split('-').map(spellingKey).join('-');
  return byRule(table.get(lowerWord) ?? lowerWord);
}

function byRule(word: string): string {
  if (word.endsWith('wards')) return word.replace(wards, '$1ward');
  const at = word.lastIndexOf('is');
  if (at < 3 || !afterIs.has(word.slice(at + 2))) return word;
  const stem = word.slice(0, at);
  alwaysIse ??= new Set(iseWordsText.split(/\s/).map((one) => one.replace(/ise$/, '')));
  return stem.endsWith('w') || alwaysIse.has(stem) ? word : `${stem}iz${word.slice(at + 2)}`;
}

function parse(): Map<string, string> {
  const map = new Map<string, string>();
  for (const line of spellingText.split('\n')) {
    const space = line.indexOf(' ');
    map.set(line.slice(0, space), line.slice(space + 1));
  }
  return map;
}
