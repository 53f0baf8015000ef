// Where a form stands: its uses as rows of the token stream, how many documents hold them, and the places to show.
import { Zone } from '../prose/zones.js';
import { firstRowOfBlock } from '../corpus/stream.js';
import type { TokenStream } from '../corpus/stream.js';
import { TokenFlag } from '../tokens/tokens.js';
import type { UsePlace } from './question.js';

/** One use of a form: rows `[row, row + length)` of the token stream. */
export interface Use {
  readonly row: number;
  readonly length: number;
}

/** How many documents hold at least one of the uses. */
export function countDocuments(stream: TokenStream, uses: readonly Use[]): number {
  return new Set(uses.map((use) => stream.documentOf(use.row))).size;
}

/** True for a row in running text: no heading, label, table cell or page title. */
export function isRunningText(stream: TokenStream, row: number): boolean {
  return (stream.zones[row]! & (Zone.heading | Zone.tableCell | Zone.frontMatter | Zone.alternativeText)) === 0;
}

/** True for a row inside a sentence of running text, where a capital is the word's own. */
export function isInsideSentence(stream: TokenStream, row: number): boolean {
  return (
    isRunningText(stream, row) &&
    (stream.flags[row]! & TokenFlag.sentenceStart) === 0 &&
    row > firstRowOfBlock(stream, row)
  );
}

/**
 * Up to `limit` uses to show for one term: running text before headings and tables, another document each while there
 * are any, in document order.
 */
export function examplePlaces(stream: TokenStream, term: number, uses: readonly Use[], limit = 3): UsePlace[] {
  const inOrder = [...uses].sort((a, b) => a.row - b.row);
  const preferred = [
    ...inOrder.filter((use) => isRunningText(stream, use.row)),
    ...inOrder.filter((use) => !isRunningText(stream, use.row)),
  ];
  const seen = new Set<number>();
  const chosen: Use[] = [];
  for (const use of preferred) {
    if (chosen.length === limit) break;
    const document = stream.documentOf(use.row);
    if (!seen.has(document)) {
      seen.add(document);
      chosen.push(use);
    }
  }
  for (const use of preferred) {
    if (chosen.length === limit) break;
    if (!chosen.includes(use)) chosen.push(use);
  }
  return chosen
    .sort((a, b) => a.row - b.row)
    .map((use) => {
      const document = stream.documentOf(use.row);
      const firstToken = use.row - stream.documentFirst[document]!;
      return { term, document, firstToken, lastToken: firstToken + use.length - 1 };
    });
}
