// Section titles: a line with an adornment under it, or over and under it; and lines that merely divide.
import { Zone } from '../zones.js';
import { glossaryLevelBehind } from '../glossary.js';
import { roleOf, type DocumentContext, type Setting } from './context.js';
import { readLeaf } from './leaf.js';
import { widthOf, type Lines } from './lines.js';
import { isAdornment } from './markers.js';

/** Adornments shorter than this count only where they are as long as the title. */
const SURE = 4;

/** Reads the title on `line` where the next line underlines it; false where that is no underline. */
export function underlinedTitle(cx: DocumentContext, lines: Lines, line: number, setting: Setting): boolean {
  const at = lines.at[line + 1]!;
  const end = lines.end[line + 1]!;
  if (!isAdornment(cx.text, at, end)) return false;
  if (end - at < SURE && widthOf(cx.text, lines.at[line]!, lines.end[line]!) > end - at) return false;
  readTitle(cx, lines, line, cx.text[at]!, setting);
  return true;
}

/**
 * The line behind the title or divider that an adornment on `line` begins, or undefined where the line is text.
 * A line over a title without its like under it is left out, and what follows is read as it stands.
 */
export function overlinedTitle(
  cx: DocumentContext,
  lines: Lines,
  line: number,
  to: number,
  _base: number,
  setting: Setting,
): number | undefined {
  const { text } = cx;
  const at = lines.at[line]!;
  const length = lines.end[line]! - at;
  const short = length < SURE;
  const title = line + 1;
  if (title >= to || lines.isBlank(title)) return short ? undefined : title;
  if (isAdornment(text, lines.at[title]!, lines.end[title]!)) return short ? undefined : title + 1;
  const under = title + 1;
  const matches = under < to && text.slice(lines.at[under], lines.end[under]) === text.slice(at, lines.end[line]);
  if (!matches) return short ? undefined : title;
  if (short && widthOf(text, lines.at[title]!, lines.end[title]!) > length) return undefined;
  readTitle(cx, lines, title, text[at]! + text[at]!, setting);
  return under + 1;
}

/** Levels are given to adornments in the order in which a document first uses them. */
function readTitle(cx: DocumentContext, lines: Lines, line: number, style: string, setting: Setting): void {
  let level = cx.titleStyles.indexOf(style) + 1;
  if (level === 0) {
    cx.titleStyles = [...cx.titleStyles, style];
    level = cx.titleStyles.length;
  }
  const { length } = cx.blocks;
  readLeaf(cx, lines, line, line + 1, { ...roleOf(setting, 'heading', Zone.heading), level });
  if (setting.depth > 0) return;
  const title = cx.blocks[length]?.content.text;
  cx.glossaryLevel = glossaryLevelBehind(title ?? '', level, cx.glossaryLevel);
}
