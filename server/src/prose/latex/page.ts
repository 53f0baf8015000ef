// One document in LaTeX while it is read: its text, what is open in it, the blocks and the problems so far.
import type { BlockRole } from '../content.js';
import type { ReadingProblem } from '../prose.js';
import type { ZoneSet } from '../zones.js';
import { Blocks } from './blocks.js';
import type { Definitions } from './definitions.js';
import { endsBeforeSection, endsWithParagraph, Frame } from './frames.js';
import { isSameLanguage } from './languages.js';
import type { Scanner } from './scanning.js';

/** Groups nested deeper than this are read as the text around them. */
const DEEPEST = 256;
const MOST_PROBLEMS = 20;

/** The state that all parts of the reader share. */
export class Page {
  readonly problems: ReadingProblem[] = [];
  readonly frames: Frame[] = [new Frame('ground', '', 0)];
  readonly out: Blocks;
  readonly text: string;
  /** True behind the end of the document's body. */
  isEnded = false;
  /** Groups that are open beyond the deepest frame. */
  private beyond = 0;

  constructor(
    readonly scanner: Scanner,
    readonly definitions: Definitions,
    /** The document's own language. */
    readonly language: string | undefined,
  ) {
    this.text = scanner.text;
    this.out = new Blocks(this.text);
  }

  get top(): Frame {
    return this.frames[this.frames.length - 1]!;
  }

  /** True where no frame more is opened. */
  get isDeep(): boolean {
    return this.frames.length > DEEPEST;
  }

  /** Adds `[from, to)` of the source as text. */
  run(from: number, to: number): number {
    this.out.run(from, to, this.role, this.zones);
    return to;
  }

  /** Adds what `[from, to)` of the source stands for. */
  put(written: string, from: number, to: number): number {
    this.out.substitute(written, from, to, this.role, this.zones);
    return to;
  }

  /** Adds one unit for `[from, to)`, which is no prose. */
  opaque(from: number, to: number): number {
    this.out.opaque(from, to, this.role, this.zones);
    return to;
  }

  push(frame: Frame): void {
    this.frames.push(frame);
    this.out.setZones(this.zones);
  }

  /** Opens a group at `at` and returns where its text begins. */
  group(at: number): number {
    if (this.isDeep) {
      if (this.beyond++ === 0) this.report(at, `Groups nested more than ${DEEPEST} levels deep are read as one.`);
    } else this.frames.push(new Frame('group', '', at, this.top));
    return at + 1;
  }

  /** Takes a closing brace: the group or argument that it closes, or undefined. */
  closeGroup(at: number): Frame | undefined {
    if (this.beyond > 0) {
      this.beyond--;
      return undefined;
    }
    if (this.top.type === 'label') this.close();
    if (this.top.type === 'group' || this.top.type === 'argument') return this.close();
    this.report(at, 'A brace is closed here that was not opened.');
    return undefined;
  }

  /** Closes the top frame. */
  close(): Frame {
    const frame = this.frames.pop()!;
    const { command, type, link } = frame;
    if (link) this.out.link(link.from, link.target);
    if (command?.flow === 'aside' && type === 'argument') this.out.resume();
    else if (type === 'environment' || type === 'label' || command?.flow === 'block') this.out.flush();
    this.out.setZones(this.zones);
    return frame;
  }

  closeTo(kept: number): void {
    while (this.frames.length > kept) this.close();
  }

  /** A paragraph ends, and with it what cannot reach over its end. */
  paragraph(): void {
    let kept = this.frames.length;
    for (let i = kept - 1; i > 0 && this.frames[i]!.type !== 'environment'; i--) {
      if (endsWithParagraph(this.frames[i]!)) kept = i;
    }
    this.closeUnended(kept, 'in its paragraph');
    this.out.flush();
  }

  /** A section begins, before which all ends that holds none. */
  beforeSection(): void {
    const kept = this.frames.findIndex((frame, i) => i > 0 && endsBeforeSection(frame));
    if (kept >= 0) this.closeUnended(kept, 'before the next section');
  }

  /** The whole document ends. */
  finish(): void {
    if (!this.isEnded) this.closeUnended(1, 'in the document');
    this.closeTo(1);
    this.out.flush();
  }

  /** Closes frames until `kept` are left, and says that the outermost of the closed has no end. */
  closeUnended(kept: number, where: string): void {
    const frame = this.frames[kept];
    if (!frame) return;
    const { type, name, start } = frame;
    const what =
      type === 'environment' ? `\\begin{${name}}` : name === '' ? 'What opens here' : `The argument of \\${name}`;
    this.report(start, `${what} has no end ${where}.`);
    this.closeTo(kept);
  }

  /** True where a language is another than that of the text here. */
  isForeign(tag: string): boolean {
    const own = this.top.language ?? this.language;
    return own === undefined || !isSameLanguage(own, tag);
  }

  report(at: number, message: string): void {
    if (this.problems.length < MOST_PROBLEMS) this.problems.push({ span: { start: at, end: at + 1 }, message });
  }

  private get zones(): ZoneSet {
    return this.top.inlineZones;
  }

  /** Text is now in the zones of the top frame. */
  declareZones(zones: ZoneSet): void {
    this.top.inlineZones |= zones;
    this.out.setZones(this.zones);
  }

  private readonly role = (): BlockRole => {
    const { kind, level, blockZones: zones, language, glossary } = this.top;
    return { kind, level, zones, language: language === this.language ? undefined : language, glossary };
  };
}
