// The arguments of commands: which are skipped, and which are read as text or as blocks of their own.
import type { BlockRole } from '../content.js';
import { Zone } from '../zones.js';
import type { Command } from './command.js';
import { Frame } from './frames.js';
import { languageTag } from './languages.js';
import type { Page } from './page.js';

const LONGEST_OVERLAY = 80;
/** What the keys of a glossary entry are, where they are text. */
const ENTRY_KEYS: Readonly<Record<string, BlockRole>> = {
  name: { kind: 'definedTerm', level: 0, zones: Zone.definedTerm, glossary: 'headword' },
  short: { kind: 'definedTerm', level: 0, zones: Zone.definedTerm, glossary: 'headword' },
  long: { kind: 'definedTerm', level: 0, zones: Zone.definedTerm, glossary: 'alsoCalled' },
  description: { kind: 'definition', level: 0, zones: 0, glossary: 'definition' },
};
const CAPTION: BlockRole = { kind: 'caption', level: 0, zones: 0 };

/** A command whose arguments are being read. */
export interface Call {
  readonly command: Command;
  readonly name: string;
  /** The offset of its backslash. */
  readonly start: number;
  /** The letters of the arguments that are left. */
  readonly signature: string;
  /** How many text arguments came before. */
  readonly index: number;
}

/** Reads arguments. */
export class ArgumentReader {
  constructor(
    private readonly page: Page,
    /** Reads a stretch of the text token by token. */
    private readonly readAll: (from: number, to: number) => void,
  ) {}

  /** Takes the arguments of a call from `behind`. Ends behind the last, or inside the first that is read as text. */
  take(call: Call, behind: number): number {
    const { command, name, start, signature } = call;
    const { page } = this;
    let at = behind;
    let first: string | undefined;
    for (let i = 0; i < signature.length; i++) {
      const letter = signature[i]!;
      if (letter === '*') at += page.text[at] === '*' ? 1 : 0;
      else if (letter === 'o' || letter === 'k') at = this.option(at, letter === 'k');
      else if (letter === 'p') at = this.enclosed(at, '(', ')');
      else if (letter === 'd') at = this.enclosed(at, '<', '>');
      else if (letter === 'v') at = this.verbatim(at);
      else {
        const open = page.scanner.argument(at, '{');
        if (open >= 0 && letter === 't') return this.open({ ...call, signature: signature.slice(i + 1) }, open, first);
        const end = open < 0 ? -1 : this.group(open, name);
        if (letter === 'g' && end > 0) this.glossaryEntry(open + 1, end - 1);
        else if (end > 0) first ??= page.text.slice(open + 1, end - 1);
        at = end > 0 ? end : letter === 'm' ? this.token(at) : at;
      }
    }
    if (command.flow === 'opaque') page.opaque(start, at);
    else if (command.flow === 'space') page.out.space(start, at);
    return at;
  }

  /** Behind the blanks that a control word ends with; a blank line stays. */
  afterWord(at: number): number {
    const { text, scanner } = this.page;
    let end = at;
    while (text[end] === ' ' || text[end] === '\t') end++;
    if (text[end] !== '\n' || scanner.isBlankLine(end + 1)) return end;
    end++;
    while (text[end] === ' ' || text[end] === '\t') end++;
    return end;
  }

  /** Reads the captions and titles among the options in `[from, to)`. */
  captions(from: number, to: number): void {
    for (const { key, start, end } of this.page.scanner.options(from, to)) {
      if (key === 'caption' || key === 'title') this.readApart(start, end, CAPTION);
    }
  }

  private option(at: number, hasCaptions: boolean): number {
    const { scanner } = this.page;
    const open = scanner.argument(at, '[');
    const end = open < 0 ? -1 : scanner.optionEnd(open);
    if (end < 0) return at;
    if (hasCaptions) this.captions(open + 1, end - 1);
    return end;
  }

  private enclosed(at: number, opening: string, closing: string): number {
    const { scanner, text } = this.page;
    const open = scanner.argument(at, opening);
    const length = open < 0 ? -1 : text.slice(open, open + LONGEST_OVERLAY).indexOf(closing);
    return length < 0 ? at : open + length + 1;
  }

  private verbatim(at: number): number {
    const { scanner } = this.page;
    const brace = scanner.argument(at, '{');
    const end = scanner.verbatimEnd(brace < 0 ? at : brace);
    return end < 0 ? at : end;
  }

  private group(open: number, name: string): number {
    const { page } = this;
    const end = page.scanner.groupEnd(open);
    if (end >= 0) return end;
    page.report(open, `The argument of \\${name} is not closed.`);
    return page.scanner.lineEnd(open);
  }

  /** Behind a control sequence that is an argument without braces; `at` itself where there is none. */
  private token(at: number): number {
    const { text, scanner } = this.page;
    const from = this.afterWord(at);
    return text[from] === '\\' ? from + 1 + scanner.controlName(from).length : at;
  }

  /** Opens the argument at `open`; `first` is the first of those that were skipped. */
  private open(call: Call, open: number, first: string | undefined): number {
    const { page } = this;
    if (page.isDeep) return page.group(open);
    const { command, name, index, signature: rest } = call;
    const { flow, kinds, zones, level, glossary, links } = command;
    const frame = new Frame('argument', name, open, page.top);
    frame.command = command;
    frame.rest = rest;
    frame.index = index;
    if (flow === 'block' || flow === 'aside') {
      if (flow === 'aside') page.out.suspend();
      else page.out.flush();
      frame.kind = kinds[Math.min(index, kinds.length - 1)]!;
      frame.level = frame.kind === 'heading' ? level : 0;
      frame.glossary = glossary?.[Math.min(index, glossary.length - 1)];
      frame.blockZones = (frame.blockZones & (Zone.quotation | Zone.safetyMessage)) | zones;
      frame.inlineZones = 0;
    } else {
      if (links && first !== undefined) frame.link = { target: first, from: page.out.length };
      const named = command.language === 'named' ? languageTag(first ?? '') : command.language;
      const foreign = named !== undefined && page.isForeign(named) ? Zone.quotation : 0;
      frame.inlineZones |= zones | foreign | (frame.link ? Zone.linkText : 0);
    }
    page.push(frame);
    return open + 1;
  }

  /** Reads the texts of a glossary entry from its options in `[from, to)`. */
  private glossaryEntry(from: number, to: number): void {
    for (const { key, start, end } of this.page.scanner.options(from, to)) {
      if (Object.hasOwn(ENTRY_KEYS, key)) this.readApart(start, end, ENTRY_KEYS[key]!);
    }
  }

  /** Reads `[from, to)` as blocks of their own. */
  private readApart(from: number, to: number, { kind, level, zones, glossary }: BlockRole): void {
    const { page } = this;
    if (page.isDeep) return;
    const kept = page.frames.length;
    page.out.suspend();
    const frame = new Frame('environment', '', from);
    frame.language = page.top.language;
    frame.kind = kind;
    frame.level = level;
    frame.glossary = glossary;
    frame.blockZones = zones;
    frame.content = 'blocks';
    page.push(frame);
    this.readAll(from, to);
    page.closeTo(kept);
    page.out.resume();
  }
}
