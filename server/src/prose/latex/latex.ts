// Reads LaTeX whole: from the body of the document, or from all of a file that others take in.
import type { SourceText } from '../../text/sourceText.js';
import { normalise } from '../normalise.js';
import { keepContents, type Reading } from '../reading.js';
import { LatexReader } from './latexReader.js';

/** Reads a document in LaTeX. */
export function readLatex(source: SourceText): Reading {
  const reader = new LatexReader(normalise(source.text));
  reader.read();
  return { source, prose: { blocks: reader.blocks(), problems: reader.problems, language: reader.language } };
}

/** Reads again; equal blocks at either end keep their content objects. */
export function rereadLatex(previous: Reading, source: SourceText): Reading {
  const reading = readLatex(source);
  return { source, prose: { ...reading.prose, blocks: keepContents(previous.prose.blocks, reading.prose.blocks) } };
}
