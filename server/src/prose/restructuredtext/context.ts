// What reading a document needs to know everywhere, and what it leaves behind.
import type { BlockRole } from '../content.js';
import type { ProseBlock, ReadingProblem } from '../prose.js';
import type { Lines } from './lines.js';

/** Bodies nested deeper than this are not read. */
export const DEEPEST = 32;

/** Where a body stands: what its paragraphs are, and how deep it is nested. */
export interface Setting extends BlockRole {
  readonly depth: number;
}

/** One document being read. */
export interface DocumentContext {
  /** The normalised source: as long as the source itself. */
  readonly text: string;
  readonly blocks: ProseBlock[];
  readonly problems: ReadingProblem[];
  /** The adornments of titles in order of their first appearance. */
  readonly titleStyles: string[];
  /** Folded name → address, of the targets that are defined with one. */
  readonly targets: ReadonlyMap<string, string>;
  /** Reads the body elements of `[from, to)`, whose margin is column `base`. */
  readBody(lines: Lines, from: number, to: number, base: number, setting: Setting): void;
}

const NO_CHANGE: Partial<BlockRole> = {};

/** The setting one body further in. */
export function inside(setting: Setting, change: Partial<BlockRole> = NO_CHANGE): Setting {
  return {
    kind: change.kind ?? setting.kind,
    level: 0,
    zones: change.zones ?? setting.zones,
    depth: setting.depth + 1,
  };
}
