// From a stream of tags and text to blocks of prose: which elements are open, and which block their text belongs to.
import { primaryLanguage } from '../../text/language.js';
import { ContentBuilder, type BlockRole } from '../content.js';
import { definitionOrSee, glossaryLevelBehind } from '../glossary.js';
import type { ProseBlock } from '../prose.js';
import { markQuotations } from '../quotations.js';
import { Zone } from '../zones.js';
import type { Checkpoint } from './checkpoints.js';
import { closedFrame, ground, openFrame, State, type Frame } from './frames.js';
import { HTML } from './htmlElements.js';
import { CLOSED, CONTAINER, Flow, HEADWORD, HIDDEN, OPAQUE_INLINE, PARAGRAPH, TERM } from './roles.js';
import type { ElementRole, Vocabulary } from './roles.js';
import type { TextReader } from './runningText.js';
import type { StartTag } from './startTag.js';

interface OpenLink {
  readonly frame: Frame;
  readonly target: string;
  /** Where its text begins in the pending block. */
  from: number;
}

/** A block of text while it is read. */
interface Pending {
  readonly out: ContentBuilder;
  readonly role: BlockRole;
  /** The source offset behind its text so far. */
  end: number;
  /** True where white space ends that. */
  spaced: boolean;
}

/** Takes the elements and the text of one document in their order and makes blocks of them. */
export class Elements {
  /** The open elements, outermost first, on the ground that they stand on. */
  readonly frames: Frame[];
  /** Elements met that are paragraphs: where there is none, titles alone make no documentation. */
  paragraphs = 0;
  /** The language that the document states for itself. */
  language: string | undefined;
  private readonly blocks: ProseBlock[] = [];
  private pending: Pending | undefined;
  private link: OpenLink | undefined;
  private readonly suspended: { readonly pending: Pending | undefined; readonly link: OpenLink | undefined }[] = [];
  /** Counts what became visible, by which an element without text is known. */
  private shown = 0;
  /** The level of the heading that says that its section is a glossary, or 0. */
  private glossaryLevel = 0;
  /** The end of the last white space between elements. */
  private spacedTo = 0;

  constructor(
    private readonly text: string,
    private readonly reader: TextReader,
    /** True where text outside all elements is prose. */
    private readonly takesText: boolean,
    /** Where reading begins again, if not at the document's start. */
    from?: Checkpoint,
  ) {
    this.frames = from ? [...from.frames] : [ground(CONTAINER, takesText)];
    if (!from) return;
    this.language = from.language;
    this.glossaryLevel = from.glossaryLevel;
    this.shown = from.shown;
    this.paragraphs = from.paragraphs;
  }

  /** The state here, at a start tag at `at`; undefined where what follows depends on more than that. */
  checkpoint(at: number): Checkpoint | undefined {
    if (this.pending || this.link || this.suspended.length > 0 || this.top.state !== State.read) return undefined;
    if (this.frames.some(({ refers, role }) => refers || role.parts === true)) return undefined;
    const { language, glossaryLevel, shown, paragraphs } = this;
    return { at, frames: [...this.frames], language, glossaryLevel, shown, paragraphs, blocks: this.blocks.length };
  }

  get top(): Frame {
    return this.frames[this.frames.length - 1]!;
  }

  /** The blocks read, in source order. */
  finish(): ProseBlock[] {
    this.closeTo(1, this.text.length);
    this.flush();
    return this.blocks.sort((a, b) => a.start - b.start);
  }

