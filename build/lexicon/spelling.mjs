// Compiles VarCon's list of British, American, Canadian and Australian spellings into word → canonical word.
import { moduleText } from './moduleText.mjs';

/** Words rarer than this level of VarCon's are left out: nobody documents software with them. */
const rarestLevel = 70;

/** Spellings that the trade parts by meaning though dictionaries do not: a disc is a round thing, a disk stores data. */
const partedByTheTrade = new Set(['disc', 'discs']);

/**
 * Two spellings are joined only where every line that has one has the other, so that words of several senses (check and
 * cheque, tire and tyre, meter and metre) stay apart. Possessives, names and forms marked improper are left out.
 */
export function compileSpelling(text, licence) {
  const rows = parse(text);
  const rowsOf = new Map();
  rows.forEach((row, i) => row.words.forEach(({ word }) => rowsOf.set(word, [...(rowsOf.get(word) ?? []), i])));
  const inseparable = (a, b) => rowsOf.get(a).every((i) => rows[i].words.some(({ word }) => word === b));

  const leader = new Map();
  const find = (word) => (leader.has(word) ? find(leader.get(word)) : word);
  for (const { level, words } of rows) {
    if (level > rarestLevel) continue;
    const canonical = words.find(({ tags }) => tags.includes('A') || tags.includes('_')) ?? words[0];
    for (const { word } of words) {
      if (word === canonical.word || !inseparable(word, canonical.word) || !inseparable(canonical.word, word)) continue;
      const [from, to] = [find(word), find(canonical.word)];
      if (from !== to) leader.set(from, to);
    }
  }
  const lines = [...leader.keys()]
    .map((word) => [word, find(word)])
    .filter(([word, canonical]) => byRule(word) !== byRule(canonical) && !partedByTheTrade.has(word))
    .map(([word, canonical]) => `${word} ${canonical}`)
    .sort((a, b) => (a < b ? -1 : 1));
  return moduleText(
    'spelling variants, "variant canonical" a line, a modified extract of VarCon',
    [['spellingText', lines.join('\n')]],
    licence,
  );
}

/** The endings that the reader of the table folds by rule, which need no line of their own. */
function byRule(word) {
  return word.replace(/^([a-z]{3,})is(e|es|ed|ing|er|ers|able|ation|ations|ational)$/, '$1iz$2');
}

function parse(text) {
  const rows = [];
  let level = 0;
  for (const line of text.split(/\r?\n/)) {
    const heading = /^# .*\(level (\d+)\)/.exec(line);
    if (heading !== null) level = Number(heading[1]);
    if (line === '' || line.startsWith('#')) continue;
    const [body, ...notes] = line.split('#')[0].split(' | ');
    if (notes.some((note) => note.includes('(-)'))) continue;
    const words = body
      .split(' / ')
      .map((entry) => /^\s*(.*?): (.*?)\s*$/.exec(entry))
      .filter((match) => match !== null && !/['A-Z]/.test(match[2]) && !/est$|eds$/.test(match[2]))
      .map((match) => ({ word: match[2], tags: match[1].replace(/\d/g, '').split(' ') }))
      .filter(({ tags }) => !tags.every((tag) => /[-x]$/.test(tag)));
    rows.push({ level, words });
  }
  return rows;
}
