// Places that a document asks to be left as they are, by a comment in its source: <!-- evenword: keep -->.
import type { Span } from '../base/span.js';
import { LineIndex } from '../text/lineIndex.js';
import type { SourceText } from '../text/sourceText.js';
import { foldText } from './foldWord.js';

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

const COMMENT = /<!--\s*evenword:\s*([^]*?)\s*-->|\{\/\*\s*evenword:\s*([^]*?)\s*\*\/\}/g;

/**
 * Reads the comments `<!-- evenword: keep -->` of a Markdown source (in MDX also as a JSX comment). Alone on its line, one keeps
 * everything from the next line to the next blank line; beside text, its own line. `keep "API key", "data centre"` keeps these terms only.
 */
export function readKept({ text, format }: SourceText): Kept {
  if (format !== 'markdown' || !text.includes('evenword:')) return NOTHING_KEPT;
  const lines = new LineIndex(text);
  const ranges: KeptLines[] = [];
  const problems: KeepProblem[] = [];
  for (const match of text.matchAll(COMMENT)) {
    const span = { start: match.index, end: match.index + match[0].length };
    const request = match[1] ?? match[2] ?? '';
    const keep = /^keep(?:\s+((?:["“][^"”]+["”]\s*,?\s*)+))?$/.exec(request);
    if (!keep) {
      problems.push({
        span,
        message: `“evenword: ${request}” is not understood: write “evenword: keep”, or “evenword: keep "a term"”.`,
      });
      continue;
    }
    const terms = [...(keep[1] ?? '').matchAll(/["“]([^"”]+)["”]/g)].map((quoted) => foldText(quoted[1]!.trim()));
    ranges.push({ ...linesKept(lines, span), terms });
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

function linesKept(lines: LineIndex, span: Span): { first: number; last: number } {
  const from = lines.positionAt(span.start);
  const to = lines.positionAt(span.end);
  const before = lines.lineText(from.line).slice(0, from.character);
  const after = lines.lineText(to.line).slice(to.character);
  if (before.trim() !== '' || after.trim() !== '') return { first: from.line, last: to.line };
  let last = to.line;
  // The blank line that Markdown wants behind an HTML block is no end yet.
  if (last + 1 < lines.lineCount && isBlank(lines.lineText(last + 1))) last++;
  while (last + 1 < lines.lineCount && !isBlank(lines.lineText(last + 1))) last++;
  return { first: from.line, last };
}

function isBlank(line: string): boolean {
  return line.trim() === '';
}
