// Adding one block's words and n-grams to the counts, or taking them out again.
import type { ColumnEdit } from '../base/pagedColumn.js';
import { isOpen } from '../prose/zones.js';
import type { ZoneSet } from '../prose/zones.js';
import { FactFlag } from '../facts/flags.js';
import type { DocumentFacts } from '../facts/documentFacts.js';
import { TokenFlag } from '../tokens/tokens.js';
import { LONGEST_GRAM } from './grams.js';
import type { GramTable } from './grams.js';
import type { Vocabulary } from './vocabulary.js';

interface Columns {
  readonly words: ColumnEdit;
  readonly grams: ColumnEdit;
}

/**
 * Adds (`sign` 1) or takes out (−1) the tokens of one block. Words count as spelled; n-grams of two to four words count in
 * lower case, where no punctuation, opaque thing or sentence end stands between and both ends are content words.
 */
export function countBlock(
  document: { readonly facts: DocumentFacts; readonly ids: Uint32Array },
  block: number,
  sign: 1 | -1,
  tables: { readonly vocabulary: Vocabulary; readonly grams: GramTable; readonly closed: ZoneSet },
  columns: Columns,
): void {
  const { facts, ids } = document;
  const from = facts.blockFirst[block]!;
  const until = facts.blockFirst[block + 1]!;
  for (let row = from; row < until; row++) {
    if (!isOpen(facts.zones[row]!, tables.closed)) continue;
    const word = ids[facts.word[row]!]!;
    columns.words.add(word, sign);
    if (!isContentWord(facts, row)) continue;
    let gram = tables.vocabulary.foldOf(word);
    for (let length = 2; length <= LONGEST_GRAM; length++) {
      const next = row + length - 1;
      if (next >= until || !continues(facts, next, tables.closed)) break;
      gram = tables.grams.extend(gram, tables.vocabulary.foldOf(ids[facts.word[next]!]!), length);
      if (isContentWord(facts, next)) columns.grams.add(gram, sign);
    }
  }
}

/** True where a counted word follows its neighbour with nothing but white space between them. */
function continues(facts: DocumentFacts, row: number, closed: ZoneSet): boolean {
  const flags = facts.flags[row]!;
  return (
    (flags & TokenFlag.word) !== 0 &&
    (flags & TokenFlag.spaceBefore) !== 0 &&
    (flags & TokenFlag.sentenceStart) === 0 &&
    (facts.flags[row - 1]! & TokenFlag.possessive) === 0 &&
    isOpen(facts.zones[row]!, closed)
  );
}

/** True for a word that an n-gram may begin or end with. */
function isContentWord(facts: DocumentFacts, row: number): boolean {
  const flags = facts.flags[row]!;
  return (flags & TokenFlag.word) !== 0 && (flags & FactFlag.functionWord) === 0;
}
