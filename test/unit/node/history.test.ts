// Reading the history of a real repository: what is found, what is kept, and that nothing of the repository is ever run.
import { execFileSync } from 'node:child_process';
import {
  chmodSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { delimiter, join } from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import { Git } from '../../../server/src/node/history/git.js';
import { readRawChanges } from '../../../server/src/node/history/commits.js';
import { readContents } from '../../../server/src/node/history/contents.js';
import { DEFAULT_BOUNDS, readHistory } from '../../../server/src/node/history/history.js';
import { nodeServerHost } from '../../../server/src/node/serverHost.js';
import type { HistoryOptions, ReadHistory } from '../../../server/src/node/history/history.js';

const made: string[] = [];
const temporary = (): string => {
  const folder = mkdtempSync(join(tmpdir(), 'evenword-history-'));
  made.push(folder);
  return folder;
};
afterEach(() => {
  for (const folder of made.splice(0)) rmSync(folder, { recursive: true, force: true });
});

const hasGit = Git.find('/nowhere') !== undefined;
const WHO = ['-c', 'user.name=A Writer', '-c', 'user.email=writer@example.org', '-c', 'commit.gpgSign=false'];
const run = (folder: string, ...words: string[]): string =>
  execFileSync('git', ['-C', folder, ...WHO, ...words], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] });

/** A repository whose page says its sentence with one word after the other, a commit for each. */
function repository(words: readonly string[], page = 'page.md'): string {
  const folder = temporary();
  run(folder, 'init', '--quiet');
  for (const word of words) commit(folder, word, page);
  return folder;
}

function commit(folder: string, word: string, page = 'page.md'): void {
  mkdirSync(join(folder, page, '..'), { recursive: true });
  writeFileSync(join(folder, page), `# Page\n\nCopy all files into the ${word} before you start.\n`);
  run(folder, 'add', '--all');
  run(folder, 'commit', '--quiet', '--message', `Say ${word}`);
}

const read = async (folder: string, options: Partial<HistoryOptions> = {}): Promise<ReadHistory | undefined> =>
  readHistory(folder, { version: '1', ...options });

const found = (history: ReadHistory | undefined): string[] | undefined =>
  history?.edits.commits.flatMap((commit) => commit.map(({ from, to }) => `${from} → ${to}`));

describe.skipIf(!hasGit)('the history of a repository (skipped where there is no git)', () => {
  it('tells what was replaced, newest first', async () => {
    const history = await read(repository(['folder', 'directory', 'catalogue']));
    expect(found(history)).toEqual(['directory → catalogue', 'folder → directory']);
    expect(history).toMatchObject({ commits: 3, readNow: 3, leftOver: 0 });
  });

  it('is over where a reader has enough, whatever git has still to say', async () => {
    const folder = repository(['folder']);
    writeFileSync(join(folder, 'large.md'), 'Check the mooring.\n'.repeat(50_000));
    run(folder, 'add', '--all');
    const name = run(folder, 'rev-parse', ':large.md').trim();
    const names = Array.from({ length: 50 }, () => name);
    const git = Git.find(folder)!;
    const read: number[] = [];
    const two = async (next: () => Promise<{ bytes: number }>): Promise<void> => {
      for (let i = 0; i < 2; i++) read.push((await next()).bytes);
    };
    await readContents(git, names, 2 ** 20, two, new AbortController().signal);
    expect(read).toEqual([950_000, 950_000]);
  });

  it('is that of the folder alone, whatever its pages are called', async () => {
    const folder = repository(['folder', 'directory'], 'docs/ünd "more" [x]/page.md');
    commit(folder, 'server', 'other/page.md');
    commit(folder, 'host', 'other/page.md');
    expect(found(await read(join(folder, 'docs')))).toEqual(['folder → directory']);
    expect(found(await read(join(folder, 'other')))).toEqual(['server → host']);
    expect(found(await read(folder))).toEqual(['server → host', 'folder → directory']);
  });

  it('is nothing where there is no repository, no commit, or no page', async () => {
    expect(await read(temporary())).toBeUndefined();
    expect(await read(join(temporary(), 'missing'))).toBeUndefined();
    expect(await read(repository([]))).toMatchObject({ edits: { commits: [] }, commits: 0 });
    expect(await read(repository(['folder', 'directory'], 'program.py'))).toMatchObject({ commits: 0 });
  });

  it('leaves out what is no text, and versions that are too large', async () => {
    const folder = repository(['folder']);
    writeFileSync(join(folder, 'page.md'), Buffer.from([0x43, 0xff, 0xfe, 0x0a]));
    run(folder, 'commit', '--quiet', '--all', '--message', 'Break it');
    commit(folder, 'directory');
    commit(folder, 'catalogue');
    expect(found(await read(folder))).toEqual(['directory → catalogue']);
    expect(found(await read(folder, { bounds: { ...DEFAULT_BOUNDS, largest: 20 } }))).toEqual([]);
  });

  it('ends where its signal is aborted', async () => {
    const folder = repository(['folder', 'directory']);
    await expect(read(folder, { signal: AbortSignal.abort(new Error('enough')) })).rejects.toThrow('enough');
  });
});

