// Reads HTML and XML documentation whole: what stands before the root, then the stream of its tags and text.
import type { SourceText } from '../../text/sourceText.js';
import { readFrontMatter } from '../markdown/frontMatter.js';
import { normalise } from '../normalise.js';
import { keepContents, type Reading } from '../reading.js';
import { readProlog } from './prolog.js';
import { MarkupStream } from './stream.js';

/** Reads a document in HTML, or in XML of any vocabulary that is prose. */
export function readMarkup(source: SourceText): Reading {
  const text = normalise(source.text);
  const start = text.charCodeAt(0) === 0xfeff ? 1 : 0;
  return source.format === 'xml' ? readXml(source, text, start) : readHtml(source, text, start);
}

/** Reads again; equal blocks at either end keep their content objects. */
export function rereadMarkup(previous: Reading, source: SourceText): Reading {
  const reading = readMarkup(source);
  return { source, prose: { ...reading.prose, blocks: keepContents(previous.prose.blocks, reading.prose.blocks) } };
}

function readXml(source: SourceText, text: string, start: number): Reading {
  const prolog = readProlog(text, start);
  const stream = new MarkupStream(text, source.uri, prolog, true);
  stream.read(prolog.end);
  return { source, prose: { blocks: stream.blocks(), problems: stream.problems, language: stream.language } };
}

/** Pages that a generator fills in can begin with front matter, as those in Markdown do. */
function readHtml(source: SourceText, text: string, start: number): Reading {
  const matter = readFrontMatter(text, start);
  const stream = new MarkupStream(text, source.uri, { end: start, doctype: '', entities: new Set() }, false);
  stream.read(matter?.end ?? start);
  const blocks = [...(matter?.blocks ?? []), ...stream.blocks()];
  return { source, prose: { blocks, problems: stream.problems, language: matter?.language ?? stream.language } };
}
