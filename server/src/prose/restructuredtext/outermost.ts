// The outermost elements of a document one after the other, with what the reader knows between them.
import type { Blockwise, Unit, UnitWalk } from '../blockwise.js';
import { Zone } from '../zones.js';
import { readBody, readElement } from './body.js';
import type { DocumentContext, Setting } from './context.js';
import { linesOf, skipBlank, type Lines } from './lines.js';

/** What the reader knows of the document above an element. */
export interface Known {
  /** The adornments of titles in order of their first appearance. */
  readonly titleStyles: readonly string[];
  /** Level of the glossary's title where the element stands in a glossary, else 0. */
  readonly glossaryLevel: number;
  /** The language that the next element was said to be in. */
  readonly nextLanguage: string | undefined;
}

export const NOTHING_KNOWN: Known = { titleStyles: [], glossaryLevel: 0, nextLanguage: undefined };

const OUTERMOST: Setting = { kind: 'paragraph', level: 0, zones: Zone.prose, depth: 0 };

/** The outermost elements of one text. */
export class Outermost implements Blockwise<Known> {
  constructor(
    private readonly text: string,
    private readonly targets: ReadonlyMap<string, string>,
  ) {}

  walk(from: number, to: number, state: Known): UnitWalk<Known> {
    return new Walk(this.text, from, to, state, this.targets);
  }

  sameState(a: Known, b: Known): boolean {
    return (
      a === b ||
      (a.glossaryLevel === b.glossaryLevel &&
        a.nextLanguage === b.nextLanguage &&
        a.titleStyles.length === b.titleStyles.length &&
        a.titleStyles.every((style, i) => style === b.titleStyles[i]))
    );
  }
}

class Walk implements UnitWalk<Known> {
  private readonly lines: Lines;
  private readonly cx: DocumentContext;
  private line = 0;

  constructor(
    private readonly text: string,
    private readonly from: number,
    to: number,
    public state: Known,
    targets: ReadonlyMap<string, string>,
  ) {
    this.lines = linesOf(text, from, to);
    const cx: DocumentContext = {
      ...state,
      text,
      blocks: [],
      problems: [],
      reach: 0,
      targets,
      readBody: (lines, first, last, base, setting) => readBody(cx, lines, first, last, base, setting),
    };
    this.cx = cx;
  }

  next(): number | undefined {
    const { lines } = this;
    this.line = skipBlank(lines, this.line, lines.count);
    if (this.line >= lines.count) return undefined;
    return Math.max(this.from, this.text.lastIndexOf('\n', lines.at[this.line]! - 1) + 1);
  }

  step(): Unit<Known> {
    const { cx, lines, state } = this;
    const start = this.next()!;
    cx.reach = 0;
    const behind = readElement(cx, lines, this.line, lines.count, 0, OUTERMOST);
    this.line = behind;
    const { titleStyles, glossaryLevel, nextLanguage } = cx;
    if (
      titleStyles !== state.titleStyles ||
      glossaryLevel !== state.glossaryLevel ||
      nextLanguage !== state.nextLanguage
    ) {
      this.state = { titleStyles, glossaryLevel, nextLanguage };
    }
    const reach = Math.max(cx.reach, this.reachOf(behind));
    return { start, reach, state, blocks: cx.blocks.splice(0), problems: cx.problems.splice(0) };
  }

  /**
   * Behind its end an element looks at the next line that is not blank (which ends what is indented) and at the line after its first
   * one behind it (which may underline a title). Only broken tables look further.
   */
  private reachOf(behind: number): number {
    const { lines, text } = this;
    const last = Math.max(behind + 1, skipBlank(lines, behind, lines.count));
    const lineBreak = last < lines.count ? text.indexOf('\n', lines.end[last]) : -1;
    return lineBreak < 0 ? Number.POSITIVE_INFINITY : lineBreak + 1;
  }
}
