// What an element means to the reader of markup: the shape of the tables of elements, one for each vocabulary.
import type { BlockKind, GlossaryPart } from '../prose.js';
import { Zone, type ZoneSet } from '../zones.js';

/** How an element lies in the text around it. */
export const Flow = {
  /** Holds blocks: the text before it ends, and so does the text in it. */
  container: 0,
  /** A block of text, which may hold further blocks. */
  block: 1,
  /** Runs on in the text around it. */
  inline: 2,
  /** Runs on in the text around it and is no prose: one opaque unit. */
  opaque: 3,
  /** No prose, and it leaves no trace in the text around it. */
  hidden: 4,
  /** No prose; the text before it ends. */
  closed: 5,
  /** A block that stands inside a text without ending it, such as a footnote. */
  aside: 6,
  /** A picture: one opaque unit; of what is in it, texts in its place are read. */
  picture: 7,
  /** Data about the document, of which only elements with {@link ElementRole.inMetadata} are read. */
  metadata: 8,
  /** A line break. */
  lineBreak: 9,
} as const;
export type Flow = (typeof Flow)[keyof typeof Flow];

/** The role of one element. */
export interface ElementRole {
  readonly flow: Flow;
  /** What the blocks in it are; left out where they are what they would be outside. */
  readonly kind?: BlockKind;
  /** Zones of the blocks in it, or of an inline element's text. */
  readonly zones: ZoneSet;
  /** A heading's level from 1; 0 where its depth in the document tells. */
  readonly level?: number;
  /** What a title in it is: its own heading, or a caption. */
  readonly titled?: 'heading' | 'caption';
  /** Takes its kind from what it is the title of. */
  readonly isTitle?: true;
  readonly inMetadata?: true;
  /** Its children are shown apart, such as the steps through a menu. */
  readonly parts?: true;
  /** Attributes of which the first present is a link's target. */
  readonly targets?: readonly string[];
  /** What the blocks in it are in a glossary. */
  readonly glossary?: GlossaryPart;
  /** The same, but only where what it lies in is a glossary by its title or its attributes. */
  readonly listed?: GlossaryPart;
  /** The attribute whose value tells whether this is a safety message. */
  readonly safetyBy?: string;
}

/** A vocabulary: its elements, and the attributes that hold prose. */
export interface Vocabulary {
  readonly name: string;
  /** By name, or by `parent>name` where the parent decides. */
  readonly elements: ReadonlyMap<string, ElementRole>;
  /** Names that stand in {@link elements} with a parent. */
  readonly dependent: ReadonlySet<string>;
  /** Attributes with prose, by name or by `element@name`. */
  readonly attributes: ReadonlyMap<string, BlockKind>;
  /** An unknown element in a container: a container too (`read`), or one whose own text is no prose (`skip`). */
  readonly unknown: 'inline' | 'read' | 'skip';
  /** Prefixes of other namespaces whose elements are read as if unknown; all others are hidden. */
  readonly extensions: ReadonlySet<string>;
}

/** One line of a table: a role and the names that have it, separated by blanks. */
export type RoleLine = readonly [ElementRole, string];

/** A vocabulary by its table. */
export function vocabulary(
  name: string,
  lines: readonly RoleLine[],
  attributes: Readonly<Record<string, BlockKind>>,
  unknown: Vocabulary['unknown'],
  extensions: readonly string[] = [],
): Vocabulary {
  const elements = new Map<string, ElementRole>();
  const dependent = new Set<string>();
  for (const [role, names] of lines) {
    for (const key of names.split(/\s+/)) {
      elements.set(key, role);
      const parent = key.indexOf('>');
      if (parent >= 0) dependent.add(key.slice(parent + 1));
    }
  }
  return {
    ...{ name, elements, dependent, unknown },
    attributes: new Map(Object.entries(attributes)),
    extensions: new Set(extensions),
  };
}

