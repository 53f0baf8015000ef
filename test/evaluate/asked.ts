// From a folder or from texts to the questions that are asked, through the engine that the product runs.
import { compareCodeUnits } from '../../server/src/base/order.js';
import { finish } from '../../server/src/base/work.js';
import type { Corpus } from '../../server/src/corpus/corpus.js';
import { Engine } from '../../server/src/engine/engine.js';
import { Profiles, factsOf } from '../../server/src/engine/factsOf.js';
import type { DocumentFacts } from '../../server/src/facts/documentFacts.js';
import { DEFAULT_MINING } from '../../server/src/mining/options.js';
import type { MiningOptions } from '../../server/src/mining/options.js';
import type { Question } from '../../server/src/mining/question.js';
import { findFiles, readDocument } from '../../server/src/node/files.js';
import type { SourceText } from '../../server/src/text/sourceText.js';

/** What a mining asked, and what it cost. */
export interface Asked {
  /** The corpus of the English documents, or undefined where there are none. */
  readonly corpus: Corpus | undefined;
  readonly documents: number;
  readonly words: number;
  /** Every question that was mined, asked or not. */
  readonly mined: readonly Question[];
  /** The questions of the default kinds above the default threshold, in the order they are asked. */
  readonly byDefault: readonly Question[];
  /** The same and every look-alike that was mined, whatever its confidence, in one order of worth. */
  readonly withLookAlikes: readonly Question[];
  /** Look-alikes below the default threshold: those who ask for the kind see them only if they lower it. */
  readonly hiddenLookAlikes: number;
  /** Processor time in seconds, on one thread. */
  readonly readingSeconds: number;
  readonly miningSeconds: number;
}

/** The documents of a folder that the product reads, in order of their paths, and the number of those it leaves out. */
export async function sourcesUnder(folder: string): Promise<{ sources: SourceText[]; leftOut: number }> {
  const { documents, leftOut } = await findFiles(folder);
  const read = await Promise.all(documents.map(readDocument));
  const sources = read.flatMap((file) => ('source' in file ? [file.source] : []));
  return { sources, leftOut: leftOut.length + read.length - sources.length };
}

/** Reads (where their facts are not given), counts and mines texts in the order given, without any termbase. */
export function ask(
  sources: readonly SourceText[],
  profiles = new Profiles(),
  facts: readonly (readonly DocumentFacts[])[] = [],
  mining: MiningOptions = DEFAULT_MINING,
): Asked {
  const start = process.cpuUsage();
  const engine = new Engine(profiles);
  engine.apply({
    mining,
    documents: sources.map((source, index) => ({
      uri: source.uri,
      source,
      facts: facts[index] ?? factsOf(source, profiles),
    })),
  });
  const readingSeconds = secondsSince(start);
  const snapshot = finish(engine.settle());
  const miningSeconds = secondsSince(start) - readingSeconds;
  const { relations } = snapshot;
  const byDefault = snapshot.agendaAt('').open;
  const lookAlikes = relations.questions.filter(({ kind }) => kind === 'look-alike');
  const shown = snapshot.asking(['look-alike']).agendaAt('').open.length;
  return {
    corpus: relations.languages.find(({ language }) => language === 'en')?.corpus,
    ...relations.size,
    mined: relations.questions,
    byDefault,
    withLookAlikes: [...byDefault, ...lookAlikes].sort((a, b) => b.worth - a.worth || compareCodeUnits(a.id, b.id)),
    hiddenLookAlikes: lookAlikes.length - shown,
    readingSeconds,
    miningSeconds,
  };
}

function secondsSince(start: NodeJS.CpuUsage): number {
  const { user, system } = process.cpuUsage(start);
  return (user + system) / 1e6;
}
