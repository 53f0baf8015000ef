// The open elements of a document, and what each means for the text in it.
import type { BlockKind, GlossaryPart } from '../prose.js';
import { Zone, type ZoneSet } from '../zones.js';
import { VOID, ENDS_PARAGRAPH, IMPLIED_ENDS, IN_HEAD } from './htmlElements.js';
import { Flow, type ElementRole } from './roles.js';

/** Whether text is read. */
export const State = {
  read: 0,
  /** Only elements that are read in metadata. */
  metadata: 1,
  /** Only asides: texts in the place of a picture. */
  asides: 2,
  none: 3,
} as const;
export type State = (typeof State)[keyof typeof State];

/** One open element, or the ground that all stand on. */
export interface Frame {
  /** As its end tag gives it. */
  readonly name: string;
  readonly role: ElementRole;
  readonly state: State;
  /** What a block of text in it is. */
  readonly kind: BlockKind;
  readonly level: number;
  readonly blockZones: ZoneSet;
  readonly inlineZones: ZoneSet;
  /** How many parts of the document with headings it lies in. */
  readonly depth: number;
  /** What a title in it is. */
  readonly titled: 'heading' | 'caption';
  /** True where an unknown element in it runs on in its text. */
  readonly takesText: boolean;
  /** The source offset of its start tag. */
  readonly start: number;
  /** Count of what was visible before it. */
  readonly shown: number;
  /** True where a text is made for it if it has none. */
  readonly refers: boolean;
  /** BCP 47 tag of the blocks in it where the source states one; else the document's holds. */
  language: string | undefined;
  /** What the blocks in it are in a glossary. */
  glossary: GlossaryPart | undefined;
  /** True where attributes say that it is a glossary. */
  isGlossary: boolean;
}

/** Zones that a block has from what it lies in, whatever it is. */
const INHERITED: ZoneSet = Zone.quotation | Zone.safetyMessage;

/** The frame on which a document's outermost elements stand. */
export function ground(role: ElementRole, takesText: boolean): Frame {
  const zones = { blockZones: 0, inlineZones: 0 };
  const place = { depth: 0, titled: 'heading', start: 0, shown: 0, refers: false } as const;
  const own = { language: undefined, glossary: undefined, isGlossary: false };
  return { ...own, name: '', role, state: State.read, kind: 'paragraph', level: 0, ...zones, ...place, takesText };
}

/** The frame of an element of which nothing is read. */
export function closedFrame(parent: Frame, name: string, role: ElementRole, start: number): Frame {
  return like(parent, name, role, start, State.none, 0, parent.inlineZones, parent.takesText, false);
}

/**
 * The frame of an element that is read; `zones` are its role's and what its attributes add, `shown` counts what was
 * visible before it; `refers` is true where a text is made for the element if it has none.
 */
export function openFrame(
  parent: Frame,
  name: string,
  role: ElementRole,
  zones: ZoneSet,
  start: number,
  shown: number,
  refers: boolean,
): Frame {
  const { flow } = role;
  if (flow === Flow.inline)
    return like(parent, name, role, start, State.read, shown, parent.inlineZones | zones, true, refers);
  const depth = parent.depth + (role.titled === 'heading' ? 1 : 0);
  let blockZones = (flow === Flow.aside ? parent.blockZones & INHERITED : parent.blockZones) | zones;
  let kind = role.kind ?? parent.kind;
  let level = role.level === 0 ? Math.max(1, depth) : (role.level ?? (role.kind === undefined ? parent.level : 0));
  if (role.isTitle) {
    const isHeading = parent.titled === 'heading';
    kind = isHeading ? 'heading' : 'caption';
    level = isHeading ? Math.max(1, depth) : 0;
    if (isHeading) blockZones |= Zone.heading;
  }
  return {
    name,
    role,
    state: flow === Flow.metadata ? State.metadata : flow === Flow.picture ? State.asides : State.read,
    kind,
    level,
    blockZones,
    inlineZones: flow === Flow.aside ? 0 : parent.inlineZones,
    depth,
    titled: role.titled ?? parent.titled,
    takesText: flow === Flow.block || flow === Flow.aside,
    start,
    shown,
    refers,
    language: parent.language,
    glossary: glossaryPart(parent, role),
    isGlossary: parent.isGlossary,
  };
}

/** What lies in a definition is part of it, but for notes. */
function glossaryPart(parent: Frame, role: ElementRole): GlossaryPart | undefined {
  if (role.glossary !== undefined) return role.glossary;
  if (role.listed !== undefined && parent.isGlossary) return role.listed;
  const goesOn = role.kind === undefined || parent.glossary === 'definition';
  return goesOn && role.flow !== Flow.aside ? parent.glossary : undefined;
}

/** A frame whose blocks are what its parent's are. Fields are named one by one: spreading costs a multiple. */
function like(
  parent: Frame,
  name: string,
  role: ElementRole,
  start: number,
  state: State,
  shown: number,
  inlineZones: ZoneSet,
  takesText: boolean,
  refers: boolean,
): Frame {
  return {
    name,
    role,
    state,
    kind: parent.kind,
    level: parent.level,
    blockZones: parent.blockZones,
    inlineZones,
    depth: parent.depth,
    titled: parent.titled,
    takesText,
    start,
    shown,
    refers,
    language: parent.language,
    glossary: parent.glossary,
    isGlossary: parent.isGlossary,
  };
}

/** True where an element of HTML has neither content nor end tag. */
export function isVoid(name: string): boolean {
  return VOID.has(name);
}

/**
 * How many of the open elements stay open when an element of HTML starts: end tags that may be left out are implied by
 * what follows (HTML Standard, "Optional tags").
 */
export function keptAtStart(frames: readonly Frame[], name: string): number {
  let kept = frames.length;
  if (kept > 1 && frames[kept - 1]!.name === 'head' && !IN_HEAD.has(name)) kept--;
  if (ENDS_PARAGRAPH.has(name)) kept = keptWithoutParagraph(frames, kept);
  const implied = IMPLIED_ENDS[name];
  if (implied === undefined) return kept;
  let result = kept;
  for (let i = kept - 1; i > 0; i--) {
    const open = frames[i]!.name;
    if (implied.within.has(open)) break;
    if (implied.ends.has(open)) result = i;
  }
  return result;
}

function keptWithoutParagraph(frames: readonly Frame[], kept: number): number {
  for (let i = kept - 1; i > 0; i--) {
    const { name, role } = frames[i]!;
    if (name === 'p') return i;
    if (role.flow !== Flow.inline && role.flow !== Flow.opaque) break;
  }
  return kept;
}

/** Parts of tables, over which the end tag of nothing else reaches. */
const TABLE_PARTS = new Set('table thead tbody tfoot tr td th caption body html'.split(' '));

/** How many of the open elements stay open at an end tag; all where it ends none. In HTML, end tags do not reach out of a cell. */
export function keptAtEnd(frames: readonly Frame[], name: string, xml: boolean): number {
  for (let i = frames.length - 1; i > 0; i--) {
    const open = frames[i]!.name;
    if (open === name) return i;
    if (!xml && TABLE_PARTS.has(open) && !TABLE_PARTS.has(name)) break;
  }
  return frames.length;
}
