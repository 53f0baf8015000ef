// What speaks against two terms being one concept: the lexicon's vetoes and the documents' own.
import type { Corpus } from '../../corpus/corpus.js';
import { mustStayApart } from '../../lexicon/opposites.js';
import { clippedSide } from '../../lexicon/clippings.js';
import { BLOCK_KINDS } from '../../prose/prose.js';
import type { Segments } from './segment.js';
import type { Term } from './terms.js';

/** The documents' own statements that terms are separate things. */
export interface Separations {
  /** In how many documents each of two terms has a heading, list item or table cell of its own beside the other's. */
  siblings(a: number, b: number): number;
  /** Whether both are headwords of the documents' glossaries. */
  bothDefined(a: number, b: number): boolean;
}

const HEADING = BLOCK_KINDS.indexOf('heading');
const LIST_ITEM = BLOCK_KINDS.indexOf('listItem');
const TABLE_CELL = BLOCK_KINDS.indexOf('tableCell');
const DEFINED = BLOCK_KINDS.indexOf('definedTerm');

/** True where the pair must not be asked about, whatever its evidence. */
export function isRefused(a: Term, b: Term): boolean {
  const left = a.words.join(' ');
  const right = b.words.join(' ');
  if (isCodeLike(left) !== isCodeLike(right)) return true;
  // A clipping and its full form are the abbreviations' to ask about, and a longer term its shorter one's.
  return clippedSide(left, right) !== undefined || mustStayApart(left, right) !== undefined;
}

function isCodeLike(text: string): boolean {
  return /[\d_.]/.test(text);
}

export function readSeparations(corpus: Corpus, segments: Segments): Separations {
  const { stream, vocabulary } = corpus;
  const groups = new Map<number, Set<number>>();
  const defined = new Set<number>();
  let group = 0;
  let document = -1;
  let previous = -1;
  let i = 0;
  const blocks = stream.blockKind.length;
  const join = (id: number, term: number): void => {
    const found = groups.get(term);
    if (found === undefined) groups.set(term, new Set([id]));
    else found.add(id);
  };
  for (let block = 0; block < blocks; block++) {
    const first = stream.blockFirst[block]!;
    const end = stream.blockFirst[block + 1]!;
    if (first === end) continue;
    const kind = stream.blockKind[block]!;
    const here = stream.documentOf(first);
    if (here !== document || kind !== previous) group++;
    document = here;
    previous = kind;
    if (kind !== HEADING && kind !== LIST_ITEM && kind !== TABLE_CELL && kind !== DEFINED) continue;
    while (i < segments.count && segments.first[i]! < first) i++;
    if (i === segments.count || segments.first[i] !== first) continue;
    const after = first + segments.length[i]!;
    const opens = after === end || (kind === LIST_ITEM && /^[:–—-]$/.test(vocabulary.textOf(stream.fold[after]!)));
    if (!opens) continue;
    const term = segments.term[i]!;
    if (kind === DEFINED) defined.add(term);
    if (kind === HEADING) join(-1 - document, term);
    else join(group, term);
  }
  return {
    siblings: (a, b) => {
      const left = groups.get(a);
      const right = groups.get(b);
      if (left === undefined || right === undefined) return 0;
      let count = 0;
      for (const id of left) if (right.has(id)) count++;
      return count;
    },
    bothDefined: (a, b) => defined.has(a) && defined.has(b),
  };
}
