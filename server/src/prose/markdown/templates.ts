// Inline markup of site generators: template markers, attribute lists, emoji short codes, local addresses. None of it is prose.
import type { InlineContext, MarkdownConfig } from '@lezer/markdown';

/** Units between a marker's ends; longer ones are text. */
const LONGEST = 600;

/** `[opening, closing]` of the markers that stand for something the generator fills in. */
const MARKERS: readonly (readonly [string, string])[] = [
  ['{{', '}}'],
  ['{%', '%}'],
  ['${', '}'],
];

const MARKER_ON_ONE_LINE = /\{\{[^\n]{0,600}?\}\}|\{%[^\n]{0,600}?%\}/g;
const FILLER = '\u00A0';

/**
 * The text with the blanks inside template markers replaced, length kept: a generator fills in `{{ branch }}` before Markdown
 * is read, so such a blank does not end a link's target. Every line is treated by itself.
 */
export function closeMarkers(text: string): string {
  if (!text.includes('{{') && !text.includes('{%')) return text;
  return text.replace(MARKER_ON_ONE_LINE, (marker) => marker.replaceAll(' ', FILLER));
}

const ATTRIBUTES = /\{(?::|\s*[.#][\w-])[^{}\n]*\}/y;
const EMOJI = /:[a-z][a-z0-9_+-]*:(?![\w:])/y;

function parseTemplate(cx: InlineContext, next: number, pos: number): number {
  if (next !== 123 && next !== 36) return -1;
  const at = pos - cx.offset;
  for (const [opening, closing] of MARKERS) {
    if (!cx.text.startsWith(opening, at)) continue;
    const end = indexWithin(cx.text, closing, at + opening.length);
    if (end >= 0) return cx.addElement(cx.elt('Template', pos, end + closing.length + cx.offset));
  }
  ATTRIBUTES.lastIndex = at;
  const attributes = next === 123 ? ATTRIBUTES.exec(cx.text) : null;
  return attributes ? cx.addElement(cx.elt('AttributeList', pos, pos + attributes[0].length)) : -1;
}

function indexWithin(text: string, what: string, from: number): number {
  const window = text.slice(from, from + LONGEST);
  const found = window.indexOf(what);
  return found < 0 ? -1 : from + found;
}

function parseEmoji(cx: InlineContext, next: number, pos: number): number {
  if (next !== 58) return -1;
  EMOJI.lastIndex = pos - cx.offset;
  const emoji = EMOJI.exec(cx.text);
  return emoji ? cx.addElement(cx.elt('Emoji', pos, pos + emoji[0].length)) : -1;
}

const BARE_URL = /https?:\/\/[^\s<>"'`|)\]*]*[^\s<>"'`|)\]*.,;:!?]/y;

/** Addresses that GFM does not link for want of a dot, such as `http://localhost:8080/`, are no prose either. */
function parseBareUrl(cx: InlineContext, next: number, pos: number): number {
  if (next !== 104) return -1;
  BARE_URL.lastIndex = pos - cx.offset;
  const url = BARE_URL.exec(cx.text);
  return url ? cx.addElement(cx.elt('BareUrl', pos, pos + url[0].length)) : -1;
}

/** The extension of the Markdown grammar. */
export const templates: MarkdownConfig = {
  defineNodes: ['Template', 'AttributeList', 'Emoji', 'BareUrl'],
  parseInline: [
    { name: 'Template', parse: parseTemplate, before: 'Escape' },
    { name: 'Emoji', parse: parseEmoji, before: 'Escape' },
    { name: 'BareUrl', parse: parseBareUrl, after: 'Autolink' },
  ],
};
