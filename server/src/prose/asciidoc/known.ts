// What is known while lines are read: of the blocks around, and between one block and the next.
import type { BlockKind, GlossaryPart } from '../prose.js';
import type { ZoneSet } from '../zones.js';
import { NO_ATTRIBUTES, type BlockAttributes } from './attributes.js';

/** What is around the blocks being read: what its paragraphs are, and how many blocks it lies in. */
export interface Surroundings {
  readonly zones: ZoneSet;
  readonly kind: BlockKind;
  readonly language?: string | undefined;
  readonly glossary?: GlossaryPart | undefined;
  readonly depth: number;
}

/** What is known between two blocks. */
export interface KnownInStretch {
  readonly attributes: BlockAttributes;
  /** Kind of the paragraphs of the list item that was read last, while its list goes on. */
  readonly item: BlockKind | undefined;
  /** True where what comes belongs to that item: behind `+`, or behind a term without text. */
  readonly attached: boolean;
  /** True behind a described term until its definition begins. */
  readonly awaitsText: boolean;
  /** Of the list that goes on: the mark behind its terms if these are a glossary's, `?` for a list of questions, else empty. */
  readonly list: string;
  readonly listLanguage: string | undefined;
  /** Level of the section's title that makes lists of terms in it glossaries, or 0. */
  readonly glossaryLevel: number;
}

export const NOTHING_KNOWN: KnownInStretch = {
  attributes: NO_ATTRIBUTES,
  item: undefined,
  attached: false,
  awaitsText: false,
  list: '',
  listLanguage: undefined,
  glossaryLevel: 0,
};

/** True where the same is known. */
export function knownAlike(a: KnownInStretch, b: KnownInStretch): boolean {
  return (
    a.attributes.style === b.attributes.style &&
    a.attributes.written === b.attributes.written &&
    a.item === b.item &&
    a.attached === b.attached &&
    a.awaitsText === b.awaitsText &&
    a.list === b.list &&
    a.listLanguage === b.listLanguage &&
    a.glossaryLevel === b.glossaryLevel
  );
}
