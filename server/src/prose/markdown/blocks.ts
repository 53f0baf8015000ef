// From syntax tree to prose blocks: which node is which kind of block, in which zones.
import type { TreeCursor } from '@lezer/common';
import { ContentBuilder } from '../content.js';
import type { BlockKind, ProseBlock, ReadingProblem } from '../prose.js';
import { markQuotations } from '../quotations.js';
import { Zone, type ZoneSet } from '../zones.js';
import { DEEPEST } from './containers.js';
import { directiveAt } from './directives.js';
import { readHtmlBlock } from './htmlBlocks.js';
import { readInline, type InlineContext } from './inline.js';
import { labelZones } from './labels.js';
import { readMdxFlow, stretches } from './mdxBlocks.js';
import { LEVEL_OF, Role, ROLE_OF } from './roles.js';
import { templateStep } from './templateTags.js';
import type { Step } from './wrappers.js';

/** Reads `[from, to)` of the text as Markdown of its own into `cx`. */
interface NestedReader {
  readNested(cx: BlockContext, from: number, to: number, zones: ZoneSet, kind: BlockKind): void;
}

/** What reading blocks leaves behind. */
export interface BlockContext extends InlineContext {
  readonly blocks: ProseBlock[];
  readonly problems: ReadingProblem[];
  /** True where the document is MDX. */
  readonly mdx: boolean;
  /** Reads Markdown that lies in a directive; undefined where that is nested too deep already. */
  readonly nested: NestedReader | undefined;
  /** Tags that other blocks close or open. */
  readonly steps: Step[];
  /** Set where text behind the block, however far, could make something else of it. */
  openEnded: boolean;
}

