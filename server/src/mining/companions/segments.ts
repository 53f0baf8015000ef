// Segments: the stretches of text within which words may meet, from a few words to a whole document.
import { BLOCK_KINDS } from '../../prose/prose.js';
import type { TokenStream } from '../../corpus/stream.js';
import { TokenFlag } from '../../tokens/tokens.js';

/** The kinds of segment, narrowest first. */
export const SEGMENT_KINDS = ['window', 'sentence', 'paragraph', 'section', 'document'] as const;
export type SegmentKind = (typeof SEGMENT_KINDS)[number];

const HEADING = BLOCK_KINDS.indexOf('heading');
const TITLE = BLOCK_KINDS.indexOf('title');

/**
 * Cuts a stream into sentences, paragraphs (blocks), sections (from heading to heading) or documents: the number of each row's
 * segment, from 0, rising with the rows.
 */
export function cutInto(stream: TokenStream, kind: Exclude<SegmentKind, 'window'>): Uint32Array {
  const starts = new Uint8Array(stream.length + 1);
  for (const first of stream.documentFirst) starts[first] = 1;
  for (let block = 0; block < stream.blockKind.length && kind !== 'document'; block++) {
    const first = stream.blockFirst[block]!;
    if (first === stream.blockFirst[block + 1]!) continue;
    if (kind !== 'section' || opensSection(stream.blockKind[block]!)) starts[first] = 1;
  }
  const of = new Uint32Array(stream.length);
  let number = -1;
  for (let row = 0; row < stream.length; row++) {
    const opensSentence = kind === 'sentence' && (stream.flags[row]! & TokenFlag.sentenceStart) !== 0;
    if (starts[row] === 1 || opensSentence) number++;
    of[row] = number;
  }
  return of;
}

/** How many segments hold a word that counts: a repeated or closed one is none. */
export function countSegments({ counted }: TokenStream, of: Uint32Array): number {
  let count = 0;
  let last = -1;
  for (let row = 0; row < of.length; row++) {
    if (counted[row] === 0 || of[row] === last) continue;
    last = of[row]!;
    count++;
  }
  return count;
}

function opensSection(blockKind: number): boolean {
  return blockKind === HEADING || blockKind === TITLE;
}
