// The statistics against nltk, scipy and scikit-learn on the same random tables in one run.
import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../server/src/corpus/statistics/agreement.js';
import {
  chiSquared,
  dice,
  logLikelihoodRatio,
  marginalsOf,
  pmi,
  tScore,
} from '../../server/src/corpus/statistics/association.js';
import {
  conditionalEntropy,
  entropy,
  jointEntropy,
  mutualInformation,
} from '../../server/src/corpus/statistics/probability.js';
import { cosine, jaccard, sparseVector } from '../../server/src/corpus/statistics/similarity.js';

const script = fileURLToPath(new URL('reference/association.py', import.meta.url));
const python = ['/usr/bin/python3', 'python3'].find(
  (command) => spawnSync(command, ['-c', 'import nltk, scipy, sklearn'], { stdio: 'ignore' }).status === 0,
);

/** A linear congruential generator (Numerical Recipes' constants), so that a failure can be repeated. */
function generator(seed: number): (limit: number) => number {
  let state = seed;
  return (limit) => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return Math.floor((state / 2 ** 32) * limit);
  };
}

const random = generator(20);
const list = <T>(length: number, make: (i: number) => T): T[] => Array.from({ length }, (_, i) => make(i));
const tables = list(200, () => [1 + random(60), 1 + random(900), 1 + random(900), 1 + random(200000)] as const);
const contingencies = list(40, () => {
  const columns = 2 + random(4);
  return list(2 + random(4), () => list(columns, (j) => (j === 0 ? 1 : 0) + random(25)));
});
const vectors = list(60, () => [0, 1].map(() => list(30, (i) => (i === 0 ? 1 : Math.max(0, random(40) - 20) / 4))));

interface Answer {
  tables: Record<'t' | 'chi' | 'pmi' | 'dice' | 'likelihood' | 'g2' | 'pearson', number>[];
  contingencies: Record<'entropy' | 'joint' | 'conditional' | 'mutual' | 'nmi' | 'rand', number>[];
  vectors: Record<'cosine' | 'jaccard', number>[];
}

function closeTo(found: number, reference: number | undefined, tolerance = 1e-9): void {
  expect(reference).toBeDefined();
  expect(Math.abs(found - (reference ?? NaN))).toBeLessThanOrEqual(tolerance * Math.max(1, Math.abs(reference ?? NaN)));
}

describe('agreement with nltk, scipy and scikit-learn', () => {
  it('holds on 200 random 2 × 2 tables, 40 larger ones and 60 pairs of vectors', { timeout: 120_000 }, (context) => {
    if (python === undefined)
      return context.skip('needs a Python with nltk, scipy and scikit-learn (Debian: python3-nltk …)');
    const run = spawnSync(python, [script], {
      input: JSON.stringify({ tables, contingencies, vectors }),
      encoding: 'utf8',
      maxBuffer: 1 << 26,
    });
    expect(run.stderr).not.toMatch(/Traceback/);
    const answer = JSON.parse(run.stdout) as Answer;
    expect(answer.tables).toHaveLength(tables.length);
    tables.forEach(([both, onlyFirst, onlySecond, neither], i) => {
      const cells = { both, onlyFirst, onlySecond, neither };
      const margins = marginalsOf(cells);
      const reference = answer.tables[i];
      closeTo(pmi(margins), reference?.pmi);
      closeTo(tScore(margins), reference?.t);
      closeTo(dice(margins), reference?.dice);
      closeTo(chiSquared(cells), reference?.pearson);
      closeTo(logLikelihoodRatio(cells), reference?.g2);
      // nltk adds 1e-20 to each cell and computes χ² by way of φ²: equal but for rounding.
      closeTo(chiSquared(cells), reference?.chi, 1e-6);
      closeTo(logLikelihoodRatio(cells), reference?.likelihood, 1e-6);
    });
    contingencies.forEach((table, i) => {
      const reference = answer.contingencies[i];
      const rows = table.map((row) => row.reduce((sum, c) => sum + c, 0));
      closeTo(entropy(rows), reference?.entropy);
      closeTo(jointEntropy(table), reference?.joint);
      closeTo(conditionalEntropy(table), reference?.conditional);
      closeTo(mutualInformation(table), reference?.mutual);
      closeTo(agreement(table).nmi, reference?.nmi);
      closeTo(agreement(table).rand, reference?.rand);
    });
    vectors.forEach((pair, i) => {
      const [a, b] = pair.map((weights) =>
        sparseVector(weights.map((weight, id) => [id, weight] as const).filter(([, weight]) => weight > 0)),
      );
      if (a === undefined || b === undefined) throw new Error('a pair has two vectors');
      closeTo(cosine(a, b), answer.vectors[i]?.cosine);
      closeTo(jaccard(a, b), answer.vectors[i]?.jaccard);
    });
  });
});
