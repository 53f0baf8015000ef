// Follows the tokenizer through one document: which element each tag opens or closes, and in which vocabulary.
import { Tokenizer } from 'htmlparser2';
import { writtenTag } from '../../text/language.js';
import type { ProseBlock, ReadingProblem } from '../prose.js';
import { isSameState, lastUpTo, LEAST_DISTANCE, type Checkpoint } from './checkpoints.js';
import { Elements } from './elements.js';
import { isVoid, keptAtEnd, keptAtStart } from './frames.js';
import { HTML } from './htmlElements.js';
import { OTHER } from './otherElements.js';
import type { Prolog } from './prolog.js';
import { recognise, type Root } from './recognise.js';
import { HIDDEN, type ElementRole, type Vocabulary } from './roles.js';
import { TextReader } from './runningText.js';
import { roleOf, StartTag, UNDETERMINED } from './startTag.js';

/** Elements nested deeper than this are not read: each level costs time at every end tag. */
const DEEPEST = 256;

/** A reading made before, of whose text what follows `from` here is what follows `from - delta` there. */
export interface Before {
  readonly checkpoints: readonly Checkpoint[];
  readonly from: number;
  readonly delta: number;
}

/** Where a reading met one made before: the same state in both. */
export interface Meeting {
  readonly here: Checkpoint;
  /** Index of the checkpoint there. */
  readonly there: number;
}

/** What the tokenizer calls; its offsets count from `base`. */
export class MarkupStream {
  readonly problems: ReadingProblem[] = [];
  readonly checkpoints: Checkpoint[] = [];
  /** Where this reading met the one before and ended. */
  meeting: Meeting | undefined;
  /** The root element, once it is known. */
  root: Root | undefined;
  private readonly tag: StartTag;
  private readonly elements: Elements;
  private readonly tokenizer: Tokenizer;
  /** Undefined until the root element is known. */
  vocabulary: Vocabulary | undefined;
  private rootPrefix = '';
  private ended = false;
  private base = 0;
  /** Open elements beyond the deepest that is read. */
  private beyond = 0;
  /** How many frames are open outside an element of a foreign vocabulary; 0 where none is open. */
  private foreign = 0;

  constructor(
    private readonly text: string,
    private readonly uri: string,
    private readonly prolog: Prolog,
    private readonly xml: boolean,
    /** Where reading begins, if not at the document's start: the state there, and the root element. */
    start?: { readonly checkpoint: Checkpoint; readonly root: Root | undefined; readonly vocabulary: Vocabulary },
    private readonly before?: Before,
  ) {
    this.tokenizer = new Tokenizer({ xmlMode: xml, decodeEntities: false }, this);
    this.tag = new StartTag(text, xml);
    const reader = new TextReader(text, { xml, defined: prolog.entities, characters: prolog.characters });
    this.elements = new Elements(text, reader, !xml, start?.checkpoint);
    if (start) {
      this.vocabulary = start.vocabulary;
      this.root = start.root;
      this.rootPrefix = prefixOf(start.root?.name ?? '');
    } else if (!xml) this.vocabulary = HTML;
  }

  /** The document's own language. */
  get language(): string | undefined {
    return this.elements.language;
  }

  read(from: number): void {
    this.base = from;
    this.tokenizer.write(this.text.slice(from));
    if (!this.meeting) this.tokenizer.end();
  }

  /** The blocks read, whether or not the document is documentation. */
  allBlocks(): ProseBlock[] {
    return this.elements.finish();
  }

  /** How many elements are paragraphs. */
  get paragraphs(): number {
    return this.elements.paragraphs;
  }

  blocks(): ProseBlock[] {
    return isProse(this.vocabulary, this.paragraphs) ? this.allBlocks() : [];
  }

  ontext(start: number, end: number): void {
    this.characters(start, end, false);
  }

  oncdata(start: number, end: number, marks: number): void {
    if (this.xml || this.foreign > 0) this.characters(start, end - marks, true);
  }

  onopentagname(start: number, end: number): void {
    this.tag.begin(this.base + start, this.base + end);
  }

  onattribname(start: number, end: number): void {
    this.tag.addName(this.base + start, this.base + end);
  }

  onattribdata(start: number, end: number): void {
    this.tag.addValue(this.base + start, this.base + end);
  }

  onopentagend(end: number): void {
    this.opened(this.base + end + 1, !this.xml && isVoid(this.tag.name));
  }

  onselfclosingtag(end: number): void {
    this.opened(this.base + end + 1, this.xml || this.foreign > 0 || isVoid(this.tag.name));
  }

  onclosetag(start: number, end: number): void {
    if (this.ended) return;
    if (this.beyond > 0) {
      this.beyond--;
      return;
    }
    const written = this.text.slice(this.base + start, this.base + end);
    const { frames } = this.elements;
    const kept = keptAtEnd(frames, this.xml ? written : written.toLowerCase(), this.xml);
    if (kept === frames.length) return;
    const tagEnd = this.text.indexOf('>', this.base + end);
    this.closeTo(kept, tagEnd < 0 ? this.text.length : tagEnd + 1);
    if (this.xml && kept === 1) this.ended = true;
  }

  isInForeignContext(): boolean {
    return this.foreign > 0;
  }

