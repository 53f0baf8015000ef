// Cold survey (reading, tagging, counting) against bare wink on the same prose, in one run.
import winkModel from 'wink-eng-lite-web-model';
import winkNLP from 'wink-nlp';
import { finish } from '../../server/src/base/work.js';
import { Corpus } from '../../server/src/corpus/corpus.js';
import { Profiles, factsOf } from '../../server/src/engine/factsOf.js';
import { mine } from '../../server/src/mining/mine.js';
import { FactsPool } from '../../server/src/node/factsPool.js';
import { read } from '../../server/src/prose/read.js';
import { documentsOf } from './documents.js';
import { cpuMs, median, ms, wallMs } from './measure.js';
import type { Row } from './measure.js';

/** Measures the survey on one thread (processor time) and on workers (elapsed time), and the mining after it. */
export async function measureSurvey(rounds: number): Promise<Row[]> {
  const { name, sources } = documentsOf('knative');
  const prose = sources.map((source) =>
    read(source)
      .blocks.map(({ content }) => content.text)
      .join('\n\n'),
  );
  // Runs that bare wink is superlinear on would only flatter us.
  const documents = sources.map(({ text }) => text.replace(/\S{65,}/g, (run) => run.slice(0, 64)));
  const wink = winkNLP(winkModel, ['sbd', 'pos']);
  const bareOn = (texts: readonly string[]): void => {
    for (const text of texts) wink.readDoc(text);
  };
  const bare = (): void => bareOn(documents);
  const profiles = new Profiles();
  let corpus = Corpus.create();
  const survey = (): void => {
    corpus = finish(
      Corpus.create().apply(sources.map((source) => ({ uri: source.uri, facts: factsOf(source, profiles)[0] }))),
    );
  };
  const pool = new FactsPool(profiles);
  bare();
  survey();
  await pool.gather(sources);
  await pool.gather(sources);
  const times = {
    bare: [] as number[],
    bareProse: [] as number[],
    bareWall: [] as number[],
    survey: [] as number[],
    workers: [] as number[],
    mining: [] as number[],
  };
  for (let round = 0; round < rounds; round++) {
    times.bare.push(cpuMs(bare));
    times.bareProse.push(cpuMs(() => bareOn(prose)));
    times.survey.push(cpuMs(survey));
    times.bareWall.push(
      await wallMs(() => {
        bare();
        return Promise.resolve();
      }),
    );
    times.workers.push(
      await wallMs(async () => {
        const facts = await pool.gather(sources);
        finish(Corpus.create().apply(sources.map(({ uri }, index) => ({ uri, facts: facts[index]![0] }))));
      }),
    );
    times.mining.push(cpuMs(() => void finish(mine(corpus))));
  }
  await pool.end();
  const ratio = (reference: readonly number[], ours: readonly number[]): number => median(reference) / median(ours);
  const speed = (reference: readonly number[], ours: readonly number[]): string =>
    `${(100 * ratio(reference, ours)).toFixed(0)} % of its speed`;
  const words = corpus.words.toLocaleString('en');
  return [
    {
      goal: `Cold survey of ${name} (${words} words), one thread, against the same documents`,
      ours: `${ms(median(times.survey))} CPU`,
      reference: `bare wink ${ms(median(times.bare))} CPU`,
      figure: speed(times.bare, times.survey),
      target: '≥ 75 %',
      reached: ratio(times.bare, times.survey) >= 0.75,
    },
    {
      goal: 'The same against their prose alone, markup taken out for wink',
      ours: `${ms(median(times.survey))} CPU`,
      reference: `bare wink ${ms(median(times.bareProse))} CPU`,
      figure: speed(times.bareProse, times.survey),
      target: '–',
    },
    {
      goal: 'The same on warm workers, against the same documents',
      ours: `${ms(median(times.workers))} elapsed`,
      reference: `bare wink ${ms(median(times.bareWall))} elapsed`,
      figure: speed(times.bareWall, times.workers),
      target: '–',
    },
    {
      goal: 'Mining all questions of it',
      ours: `${ms(median(times.mining))} CPU`,
      reference: `bare wink on prose ${ms(median(times.bareProse))} CPU`,
      figure: `${ratio(times.mining, times.bareProse).toFixed(2)} ×`,
      target: '–',
    },
  ];
}
