// Blocks that hold blocks in the common generators: admonitions by indentation or by colons, tabs, footnotes.
import type { BlockContext, Line, MarkdownConfig } from '@lezer/markdown';

/** Contexts deeper than this are not read: each level costs time on every line. */
export const DEEPEST = 24;

const INDENTED = /^(?:(?:!!!|\?\?\?\+?)[ \t]*|===[!+]?[ \t]+)(?=["\w])/;
const INDENTED_TITLE = /^(?:!!!|\?\?\?\+?|===[!+]?)[ \t]*[^"]*"(.*)"[ \t\r]*$/;
const COLONS = /^(:{3,})[ \t]*(?:\{[^}]*\}|[A-Za-z][\w-]*)/;
const COLONS_TITLE = /^:{3,}[ \t]*(?:\{[^}]*\}|[A-Za-z][\w-]*)(?:\[([^\]]*)\]|[ \t]+([^[{\s].*))/;
const COLONS_END = /^:{3,}[ \t\r]*$/;
const FOOTNOTE = /^\[\^[^\]\s]+\]:[ \t]*/;

function tooDeep(cx: BlockContext, line: Line): boolean {
  if (cx.depth <= DEEPEST) return false;
  cx.addElement(cx.elt('TooDeep', cx.lineStart + line.pos, cx.lineStart + line.text.length));
  cx.nextLine();
  return true;
}

function isIndentedOpening(line: Line): boolean {
  return (line.next === 33 || line.next === 63 || line.next === 61) && INDENTED.test(line.text.slice(line.pos));
}

function openIndented(cx: BlockContext, line: Line): boolean | null {
  if (!isIndentedOpening(line)) return false;
  const head = line.text.slice(line.pos);
  if (head.startsWith('===') && !INDENTED_TITLE.test(head)) return false;
  return open(cx, line, 'IndentedContainer', line.indent - line.baseIndent + 4, INDENTED_TITLE.exec(head)?.[1]);
}

function continueIndented(_cx: BlockContext, line: Line, value: number): boolean {
  if (line.next >= 0 && line.indent < line.baseIndent + value) return false;
  line.moveBaseColumn(line.baseIndent + value);
  return true;
}

function openColons(cx: BlockContext, line: Line): boolean | null {
  if (line.next !== 58) return false;
  const head = line.text.slice(line.pos);
  const opening = COLONS.exec(head);
  if (!opening) {
    if (!COLONS_END.test(head)) return false;
    const from = cx.lineStart + line.pos;
    cx.addElement(cx.elt('ContainerEnd', from, from + head.length));
    cx.nextLine();
    return true;
  }
  const title = COLONS_TITLE.exec(head);
  return open(cx, line, 'ColonContainer', opening[1]!.length, title?.[1] ?? title?.[2]);
}

function continueColons(_cx: BlockContext, line: Line, value: number): boolean {
  if (line.next !== 58) return true;
  const closing = /^(:{3,})[ \t\r]*$/.exec(line.text.slice(line.pos));
  return closing === null || closing[1]!.length < value;
}

/** Opens a container whose first line holds nothing but its kind and, maybe, a title. */
function open(cx: BlockContext, line: Line, type: string, value: number, title: string | undefined): true {
  const from = cx.lineStart;
  const head = line.text.slice(line.pos);
  cx.startComposite(type, line.pos, value);
  const end = from + line.text.length;
  if (title !== undefined && title !== '') {
    const shownFrom = from + line.pos + head.lastIndexOf(title);
    const inline = cx.parser.parseInline(title, shownFrom);
    cx.addElement(cx.elt('ContainerHead', from + line.pos, shownFrom));
    cx.addElement(cx.elt('ContainerTitle', shownFrom, shownFrom + title.length, inline));
  } else cx.addElement(cx.elt('ContainerHead', from + line.pos, end));
  cx.nextLine();
  return true;
}

function openFootnote(cx: BlockContext, line: Line): boolean | null {
  if (line.next !== 91) return false;
  const label = FOOTNOTE.exec(line.text.slice(line.pos));
  if (!label) return false;
  const from = cx.lineStart + line.pos;
  cx.startComposite('Footnote', line.pos, 4);
  cx.addElement(cx.elt('FootnoteLabel', from, from + label[0].length));
  line.moveBase(line.pos + label[0].length);
  return null;
}

function endsLeaf(_cx: BlockContext, line: Line): boolean {
  if (line.next === 58) {
    const head = line.text.slice(line.pos);
    return COLONS.test(head) || COLONS_END.test(head);
  }
  if (line.next === 91) return FOOTNOTE.test(line.text.slice(line.pos));
  return isIndentedOpening(line) && (line.next !== 61 || INDENTED_TITLE.test(line.text.slice(line.pos)));
}

/** The extension of the Markdown grammar. */
export const containers: MarkdownConfig = {
  defineNodes: [
    { name: 'IndentedContainer', block: true, composite: continueIndented },
    { name: 'ColonContainer', block: true, composite: continueColons },
    { name: 'Footnote', block: true, composite: continueIndented },
    { name: 'ContainerHead', block: true },
    { name: 'ContainerTitle', block: true },
    { name: 'ContainerEnd', block: true },
    { name: 'FootnoteLabel', block: true },
    { name: 'TooDeep', block: true },
  ],
  parseBlock: [
    { name: 'TooDeep', parse: tooDeep, before: 'LinkReference' },
    { name: 'IndentedContainer', parse: openIndented, before: 'FencedCode', endLeaf: endsLeaf },
    { name: 'ColonContainer', parse: openColons, before: 'FencedCode' },
    { name: 'Footnote', parse: openFootnote, before: 'FencedCode' },
  ],
};