  /** Opens an element whose start tag ends before `tagEnd`. */
  open(tag: StartTag, ofName: ElementRole, vocabulary: Vocabulary, tagEnd: number): void {
    const role = this.roleHere(tag, ofName, vocabulary);
    const parent = this.top;
    const { flow } = role;
    const { name, start } = tag;
    if (parent.state === State.none) {
      this.frames.push(closedFrame(parent, name, HIDDEN, start));
      return;
    }
    const isRead =
      parent.state === State.read ||
      (parent.state === State.asides ? flow === Flow.aside : role.inMetadata === true || flow === Flow.metadata);
    this.readAttributes(tag, vocabulary, isRead && flow !== Flow.hidden && flow !== Flow.closed);
    if (!isRead || flow === Flow.hidden) {
      this.frames.push(closedFrame(parent, name, HIDDEN, start));
      return;
    }
    if (parent.role.parts && flow === Flow.inline && parent.shown !== this.shown) this.space(start, tagEnd);
    if (flow === Flow.container || flow === Flow.block || flow === Flow.closed || flow === Flow.metadata) this.flush();
    if (role === PARAGRAPH) this.paragraphs++;
    if (flow === Flow.opaque || flow === Flow.closed || flow === Flow.lineBreak) {
      this.frames.push(closedFrame(parent, name, role, start));
      if (flow === Flow.lineBreak) this.space(start, tagEnd);
      return;
    }
    if (flow === Flow.picture) this.opaque(start, tagEnd);
    const target = tag.target(role);
    const language = this.isRoot(tag) ? undefined : tag.language();
    const isForeign = flow === Flow.inline && language !== undefined && this.isForeign(language);
    const zones = role.zones | tag.zones(role, vocabulary) | (isForeign ? Zone.quotation : 0);
    const refers = vocabulary !== HTML && (target !== undefined || tag.isReused());
    const frame = openFrame(parent, name, role, zones, start, this.shown, refers);
    if (flow !== Flow.inline) {
      if (language !== undefined) frame.language = language;
      if (tag.isGlossary()) frame.isGlossary = true;
      if (this.glossaryLevel > 0) frame.glossary = role.glossary ?? role.listed ?? frame.glossary;
    }
    this.frames.push(frame);
    if (flow === Flow.aside) this.suspend();
    if (target !== undefined && this.link === undefined) this.openLink(frame, target);
    else if (frame.inlineZones !== parent.inlineZones) this.pending?.out.setZones(this.zones());
  }

  /** Closes elements until `kept` frames are left; their end tag ends before `tagEnd`. */
  closeTo(kept: number, tagEnd: number): void {
    while (this.frames.length > kept) this.close(tagEnd);
  }

  /** Adds character data. */
  characters(from: number, to: number, plain: boolean): void {
    const { top } = this;
    if (top.state !== State.read || from >= to) return;
    const visible = this.reader.visibleFrom(from, to);
    if (visible === to) {
      this.space(from, to);
      return;
    }
    const pending = this.begin(visible);
    this.reader.read(pending.spaced ? visible : from, to, pending.out, plain);
    pending.end = to;
    pending.spaced = this.reader.visibleEnd(visible, to) < to;
    this.shown++;
  }

  private close(tagEnd: number): void {
    const frame = this.frames.pop()!;
    const { flow } = frame.role;
    if (flow === Flow.opaque) this.opaque(frame.start, tagEnd);
    else if (flow === Flow.inline) {
      if (this.link?.frame === frame) {
        this.endLink();
        this.link = undefined;
      }
      this.pending?.out.setZones(this.zones());
      if (frame.refers && frame.shown === this.shown) this.opaque(frame.start, tagEnd);
    } else if (flow !== Flow.hidden && flow !== Flow.lineBreak && flow !== Flow.picture) {
      this.flush();
      if (this.link?.frame === frame) this.link = undefined;
      if (flow === Flow.aside) ({ pending: this.pending, link: this.link } = this.suspended.pop()!);
    }
  }

  /** The role of an element by its name, unless its attributes or its place say otherwise. */
  private roleHere(tag: StartTag, role: ElementRole, vocabulary: Vocabulary): ElementRole {
    const parent = this.top;
    if (tag.isUntranslated(vocabulary) && !this.isRoot(tag) && tag.name !== 'body') {
      if (role.flow === Flow.inline) return OPAQUE_INLINE;
      if (role.flow === Flow.container || role.flow === Flow.block || role.flow === Flow.aside) return CLOSED;
    }
    // A paragraph of a glossary that begins with the term that it defines.
    const isEntry = role === TERM && tag.name === 'dfn' && parent.role === PARAGRAPH && !this.pending;
    if (!isEntry || (!parent.isGlossary && this.glossaryLevel === 0)) return role;
    this.frames[this.frames.length - 1] = { ...parent, glossary: 'definition' };
    return HEADWORD;
  }

