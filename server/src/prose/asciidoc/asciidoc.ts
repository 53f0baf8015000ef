// Reads AsciiDoc: front matter, then the document; the whole, or what an edit touched.
import type { SourceText } from '../../text/sourceText.js';
import { gathered, readUnits, rereadUnits, type BlockwiseReading } from '../blockwise.js';
import { readFrontMatter, type FrontMatter } from '../markdown/frontMatter.js';
import { normalise, textStart } from '../normalise.js';
import { changeBetween } from '../reading.js';
import { AT_HEAD, Outermost, type Known } from './outermost.js';

/** A document read. */
export interface AsciidocReading extends BlockwiseReading<Known> {
  readonly frontMatter: FrontMatter | undefined;
}

/**
 * Reads an AsciiDoc document by its lines, after the AsciiDoc documentation (docs.asciidoctor.org/asciidoc). Every branch of a
 * preprocessor conditional is read; included files are documents of their own; attribute references stay opaque.
 */
export function readAsciidoc(source: SourceText): AsciidocReading {
  const text = normalise(source.text);
  const start = textStart(text);
  const frontMatter = readFrontMatter(text, start);
  const read = readUnits(new Outermost(text), text, frontMatter?.end ?? start, AT_HEAD);
  return assemble(source, text, frontMatter, read);
}

/** Reads a document again after an edit, with the same result as {@link readAsciidoc} gives for the new text. */
export function rereadAsciidoc(previous: AsciidocReading, source: SourceText): AsciidocReading {
  const text = normalise(source.text);
  const change = changeBetween(previous.text, text);
  if (!change) return { ...previous, source };
  const start = textStart(text);
  const frontMatter = readFrontMatter(text, start);
  const body = frontMatter?.end ?? start;
  const same = body === (previous.frontMatter?.end ?? textStart(previous.text)) && change.start >= body;
  const reread = same ? rereadUnits(new Outermost(text), previous, text, change, body) : undefined;
  if (reread) return assemble(source, text, frontMatter, reread, previous);
  const reading = readAsciidoc(source);
  return assemble(source, text, frontMatter, reading, previous);
}

function assemble(
  source: SourceText,
  text: string,
  frontMatter: FrontMatter | undefined,
  { units, final }: Pick<AsciidocReading, 'units' | 'final'>,
  previous?: AsciidocReading,
): AsciidocReading {
  const language = frontMatter?.language ?? final.language;
  const prose = { ...gathered(units, frontMatter?.blocks ?? [], previous?.prose.blocks), language };
  return { source, text, frontMatter, units, final, prose };
}
