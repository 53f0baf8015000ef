// Where a form stands: its uses as rows of the token stream, how many documents hold them, and the places to show.
import { Zone } from '../prose/zones.js';
import { endRowOfBlock, firstRowOfBlock, followsOn, isContent } from '../corpus/stream.js';
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

/** Up to `limit` uses to show for one term: see {@link examplePlacesOf}. */
export function examplePlaces(stream: TokenStream, term: number, uses: readonly Use[], limit = 3): UsePlace[] {
  return chooseUses(stream, inOrder(uses), [], new Set(), limit).map((use) => placeOf(stream, term, use));
}

/**
 * Up to `limit` uses to show for each of several terms, by which a reader can tell whether one could stand for the other: first
 * those beside a word that the other terms stand beside as well, the commonest first; running text before headings and tables;
 * another document each, and no block that another term shows already, while there are others.
 */
export function examplePlacesOf(stream: TokenStream, terms: readonly (readonly Use[])[], limit = 3): UsePlace[] {
  const sorted = terms.map(inOrder);
  const frames = sharedNeighbours(stream, sorted);
  const shown = new Set<number>();
  return sorted.flatMap((uses, term) =>
    chooseUses(stream, uses, frames, shown, limit).map((use) => placeOf(stream, term, use)),
  );
}

function inOrder(uses: readonly Use[]): Use[] {
  return [...uses].sort((a, b) => a.row - b.row);
}

function placeOf(stream: TokenStream, term: number, { row, length }: Use): UsePlace {
  const document = stream.documentOf(row);
  const firstToken = row - stream.documentFirst[document]!;
  return { term, document, firstToken, lastToken: firstToken + length - 1 };
}

function chooseUses(
  stream: TokenStream,
  uses: readonly Use[],
  frames: readonly number[],
  shown: Set<number>,
  limit: number,
): Use[] {
  const prose = uses.filter((use) => isRunningText(stream, use.row));
  const others = uses.filter((use) => !isRunningText(stream, use.row));
  const chosen: Use[] = [];
  const documents = new Set<number>();
  const take = (candidates: readonly Use[], most: number, isFit: (use: Use) => boolean): void => {
    for (const use of candidates) {
      if (most === 0 || chosen.length === limit) return;
      if (chosen.includes(use) || !isFit(use)) continue;
      chosen.push(use);
      documents.add(stream.documentOf(use.row));
      shown.add(stream.blockOf(use.row));
      most--;
    }
  };
  const isUnseen = ({ row }: Use): boolean => !shown.has(stream.blockOf(row));
  const isFresh = (use: Use): boolean => !documents.has(stream.documentOf(use.row)) && isUnseen(use);
  for (const frame of frames) {
    if (chosen.length === limit) break;
    take(prose, 1, (use) => neighboursOf(stream, use).includes(frame) && isFresh(use));
  }
  for (const isFit of [isFresh, isUnseen, () => true]) take(prose, limit, isFit);
  for (const isFit of [isFresh, isUnseen, () => true]) take(others, limit, isFit);
  return chosen;
}

/** At most so many words that terms stand beside are looked for when examples are chosen. */
const MOST_NEIGHBOURS = 10;

/** The neighbours that all terms have in running text, by the uses of the term that has them least; ties by their first use. */
function sharedNeighbours(stream: TokenStream, terms: readonly (readonly Use[])[]): number[] {
  const counts = terms.map((uses) => {
    const ofTerm = new Map<number, number>();
    for (const use of uses) {
      if (!isRunningText(stream, use.row)) continue;
      for (const frame of neighboursOf(stream, use)) ofTerm.set(frame, (ofTerm.get(frame) ?? 0) + 1);
    }
    return ofTerm;
  });
  const [first, ...rest] = counts;
  if (first === undefined || rest.length === 0) return [];
  return [...first.keys()]
    .filter((frame) => rest.every((ofTerm) => ofTerm.has(frame)))
    .map((frame) => ({ frame, least: Math.min(...counts.map((ofTerm) => ofTerm.get(frame)!)) }))
    .sort((a, b) => b.least - a.least)
    .slice(0, MOST_NEIGHBOURS)
    .map(({ frame }) => frame);
}

/** The content words right before and right after a use, as twice their number, plus 1 for the one after. */
function neighboursOf(stream: TokenStream, { row, length }: Use): number[] {
  const found: number[] = [];
  const end = row + length;
  if (row > firstRowOfBlock(stream, row) && followsOn(stream, row) && isContent(stream, row - 1))
    found.push(stream.fold[row - 1]! * 2);
  if (end < endRowOfBlock(stream, row) && followsOn(stream, end) && isContent(stream, end))
    found.push(stream.fold[end]! * 2 + 1);
  return found;
}