  /** True for the element that holds the whole document, of which the stream reads what it states. */
  private isRoot({ name }: StartTag): boolean {
    return name === 'html' || (this.frames.length === 1 && !this.takesText);
  }

  private isForeign(language: string): boolean {
    const own = this.top.language ?? this.language ?? 'en';
    return primaryLanguage(own) !== primaryLanguage(language);
  }

  /** A language as a block has it: only where it is not the document's. */
  private ownLanguage(language: string | undefined): string | undefined {
    return language === this.language ? undefined : language;
  }

  private suspend(): void {
    this.suspended.push({ pending: this.pending, link: this.link });
    this.pending = undefined;
    this.link = undefined;
  }

  private space(from: number, to: number): void {
    const { pending } = this;
    if (!pending || pending.spaced) return;
    pending.out.space(from, to);
    pending.end = this.spacedTo = to;
    pending.spaced = true;
  }

  /** One opaque unit for `[start, to)`, or for what spaces in it leave. */
  private opaque(start: number, to: number): void {
    const from = Math.max(start, this.spacedTo);
    if (from >= to) return;
    const pending = this.begin(from);
    pending.out.opaque(from, to);
    pending.end = to;
    pending.spaced = false;
    this.shown++;
  }

  /** The pending block; a new one, if need be, begins at `at`. */
  private begin(at: number): Pending {
    if (this.pending) return this.pending;
    const { kind, level, blockZones: zones, glossary, language } = this.top;
    const out = new ContentBuilder(this.text, at);
    out.setZones(this.zones());
    if (this.link) this.link.from = 0;
    const role = { kind, level, zones, glossary, language: this.ownLanguage(language) };
    return (this.pending = { out, role, end: at, spaced: true });
  }

  /** Ends the pending block. */
  private flush(): void {
    const { pending } = this;
    if (!pending) return;
    this.endLink();
    this.pending = undefined;
    const content = pending.out.finish(pending.role, pending.end);
    if (!content) return;
    const { kind, text, level } = content;
    if (kind === 'heading') this.glossaryLevel = glossaryLevelBehind(text, level, this.glossaryLevel);
    this.blocks.push({ start: pending.out.start, content: markQuotations(definitionOrSee(content)) });
  }

  private zones(): number {
    return this.top.inlineZones | (this.link ? Zone.linkText : 0);
  }

  private openLink(frame: Frame, target: string): void {
    this.link = { frame, target, from: 0 };
    if (!this.pending) return;
    this.pending.out.setZones(this.zones());
    this.link.from = this.pending.out.length;
  }

  /** Records the text of the open link in the pending block. */
  private endLink(): void {
    if (this.link && this.pending) this.pending.out.link(this.link.from, this.link.target);
  }

  /** Reads the attributes that hold prose; outside what is read, those alone that the table names with their element. */
  private readAttributes(tag: StartTag, vocabulary: Vocabulary, isRead: boolean): void {
    const { attributes } = vocabulary;
    if (attributes.size === 0) return;
    const stated = this.isRoot(tag) ? undefined : tag.language();
    tag.forEach((name, from, to) => {
      const kind = attributes.get(`${tag.name}@${name}`) ?? (isRead ? attributes.get(name) : undefined);
      if (kind === undefined || from === to) return;
      if (kind === 'description' && tag.attribute('name')?.toLowerCase() !== 'description') return;
      const start = this.reader.visibleFrom(from, to);
      const out = new ContentBuilder(this.text, start);
      this.reader.read(start, to, out, false);
      const own = kind === 'alternativeText' ? Zone.alternativeText : kind === 'description' ? Zone.frontMatter : 0;
      const zones = own | (this.top.blockZones & (Zone.quotation | Zone.safetyMessage));
      const language = this.ownLanguage(stated ?? this.top.language);
      const content = out.finish({ kind, level: 0, zones, language }, this.reader.visibleEnd(start, to));
      if (content) this.blocks.push({ start, content: markQuotations(content) });
    });
  }
}
