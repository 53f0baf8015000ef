// What is open at a place of a LaTeX document, and what that means for the text there.
import type { BlockKind, GlossaryPart } from '../prose.js';
import { CLOSED_ZONES, type ZoneSet } from '../zones.js';
import type { Command, Content } from './command.js';

/** What opens a frame; the ground is what all others stand on. */
export type FrameType = 'ground' | 'group' | 'argument' | 'label' | 'environment';

/** One open group, argument or environment. In a new one text is what it is around it; who opens it says what differs. */
export class Frame {
  /** What a block of text in it is; an item changes it. */
  kind: BlockKind = 'paragraph';
  /** The heading's level from 1, else 0. */
  level = 0;
  blockZones: ZoneSet = 0;
  inlineZones: ZoneSet = 0;
  /** The language of text in it where the source states one. */
  language: string | undefined = undefined;
  glossary: GlossaryPart | undefined = undefined;
  content: Content = 'inline';
  /** True where items are entries of a glossary. */
  isGlossary = false;
  /** Of an argument: its command, the arguments that follow, and how many text arguments came before. */
  command: Command | undefined = undefined;
  rest = '';
  index = 0;
  link: { readonly target: string; readonly from: number } | undefined = undefined;

  constructor(
    readonly type: FrameType,
    /** The name of its command or environment. */
    readonly name: string,
    /** The source offset at which it opens. */
    readonly start: number,
    parent?: Frame,
  ) {
    if (!parent) return;
    this.kind = parent.kind;
    this.level = parent.level;
    this.blockZones = parent.blockZones;
    this.inlineZones = parent.inlineZones;
    this.language = parent.language;
    this.glossary = parent.glossary;
  }
}

/** True where a paragraph's end inside the frame means that its end was forgotten. */
export function endsWithParagraph({ type, command, kind, link }: Frame): boolean {
  if (type === 'label' || link !== undefined) return true;
  if (type !== 'argument' || command === undefined) return false;
  if (command.flow === 'block') return kind === 'heading' || kind === 'caption' || kind === 'definedTerm';
  return command.flow === 'inline' && command.zones !== 0;
}

/** True where a section cannot begin inside the frame. */
export function endsBeforeSection(frame: Frame): boolean {
  const { type, content, blockZones } = frame;
  if (type !== 'environment') return endsWithParagraph(frame);
  return content === 'items' || content === 'terms' || content === 'table' || (blockZones & CLOSED_ZONES) !== 0;
}
