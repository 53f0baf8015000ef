// One directive: its argument, its options and its body, each read for what it is.
import { writtenTag } from '../../text/language.js';
import { Zone } from '../zones.js';
import { inside, roleOf, type DocumentContext, type Setting } from './context.js';
import { readRecords } from './csvTable.js';
import { readGlossary } from './definitionList.js';
import { directiveKind, type DirectiveKind } from './directiveKinds.js';
import { moveStart } from './explicit.js';
import { readLeaf, readPhrase } from './leaf.js';
import { indentedBlock, isBlank, paragraphEnd, skipBlank, type Lines } from './lines.js';
import { fieldMarkEnd } from './markers.js';

/** The lines of a directive, the first of which goes on behind the name; the others' margin. */
export interface DirectiveLines {
  readonly lines: Lines;
  readonly line: number;
  readonly to: number;
  readonly margin: number;
}

const UNKNOWN: DirectiveKind = { argument: 'opaque', body: 'prose' };
const SAFETY_TITLE = /^(?:danger|warning|caution|notice)\b/i;
const SAFETY_CLASS = /(?:^|\s)(?:danger|warning|caution|notice)(?:\s|$)/i;
/** A class that says which language an element is in (docutils, "Document Tree", `classes`). */
const LANGUAGE_CLASS = /(?:^|\s)language-([A-Za-z]{2,3}(?:-[A-Za-z0-9]{1,8})*)(?:\s|$)/;

/** Reads the directive `name`, whose matter begins behind offset `after`. */
export function readDirective(
  cx: DocumentContext,
  name: string,
  after: number,
  { lines, line, to, margin }: DirectiveLines,
  setting: Setting,
): void {
  const { text } = cx;
  const known = directiveKind(name);
  const kind = known ?? UNKNOWN;
  moveStart(text, lines, line, after, margin);
  const base = lines.column[line]!;
  const first = lines.isBlank(line) ? line + 1 : line;
  const headEnd = paragraphEnd(lines, first, to);
  let options = first;
  while (options < headEnd && !isOption(text, lines, options, base)) options++;
  const head = { lines, from: first, to: options };
  const title = text.slice(lines.at[first], lines.at[first]! + 9);
  const classes = classesOf(cx, { lines, from: options, to: headEnd });
  let zones = setting.zones;
  if (kind.safety || (name === 'admonition' && (SAFETY_TITLE.test(title) || SAFETY_CLASS.test(classes)))) {
    zones |= Zone.safetyMessage;
  }
  if (name === 'epigraph' || name === 'pull-quote') zones |= Zone.quotation;
  const named = kind.argument === 'classes' ? text.slice(lines.at[first], lines.end[first]) : '';
  const language = LANGUAGE_CLASS.exec(`${classes} ${named}`)?.[1] ?? setting.language;
  const within = { ...setting, zones, language };
  if (kind.argument !== 'none') readArgument(cx, head, kind, within);
  else if (options > first && kind.body === 'prose') {
    // Without options between them, the first lines and the rest are one body.
    const end = options < headEnd ? options : to;
    cx.readBody(lines, first, end, base, inside(within));
    if (end === to) return;
  }
  if (kind.options) readOptions(cx, lines, options, headEnd, kind.options, within);
  const from = skipBlank(lines, kind.body === 'meta' || kind.body === 'glossary' ? options : headEnd, to);
  // Classes without a body are those of the element that follows.
  if (from >= to && kind.argument === 'classes' && name !== 'container' && language !== setting.language)
    cx.nextLanguage = language;
  if (from >= to || (!known && !looksLikeProse(text, lines, from))) return;
  readDirectiveBody(cx, kind, { lines, line: from, to, margin: base }, within);
}

function isOption(text: string, lines: Lines, line: number, base: number): boolean {
  return lines.column[line]! <= base && fieldMarkEnd(text, lines.at[line]!, lines.end[line]!) >= 0;
}

/** What the option `:class:` says. */
function classesOf(cx: DocumentContext, { lines, from, to }: Range): string {
  for (let line = from; line < to; line++) {
    const at = lines.at[line]!;
    if (cx.text.startsWith(':class:', at)) return cx.text.slice(at + 7, lines.end[line]);
  }
  return '';
}

interface Range {
  readonly lines: Lines;
  readonly from: number;
  readonly to: number;
}

