// Builds one block's content: text, its map back to the source, zones and links, in one pass from left to right.
import { OPAQUE } from './prose.js';
import type { BlockContent, BlockKind, GlossaryPart, LinkMark, ZoneMark } from './prose.js';
import type { ZoneSet } from './zones.js';

const LETTER_OR_DIGIT = /[\p{L}\p{N}]/u;
const NO_MARKS: readonly ZoneMark[] = [];
const NO_LINKS: readonly LinkMark[] = [];

/** What a block is, apart from its text. */
export interface BlockRole {
  readonly kind: BlockKind;
  /** The heading's level from 1, else 0. */
  readonly level: number;
  readonly zones: ZoneSet;
  readonly language?: string | undefined;
  readonly glossary?: GlossaryPart | undefined;
}

/**
 * Collects the text of one block. Offsets given to its methods are offsets into `source` and must not go back.
 * White space given by {@link space} becomes one space between two visible things and vanishes at the block's ends.
 */
export class ContentBuilder {
  private text = '';
  private readonly pieces: number[] = [];
  private marks: ZoneMark[] | undefined;
  private links: LinkMark[] | undefined;
  private zones: ZoneSet = 0;
  private zonesFrom = 0;
  private gapFrom = -1;
  private gapTo = -1;
  /** Where an in-step piece that ends the text so far would go on in the source, else -1. */
  private stepTo = -1;

  /** `start` is the source offset that the content's pieces count from. */
  constructor(
    private readonly source: string,
    readonly start: number,
  ) {}

  /** Adds `[from, to)` of the source as it is written. */
  run(from: number, to: number): void {
    if (from >= to) return;
    this.closeGap();
    if (this.stepTo !== from) this.pieces.push(this.text.length, from - this.start, to - from);
    else this.pieces[this.pieces.length - 1]! += to - from;
    this.text += this.source.slice(from, to);
    this.stepTo = to;
  }

  /** Adds `text` in the place of `[from, to)` of the source, as a whole. */
  substitute(text: string, from: number, to: number): void {
    this.closeGap();
    this.pieces.push(this.text.length, from - this.start, to - from);
    this.text += text;
    this.stepTo = -1;
  }

  /** Adds one unit that stands for something that is no prose. */
  opaque(from: number, to: number): void {
    this.substitute(OPAQUE, from, to);
  }

  /** Adds white space that the format folds: a line break and the indentation after it, or trailing blanks. */
  space(from: number, to: number): void {
    if (this.gapFrom < 0) this.gapFrom = from;
    this.gapTo = to;
  }

  /** Length of the text so far; what is added next starts there. */
  get length(): number {
    if (this.gapFrom >= 0) this.closeGap();
    return this.text.length;
  }

  get currentZones(): ZoneSet {
    return this.zones;
  }

  /** What follows lies in these zones beside the block's own. */
  setZones(zones: ZoneSet): void {
    if (zones === this.zones) return;
    const at = this.length;
    if (this.zones !== 0 && at > this.zonesFrom) {
      (this.marks ??= []).push({ start: this.zonesFrom, end: at, zones: this.zones });
    }
    this.zones = zones;
    this.zonesFrom = at;
  }

  /** Records that the text from `start` to here is a link's. */
  link(start: number, target: string): void {
    if (this.text.length > start) (this.links ??= []).push({ start, end: this.text.length, target });
  }

  /** The finished content, or undefined where the block holds no word. `end` is the source offset of the block's end. */
  finish(role: BlockRole, end: number): BlockContent | undefined {
    this.gapFrom = -1;
    this.setZones(0);
    if (!hasWord(this.text)) return undefined;
    return {
      kind: role.kind,
      level: role.level,
      text: this.text,
      zones: role.zones,
      language: role.language,
      glossary: role.glossary,
      marks: this.marks ?? NO_MARKS,
      links: this.links ?? NO_LINKS,
      pieces: new Uint32Array(this.pieces),
      sourceLength: end - this.start,
    };
  }

  private closeGap(): void {
    if (this.gapFrom < 0) return;
    const from = this.gapFrom;
    this.gapFrom = -1;
    if (this.text === '') return;
    const length = this.gapTo - from;
    if (length === 1 && this.stepTo === from) {
      this.pieces[this.pieces.length - 1]! += 1;
      this.stepTo = this.gapTo;
    } else {
      this.pieces.push(this.text.length, from - this.start, length);
      this.stepTo = length === 1 ? this.gapTo : -1;
    }
    this.text += ' ';
  }
}

/** True where the text holds a letter or a digit. Most texts show one at once, in ASCII. */
function hasWord(text: string): boolean {
  for (let i = 0; i < text.length; i++) {
    const unit = text.charCodeAt(i);
    if (unit > 127) return LETTER_OR_DIGIT.test(text);
    if ((unit >= 97 && unit <= 122) || (unit >= 65 && unit <= 90) || (unit >= 48 && unit <= 57)) return true;
  }
  return false;
}
