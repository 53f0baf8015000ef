// The commits that changed documents of a folder, and the two versions of each document that they changed.
import { FORMATS, formatOf } from '../../text/sourceText.js';
import { GitFailed } from './git.js';
import type { Git } from './git.js';

/** A document that a commit changed: object names of its contents, and its path below the repository's root. */
export interface ChangedDocument {
  readonly path: string;
  readonly before: string;
  readonly after: string;
}

/** A commit's name with what it changed. */
export interface CommitChanges {
  readonly commit: string;
  readonly documents: readonly ChangedDocument[];
}

/** Regular files: links and submodules have other modes. */
const FILE_MODE = /^100/;

/** True where the folder lies in a repository that git reads for this user. */
export async function isRepository(git: Git, signal: AbortSignal): Promise<boolean> {
  return (await outputOrNone(git, ['rev-parse', '--is-inside-work-tree'], signal)).trim() === 'true';
}

/** The most recent commits (no merges) that changed documents of the folder, newest first; empty before the first commit. */
export async function listCommits(git: Git, most: number, signal: AbortSignal): Promise<string[]> {
  const words = ['rev-list', '--no-merges', `--max-count=${most}`, 'HEAD', '--', ...DOCUMENTS];
  return (await outputOrNone(git, words, signal)).split('\n').filter((line) => line !== '');
}

/** What git writes, or nothing where it says that it failed: there is no repository, or no commit yet. */
async function outputOrNone(git: Git, words: readonly string[], signal: AbortSignal): Promise<string> {
  try {
    return await git.read(words, { signal });
  } catch (error) {
    if (error instanceof GitFailed) return '';
    throw error;
  }
}

/** What commits changed in documents of the folder: contents alone, neither new files nor deleted or renamed ones. */
export async function changesOf(git: Git, commits: readonly string[], signal: AbortSignal): Promise<CommitChanges[]> {
  if (commits.length === 0) return [];
  const words = ['diff-tree', '--stdin', '-r', '-z', '--raw', '--no-abbrev', '--no-renames', '--diff-filter=M'];
  const safe = ['--no-ext-diff', '--no-textconv', '--no-color'];
  const output = await git.read([...words, ...safe, '--', ...DOCUMENTS], {
    input: commits.map((commit) => `${commit}\n`).join(''),
    signal,
  });
  return readRawChanges(output);
}

/** Reads what `git diff-tree --stdin -z --raw` writes: a commit's name, then pairs of a line of figures and a path. */
export function readRawChanges(output: string): CommitChanges[] {
  const found: { commit: string; documents: ChangedDocument[] }[] = [];
  const fields = output.split('\0');
  for (let at = 0; at < fields.length; at++) {
    const field = fields[at]!;
    if (/^[0-9a-f]{40,64}\n?$/.test(field)) {
      found.push({ commit: field.trim(), documents: [] });
      continue;
    }
    const figures = /^:(\d+) (\d+) ([0-9a-f]+) ([0-9a-f]+) M$/.exec(field.trimStart());
    if (figures === null) continue;
    const path = fields[++at] ?? '';
    const [, modeBefore, modeAfter, before, after] = figures as unknown as [string, string, string, string, string];
    const isFile = FILE_MODE.test(modeBefore) && FILE_MODE.test(modeAfter);
    if (isFile && formatOf(path) !== undefined) found[found.length - 1]?.documents.push({ path, before, after });
  }
  return found;
}

const DOCUMENTS = Object.keys(FORMATS).map((extension) => `:(glob,icase)**/*.${extension}`);
