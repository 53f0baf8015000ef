// Prose that stands inside the strings of another format: a decoded text with a map to the source, and its blocks lifted out.
import { OPAQUE, pieceAt, sourceEnd, sourceStart, type ProseBlock } from './prose.js';

/**
 * A text decoded from a source. `pieces` holds triples (offset in `text`, offset in the source, length in the source),
 * ascending: a piece as long in the source as in the text runs in step with it, any other stands for its source as a whole.
 */
export interface Embedded {
  readonly text: string;
  readonly pieces: Uint32Array;
}

/** Collects a decoded text from left to right. Offsets given to its methods are offsets into the source. */
export class EmbeddedBuilder {
  private text = '';
  private readonly pieces: number[] = [];

  constructor(private readonly source: string) {}

  /** Adds `[from, to)` of the source as it is written. */
  run(from: number, to: number): void {
    if (from < to) this.put(this.source.slice(from, to), from, to);
  }

  /** Adds `text` in the place of `[from, to)` of the source, as a whole. */
  substitute(text: string, from: number, to: number): void {
    if (text !== '') this.put(text, from, to);
  }

  finish(): Embedded {
    return { text: this.text, pieces: new Uint32Array(this.pieces) };
  }

  private put(text: string, from: number, to: number): void {
    this.pieces.push(this.text.length, from, to - from);
    this.text += text;
  }
}

/** Blocks that were read from a decoded text, at their places in the source. */
export function liftBlocks(blocks: readonly ProseBlock[], embedded: Embedded): ProseBlock[] {
  const map = new SourceMap(embedded);
  return blocks.map((block) => {
    const { content } = block;
    const start = map.start(block.start);
    const pieces: number[] = [];
    for (let i = 0; i < content.pieces.length; i += 3) {
      const at = content.pieces[i]!;
      const from = block.start + content.pieces[i + 1]!;
      const length = content.pieces[i + 2]!;
      const textEnd = content.pieces[i + 3] ?? content.text.length;
      if (textEnd - at === length && content.text[at] !== OPAQUE) {
        map.steps(from, from + length, (offset, source, sourceLength) =>
          pieces.push(at + offset - from, source - start, sourceLength),
        );
      } else {
        const source = map.start(from);
        pieces.push(at, source - start, map.end(from + length) - source);
      }
    }
    const sourceLength = map.end(block.start + content.sourceLength) - start;
    return { start, content: { ...content, pieces: new Uint32Array(pieces), sourceLength } };
  });
}

/** The map of a decoded text, asked as that of a block of prose is. */
class SourceMap {
  private readonly block: ProseBlock;

  constructor({ text, pieces }: Embedded) {
    const content = { kind: 'paragraph', level: 0, zones: 0, marks: [], links: [], sourceLength: 0 } as const;
    this.block = { start: 0, content: { ...content, text, pieces } };
  }

  start(offset: number): number {
    return sourceStart(this.block, offset);
  }

  end(offset: number): number {
    return sourceEnd(this.block, offset);
  }

  /** Visits the pieces that `[from, to)` of the text touches, cut to it: offset in the text, place and length in the source. */
  steps(from: number, to: number, visit: (offset: number, source: number, sourceLength: number) => void): void {
    const { text, pieces } = this.block.content;
    for (let i = pieceAt(pieces, from); i < pieces.length && pieces[i]! < to; i += 3) {
      const at = Math.max(from, pieces[i]!);
      const end = Math.min(to, pieces[i + 3] ?? text.length);
      const source = this.start(at);
      visit(at, source, this.end(end) - source);
    }
  }
}
