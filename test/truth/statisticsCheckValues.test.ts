// The statistics against the machine-readable list of published values, where that list is at hand.
import { existsSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { logLikelihoodRatio, pmi, tScore } from '../../server/src/corpus/statistics/association.js';

interface CheckValue {
  readonly id: string;
  readonly source: string;
  readonly verified: string;
  readonly input: Record<string, number>;
  readonly published: { readonly t?: number; readonly pmi?: number; readonly g2?: number };
  readonly tolerance: number;
}

const file = fileURLToPath(new URL('../../../shared/data/checkvalues/checkvalues.json', import.meta.url));

function value(input: Record<string, number>, name: string): number {
  const found = input[name];
  if (found === undefined) throw new Error(`the check value has no ${name}`);
  return found;
}

describe('published association values', () => {
  it('are reproduced, each within its tolerance', (context) => {
    if (!existsSync(file)) return context.skip('needs ../shared/data/checkvalues/checkvalues.json');
    const values = JSON.parse(readFileSync(file, 'utf8')) as CheckValue[];
    expect(values.length).toBeGreaterThanOrEqual(39);
    for (const { id, source, verified, input, published, tolerance } of values) {
      const where = `${id} (${source}; ${verified})`;
      const checks: [string, number | undefined, () => number][] = [
        ['t', published.t, () => tScore(margins(input))],
        ['PMI', published.pmi, () => pmi(margins(input))],
        [
          'G²',
          published.g2,
          () =>
            logLikelihoodRatio({
              both: value(input, 'o11'),
              onlyFirst: value(input, 'o12'),
              onlySecond: value(input, 'o21'),
              neither: value(input, 'o22'),
            }),
        ],
      ];
      const given = checks.filter(([, expected]) => expected !== undefined);
      expect(given.length, where).toBeGreaterThan(0);
      for (const [name, expected, measure] of given) {
        expect(Math.abs(measure() - (expected ?? NaN)), `${name} of ${where}`).toBeLessThanOrEqual(tolerance);
      }
    }
  });
});

function margins(input: Record<string, number>) {
  return { c1: value(input, 'c1'), c2: value(input, 'c2'), c12: value(input, 'c12'), n: value(input, 'N') };
}