describe.skipIf(!hasGit)('what was read of a history is kept', () => {
  it('by commit: a later reading reads the new ones alone, and gives what reading all anew gives', async () => {
    const folder = repository(['folder', 'directory']);
    const cacheFolder = join(temporary(), 'a', 'b');
    await read(folder, { cacheFolder });
    commit(folder, 'catalogue');
    const later = await read(folder, { cacheFolder });
    expect(later).toMatchObject({ commits: 3, readNow: 1 });
    expect(later?.edits).toEqual((await read(folder))?.edits);
    expect(await read(folder, { cacheFolder })).toMatchObject({ commits: 3, readNow: 0, edits: later?.edits });
  });

  it('whatever becomes of the commits: those that are gone count no more', async () => {
    const folder = repository(['folder', 'directory', 'catalogue']);
    const cacheFolder = temporary();
    await read(folder, { cacheFolder });
    run(folder, 'reset', '--quiet', '--hard', 'HEAD~1');
    commit(folder, 'cabinet');
    const history = await read(folder, { cacheFolder });
    expect(found(history)).toEqual(['directory → cabinet', 'folder → directory']);
    expect(history?.readNow).toBe(1);
  });

  it('until another version reads it, or it is broken: then all is read anew, and nothing is said', async () => {
    const folder = repository(['folder', 'directory']);
    const cacheFolder = temporary();
    await read(folder, { cacheFolder });
    expect(await read(folder, { cacheFolder, version: '2' })).toMatchObject({ readNow: 2 });
    const [file] = readdirSync(cacheFolder);
    const path = join(cacheFolder, file!);
    const sound = readFileSync(path, 'utf8');
    for (const broken of ['', 'x', sound.slice(0, -2), sound.replace('directory', 'catalogue'), '0\n{"form":1}']) {
      writeFileSync(path, broken);
      const history = await read(folder, { cacheFolder, version: '2' });
      expect(history).toMatchObject({ readNow: 2 });
      expect(found(history)).toEqual(['folder → directory']);
      expect(readFileSync(path, 'utf8')).toBe(sound);
    }
    expect(readdirSync(cacheFolder)).toHaveLength(1);
  });

  it('in no folder that cannot be written, which is no reason to fail', async () => {
    const folder = repository(['folder', 'directory']);
    const file = join(temporary(), 'file');
    writeFileSync(file, '');
    expect(found(await read(folder, { cacheFolder: join(file, 'below') }))).toEqual(['folder → directory']);
  });

  it('within bounds: what is beyond them is left to the next reading', async () => {
    const folder = repository(['folder', 'directory', 'catalogue', 'cabinet']);
    const cacheFolder = temporary();
    expect(await read(folder, { bounds: { ...DEFAULT_BOUNDS, commits: 2 } })).toMatchObject({ commits: 2 });
    const bounds = { ...DEFAULT_BOUNDS, bytes: 100 };
    const first = await read(folder, { cacheFolder, bounds });
    expect(first).toMatchObject({ commits: 4, readNow: 1, leftOver: 3 });
    expect(found(first)).toEqual(['catalogue → cabinet']);
    expect(await read(folder, { cacheFolder, bounds })).toMatchObject({ readNow: 1, leftOver: 2 });
    expect(await read(folder, { cacheFolder, bounds: { ...DEFAULT_BOUNDS, time: 0 } })).toMatchObject({ readNow: 0 });
    expect(found(await read(folder, { cacheFolder }))).toHaveLength(3);
  });
});

