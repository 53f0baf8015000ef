// What reading a document needs to know everywhere, and what it leaves behind.
import type { BlockRole } from '../content.js';
import type { BlockKind, ProseBlock, ReadingProblem } from '../prose.js';
import type { ZoneSet } from '../zones.js';
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
  titleStyles: readonly string[];
  /** Level of the glossary's title where an outermost element stands in a glossary, else 0. */
  glossaryLevel: number;
  /** The language that the next element was said to be in. */
  nextLanguage: string | undefined;
  /** Source offset up to where the outermost element being read has looked for its end, if far. */
  reach: number;
  /** Folded name → address, of the targets that are defined with one. */
  readonly targets: ReadonlyMap<string, string>;
  /** Reads the body elements of `[from, to)`, whose margin is column `base`. */
  readBody(lines: Lines, from: number, to: number, base: number, setting: Setting): void;
}

/** What a block of this kind is where a body stands. */
export function roleOf(setting: Setting, kind: BlockKind, zones: ZoneSet = 0): BlockRole {
  const { language, glossary } = setting;
  return { kind, level: 0, zones: setting.zones | zones, language, glossary };
}

const NO_CHANGE: Partial<BlockRole> = {};

/** The setting one body further in. */
export function inside(setting: Setting, change: Partial<BlockRole> = NO_CHANGE): Setting {
  return {
    kind: change.kind ?? setting.kind,
    level: 0,
    zones: change.zones ?? setting.zones,
    language: change.language ?? setting.language,
    glossary: change.glossary ?? setting.glossary,
    depth: setting.depth + 1,
  };
}
