// Runs the built command line as a process.
import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { projectRoot } from './languageServer.js';

/** What a run printed, and how it ended. */
export interface Run {
  readonly code: number | null;
  readonly out: string;
  readonly err: string;
}

/** Runs `evenword …words` in a folder, with further variables of the environment. */
export function evenword(words: readonly string[], cwd = projectRoot, variables: NodeJS.ProcessEnv = {}): Promise<Run> {
  const file = join(projectRoot, 'dist/cli.js');
  if (!existsSync(file)) throw new Error('dist/cli.js is missing: run npm run build first');
  return new Promise((resolve) => {
    const child = spawn(process.execPath, [file, ...words], {
      cwd,
      env: { ...process.env, ...variables },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    let out = '';
    let err = '';
    child.stdout.setEncoding('utf8').on('data', (text: string) => (out += text));
    child.stderr.setEncoding('utf8').on('data', (text: string) => (err += text));
    child.once('close', (code) => resolve({ code, out, err }));
  });
}
