// From offsets to lines and back: zero-based lines and UTF-16 columns; \n, \r\n and \r end a line.

/** A zero-based place in a text; `character` counts UTF-16 code units. */
export interface Position {
  readonly line: number;
  readonly character: number;
}

/** The starts of a text's lines. Offsets beyond either end are clamped, as the Language Server Protocol asks. */
export class LineIndex {
  private readonly starts: Uint32Array;

  constructor(private readonly text: string) {
    this.starts = new Uint32Array(text.includes('\r') ? startsAnyBreak(text) : startsLineFeed(text));
  }

  get lineCount(): number {
    return this.starts.length;
  }

  /** The place of an offset. */
  positionAt(offset: number): Position {
    const clamped = Math.max(0, Math.min(offset, this.text.length));
    let low = 0;
    let high = this.starts.length - 1;
    while (low < high) {
      const middle = (low + high + 1) >>> 1;
      if (this.starts[middle]! <= clamped) low = middle;
      else high = middle - 1;
    }
    return { line: low, character: clamped - this.starts[low]! };
  }

  /** The offset of a place; a column beyond the line's text falls on its end, before the line break. */
  offsetAt({ line, character }: Position): number {
    if (line < 0) return 0;
    if (line >= this.starts.length) return this.text.length;
    const start = this.starts[line]!;
    return Math.min(start + Math.max(0, character), this.lineEnd(line));
  }

  /** The text of a line without its line break. */
  lineText(line: number): string {
    return this.text.slice(this.starts[line] ?? this.text.length, this.lineEnd(line));
  }

  private lineEnd(line: number): number {
    let end = line + 1 < this.starts.length ? this.starts[line + 1]! : this.text.length;
    const start = this.starts[line] ?? end;
    if (line + 1 < this.starts.length) {
      if (end > start && this.text.charCodeAt(end - 1) === 10) end--;
      if (end > start && this.text.charCodeAt(end - 1) === 13) end--;
    }
    return end;
  }
}

/** Made after each keystroke for the whole text, so the common case leaves the search to the engine of the language. */
function startsLineFeed(text: string): number[] {
  const starts = [0];
  for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) starts.push(at + 1);
  return starts;
}

function startsAnyBreak(text: string): number[] {
  const starts = [0];
  for (let i = 0; i < text.length; i++) {
    const unit = text.charCodeAt(i);
    if (unit === 10 || (unit === 13 && text.charCodeAt(i + 1) !== 10)) starts.push(i + 1);
  }
  return starts;
}
