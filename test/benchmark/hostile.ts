// A hostile line of 100 KB, read, tagged and counted, against ordinary prose of that size.
import { Profiles, factsOf } from '../../server/src/engine/factsOf.js';
import { documentsOf } from './documents.js';
import { cpuMs, median, ms } from './measure.js';
import type { Row } from './measure.js';

const SIZE = 100_000;

/** The lines: what log files, data and generated pages really hold. */
const HOSTILE: Readonly<Record<string, string>> = {
  base64: 'QUJDREVGR0hJSktMTU5PUFFSU1RVVldYWVo5876+/'.repeat(SIZE / 40),
  dashes: '-'.repeat(SIZE),
  'one word': 'a'.repeat(SIZE),
  'hyphened word': 'ab-'.repeat(SIZE / 3),
  brackets: '['.repeat(SIZE),
  commas: 'a,'.repeat(SIZE / 2),
};

/** The slowest line decides. */
export function measureHostileLines(rounds: number): Row {
  const profiles = new Profiles();
  const ordinary = documentsOf('knative')
    .sources.map(({ text }) => text)
    .join('\n\n')
    .slice(0, SIZE);
  const facts = (text: string): void => void factsOf({ uri: 'file:///line.md', format: 'markdown', text }, profiles);
  facts(ordinary);
  const times = new Map(Object.keys(HOSTILE).map((name) => [name, [] as number[]]));
  const reference: number[] = [];
  for (let round = 0; round < rounds; round++) {
    reference.push(cpuMs(() => facts(ordinary)));
    for (const [name, line] of Object.entries(HOSTILE)) times.get(name)!.push(cpuMs(() => facts(line.slice(0, SIZE))));
  }
  const [slowest, taken] = [...times].sort(([, a], [, b]) => median(b) - median(a))[0]!;
  return {
    goal: `Any hostile line of 100 KB (slowest of ${times.size}: ${slowest})`,
    ours: `${ms(median(taken))} CPU`,
    reference: `ordinary prose ${ms(median(reference))} CPU`,
    figure: `${(median(taken) / median(reference)).toFixed(2)} ×`,
    target: '< 100 ms',
    reached: median(taken) < 100,
  };
}
