// Blocks of MDX: tags that fill their lines, and paragraphs that tags part as the elements of a page do.
import type { TreeCursor } from '@lezer/common';
import type { BlockRole } from '../content.js';
import { isVoid } from '../markup/frames.js';
import type { BlockKind, ProseBlock } from '../prose.js';
import { Zone, type ZoneSet } from '../zones.js';
import { attributeBlocks, attributeOf } from './jsxProse.js';
import { scanTag, type JsxTag } from './jsxTag.js';
import { Role, ROLE_OF } from './roles.js';
import { effectOf, type Step } from './wrappers.js';

/** Elements that part the text around them, and what the text in them is. */
const PARTS: Partial<Record<string, BlockKind | undefined>> = {
  ...{ td: 'tableCell', th: 'tableCell', li: 'listItem', dt: 'definedTerm', dd: 'definition', summary: 'caption' },
  ...{ caption: 'caption', figcaption: 'caption', legend: 'caption', h1: 'heading', h2: 'heading', h3: 'heading' },
  ...{ h4: 'heading', h5: 'heading', h6: 'heading', p: undefined, div: undefined, tr: undefined, table: undefined },
  ...{ ul: undefined, ol: undefined, dl: undefined, section: undefined, article: undefined, details: undefined },
  ...{ figure: undefined, header: undefined, footer: undefined, hr: undefined, thead: undefined, tbody: undefined },
};
const ZONES: Partial<Record<BlockKind, ZoneSet>> = {
  tableCell: Zone.tableCell,
  definedTerm: Zone.definedTerm,
  heading: Zone.heading,
};

/** Beyond these, the tags of a leaf part nothing: each part costs a look at all tags. */
const MOST_PARTS = 64;

/** A part of a leaf, as one block. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
  readonly role: BlockRole;
}

/** Reads the attributes of tags that fill their lines, and notes which they open and close. */
export function readMdxFlow(
  cx: { readonly text: string; readonly blocks: ProseBlock[]; readonly steps: Step[] },
  cursor: TreeCursor,
  zones: ZoneSet,
): void {
  if (!cursor.firstChild()) return;
  do {
    const tag = ROLE_OF[cursor.type.id] === Role.jsxTag ? scanTag(cx.text, cursor.from) : -1;
    if (typeof tag === 'number') continue;
    for (const { start, content } of attributeBlocks(cx.text, tag)) {
      cx.blocks.push({ start, content: { ...content, zones: content.zones | zones | ownZones(cx.text, tag) } });
    }
    const step = stepOf(cx.text, tag);
    if (step) cx.steps.push({ ...step, at: cx.blocks.length });
  } while (cursor.nextSibling());
  cursor.parent();
}

function stepOf(text: string, tag: JsxTag): Omit<Step, 'at'> | undefined {
  const { name, closes, isEmpty } = tag;
  if (isEmpty || isVoid(name)) return undefined;
  return { name, opens: !closes, effect: closes ? undefined : effect(text, tag) };
}

function effect(text: string, tag: JsxTag): Step['effect'] {
  return effectOf(tag.name, (name) => attributeOf(text, tag, name), true);
}

/** An admonition's title is part of it. */
function ownZones(text: string, tag: JsxTag): ZoneSet {
  return (effect(text, tag)?.zones ?? 0) & Zone.safetyMessage;
}

/** The parts that tags make of the leaf at the cursor: one, unless elements such as cells stand in its lines. */
export function stretches(text: string, cursor: TreeCursor, whole: Stretch): Stretch[] {
  const { from, to, role } = whole;
  if (role.kind === 'heading' || !cursor.firstChild()) return [whole];
  const parts: Stretch[] = [];
  let at = from;
  let current = role;
  do {
    if (ROLE_OF[cursor.type.id] !== Role.jsxTag || cursor.from < at) continue;
    const tag = scanTag(text, cursor.from);
    if (typeof tag === 'number' || !Object.hasOwn(PARTS, tag.name)) continue;
    parts.push({ from: at, to: cursor.from, role: current });
    at = cursor.to;
    current = tag.closes ? role : roleIn(tag.name, role);
  } while (cursor.nextSibling());
  cursor.parent();
  if (parts.length === 0 || parts.length > MOST_PARTS) return [whole];
  parts.push({ from: at, to, role: current });
  return parts.filter((part) => part.from < part.to);
}

function roleIn(name: string, role: BlockRole): BlockRole {
  const kind = PARTS[name];
  if (kind === undefined) return role;
  return { ...role, kind, level: kind === 'heading' ? Number(name[1]) : 0, zones: role.zones | (ZONES[kind] ?? 0) };
}
