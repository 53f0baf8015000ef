// npm run oracles [-- --files N]: every format held against another reader on real documentation; a table of how well and how fast.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { parseArgs } from 'node:util';
import { speedOf, type OracleRow } from './oracleTable.js';

/** The comparisons; each skips what is not installed or not there. */
const TESTS = [
  'markdownOracle',
  'mdxOracle',
  'markupHtml',
  'markupXml',
  'restructuredtextOracle',
  'asciidocOracle',
  'latexOracle',
];
const TABLE = 'out/oracles.jsonl';

const { values } = parseArgs({ options: { files: { type: 'string', default: '150' } } });
if (!/^[1-9]\d*$/.test(values.files))
  throw new RangeError(`--files needs a number of files for each set, not ${values.files}`);
mkdirSync('out', { recursive: true });
rmSync(TABLE, { force: true });
const { status } = spawnSync(
  process.execPath,
  [
    'node_modules/vitest/vitest.mjs',
    'run',
    '--maxWorkers=1',
    '--reporter=dot',
    ...TESTS.map((name) => `test/truth/${name}.test.ts`),
  ],
  {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: { ...process.env, ORACLE_TABLE: TABLE, ORACLE_FILES: values.files },
  },
);
const rows = existsSync(TABLE)
  ? readFileSync(TABLE, 'utf8')
      .trimEnd()
      .split('\n')
      .map((line) => JSON.parse(line) as OracleRow)
  : [];
const HEAD = ['format', 'oracle', 'set', 'words', 'recall', 'precision', 'misplaced', 'ours', 'oracle’s', 'ratio'];
const cells = rows.map((row) => [
  row.format,
  row.oracle,
  row.set,
  String(row.theirs),
  (row.found / row.theirs).toFixed(4),
  (row.right / row.ours).toFixed(4),
  String(row.misplaced),
  speedOf(row.units, row.ourTime),
  speedOf(row.units, row.theirTime),
  !row.ourTime || !row.theirTime ? '–' : `${(row.theirTime / row.ourTime).toFixed(1)} ×`,
]);
const widths = HEAD.map((head, at) => Math.max(head.length, ...cells.map((row) => row[at]!.length)));
for (const row of [HEAD, ...cells])
  console.log(
    row
      .map((cell, at) => cell.padEnd(widths[at]!))
      .join('  ')
      .trimEnd(),
  );
if (rows.length === 0)
  console.log('No comparison could be made: the documentation sets or the other readers are not there.');
if (status !== 0) console.log('Some comparison fell short of what its test asks for: run it with vitest to see where.');
process.exitCode = status ?? 1;
