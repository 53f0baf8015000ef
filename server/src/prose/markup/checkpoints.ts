// Places between the blocks of a document at which its reading can begin again, or meet a reading made before.
import type { Frame } from './frames.js';

/** What the reader of markup knows at a start tag before which no text is pending. */
export interface Checkpoint {
  /** The source offset of the tag. */
  readonly at: number;
  /** The elements that are open, outermost first; never changed. */
  readonly frames: readonly Frame[];
  readonly language: string | undefined;
  readonly glossaryLevel: number;
  /** Count of what became visible. */
  readonly shown: number;
  /** How many elements before it are paragraphs. */
  readonly paragraphs: number;
  /** How many blocks stand before it. */
  readonly blocks: number;
}

/** Checkpoints nearer than this to the one before are not kept. */
export const LEAST_DISTANCE = 512;

/** The index of the last checkpoint at or before an offset, or -1. */
export function lastUpTo(checkpoints: readonly Checkpoint[], offset: number): number {
  let low = -1;
  let high = checkpoints.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >>> 1;
    if (checkpoints[middle]!.at <= offset) low = middle;
    else high = middle - 1;
  }
  return low;
}

/** True where what follows reads the same behind both, whatever stood before. */
export function isSameState(a: Checkpoint, b: Checkpoint): boolean {
  return (
    a.language === b.language &&
    a.glossaryLevel === b.glossaryLevel &&
    a.frames.length === b.frames.length &&
    a.frames.every((frame, i) => isSameFrame(frame, b.frames[i]!))
  );
}

/** Where frames start, and what was visible before them, matters for elements alone that no checkpoint lies in. */
function isSameFrame(a: Frame, b: Frame): boolean {
  return (
    a === b ||
    (a.name === b.name &&
      a.role === b.role &&
      a.state === b.state &&
      a.kind === b.kind &&
      a.level === b.level &&
      a.blockZones === b.blockZones &&
      a.inlineZones === b.inlineZones &&
      a.depth === b.depth &&
      a.titled === b.titled &&
      a.takesText === b.takesText &&
      a.language === b.language &&
      a.glossary === b.glossary &&
      a.isGlossary === b.isGlossary)
  );
}
