// From lines to prose blocks: which lines are which kind of block, in which zones.
import { writtenTag } from '../../text/language.js';
import type { BlockRole } from '../content.js';
import { definitionOrSee, glossaryLevelBehind } from '../glossary.js';
import type { BlockKind, ProseBlock, ReadingProblem } from '../prose.js';
import { Zone, type ZoneSet } from '../zones.js';
import { namedAttribute, NO_ATTRIBUTES, withAttributes, type BlockAttributes } from './attributes.js';
import { readBlockText } from './inline.js';
import {
  attributeEntry,
  delimiter,
  isAttributeLine,
  isBlank,
  isBlockTitle,
  isBreak,
  isComment,
  isEscaped,
  isInclude,
  sectionTitle,
  underlinedLevel,
  type Delimited,
  type Line,
} from './lines.js';
import { NOTHING_KNOWN, type KnownInStretch, type Surroundings } from './known.js';
import { listMark, type ListMark } from './lists.js';
import { alternativeText } from './macros.js';
import { cellsOf } from './tables.js';

/** Blocks within blocks deeper than this are not read: each level costs time on every line. */
export const DEEPEST = 24;

const QUESTIONS = '?';

const CODE_STYLES = new Set(
  (
    'source listing literal pass stem latexmath asciimath comment plantuml ditaa graphviz dot mermaid blockdiag seqdiag ' +
    'actdiag nwdiag packetdiag rackdiag erd nomnoml svgbob vega vegalite wavedrom bytefield tikz d2 bpmn gnuplot msc pikchr'
  ).split(' '),
);
const SAFETY_STYLES = new Set(['WARNING', 'CAUTION', 'DANGER', 'NOTICE']);
const ADMONITION = /(NOTE|TIP|IMPORTANT|WARNING|CAUTION|DANGER|NOTICE):[ \t]+(?=\S)/y;
const MACRO = /([\p{L}\p{N}_-]{1,40})::(\S*?)\[/uy;

/** Reads the blocks of one document. */
export class BlockReader {
  readonly blocks: ProseBlock[] = [];
  readonly problems: ReadingProblem[] = [];
  language: string | undefined;

  constructor(private readonly text: string) {}

  /** Reads the lines `[from, to)`. */
  read(lines: readonly Line[], from: number, to: number, around: Surroundings): void {
    new Stretch(this, this.text, lines, to, around).read(from);
  }

  /** Where the comment, comment block or attribute entry at a line ends; `at` itself where there is none. */
  behindSilent(lines: readonly Line[], at: number, to: number): number {
    const { text } = this;
    const line = lines[at]!;
    const first = text.charCodeAt(line.start);
    if (first === 47) {
      if (delimiter(text, line)?.kind === 'comment') return Math.min(to, closingLine(text, lines, at, to) + 1);
      return isComment(text, line) ? at + 1 : at;
    }
    const entry = first === 58 ? attributeEntry(text, line) : undefined;
    if (!entry) return at;
    if (entry.name === 'lang') {
      this.language ??= writtenTag(text.slice(entry.value, line.end));
    }
    let last = at;
    while (last + 1 < to && endsWithContinuation(text, lines[last]!)) last++;
    return last + 1;
  }

  /** Adds the prose of some lines as one block. */
  add(lines: readonly Line[], role: BlockRole): void {
    for (const block of readBlockText(this.text, lines, role)) this.blocks.push(block);
  }
}

/** A value goes on in the next line where ` \` ends this one (` + \` in one with a hard break). */
function endsWithContinuation(text: string, line: Line): boolean {
  return text.charCodeAt(line.end - 1) === 92 && isBlank(text.charCodeAt(line.end - 2));
}

/** The index of the line that closes the block which line `at` opens; `to` where none does. */
function closingLine(text: string, lines: readonly Line[], at: number, to: number): number {
  const { closing } = delimiter(text, lines[at]!)!;
  for (let i = at + 1; i < to; i++) {
    const { start, end } = lines[i]!;
    if (end - start === closing.length && text.startsWith(closing, start)) return i;
  }
  return to;
}

/** Reads some lines at one depth. */
export class Stretch implements KnownInStretch {
  attributes: BlockAttributes;
  item: BlockKind | undefined;
  attached: boolean;
  awaitsText: boolean;
  list: string;
  listLanguage: string | undefined;
  glossaryLevel: number;

  constructor(
    private readonly reader: BlockReader,
    private readonly text: string,
    private readonly lines: readonly Line[],
    private readonly to: number,
    private readonly around: Surroundings,
    known = NOTHING_KNOWN,
  ) {
    this.attributes = known.attributes;
    this.item = known.item;
    this.attached = known.attached;
    this.awaitsText = known.awaitsText;
    this.list = known.list;
    this.listLanguage = known.listLanguage;
    this.glossaryLevel = known.glossaryLevel;
  }

  /** What is known now. */
  known(): KnownInStretch {
    const { attributes, item, attached, awaitsText, list, listLanguage, glossaryLevel } = this;
    return { attributes, item, attached, awaitsText, list, listLanguage, glossaryLevel };
  }

  read(from: number): void {
    for (let at = from; at < this.to;) at = this.step(at);
  }

  /** Reads what begins at a line; the index of the line behind it. */
  step(at: number): number {
    const { text, lines, to } = this;
    const line = lines[at]!;
    if (line.start === line.end || isInclude(text, line)) return at + 1;
    const silent = this.reader.behindSilent(lines, at, to);
    if (silent > at) return silent;
    if (isAttributeLine(text, line)) return this.attributeLines(at);
    if (isContinuation(text, line)) {
      this.attached = this.item !== undefined;
      this.awaitsText = false;
      return at + 1;
    }
    const opened = delimiter(text, line);
    if (opened) return this.delimited(at, opened.kind);
    if (isBlockTitle(text, line)) {
      // What the lines below say of the block holds for its title too.
      const next = this.attributeLines(at + 1);
      this.reader.add(
        [{ start: line.start + 1, end: line.end }],
        this.role('caption', styleZones(this.attributes.style) & Zone.safetyMessage),
      );
      return next;
    }
    return this.simple(at, line);
  }

  /** Takes in what the attribute lines from `at` on say; the line behind them. */
  private attributeLines(at: number): number {
    const { text, lines, to } = this;
    let end = at;
    for (; end < to && isAttributeLine(text, lines[end]!); end++) {
      const { start, end: lineEnd } = lines[end]!;
      this.attributes = withAttributes(this.attributes, text.slice(start + 1, lineEnd - 1));
    }
    return end;
  }

  private simple(at: number, line: Line): number {
    const { text, lines, to } = this;
    const { style } = this.attributes;
    if (CODE_STYLES.has(style)) return this.done(this.paragraphEnd(at, false));
    const title = sectionTitle(text, line);
    if (title) {
      this.section(title, title.level);
      return this.done(at + 1, false);
    }
    if (this.around.depth === 0 && !this.attached && at + 1 < to) {
      const level = underlinedLevel(text, line, lines[at + 1]!);
      if (level > 0 && !listMark(text, line)) {
        this.section(line, level);
        return this.done(at + 2, false);
      }
    }
    if (isBreak(text, line)) return this.done(at + 1, false);
    if (this.blockMacro(line)) return this.done(at + 1);
    const mark = listMark(text, line);
    if (mark) return this.listItem(at, line, mark);
    // An indented paragraph is code, unless a style says what it is, or it is the first text of a described term.
    if (isBlank(text.charCodeAt(line.start)) && style === '' && !this.awaitsText) {
      return this.done(this.paragraphEnd(at, this.item !== undefined), true);
    }
    return this.paragraph(at, line);
  }

  private paragraph(at: number, line: Line): number {
    const { text } = this;
    const end = this.paragraphEnd(at, this.attached);
    const styled = styleZones(this.attributes.style);
    ADMONITION.lastIndex = line.start;
    const admonition = ADMONITION.exec(text);
    const content = this.contentLines(at, end);
    let zones = styled;
    if (admonition) {
      if (SAFETY_STYLES.has(admonition[1]!)) zones |= Zone.safetyMessage;
      content[0] = { start: line.start + admonition[0].length, end: line.end };
    } else if (text.charCodeAt(line.start) === 62 && /[> \t]/.test(text[line.start + 1] ?? ' ')) {
      zones |= Zone.quotation;
      for (let i = 0; i < content.length; i++) content[i] = withoutQuoteMark(text, content[i]!);
    } else if (text.charCodeAt(line.start) === 34 && content.length > 1) {
      const last = content.at(-1)!;
      if (text.startsWith('-- ', last.start) && text.charCodeAt(content.at(-2)!.end - 1) === 34) {
        zones |= Zone.quotation;
        content.pop();
      }
    }
    this.addSaid(content, this.role(this.innerKind(), zones), this.awaitsText);
    return this.done(end);
  }

  private section(title: Line, level: number): void {
    const { depth, zones } = this.around;
    this.reader.add([title], { ...this.role('heading'), level, zones: zones | Zone.heading });
    if (depth > 0) return;
    const { style } = this.attributes;
    const written = this.text.slice(title.start, title.end);
    this.glossaryLevel = style === 'glossary' ? level : glossaryLevelBehind(written, level, this.glossaryLevel);
  }

  /** Adds a paragraph. The first that is said of a glossary's term may be no more than another term to look at. */
  private addSaid(lines: readonly Line[], role: BlockRole, first: boolean): void {
    const at = this.reader.blocks.length;
    this.reader.add(lines, role);
    const block = this.reader.blocks[at];
    if (first && block) this.reader.blocks[at] = { ...block, content: definitionOrSee(block.content) };
  }

  /** One item's first paragraph; what follows it may belong to it too. */
  private listItem(at: number, line: Line, mark: ListMark): number {
    const hasText = mark.start < line.end;
    const written = mark.term ? this.text.slice(mark.term.end, mark.start).trim() : '';
    if (this.item === undefined || (this.attributes.style !== '' && !this.attached)) this.beginList(written);
    const asked = mark.term !== undefined && this.list === QUESTIONS;
    this.item = asked ? 'paragraph' : mark.term ? 'definition' : 'listItem';
    this.attached = true;
    this.awaitsText = !hasText && mark.term !== undefined;
    if (asked) this.reader.add([mark.term], this.role('paragraph'));
    else if (mark.term) {
      const role = this.role('definedTerm', Zone.definedTerm);
      this.reader.add([mark.term], written === this.list ? { ...role, glossary: 'headword' } : role);
    }
    if (!hasText) {
      this.attributes = NO_ATTRIBUTES;
      return at + 1;
    }
    const end = this.paragraphEnd(at, true);
    const content = this.contentLines(at, end);
    content[0] = { start: mark.start, end: line.end };
    this.addSaid(content, this.role(this.item), written !== '');
    this.attributes = NO_ATTRIBUTES;
    this.attached = false;
    return end;
  }

  /** What the lines above a list say holds for all its items. */
  private beginList(termMark: string): void {
    const { style } = this.attributes;
    const entries = termMark !== '' && (style === 'glossary' || (this.glossaryLevel > 0 && style !== 'qanda'));
    this.list = entries ? termMark : style === 'qanda' ? QUESTIONS : '';
    this.listLanguage = this.ownLanguage();
  }

  /** The language that the lines above a block give it. */
  private ownLanguage(): string | undefined {
    const tag = this.attributes.written === '' ? undefined : namedAttribute(this.attributes.written, 'lang');
    return tag === undefined ? undefined : writtenTag(tag);
  }

  private delimited(at: number, kind: Delimited): number {
    const { text, lines, to } = this;
    const close = closingLine(text, lines, at, to);
    if (close === to) {
      const message = 'Nothing closes the block that this line opens, so it reaches to the end of what it stands in.';
      this.reader.problems.push({ span: lines[at]!, message });
    }
    const { style } = this.attributes;
    if (kind === 'table') this.table(at, close);
    else if (kind !== 'verbatim' && !CODE_STYLES.has(style)) {
      const quoted = kind === 'quote' || style === 'quote' || style === 'verse';
      const zones = styleZones(style) | (quoted ? Zone.quotation : 0);
      this.inner(lines, at + 1, close, { ...this.role(this.innerKind(), zones) });
    }
    return this.done(Math.min(to, close + 1));
  }

  private inner(lines: readonly Line[], from: number, to: number, around: Omit<Surroundings, 'depth'>): void {
    if (from >= to) return;
    const depth = this.around.depth + 1;
    if (depth <= DEEPEST) {
      this.reader.read(lines, from, to, { ...around, depth });
      return;
    }
    const message = `Text nested more than ${DEEPEST} levels deep is not read.`;
    this.reader.problems.push({ span: { start: lines[from]!.start, end: lines[to - 1]!.end }, message });
  }

  private table(at: number, close: number): void {
    const { text, lines } = this;
    const opening = text[lines[at]!.start]!;
    const role = this.role('tableCell', Zone.tableCell);
    for (const cell of cellsOf(text, lines, at + 1, close, opening, this.attributes)) {
      if (cell.style === 'l' || cell.style === 'm') continue;
      if (cell.style === 'a') {
        this.inner(withoutIndent(text, cell.lines), 0, cell.lines.length, role);
        continue;
      }
      for (const paragraph of paragraphs(cell.lines)) {
        this.reader.add(paragraph, role);
      }
    }
  }

  /** `name::target[list]` on a line of its own: of an image the alternative text and the title are read. */
  private blockMacro(line: Line): boolean {
    const { text } = this;
    MACRO.lastIndex = line.start;
    const found = text.charCodeAt(line.end - 1) === 93 && !isEscaped(text, line) ? MACRO.exec(text) : null;
    const from = line.start + (found?.[0].length ?? 0);
    if (!found || from > line.end) return false;
    if (found[1] !== 'image') return true;
    const alternative = alternativeText(text, from, line.end - 1);
    if (alternative) this.reader.add([alternative], this.role('alternativeText', Zone.alternativeText));
    const title = namedAttribute(text.slice(from, line.end - 1), 'title');
    const start = title ? text.indexOf(title, from) : -1;
    if (title && start >= (alternative?.end ?? 0)) {
      this.reader.add([{ start, end: start + title.length }], this.role('caption'));
    }
    return true;
  }

  /** The index behind the last line of a paragraph that begins at `at`. */
  private paragraphEnd(at: number, atListMarks: boolean): number {
    const { text, lines, to } = this;
    let end = at + 1;
    for (; end < to; end++) {
      const line = lines[end]!;
      if (line.start === line.end || isContinuation(text, line) || isInclude(text, line)) break;
      if (isAttributeLine(text, line) || delimiter(text, line)) break;
      if (atListMarks && listMark(text, line)) break;
    }
    return end;
  }

  private contentLines(at: number, end: number): Line[] {
    const content = this.lines.slice(at, end);
    return content.length === 1 ? content : content.filter((line) => !isComment(this.text, line));
  }

  /** Kind of the paragraphs that belong to a list item or to nothing. */
  private innerKind(): BlockKind {
    return (this.attached ? this.item : undefined) ?? this.around.kind;
  }

  private role(kind: BlockKind, zones: ZoneSet = 0): BlockRole {
    const { around } = this;
    const inList = this.attached && this.item !== undefined;
    const said = inList && this.list !== '' && this.list !== QUESTIONS;
    return {
      kind,
      level: 0,
      zones: around.zones | zones,
      language: this.ownLanguage() ?? (inList ? this.listLanguage : undefined) ?? around.language,
      glossary: said ? 'definition' : around.glossary,
    };
  }

  private endList(): void {
    this.item = undefined;
    this.list = '';
    this.listLanguage = undefined;
  }

  /** A block was read: its attributes are used up, and it ended the list unless it belongs to an item. */
  private done(next: number, inList = this.attached): number {
    if (!inList) this.endList();
    this.attributes = NO_ATTRIBUTES;
    this.attached = false;
    this.awaitsText = false;
    return next;
  }
}

function isContinuation(text: string, line: Line): boolean {
  return line.end === line.start + 1 && text.charCodeAt(line.start) === 43;
}

function styleZones(style: string): ZoneSet {
  if (SAFETY_STYLES.has(style)) return Zone.safetyMessage;
  return style === 'quote' || style === 'verse' ? Zone.quotation : 0;
}

function withoutQuoteMark(text: string, line: Line): Line {
  return text.charCodeAt(line.start) === 62 ? { start: line.start + 1, end: line.end } : line;
}

/** A cell's lines, the first of which stands behind the mark of the cell and blanks. */
function withoutIndent(text: string, lines: readonly Line[]): Line[] {
  return lines.map((line, i) => {
    let { start } = line;
    if (i === 0) while (start < line.end && isBlank(text.charCodeAt(start))) start++;
    return { start, end: line.end };
  });
}

function paragraphs(lines: readonly Line[]): Line[][] {
  const found: Line[][] = [[]];
  for (const line of lines) {
    if (line.start < line.end) found.at(-1)!.push(line);
    else if (found.at(-1)!.length > 0) found.push([]);
  }
  return found;
}
