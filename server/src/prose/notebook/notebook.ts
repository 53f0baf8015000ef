// Reads Jupyter notebooks: the Markdown of their cells, at its places in the JSON file.
import { printParseErrorCode, visit, type ParseErrorCode } from 'jsonc-parser';
import type { Span } from '../../base/span.js';
import type { SourceText } from '../../text/sourceText.js';
import { liftBlocks } from '../embedded.js';
import { withGlossary } from '../markdown/glossary.js';
import { readMarkdown, type MarkdownOptions } from '../markdown/markdown.js';
import { normalise, textStart } from '../normalise.js';
import type { BlockKind, ProseBlock, ReadingProblem } from '../prose.js';
import { keepContents, type Reading } from '../reading.js';
import { Zone } from '../zones.js';
import { findCells, type Cell } from './cells.js';
import { decodeStrings } from './strings.js';

/** What one cell reads as; offsets count from the start of its source. */
interface CellReading {
  readonly blocks: readonly ProseBlock[];
  readonly problems: readonly ReadingProblem[];
  readonly language: string | undefined;
}

/** A notebook read; its cells by all that they depend on. */
export interface NotebookReading extends Reading {
  readonly cells: ReadonlyMap<string, CellReading>;
}

/** Reads a notebook. Where the file is no valid JSON nothing is read, since the places of its cells are not certain. */
export function readNotebook(source: SourceText, previous?: NotebookReading): NotebookReading {
  const text = normalise(source.text);
  const start = textStart(text);
  const broken = brokenJson(text.slice(start), start);
  if (broken) return failed(source, broken);
  const { cells, title } = findCells(text);
  if (cells === undefined) {
    const message = 'This is no notebook that can be read: it has no list of cells.';
    return failed(source, { span: { start, end: Math.min(start + 1, text.length) }, message });
  }
  const blocks: ProseBlock[] = [];
  const problems: ReadingProblem[] = [];
  const known = new Map<string, CellReading>();
  let language: string | undefined;
  cells.forEach((cell, index) => {
    if (cell.source.length === 0 || !isRead(cell, index)) return;
    const from = cell.source[0]!.start;
    const key = `${index === 0 ? '0' : ''}${cell.type}${cell.level} ${text.slice(from, cell.source.at(-1)!.end)}`;
    const reading = known.get(key) ?? previous?.cells.get(key) ?? readCell(text, cell, index === 0);
    known.set(key, reading);
    language ??= reading.language;
    for (const block of reading.blocks) blocks.push({ start: block.start + from, content: block.content });
    for (const { span, message } of reading.problems)
      problems.push({ span: { start: span.start + from, end: span.end + from }, message });
  });
  if (title) blocks.push(...readTitle(text, title));
  blocks.sort((a, b) => a.start - b.start);
  return { source, cells: known, prose: { blocks: withGlossary(blocks, text), problems, language } };
}

/** Reads a notebook again; cells that an edit left alone are not read. */
export function rereadNotebook(previous: NotebookReading, source: SourceText): NotebookReading {
  const reading = readNotebook(source, previous);
  return { ...reading, prose: { ...reading.prose, blocks: keepContents(previous.prose.blocks, reading.prose.blocks) } };
}

/** Of a raw cell at the start, front matter is read, as generators do that take notebooks for pages. */
function isRead({ type }: Cell, index: number): boolean {
  return type === 'markdown' || type === 'heading' || (type === 'raw' && index === 0);
}

function readCell(text: string, cell: Cell, isFirst: boolean): CellReading {
  const embedded = decodeStrings(text, cell.source);
  const options: MarkdownOptions = { frontMatter: isFirst, glossary: false };
  const { prose, frontMatter } = readMarkdown({ uri: '', format: 'markdown', text: embedded.text }, options);
  const kept = cell.type === 'raw' ? (frontMatter?.blocks ?? []) : prose.blocks;
  const from = cell.source[0]!.start;
  const toSource = liftBlocks(kept, embedded).map(({ start, content }) => ({ start: start - from, content }));
  const blocks = cell.type === 'heading' ? toSource.map((block) => asHeading(block, cell.level)) : toSource;
  const whole = { start: 0, end: cell.source.at(-1)!.end - from };
  const problems = cell.type === 'raw' ? [] : prose.problems.map(({ message }) => ({ span: whole, message }));
  return { blocks, problems, language: prose.language };
}

/** Heading cells of nbformat 3 hold the words of a heading alone. */
function asHeading(block: ProseBlock, level: number): ProseBlock {
  const { content } = block;
  if (content.kind !== 'paragraph') return block;
  return {
    ...block,
    content: { ...content, kind: 'heading', level: Math.max(1, level), zones: content.zones | Zone.heading },
  };
}

function readTitle(text: string, string: Span): ProseBlock[] {
  const embedded = decodeStrings(text, [string]);
  const { prose } = readMarkdown(
    { uri: '', format: 'markdown', text: embedded.text },
    { frontMatter: false, glossary: false },
  );
  const kind: BlockKind = 'title';
  return liftBlocks(prose.blocks, embedded).map(({ start, content }) => ({
    start,
    content: { ...content, kind, level: 0, zones: Zone.frontMatter },
  }));
}

/** The first error of a text that is no valid JSON, else undefined. */
function brokenJson(text: string, offset: number): ReadingProblem | undefined {
  try {
    JSON.parse(text);
    return undefined;
  } catch {
    let problem: ReadingProblem | undefined;
    const onError = (code: ParseErrorCode, start: number, length: number): void => {
      const end = Math.min(start + Math.max(length, 1), text.length);
      const reason = REASONS[printParseErrorCode(code)] ?? 'something unexpected stands here';
      problem ??= {
        span: { start: offset + Math.min(start, end), end: offset + end },
        message: `The notebook is no valid JSON and is not read: ${reason}.`,
      };
    };
    visit(text, { onError }, { disallowComments: true });
    const whole = {
      span: { start: offset, end: offset + text.length },
      message: 'The notebook is no valid JSON and is not read.',
    };
    return problem ?? whole;
  }
}

const REASONS: Partial<Record<string, string>> = {
  PropertyNameExpected: 'the name of a property is missing',
  ValueExpected: 'a value is missing',
  ColonExpected: 'a colon is missing',
  CommaExpected: 'a comma is missing',
  CloseBraceExpected: 'a closing brace is missing',
  CloseBracketExpected: 'a closing bracket is missing',
  EndOfFileExpected: 'something stands behind its end',
  InvalidCommentToken: 'JSON has no comments',
  UnexpectedEndOfComment: 'JSON has no comments',
  UnexpectedEndOfString: 'a string does not end',
  UnexpectedEndOfNumber: 'a number does not end',
  InvalidUnicode: 'an escaped character is not complete',
  InvalidEscapeCharacter: 'a backslash stands before a sign that it does not escape',
  InvalidCharacter: 'a character stands in a string that has to be escaped',
};

function failed(source: SourceText, problem: ReadingProblem): NotebookReading {
  return { source, cells: new Map(), prose: { blocks: [], problems: [problem], language: undefined } };
}
