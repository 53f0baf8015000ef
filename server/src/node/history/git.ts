// The git program, to read a repository with: nothing is written, nothing of the repository is run, nothing is fetched.
import { spawn } from 'node:child_process';
import { accessSync, constants, statSync } from 'node:fs';
import { delimiter, isAbsolute, join, relative } from 'node:path';
import type { Readable } from 'node:stream';

/**
 * Settings that outweigh those of the repository: whatever in it names a program names none. Reading commands run few of them;
 * all are named, so that no version of git has to be trusted on that.
 */
const HARMLESS = [
  'core.fsmonitor=false',
  'core.hooksPath=/dev/null',
  'core.pager=cat',
  'core.sshCommand=false',
  'core.askPass=false',
  'core.editor=false',
  'credential.helper=',
  'diff.external=',
  'gpg.program=false',
  'log.showSignature=false',
  'protocol.allow=never',
  'safe.bareRepository=explicit',
  'uploadpack.packObjectsHook=',
].flatMap((setting) => ['-c', setting]);

/** What git needs of the environment: where programs and the user's own settings are. */
const KEPT = ['PATH', 'Path', 'HOME', 'USERPROFILE', 'XDG_CONFIG_HOME', 'SYSTEMROOT', 'SystemRoot', 'TEMP', 'TMP'];

const SET = {
  LC_ALL: 'C',
  GIT_OPTIONAL_LOCKS: '0',
  GIT_TERMINAL_PROMPT: '0',
  GIT_NO_LAZY_FETCH: '1',
  // What an older git would fetch all the same it may fetch by no protocol.
  GIT_ALLOW_PROTOCOL: 'none',
  GIT_NO_REPLACE_OBJECTS: '1',
  GIT_PAGER: 'cat',
};

/** A run of git ended with an error. */
export class GitFailed extends Error {
  override readonly name = 'GitFailed';
}

/** How a run is started. */
export interface RunOptions {
  /** What the program reads; closed when it is written. */
  readonly input?: string;
  /** Aborting it ends the program, and the run with the signal's reason. */
  readonly signal?: AbortSignal;
}

/** The git program of this computer, reading the repository of one folder. */
export class Git {
  private constructor(
    private readonly program: string,
    /** Absolute. */
    readonly folder: string,
  ) {}

  /** Undefined where there is no git program. A program that lies in the folder itself is none. */
  static find(folder: string, environment = process.env, platform = process.platform): Git | undefined {
    const path = environment['PATH'] ?? environment['Path'] ?? '';
    const name = platform === 'win32' ? 'git.exe' : 'git';
    for (const place of path.split(delimiter)) {
      // A relative place, and on Windows any name without a place, would be looked for in the folder that is worked in.
      if (!isAbsolute(place) || !isOutside(place, folder)) continue;
      const program = join(place, name);
      if (isProgram(program)) return new Git(program, folder);
    }
    return undefined;
  }

  /** All that a run writes, as text. @throws GitFailed where git says that it failed */
  async read(words: readonly string[], options: RunOptions = {}): Promise<string> {
    const parts: Buffer[] = [];
    await this.stream(
      words,
      async (output) => {
        for await (const part of output) parts.push(part as Buffer);
      },
      options,
    );
    return Buffer.concat(parts).toString('utf8');
  }

  /**
   * Runs git and hands its output over while it comes; ends it where the reader has read enough.
   * @throws GitFailed where git says that it failed before the reader had enough
   */
  async stream(
    words: readonly string[],
    take: (output: Readable) => Promise<void>,
    { input, signal }: RunOptions = {},
  ): Promise<void> {
    signal?.throwIfAborted();
    const own = { ...SET, ...Object.fromEntries(KEPT.flatMap((name) => entryOf(name))) };
    const run = spawn(this.program, ['--no-pager', ...HARMLESS, '-C', this.folder, ...words], {
      env: own,
      shell: false,
      windowsHide: true,
      stdio: ['pipe', 'pipe', 'pipe'],
    });
    const stop = (): void => void run.kill();
    signal?.addEventListener('abort', stop);
    let said = '';
    run.stderr.on('data', (part: Buffer) => (said = (said + part.toString('utf8')).slice(-500)));
    // A program that ends before it has read everything closes the pipe.
    run.stdin.on('error', () => undefined);
    run.stdin.end(input ?? '');
    const ended = new Promise<number | null>((resolve, reject) => {
      run.on('error', (error) => reject(new GitFailed(error.message)));
      run.on('close', resolve);
    });
    try {
      await take(run.stdout);
      const hadEnough = !run.stdout.readableEnded;
      if (hadEnough) {
        stop();
        // What was not read is thrown away: a run is over when its output is, and nobody else would take it.
        run.stdout.destroy();
      }
      const code = await ended;
      signal?.throwIfAborted();
      if (!hadEnough && code !== 0) throw new GitFailed(said.trim() || `git ended with ${String(code)}`);
    } finally {
      stop();
      ended.catch(() => undefined);
      signal?.removeEventListener('abort', stop);
    }
  }
}

function entryOf(name: string): [string, string][] {
  const value = process.env[name];
  return value === undefined ? [] : [[name, value]];
}

function isOutside(place: string, folder: string): boolean {
  const below = relative(folder, place);
  return below.startsWith('..') || isAbsolute(below);
}

function isProgram(path: string): boolean {
  try {
    accessSync(path, constants.X_OK);
    return statSync(path).isFile();
  } catch {
    return false;
  }
}
