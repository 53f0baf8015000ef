// Follows LaTeX from token to token: what each opens, closes or puts into the text.
import { textStart } from '../normalise.js';
import type { ProseBlock, ReadingProblem } from '../prose.js';
import { ArgumentReader } from './argumentReader.js';
import type { Command } from './command.js';
import { COMMANDS_BY_NAME } from './commands.js';
import { definitionsIn } from './definitions.js';
import { EnvironmentReader } from './environmentReader.js';
import { isSameLanguage, languageTag, namedLanguage, statedLanguage } from './languages.js';
import { Page } from './page.js';
import { Scanner } from './scanning.js';
import { accented, accentOf, germanShorthand, symbolOf } from './symbols.js';
import { addressAt, isPlainUnit } from './text.js';
import { skippedBy, unknownCommand } from './unknown.js';

const BODY = '\\begin{document}';
/** Commands before the document's body whose text the reader of the page sees. */
const IN_PREAMBLE =
  /\\(?:title|subtitle|newglossaryentry|provideglossaryentry|longnewglossaryentry|newacronym|newabbreviation|DeclareAcronym|acrodef)\b/g;

/** Reads one document in LaTeX. */
export class LatexReader {
  readonly language: string | undefined;
  private readonly page: Page;
  private readonly args: ArgumentReader;
  private readonly environments: EnvironmentReader;
  private readonly bodyFrom: number;

  /** `text` is a normalised source. */
  constructor(private readonly text: string) {
    const scanner = new Scanner(text);
    this.bodyFrom = bodyStart(text);
    this.language = statedLanguage(text.slice(0, this.bodyFrom));
    this.page = new Page(scanner, definitionsIn(scanner), this.language);
    this.args = new ArgumentReader(this.page, (from, to) => this.readAll(from, to));
    this.environments = new EnvironmentReader(this.page, this.args);
  }

  get problems(): readonly ReadingProblem[] {
    return this.page.problems;
  }

  read(): void {
    this.readPreamble();
    this.readAll(this.bodyFrom, this.text.length);
    this.page.finish();
  }

  /** The blocks read, in the order of the source. */
  blocks(): ProseBlock[] {
    return this.page.out.sorted();
  }

  private readPreamble(): void {
    const { page } = this;
    let done = 0;
    let uncommentedTo = 0;
    for (const { index } of this.text.slice(0, this.bodyFrom).matchAll(IN_PREAMBLE)) {
      if (index < done) continue;
      if (isCommented(this.text, index, uncommentedTo)) {
        uncommentedTo = done = lineEnd(this.text, index);
        continue;
      }
      uncommentedTo = index;
      let at = this.controlSequence(index);
      while (page.frames.length > 1 && at < this.bodyFrom) at = this.step(at, this.bodyFrom);
      page.closeTo(1);
      page.out.flush();
      done = at;
    }
  }

  private readAll(from: number, to: number): void {
    for (let at = from; at < to && !this.page.isEnded;) at = this.step(at, to);
  }

  /** Reads what begins at `at`, and returns where it ends. */
  private step(at: number, to: number): number {
    const { text, page } = this;
    const { verbatimMarks } = page.definitions;
    const isPlain = (i: number): boolean =>
      isPlainUnit(text, i) && (verbatimMarks === '' || !verbatimMarks.includes(text[i]!));
    let end = at;
    while (end < to && isPlain(end)) end++;
    if (end > at) return this.plain(at, end);
    if (verbatimMarks.includes(text[at]!)) return this.verbatim(at);
    switch (text[at]) {
      case '\\':
        return this.controlSequence(at);
      case ' ':
      case '\t':
      case '\n':
      case '\f':
        return this.blanks(at);
      case '%':
        return this.comment(at);
      case '{':
        return page.group(at);
      case '}':
        return this.closeGroup(at);
      case '$':
        return this.dollar(at);
      case '&':
        if (page.top.content === 'table') page.out.flush();
        else page.out.space(at, at + 1);
        return at + 1;
      case '~':
        return page.put('\u00A0', at, at + 1);
      case '#':
        return at + (/[1-9]/.test(text[at + 1] ?? '') ? 2 : 1);
      case ']':
        if (page.top.type !== 'label') return page.run(at, at + 1);
        page.close();
        return at + 1;
      default:
        return this.mark(at);
    }
  }

