// What the history of a set tells, up to the commit that is evaluated: nothing of what its maintainers decided afterwards.
import { execFileSync } from 'node:child_process';
import type { ExecFileSyncOptionsWithStringEncoding } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { PastEdits } from '../../server/src/mining/pastEdits.js';
import { DEFAULT_BOUNDS, readHistory } from '../../server/src/node/history/history.js';
import { DATA } from './gold.js';
import type { GoldSet } from './gold.js';

/**
 * The past edits of a set of which there is a bundle of its history, else undefined.
 * @throws Error where the bundle does not end with the commit that the set's documents are of
 */
export async function pastEditsOf({ name, commit }: GoldSet): Promise<PastEdits | undefined> {
  const bundle = join(DATA, 'history', `${name}.bundle`);
  if (!existsSync(bundle)) return undefined;
  const folder = mkdtempSync(join(tmpdir(), 'evenword-evaluate-'));
  try {
    const quietly: ExecFileSyncOptionsWithStringEncoding = { stdio: ['ignore', 'pipe', 'ignore'], encoding: 'utf8' };
    execFileSync('git', ['clone', '--quiet', '--branch', 'evaluation', bundle, folder], quietly);
    const head = execFileSync('git', ['-C', folder, 'rev-parse', 'HEAD'], quietly).trim();
    if (head !== commit) throw new Error(`${bundle} ends with ${head}, and the documents are of ${commit}`);
    // Whatever the machine's load, the same commits are read.
    const bounds = { ...DEFAULT_BOUNDS, time: 3_600_000 };
    return (await readHistory(folder, { version: '', bounds }))?.edits;
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
