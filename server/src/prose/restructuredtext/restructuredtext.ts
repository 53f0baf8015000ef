// Reads reStructuredText, as docutils and Sphinx understand it: the whole document, or what an edit touched.
import type { SourceText } from '../../text/sourceText.js';
import { gathered, readUnits, rereadUnits, type BlockwiseReading } from '../blockwise.js';
import { normalise, textStart } from '../normalise.js';
import { changeBetween } from '../reading.js';
import { docinfoLanguage } from './docinfo.js';
import { NOTHING_KNOWN, Outermost, type Known } from './outermost.js';
import { hasTargets, targetsIn } from './targets.js';

/** A document read; the targets are those that its references may stand for. */
export interface RestructuredTextReading extends BlockwiseReading<Known> {
  readonly targets: ReadonlyMap<string, string>;
}

/** Reads a whole document. */
export function readRestructuredText(source: SourceText): RestructuredTextReading {
  const text = normalise(source.text);
  const targets = targetsIn(text);
  const read = readUnits(new Outermost(text, targets), text, textStart(text), NOTHING_KNOWN);
  return assemble(source, text, read, targets);
}

/** Reads a document again after an edit, with the same result as {@link readRestructuredText} gives for the new text. */
export function rereadRestructuredText(previous: RestructuredTextReading, source: SourceText): RestructuredTextReading {
  const text = normalise(source.text);
  const change = changeBetween(previous.text, text);
  if (!change) return { ...previous, source };
  const body = textStart(text);
  if (body !== textStart(previous.text)) return rereadWhole(previous, source);
  const { targets } = previous;
  const reread = rereadUnits(new Outermost(text, targets), previous, text, change, body);
  if (!reread) return rereadWhole(previous, source);
  // References anywhere depend on the targets, whose statements stand on lines of their own.
  const before = previous.text.slice(reread.from, reread.oldTo);
  const after = text.slice(reread.from, reread.newTo);
  if ((hasTargets(before) || hasTargets(after)) && !sameTargets(targetsIn(before), targetsIn(after))) {
    return rereadWhole(previous, source);
  }
  return assemble(source, text, reread, targets, previous);
}

function rereadWhole(previous: RestructuredTextReading, source: SourceText): RestructuredTextReading {
  const reading = readRestructuredText(source);
  return assemble(source, reading.text, reading, reading.targets, previous);
}

function assemble(
  source: SourceText,
  text: string,
  { units, final }: Pick<RestructuredTextReading, 'units' | 'final'>,
  targets: ReadonlyMap<string, string>,
  previous?: RestructuredTextReading,
): RestructuredTextReading {
  const prose = { ...gathered(units, [], previous?.prose.blocks), language: docinfoLanguage(text) };
  return { source, text, units, final, targets, prose };
}

/** True where two stretches name the same targets in the same order: whatever stands around them, the first of a name counts. */
function sameTargets(a: ReadonlyMap<string, string>, b: ReadonlyMap<string, string>): boolean {
  const other = [...b];
  return a.size === b.size && [...a].every(([name, to], i) => other[i]![0] === name && other[i]![1] === to);
}
