// The free uses of a long form: in running prose, where it neither explains its short form nor names or labels a thing.
import { endRowOfBlock, firstRowOfBlock, followsOn } from '../../corpus/stream.js';
import type { Corpus } from '../../corpus/corpus.js';
import { FactFlag } from '../../facts/flags.js';
import { Zone } from '../../prose/zones.js';
import { TokenFlag } from '../../tokens/tokens.js';
import { isRunningText } from '../places.js';
import type { Use } from '../places.js';
import { LABELLED_THINGS } from '../wording.js';
import type { Expansion } from './explained.js';

/** How the long form is used beside the short one. */
export interface FreeUse {
  /** Free uses on pages that use the short form. */
  readonly onItsPages: readonly Use[];
  /** Free uses on any page. */
  readonly all: readonly Use[];
  /** The pages that go on with the long form: it comes back, and more than once where they explain the short form. */
  readonly goingOn: ReadonlySet<number>;
}

/** So many words beside a long form, its short form explains it, whatever stands between (FLS, or field-level security). */
const NEAR = 2;

/** How often the long form must come back on a page that explains the short form. */
const RETURNS = 2;

/**
 * Tells the free uses. Not free are explanations, the first use on a page with the short form, what stands right beside the
 * short form, headings, links, cells of tables and labels of list items; names of plugins, pages and the like; and
 * what is set in capitals where most uses are not.
 * @param long uses of the long form in document order
 */
export function freeUses(corpus: Corpus, long: readonly Use[], short: readonly Use[], expansion: Expansion): FreeUse {
  const { stream } = corpus;
  const explained = new Set(expansion.definitions.map((definition) => definition.longRow));
  const shortRows = new Set(short.map((use) => use.row));
  const shortPages = new Set(short.map((use) => stream.documentOf(use.row)));
  // A page is introduced to the concept by the first long form before which no sentence has the short one.
  const introduced = new Map<number, number>();
  for (const use of short) {
    const page = stream.documentOf(use.row);
    if (!introduced.has(page) && isProse(corpus, use)) introduced.set(page, use.row);
  }
  const found: Use[] = [];
  for (const use of long) {
    if (!isProse(corpus, use)) continue;
    const page = stream.documentOf(use.row);
    const isFirst = shortPages.has(page) && use.row < (introduced.get(page) ?? Infinity);
    if (isFirst) introduced.set(page, use.row);
    if (isFirst || explained.has(use.row) || isBeside(corpus, use, shortRows) || isNamed(corpus, use)) continue;
    found.push(use);
  }
  const plain = found.filter((use) => !isCapitalised(corpus, use));
  const all = plain.length * 2 > found.length ? plain : found;
  const onItsPages = all.filter((use) => shortPages.has(stream.documentOf(use.row)));
  const explaining = new Set(expansion.definitions.map((definition) => stream.documentOf(definition.longRow)));
  const returns = new Map<number, number>();
  for (const use of onItsPages) {
    const page = stream.documentOf(use.row);
    returns.set(page, (returns.get(page) ?? 0) + 1);
  }
  const goingOn = new Set(
    [...returns].filter(([page, n]) => n >= (explaining.has(page) ? RETURNS : 1)).map(([p]) => p),
  );
  return { onItsPages, all, goingOn };
}

/** A use in a sentence; a block that begins with the form and a sign, or has nothing else, is labelled with it. */
function isProse({ stream }: Corpus, { row, length }: Use): boolean {
  if (!isRunningText(stream, row) || (stream.zones[row]! & Zone.linkText) !== 0) return false;
  if (row > firstRowOfBlock(stream, row)) return true;
  const end = row + length;
  return end < endRowOfBlock(stream, row) && (stream.flags[end]! & TokenFlag.word) !== 0;
}

function isBeside({ stream }: Corpus, { row, length }: Use, shortRows: ReadonlySet<number>): boolean {
  const first = Math.max(firstRowOfBlock(stream, row), row - 1 - NEAR);
  const end = Math.min(endRowOfBlock(stream, row), row + length + 1 + NEAR);
  for (let at = first; at < end; at++) if (shortRows.has(at)) return true;
  return false;
}

/** The name of a plugin, a page or another labelled thing. */
function isNamed(corpus: Corpus, use: Use): boolean {
  const { stream, vocabulary } = corpus;
  const end = use.row + use.length;
  if (end >= endRowOfBlock(stream, use.row) || !followsOn(stream, end) || !isCapitalised(corpus, use)) return false;
  return LABELLED_THINGS.has(vocabulary.textOf(stream.fold[end]!));
}

/** Every word of content begins with a capital. */
export function isCapitalised({ stream }: Corpus, { row, length }: Use): boolean {
  for (let at = row; at < row + length; at++) {
    const isContent = (stream.flags[at]! & FactFlag.functionWord) === 0;
    if (isContent && stream.spelling[at] === stream.fold[at]) return false;
  }
  return true;
}
