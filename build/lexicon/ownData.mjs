// Turns our own word lists into modules: comments and blank lines go, everything else stays as it is written.
import { moduleText } from './moduleText.mjs';

const lists = [
  ['equivalents', 'technical terms that name one thing'],
  ['clippings', 'clipped forms and the words they stand for'],
  ['opposites', 'pairs of opposites of the trade'],
  ['closedSets', 'sets whose members are never one thing'],
  ['functionWords', 'words that carry grammar rather than content'],
  ['verbNounPairs', 'phrasal verbs and the nouns made of them'],
  ['iseWords', 'words that end in -ise in every country'],
  ['plurals', 'irregular plurals, and nouns that have none'],
];

/** Pairs of module name and text; `source` reads a file of server/lexicon-data. */
export function* compileOwnData(source) {
  for (const [name, duty] of lists) {
    const lines = source(`${name}.txt`)
      .split(/\r?\n/)
      .map((line) => line.trim())
      .filter((line) => line !== '' && !line.startsWith('#'));
    yield [`${name}.ts`, moduleText(duty, [[`${name}Text`, lines.join('\n')]])];
  }
}
