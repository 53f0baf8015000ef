// Reads Markdown and MDX: the whole document, or what an edit touched.
import type { SourceText } from '../../text/sourceText.js';
import { normalise, textStart } from '../normalise.js';
import type { Prose, ProseBlock, ReadingProblem } from '../prose.js';
import { changeBetween, keepContents, type Change, type Reading } from '../reading.js';
import { readFrontMatter, type FrontMatter } from './frontMatter.js';
import { wrap, type Step } from './wrappers.js';
import { withGlossary } from './glossary.js';
import { rereadRows } from './rows.js';
import { definitionTable, parseStretch, readUnits, shifted, type Stretch, type Unit } from './units.js';

/** A Markdown document read. The fields beside the prose are the reader's own. */
export interface MarkdownReading extends Reading {
  readonly text: string;
  readonly frontMatter: FrontMatter | undefined;
  readonly units: readonly Unit[];
  readonly definitions: ReadonlyMap<string, string>;
}

/** How many unchanged outermost blocks are parsed again on either side of an edit. See {@link rereadMarkdown}. */
const MARGIN = 2;

/** How a text that is part of another document is read. */
export interface MarkdownOptions {
  /** False where the text cannot begin with front matter. */
  readonly frontMatter?: boolean;
  /** False where the glossaries of the document are looked for in it as a whole. */
  readonly glossary?: boolean;
}

/** Reads a whole document. */
export function readMarkdown(source: SourceText, options: MarkdownOptions = {}): MarkdownReading {
  const text = normalise(source.text);
  const bodyStart = textStart(text);
  const frontMatter = options.frontMatter === false ? undefined : readFrontMatter(text, bodyStart);
  const stretch = parseStretch(text, source.format, frontMatter?.end ?? bodyStart, text.length);
  const definitions = definitionTable(stretch.definitions);
  const units = readUnits(stretch, definitions, stretch.outline.length);
  return assemble(source, text, frontMatter, units, definitions, undefined, options.glossary);
}

/**
 * Reads a document again after an edit, with the same result as {@link readMarkdown} gives for the new text.
 *
 * Where an outermost block begins, the block parser's state is always the same, so what follows depends on the text from
 * there alone. Where a block ends is decided by at most two lines behind it. Hence reading may begin two blocks above
 * the edit, and may stop where an outermost block begins on an unchanged line at which one began before, if two more
 * unchanged blocks were in sight of the parser.
 */
export function rereadMarkdown(previous: MarkdownReading, source: SourceText): MarkdownReading {
  const text = normalise(source.text);
  const change = changeBetween(previous.text, text);
  if (!change) return { ...previous, source };
  const shift = change.newEnd - change.oldEnd;
  const bodyStart = textStart(text);
  const frontMatter = readFrontMatter(text, bodyStart);
  const from = frontMatter?.end ?? bodyStart;
  const oldFrom = previous.frontMatter?.end ?? textStart(previous.text);
  const insideFrontMatter = change.oldEnd < oldFrom && from === oldFrom + shift;
  const behindFrontMatter = change.start >= oldFrom && from === oldFrom;
  if (!insideFrontMatter && !behindFrontMatter) return rereadWhole(previous, source);
  if (insideFrontMatter) {
    const units = previous.units.map((unit) => shifted(unit, shift));
    return assemble(source, text, frontMatter, units, previous.definitions, previous.prose.blocks);
  }
  return rereadBody(previous, source, text, from, change) ?? rereadWhole(previous, source);
}

function rereadWhole(previous: MarkdownReading, source: SourceText): MarkdownReading {
  const reading = readMarkdown(source);
  const blocks = keepContents(previous.prose.blocks, reading.prose.blocks);
  return { ...reading, prose: { ...reading.prose, blocks } };
}

