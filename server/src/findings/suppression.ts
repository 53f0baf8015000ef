// Places that a document asks to be left as they are, by a comment in its source that says `evenword: keep`.
import type { Span } from '../base/span.js';
import { LineIndex } from '../text/lineIndex.js';
import type { SourceText } from '../text/sourceText.js';
import { foldText } from './foldWord.js';
import { commentSyntaxOf } from './keepComments.js';
import type { CommentSyntax } from './keepComments.js';

/** What a document keeps, and comments of ours that say nothing we know. */
export interface Kept {
  /** True where the finding at `span` (in the source) is not to be shown. */
  isKept(span: Span, finding: { readonly term: string; readonly surface: string }): boolean;
  readonly problems: readonly KeepProblem[];
}

/** A comment that begins as ours and goes on otherwise. */
export interface KeepProblem {
  readonly span: Span;
  readonly message: string;
}

interface KeptLines {
  readonly first: number;
  readonly last: number;
  /** Folded terms; empty: every term. */
  readonly terms: readonly string[];
}

/** A document without such comments. */
export const NOTHING_KEPT: Kept = { isKept: () => false, problems: [] };

/**
 * Reads the comments `evenword: keep` of a source, written as its format writes comments. Alone on its line, one keeps what
 * follows: the paragraph, in HTML and XML the element, in YAML the node. Beside text it keeps its own line.
 * `keep "API key", "data centre"` keeps these terms only.
 */
export function readKept({ text, format }: SourceText): Kept {
  const syntax = commentSyntaxOf(format);
  if (syntax === undefined || !text.includes('evenword:')) return NOTHING_KEPT;
  const lines = new LineIndex(text);
  const ranges: KeptLines[] = [];
  const problems: KeepProblem[] = [];
  for (const match of text.matchAll(syntax.comment)) {
    const span = { start: match.index, end: match.index + match[0].length };
    const request = (match[1] ?? match[2] ?? '').replaceAll('\\"', '"').trim();
    const keep = /^keep(?:\s+((?:["“][^"”]+["”]\s*(?:,\s*)?)+))?$/.exec(request);
    if (!keep) {
      problems.push({
        span,
        message: `“evenword: ${request}” is not understood: write “evenword: keep”, or “evenword: keep "a term"”.`,
      });
      continue;
    }
    const terms = [...(keep[1] ?? '').matchAll(/["“]([^"”]+)["”]/g)].map((quoted) => foldText(quoted[1]!.trim()));
    ranges.push({ ...linesKept(lines, span, syntax), terms });
  }
  return {
    problems,
    isKept: (span, { term, surface }) => {
      if (ranges.length === 0) return false;
      const { line } = lines.positionAt(span.start);
      const names = [foldText(term), foldText(surface)];
      return ranges.some(
        (range) =>
          range.first <= line &&
          line <= range.last &&
          (range.terms.length === 0 || names.some((name) => range.terms.includes(name))),
      );
    },
  };
}

function linesKept(lines: LineIndex, span: Span, syntax: CommentSyntax): { first: number; last: number } {
  const { reach, isNothing = isBlank } = syntax;
  const from = lines.positionAt(span.start);
  const to = lines.positionAt(span.end);
  const before = lines.lineText(from.line).slice(0, from.character);
  const after = lines.lineText(to.line).slice(to.character);
  const alone = isNothing(before) && isNothing(after);
  return { first: from.line, last: alone ? reach(lines, to.line) : to.line };
}

function isBlank(text: string): boolean {
  return text.trim() === '';
}
