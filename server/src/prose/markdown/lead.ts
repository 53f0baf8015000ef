// A block that opens with a term in bold and then says what it is: where the term ends and the rest begins, and both apart.
import type { BlockContent, LinkMark, ProseBlock, ZoneMark } from '../prose.js';
import { Zone } from '../zones.js';

/** Offsets into the block's text: the term is `[0, termEnd)`, what is said of it begins at `from`. */
export interface Lead {
  readonly termEnd: number;
  readonly from: number;
}

const BOLD = /\*\*|__|<(?:b|strong)\b/;
const BOLD_END = /\*\*|__|<\/(?:b|strong)\b/;
const SEPARATOR_INSIDE = /\s*[:–—]\s*$/;
const SEPARATOR = /\s*(?::|[–—]|--?(?=\s))\s*(?=\S)/y;
/** Words that open a remark in bold. */
const LABEL = /^(?:note|tip|hint|info|important|warning|caution|danger|notice|example|remark|attention|see also)s?$/i;
const LONGEST_TERM = 80;

/** How the block opens, or undefined where it is no paragraph or list item that opens so. */
export function leadOf(block: ProseBlock, source: string): Lead | undefined {
  const { kind, text, pieces } = block.content;
  if (kind !== 'paragraph' && kind !== 'listItem') return undefined;
  if (pieces.length < 6 || !BOLD.test(source.slice(block.start, block.start + pieces[1]!))) return undefined;
  let end = -1;
  for (let i = 3; i < pieces.length && pieces[i]! <= LONGEST_TERM; i += 3) {
    const gap = source.slice(block.start + pieces[i - 2]! + pieces[i - 1]!, block.start + pieces[i + 1]!);
    if (!BOLD_END.test(gap)) continue;
    end = pieces[i]!;
    break;
  }
  if (end <= 0) return undefined;
  const inside = SEPARATOR_INSIDE.exec(text.slice(0, end));
  const termEnd = inside ? inside.index : text.slice(0, end).trimEnd().length;
  let from = end;
  if (inside) while (from < text.length && text[from] === ' ') from++;
  else {
    SEPARATOR.lastIndex = end;
    if (!SEPARATOR.test(text)) return undefined;
    from = SEPARATOR.lastIndex;
  }
  const isTerm = termEnd > 0 && from < text.length && !LABEL.test(text.slice(0, termEnd).trim());
  return isTerm ? { termEnd, from } : undefined;
}

/** The term and what is said of it as blocks; their starts count from the block's start. */
export function splitAt(content: BlockContent, { termEnd, from }: Lead): [term: ProseBlock, said: ProseBlock] {
  const term = cut(content, 0, termEnd);
  const zones = content.zones | Zone.definedTerm;
  return [{ ...term, content: { ...term.content, zones } }, cut(content, from, content.text.length)];
}

/** `[from, to)` of a content as a block; neither lies inside a substitute. */
function cut(content: BlockContent, from: number, to: number): ProseBlock {
  const { pieces, text } = content;
  const kept: number[] = [];
  let start = -1;
  let end = 0;
  for (let i = 0; i < pieces.length; i += 3) {
    const at = pieces[i]!;
    const textEnd = pieces[i + 3] ?? text.length;
    if (textEnd <= from || at >= to) continue;
    const isWhole = at >= from && textEnd <= to;
    const skipped = Math.max(0, from - at);
    const source = pieces[i + 1]! + skipped;
    const length = isWhole ? pieces[i + 2]! : Math.min(textEnd, to) - Math.max(at, from);
    if (start < 0) start = source;
    kept.push(Math.max(at, from) - from, source - start, length);
    end = source + length;
  }
  const inside = <Mark extends ZoneMark | LinkMark>(marks: readonly Mark[]): Mark[] =>
    marks
      .filter((mark) => mark.end > from && mark.start < to)
      .map((mark) => ({ ...mark, start: Math.max(mark.start, from) - from, end: Math.min(mark.end, to) - from }));
  return {
    start,
    content: {
      ...content,
      text: text.slice(from, to),
      marks: inside(content.marks),
      links: inside(content.links),
      pieces: new Uint32Array(kept),
      sourceLength: (to === text.length ? content.sourceLength : end) - start,
    },
  };
}
