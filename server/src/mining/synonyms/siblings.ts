// Sibling headings, items and cells: texts alike but for one term or verb, as the documents give to two things of one kind.
import type { Corpus } from '../../corpus/corpus.js';
import { BLOCK_KINDS } from '../../prose/prose.js';
import { TAG } from '../../tokens/tokens.js';
import { lemmaOfUnit, PassageReader } from './parallel/passages.js';
import type { Segments } from './segment.js';

const HEADING = BLOCK_KINDS.indexOf('heading');
const TITLE = BLOCK_KINDS.indexOf('title');

/** Longest heading that is looked at, in units. */
const LONGEST = 8;

/** What sibling headings say: how many more there are than chance brings about. */
export interface Siblings {
  /** Two terms with headings of their own that are alike otherwise: “Create a …”, “Delete a …”. */
  ofTerms(a: number, b: number): number;
  /** Two verbs, by their dictionary forms, on one page alone: on different pages either may head the same operation. */
  ofVerbs(one: string, other: string): number;
}

/** The headings of one term or verb, the term left out: on every page, and with the page. */
interface Frames {
  readonly anywhere: Set<string>;
  readonly onPage: Set<string>;
}

/** Reads the headings and titles of all documents. */
export function readSiblings(corpus: Corpus, segments: Segments): Siblings {
  const { stream, vocabulary } = corpus;
  const reader = new PassageReader(corpus, segments);
  const framesOfTerm = new Map<number, Frames>();
  const framesOfVerb = new Map<string, Frames>();
  const put = <K>(into: Map<K, Frames>, key: K, frame: string, page: number): void => {
    let frames = into.get(key);
    if (frames === undefined) into.set(key, (frames = { anywhere: new Set(), onPage: new Set() }));
    frames.anywhere.add(frame);
    frames.onPage.add(`${page} ${frame}`);
  };
  for (let block = 0; block < stream.blockKind.length; block++) {
    const kind = stream.blockKind[block]!;
    if (kind !== HEADING && kind !== TITLE) continue;
    const { units, rows } = reader.read({ first: stream.blockFirst[block]!, end: stream.blockFirst[block + 1]! });
    if (units.length < 2 || units.length > LONGEST) continue;
    const page = stream.documentOf(rows[0]!);
    units.forEach((unit, gap) => {
      const isVerb = unit < 0 && stream.tag[rows[gap]!] === TAG.VERB;
      if (unit < 0 && !isVerb) return;
      const frame = units.map((each, at) => (at === gap ? '_' : each)).join(' ');
      if (isVerb) put(framesOfVerb, vocabulary.textOf(lemmaOfUnit(unit)), frame, page);
      else put(framesOfTerm, unit, frame, page);
    });
  }
  return {
    ofTerms: (a, b) => countShared(framesOfTerm.get(a), framesOfTerm.get(b)),
    ofVerbs: (one, other) => countOnPages(framesOfVerb.get(one), framesOfVerb.get(other)),
  };
}

/** Headings of one page part two things; on different pages one pair may be the very mix that is asked about. */
function countShared(one: Frames | undefined, other: Frames | undefined): number {
  if (one === undefined || other === undefined) return 0;
  return countOnPages(one, other) + Math.max(0, countCommon(one.anywhere, other.anywhere) - 1);
}

function countOnPages(one: Frames | undefined, other: Frames | undefined): number {
  return one === undefined || other === undefined ? 0 : countCommon(one.onPage, other.onPage);
}

function countCommon(one: ReadonlySet<string>, other: ReadonlySet<string>): number {
  let common = 0;
  for (const each of one) if (other.has(each)) common++;
  return common;
}
