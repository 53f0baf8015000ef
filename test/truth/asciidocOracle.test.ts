// Real AsciiDoc held against Asciidoctor: the words that are prose, and where ours stand.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { sourceEnd, sourceStart, type ProseBlock } from '../../server/src/prose/prose.js';
import { read } from '../../server/src/prose/read.js';
import { commonLength, oracleWords, WORD } from './asciidocOracle.js';

interface Score {
  oracle: number;
  ours: number;
  common: number;
  misplaced: string[];
  details: string[];
}

/** Markup that may stand inside a word: escapes, references, marks that vanish, lines that are joined. */
const MARKUP = /[\\&{*_#^~[\]`+(]/;

/** Alternative texts are no text of the converted page; everything else that is read is. */
function isCompared({ content }: ProseBlock): boolean {
  return !['alternativeText', 'title', 'description'].includes(content.kind);
}

async function compare(name: string, text: string, score: Score): Promise<void> {
  const theirs = await oracleWords(text);
  const words: string[] = [];
  for (const block of read({ uri: name, format: 'asciidoc', text }).blocks) {
    for (const { 0: word, index } of block.content.text.matchAll(WORD)) {
      const slice = text.slice(sourceStart(block, index), sourceEnd(block, index + word.length));
      if (slice !== word && !MARKUP.test(slice)) score.misplaced.push(`${name}: ${word} is ${slice}`);
      if (isCompared(block)) words.push(word);
    }
  }
  const common = commonLength(theirs, words);
  score.oracle += theirs.length;
  score.ours += words.length;
  score.common += common;
  if (common < Math.max(theirs.length, words.length)) score.details.push(`${name}: ${difference(theirs, words)}`);
}

function difference(theirs: readonly string[], ours: readonly string[]): string {
  const count = new Map<string, number>();
  for (const word of theirs) count.set(word, (count.get(word) ?? 0) + 1);
  for (const word of ours) count.set(word, (count.get(word) ?? 0) - 1);
  const show = (sign: number): string =>
    [...count]
      .filter(([, n]) => n * sign > 0)
      .map(([word, n]) => (n * sign > 1 ? `${word}*${n * sign}` : word))
      .join(' ');
  return `MISSING ${show(1).slice(0, 400)} EXTRA ${show(-1).slice(0, 400)}`;
}

async function scoreOf(files: readonly (readonly [string, string])[]): Promise<Score> {
  const score: Score = { oracle: 0, ours: 0, common: 0, misplaced: [], details: [] };
  for (const [name, text] of files) await compare(name, text, score);
  const recall = score.common / score.oracle;
  const precision = score.common / score.ours;
  console.info(`${score.oracle} words, recall ${recall.toFixed(4)}, precision ${precision.toFixed(4)}`);
  if (process.env.ORACLE_DETAILS) console.info(score.details.join('\n'));
  return score;
}

function adocFiles(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true })
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .flatMap((entry) => {
      const full = path.join(folder, entry.name);
      if (entry.isDirectory()) return adocFiles(full);
      return entry.isFile() && entry.name.endsWith('.adoc') ? [full] : [];
    });
}

const root = path.resolve(import.meta.dirname, '../..');
const SAMPLE = Number(process.env.ORACLE_FILES ?? 40);

describe('AsciiDoc against Asciidoctor', () => {
  for (const set of ['keycloak', 'spring-boot']) {
    const folder = path.join(root, '../shared/data/docs', set);
    it.skipIf(!existsSync(folder))(
      `agrees on the documentation set ${set} (needs ../shared)`,
      async () => {
        const files = adocFiles(folder);
        const stride = Math.max(1, Math.ceil(files.length / SAMPLE));
        const sample = files.filter((_, i) => i % stride === 0);
        const score = await scoreOf(sample.map((file) => [file, readFileSync(file, 'utf8')] as const));
        const { oracle, ours, common, misplaced, details } = score;
        expect(misplaced).toEqual([]);
        expect(oracle).toBeGreaterThan(1000);
        expect(common / oracle, details.slice(0, 20).join('\n')).toBeGreaterThanOrEqual(0.985);
        expect(common / ours, details.slice(0, 20).join('\n')).toBeGreaterThanOrEqual(0.985);
      },
      120_000,
    );
  }
});
