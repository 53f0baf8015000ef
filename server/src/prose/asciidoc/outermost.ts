// The header of a document and its outermost elements one after the other, with what the reader knows between them.
import type { Blockwise, Unit, UnitWalk } from '../blockwise.js';
import { Zone } from '../zones.js';
import { BlockReader, Stretch } from './blocks.js';
import { readHeader } from './header.js';
import { knownAlike, NOTHING_KNOWN, type KnownInStretch } from './known.js';
import { linesOf, type Line } from './lines.js';

/** What the reader knows of the document above an element. */
export interface Known extends KnownInStretch {
  /** True where the document's header may still come. */
  readonly atHead: boolean;
  /** BCP 47 tag by the document's own statement. */
  readonly language: string | undefined;
}

export const AT_HEAD: Known = { ...NOTHING_KNOWN, atHead: true, language: undefined };

/** The outermost elements of one text. */
export class Outermost implements Blockwise<Known> {
  constructor(private readonly text: string) {}

  walk(from: number, to: number, state: Known): UnitWalk<Known> {
    return new Walk(this.text, from, to, state);
  }

  sameState(a: Known, b: Known): boolean {
    return a === b || (a.atHead === b.atHead && a.language === b.language && knownAlike(a, b));
  }
}

class Walk implements UnitWalk<Known> {
  private readonly lines: readonly Line[];
  private readonly reader: BlockReader;
  private readonly stretch: Stretch;
  private line = 0;

  constructor(
    private readonly text: string,
    private readonly from: number,
    to: number,
    public state: Known,
  ) {
    this.lines = linesOf(text, from, to);
    this.reader = new BlockReader(text);
    this.reader.language = state.language;
    const around = { zones: Zone.prose, kind: 'paragraph', depth: 0 } as const;
    this.stretch = new Stretch(this.reader, text, this.lines, this.lines.length, around, state);
  }

  next(): number | undefined {
    const { lines, text } = this;
    while (this.line < lines.length && lines[this.line]!.start === lines[this.line]!.end) this.line++;
    const line = lines[this.line];
    return line && Math.max(this.from, text.lastIndexOf('\n', line.start - 1) + 1);
  }

  step(): Unit<Known> {
    const { reader, stretch, state } = this;
    const start = this.next()!;
    let looked = 0;
    let behind = this.line;
    if (state.atHead) {
      const header = readHeader(reader, this.text, this.lines, this.line);
      ({ behind, looked } = header);
      stretch.glossaryLevel = header.isGlossary ? 1 : 0;
    }
    if (behind === this.line) behind = stretch.step(behind);
    this.line = behind;
    const { language } = reader;
    if (state.atHead || language !== state.language || !knownAlike(state, stretch)) {
      this.state = { ...stretch.known(), atHead: false, language };
    }
    const reach = this.endOf(Math.max(looked, behind + 1));
    return { start, reach, state, blocks: reader.blocks.splice(0), problems: reader.problems.splice(0) };
  }

  /** The offset behind a line and its break: an element looks at one line behind its end at most. */
  private endOf(line: number): number {
    const { lines, text } = this;
    const lineBreak = line < lines.length ? text.indexOf('\n', lines[line]!.end) : -1;
    return lineBreak < 0 ? Number.POSITIVE_INFINITY : lineBreak + 1;
  }
}
