// The command line reads a folder's history: what it tells stands beside the questions, unless it is not wanted.
import { execFileSync } from 'node:child_process';
import { mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Git } from '../../server/src/node/history/git.js';
import { evenword } from '../support/commandLine.js';
import { temporaryFolder } from '../support/languageServer.js';

const SENTENCES = [
  'Install the NAME on the build server before you start.',
  'Every NAME is loaded when the server starts.',
  'Ask the NAME for its version before you update it.',
  'You can remove the NAME again at any time.',
  'Each NAME has a folder of its own on the server.',
  'Write a NAME if you miss a feature of the server.',
];
const page = (names: readonly string[]): string =>
  `# Extending\n\n${SENTENCES.map((sentence, at) => sentence.replace('NAME', names[at]!)).join('\n\n')}\n`;

let folder: Awaited<ReturnType<typeof temporaryFolder>>;
const git = (...words: string[]): void => {
  const who = ['-c', 'user.name=A Writer', '-c', 'user.email=writer@example.org', '-c', 'commit.gpgSign=false'];
  execFileSync('git', ['-C', folder.path, ...who, ...words], { stdio: 'ignore' });
};

describe.skipIf(Git.find('/nowhere') === undefined)('the history (skipped where there is no git)', () => {
  beforeAll(async () => {
    folder = await temporaryFolder({});
    git('init', '--quiet');
    mkdirSync(join(folder.path, 'docs'));
    // Writers move from the plug-in to the plugin, one sentence after the other, and are half way through.
    const names = SENTENCES.map(() => 'plug-in');
    for (let moved = 0; moved <= 3; moved++) {
      if (moved > 0) names[moved - 1] = 'plugin';
      writeFileSync(join(folder.path, 'docs/page.md'), page(names));
      git('add', '--all');
      git('commit', '--quiet', '--message', `Step ${moved}`);
    }
  });
  afterAll(() => folder.dispose());

  const ask = async (...words: string[]): Promise<string> => {
    const run = await evenword(['ask', join(folder.path, 'docs'), ...words], folder.path, {
      XDG_CACHE_HOME: join(folder.path, 'cache'),
      LOCALAPPDATA: join(folder.path, 'cache'),
    });
    expect(run.code).toBe(0);
    return run.out;
  };
  const TOLD = 'writers replaced “plug-in” by “plugin” 3 times, never the other way round';

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
