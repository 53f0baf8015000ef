// The blocks that a reader of LaTeX makes: the one that text is added to now, and those that footnotes interrupt.
import { ContentBuilder, type BlockRole } from '../content.js';
import { definitionOrSee, glossaryLevelBehind } from '../glossary.js';
import type { ProseBlock } from '../prose.js';
import { markQuotations } from '../quotations.js';
import type { ZoneSet } from '../zones.js';

/** A block of text while it is read. */
interface Pending {
  readonly out: ContentBuilder;
  readonly role: BlockRole;
  /** The source offset behind its text so far. */
  end: number;
  spaced: boolean;
}

/** Gathers text, from left to right, into the blocks of one document. */
export class Blocks {
  /** The level of the heading that says that its section is a glossary, or 0. */
  glossaryLevel = 0;
  private readonly finished: ProseBlock[] = [];
  private readonly suspended: (Pending | undefined)[] = [];
  private pending: Pending | undefined;

  constructor(private readonly text: string) {}

  /** The blocks, in the order of the source. */
  sorted(): ProseBlock[] {
    return this.finished.sort((a, b) => a.start - b.start);
  }

  get isEmpty(): boolean {
    return this.pending === undefined;
  }

  /** Length of the pending block's text. */
  get length(): number {
    return this.pending?.out.length ?? 0;
  }

  run(from: number, to: number, role: () => BlockRole, zones: ZoneSet): void {
    if (from >= to) return;
    const pending = this.begin(from, role, zones);
    pending.out.run(from, to);
    pending.end = to;
    pending.spaced = false;
  }

  substitute(written: string, from: number, to: number, role: () => BlockRole, zones: ZoneSet): void {
    if (written === '') return;
    const pending = this.begin(from, role, zones);
    pending.out.substitute(written, from, to);
    pending.end = to;
    pending.spaced = false;
  }

  opaque(from: number, to: number, role: () => BlockRole, zones: ZoneSet): void {
    const pending = this.begin(from, role, zones);
    pending.out.opaque(from, to);
    pending.end = to;
    pending.spaced = false;
  }

  space(from: number, to: number): void {
    const { pending } = this;
    if (!pending || pending.spaced || from >= to) return;
    pending.out.space(from, to);
    pending.end = to;
    pending.spaced = true;
  }

  /** What follows in the pending block lies in these zones. */
  setZones(zones: ZoneSet): void {
    this.pending?.out.setZones(zones);
  }

  /** Records that the pending block's text from `from` is a link's. */
  link(from: number, target: string): void {
    this.pending?.out.link(from, target);
  }

  /** Sets the pending block aside until {@link resume}. */
  suspend(): void {
    this.suspended.push(this.pending);
    this.pending = undefined;
  }

  resume(): void {
    this.flush();
    this.pending = this.suspended.pop();
  }

  /** Ends the pending block. */
  flush(): void {
    const { pending } = this;
    if (!pending) return;
    this.pending = undefined;
    const content = pending.out.finish(pending.role, pending.end);
    if (!content) return;
    const { kind, text, level } = content;
    if (kind === 'heading') this.glossaryLevel = glossaryLevelBehind(text, level, this.glossaryLevel);
    this.finished.push({ start: pending.out.start, content: markQuotations(definitionOrSee(content)) });
  }

  private begin(at: number, role: () => BlockRole, zones: ZoneSet): Pending {
    if (this.pending) return this.pending;
    const out = new ContentBuilder(this.text, at);
    out.setZones(zones);
    return (this.pending = { out, role: role(), end: at, spaced: true });
  }
}
