// The marks around inline text: monospace and passthroughs, which are no prose, and those of formatting, which vanish.

/** What stands at one unit of a text. */
export const Mark = {
  text: 0,
  hidden: 1,
  /** Begins something opaque that ends at `ends.get(at)`. */
  opaque: 2,
  inside: 3,
  /** These are the first of two units that a curved quotation mark stands for. */
  openDouble: 4,
  closeDouble: 5,
  openSingle: 6,
  closeSingle: 7,
} as const;

/** The marks of a text by offset, good until those of the next text are looked for. */
export interface Marks {
  readonly at: Uint8Array;
  readonly ends: ReadonlyMap<number, number>;
}

const LITERAL = /[`+$]|pass:/;
const FORMATTING = /[*_#^~]/;
const LETTER = /[\p{L}\p{N}\p{M}]/u;
const LONGEST_ROLE = 100;
const LONGEST_TIGHT = 200;

/**
 * Finds the marks of a paragraph's text. Rules as in AsciiDoc's "constrained" and "unconstrained" marks: a single mark opens
 * where no word stands before it and no blank behind it, and closes the other way round; a doubled one anywhere. Each search
 * for a mark that closes runs over the text once: where one fails, so do all that begin later.
 */
export function findMarks(text: string): Marks | undefined {
  const literal = LITERAL.test(text);
  const formatting = FORMATTING.test(text);
  if (!literal && !formatting) return undefined;
  const finder = new MarkFinder(text);
  if (literal) finder.literal();
  if (!formatting) return finder;
  for (const mark of ['*', '_', '#']) if (text.includes(mark)) finder.formatting(mark);
  for (const mark of ['^', '~']) if (text.includes(mark)) finder.tight(mark);
  return finder;
}

/** Marks of a usual text: one is read at a time, and the array for it costs more than finding them. */
const scratch = new Uint8Array(4096);

class MarkFinder implements Marks {
  readonly at: Uint8Array;
  readonly ends = new Map<number, number>();
  /** What was looked for in vain. */
  private readonly missing = new Set<string>();
  /** Quotation marks do not open again before the ones that are open close. */
  private readonly curvedUntil = { '"': 0, "'": 0 };

  constructor(private readonly text: string) {
    this.at = text.length > scratch.length ? new Uint8Array(text.length) : scratch.fill(0, 0, text.length);
  }

  /** Monospace, passthroughs and curved quotation marks, from left to right. */
  literal(): void {
    const { text } = this;
    for (let i = 0; i < text.length; i++) {
      switch (text.charCodeAt(i)) {
        case 96: // `
          if (this.at[i] === Mark.text) i = this.backtick(i);
          break;
        case 43: // +
          i = this.plus(i);
          break;
        case 36: // $
          if (text.startsWith('$$', i)) i = this.doubled(i, '$$');
          break;
        case 112: // p
          if (text.startsWith('pass:', i)) i = this.pass(i);
          break;
        default:
      }
    }
  }

  /** Each of these returns the offset of the last unit that it has dealt with. */
  private backtick(i: number): number {
    const { text } = this;
    const quote = text[i - 1];
    if ((quote === '"' || quote === "'") && this.at[i - 1] === Mark.text && this.curved(i, quote)) return i;
    if (text.startsWith('``', i)) {
      const end = this.doubled(i, '``');
      if (end > i + 1) return end;
    }
    if (!this.opens(i) || /["'`]/.test(quote ?? '')) return i;
    const tight = this.tightCode(i);
    const close = tight < 0 ? this.closing('`', i, /["'`]/) : tight;
    return close < 0 ? i : this.opaque(i, close + 1);
  }

  /**
   * The mark that ends code without a blank in it, whatever stands behind, or -1. AsciiDoc takes `` `Key`s `` and `` `Key`'s `` for text with
   * backticks in it, but their writers mean code.
   */
  private tightCode(i: number): number {
    const { text } = this;
    const most = Math.min(text.length, i + LONGEST_TIGHT);
    let close = i + 1;
    while (close < most && text[close] !== '`' && !isSpace(text, close)) close++;
    const ends = close > i + 1 && text[close] === '`' && text[close + 1] !== '`' && this.at[close] === Mark.text;
    return ends ? close : -1;
  }

  private curved(i: number, quote: '"' | "'"): boolean {
    const { text, at } = this;
    const before = this.roleStart(i - 1);
    if (i < this.curvedUntil[quote] || !mayStandBefore(text, before) || isSpace(text, i + 1)) return false;
    const closing = `\`${quote}`;
    if (this.missing.has(closing)) return false;
    for (let close = text.indexOf(closing, i + 2); close >= 0; close = text.indexOf(closing, close + 1)) {
      if (isSpace(text, close - 1) || isWord(text, close + 2)) continue;
      at[i - 1] = quote === '"' ? Mark.openDouble : Mark.openSingle;
      at[i] = Mark.hidden;
      at[close] = quote === '"' ? Mark.closeDouble : Mark.closeSingle;
      at[close + 1] = Mark.hidden;
      this.curvedUntil[quote] = close;
      return true;
    }
    this.missing.add(closing);
    return false;
  }

  private plus(i: number): number {
    const { text } = this;
    if (text.startsWith('+++', i)) {
      const end = this.doubled(i, '+++');
      if (end > i + 2) return end;
      return i + 2;
    }
    if (text.startsWith('++', i)) return this.doubled(i, '++');
    const close = this.opens(i) ? this.closing('+', i, undefined) : -1;
    return close < 0 ? i : this.opaque(i, close + 1);
  }

  /** Something opaque between two equal marks that may stand anywhere. */
  private doubled(i: number, mark: string): number {
    const { text } = this;
    const last = i + mark.length - 1;
    if (text[i - 1] === '\\' || this.missing.has(mark)) return last;
    let close = text.indexOf(mark, last + 2);
    if (close < 0) {
      this.missing.add(mark);
      return last;
    }
    // The last of several marks closes: ```` ``a``` ```` holds a backtick.
    while (text[close + mark.length] === mark[0] && mark !== '$$') close++;
    return this.opaque(i, close + mark.length);
  }

  private pass(i: number): number {
    const open = /^pass:[a-z,+-]{0,80}\[/.exec(this.text.slice(i, i + 90));
    if (!open || isWord(this.text, i - 1) || this.missing.has('pass')) return i;
    let close = this.text.indexOf(']', i + open[0].length);
    while (close > 0 && this.text[close - 1] === '\\') close = this.text.indexOf(']', close + 1);
    if (close >= 0) return this.opaque(i, close + 1);
    this.missing.add('pass');
    return i;
  }

  private opaque(from: number, to: number): number {
    this.hide(this.roleStart(from), from);
    this.at.fill(Mark.inside, from, to);
    this.at[from] = Mark.opaque;
    this.ends.set(from, to);
    return to - 1;
  }

  /** Pairs of `**` anywhere, then of `*` at the edges of words; likewise for the other marks of formatting. */
  formatting(mark: string): void {
    const { text, at } = this;
    const double = mark + mark;
    for (let i = this.free(double, 0); i >= 0;) {
      if (text[i - 1] === '\\') {
        i = this.free(double, i + 2);
        continue;
      }
      const close = this.free(double, i + 3);
      if (close < 0) break;
      this.hide(this.roleStart(i), i + 2);
      this.hide(close, close + 2);
      i = this.free(double, close + 2);
    }
    for (let i = this.free(mark, 0); i >= 0; i = this.free(mark, i + 1)) {
      if (!this.opens(i)) continue;
      const close = this.closing(mark, i, undefined);
      if (close < 0) {
        if (this.missing.has(mark)) break;
        continue;
      }
      this.hide(this.roleStart(i), i + 1);
      at[close] = Mark.hidden;
      i = close;
    }
  }

  /** Superscript and subscript: no blank between the marks. */
  tight(mark: string): void {
    const { text } = this;
    for (let i = this.free(mark, 0); i >= 0;) {
      let close = i + 1;
      while (close < text.length && text[close] !== mark && !isSpace(text, close)) close++;
      const paired = text[close] === mark && this.at[close] === Mark.text && close > i + 1 && text[i - 1] !== '\\';
      if (paired) {
        this.hide(this.roleStart(i), i + 1);
        this.at[close] = Mark.hidden;
      }
      i = this.free(mark, paired ? close + 1 : close);
    }
  }

  /** The next place of a mark that nothing else has taken, or -1. */
  private free(mark: string, from: number): number {
    let i = this.text.indexOf(mark, from);
    while (i >= 0 && (this.at[i] !== Mark.text || this.at[i + mark.length - 1] !== Mark.text))
      i = this.text.indexOf(mark, i + 1);
    return i;
  }

  private opens(i: number): boolean {
    return !isSpace(this.text, i + 1) && mayStandBefore(this.text, this.roleStart(i));
  }

  /** The mark that closes the one at `i`: no blank before it, no word (nor one of `not`) behind it. -1 where there is none. */
  private closing(mark: string, i: number, not: RegExp | undefined): number {
    const { text } = this;
    if (this.missing.has(mark)) return -1;
    for (let close = this.free(mark, i + 2); close >= 0; close = this.free(mark, close + 1)) {
      if (isSpace(text, close - 1) || isWord(text, close + 1)) continue;
      if (not === undefined || close + 1 >= text.length || !not.test(text[close + 1]!)) return close;
    }
    this.missing.add(mark);
    return -1;
  }

  /** Where the attribute list `[.role]` right before a mark begins; the mark's own place where there is none. */
  private roleStart(i: number): number {
    const { text } = this;
    if (text[i - 1] !== ']' || this.at[i - 1] !== Mark.text) return i;
    const least = Math.max(0, i - LONGEST_ROLE);
    for (let at = i - 2; at >= least; at--) {
      if (text[at] === '[') return at < i - 2 && this.at[at] === Mark.text && text[at - 1] !== '[' ? at : i;
      if (text[at] === ']') return i;
    }
    return i;
  }

  private hide(from: number, to: number): void {
    this.at.fill(Mark.hidden, from, to);
  }
}

/** True where the unit before `i` lets a single mark open. */
function mayStandBefore(text: string, i: number): boolean {
  return i === 0 || (!isWord(text, i - 1) && !';:}<>&\\'.includes(text[i - 1]!));
}

function isSpace(text: string, i: number): boolean {
  const unit = text.charCodeAt(i);
  return Number.isNaN(unit) || unit === 32 || (unit >= 9 && unit <= 13);
}

/** True where a letter, a digit or an underscore stands at `i`. */
export function isWord(text: string, i: number): boolean {
  const unit = text.charCodeAt(i);
  if (unit > 127) return LETTER.test(text[i]!);
  return (unit >= 97 && unit <= 122) || (unit >= 65 && unit <= 90) || (unit >= 48 && unit <= 57) || unit === 95;
}
