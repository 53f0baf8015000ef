// npm run evaluate: the questions of real documentation sets held against what their maintainers decided.
import { spawnSync } from 'node:child_process';
import { readFileSync, writeFileSync } from 'node:fs';
import { parseArgs } from 'node:util';
import { showChanges } from './against.js';
import { sourcesUnder } from './asked.js';
import { evaluateSet } from './evaluateSet.js';
import { evaluateGlossary } from './glossary.js';
import type { GlossaryResult } from './glossary.js';
import { DATA, readGold } from './gold.js';
import type { GoldSet } from './gold.js';
import { recoverPseudoSynonyms } from './pseudo.js';
import type { PseudoBand } from './pseudo.js';
import type { Evaluation, SetResult, SkippedSet } from './result.js';
import { showEvaluation } from './table.js';

const USAGE = `npm run evaluate -- [SET…] [options]
  SET…             evaluate these sets only (default: all)
  --against FILE   say what changed since an earlier evaluate.json
  --json FILE      where the figures go (default: evaluate.json)
  --pseudo SET     the set for pseudo-synonyms (default: redis; "none" leaves them out)
  --no-glossary    leave RFC 4949 out
  --no-history     leave past edits out, where a set has a history
`;

void main().catch((error: unknown) => {
  // What fails inside a part is a fault of the program; what fails outside is mostly an option.
  const inPart = process.argv.includes('--part');
  const told = error instanceof Error ? (inPart ? error.stack : error.message) : undefined;
  process.stderr.write(`${told ?? String(error)}\n`);
  process.exitCode = 2;
});

async function main(): Promise<void> {
  const { values, positionals } = parseArgs({
    allowPositionals: true,
    allowNegative: true,
    options: {
      against: { type: 'string' },
      json: { type: 'string', default: 'evaluate.json' },
      pseudo: { type: 'string', default: 'redis' },
      glossary: { type: 'boolean', default: true },
      history: { type: 'boolean', default: true },
      part: { type: 'string' },
      help: { type: 'boolean', default: false },
    },
  });
  if (values.help) return void process.stdout.write(USAGE);
  const sets = readGold();
  if (sets === undefined)
    return void process.stdout.write(`Nothing to evaluate: there is no gold-dev.json in ${DATA}\n`);
  if (values.part !== undefined) return runPart(values.part, sets);
  const setPart = values.history ? 'set' : 'bare set';
  const before = values.against === undefined ? undefined : readEvaluation(values.against);
  const chosen = positionals.length === 0 ? sets : positionals.map((name) => findSet(sets, name));
  if (values.pseudo !== 'none') findSet(sets, values.pseudo);
  const results = chosen.map(({ name }) => inOwnProcess(`${setPart}:${name}`) as SetResult | SkippedSet);
  const glossary = values.glossary ? (inOwnProcess('glossary:') as GlossaryResult | null) : null;
  const evaluation: Evaluation = {
    sets: results.filter((result): result is SetResult => 'questions' in result),
    skipped: results.filter((result): result is SkippedSet => 'reason' in result),
    ...(values.pseudo !== 'none' && {
      pseudo: { set: values.pseudo, bands: inOwnProcess(`pseudo:${values.pseudo}`) as PseudoBand[] },
    }),
    ...(glossary && { glossary }),
  };
  process.stdout.write(showEvaluation(evaluation));
  if (before !== undefined) process.stdout.write(showChanges(before, evaluation));
  writeFileSync(values.json, `${JSON.stringify(evaluation, null, 1)}\n`);
  process.stdout.write(`\nFigures in ${values.json}\n`);
}

function findSet(sets: readonly GoldSet[], name: string): GoldSet {
  const set = sets.find((each) => each.name === name);
  if (set !== undefined) return set;
  throw new Error(`${name}: no such set; there are ${sets.map((each) => each.name).join(', ')}`);
}

function readEvaluation(file: string): Evaluation {
  let written: unknown;
  try {
    written = JSON.parse(readFileSync(file, 'utf8'));
  } catch (error) {
    throw new Error(`${file}: ${error instanceof Error ? error.message : 'cannot be read'}`, { cause: error });
  }
  if (typeof written !== 'object' || written === null || !Array.isArray((written as Partial<Evaluation>).sets))
    throw new Error(`${file}: not the figures of an earlier evaluation (it has no list of sets)`);
  return written as Evaluation;
}

/** Runs one part of the evaluation in a child process of the same program and reads its result. */
function inOwnProcess(part: string): unknown {
  process.stderr.write(`${part.replace(/^(bare )?set:|:$/, '')} …\n`);
  const { status, stdout } = spawnSync(process.execPath, [...process.execArgv, process.argv[1]!, '--part', part], {
    stdio: ['ignore', 'pipe', 'inherit'],
    encoding: 'utf8',
    maxBuffer: 1 << 28,
  });
  if (status !== 0) throw new Error(`${part} ended with status ${status ?? 'none'}`);
  return JSON.parse(stdout);
}

async function runPart(part: string, sets: readonly GoldSet[]): Promise<void> {
  const [kind, name = ''] = part.split(':');
  const result =
    kind === 'glossary'
      ? evaluateGlossary()
      : kind === 'pseudo'
        ? recoverPseudoSynonyms((await sourcesUnder(findSet(sets, name).folder)).sources)
        : await evaluateSet(findSet(sets, name), kind === 'set');
  process.stdout.write(JSON.stringify(result ?? null));
}