  onattribend(): void {}
  onattribentity(): void {}
  oncomment(): void {}
  ondeclaration(): void {}
  onend(): void {}
  onprocessinginstruction(): void {}
  ontextentity(): void {}

  private characters(start: number, end: number, plain: boolean): void {
    // The tokenizer gives -1 for the start of a tag that the end of the text cuts off.
    if (start < 0 || this.ended || this.beyond > 0 || this.vocabulary === undefined) return;
    const { elements, vocabulary } = this;
    if (elements.frames.length === 1 && this.xml) return;
    if (vocabulary.unknown === 'skip' && !elements.top.takesText) return;
    elements.characters(this.base + start, this.base + end, plain);
  }

  private opened(tagEnd: number, isEmpty: boolean): void {
    const { tag, elements } = this;
    if (this.ended) return;
    if (this.vocabulary === undefined) {
      if (!this.start()) return;
    } else if (this.meets()) return;
    const vocabulary = this.vocabulary!;
    if (this.beyond > 0 || elements.frames.length > DEEPEST) {
      if (!isEmpty && this.beyond++ === 0) this.reportTooDeep();
      return;
    }
    if (!this.xml) {
      if (this.foreign === 0) this.closeTo(keptAtStart(elements.frames, tag.name), tag.start);
      if (tag.name === 'html' || tag.name === 'body') elements.language ??= ownLanguage(tag);
    }
    if (vocabulary === HTML && tag.name === 'meta') elements.language ??= metaLanguage(tag);
    const role = this.roleOf(vocabulary);
    elements.open(tag, role, vocabulary, tagEnd);
    if (isEmpty) this.closeTo(elements.frames.length - 1, tagEnd);
    else if (this.foreign === 0 && (tag.name === 'svg' || tag.name === 'math'))
      this.foreign = elements.frames.length - 1;
  }

  /** Keeps a checkpoint at the tag, if it is one; true where the reading before can go on for this one. */
  private meets(): boolean {
    const { elements, tag, before, checkpoints } = this;
    if (this.beyond > 0 || this.foreign > 0 || (this.xml && elements.frames.length === 1)) return false;
    const isDue = tag.start - (checkpoints.at(-1)?.at ?? -LEAST_DISTANCE) >= LEAST_DISTANCE;
    const candidate = before && tag.start >= before.from ? lastUpTo(before.checkpoints, tag.start - before.delta) : -1;
    const there = candidate < 0 ? undefined : before!.checkpoints[candidate]!;
    const isKnown = there !== undefined && there.at === tag.start - before!.delta;
    if (!isDue && !isKnown) return false;
    const here = elements.checkpoint(tag.start);
    if (!here) return false;
    if (isKnown && isSameState(here, there)) {
      this.meeting = { here, there: candidate };
      this.ended = true;
      this.tokenizer.pause();
      return true;
    }
    if (isDue) checkpoints.push(here);
    return false;
  }

  private closeTo(kept: number, tagEnd: number): void {
    this.elements.closeTo(kept, tagEnd);
    if (this.foreign >= kept) this.foreign = 0;
  }

  /** Takes the root element's start tag; false where the document holds no prose. */
  private start(): boolean {
    const { tag } = this;
    const vocabulary = recognise(tag, this.prolog.doctype, this.uri, this.text);
    this.vocabulary = vocabulary;
    this.ended = vocabulary === undefined;
    this.root = tag.copy();
    this.rootPrefix = prefixOf(tag.name);
    this.elements.language = ownLanguage(tag);
    return !this.ended;
  }

  private roleOf(vocabulary: Vocabulary): ElementRole {
    const { name } = this.tag;
    const colon = name.indexOf(':');
    const parent = this.elements.top;
    if (colon < 0) return roleOf(vocabulary, parent, name);
    const known = name.startsWith(this.rootPrefix) && this.rootPrefix !== '';
    if (!known && this.xml && !vocabulary.extensions.has(name.slice(0, colon))) return HIDDEN;
    return roleOf(vocabulary, parent, name.slice(colon + 1));
  }

  private reportTooDeep(): void {
    if (this.problems.length > 0) return;
    const span = { start: this.tag.start, end: this.tag.start + this.tag.name.length + 1 };
    this.problems.push({ span, message: `Text nested more than ${DEEPEST} levels deep is not read.` });
  }
}

/** True where a document holds prose of its own: in a vocabulary that is not known, only by its paragraphs. */
export function isProse(vocabulary: Vocabulary | undefined, paragraphs: number): boolean {
  return vocabulary !== OTHER || paragraphs > 0;
}

function prefixOf(name: string): string {
  return name.slice(0, name.indexOf(':') + 1);
}

/** The language of the whole document; an empty attribute there is rather a template's than a statement. */
function ownLanguage(tag: StartTag): string | undefined {
  const language = tag.language();
  return language === UNDETERMINED ? undefined : language;
}

/** The language that a page's head states for want of an attribute (HTML Standard, "Pragma directives"). */
function metaLanguage(tag: StartTag): string | undefined {
  if (tag.attribute('http-equiv')?.toLowerCase() !== 'content-language') return undefined;
  return writtenTag(tag.attribute('content') ?? '');
}
