// Reads reStructuredText, as docutils and Sphinx understand it.
import type { SourceText } from '../../text/sourceText.js';
import { normalise } from '../normalise.js';
import { keepContents, type Reading } from '../reading.js';
import { Zone } from '../zones.js';
import { readBody } from './body.js';
import type { DocumentContext } from './context.js';
import { linesOf } from './lines.js';
import { targetsIn } from './targets.js';

/** Reads a whole document. */
export function readRestructuredText(source: SourceText): Reading {
  const text = normalise(source.text);
  const lines = linesOf(text);
  const cx: DocumentContext = {
    text,
    blocks: [],
    problems: [],
    titleStyles: [],
    targets: targetsIn(text),
    readBody: (inner, from, to, base, setting) => readBody(cx, inner, from, to, base, setting),
  };
  if (lines.count > 0)
    cx.readBody(lines, 0, lines.count, 0, { kind: 'paragraph', level: 0, zones: Zone.prose, depth: 0 });
  return { source, prose: { blocks: cx.blocks, problems: cx.problems, language: undefined } };
}

/** Reads again; equal blocks at either end keep their content objects. */
export function rereadRestructuredText(previous: Reading, source: SourceText): Reading {
  const reading = readRestructuredText(source);
  return { source, prose: { ...reading.prose, blocks: keepContents(previous.prose.blocks, reading.prose.blocks) } };
}
