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
  const wink = winkNLP(winkModel, ['sbd', 'pos']);
  const bare = (): void => {
    for (const text of prose) wink.readDoc(text);
  };
  const profiles = new Profiles();
  let corpus = Corpus.create();
  const survey = (): void => {
    corpus = finish(
      Corpus.create().apply(sources.map((source) => ({ uri: source.uri, facts: factsOf(source, profiles) }))),
    );
  };
  const pool = new FactsPool(profiles);
  bare();
  survey();
  await pool.gather(sources);
  await pool.gather(sources);
  const times = {
    bare: [] as number[],
    bareWall: [] as number[],
    survey: [] as number[],
    workers: [] as number[],
    mining: [] as number[],
  };
  for (let round = 0; round < rounds; round++) {
    times.bare.push(cpuMs(bare));
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
        finish(Corpus.create().apply(sources.map(({ uri }, index) => ({ uri, facts: facts[index]! }))));
      }),
    );
    times.mining.push(cpuMs(() => void finish(mine(corpus))));
  }
  await pool.end();
  const speed = median(times.bare) / median(times.survey);
  const withWorkers = median(times.bareWall) / median(times.workers);
  const words = corpus.words.toLocaleString('en');
  return [
    {
      goal: `Cold survey of ${name} (${words} words), one thread`,
      ours: `${ms(median(times.survey))} CPU`,
      reference: `bare wink ${ms(median(times.bare))} CPU`,
      figure: `${(100 * speed).toFixed(0)} % of its speed`,
      target: '≥ 75 %',
      reached: speed >= 0.75,
    },
    {
      goal: 'The same on workers, model loading included',
      ours: `${ms(median(times.workers))} elapsed`,
      reference: `bare wink ${ms(median(times.bareWall))} elapsed`,
      figure: `${(100 * withWorkers).toFixed(0)} % of its speed`,
      target: '–',
      reached: true,
    },
    {
      goal: 'Mining all questions of it',
      ours: `${ms(median(times.mining))} CPU`,
      reference: `bare wink ${ms(median(times.bare))} CPU`,
      figure: `${(median(times.mining) / median(times.bare)).toFixed(2)} ×`,
      target: '–',
      reached: true,
    },
  ];
}