export const CONTAINER: ElementRole = { flow: Flow.container, zones: 0 };
/** A part of the document with a heading of its own. */
export const SECTION: ElementRole = { flow: Flow.container, zones: 0, kind: 'paragraph', titled: 'heading' };
/** Something that has a caption. */
export const CAPTIONED: ElementRole = { flow: Flow.container, zones: 0, titled: 'caption' };
export const PARAGRAPH: ElementRole = { flow: Flow.block, zones: 0 };
export const LIST_ITEM: ElementRole = { flow: Flow.block, zones: 0, kind: 'listItem' };
/** A list item that holds blocks alone. */
export const LIST_PART: ElementRole = { flow: Flow.container, zones: 0, kind: 'listItem' };
export const CELL: ElementRole = { flow: Flow.block, zones: Zone.tableCell, kind: 'tableCell' };
/** A second title, which is no heading. */
export const SUBTITLE: ElementRole = { flow: Flow.block, zones: 0, kind: 'caption', inMetadata: true };
export const CAPTION: ElementRole = { flow: Flow.block, zones: 0, kind: 'caption' };
export const TITLE: ElementRole = { flow: Flow.block, zones: 0, isTitle: true, inMetadata: true };
/** A title that is shown in windows and lists, not on the page. */
export const OTHER_TITLE: ElementRole = { flow: Flow.block, zones: Zone.frontMatter, kind: 'title', inMetadata: true };
export const DESCRIPTION: ElementRole = {
  flow: Flow.block,
  zones: Zone.frontMatter,
  kind: 'description',
  inMetadata: true,
};
export const DEFINED_TERM: ElementRole = {
  flow: Flow.block,
  zones: Zone.definedTerm,
  kind: 'definedTerm',
  listed: 'headword',
};
export const DEFINITION: ElementRole = { flow: Flow.block, zones: 0, kind: 'definition', listed: 'definition' };
export const HEADWORD: ElementRole = { ...DEFINED_TERM, glossary: 'headword' };
export const ALSO_CALLED: ElementRole = { ...DEFINED_TERM, glossary: 'alsoCalled' };
/** The name of another entry, to which this one sends the reader. */
export const SEE: ElementRole = { ...DEFINITION, glossary: 'see' };
export const QUOTATION: ElementRole = { flow: Flow.container, zones: Zone.quotation };
export const SAFETY: ElementRole = { flow: Flow.container, zones: Zone.safetyMessage, titled: 'caption' };
export const ASIDE: ElementRole = { flow: Flow.aside, zones: 0, kind: 'paragraph' };
export const ALTERNATIVE: ElementRole = { flow: Flow.aside, zones: Zone.alternativeText, kind: 'alternativeText' };
export const PICTURE: ElementRole = { flow: Flow.picture, zones: 0 };
export const CLOSED: ElementRole = { flow: Flow.closed, zones: 0 };
export const METADATA: ElementRole = { flow: Flow.metadata, zones: 0 };
export const INLINE: ElementRole = { flow: Flow.inline, zones: 0 };
export const UI_LABEL: ElementRole = { flow: Flow.inline, zones: Zone.uiLabel };
export const UI_PATH: ElementRole = { flow: Flow.inline, zones: Zone.uiLabel, parts: true };
export const TERM: ElementRole = { flow: Flow.inline, zones: Zone.definedTerm };
export const QUOTE: ElementRole = { flow: Flow.inline, zones: Zone.quotation };
/** A name whose wording is its owner's: closed as a quotation is. */
export const NAME: ElementRole = { flow: Flow.inline, zones: Zone.quotation };
export const OPAQUE_INLINE: ElementRole = { flow: Flow.opaque, zones: 0 };
export const HIDDEN: ElementRole = { flow: Flow.hidden, zones: 0 };
export const LINE_BREAK: ElementRole = { flow: Flow.lineBreak, zones: 0 };

/** A heading of a fixed level, or by depth where it is 0. */
export function heading(level: number): ElementRole {
  return { flow: Flow.block, zones: Zone.heading, kind: 'heading', level };
}

/** An inline link whose target is the first of these attributes. */
export function link(...targets: string[]): ElementRole {
  return { flow: Flow.inline, zones: 0, targets };
}