describe.skipIf(!hasGit || process.platform === 'win32')('a hostile repository', () => {
  /** Makes a repository in which everything that can name a program names one that leaves a mark. */
  function hostile(): { readonly folder: string; readonly marks: () => string[] } {
    const folder = repository(['folder', 'directory', 'catalogue']);
    const place = temporary();
    const program = (name: string): string => {
      const path = join(place, name);
      writeFileSync(path, `#!/bin/sh\ntouch "${path}.ran"\n`);
      chmodSync(path, 0o755);
      return path;
    };
    const settings: Record<string, string> = {
      'core.fsmonitor': program('fsmonitor'),
      'core.hooksPath': join(place, 'hooks'),
      'core.pager': program('pager'),
      'core.editor': program('editor'),
      'core.sshCommand': program('ssh'),
      'core.askPass': program('askpass'),
      'core.alternateRefsCommand': program('alternates'),
      'core.gitProxy': program('proxy'),
      'credential.helper': program('credential'),
      'diff.external': program('external'),
      'diff.page.command': program('command'),
      'diff.page.textconv': program('textconv'),
      'filter.page.clean': program('clean'),
      'filter.page.smudge': program('smudge'),
      'filter.page.process': program('process'),
      'merge.page.driver': program('merge'),
      'gpg.program': program('gpg'),
      'log.showSignature': 'true',
      'pager.log': program('pager-log'),
      'pager.rev-list': program('pager-list'),
      'pager.diff-tree': program('pager-tree'),
      'alias.rev-list': `!${program('alias')}`,
      'uploadpack.packObjectsHook': program('pack'),
      'extensions.partialClone': 'origin',
      'remote.origin.url': `ext::${program('fetch')}`,
      'remote.origin.promisor': 'true',
      'remote.origin.partialclonefilter': 'blob:none',
      'protocol.allow': 'always',
      'protocol.ext.allow': 'always',
    };
    run(folder, 'config', 'core.repositoryFormatVersion', '1');
    for (const [name, value] of Object.entries(settings)) run(folder, 'config', name, value);
    mkdirSync(join(place, 'hooks'));
    for (const hook of [
      'post-index-change',
      'pre-commit',
      'post-checkout',
      'reference-transaction',
      'fsmonitor-watchman',
    ])
      writeFileSync(join(place, 'hooks', hook), `#!/bin/sh\ntouch "${join(place, hook)}.ran"\n`, { mode: 0o755 });
    writeFileSync(join(folder, '.git/info/attributes'), '*.md diff=page filter=page merge=page\n');
    return { folder, marks: () => readdirSync(place).filter((name) => name.endsWith('.ran')) };
  }

  it('is read, and none of its programs is run', async () => {
    const { folder, marks } = hostile();
    expect(found(await read(folder))).toEqual(['directory → catalogue', 'folder → directory']);
    expect(marks()).toEqual([]);
    // The programs would run: without our care some do.
    writeFileSync(join(folder, 'page.md'), 'Changed.\n');
    const careless = { stdio: 'ignore', env: { ...process.env, GIT_TERMINAL_PROMPT: '0' } } as const;
    for (const words of [['status'], ['diff'], ['log', '-p', '--ext-diff']]) {
      try {
        execFileSync('git', ['-C', folder, ...words], careless);
      } catch {
        // Programs that do nothing but leave a mark are of no use to git.
      }
    }
    expect(marks()).toEqual(expect.arrayContaining(['fsmonitor.ran', 'post-index-change.ran']));
  });

  it('is read as far as it goes where contents are missing: they are fetched from nowhere', async () => {
    const { folder, marks } = hostile();
    const blob = run(folder, 'rev-parse', 'HEAD~1:page.md').trim();
    rmSync(join(folder, '.git/objects', blob.slice(0, 2), blob.slice(2)), { force: true });
    expect(found(await read(folder))).toEqual([]);
    expect(marks()).toEqual([]);
    try {
      execFileSync('git', ['-C', folder, 'cat-file', 'blob', blob], { stdio: 'ignore' });
    } catch {
      // The program that should fetch fetches nothing.
    }
    expect(marks()).toEqual(['fetch.ran']);
  });

  it('with its own copy of git: that one is not run', () => {
    const { folder } = hostile();
    writeFileSync(join(folder, 'git'), '#!/bin/sh\ntouch ran\n', { mode: 0o755 });
    const path = (places: readonly string[]): NodeJS.ProcessEnv => ({ PATH: places.join(delimiter) });
    expect(Git.find(folder, path([folder, '.', '', 'bin']))).toBeUndefined();
    expect(Git.find(temporary(), path([folder]))).toBeDefined();
    expect(Git.find(folder, {})).toBeUndefined();
    expect(existsSync(join(folder, 'ran'))).toBe(false);
  });
});

describe('a folder of another scheme than file', () => {
  it('has no history', async () => {
    const { signal } = new AbortController();
    expect(await nodeServerHost('1').readHistory('vscode-vfs://github/a/b', undefined, signal)).toBeUndefined();
  });
});

describe('what diff-tree writes', () => {
  it('is read by its figures; links, submodules and other files are left out', () => {
    const [a, b] = ['a'.repeat(40), 'b'.repeat(40)];
    const changed = (mode: string, path: string): string => `:${mode} ${mode} ${a} ${b} M\0${path}\0`;
    const output = `${a}\0${changed('100644', 'a b.md')}${changed('120000', 'link.md')}${changed('160000', 'sub.md')}${b}\0${changed('100755', 'x.py')}`;
    expect(readRawChanges(output)).toEqual([
      { commit: a, documents: [{ path: 'a b.md', before: a, after: b }] },
      { commit: b, documents: [] },
    ]);
    expect(readRawChanges('')).toEqual([]);
  });
});
