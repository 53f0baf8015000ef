// Which uses of rival terms to show: those in surroundings that the rivals share, so that a reader sees one used for the other.
import type { TokenStream } from '../../corpus/stream.js';
import { FactFlag } from '../../facts/flags.js';
import { TokenFlag } from '../../tokens/tokens.js';
import { isRunningText } from '../places.js';
import type { Use } from '../places.js';
import type { UsePlace } from '../question.js';

/** How many uses of one term are shown. */
const SHOWN = 3;
/** A rival so many words away or nearer is shown with the term. */
const NEAR = 8;
/** What each sign of a telling use counts. */
const WORTH = { rivalNearby: 4, contentWord: 2, grammarWord: 1, runningText: 1 } as const;

/** Up to three places a term: the most telling, different documents first; in document order. */
export function tellingPlaces(stream: TokenStream, usesOfTerms: readonly (readonly Use[])[]): UsePlace[] {
  const before = usesOfTerms.map((uses) => new Set(uses.map((use) => wordBefore(stream, use))));
  const after = usesOfTerms.map((uses) => new Set(uses.map((use) => wordAfter(stream, use))));
  const starts = usesOfTerms.map((uses) => new Set(uses.map(({ row }) => row)));
  return usesOfTerms.flatMap((uses, term) => {
    const ofRivals = <T>(lists: readonly T[]): T[] => lists.filter((_, index) => index !== term);
    const rivalsBefore = ofRivals(before);
    const rivalsAfter = ofRivals(after);
    const rivalStarts = ofRivals(starts);
    const scored = uses.map((use) => {
      let score = isRunningText(stream, use.row) ? WORTH.runningText : 0;
      if (rivalStarts.some((rows) => hasNear(stream, rows, use))) score += WORTH.rivalNearby;
      score += frameWorth(stream, wordBefore(stream, use), use.row - 1, rivalsBefore);
      score += frameWorth(stream, wordAfter(stream, use), use.row + use.length, rivalsAfter);
      return { use, score };
    });
    scored.sort((x, y) => y.score - x.score || x.use.row - y.use.row);
    return distinctDocuments(
      stream,
      scored.map(({ use }) => use),
    )
      .sort((x, y) => x.row - y.row)
      .map((use) => {
        const document = stream.documentOf(use.row);
        const firstToken = use.row - stream.documentFirst[document]!;
        return { term, document, firstToken, lastToken: firstToken + use.length - 1 };
      });
  });
}

function frameWorth(stream: TokenStream, word: number, row: number, rivals: readonly ReadonlySet<number>[]): number {
  if (word < 0 || !rivals.some((words) => words.has(word))) return 0;
  const flags = stream.flags[row]!;
  if ((flags & TokenFlag.word) === 0) return 0;
  return (flags & FactFlag.functionWord) === 0 ? WORTH.contentWord : WORTH.grammarWord;
}

/** The lemma of the neighbouring word in the sentence, or −1. */
function wordBefore(stream: TokenStream, { row }: Use): number {
  return row === 0 || (stream.flags[row]! & TokenFlag.sentenceStart) !== 0 ? -1 : stream.lemma[row - 1]!;
}

function wordAfter(stream: TokenStream, { row, length }: Use): number {
  const next = row + length;
  return next >= stream.length || (stream.flags[next]! & TokenFlag.sentenceStart) !== 0 ? -1 : stream.lemma[next]!;
}

function hasNear(stream: TokenStream, rows: ReadonlySet<number>, { row, length }: Use): boolean {
  for (let at = row + length; at < Math.min(stream.length, row + length + NEAR); at++) {
    if ((stream.flags[at]! & TokenFlag.sentenceStart) !== 0) break;
    if (rows.has(at)) return true;
  }
  for (let at = row; at > Math.max(0, row - NEAR); at--) {
    if ((stream.flags[at]! & TokenFlag.sentenceStart) !== 0) break;
    if (rows.has(at - 1)) return true;
  }
  return false;
}

/** The first uses of different documents, then others, up to the number shown. */
function distinctDocuments(stream: TokenStream, uses: readonly Use[]): Use[] {
  const documents = new Set<number>();
  const chosen: Use[] = [];
  const rest: Use[] = [];
  for (const use of uses) {
    if (chosen.length === SHOWN) return chosen;
    const document = stream.documentOf(use.row);
    if (documents.has(document)) rest.push(use);
    else chosen.push(use);
    documents.add(document);
  }
  return [...chosen, ...rest].slice(0, SHOWN);
}
