// Reads reStructuredText, as docutils and Sphinx understand it: the whole document, or what an edit touched.
import type { SourceText } from '../../text/sourceText.js';
import { gathered, readUnits, rereadUnits, type BlockwiseReading } from '../blockwise.js';
import { normalise } from '../normalise.js';
import { changeBetween, type Reading } from '../reading.js';
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
  const read = readUnits(new Outermost(text, targets), text, bodyStart(text), NOTHING_KNOWN);
  return assemble(source, text, read, targets);
}

/** Reads a document again after an edit, with the same result as {@link readRestructuredText} gives for the new text. */
export function rereadRestructuredText(previous: Reading, source: SourceText): RestructuredTextReading {
  return isOurs(previous) ? rereadOurs(previous, source) : readRestructuredText(source);
}

/** False for what stands in the place of a reading that failed. */
function isOurs(reading: Reading): reading is RestructuredTextReading {
  return 'units' in reading;
}

function rereadOurs(previous: RestructuredTextReading, source: SourceText): RestructuredTextReading {
  const text = normalise(source.text);
  const change = changeBetween(previous.text, text);
  if (!change) return { ...previous, source };
  const body = bodyStart(text);
  if (body !== bodyStart(previous.text)) return rereadWhole(previous, source);
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

function bodyStart(text: string): number {
  return text.charCodeAt(0) === 0xfeff ? 1 : 0;
}

/** True where two stretches name the same targets in the same order: whatever stands around them, the first of a name counts. */
function sameTargets(a: ReadonlyMap<string, string>, b: ReadonlyMap<string, string>): boolean {
  const other = [...b];
  return a.size === b.size && [...a].every(([name, to], i) => other[i]![0] === name && other[i]![1] === to);
}