function readArgument(cx: DocumentContext, { lines, from, to }: Range, kind: DirectiveKind, setting: Setting): void {
  if (from >= to) return;
  switch (kind.argument) {
    case 'caption':
      readLeaf(cx, lines, from, to, roleOf(setting, 'caption'));
      break;
    case 'title':
    case 'paragraph':
      readLeaf(cx, lines, from, to, roleOf(setting, kind.argument));
      break;
    case 'heading':
      readLeaf(cx, lines, from, to, { ...roleOf(setting, 'heading', Zone.heading), level: 6 });
      break;
    case 'version':
      readBehindVersion(cx, { lines, from, to }, setting);
      break;
    default:
  }
}

/** `versionadded:: 1.2 text` may go on for some lines. */
function readBehindVersion(cx: DocumentContext, { lines, from, to }: Range, setting: Setting): void {
  const { text } = cx;
  const end = lines.end[from]!;
  let at = lines.at[from]!;
  while (at < end && !isBlank(text.charCodeAt(at))) at++;
  while (at < end && isBlank(text.charCodeAt(at))) at++;
  lines.at[from] = at;
  const start = at < end ? from : from + 1;
  if (start < to) readLeaf(cx, lines, start, to, setting);
}

function readOptions(
  cx: DocumentContext,
  lines: Lines,
  from: number,
  to: number,
  wanted: NonNullable<DirectiveKind['options']>,
  setting: Setting,
): void {
  for (let line = from; line < to;) {
    const at = lines.at[line]!;
    const colon = fieldMarkEnd(cx.text, at, lines.end[line]!);
    const next = indentedBlock(lines, line + 1, to, lines.column[line]!).next;
    const name = colon < 0 ? '' : cx.text.slice(at + 1, colon);
    if (Object.hasOwn(wanted, name)) {
      const kind = wanted[name]!;
      moveStart(cx.text, lines, line, colon + 1, lines.column[line]!);
      const role = roleOf(setting, kind, kind === 'alternativeText' ? Zone.alternativeText : 0);
      const start = lines.isBlank(line) ? line + 1 : line;
      if (kind === 'tableCell') readRecords(cx, lines, start, next, setting);
      else if (start < next) readLeaf(cx, lines, start, next, role);
    }
    line = next;
  }
}

function readDirectiveBody(
  cx: DocumentContext,
  kind: DirectiveKind,
  { lines, line, to, margin }: DirectiveLines,
  setting: Setting,
): void {
  switch (kind.body) {
    case 'prose':
      cx.readBody(lines, line, to, margin, inside(setting));
      break;
    case 'caption':
      cx.readBody(lines, line, to, margin, inside(setting, { kind: 'caption' }));
      break;
    case 'cells':
      cx.readBody(
        lines,
        line,
        to,
        margin,
        inside(setting, { kind: 'tableCell', zones: setting.zones | Zone.tableCell }),
      );
      break;
    case 'records':
      readRecords(cx, lines, line, to, setting);
      break;
    case 'glossary':
      readGlossary(cx, lines, skipOptions(cx.text, lines, line, to), to, margin, setting);
      break;
    case 'meta':
      readMeta(cx, lines, line, to, setting);
      break;
    default:
  }
}

function skipOptions(text: string, lines: Lines, from: number, to: number): number {
  let line = from;
  while (line < to && fieldMarkEnd(text, lines.at[line]!, lines.end[line]!) >= 0) line++;
  return line;
}

/** Of the statements about a page, its description is prose. */
function readMeta(cx: DocumentContext, lines: Lines, from: number, to: number, setting: Setting): void {
  for (let line = from; line < to; line++) {
    const at = lines.at[line]!;
    const colon = fieldMarkEnd(cx.text, at, lines.end[line]!);
    if (colon < 0 || !/^description(?: |$)/.test(cx.text.slice(at + 1, colon))) continue;
    let start = colon + 1;
    while (start < lines.end[line]! && isBlank(cx.text.charCodeAt(start))) start++;
    const role = roleOf(setting, 'description', Zone.frontMatter);
    const tag = writtenTag(/\slang=([\w-]+)/.exec(cx.text.slice(at, colon))?.[1] ?? '');
    readPhrase(cx, start, lines.end[line]!, { ...role, language: tag ?? role.language });
  }
}

/** True where the first line of a body that nobody knows has four words or more and begins like a sentence. */
function looksLikeProse(text: string, lines: Lines, line: number): boolean {
  const written = text.slice(lines.at[line], Math.min(lines.end[line]!, lines.at[line]! + 300));
  return (
    /^[*_`“"]{0,3}\p{Lu}/u.test(written) && !/[;{}=]|->/.test(written) && /(?:\p{L}+[,;]? +){3}\p{L}/u.test(written)
  );
}
