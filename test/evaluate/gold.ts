// The real decisions that recall is measured on: what the maintainers of public documentation unified, and what they keep apart.
import { existsSync, readFileSync } from 'node:fs';
import { basename, join, resolve } from 'node:path';

/** Where the measuring data lies, seen from the project's root. It is no part of the project. */
export const DATA = resolve(process.cwd(), '../shared/data');

/** What kind of difference a decision removed. */
export const PAIR_KINDS = ['spelling', 'hyphenation', 'abbreviation', 'synonym', 'phrase-verb', 'rename'] as const;
export type PairKind = (typeof PAIR_KINDS)[number];

/** Why a pair is counted apart from the plain ones. */
export const FLAGS = ['low_count', 'residual', 'pos_dependent', 'sense_limited', 'function_phrase'] as const;
export type Flag = (typeof FLAGS)[number];

/** Fewest uses of each form, by the list's own counts, of a pair that recall is measured on. */
export const FEWEST_USES = 5;

/** Two forms that maintainers made one. */
export interface GoldPair {
  readonly a: string;
  readonly b: string;
  readonly countA: number;
  readonly countB: number;
  readonly kind: PairKind;
  /** Empty for a plain pair. */
  readonly flags: readonly Flag[];
}

/** Two terms that the documentation keeps apart. */
export interface GoldNegative {
  readonly a: string;
  readonly b: string;
  /** `glossary` or `curated`. */
  readonly basis: string;
}

/** One documentation set with its decisions. */
export interface GoldSet {
  readonly name: string;
  /** Absolute path of the documents. */
  readonly folder: string;
  readonly format: string;
  /** The commit that the documents are of. */
  readonly commit: string;
  readonly positives: readonly GoldPair[];
  readonly negatives: readonly GoldNegative[];
}

interface WrittenPair extends Partial<Record<Flag, boolean>> {
  readonly a: string;
  readonly b: string;
  readonly count_a: number;
  readonly count_b: number;
  readonly kind: PairKind;
}

interface WrittenSet {
  readonly folder: string;
  readonly format: string;
  readonly commit: string;
  readonly positives: readonly WrittenPair[];
  readonly negatives: readonly GoldNegative[];
}

/** All sets of the list, or undefined where the data is not there. */
export function readGold(file = join(DATA, 'gold-dev.json')): readonly GoldSet[] | undefined {
  if (!existsSync(file)) return undefined;
  const written = JSON.parse(readFileSync(file, 'utf8')) as readonly WrittenSet[];
  return written.map(({ folder, format, commit, positives, negatives }) => ({
    name: basename(folder),
    folder: join(DATA, folder),
    format,
    commit,
    positives: positives.map(readPair),
    negatives,
  }));
}

function readPair(written: WrittenPair): GoldPair {
  const { a, b, kind, count_a: countA, count_b: countB } = written;
  const rare = Math.min(countA, countB) < FEWEST_USES;
  const flags = FLAGS.filter((flag) => written[flag] === true || (flag === 'low_count' && rare));
  return { a, b, kind, countA, countB, flags };
}
