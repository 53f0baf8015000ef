// The prose in the attributes of JSX tags, and what the names of components say about the text in them.
import { ContentBuilder } from '../content.js';
import { TextReader } from '../markup/runningText.js';
import type { BlockKind, ProseBlock } from '../prose.js';
import { markQuotations } from '../quotations.js';
import { Zone, type ZoneSet } from '../zones.js';
import type { JsxTag } from './jsxTag.js';
import { holdsCode } from './wrappers.js';

/**
 * Attributes that readers are shown, by what they are in all components that we know of (common practice, no source). Only
 * values in quotation marks are read: what stands in braces is code.
 */
const PROSE_ATTRIBUTES: Partial<Record<string, BlockKind>> = {
  ...{ alt: 'alternativeText', 'aria-label': 'alternativeText', placeholder: 'alternativeText' },
  ...{ title: 'caption', label: 'caption', caption: 'caption', heading: 'caption', subtitle: 'caption' },
  ...{ description: 'paragraph', summary: 'caption', tooltip: 'caption' },
};
const HAS_BLANK = /\s/;

/** The values of a tag's attributes that are prose, as blocks. */
export function attributeBlocks(text: string, tag: JsxTag): ProseBlock[] {
  const blocks: ProseBlock[] = [];
  if (tag.attributes.length === 0 || holdsCode(tag.name)) return blocks;
  let reader: TextReader | undefined;
  for (const { name, from, to } of tag.attributes) {
    const kind = Object.hasOwn(PROSE_ATTRIBUTES, name) ? PROSE_ATTRIBUTES[name] : undefined;
    if (kind === undefined || from === to || isName(text.slice(from, to))) continue;
    reader ??= new TextReader(text, { xml: false, defined: new Set() });
    const start = reader.visibleFrom(from, to);
    const end = reader.visibleEnd(start, to);
    const out = new ContentBuilder(text, start);
    reader.read(start, end, out, false);
    const content = out.finish({ kind, level: 0, zones: kind === 'alternativeText' ? Zone.alternativeText : 0 }, end);
    if (content) blocks.push({ start, content: markQuotations(content) });
  }
  return blocks;
}

/** True for a file's name, a path, an identifier: one word with signs that words of prose do not have. */
function isName(value: string): boolean {
  return !HAS_BLANK.test(value.trim()) && /[./\\_:$#@]|[a-z][A-Z]|\d/.test(value.trim().replace(/[.!?:]$/, ''));
}

const LABELS = new Set(['Kbd', 'Key', 'Keys', 'Button', 'UI', 'GuiLabel', 'MenuItem']);
const LINKS = new Set(['Link', 'A', 'Anchor', 'NavLink', 'NextLink']);

/** Zones of the text in a component that runs on in its line. */
export function componentZones(name: string): ZoneSet {
  return LABELS.has(name) ? Zone.uiLabel : 0;
}

/** True for components that are links. */
export function isLink(name: string): boolean {
  return LINKS.has(name);
}

/** The target of a link's tag, or undefined where it is no string. */
export function componentTarget(text: string, { attributes }: JsxTag): string | undefined {
  const target = attributes.find((attribute) => attribute.name === 'to' || attribute.name === 'href');
  return target && text.slice(target.from, target.to);
}

/** A string attribute's value as written. */
export function attributeOf(text: string, { attributes }: JsxTag, name: string): string | undefined {
  const found = attributes.find((attribute) => attribute.name === name);
  return found && text.slice(found.from, found.to);
}
