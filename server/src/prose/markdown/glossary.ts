// Glossaries in Markdown: what is a headword and what is said of it, in a section or page whose title says that it is one.
import { isGlossaryTitle, sendsOn } from '../glossary.js';
import type { BlockContent, GlossaryPart, ProseBlock } from '../prose.js';
import { CellPlaces } from './glossaryTable.js';
import { leadOf, splitAt, type Lead } from './lead.js';

/** Titles under which headings stand for entries too; the other titles head other things as often. */
const STRONG = /\bglossary\b|\bterminology\b/i;
const LONGER_TITLE = /^(?:[\p{L}\p{N}-]+ ){1,3}(?:glossary|terminology)$|^glossary (?:of|for) [^.:?]+$/iu;
/** Headings that part a glossary: a letter, a range of letters. */
const LETTERS = /^(?:\p{L}|\d|\p{L} ?[-–—] ?\p{L}|0 ?[-–—] ?9|#|numbers|symbols)$/iu;
const NO_ENTRY =
  /[?!]$|^(?:overview|introduction|see also|references?|further reading|next steps|related .*|contents)$/i;
const LONGEST_HEADWORD = 80;
/** Entries by which a list or a row of headings is known for a glossary's. */
const FEWEST = 2;

interface Section {
  readonly from: number;
  readonly to: number;
  readonly strong: boolean;
}

/**
 * The blocks with their parts in glossaries. An entry may be a definition list's, a row of a table headed *Term*, a paragraph or
 * list item that opens with its term in bold (split then into term and definition), or a heading with its first paragraph.
 * A term of which nothing is said has no part: without a definition it would seem a second name of the next.
 * @param source what the blocks' offsets count in
 */
export function withGlossary(blocks: ProseBlock[], source: string): ProseBlock[] {
  const sections = sectionsOf(blocks);
  if (sections.length === 0) return blocks;
  const result: ProseBlock[] = [];
  let at = 0;
  for (const section of sections) {
    for (; at < section.from; at++) result.push(blocks[at]!);
    for (const block of readSection(blocks.slice(section.from, section.to), source, section.strong)) result.push(block);
    at = section.to;
  }
  for (; at < blocks.length; at++) result.push(blocks[at]!);
  return result;
}

function sectionsOf(blocks: readonly ProseBlock[]): Section[] {
  const title = blocks.find(({ content }) => content.kind === 'title')?.content.text;
  if (title !== undefined && isTitle(title)) return [{ from: 0, to: blocks.length, strong: STRONG.test(title) }];
  const sections: Section[] = [];
  let open: { from: number; level: number; strong: boolean } | undefined;
  blocks.forEach(({ content }, i) => {
    if (content.kind !== 'heading') return;
    if (open && content.level <= open.level) {
      sections.push({ from: open.from, to: i, strong: open.strong });
      open = undefined;
    }
    if (!open && isTitle(content.text)) open = { from: i + 1, level: content.level, strong: STRONG.test(content.text) };
  });
  if (open) sections.push({ ...open, to: blocks.length });
  return sections;
}

function isTitle(text: string): boolean {
  return text.length < 60 && (isGlossaryTitle(text) || LONGER_TITLE.test(text.trim()));
}

function readSection(blocks: readonly ProseBlock[], source: string, strong: boolean): ProseBlock[] {
  const parts = new Array<GlossaryPart | undefined>(blocks.length);
  readDefinitionLists(blocks, parts);
  readTables(blocks, source, parts);
  const leads = blocks.map((block, i) => (parts[i] === undefined ? leadOf(block, source) : undefined));
  const hasLeads = leads.filter((lead) => lead !== undefined).length >= FEWEST;
  if (strong && !hasLeads && !parts.includes('headword')) readHeadings(blocks, parts);
  return blocks.flatMap((block, i) => {
    const lead = hasLeads ? leads[i] : undefined;
    if (lead) return splitEntry(block, lead);
    return [parts[i] === undefined ? block : asPart(block, parts[i])];
  });
}

function readDefinitionLists(blocks: readonly ProseBlock[], parts: (GlossaryPart | undefined)[]): void {
  for (let i = 0; i < blocks.length;) {
    let end = i;
    while (blocks[end]?.content.kind === 'definedTerm') end++;
    const isEntry = end > i && blocks[end]?.content.kind === 'definition';
    for (; isEntry && i < end; i++) parts[i] = 'headword';
    if (!isEntry) i = Math.max(end, i + 1);
    for (let first = true; isEntry && blocks[i]?.content.kind === 'definition'; first = false, i++)
      parts[i] = first ? saidBy(blocks[i]!) : 'definition';
  }
}

const HEADWORD_COLUMN = /^(?:terms?|words?|concepts?|names?|acronyms?|abbreviations?|expressions?)$/i;
const OTHER_COLUMNS: readonly (readonly [RegExp, GlossaryPart])[] = [
  [/^see$/i, 'see'],
  [/^(?:also (?:called|known as)|synonyms?|alias(?:es)?|other names?|aka)$/i, 'alsoCalled'],
];

function readTables(blocks: readonly ProseBlock[], source: string, parts: (GlossaryPart | undefined)[]): void {
  const places = new CellPlaces(source);
  let columns: (GlossaryPart | undefined)[] = [];
  let row = -1;
  blocks.forEach((block, i) => {
    const cell = block.content.kind === 'tableCell' ? places.of(block.start) : undefined;
    if (cell === undefined) {
      columns = [];
      return;
    }
    if (cell.isHeader) {
      if (cell.column === 0) columns = HEADWORD_COLUMN.test(block.content.text) ? ['headword'] : [];
      else if (columns.length > 0) columns[cell.column] = columnPart(block.content.text);
      return;
    }
    if (cell.column > 0) {
      if (row === cell.lineStart) parts[i] = columns[cell.column];
      return;
    }
    const next = blocks[i + 1];
    const following = next?.content.kind === 'tableCell' ? places.of(next.start) : undefined;
    const says = following?.lineStart === cell.lineStart && columns[following.column] !== undefined;
    row = columns[0] === 'headword' && says ? cell.lineStart : -1;
    if (row >= 0) parts[i] = 'headword';
  });
}

function columnPart(header: string): GlossaryPart {
  return OTHER_COLUMNS.find(([pattern]) => pattern.test(header.trim()))?.[1] ?? 'definition';
}

/** Headings of one level, each with its first paragraph. */
function readHeadings(blocks: readonly ProseBlock[], parts: (GlossaryPart | undefined)[]): void {
  const isEntry = ({ content }: ProseBlock): boolean =>
    content.kind === 'heading' && !LETTERS.test(content.text) && !isTitle(content.text);
  const level = blocks.find(isEntry)?.content.level;
  const entries: number[] = [];
  blocks.forEach((block, i) => {
    if (!isEntry(block) || block.content.level !== level || blocks[i + 1]?.content.kind !== 'paragraph') return;
    const { text } = block.content;
    if (text.length <= LONGEST_HEADWORD && !NO_ENTRY.test(text)) entries.push(i);
  });
  if (entries.length < FEWEST) return;
  for (const i of entries) {
    parts[i] = 'headword';
    parts[i + 1] = saidBy(blocks[i + 1]!);
  }
}

function saidBy({ content }: ProseBlock): GlossaryPart {
  return sendsOn(content.text) ? 'see' : 'definition';
}

/** Contents by what they were made of, so that what an edit leaves alone stays the same object. */
const made = new WeakMap<BlockContent, BlockContent>();
const parted = new WeakMap<BlockContent, readonly ProseBlock[]>();

function asPart(block: ProseBlock, glossary: GlossaryPart | undefined): ProseBlock {
  let content = made.get(block.content);
  if (content?.glossary !== glossary) {
    content = { ...block.content, glossary };
    made.set(block.content, content);
  }
  return { start: block.start, content: content! };
}

/** The term and the definition as blocks of their own; those kept count from the block's start. */
function splitEntry({ start, content }: ProseBlock, lead: Lead): ProseBlock[] {
  let parts = parted.get(content);
  if (parts === undefined) {
    const [term, definition] = splitAt(content, lead);
    parts = [
      { start: term.start, content: { ...term.content, kind: 'definedTerm', glossary: 'headword' } },
      {
        start: definition.start,
        content: { ...definition.content, kind: 'definition', glossary: saidBy(definition) },
      },
    ];
    parted.set(content, parts);
  }
  return parts.map((part) => ({ start: start + part.start, content: part.content }));
}
