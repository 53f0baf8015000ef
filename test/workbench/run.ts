// Runs the workbench tests of both kinds and sums them up.
import { NoWorkbench } from './host/noWorkbench.js';
import { runHostTests } from './runHostTests.js';
import { runPersonTests } from './runPersonTests.js';
import { add, type Tally } from './tally.js';

/** A kind of tests: says what it does through `say`, and runs only tests with `grep` in their titles if given. */
export type Kind = (say: (line: string) => void, grep?: string) => Promise<Tally>;

const kinds: Readonly<Record<string, Kind>> = { host: runHostTests, person: runPersonTests };

/**
 * Runs the kinds named in `argv` (`host`, `person`; both when none is named); `--grep=TEXT` narrows the tests.
 * @returns the exit code: 0 all passed; 1 a failure, or no test was run at all; 2 wrong arguments. A kind that finds no
 * workbench fails where `CI=true`, and is skipped elsewhere.
 */
export async function runWorkbenchTests(argv: readonly string[]): Promise<number> {
  const grep = argv.find((argument) => argument.startsWith('--grep='))?.slice('--grep='.length);
  const named = argv.filter((argument) => !argument.startsWith('--grep='));
  const unknown = named.find((name) => !Object.hasOwn(kinds, name));
  if (unknown !== undefined) {
    console.error(`unknown kind of tests “${unknown}”: give ${Object.keys(kinds).join(' or ')}`);
    return 2;
  }
  const begun = performance.now();
  let total: Tally = { passed: 0, failed: 0 };
  let skipped = 0;
  for (const [name, run] of Object.entries(kinds)) {
    if (named.length > 0 && !named.includes(name)) continue;
    const say = (line: string): void => console.error(`[workbench ${name}] ${line}`);
    try {
      total = add(total, await run(say, grep));
    } catch (error) {
      const inCi = process.env['CI'] === 'true';
      if (error instanceof NoWorkbench && !inCi) {
        say(`SKIPPED, no workbench can be had (in CI this fails): ${error.message}`);
        skipped++;
      } else {
        say(`could not be run: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}`);
        total = add(total, { passed: 0, failed: 1 });
      }
    }
  }
  const seconds = Math.round((performance.now() - begun) / 1000);
  const left = skipped > 0 ? `, ${skipped} kinds of tests skipped` : '';
  console.log(`\nWorkbench tests: ${total.passed} passed, ${total.failed} failed${left} (${seconds} s)`);
  return total.failed > 0 || (total.passed === 0 && skipped === 0) ? 1 : 0;
}
