// What speaks against two terms being one concept: the lexicon's vetoes and the documents' own.
import type { Corpus } from '../../corpus/corpus.js';
import { mustStayApart } from '../../lexicon/opposites.js';
import { clippedSide } from '../../lexicon/clippings.js';
import { BLOCK_KINDS } from '../../prose/prose.js';
import type { Segments } from './segment.js';
import type { Term } from './terms.js';

/** The documents' own statements that terms are separate things. */
export interface Separations {
  /** In how many lists and tables each of two terms has an item or cell of its own beside the other's. */
  siblings(a: number, b: number): number;
  /** Whether both are headwords of the documents' glossaries, or one document has a heading for each. */
  areSeparate(a: number, b: number): boolean;
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
  // Clippings, abbreviations and ways of writing are other engines' to ask about.
  if (clippedSide(left, right) !== undefined || isAbbreviated(a.words, b.words)) return true;
  if (a.words.length === b.words.length && a.words.every((word, at) => isOneStem(word, b.words[at]!))) return true;
  return mustStayApart(left, right) !== undefined;
}

function isCodeLike(text: string): boolean {
  return /[\d_.]/.test(text);
}

/** True where what differs is one short word on one side whose letters stand, in order, in the words of the other. */
export function isAbbreviated(a: readonly string[], b: readonly string[]): boolean {
  const left = a.filter((word) => !b.includes(word));
  const right = b.filter((word) => !a.includes(word));
  return shortens(left, right) || shortens(right, left);
}

const LONGEST_ABBREVIATION = 6;

function shortens(short: readonly string[], long: readonly string[]): boolean {
  const letters = short.length === 1 ? short[0]!.replace(/s$/, '') : '';
  const text = long.join('').replaceAll('-', '');
  if (letters.length < 2 || letters.length > LONGEST_ABBREVIATION || text.length < letters.length + 3) return false;
  if (letters[0] !== text[0]) return false;
  let at = 0;
  for (const letter of letters) {
    at = text.indexOf(letter, at) + 1;
    if (at === 0) return false;
  }
  return true;
}

/** The same word, or one of them its gerund (load, loading; map, mapping). */
function isOneStem(a: string, b: string): boolean {
  const [short, long] = a.length <= b.length ? [a, b] : [b, a];
  if (short === long) return true;
  if (!long.endsWith('ing')) return false;
  const stem = long.slice(0, -3);
  return stem === short || `${stem}e` === short || (stem.at(-1) === stem.at(-2) && stem.slice(0, -1) === short);
}

/** Reads what the documents list apart: headings, list items, cells and glossary entries that consist of one term. */
export function readSeparations(corpus: Corpus, segments: Segments): Separations {
  const { stream, vocabulary } = corpus;
  const groups = new Map<number, Set<number>>();
  const headed = new Map<number, Set<number>>();
  const defined = new Set<number>();
  let group = 0;
  let document = -1;
  let previous = -1;
  let i = 0;
  const blocks = stream.blockKind.length;
  const join = (into: Map<number, Set<number>>, id: number, term: number): void => {
    const found = into.get(term);
    if (found === undefined) into.set(term, new Set([id]));
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
    // All headings of a document are one group; lists and tables are runs of their blocks.
    join(kind === HEADING ? headed : groups, kind === HEADING ? document : group, term);
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
    areSeparate: (a, b) => {
      if (defined.has(a) && defined.has(b)) return true;
      const other = headed.get(b);
      return other !== undefined && [...(headed.get(a) ?? [])].some((document) => other.has(document));
    },
  };
}
