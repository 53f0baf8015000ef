// How each format writes a comment to us, and how far one that stands alone on its line reaches.
import type { LineIndex } from '../text/lineIndex.js';
import type { Format } from '../text/sourceText.js';

/** The comments of one format. */
export interface CommentSyntax {
  /** Finds comments to us; one of its groups holds what is asked. Global. */
  readonly comment: RegExp;
  /** The last line that a comment alone on its lines speaks for, given the last line of the comment. */
  readonly reach: (lines: LineIndex, line: number) => number;
  /** True where what stands beside a comment on its line is no content. */
  readonly isNothing?: (beside: string) => boolean;
}

const MARKUP = /<!--\s*evenword:([^]*?)-->/g;

const SYNTAXES: Readonly<Partial<Record<Format, CommentSyntax>>> = {
  markdown: { comment: MARKUP, reach: toBlankLine },
  mdx: { comment: /\{\/\*\s*evenword:([^]*?)\*\/\}|<!--\s*evenword:([^]*?)-->/g, reach: toBlankLine },
  html: { comment: MARKUP, reach: toElementEnd },
  xml: { comment: MARKUP, reach: toElementEnd },
  restructuredtext: { comment: /^[ \t]*\.\.[ \t]+evenword:(?!:)(.*)$/gm, reach: toBlankLine },
  asciidoc: { comment: /^\/\/(?!\/)[ \t]*evenword:(?!:)(.*)$/gm, reach: toBlankLine },
  latex: { comment: /(?<!\\)%[ \t]*evenword:(.*)$/gm, reach: toBlankLine },
  apiDescription: { comment: /(?<=^|\s)#[ \t]*evenword:(.*)$/gm, reach: toNodeEnd },
  // A line of a cell is a JSON string of its own.
  notebook: { comment: MARKUP, reach: toEmptyString, isNothing: (beside) => /^\s*"?(?:\\n)?"?,?\s*$/.test(beside) },
};

/** How a format writes comments, or undefined where it has none. */
export function commentSyntaxOf(format: Format): CommentSyntax | undefined {
  return SYNTAXES[format];
}

function toBlankLine(lines: LineIndex, line: number): number {
  return untilLine(lines, line, (text) => text.trim() === '');
}

function toEmptyString(lines: LineIndex, line: number): number {
  return untilLine(lines, line, (text) => /^\s*"(?:\\n)?",?\s*$|^\s*\]/.test(text));
}

/** To the line before the first that ends the passage; one such line right behind the comment is no end yet. */
function untilLine(lines: LineIndex, line: number, ends: (text: string) => boolean): number {
  let last = line;
  if (last + 1 < lines.lineCount && ends(lines.lineText(last + 1))) last++;
  while (last + 1 < lines.lineCount && !ends(lines.lineText(last + 1))) last++;
  return last;
}

/** To the end of the element that opens next; where none does, to the next blank line. */
function toElementEnd(lines: LineIndex, line: number): number {
  let name: string | undefined;
  let depth = 0;
  for (let at = line + 1; at < lines.lineCount; at++) {
    for (const [, closing, tag, selfClosing] of lines.lineText(at).matchAll(TAG)) {
      name ??= closing === '' ? tag! : undefined;
      if (name === undefined) return toBlankLine(lines, line);
      if (tag !== name || selfClosing === '/') {
        if (depth === 0) return at;
        continue;
      }
      depth += closing === '' ? 1 : -1;
      if (depth === 0) return at;
    }
  }
  return toBlankLine(lines, line);
}

const TAG = /<(\/?)([A-Za-z][\w:.-]*)(?:[^<>"']|"[^"]*"|'[^']*')*?(\/?)>/g;

/** To the end of the YAML node on the next line: what is indented deeper belongs to it. */
function toNodeEnd(lines: LineIndex, line: number): number {
  const indent = indentOf(lines.lineText(line + 1));
  let last = line + 1;
  while (last + 1 < lines.lineCount) {
    const next = lines.lineText(last + 1);
    if (next.trim() !== '' && indentOf(next) <= indent) break;
    last++;
  }
  return Math.min(last, lines.lineCount - 1);
}

function indentOf(line: string): number {
  return line.length - line.trimStart().length;
}