const BROKEN = 'Code or a tag begins here and does not end: nothing is read up to the next blank line.';
const SAFETY = /^(?:danger|warning|caution|notice)$/i;
const CONTAINER_KIND = /[:!?=+\s]*(?:\{\s*\.?(?:callout-)?)?([A-Za-z]+)/y;
const ALERT = /\[!([A-Za-z]+)\][+-]?[ \t]*/y;
const LABELLED = /\*\*(note|tip|hint|info|important|warning|caution|danger|notice)\b/iy;

/** Reads the block at the cursor, which comes back to it. */
export function readBlock(cx: BlockContext, cursor: TreeCursor, zones: ZoneSet, kind: BlockKind = 'paragraph'): void {
  switch (ROLE_OF[cursor.type.id]) {
    case Role.container:
    case Role.list:
    case Role.table:
      readChildren(cx, cursor, zones, kind);
      break;
    case Role.listItem:
      readChildren(cx, cursor, zones, 'listItem');
      break;
    case Role.blockquote:
      readBlockquote(cx, cursor, zones, kind);
      break;
    case Role.admonition:
      readChildren(cx, cursor, zones | admonitionZones(cx.text, cursor.from), kind);
      break;
    case Role.paragraph:
      readLeaf(cx, cursor, zones, kind, cursor.from);
      break;
    case Role.heading:
      readLeaf(cx, cursor, zones | Zone.heading, 'heading', cursor.from);
      break;
    case Role.title:
      readLeaf(cx, cursor, zones, 'caption', cursor.from);
      break;
    case Role.tableCell:
      readLeaf(cx, cursor, zones | Zone.tableCell, 'tableCell', cursor.from);
      break;
    case Role.definedTerm:
      readLeaf(cx, cursor, zones | Zone.definedTerm, 'definedTerm', cursor.from);
      break;
    case Role.definitionBody:
      readChildren(cx, cursor, zones, 'definition');
      break;
    case Role.htmlBlock:
      readHtmlBlock(cx, cursor, zones, kind);
      break;
    case Role.mdxFlow:
      readMdxFlow(cx, cursor, zones);
      break;
    case Role.brokenMdx:
      cx.openEnded = true;
      cx.problems.push({ span: { start: cursor.from, end: cursor.to }, message: BROKEN });
      break;
    case Role.fence:
      readDirective(cx, cursor.from, cursor.to, zones, kind);
      break;
    case Role.templateTag:
      readTemplateTag(cx, cx.text.slice(cursor.from, cursor.to));
      break;
    case Role.unended:
      cx.openEnded = true;
      break;
    case Role.tooDeep:
      reportTooDeep(cx.problems, cursor.from, cursor.to);
      break;
    default:
  }
}

/** A fenced block is code, unless it is a directive that holds Markdown. */
function readDirective(cx: BlockContext, from: number, to: number, zones: ZoneSet, kind: BlockKind): void {
  const { nested } = cx;
  const directive = nested && directiveAt(cx.text, from, to);
  if (!directive) return;
  const inner = zones | directive.zones;
  nested.readNested(cx, directive.titleFrom, directive.titleTo, inner, 'caption');
  nested.readNested(cx, directive.bodyFrom, directive.bodyTo, inner, kind);
}

function readTemplateTag(cx: BlockContext, marker: string): void {
  const step = templateStep(marker);
  if (step) cx.steps.push({ ...step, at: cx.blocks.length });
}

/** One problem for all lines of an outermost block that are too deep. */
function reportTooDeep(problems: ReadingProblem[], start: number, end: number): void {
  const first = problems.pop()?.span.start ?? start;
  const message = `Text nested more than ${DEEPEST} levels deep is not read.`;
  problems.push({ span: { start: first, end }, message });
}

function readChildren(cx: BlockContext, cursor: TreeCursor, zones: ZoneSet, kind: BlockKind): void {
  if (!cursor.firstChild()) return;
  do readBlock(cx, cursor, zones, kind);
  while (cursor.nextSibling());
  cursor.parent();
}

/** A blockquote quotes somebody, unless it opens as an alert (`> [!NOTE]`) or with a label in bold (`> **Note**`). */
function readBlockquote(cx: BlockContext, cursor: TreeCursor, zones: ZoneSet, kind: BlockKind): void {
  if (!cursor.firstChild()) return;
  let inner = zones | Zone.quotation;
  let first = true;
  do {
    const role = ROLE_OF[cursor.type.id];
    if (role === Role.none) continue;
    let from = cursor.from;
    if (first && role === Role.paragraph) {
      const alert = matchAt(ALERT, cx.text, from);
      const label = alert ?? matchAt(LABELLED, cx.text, from);
      if (label) inner = zones | (SAFETY.test(label[1]!) ? Zone.safetyMessage : 0);
      if (alert) {
        from += alert[0].length;
        // Behind the mark stands a title, where the generator has such.
        const lineEnd = Math.min(cursor.to, endOfLine(cx.text, from));
        if (cx.text.slice(from, lineEnd).trim() !== '') readLeaf(cx, cursor, inner, 'caption', from, lineEnd);
        from = lineEnd;
      }
    }
    first = false;
    if (role === Role.paragraph) readLeaf(cx, cursor, inner, kind, from);
    else readBlock(cx, cursor, inner, kind);
  } while (cursor.nextSibling());
  cursor.parent();
}

function admonitionZones(text: string, from: number): ZoneSet {
  const kind = matchAt(CONTAINER_KIND, text, from)?.[1];
  return kind !== undefined && SAFETY.test(kind) ? Zone.safetyMessage : 0;
}

function matchAt(pattern: RegExp, text: string, at: number): RegExpExecArray | null {
  pattern.lastIndex = at;
  return pattern.exec(text);
}

function endOfLine(text: string, from: number): number {
  const end = text.indexOf('\n', from);
  return end < 0 ? text.length : end;
}

function readLeaf(
  cx: BlockContext,
  cursor: TreeCursor,
  outer: ZoneSet,
  kind: BlockKind,
  from: number,
  to = cursor.to,
): void {
  const isText = kind === 'paragraph' || kind === 'listItem' || kind === 'definition';
  const zones = isText ? outer | labelZones(cx.text, from, to) : outer;
  const whole = { from, to, role: { kind, level: LEVEL_OF[cursor.type.id]!, zones } };
  const parts = cx.mdx ? stretches(cx.text, cursor, whole) : [whole];
  for (const { from: start, to: end, role } of parts) {
    const builder = new ContentBuilder(cx.text, start);
    readInline(cx, cursor, builder, start, end);
    const content = builder.finish(role, end);
    if (content) cx.blocks.push({ start, content: markQuotations(content) });
    for (const block of cx.inner) {
      const inherited = block.content.zones | (zones & (Zone.quotation | Zone.safetyMessage));
      cx.blocks.push({ start: block.start, content: { ...block.content, zones: inherited } });
    }
    cx.inner.length = 0;
  }
}
