// Inline content of one block: what is text, what stands opaque in it, what vanishes.
import { decodeReference } from '../characterReferences.js';
import { ContentBuilder, type BlockRole } from '../content.js';
import type { ProseBlock } from '../prose.js';
import { markQuotations } from '../quotations.js';
import { Zone, type ZoneSet } from '../zones.js';
import { firstPositional } from './attributes.js';
import type { Line } from './lines.js';
import { macroAt } from './macros.js';
import { findMarks, isWord, Mark, type Marks } from './marks.js';
import { Passage } from './passage.js';
import { attributeReference } from './references.js';

/** Zones of a block that the blocks inside it lie in too. */
const INHERITED = Zone.quotation | Zone.safetyMessage;

/**
 * Reads the lines of one block. Gives the block, if it holds a word, and behind it the blocks that lie in it: footnotes and
 * images' alternative texts.
 */
export function readBlockText(source: string, lines: readonly Line[], role: BlockRole): ProseBlock[] {
  if (lines.length === 0) return [];
  const passage = new Passage(source, lines);
  const reader = new InlineReader(passage, role.zones & INHERITED);
  const block = reader.block(0, passage.text.length, role);
  return block ? [block, ...reader.inner] : reader.inner;
}

const SPECIAL = new Uint8Array(128);
for (const mark of '\n\\{:<([&@+"') SPECIAL[mark.charCodeAt(0)] = 1;

