// A repository in which writers move from the plug-in to the plugin, one sentence after the other, and are half way through.
import { execFileSync } from 'node:child_process';
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Git } from '../../server/src/node/history/git.js';

/** True where there is a git program to make repositories with. */
export const hasGit = Git.find('/nowhere') !== undefined;

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

/** What a question about the two tells of the history. */
export const TOLD = 'writers replaced “plug-in” by “plugin” 3 times, never the other way round';

/** Makes the repository in an empty folder; its page is `docs/page.md`. */
export function movePages(folder: string): void {
  const git = (...words: string[]): void => {
    const who = ['-c', 'user.name=A Writer', '-c', 'user.email=writer@example.org', '-c', 'commit.gpgSign=false'];
    execFileSync('git', ['-C', folder, ...who, ...words], { stdio: 'ignore' });
  };
  git('init', '--quiet');
  mkdirSync(join(folder, 'docs'));
  const names = SENTENCES.map(() => 'plug-in');
  for (let moved = 0; moved <= 3; moved++) {
    if (moved > 0) names[moved - 1] = 'plugin';
    writeFileSync(join(folder, 'docs/page.md'), page(names));
    git('add', '--all');
    git('commit', '--quiet', '--message', `Step ${moved}`);
  }
}
