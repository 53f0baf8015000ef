// Definition lists as the common generators read them: lines with terms, then paragraphs that begin with a colon.
import type { BlockContext, Element, LeafBlock, LeafBlockParser, Line, MarkdownConfig } from '@lezer/markdown';

const COLON = 58;
const MARKER = /^:[ \t]+(?=\S)/;
const INDENTED_MARKER = /^[ \t>]*:[ \t]+\S/;
/** More or longer lines before a colon are a paragraph that happens to stand there. */
const MOST_TERMS = 6;
const LONGEST_TERM = 160;

function opensDefinition(line: Line): boolean {
  return line.next === COLON && line.indent < line.baseIndent + 4 && MARKER.test(line.text.slice(line.pos));
}

/** Without a look at what stood before, so that reading can begin anywhere: a caption of a table may be taken for a definition. */
function openDefinition(cx: BlockContext, line: Line): boolean | null {
  if (!opensDefinition(line)) return false;
  const [marker] = MARKER.exec(line.text.slice(line.pos))!;
  const from = cx.lineStart + line.pos;
  cx.startComposite('Definition', line.pos, line.indent - line.baseIndent + Math.min(marker.length, 4));
  cx.addElement(cx.elt('DefinitionMark', from, from + 1));
  line.moveBase(line.pos + marker.length);
  return null;
}

function continueDefinition(_cx: BlockContext, line: Line, value: number): boolean {
  if (line.next >= 0 && line.indent < line.baseIndent + value) return false;
  line.moveBaseColumn(line.baseIndent + value);
  return true;
}

/** Watches a paragraph for the colon that makes terms of its lines. */
const termLines: LeafBlockParser = {
  nextLine: (cx, line, leaf) => opensDefinition(line) && takeTerms(cx, leaf),

  /** A single line and a blank one may stand before the colon. */
  finish(cx, leaf) {
    if (leaf.content.length > LONGEST_TERM || leaf.content.includes('\n')) return false;
    const { line } = cx as unknown as { line: Line };
    return line.next < 0 && INDENTED_MARKER.test(cx.peekLine()) && takeTerms(cx, leaf);
  },
};

function takeTerms(cx: BlockContext, leaf: LeafBlock): boolean {
  const lines = leaf.content.split('\n');
  if (lines.length > MOST_TERMS || lines.some((line) => line.length > LONGEST_TERM)) return false;
  const terms: Element[] = [];
  let at = leaf.start;
  for (const line of lines) {
    const from = at + (line.length - line.trimStart().length);
    const term = line.trim();
    terms.push(cx.elt('DefinedTerm', from, from + term.length, cx.parser.parseInline(term, from)));
    at += line.length + 1;
  }
  cx.addLeafElement(leaf, cx.elt('DefinedTerms', leaf.start, leaf.start + leaf.content.length, terms));
  return true;
}

/** The extension of the Markdown grammar. */
export const definitionLists: MarkdownConfig = {
  defineNodes: [
    { name: 'Definition', block: true, composite: continueDefinition },
    { name: 'DefinedTerms', block: true },
    { name: 'DefinedTerm', block: true },
    { name: 'DefinitionMark', block: true },
  ],
  parseBlock: [
    {
      name: 'Definition',
      parse: openDefinition,
      leaf: () => termLines,
      endLeaf: (cx, line) => opensDefinition(line) && cx.parentType().name === 'Definition',
      before: 'SetextHeading',
    },
  ],
};