const CHARACTER_REFERENCE = /&(?:#\d{1,7}|#[xX][\da-fA-F]{1,6}|[a-zA-Z][a-zA-Z\d]{1,31});/y;
const ANCHOR = /\[\[\[?[\p{L}_:][^\]\n]{0,300}\]\]\]?/uy;
const MENU_PATH = /"[\p{L}\p{N}&][^"\n]{0,100}?[ \n]+>[ \n]+[^"\n]{1,100}"/uy;
const SYMBOLS: readonly (readonly [string, string])[] = [
  ['(C)', '©'],
  ['(R)', '®'],
  ['(TM)', '™'],
];
const ADDRESS_BEFORE = /[\p{L}\p{N}._%+-]{1,64}$/u;
const ADDRESS_BEHIND = /@[\p{L}\p{N}][\p{L}\p{N}_-]{0,62}(?:\.[\p{L}\p{N}_-]{1,63}){1,8}/uy;
function isWhite(unit: number): boolean {
  return unit === 32 || unit === 10 || unit === 9;
}

const ESCAPABLE = /[*_`#^~{<[(&+|'":\\]|https?:|[a-z]{2,20}:/y;

/** One pass from left to right over a passage; `run` is where text begins that was not given to the builder yet. */
export class InlineReader {
  readonly inner: ProseBlock[] = [];
  readonly text: string;
  private readonly marks: Marks | undefined;
  private out!: ContentBuilder;
  private run = 0;

  constructor(
    readonly passage: Passage,
    private readonly inherited: ZoneSet,
  ) {
    this.text = passage.text;
    this.marks = findMarks(this.text);
  }

  /** Reads `[from, to)` as a block of its own. */
  block(from: number, to: number, role: BlockRole): ProseBlock | undefined {
    const outer = this.out;
    const start = this.passage.sourceOf(from);
    this.out = new ContentBuilder(this.passage.source, start);
    this.read(from, to);
    const content = this.out.finish(role, this.passage.sourceEndOf(to));
    this.out = outer;
    return content && { start, content: markQuotations(content) };
  }

  /** A block that lies in the one being read. */
  innerBlock(from: number, to: number, kind: 'paragraph' | 'alternativeText'): void {
    const own = kind === 'alternativeText' ? Zone.alternativeText : Zone.prose;
    const at = this.inner.length;
    const block = this.block(from, to, { kind, level: 0, zones: own | this.inherited });
    if (block) this.inner.splice(at, 0, block);
  }

  /** Reads stretches as text in a further zone of the block being read, with a blank between them. */
  within(zone: ZoneSet, ...stretches: readonly (readonly [number, number])[]): void {
    const before = this.out.currentZones;
    this.out.setZones(before | zone);
    let end = -1;
    for (const stretch of stretches) {
      const [from, to] = this.trimmed(...stretch);
      if (from >= to) continue;
      if (end >= 0) this.out.space(this.passage.sourceOf(end), this.passage.sourceOf(from));
      this.read(from, to);
      end = to;
    }
    this.out.setZones(before);
  }

  /** Reads `[from, to)` as the text of a link. */
  linkText(from: number, to: number, target: string): void {
    const before = this.out.currentZones;
    this.out.setZones(before | Zone.linkText);
    const start = this.out.length;
    this.read(...this.trimmed(from, to));
    this.out.link(start, target);
    this.out.setZones(before);
  }

  /** One opaque unit for `[from, to)`. */
  opaque(from: number, to: number): void {
    this.out.opaque(this.passage.sourceOf(from), this.passage.sourceEndOf(to));
  }

  private space(from: number, to: number): void {
    this.out.space(this.passage.sourceOf(from), this.passage.sourceOf(to));
  }

  /** Without blanks at the ends: the builder has one blank for them already, if there is one outside. */
  private trimmed(from: number, to: number): readonly [number, number] {
    let start = from;
    let end = to;
    while (start < end && isWhite(this.text.charCodeAt(start))) start++;
    while (end > start && isWhite(this.text.charCodeAt(end - 1))) end--;
    return [start, end];
  }

  private read(from: number, to: number): void {
    const { text, marks } = this;
    const outerRun = this.run;
    this.run = from;
    const at = marks?.at;
    for (let i = from; i < to;) {
      const unit = text.charCodeAt(i);
      if (at !== undefined && at[i] !== Mark.text) {
        i = this.marked(i, at[i]!, to);
      } else if (unit > 127 || SPECIAL[unit] === 0) {
        i++;
      } else {
        const end = this.special(unit, i, to);
        if (end < 0) i++;
        else this.run = i = end;
      }
    }
    this.flush(to);
    this.run = outerRun;
  }

  private marked(i: number, mark: number, to: number): number {
    this.flush(i);
    let end = i + 1;
    if (mark === Mark.opaque) {
      end = Math.min(to, this.marks!.ends.get(i)!);
      this.opaque(i, end);
    } else if (mark >= Mark.openDouble && i + 1 < to) {
      end = i + 2;
      this.substitute('“”‘’'[mark - Mark.openDouble]!, i, end);
    }
    this.run = end;
    return end;
  }

  /** Gives the text up to `to` to the builder. Blanks at its ends fold with whatever vanishes next to them. */
  private flush(to: number): void {
    const { text, passage } = this;
    let from = this.run;
    if (from >= to) return;
    let end = to;
    while (from < end && text.charCodeAt(from) === 32) from++;
    if (from > this.run) this.space(this.run, from);
    while (end > from && text.charCodeAt(end - 1) === 32) end--;
    if (end > from) {
      const start = passage.sourceOf(from);
      this.out.run(start, start + end - from);
    }
    if (to > end) this.space(end, to);
    this.run = to;
  }

  private substitute(stands: string, from: number, to: number): void {
    this.out.substitute(stands, this.passage.sourceOf(from), this.passage.sourceEndOf(to));
  }

  /** Deals with what begins at `i`, or around it; where it ends, or -1 where the unit is text. */
  private special(unit: number, i: number, to: number): number {
    switch (unit) {
      case 10:
        this.flush(i);
        this.space(i, i + 1);
        return i + 1;
      case 43:
        return this.hardBreak(i, to);
      case 92:
        return this.escape(i, to);
      case 123:
        return this.reference(i, to);
      case 58:
        return this.macro(i, to);
      case 34:
        return this.menuPath(i, to);
      case 60:
        return this.crossReference(i, to);
      case 40:
        return this.parenthesis(i, to);
      case 91:
        return this.hideMatch(ANCHOR, i, to);
      case 38:
        return this.characterReference(i, to);
      default:
        return this.address(i, to);
    }
  }

  /** ` +` at the end of a line. */
  private hardBreak(i: number, to: number): number {
    if (i === 0 || this.text.charCodeAt(i - 1) !== 32) return -1;
    if (i + 1 < to ? this.text.charCodeAt(i + 1) !== 10 : to !== this.text.length) return -1;
    this.flush(i);
    return i + 1;
  }

  /** A backslash before markup vanishes and leaves the markup's first unit as text. */
  private escape(i: number, to: number): number {
    ESCAPABLE.lastIndex = i + 1;
    if (i + 1 >= to || !ESCAPABLE.test(this.text)) return -1;
    if (this.marks !== undefined && this.marks.at[i + 1] !== Mark.text) return -1;
    this.flush(i);
    const unit = this.text[i + 1]!;
    const letter = unit >= 'a' && unit <= 'z';
    if (letter) return i + 1;
    this.substitute(unit, i, i + 2);
    return i + 2;
  }

  private reference(i: number, to: number): number {
    const found = attributeReference(this.text, i);
    if (!found || found.end > to) return -1;
    this.flush(i);
    if (found.stands === undefined) return this.addressOf(i, found.end, to);
    if (found.stands !== '') this.substitute(found.stands, i, found.end);
    return found.end;
  }

  /** `{url}/page[text]` is a link; the reference alone is opaque. */
  private addressOf(from: number, end: number, to: number): number {
    const open = this.passage.next('[', end);
    const address = open < to && open - end < 300 ? this.text.slice(end, open) : ' ';
    const close = /[\s\]`'"<>()|]/.test(address) ? to : this.passage.next(']', open);
    const shown = close < to ? firstPositional(this.text, open + 1, close, false) : undefined;
    if (!shown || this.text[open + 1] === '[') {
      this.opaque(from, end);
      return end;
    }
    const last = this.text[shown.end - 1] === '^' ? shown.end - 1 : shown.end;
    this.linkText(shown.start, last, this.text.slice(from, open));
    return close + 1;
  }

  private macro(i: number, to: number): number {
    const macro = macroAt(this.passage, this.run, i, to);
    if (!macro) return -1;
    this.flush(macro.start);
    macro.read(this);
    return macro.end;
  }

  /** `"File > Save"`, the short form of the menu macro. */
  private menuPath(i: number, to: number): number {
    MENU_PATH.lastIndex = i;
    const found = MENU_PATH.exec(this.text);
    const end = found ? i + found[0].length : 0;
    if (!found || end > to) return -1;
    this.flush(i);
    this.within(Zone.uiLabel, [i + 1, end - 1]);
    return end;
  }

  /** `<<id>>` and `<<id,text>>`. */
  private crossReference(i: number, to: number): number {
    const { text } = this;
    if (!text.startsWith('<<', i) || !/[\p{L}\p{N}_#/.:{]/u.test(text[i + 2] ?? ' ')) return -1;
    const close = this.passage.next('>>', i + 2);
    if (close + 2 > to) return -1;
    this.flush(i);
    const comma = this.passage.next(',', i + 2);
    if (comma < close) this.linkText(comma + 1, close, text.slice(i + 2, comma));
    else this.opaque(i, close + 2);
    return close + 2;
  }

  /** Index terms, `((shown))` and `(((not, shown)))`, and the signs `(C)`, `(R)`, `(TM)`. */
  private parenthesis(i: number, to: number): number {
    const { text } = this;
    if (text.startsWith('((', i)) {
      let close = this.passage.next('))', i + 2);
      if (close <= i + 2 || close + 2 > to) return -1;
      while (text[close + 2] === ')' && close + 3 <= to) close++;
      this.flush(i);
      if (text[i + 2] !== '(') this.within(Zone.prose, [i + 2, close]);
      return close + 2;
    }
    for (const [written, sign] of SYMBOLS) {
      if (!text.startsWith(written, i) || i + written.length > to) continue;
      this.flush(i);
      this.substitute(sign, i, i + written.length);
      return i + written.length;
    }
    return -1;
  }

  private hideMatch(pattern: RegExp, i: number, to: number): number {
    pattern.lastIndex = i;
    const found = pattern.exec(this.text);
    if (!found || i + found[0].length > to) return -1;
    this.flush(i);
    return i + found[0].length;
  }

  private characterReference(i: number, to: number): number {
    CHARACTER_REFERENCE.lastIndex = i;
    const found = CHARACTER_REFERENCE.exec(this.text);
    const stands = found && i + found[0].length <= to ? decodeReference(found[0]) : undefined;
    if (stands === undefined) return -1;
    this.flush(i);
    this.substitute(stands, i, i + found![0].length);
    return i + found![0].length;
  }

  /** An e-mail address, around its `@`. */
  private address(i: number, to: number): number {
    if (i === this.run || !isWord(this.text, i - 1)) return -1;
    const local = ADDRESS_BEFORE.exec(this.text.slice(Math.max(this.run, i - 64), i));
    ADDRESS_BEHIND.lastIndex = i;
    const host = local ? ADDRESS_BEHIND.exec(this.text) : null;
    if (!local || !host || i + host[0].length > to) return -1;
    this.flush(i - local[0].length);
    this.opaque(i - local[0].length, i + host[0].length);
    return i + host[0].length;
  }
}
