// The outermost blocks of a Markdown document, of lists the items, each read by itself: what an edit leaves alone is kept.
import type { Tree, TreeCursor } from '@lezer/common';
import type { BlockKind, ProseBlock, ReadingProblem } from '../prose.js';
import type { ZoneSet } from '../zones.js';
import { readBlock, type BlockContext } from './blocks.js';
import { definitionsIn, type Definition } from './definitions.js';
import type { Format } from '../../text/sourceText.js';
import { markdownParser, mdxParser } from './grammar.js';
import { Role, ROLE_OF } from './roles.js';
import { closeMarkers } from './templates.js';
import type { Step } from './wrappers.js';

/** Directives nested deeper are not read: each is parsed anew. */
const DEEPEST_DIRECTIVE = 4;

/** An outermost block, or an item of an outermost list, and the prose in it; blocks and problems count offsets from the document's start. */
export interface Unit {
  /** Where the line begins on which the block begins. At this place the parser knows nothing of what came before. */
  readonly lineStart: number;
  readonly end: number;
  readonly blocks: readonly ProseBlock[];
  readonly problems: readonly ReadingProblem[];
  readonly definitions: readonly Definition[];
  /** Of a table with rows, where the first line behind the head begins. */
  readonly rowsStart: number | undefined;
  /** Tags that other units close or open; `at` counts this unit's blocks. */
  readonly steps: readonly Step[];
  /** True where text behind the unit, however far, could make something else of it. */
  readonly openEnded: boolean;
}

/** A parsed stretch of a text, and where its outermost blocks begin. */
export interface Stretch {
  readonly from: number;
  readonly mdx: boolean;
  readonly text: string;
  readonly tree: Tree;
  /** The outermost blocks, of lists the items, as offsets into `text`: the start of the first line, the end. */
  readonly outline: readonly { readonly lineStart: number; readonly end: number }[];
  /** Of each outermost block. */
  readonly definitions: readonly (readonly Definition[])[];
}

/** Parses `[from, to)` of a text, which begins at the start of a line. */
export function parseStretch(whole: string, format: Format, from: number, to: number): Stretch {
  const text = from === 0 && to === whole.length ? whole : whole.slice(from, to);
  const tree = (format === 'mdx' ? mdxParser : markdownParser).parse(closeMarkers(text));
  const outline: { lineStart: number; end: number }[] = [];
  const definitions: Definition[][] = [];
  const found = definitionsIn(tree, text);
  let next = 0;
  forEachOutermost(tree, ({ from: start, to: end }) => {
    outline.push({ lineStart: text.lastIndexOf('\n', start - 1) + 1, end });
    const own: Definition[] = [];
    while (next < found.length && found[next]!.at < end) own.push(found[next++]!.definition);
    definitions.push(own);
    return true;
  });
  return { from, mdx: format === 'mdx', text, tree, outline, definitions };
}

/**
 * Visits the outermost blocks until `visit` returns false; of a list its items. Where an item begins, what follows does not
 * depend on the items above it: read by itself, it opens a list of the same kind.
 */
function forEachOutermost(tree: Tree, visit: (cursor: TreeCursor) => boolean): void {
  const cursor = tree.cursor();
  if (!cursor.firstChild()) return;
  do {
    if (ROLE_OF[cursor.type.id] !== Role.list) {
      if (!visit(cursor)) return;
      continue;
    }
    cursor.firstChild();
    do if (!visit(cursor)) return;
    while (cursor.nextSibling());
    cursor.parent();
  } while (cursor.nextSibling());
}

/** Reads the first `count` outermost blocks of a stretch. */
export function readUnits(stretch: Stretch, definitions: ReadonlyMap<string, string>, count: number): Unit[] {
  const { from, text, tree, outline } = stretch;
  const units: Unit[] = [];
  if (count === 0) return units;
  const reader = new StretchReader(stretch, definitions, 0);
  forEachOutermost(tree, (cursor) => {
    const i = units.length;
    const { blocks, problems, steps, openEnded } = reader.read(cursor, 0, 'paragraph');
    const unit: Unit = {
      lineStart: outline[i]!.lineStart,
      end: outline[i]!.end,
      blocks,
      problems,
      definitions: stretch.definitions[i]!,
      steps,
      openEnded,
      rowsStart: ROLE_OF[cursor.type.id] === Role.table ? behindHead(text, outline[i]!) : undefined,
    };
    units.push(shifted(unit, from));
    return units.length < count;
  });
  return units;
}

/** Reads outermost blocks of a stretch that lies in `depth` directives. */
class StretchReader {
  constructor(
    private readonly stretch: Stretch,
    private readonly definitions: ReadonlyMap<string, string>,
    private readonly depth: number,
  ) {}

  read(cursor: TreeCursor, zones: ZoneSet, kind: BlockKind): BlockContext {
    const { text, mdx } = this.stretch;
    const cx: BlockContext = {
      text,
      mdx,
      definitions: this.definitions,
      inner: [],
      blocks: [],
      problems: [],
      steps: [],
      openEnded: false,
      nested: this.depth < DEEPEST_DIRECTIVE ? this : undefined,
    };
    readBlock(cx, cursor, zones, kind);
    return cx;
  }

  readNested(cx: BlockContext, from: number, to: number, zones: ZoneSet, kind: BlockKind): void {
    const { text, mdx } = this.stretch;
    const stretch = parseStretch(text, mdx ? 'mdx' : 'markdown', from, to);
    const reader = new StretchReader(stretch, this.definitions, this.depth + 1);
    forEachOutermost(stretch.tree, (cursor) => {
      const nested = reader.read(cursor, zones, kind);
      for (const step of nested.steps) cx.steps.push({ ...step, at: step.at + cx.blocks.length });
      for (const { start, content } of nested.blocks) cx.blocks.push({ start: start + from, content });
      for (const { span, message } of nested.problems)
        cx.problems.push({ span: { start: span.start + from, end: span.end + from }, message });
      return true;
    });
  }
}

/** Where a table's third line begins; undefined where it has two. */
function behindHead(text: string, { lineStart, end }: { lineStart: number; end: number }): number | undefined {
  const at = text.indexOf('\n', text.indexOf('\n', lineStart) + 1) + 1;
  return at > 0 && at < end ? at : undefined;
}

/** The unit `by` units further on; the same contents. */
export function shifted(unit: Unit, by: number): Unit {
  if (by === 0) return unit;
  return {
    lineStart: unit.lineStart + by,
    end: unit.end + by,
    blocks: unit.blocks.map(({ start, content }) => ({ start: start + by, content })),
    definitions: unit.definitions,
    steps: unit.steps,
    openEnded: unit.openEnded,
    rowsStart: unit.rowsStart === undefined ? undefined : unit.rowsStart + by,
    problems: unit.problems.map(({ span, message }) => ({
      span: { start: span.start + by, end: span.end + by },
      message,
    })),
  };
}

/** The first definition of each label counts (CommonMark 0.31.2, "Link reference definitions"). */
export function definitionTable(units: Iterable<readonly Definition[]>): Map<string, string> {
  const table = new Map<string, string>();
  for (const definitions of units) {
    for (const { label, target } of definitions) if (!table.has(label)) table.set(label, target);
  }
  return table;
}