  /** A mark that others like it, or what follows, can make another. */
  private mark(at: number): number {
    const { text, page } = this;
    const mark = text[at]!;
    const isDouble = text[at + 1] === mark;
    if (mark === '-' && isDouble) return text[at + 2] === '-' ? page.put('—', at, at + 3) : page.put('–', at, at + 2);
    if (mark === '`') return isDouble ? page.put('“', at, at + 2) : page.put('‘', at, at + 1);
    if (mark === "'" && isDouble) return page.put('”', at, at + 2);
    if (mark === '"') {
      const language = page.top.language ?? this.language;
      const isGerman = language !== undefined && isSameLanguage(language, 'de');
      const written = isGerman ? germanShorthand(text[at + 1] ?? '') : undefined;
      if (written !== undefined) return page.put(written, at, at + 2);
    }
    return page.run(at, at + 1);
  }

  /** Adds `[from, to)`, in which nothing is special; an address that begins in it can reach beyond. */
  private plain(from: number, to: number): number {
    let at = from;
    while (at < to) {
      const address = addressAt(this.text, at, to);
      this.page.run(at, address?.start ?? to);
      at = address ? this.page.opaque(address.start, address.end) : to;
    }
    return at;
  }

  private verbatim(at: number): number {
    const end = this.page.scanner.verbatimEnd(at);
    return end < 0 ? this.page.run(at, at + 1) : this.page.opaque(at, end);
  }

  private blanks(at: number): number {
    const { text, page } = this;
    let end = at;
    let lines = 0;
    for (; end < text.length; end++) {
      const unit = text.charCodeAt(end);
      if (unit === 10) lines++;
      else if (unit !== 32 && unit !== 9 && unit !== 12) break;
    }
    if (lines > 1) page.paragraph();
    else page.out.space(at, end);
    return end;
  }

  /** A comment takes its line break with it, and the blanks behind that. */
  private comment(at: number): number {
    const { text, page } = this;
    let end = page.scanner.lineEnd(at) + 1;
    while (text[end] === ' ' || text[end] === '\t') end++;
    if (text[end] === '\n') page.paragraph();
    return Math.min(end, text.length);
  }

  private closeGroup(at: number): number {
    const frame = this.page.closeGroup(at);
    if (!frame?.command || frame.rest === '') return at + 1;
    const { command, name, rest: signature, index } = frame;
    return this.args.take({ command, name, start: at + 1, signature, index: index + 1 }, at + 1);
  }

  private dollar(at: number): number {
    const { text, page } = this;
    const mark = text[at + 1] === '$' ? '$$' : '$';
    const last = page.scanner.paragraphEnd(at);
    for (let end = at + mark.length; end < last; end++) {
      if (text[end] === '\\') end++;
      else if (text[end] === '$' && text.startsWith(mark, end)) return page.opaque(at, end + mark.length);
    }
    return this.unendedFormula(at, last);
  }

  private formula(at: number, closing: string): number {
    const { page } = this;
    const end = page.scanner.find(closing, at + 2);
    const last = page.scanner.paragraphEnd(at);
    return end >= 0 && end < last ? page.opaque(at, end + 2) : this.unendedFormula(at, last);
  }

  private unendedFormula(at: number, last: number): number {
    this.page.report(at, 'A formula begins here that has no end in its paragraph.');
    return this.page.opaque(at, last);
  }

