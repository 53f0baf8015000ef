// Asciidoctor's view of a document: the words of the HTML that it makes, without what no reader can know or calls prose.
import { convert } from '@asciidoctor/core';
import { parseFragment, type DefaultTreeAdapterTypes } from 'parse5';

/** What counts as a word in both readings. */
export const WORD = /[\p{L}\p{N}]+/gu;

const FILLER = '\u2060';
const KNOWN_CHARACTERS =
  /^(?:empty|blank|zwsp|wj|sp|nbsp|apos|quot|[lr][sd]quo|deg|plus|brvbar|vbar|amp|lt|gt|startsb|endsb|caret|asterisk|tilde|backslash|backtick|two-colons|two-semicolons)$/;

/**
 * The document with everything hidden that is set outside it, so that both readings see the same: branches of conditionals are all
 * open (their directive lines go), included files are not there, attribute references hold no word (an address where one
 * begins a link), and so do macros of extensions and cross references without a text of their own.
 */
export function withoutOutside(source: string): string {
  return source
    .replace(/\r\n?/g, '\n')
    .replace(/^(?:ifn?def|ifeval|endif)::[^\s[]*\[(.*)\][ \t]*\n/gm, (line, content: string) =>
      line.startsWith('ifd') || line.startsWith('ifn') ? (content === '' ? '' : `${content}\n`) : '',
    )
    .replace(/^include::[^\s[]*\[.*\][ \t]*$/gm, '//')
    .replace(/^\[.*\]$/gm, (line) => line.replace(/\{[\w-]+\}/g, 'x'))
    .replace(/\b(?:configprop|javadoc):[^\s[]*\[[^\]\n]*\]/g, FILLER)
    .replace(/<<[^,>\n]+>>|\bxref:[^\s[]*\[\]/g, FILLER)
    .replace(/\{([\w-]+)\}(?=([^\s[\]`'"<>()|]*\[)?)/g, (written, name: string, linked: string | undefined) => {
      if (KNOWN_CHARACTERS.test(name)) return written;
      return linked === undefined ? FILLER : 'https://a.invalid/';
    })
    .replace(/(?<=\b(?:link:|https?:\S*|image::?))https:\/\/a\.invalid\//g, 'x')
    .replace(/(?:https:\/\/a\.invalid\/){2,}/g, 'https://a.invalid/');
}

const ATTRIBUTES = {
  experimental: '',
  showtitle: '',
  'skip-front-matter': '',
  'table-caption': null,
  'figure-caption': null,
  'example-caption': null,
  'appendix-caption': null,
  sectnums: null,
  toc: null,
};

/** The words of the document as Asciidoctor converts it. */
export async function oracleWords(source: string): Promise<string[]> {
  const html = (await convert(withoutOutside(source), { safe: 'secure', attributes: ATTRIBUTES })) as string;
  const out: string[] = [];
  gather(parseFragment(html), out);
  return out.join('').match(WORD) ?? [];
}

const CODE = new Set(['code', 'pre', 'script', 'style', 'img', 'object']);
const INLINE = new Set(['a', 'strong', 'em', 'mark', 'span', 'sub', 'sup', 'kbd', 'b', 'u', 'del', 'i']);
/** Labels that the converter adds, addresses shown for want of a text, authors of quotations, numbers of footnotes. */
const ADDED = /(?:^| )(?:bare|icon|conum|attribution|footnote|hdlist-none)(?: |$)/;

function gather(node: DefaultTreeAdapterTypes.Node, out: string[]): void {
  if ('value' in node) {
    out.push(node.value);
    return;
  }
  if (!('childNodes' in node)) return;
  if ('tagName' in node) {
    const attribute = (name: string): string => node.attrs.find((one) => one.name === name)?.value ?? '';
    const verse = node.tagName === 'pre' && attribute('class') === 'content';
    const address = node.tagName === 'a' && attribute('href').startsWith('mailto:');
    const number = attribute('href').startsWith('#_footnoteref');
    if ((CODE.has(node.tagName) && !verse) || address || number || addedLabel(node.tagName, attribute('class'))) {
      out.push('\uFFFC');
      return;
    }
    if (!INLINE.has(node.tagName)) out.push('\n');
  }
  for (const child of node.childNodes) gather(child, out);
  if ('tagName' in node && !INLINE.has(node.tagName)) out.push('\n');
}

function addedLabel(tag: string, classes: string): boolean {
  if (tag === 'div' && classes === 'footnote') return false;
  return ADDED.test(classes);
}

/** The length of the longest common subsequence (E. W. Myers, "An O(ND) difference algorithm and its variations", 1986). */
export function commonLength(a: readonly string[], b: readonly string[]): number {
  const most = a.length + b.length;
  const furthest = new Int32Array(2 * most + 3);
  const middle = most + 1;
  for (let d = 0; d <= most; d++) {
    for (let k = -d; k <= d; k += 2) {
      const down = k === -d || (k !== d && furthest[middle + k - 1]! < furthest[middle + k + 1]!);
      let x = down ? furthest[middle + k + 1]! : furthest[middle + k - 1]! + 1;
      while (x < a.length && x - k < b.length && a[x] === b[x - k]) x++;
      furthest[middle + k] = x;
      if (x >= a.length && x - k >= b.length) return (most - d) / 2;
    }
  }
  return 0;
}
