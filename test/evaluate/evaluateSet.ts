// Evaluates one documentation set, in a process of its own so that its time and memory are its own.
import type { Question } from '../../server/src/mining/question.js';
import { ask, sourcesUnder } from './asked.js';
import { agreementOf, readDictionary } from './dictionary.js';
import { createFunnel } from './funnel.js';
import type { GoldSet } from './gold.js';
import { pastEditsOf } from './history.js';
import { fatesOf, negativesAsked } from './recall.js';
import type { AskedQuestion, SetResult, SkippedSet } from './result.js';

/** Reads, mines and judges a set, with its history where that is wanted; says why where nothing in it can be read. */
export async function evaluateSet(set: GoldSet, withHistory: boolean): Promise<SetResult | SkippedSet> {
  const { sources, leftOut } = await sourcesUnder(set.folder);
  // A handful of readme files in a set of another format would pass for the set.
  if (sources.length === 0 || (set.format !== 'markdown' && sources.every(({ format }) => format === 'markdown')))
    return { name: set.name, reason: `its format (${set.format}) has no reader yet` };
  const pastEdits = withHistory ? await pastEditsOf(set) : undefined;
  const asked = ask(sources, undefined, undefined, { pastEdits });
  const peakMegabytes = (process.resourceUsage().maxRSS * 1024) / 1e6;
  const lookAlikes = asked.withLookAlikes.filter(({ kind }) => kind === 'look-alike');
  const dictionary = readDictionary();
  const { documents, words, readingSeconds, miningSeconds } = asked;
  return {
    ...{ name: set.name, format: set.format, documents, leftOut, words },
    asPlainText: set.format !== 'markdown' && sources.some(({ format }) => format === 'plaintext'),
    ...{ readingSeconds, miningSeconds, peakMegabytes },
    questions: asked.byDefault.map(inShort),
    lookAlikes: lookAlikes.map(inShort),
    hiddenLookAlikes: asked.hiddenLookAlikes,
    pairs: fatesOf(set, asked, createFunnel(asked)),
    negatives: set.negatives.length,
    negativesAsked: negativesAsked(set, asked),
    agreement: agreementOf(asked.byDefault, dictionary),
    agreementOfLookAlikes: agreementOf(lookAlikes, dictionary),
  };
}

function inShort({ id, kind, terms }: Question): AskedQuestion {
  return { id, kind, terms: terms.map(({ text, uses }) => `${text} ${uses}`) };
}
