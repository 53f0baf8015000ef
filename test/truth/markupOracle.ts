// Holds what the reader of markup reads against what another parser takes for text: the words, and where they stand.
import { expect } from 'vitest';
import { sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read } from '../../server/src/prose/read.js';
import type { Format } from '../../server/src/text/sourceText.js';
import { tell } from './oracleTable.js';

const WORD = /[\p{L}\p{N}]+/gu;
/** What stands in text and is no prose by the rules of every format: URLs, addresses, template markers, tags that are shown; and references. */
const MASKED =
  /[A-Za-z][A-Za-z0-9+.-]*:\/\/[^\s<>"'`|\\^{}]*|www\.[^\s<>"]+|[\w.+-]+@[\w-]+(?:\.[\w-]+)+|\{\{[^]{0,600}?\}\}|\{%[^]{0,600}?%\}|\$\{[^}]{0,600}\}|&lt;\/?[A-Za-z][\w:.-]*\s?\/?&gt;|&[\w#:.-]+;/g;

/** How well a set of files agrees. */
export interface Score {
  words: number;
  found: number;
  ours: number;
  right: number;
  /** Milliseconds, and the text read in them. */
  theirTime: number;
  ourTime: number;
  units: number;
  readonly misplaced: string[];
  readonly missing: string[];
  readonly extra: string[];
}

export function newScore(): Score {
  const counts = { words: 0, found: 0, ours: 0, right: 0, theirTime: 0, ourTime: 0, units: 0 };
  return { ...counts, misplaced: [], missing: [], extra: [] };
}

/** A file, and the stretches of it that the other parser takes for prose. */
export interface Judged {
  readonly name: string;
  readonly format: Format;
  readonly source: string;
  readonly prose: readonly (readonly [from: number, to: number])[];
}

export function compare({ name, format, source, prose }: Judged, score: Score): void {
  const units = new Uint8Array(source.length);
  for (const [from, to] of prose) units.fill(1, from, to);
  for (const { 0: found, index } of source.matchAll(MASKED)) units.fill(0, index, index + found.length);
  const isAll = (marks: Uint8Array, from: number, to: number): boolean => {
    for (let i = from; i < to; i++) if (marks[i] === 0) return false;
    return true;
  };
  const ours = new Uint8Array(source.length);
  const begun = performance.now();
  const { blocks } = read({ uri: `file:///${name}`, format, text: source });
  score.ourTime += performance.now() - begun;
  score.units += source.length;
  for (const block of blocks) {
    for (const { 0: word, index } of block.content.text.matchAll(WORD)) {
      const from = sourceStart(block, index);
      const to = sourceEnd(block, index + word.length);
      const slice = source.slice(from, to);
      ours.fill(1, from, to);
      if (slice !== word) {
        // Tags inside a word vanish, references in it are decoded.
        const bare = slice.replace(/<!--[^]*?-->|<[^>]*>/g, '');
        if (bare !== word && !bare.includes('&')) score.misplaced.push(`${name}@${from}: ${word} is ${slice}`);
        continue;
      }
      if (block.content.kind === 'description' || isAttribute(source, from)) continue;
      score.ours++;
      if (isAll(units, from, to)) score.right++;
      else score.extra.push(`${name}@${from}: ${word}`);
    }
  }
  for (const { 0: word, index } of source.matchAll(WORD)) {
    if (!isAll(units, index, index + word.length)) continue;
    score.words++;
    if (isAll(ours, index, index + word.length)) score.found++;
    else score.missing.push(`${name}@${index}: ${word}`);
  }
}

/** True where the offset lies in a tag: the last angle bracket before it opens one. */
function isAttribute(source: string, offset: number): boolean {
  const opening = source.lastIndexOf('<', offset);
  return /[A-Za-z]/.test(source[opening + 1] ?? '') && source.lastIndexOf('>', offset) < opening;
}

/** Expects the agreement that the reader promises on a set of files. */
export function expectAgreement(score: Score, leastWords: number, format: string, oracle: string, set: string): void {
  const recall = score.found / score.words;
  const precision = score.right / score.ours;
  tell({ ...score, format, oracle, set, theirs: score.words, misplaced: score.misplaced.length });
  if (process.env.ORACLE_DETAILS)
    console.info({ missing: score.missing.slice(0, 80), extra: score.extra.slice(0, 80) });
  expect(score.misplaced).toEqual([]);
  expect(score.words).toBeGreaterThanOrEqual(leastWords);
  expect(recall, score.missing.slice(0, 20).join('\n')).toBeGreaterThanOrEqual(0.99);
  expect(precision, score.extra.slice(0, 20).join('\n')).toBeGreaterThanOrEqual(0.99);
}
