// Reads HTML and XML documentation: what stands before the root, then the stream of its tags and text; again from where it changed.
import type { SourceText } from '../../text/sourceText.js';
import { readFrontMatter } from '../markdown/frontMatter.js';
import { normalise, textStart } from '../normalise.js';
import type { ProseBlock } from '../prose.js';
import { changeBetween, keepContents, type Change, type Reading } from '../reading.js';
import { lastUpTo, type Checkpoint } from './checkpoints.js';
import { readProlog, type Prolog } from './prolog.js';
import { recognise, type Root } from './recognise.js';
import type { Vocabulary } from './roles.js';
import { isProse, MarkupStream } from './stream.js';

/** A document in markup, and what is needed to read it again from where it changed. */
interface MarkupReading extends Reading {
  /** The normalised text. */
  readonly text: string;
  readonly head: Head;
  readonly root: Root | undefined;
  readonly vocabulary: Vocabulary | undefined;
  /** The language that the elements state. */
  readonly language: string | undefined;
  readonly paragraphs: number;
  /** Blocks behind the head, whether or not the document is documentation. */
  readonly blocks: readonly ProseBlock[];
  readonly checkpoints: readonly Checkpoint[];
}

/** What stands before the elements. */
interface Head {
  readonly prolog: Prolog;
  readonly blocks: readonly ProseBlock[];
  readonly language: string | undefined;
}

/** Reads a document in HTML, or in XML of any vocabulary that is prose. */
export function readMarkup(source: SourceText): Reading {
  return readWhole(source, normalise(source.text));
}

/**
 * Reads again, from the last place before the change at which no text was pending, to the first behind it at which the reader
 * knows what it knew there before.
 */
export function rereadMarkup(previous: Reading, source: SourceText): Reading {
  const text = normalise(source.text);
  const before = 'checkpoints' in previous ? (previous as MarkupReading) : undefined;
  const change = before && changeBetween(before.text, text);
  const reading = (change && readPart(before, source, text, change)) ?? readWhole(source, text);
  return { ...reading, prose: { ...reading.prose, blocks: keepContents(previous.prose.blocks, reading.prose.blocks) } };
}

function readWhole(source: SourceText, text: string): MarkupReading {
  const head = readHead(source, text);
  const stream = new MarkupStream(text, source.uri, head.prolog, source.format === 'xml');
  stream.read(head.prolog.end);
  const { root, vocabulary, language, paragraphs, checkpoints } = stream;
  const blocks = stream.allBlocks();
  const state = { text, head, root, vocabulary, language, paragraphs, blocks, checkpoints };
  return readingOf(source, state, stream.problems);
}

/** Pages that a generator fills in can begin with front matter, as those in Markdown do. */
function readHead(source: SourceText, text: string): Head {
  const start = textStart(text);
  if (source.format === 'xml') return { prolog: readProlog(text, start), blocks: [], language: undefined };
  const matter = readFrontMatter(text, start);
  const prolog = { end: matter?.end ?? start, doctype: '', entities: new Set<string>() };
  return { prolog, blocks: matter?.blocks ?? [], language: matter?.language };
}

/** The reading of a changed text; undefined where it has to be read whole. */
function readPart(
  before: MarkupReading,
  source: SourceText,
  text: string,
  { start, oldEnd, newEnd }: Change,
): MarkupReading | undefined {
  const { root, vocabulary, head } = before;
  const first = lastUpTo(before.checkpoints, start);
  if (first < 0 || vocabulary === undefined || before.prose.problems.length > 0) return undefined;
  if (readHead(source, text).prolog.end !== head.prolog.end || source.uri !== before.source.uri) return undefined;
  if (root && recognise(root, head.prolog.doctype, source.uri, text) !== vocabulary) return undefined;
  const checkpoint = before.checkpoints[first]!;
  const delta = newEnd - oldEnd;
  const known = { checkpoints: before.checkpoints, from: newEnd, delta };
  const isXml = source.format === 'xml';
  const stream = new MarkupStream(text, source.uri, head.prolog, isXml, { checkpoint, root, vocabulary }, known);
  stream.read(checkpoint.at);
  if (stream.problems.length > 0) return undefined;
  const { meeting } = stream;
  const there = meeting && before.checkpoints[meeting.there]!;
  const blocks = before.blocks.slice(0, checkpoint.blocks).concat(stream.allBlocks());
  const kept = { blocks: checkpoint.blocks, paragraphs: 0 };
  const checkpoints = before.checkpoints.slice(0, first).concat(shifted(stream.checkpoints, 0, kept));
  let { language, paragraphs } = stream;
  if (meeting && there) {
    const more = { blocks: blocks.length - there.blocks, paragraphs: meeting.here.paragraphs - there.paragraphs };
    checkpoints.push(...shifted(before.checkpoints.slice(meeting.there), delta, more));
    for (const block of before.blocks.slice(there.blocks)) {
      blocks.push(delta === 0 ? block : { start: block.start + delta, content: block.content });
    }
    language = before.language;
    paragraphs = before.paragraphs + more.paragraphs;
  }
  return readingOf(source, { text, head, root, vocabulary, language, paragraphs, blocks, checkpoints }, []);
}

/** Checkpoints as they are behind a text that grew. */
function shifted(
  checkpoints: readonly Checkpoint[],
  delta: number,
  more: { readonly blocks: number; readonly paragraphs: number },
): Checkpoint[] {
  return checkpoints.map((each) => ({
    ...each,
    at: each.at + delta,
    blocks: each.blocks + more.blocks,
    paragraphs: each.paragraphs + more.paragraphs,
  }));
}

type Known = Omit<MarkupReading, 'source' | 'prose'>;

function readingOf(source: SourceText, known: Known, problems: Reading['prose']['problems']): MarkupReading {
  const { head, vocabulary, paragraphs } = known;
  const blocks = isProse(vocabulary, paragraphs) ? [...head.blocks, ...known.blocks] : [...head.blocks];
  return { source, ...known, prose: { blocks, problems, language: head.language ?? known.language } };
}
