// Real Markdown held against micromark 4 with its GFM extension, and parse5 in HTML blocks: the words that are prose, and where they stand.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { parse, postprocess, preprocess } from 'micromark';
import { gfm } from 'micromark-extension-gfm';
import { describe, expect, it } from 'vitest';
import { sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read } from '../../server/src/prose/read.js';
import { judgeHtml } from './htmlInMarkdown.js';
import { maskGenerators } from './markdownOracleMask.js';
import { tell } from './oracleTable.js';

const WORD = /[\p{L}\p{N}]+/gu;

/** Micromark's tokens in which text is no prose. */
const CLOSED = new Set([
  ...[
    'codeText',
    'codeFenced',
    'codeIndented',
    'htmlFlow',
    'htmlText',
    'resource',
    'reference',
    'definition',
    'autolink',
  ],
  ...['literalAutolink', 'gfmFootnoteCall', 'gfmFootnoteDefinitionLabel', 'taskListCheck'],
]);

/** The source offsets of the code units that are text to micromark, or in HTML blocks to parse5; and those that neither judges. */
function oracleUnits(text: string): { units: Set<number>; unjudged: Set<number> } {
  const units = new Set<number>();
  const unjudged = new Set<number>();
  const events = postprocess(
    parse({ extensions: [gfm()] })
      .document()
      .write(preprocess()(text, undefined, true)),
  );
  let closed = 0;
  for (const [phase, token] of events) {
    if (CLOSED.has(token.type)) closed += phase === 'enter' ? 1 : -1;
    if (token.type === 'htmlFlow' && phase === 'enter') {
      const from = token.start.offset;
      judgeHtml(text.slice(from, token.end.offset)).forEach((mark, i) => {
        if (mark === 1) units.add(from + i);
        else if (mark === 2) unjudged.add(from + i);
      });
    }
    if (phase === 'exit' || closed > 0) continue;
    if (token.type === 'data' || token.type === 'characterEscapeValue') {
      for (let i = token.start.offset; i < token.end.offset; i++) units.add(i);
    }
  }
  return { units, unjudged };
}

interface Score {
  words: number;
  found: number;
  ours: number;
  right: number;
  /** Milliseconds, and the text read in them. */
  theirTime: number;
  ourTime: number;
  units: number;
  misplaced: string[];
  missing: string[];
  extra: string[];
}

function compare(file: string, source: string, score: Score): void {
  const { text, opened } = maskGenerators(source);
  const started = performance.now();
  const { units, unjudged } = oracleUnits(text);
  score.theirTime += performance.now() - started;
  const inOracle = (from: number, to: number): boolean => {
    for (let i = from; i < to; i++) if (!units.has(i)) return false;
    return true;
  };
  const ours = new Uint8Array(source.length);
  const begun = performance.now();
  const { blocks } = read({ uri: file, format: 'markdown', text: source });
  score.ourTime += performance.now() - begun;
  score.units += source.length;
  for (const block of blocks) {
    if (block.content.kind === 'title' || block.content.kind === 'description') continue;
    for (const { 0: word, index } of block.content.text.matchAll(WORD)) {
      const from = sourceStart(block, index);
      const to = sourceEnd(block, index + word.length);
      const slice = source.slice(from, to);
      if (slice !== word) {
        if (!/[*_~&\\<\]]/.test(slice)) score.misplaced.push(`${file}@${from}: ${word} is ${slice}`);
        ours.fill(1, from, to);
        continue;
      }
      ours.fill(1, from, to);
      // Bodies of generators' containers are prose that CommonMark alone cannot see.
      if (opened(from) || unjudged.has(from)) continue;
      score.ours++;
      if (inOracle(from, to)) score.right++;
      else score.extra.push(`${file}@${from}: ${word}`);
    }
  }
  for (const { 0: word, index } of text.matchAll(WORD)) {
    if (!inOracle(index, index + word.length) || opened(index)) continue;
    score.words++;
    if (ours.subarray(index, index + word.length).every((unit) => unit === 1)) score.found++;
    else score.missing.push(`${file}@${index}: ${word}`);
  }
}

function markdownFiles(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true })
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .flatMap((entry) => {
      const full = path.join(folder, entry.name);
      if (entry.isDirectory()) return markdownFiles(full);
      return entry.isFile() && entry.name.endsWith('.md') ? [full] : [];
    });
}

function expectAgreement(set: string, files: readonly string[], sample: number): void {
  const counts = { words: 0, found: 0, ours: 0, right: 0, theirTime: 0, ourTime: 0, units: 0 };
  const score: Score = { ...counts, misplaced: [], missing: [], extra: [] };
  const stride = Math.max(1, Math.ceil(files.length / sample));
  for (let i = 0; i < files.length; i += stride) compare(files[i]!, readFileSync(files[i]!, 'utf8'), score);
  const recall = score.found / score.words;
  const precision = score.right / score.ours;
  const misplaced = score.misplaced.length;
  tell({ ...score, format: 'Markdown', oracle: 'micromark', set, theirs: score.words, misplaced });
  if (process.env.ORACLE_DETAILS)
    console.info({ missing: score.missing.slice(0, 80), extra: score.extra.slice(0, 80) });
  expect(score.misplaced).toEqual([]);
  expect(score.words).toBeGreaterThan(1000);
  expect(recall, score.missing.slice(0, 20).join('\n')).toBeGreaterThanOrEqual(0.99);
  expect(precision, score.extra.slice(0, 20).join('\n')).toBeGreaterThanOrEqual(0.99);
}

const root = path.resolve(import.meta.dirname, '../..');
const SAMPLE = Number(process.env.ORACLE_FILES ?? 40);

describe('Markdown against micromark', () => {
  it('agrees on the read-me files of npm packages', () => {
    const packages = [
      'prettier',
      'vitest',
      'esbuild',
      'fast-check',
      'micromark',
      'yaml',
      'ignore',
      'eslint',
      'mocha',
      'vite',
    ];
    const files = packages
      .map((name) => path.join(root, 'node_modules', name, 'README.md'))
      .concat(path.join(root, 'node_modules/micromark/readme.md'))
      .filter((file) => existsSync(file));
    expect(files.length).toBeGreaterThan(4);
    expectAgreement('read-me files', files, files.length);
  }, 60_000);

  for (const set of ['knative', 'redis', 'rust-book', 'argo-cd', 'opensearch', 'wagtail']) {
    const folder = path.join(root, '../shared/data/docs', set);
    it.skipIf(!existsSync(folder))(
      `agrees on the documentation set ${set} (needs ../shared)`,
      () => {
        expectAgreement(set, markdownFiles(folder), SAMPLE);
      },
      120_000,
    );
  }
});
