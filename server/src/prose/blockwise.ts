// Reading by outermost elements, so that an edit costs what it touches: for formats that are read from top to bottom in steps.
import type { ProseBlock, ReadingProblem } from './prose.js';
import { keepContents, type Change, type Reading } from './reading.js';

/** An outermost element as it was read: it depends on `[start, reach)` of the text and on the reader's state before it alone. */
export interface Unit<State> {
  /** Source offset of its first line. */
  readonly start: number;
  /** Source offset up to where text was looked at; Infinity where the end of the text was. */
  readonly reach: number;
  /** What the reader knew before it. */
  readonly state: State;
  readonly blocks: readonly ProseBlock[];
  readonly problems: readonly ReadingProblem[];
}

/** Reads a stretch of a text from an outermost element on, one after the other. */
export interface UnitWalk<State> {
  /** Steps over blank lines; the source offset of the line at which the next element begins, or undefined behind the last one. */
  next(): number | undefined;
  /** What the reader knows by now; never changed afterwards. */
  readonly state: State;
  /** Reads the element that begins at {@link next}. */
  step(): Unit<State>;
}

/** How a format is read by its outermost elements. */
export interface Blockwise<State> {
  /** Begins at a line's start `from`, ends before the line's start `to` (or at the text's end). */
  walk(from: number, to: number, state: State): UnitWalk<State>;
  sameState(a: State, b: State): boolean;
}

/** A document read by its outermost elements. */
export interface BlockwiseReading<State> extends Reading {
  /** The normalised text. */
  readonly text: string;
  readonly units: readonly Unit<State>[];
  /** What the reader knew in the end. */
  readonly final: State;
}

/** What was read again: units of the whole text, those between `from` and `to` anew. */
export interface Reread<State> {
  readonly units: readonly Unit<State>[];
  readonly final: State;
  /** `[from, oldTo)` of the text before became `[from, newTo)`; all else is as it was. */
  readonly from: number;
  readonly oldTo: number;
  readonly newTo: number;
}

/** Unchanged elements behind an edit that are looked at first; more, where reading does not meet what was read before. */
const AHEAD = 4;

/** Reads all units from `from` to the end of the text. */
export function readUnits<State>(
  format: Blockwise<State>,
  text: string,
  from: number,
  state: State,
): Pick<BlockwiseReading<State>, 'units' | 'final'> {
  const walk = format.walk(from, text.length, state);
  const units: Unit<State>[] = [];
  while (walk.next() !== undefined) units.push(walk.step());
  return { units, final: walk.state };
}

/**
 * Reads again what an edit touched. It begins at the first element whose text, or what was looked at behind it, the edit
 * changed, and ends where an element begins at a line and in a state in which one began before: all behind is the same.
 * `body` is where the first element may begin, before and after the edit; the edit must not lie above. Undefined where there
 * was no element.
 */
export function rereadUnits<State>(
  format: Blockwise<State>,
  previous: Pick<BlockwiseReading<State>, 'units' | 'final'>,
  text: string,
  change: Change,
  body: number,
): Reread<State> | undefined {
  const old = previous.units;
  const shift = change.newEnd - change.oldEnd;
  let first = old.findIndex((unit) => unit.reach > change.start);
  while (first > 0 && old[first]!.start > change.start) first--;
  if (first < 0) return undefined;
  const from = first === 0 ? body : old[first]!.start;
  const behind = firstFrom(old, change.oldEnd);
  const units = old.slice(0, first);
  let { state } = old[first]!;
  let at = from;
  for (let ahead = AHEAD; ; ahead *= 4) {
    const last = behind + ahead >= old.length;
    const to = last ? text.length : old[behind + ahead]!.start + shift;
    const walk = format.walk(at, to, state);
    for (let next = walk.next(); next !== undefined; next = walk.next()) {
      const met = firstFrom(old, next - shift, behind);
      if (old[met]?.start === next - shift && format.sameState(old[met].state, walk.state)) {
        for (let i = met; i < old.length; i++) units.push(shifted(old[i]!, shift));
        return { units, final: previous.final, from, oldTo: old[met].start, newTo: next };
      }
      const unit = walk.step();
      if (unit.reach > to && !last) break;
      units.push(unit);
      state = walk.state;
      at = walk.next() ?? to;
    }
    if (last) {
      return { units, final: state, from, oldTo: Number.POSITIVE_INFINITY, newTo: text.length };
    }
  }
}

/** Blocks and problems of all units; contents that `previous` has too are its objects. */
export function gathered<State>(
  units: readonly Unit<State>[],
  head: readonly ProseBlock[],
  previous: readonly ProseBlock[] | undefined,
): { blocks: readonly ProseBlock[]; problems: readonly ReadingProblem[] } {
  const blocks: ProseBlock[] = [...head];
  const problems: ReadingProblem[] = [];
  for (const unit of units) {
    for (const block of unit.blocks) blocks.push(block);
    for (const problem of unit.problems) problems.push(problem);
  }
  return { blocks: previous ? keepContents(previous, blocks) : blocks, problems };
}

/** The index of the first unit at or behind an offset; the units' number where there is none. */
function firstFrom<State>(units: readonly Unit<State>[], offset: number, from = 0): number {
  let low = from;
  let high = units.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if (units[middle]!.start < offset) low = middle + 1;
    else high = middle;
  }
  return low;
}

function shifted<State>(unit: Unit<State>, by: number): Unit<State> {
  if (by === 0) return unit;
  return {
    start: unit.start + by,
    reach: unit.reach + by,
    state: unit.state,
    blocks: unit.blocks.map(({ start, content }) => ({ start: start + by, content })),
    problems: unit.problems.map(({ span, message }) => ({
      span: { start: span.start + by, end: span.end + by },
      message,
    })),
  };
}
