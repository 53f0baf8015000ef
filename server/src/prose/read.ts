// The door to the readers: a text in, its prose out, whatever the format.
import type { Format, SourceText } from '../text/sourceText.js';
import { readApiDescription, rereadApiDescription } from './apiDescription/apiDescription.js';
import { readAsciidoc, rereadAsciidoc } from './asciidoc/asciidoc.js';
import { readLatex, rereadLatex } from './latex/latex.js';
import { readMarkup, rereadMarkup } from './markup/markup.js';
import { readMarkdown, rereadMarkdown } from './markdown/markdown.js';
import { readNotebook, rereadNotebook } from './notebook/notebook.js';
import { readPlaintext, rereadPlaintext } from './plaintext.js';
import type { Prose } from './prose.js';
import type { Reading } from './reading.js';
import { readRestructuredText, rereadRestructuredText } from './restructuredtext/restructuredtext.js';

export type { Reading } from './reading.js';

/** How one format is read, and read again. */
interface Reader {
  read(source: SourceText): Reading;
  reread(previous: Reading, source: SourceText): Reading;
}

/** A reader; where it keeps more than every reading has, `own` is a property by which its readings are known. */
function reader<Own extends Reading>(
  readWhole: (source: SourceText) => Own,
  reread: (previous: Own, source: SourceText) => Reading,
  own?: keyof Own & string,
): Reader {
  return {
    read: readWhole,
    reread: (previous, source) =>
      own === undefined || own in previous ? reread(previous as Own, source) : readWhole(source),
  };
}

const markdown = reader(readMarkdown, rereadMarkdown, 'units');
const markup = reader(readMarkup, rereadMarkup);

const READERS: Readonly<Record<Format, Reader>> = {
  markdown,
  mdx: markdown,
  notebook: reader(readNotebook, rereadNotebook, 'cells'),
  restructuredtext: reader(readRestructuredText, rereadRestructuredText, 'units'),
  asciidoc: reader(readAsciidoc, rereadAsciidoc, 'units'),
  html: markup,
  xml: markup,
  latex: reader(readLatex, rereadLatex),
  apiDescription: reader((source) => readApiDescription(source), rereadApiDescription, 'byText'),
  plaintext: reader(readPlaintext, rereadPlaintext, 'units'),
};

/** The prose of a document. Never throws: what cannot be read is left out and said in `problems`. */
export function read(source: SourceText): Prose {
  return startReading(source).prose;
}

/** Reads a document and keeps what {@link reread} needs. Never throws. */
export function startReading(source: SourceText): Reading {
  try {
    return READERS[source.format].read(source);
  } catch (error) {
    return unreadable(source, error);
  }
}

/**
 * Reads the document again after an edit: the same prose as {@link startReading} gives for `source`, at the cost of what
 * changed. Blocks that the edit leaves alone keep their {@link BlockContent} objects, so that whatever was
 * computed from them can be kept too. `previous` is not changed and can be read on from again. Never throws.
 */
export function reread(previous: Reading, source: SourceText): Reading {
  if (source.format !== previous.source.format) return startReading(source);
  try {
    return READERS[source.format].reread(previous, source);
  } catch (error) {
    return unreadable(source, error);
  }
}

/** A parser gave up, such as on nesting too deep for its stack: nothing is read, and the document says so. */
function unreadable(source: SourceText, error: unknown): Reading {
  const reason = error instanceof Error ? error.message : 'unknown error';
  const problem = {
    span: { start: 0, end: source.text.length },
    message: `The document could not be read (${reason}).`,
  };
  return { source, prose: { blocks: [], problems: [problem], language: undefined } };
}
