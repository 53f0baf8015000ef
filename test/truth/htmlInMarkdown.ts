// The prose of a piece of HTML as parse5 8 (the HTML Standard's algorithm) sees it, for HTML blocks inside Markdown.
import { defaultTreeAdapter as tree, parseFragment, type DefaultTreeAdapterTypes } from 'parse5';

/** Elements in which text is no prose (HTML Standard): code, what pages hold for machines, navigation, superscripts. */
const CLOSED = new Set(
  'script style template noscript pre code samp tt var svg math canvas audio video object iframe textarea select nav sup'
    .concat(' progress meter output data datalist rp rt listing xmp')
    .split(' '),
);
const MASKED = /[A-Za-z][A-Za-z0-9+.-]*:\/\/[^\s<>"'`|\\^{}]*|www\.[^\s<>"]+|[\w.+-]+@[\w-]+(?:\.[\w-]+)+|&[\w#:.-]+;/g;

/** Marks the units of `html` that are prose: 1 for text, 2 for attributes and other places that this oracle does not judge. */
export function judgeHtml(html: string): Uint8Array {
  const units = new Uint8Array(html.length);
  const visit = (node: DefaultTreeAdapterTypes.Node): void => {
    if (tree.isTextNode(node)) {
      const place = node.sourceCodeLocation;
      if (place) units.fill(1, place.startOffset, place.endOffset);
      return;
    }
    if (tree.isElementNode(node)) {
      const tag = node.sourceCodeLocation?.startTag;
      if (tag) units.fill(2, tag.startOffset, tag.endOffset);
      if (CLOSED.has(node.tagName)) return;
    }
    if ('childNodes' in node) for (const child of node.childNodes) visit(child);
  };
  visit(parseFragment(html, { sourceCodeLocationInfo: true, scriptingEnabled: false }));
  for (const { 0: found, index } of html.matchAll(MASKED)) {
    for (let i = index; i < index + found.length; i++) if (units[i] === 1) units[i] = 0;
  }
  return units;
}
