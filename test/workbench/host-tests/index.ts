// Entry of the tests in the extension host: VS Code calls run(), mocha runs the suites beside this file.
import { readdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import Mocha from 'mocha';
import { grepVariable, tallyVariable } from '../tally.js';

/** Runs every suite. @throws when a test fails, which VS Code turns into exit code 1. */
export async function run(): Promise<void> {
  const grep = process.env[grepVariable];
  const mocha = new Mocha({ ui: 'bdd', timeout: 60_000, color: false, ...(grep !== undefined && { fgrep: grep }) });
  for (const name of readdirSync(__dirname).sort()) {
    if (name.endsWith('.suite.cjs')) mocha.addFile(path.join(__dirname, name));
  }
  const stats = await new Promise<Mocha.Stats>((resolve) => {
    const runner = mocha.run(() => resolve(runner.stats as Mocha.Stats));
  });
  const file = process.env[tallyVariable];
  if (file !== undefined) writeFileSync(file, JSON.stringify({ passed: stats.passes, failed: stats.failures }));
  if (stats.failures > 0) throw new Error(`${stats.failures} of ${stats.tests} tests failed`);
  if (stats.passes === 0) throw new Error('no test was run');
}