  private controlSequence(at: number): number {
    const { text, page, args } = this;
    const name = page.scanner.controlName(at);
    const behind = at + 1 + name.length;
    const accent = accentOf(name);
    const letter = accent === undefined ? undefined : accented(text, behind, accent);
    if (letter) return page.put(letter.text, at, letter.end);
    const isWord = /[A-Za-z@]/.test(name);
    const symbol = symbolOf(name);
    // A control word takes the blanks behind it.
    if (symbol !== undefined) return page.put(symbol, at, isWord ? args.afterWord(behind) : behind);
    if (!isWord) return this.controlSymbol(name, at, behind);
    if (name === 'begin' || name === 'end') return this.environments.tag(at, behind, name === 'begin');
    if (name === 'item') return this.environments.item(behind);
    if (name === 'selectlanguage') return this.selectLanguage(behind);
    if (name === 'par') page.paragraph();
    const skipped = skippedBy(name, page.scanner, behind);
    if (skipped !== undefined) return skipped;
    const known = page.definitions.commands.get(name) ?? COMMANDS_BY_NAME.get(name) ?? languageCommand(name);
    return this.call(known ?? unknownCommand(name, text, behind, page.out.isEmpty), name, at, behind);
  }

  private controlSymbol(name: string, at: number, behind: number): number {
    const { page } = this;
    if (name === '(' || name === '[') return this.formula(at, name === '(' ? '\\)' : '\\]');
    if (name === '\\') return this.lineBreak(at);
    if (name === ' ' || name === '\n' || name === '\t') page.out.space(at, behind);
    return behind;
  }

  private lineBreak(at: number): number {
    const { page, text } = this;
    let end = at + (text[at + 2] === '*' ? 3 : 2);
    end += /^\[[^\]\n]{0,40}\]/.exec(text.slice(end, end + 42))?.[0].length ?? 0;
    if (page.top.content === 'table') page.out.flush();
    else page.out.space(at, end);
    return end;
  }

  private call(command: Command, name: string, start: number, behind: number): number {
    const { page } = this;
    const { flow, signature, kinds, zones } = command;
    if (kinds[0] === 'heading') page.beforeSection();
    if (flow === 'block' || flow === 'break') page.out.flush();
    if (flow === 'declaration' && page.frames.length > 1) page.declareZones(zones);
    const end = this.args.take({ command, name, start, signature, index: 0 }, behind);
    return end === behind ? this.args.afterWord(end) : end;
  }

  private selectLanguage(behind: number): number {
    const { page, text } = this;
    const open = page.scanner.argument(behind, '{');
    const end = open < 0 ? -1 : page.scanner.groupEnd(open);
    if (end < 0) return behind;
    const tag = languageTag(text.slice(open + 1, end - 1));
    page.out.flush();
    if (tag !== undefined) page.top.language = tag;
    return end;
  }
}

/**
 * Where the body begins: behind `\begin{document}`, at the end where a class has no body yet, at the start in a file that
 * others take in.
 */
function bodyStart(text: string): number {
  const start = textStart(text);
  const classAt = uncommented(text, '\\document', 0);
  if (classAt < 0 || !/^(?:class|style)/.test(text.slice(classAt + 9, classAt + 14))) return start;
  const bodyAt = uncommented(text, BODY, classAt);
  return bodyAt < 0 ? text.length : bodyAt + BODY.length;
}

/** Where `what` stands at or behind `from` outside a comment, or -1. */
function uncommented(text: string, what: string, from: number): number {
  for (let at = text.indexOf(what, from); at >= 0; at = text.indexOf(what, at + 1)) {
    if (!isCommented(text, at)) return at;
    at = lineEnd(text, at);
  }
  return -1;
}

/** True in a comment; there is none at `from`, at or before `at`. */
function isCommented(text: string, at: number, from = 0): boolean {
  const before = text.slice(from, at);
  return /(?<!\\)%/.test(before.slice(before.lastIndexOf('\n') + 1));
}

function lineEnd(text: string, at: number): number {
  const end = text.indexOf('\n', at);
  return end < 0 ? text.length : end;
}

/** `\textgerman{…}` and its like, as polyglossia has them. */
function languageCommand(name: string): Command | undefined {
  const language = name.startsWith('text') ? namedLanguage(name.slice(4)) : undefined;
  if (language === undefined) return undefined;
  return { flow: 'inline', signature: 'ot', zones: 0, kinds: ['paragraph'], level: 0, language };
}
