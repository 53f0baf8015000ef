// Drift: how mixed a concept's naming is, in bits and in names, and whether folders, pages or sentences mix it.
import { conditionalEntropy, entropy, mutualInformation } from '../engine/usage.js';

/** How mixed a concept's naming is. */
export interface Drift {
  /** Entropy H of the names' uses, in bits (Shannon 1948); 0 where one name is used alone. */
  readonly bits: number;
  /** 2^H: as mixed as this many names in equal use. */
  readonly names: number;
}

/** Which part of a concept's drift lies between folders, between pages of one folder and inside pages. */
export interface WhereDriftLives {
  /** H(name | folder), in bits. */
  readonly givenFolder: number;
  /** H(name | page), in bits. */
  readonly givenPage: number;
  /** I(name; folder), in bits. */
  readonly information: number;
  /**
   * Shares of the drift, adding up to 1, after {@link bias} is taken off; `pages` and `inside` are missing where too few
   * uses fall on a page to part them.
   */
  readonly shares: { readonly folders: number; readonly pages?: number; readonly inside?: number };
  /** The folders, most uses first, with the uses of each name in the order of the concept's names. */
  readonly folders: readonly { readonly folder: string; readonly uses: readonly number[] }[];
}

/** Uses of each name (in one order) in one page. */
export interface PageUses {
  readonly path: string;
  readonly folder: string;
  readonly uses: readonly number[];
}

/** Fewer uses than these say nothing about folders. */
const LEAST_USES = 20;
const LEAST_USES_OF_FOLDER = 5;
/** With fewer uses a page on the average, pages look settled by chance alone. */
const LEAST_USES_A_PAGE = 2;
/** Below this many bits there is no drift to place. */
const LEAST_BITS = 0.1;

/** The drift of a concept from the uses of its names; undefined where none is used. */
export function driftOf(uses: readonly number[]): Drift | undefined {
  if (!uses.some((count) => count > 0)) return undefined;
  const bits = entropy(uses);
  return { bits, names: 2 ** bits };
}

/**
 * The mean drift of several concepts: H(name | concept), in which each concept weighs as much as it is used, and 2 to the
 * power of it (Cover & Thomas, ch. 2). Undefined where nothing is used.
 */
export function meanDrift(concepts: readonly (readonly number[])[]): Drift | undefined {
  let total = 0;
  let sum = 0;
  for (const uses of concepts) {
    const count = uses.reduce((a, b) => a + b, 0);
    if (count === 0) continue;
    total += count;
    sum += count * entropy(uses);
  }
  return total === 0 ? undefined : { bits: sum / total, names: 2 ** (sum / total) };
}

/** Where the drift of a concept lives; undefined where the uses are too few, in one folder, or hardly mixed. */
export function whereDriftLives(pages: readonly PageUses[]): WhereDriftLives | undefined {
  const used = pages.filter(({ uses }) => uses.some((count) => count > 0));
  const folders = foldersOf(used);
  const total = folders.reduce((sum, { uses }) => sum + sumOf(uses), 0);
  if (total < LEAST_USES || folders.filter(({ uses }) => sumOf(uses) >= LEAST_USES_OF_FOLDER).length < 2)
    return undefined;
  const byFolder = folders.map(({ uses }) => uses);
  const byPage = used.map(({ uses }) => uses);
  const names = byFolder[0]!.map((_, name) => byFolder.reduce((sum, uses) => sum + uses[name]!, 0));
  const bits = entropy(names);
  if (bits < LEAST_BITS) return undefined;
  const usedNames = names.filter((count) => count > 0).length;
  const information = mutualInformation(byFolder);
  const between = clip((information - bias(byFolder.length, usedNames, total)) / bits);
  return {
    givenFolder: conditionalEntropy(byFolder),
    givenPage: conditionalEntropy(byPage),
    information,
    shares:
      total < LEAST_USES_A_PAGE * byPage.length
        ? { folders: between }
        : parted(byPage, between, bits, usedNames, total),
    folders,
  };
}

function parted(
  byPage: readonly (readonly number[])[],
  folders: number,
  bits: number,
  names: number,
  total: number,
): WhereDriftLives['shares'] {
  const known = clip((mutualInformation(byPage) - bias(byPage.length, names, total)) / bits);
  const pages = Math.max(0, known - folders);
  return { folders, pages, inside: 1 - folders - pages };
}

/**
 * What I(name; place) amounts to by chance alone: (places − 1)(names − 1) / (2 N ln 2) bits to the first order
 * (Miller 1955, Note on the bias of information estimates).
 */
function bias(places: number, names: number, total: number): number {
  return ((places - 1) * (names - 1)) / (2 * total * Math.LN2);
}

function foldersOf(pages: readonly PageUses[]): { folder: string; uses: number[] }[] {
  const folders = new Map<string, number[]>();
  for (const { folder, uses } of pages) {
    const sum = folders.get(folder) ?? uses.map(() => 0);
    folders.set(folder, sum);
    uses.forEach((count, name) => (sum[name]! += count));
  }
  return [...folders]
    .map(([folder, uses]) => ({ folder, uses }))
    .sort((a, b) => sumOf(b.uses) - sumOf(a.uses) || (a.folder < b.folder ? -1 : 1));
}

function sumOf(uses: readonly number[]): number {
  return uses.reduce((sum, count) => sum + count, 0);
}

function clip(share: number): number {
  return Math.min(1, Math.max(0, share));
}
