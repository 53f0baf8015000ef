// The door to the readers: a text in, its prose out, whatever the format.
import type { SourceText } from '../text/sourceText.js';
import { readApiDescription, rereadApiDescription } from './apiDescription/apiDescription.js';
import { readAsciidoc, rereadAsciidoc } from './asciidoc/asciidoc.js';
import { readLatex, rereadLatex } from './latex/latex.js';
import { readMarkup, rereadMarkup } from './markup/markup.js';
import { readMarkdown, rereadMarkdown, type MarkdownReading } from './markdown/markdown.js';
import { readNotebook, rereadNotebook, type NotebookReading } from './notebook/notebook.js';
import { readPlaintext, rereadPlaintext } from './plaintext.js';
import type { Prose } from './prose.js';
import type { Reading } from './reading.js';
import { readRestructuredText, rereadRestructuredText } from './restructuredtext/restructuredtext.js';

export type { Reading } from './reading.js';

/** The prose of a document. Never throws: what cannot be read is left out and said in `problems`. */
export function read(source: SourceText): Prose {
  return startReading(source).prose;
}

/** Reads a document and keeps what {@link reread} needs. Never throws. */
export function startReading(source: SourceText): Reading {
  try {
    if (source.format === 'asciidoc') return readAsciidoc(source);
    if (source.format === 'restructuredtext') return readRestructuredText(source);
    if (source.format === 'html' || source.format === 'xml') return readMarkup(source);
    if (source.format === 'latex') return readLatex(source);
    if (source.format === 'notebook') return readNotebook(source);
    if (source.format === 'apiDescription') return readApiDescription(source);
    return source.format === 'markdown' || source.format === 'mdx' ? readMarkdown(source) : readPlaintext(source);
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
    if (source.format === 'plaintext') return rereadPlaintext(previous, source);
    if (source.format === 'html' || source.format === 'xml') return rereadMarkup(previous, source);
    if (source.format === 'latex') return rereadLatex(previous, source);
    if (source.format === 'notebook')
      return 'cells' in previous ? rereadNotebook(previous as NotebookReading, source) : startReading(source);
    if (source.format === 'apiDescription') return rereadApiDescription(previous, source);
    if (source.format === 'restructuredtext') return rereadRestructuredText(previous, source);
    if (source.format === 'asciidoc') return rereadAsciidoc(previous, source);
    return 'units' in previous ? rereadMarkdown(previous as MarkdownReading, source) : startReading(source);
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