/** Undefined where the edit changes the definitions that links elsewhere depend on. */
function rereadBody(
  previous: MarkdownReading,
  source: SourceText,
  text: string,
  bodyStart: number,
  change: Change,
): MarkdownReading | undefined {
  const old = previous.units;
  const shift = change.newEnd - change.oldEnd;
  const touched = lastWhere(old, (unit) => unit.lineStart <= change.start);
  const openEnded = old.findIndex((unit) => unit.openEnded);
  const row =
    openEnded < 0 && old[touched]
      ? rereadRows(old[touched], source.format, previous.text, text, change, previous.definitions)
      : undefined;
  if (row) {
    const units = old.map((unit, i) => (i < touched ? unit : i === touched ? row : shifted(unit, shift)));
    return assemble(source, text, previous.frontMatter, units, previous.definitions, previous.prose.blocks);
  }
  const first = Math.max(0, Math.min(touched - MARGIN, openEnded < 0 ? touched : openEnded));
  const from = first === 0 ? bodyStart : old[first]!.lineStart;
  const behind = lastWhere(old, (unit) => unit.lineStart <= change.oldEnd) + 1;
  for (let ahead = 2 * MARGIN; ; ahead *= 4) {
    const stop = behind + ahead;
    const atEnd = stop >= old.length;
    const stretch = parseStretch(text, source.format, from, atEnd ? text.length : old[stop]!.lineStart + shift);
    const met = atEnd
      ? meet(stretch, old, behind, old.length, shift)
      : meet(stretch, old, behind, stop - MARGIN, shift);
    if (!met && !atEnd) continue;
    const count = met ? met.fresh : stretch.outline.length;
    const kept = met ? met.old : old.length;
    const fresh = readUnits(stretch, previous.definitions, count);
    if (!atEnd && fresh.some((unit) => unit.openEnded)) continue;
    const definitions = definitionTable([
      ...old.slice(0, first).map((unit) => unit.definitions),
      ...stretch.definitions.slice(0, count),
      ...old.slice(kept).map((unit) => unit.definitions),
    ]);
    if (!sameTable(definitions, previous.definitions)) return undefined;
    const units = old.slice(0, first);
    for (const unit of fresh) units.push(unit);
    for (let i = kept; i < old.length; i++) units.push(shifted(old[i]!, shift));
    return assemble(source, text, previous.frontMatter, units, previous.definitions, previous.prose.blocks);
  }
}

/** The first outermost block of the stretch that begins where an old one in `[from, to)` began, behind the edit. */
function meet(
  stretch: Stretch,
  old: readonly Unit[],
  from: number,
  to: number,
  shift: number,
): { fresh: number; old: number } | undefined {
  let i = from;
  for (let fresh = 0; fresh < stretch.outline.length; fresh++) {
    const at = stretch.from + stretch.outline[fresh]!.lineStart - shift;
    while (i < to && old[i]!.lineStart < at) i++;
    if (i >= to) return undefined;
    if (old[i]!.lineStart === at) return { fresh, old: i };
  }
  return undefined;
}

/** The index of the last unit that fits, where those that fit stand before those that do not; 0 where none does. */
function lastWhere(units: readonly Unit[], fits: (unit: Unit) => boolean): number {
  let low = 0;
  let high = units.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >>> 1;
    if (fits(units[middle]!)) low = middle;
    else high = middle - 1;
  }
  return low;
}

function sameTable(a: ReadonlyMap<string, string>, b: ReadonlyMap<string, string>): boolean {
  if (a.size !== b.size) return false;
  for (const [label, target] of a) if (b.get(label) !== target) return false;
  return true;
}

function assemble(
  source: SourceText,
  text: string,
  frontMatter: FrontMatter | undefined,
  units: readonly Unit[],
  definitions: ReadonlyMap<string, string>,
  previous?: readonly ProseBlock[],
  glossary = true,
): MarkdownReading {
  const blocks: ProseBlock[] = frontMatter ? [...frontMatter.blocks] : [];
  const problems: ReadingProblem[] = [];
  const steps: Step[] = [];
  for (const unit of units) {
    for (const step of unit.steps) steps.push({ ...step, at: step.at + blocks.length });
    for (const block of unit.blocks) blocks.push(block);
    for (const problem of unit.problems) problems.push(problem);
  }
  wrap(blocks, steps);
  const marked = glossary ? withGlossary(blocks, text) : blocks;
  const prose: Prose = {
    blocks: previous ? keepContents(previous, marked) : marked,
    problems,
    language: frontMatter?.language,
  };
  return { source, text, frontMatter, units, definitions, prose };
}
