// Replacing a finding's term by the preferred one, as edits of the document's source.
import { languagesIn } from './languages.js';
import type { Finding } from '../findings/finding.js';
import { isRefusal, replaceTerm } from '../rewrite/replaceTerm.js';
import { sourceEdits } from '../rewrite/sourceEdits.js';
import type { ProseBlock } from '../prose/prose.js';
import type { TextEdit } from '../text/edits.js';
import type { Format, SourceText } from '../text/sourceText.js';
import type { Snapshot } from './snapshot.js';

/** The edits of a fix, or why there is none, as a sentence for the writer. Not certain: a person should look first. */
export type Fix =
  | { readonly kind: 'edits'; readonly edits: readonly TextEdit[]; readonly certain: boolean }
  | { readonly kind: 'refused'; readonly reason: string };

/** Uses the preferred term in the place of a finding of this very snapshot. */
export function preferredEdits(snapshot: Snapshot, uri: string, finding: Finding): Fix {
  const reading = snapshot.readingOf(uri);
  const block = reading?.prose.blocks[finding.block];
  if (reading === undefined || block === undefined || finding.preferred === undefined)
    return { kind: 'refused', reason: 'There is no preferred term.' };
  const language = languagesIn(reading).blocks[finding.block]!;
  const { terms, closed } = snapshot.checkerAt(uri).termsIn(language);
  const checked = terms.find((term) => term.checked.id === finding.termId)?.checked;
  const replaced = replaceTerm({
    ...{
      text: block.content.text,
      // A zone that the user has opened is prose like any other.
      zones: finding.zones & closed,
      span: finding.proseSpan,
      from: finding.term,
      to: finding.preferred,
    },
    ...(checked?.partOfSpeech && { partOfSpeech: checked.partOfSpeech }),
    inflects: language === 'en',
  });
  if (isRefusal(replaced)) return { kind: 'refused', reason: replaced.refused };
  const edits = sourceEdits(block, replaced.span, replaced.edits, reading.source.text);
  if (isRefusal(edits)) return { kind: 'refused', reason: edits.refused };
  const broken = brokenLayout(reading.source, block, edits);
  if (broken !== undefined) return { kind: 'refused', reason: broken };
  return { kind: 'edits', edits, certain: replaced.certain };
}

/** Signs that may act as markup in a format wherever prose stands. */
const SIGNS: Readonly<Partial<Record<Format, RegExp>>> = {
  html: /[&<>"]/,
  xml: /[&<>"]/,
  mdx: /[<>{}]/,
  notebook: /["\\]/,
  latex: /[\\{}$&#%_^~]/,
  apiDescription: /["'\\:#]/,
};

/** Why edits would break the format: signs that act as markup, columns of a drawn table, the line under a title. */
function brokenLayout(
  { format, text }: SourceText,
  { content: { kind }, start }: ProseBlock,
  edits: readonly TextEdit[],
): string | undefined {
  const signs = SIGNS[format];
  if (signs !== undefined && edits.some(({ newText }) => signs.test(newText))) {
    return 'The preferred term has signs that act as markup here: change it by hand.';
  }
  const grown = edits.reduce((sum, { span, newText }) => sum + newText.length - (span.end - span.start), 0);
  if (format === 'restructuredtext' && kind === 'tableCell' && grown !== 0 && !isInListTable(text, start))
    return 'A word of another length could break the columns of the table: change it by hand.';
  if (kind === 'heading' && !lineUnderFits(format, text, start, grown))
    return 'The line under the title would not fit: change both by hand.';
  return undefined;
}

/** Letters that may be wider than one column, or have no width. */
const OF_OTHER_WIDTH = /[^\0-\u02ff]/;

/**
 * Whether a title that grows by so many letters still fits the line of marks under it, if there is one: no longer than it in
 * reStructuredText, as long give or take one in AsciiDoc.
 */
function lineUnderFits(format: Format, text: string, at: number, grown: number): boolean {
  const title = text.slice(text.lastIndexOf('\n', at - 1) + 1).split('\n', 2);
  const [above, under] = title.map((line) => line.trim());
  if (under === undefined || !/^([^\p{L}\p{N}\s])\1*$/u.test(under)) return true;
  const room = under.length - above!.length - grown;
  if (format === 'asciidoc') return Math.abs(room) < 2;
  if (format !== 'restructuredtext') return true;
  return grown <= 0 || (room >= 0 && !OF_OTHER_WIDTH.test(above!));
}

/** A line that draws a table in reStructuredText: a border, or a row of a grid. */
const DRAWN = /^\s*(?:\||\+[-=+]|=+[\s=]*$)/;

/** Whether a place of reStructuredText stands in a table written as a list, with nothing drawn in between. */
function isInListTable(text: string, at: number): boolean {
  const lineEnd = text.indexOf('\n', at);
  let margin = Number.POSITIVE_INFINITY;
  for (const line of text
    .slice(0, lineEnd < 0 ? undefined : lineEnd)
    .split('\n')
    .reverse()) {
    const indentation = line.search(/\S/);
    if (indentation < 0) continue;
    if (/^\s*\.\. list-table::/.test(line)) return indentation < margin;
    if (indentation === 0 || DRAWN.test(line)) return false;
    margin = Math.min(margin, indentation);
  }
  return false;
}
