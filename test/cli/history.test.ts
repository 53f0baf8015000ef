// The command line reads a folder's history: what it tells stands beside the questions, unless it is not wanted.
import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { evenword } from '../support/commandLine.js';
import { temporaryFolder } from '../support/languageServer.js';
import { hasGit, movePages, TOLD } from '../support/movingPages.js';

let folder: Awaited<ReturnType<typeof temporaryFolder>>;

describe.skipIf(!hasGit)('the history (skipped where there is no git)', () => {
  beforeAll(async () => {
    folder = await temporaryFolder({});
    movePages(folder.path);
  });
  afterAll(() => folder.dispose());

  const ask = async (...words: string[]): Promise<string> => {
    const cache = join(folder.path, 'cache');
    const variables = { XDG_CACHE_HOME: cache, LOCALAPPDATA: cache };
    const run = await evenword(['ask', join(folder.path, 'docs'), ...words], folder.path, variables);
    expect(run.code).toBe(0);
    return run.out;
  };

  it('tells beside a question what writers replaced, and is kept outside the documents', async () => {
    expect(await ask()).toContain(TOLD);
    expect(readdirSync(join(folder.path, 'cache/evenword'))).toHaveLength(1);
    expect(await ask('--format', 'json')).toContain(TOLD);
    expect(readdirSync(join(folder.path, 'docs'))).toEqual(['page.md']);
  });

  it('is not read where it is not wanted', async () => {
    const out = await ask('--no-history');
    expect(out).toContain('plugin');
    expect(out).not.toContain('writers replaced');
  });
});
