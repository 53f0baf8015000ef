// Parallel places that neighbouring blocks make: a page's title with its description or heading, a caption with its picture's text.
import type { Corpus } from '../../../corpus/corpus.js';
import { BLOCK_KINDS } from '../../../prose/prose.js';
import type { Parallel, Passage } from './passages.js';

const HEADING = BLOCK_KINDS.indexOf('heading');
const CAPTION = BLOCK_KINDS.indexOf('caption');
const TITLE = BLOCK_KINDS.indexOf('title');
const DESCRIPTION = BLOCK_KINDS.indexOf('description');
const ALTERNATIVE = BLOCK_KINDS.indexOf('alternativeText');

/** The title of a page with its description and its first heading; a caption with the alternative text beside it. */
export function findBlockParallels({ stream }: Corpus): Parallel[] {
  const found: Parallel[] = [];
  let title: Passage | undefined;
  let hasHeading = false;
  let document = -1;
  let previous: { kind: number; passage: Passage } | undefined;
  for (let block = 0; block < stream.blockKind.length; block++) {
    const passage = { first: stream.blockFirst[block]!, end: stream.blockFirst[block + 1]! };
    if (passage.first === passage.end) continue;
    const kind = stream.blockKind[block]!;
    const here = stream.documentOf(passage.first);
    if (here !== document) {
      title = previous = undefined;
      hasHeading = false;
    }
    document = here;
    if (title !== undefined && (kind === DESCRIPTION || (kind === HEADING && !hasHeading))) {
      found.push({ source: 'title', one: title, other: passage });
    }
    const beside = [previous?.kind, kind];
    if (beside.includes(CAPTION) && beside.includes(ALTERNATIVE)) {
      found.push({ source: 'caption', one: previous!.passage, other: passage });
    }
    if (kind === TITLE) title = passage;
    hasHeading ||= kind === HEADING;
    previous = { kind, passage };
  }
  return found;
}
