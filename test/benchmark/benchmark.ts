// npm run benchmark: each goal as a ratio to its reference in the same run; a table, and benchmark.json.
import { writeFileSync } from 'node:fs';
import { serveAsWorker } from '../../server/src/node/factsPool.js';
import { measureHostileLines } from './hostile.js';
import { measureKeystrokes } from './keystroke.js';
import type { Row } from './measure.js';
import { measureSurvey } from './survey.js';
import { measureTermCheck } from './termCheck.js';

/** Interleaved rounds of each measurement. */
const ROUNDS = 5;

async function main(): Promise<void> {
  // The term check comes first: it walks through tables that a large heap would push out of the caches.
  const { rows: checks, growth, characters } = measureTermCheck(ROUNDS);
  const rows: Row[] = [...(await measureSurvey(ROUNDS))];
  for (const { terms, scanMs, grepMs, ratio } of checks) {
    rows.push({
      goal: `Term check, ${terms.toLocaleString('en')} terms, ${(characters / 1e6).toFixed(1)} MB`,
      ours: `${scanMs.toFixed(0)} ms CPU`,
      reference: `grep -F ${grepMs.toFixed(0)} ms CPU`,
      figure: `${ratio.toFixed(2)} ×`,
      target: '≤ 1.1 ×',
      reached: ratio <= 1.1,
    });
  }
  rows.push({
    goal: 'Term check, 10,000 terms against 100',
    ours: `${checks[2]!.scanMs.toFixed(0)} ms CPU`,
    reference: `${checks[0]!.scanMs.toFixed(0)} ms CPU`,
    figure: `${growth.toFixed(2)} ×`,
    target: '≤ 1.4 ×',
    reached: growth <= 1.4,
  });
  rows.push(await measureKeystrokes(300));
  rows.push(measureHostileLines(ROUNDS));
  const columns = ['goal', 'ours', 'reference', 'figure', 'target'] as const;
  const widths = columns.map((column) => Math.max(column.length, ...rows.map((row) => row[column].length)));
  const line = (cells: readonly string[]): string => cells.map((cell, at) => cell.padEnd(widths[at]!)).join('  ');
  console.log(line(columns));
  for (const row of rows)
    console.log(
      `${line(columns.map((column) => row[column]))}  ${row.reached === undefined ? '' : row.reached ? 'reached' : 'MISSED'}`,
    );
  writeFileSync('benchmark.json', `${JSON.stringify({ node: process.version, rows }, undefined, 2)}\n`);
}

if (!serveAsWorker()) orFail(main());

/** Ends the process with the failure, if there is one. */
function orFail(work: Promise<void>): void {
  work.catch((error: unknown) => {
    console.error(error);
    process.exitCode = 1;
  });
}
