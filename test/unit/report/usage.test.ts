// Uses counted in the corpus, against the sample's own list of counts (made apart from this program) and by hand.
import { readdirSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { describe, expect, it } from 'vitest';
import { countUses } from '../../../server/src/engine/usage.js';
import type { CountedTerm } from '../../../server/src/engine/usage.js';
import { snapshotOf } from './workspace.js';

interface Mix {
  readonly forms: readonly string[];
  readonly kind: string;
  readonly counts: Readonly<Record<string, { readonly uses: number; readonly pages: number }>>;
}

const samples = resolve(import.meta.dirname, '../../../samples');

function counts(pages: Readonly<Record<string, string>>, terms: readonly CountedTerm[]): Record<string, number> {
  return Object.fromEntries([...countUses(snapshotOf(pages).relations, terms)].map(([id, { uses }]) => [id, uses]));
}

const term = (text: string, more: Partial<CountedTerm> = {}): CountedTerm => ({ id: text, text, ...more });

describe('uses of names', () => {
  it('are counted in all forms, and a name inside a longer name is not', () => {
    const text = 'The access keys expire. An access key opens the key store. Keys are rotated, and a key is kept.';
    const found = counts({ 'a.md': text }, [term('key'), term('access key'), term('store')]);
    expect(found).toEqual({ key: 3, 'access key': 2, store: 1 });
  });

  it('leave out code, quotations and repeated passages', () => {
    const line = 'Choose the data set that you need.';
    const pages = { 'a.md': `${line}\n\n    data set\n\nSee \`data set\`.\n\n> a data set\n`, 'b.md': `${line}\n` };
    expect(counts(pages, [term('data set')])).toEqual({ 'data set': 1 });
  });

  it('go by capitals where names differ in them alone, except at a sentence’s start', () => {
    const text = 'Job runs end. A Job ends, and the Job is gone. One job waits for JOB control.';
    expect(counts({ 'a.md': text }, [term('job'), term('Job', { exact: true })])).toEqual({ job: 3, Job: 2 });
  });

  it('of a verb need one of its objects', () => {
    const text = 'Start the nightly job. Start the engine. The jobs were started by hand. A start is no verb.';
    const start = term('start', { partOfSpeech: 'verb', objects: ['job'] });
    expect(counts({ 'a.md': text }, [start])).toEqual({ start: 2 });
  });

  it('of nouns agree with the list of the sample, which leaves front matter out and counts overlapping names otherwise', () => {
    const pages: Record<string, string> = {};
    for (const entry of readdirSync(join(samples, 'buoys'), { recursive: true, encoding: 'utf8' })) {
      if (/\.(md|txt)$/.test(entry)) pages[entry] = readFileSync(join(samples, 'buoys', entry), 'utf8');
    }
    const { mixes } = JSON.parse(readFileSync(join(samples, 'mixes.json'), 'utf8')) as { mixes: Mix[] };
    const nouns = mixes.filter(({ kind }) => kind !== 'verb-object');
    const terms = nouns.flatMap(({ forms, kind }) =>
      forms.map((text, index) => term(text, { exact: kind === 'case' && index === 0 })),
    );
    const found = countUses(snapshotOf(pages).relations, terms);
    const expected = nouns.flatMap((mix) => Object.entries(mix.counts));
    const apart = expected.filter(([text, { uses }]) => found.get(text)!.uses !== uses);
    expect(expected.length).toBeGreaterThan(50);
    expect(apart.length / expected.length).toBeLessThanOrEqual(0.25);
    for (const [text, { uses }] of apart) expect(Math.abs(found.get(text)!.uses - uses), text).toBeLessThanOrEqual(4);
  });
});
