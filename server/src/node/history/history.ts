// What earlier versions of a folder's documents tell: its repository's recent commits, read once and kept by commit.
import { createHash } from 'node:crypto';
import type { PastEdits, Replacement } from '../../mining/pastEdits.js';
import { RevisionReader } from '../../revisions/replacements.js';
import { formatOf } from '../../text/sourceText.js';
import type { SourceText } from '../../text/sourceText.js';
import { readCache, writeCache } from './cache.js';
import type { KnownCommits } from './cache.js';
import { changesOf, isRepository, listCommits } from './commits.js';
import { readContents } from './contents.js';
import type { ReadObject } from './contents.js';
import { Git, GitFailed } from './git.js';

/** How much of a history is read. */
export interface HistoryBounds {
  /** The most recent commits that changed documents of the folder. */
  readonly commits: number;
  /** Bytes of the documents' versions that one reading may come to; the rest is left to the next one. */
  readonly bytes: number;
  /** Larger versions of documents are skipped. In bytes. */
  readonly largest: number;
  /** Milliseconds that one reading may take; the rest is left to the next one. */
  readonly time: number;
}

export const DEFAULT_BOUNDS: HistoryBounds = {
  commits: 2000,
  bytes: 256 * 1024 * 1024,
  largest: 256 * 1024,
  time: 30_000,
};

/** What a reading needs besides the folder. */
export interface HistoryOptions {
  /** Where findings are kept by commit; undefined keeps none. It must lie outside the repository. */
  readonly cacheFolder?: string | undefined;
  /** Of the engine: what another version found is found anew. */
  readonly version: string;
  readonly bounds?: HistoryBounds;
  readonly signal?: AbortSignal;
}

/** What was read, and how much of it this time. */
export interface ReadHistory {
  readonly edits: PastEdits;
  /** Stands for the commits that count: equal keys, equal edits. */
  readonly key: string;
  /** Commits within the bounds. */
  readonly commits: number;
  /** Of these, the ones read now; the others were known. */
  readonly readNow: number;
  /** Of these, the ones left to the next reading. */
  readonly leftOver: number;
}

/** A repository may be so large that listing its commits takes longer than this beyond what reading them may take. In milliseconds. */
const LISTING = 30_000;

/**
 * Reads the past edits of a folder's documents. Undefined where there is nothing to read: no git program, no repository, or one
 * that git cannot read for this user. Never fails but where its signal is aborted.
 */
export async function readHistory(folder: string, options: HistoryOptions): Promise<ReadHistory | undefined> {
  const { bounds = DEFAULT_BOUNDS, signal } = options;
  const limit = AbortSignal.timeout(bounds.time + LISTING);
  try {
    return await read(folder, options, bounds, signal === undefined ? limit : AbortSignal.any([signal, limit]));
  } catch (error) {
    signal?.throwIfAborted();
    if (limit.aborted || error instanceof GitFailed) return undefined;
    throw error;
  }
}

async function read(
  folder: string,
  { cacheFolder, version }: HistoryOptions,
  bounds: HistoryBounds,
  signal: AbortSignal,
): Promise<ReadHistory | undefined> {
  const git = Git.find(folder);
  if (git === undefined || !(await isRepository(git, signal))) return undefined;
  const commits = await listCommits(git, bounds.commits, signal);
  const place = cacheFolder === undefined ? undefined : { folder: cacheFolder, documents: folder, version };
  const known = place === undefined ? new Map<string, readonly Replacement[]>() : await readCache(place);
  const wanted = commits.filter((commit) => !known.has(commit));
  const found = await readCommits(git, wanted, bounds, signal);
  const all: KnownCommits = new Map(
    commits.flatMap((commit) => {
      const replacements = found.get(commit) ?? known.get(commit);
      return replacements === undefined ? [] : [[commit, replacements]];
    }),
  );
  if (place !== undefined && found.size > 0) await writeCache(place, all);
  return {
    edits: { commits: [...all.values()].filter((replacements) => replacements.length > 0) },
    key: createHash('sha256')
      .update([...all.keys()].join('\n'))
      .digest('hex'),
    ...{ commits: commits.length, readNow: found.size, leftOver: wanted.length - found.size },
  };
}

/**
 * The replacements of commits, the first ones first, as far as the bounds reach. Of the commit that they end in counts what was
 * read: one that is larger than the bounds would be begun for ever.
 */
async function readCommits(
  git: Git,
  commits: readonly string[],
  bounds: HistoryBounds,
  signal: AbortSignal,
): Promise<Map<string, readonly Replacement[]>> {
  const until = Date.now() + bounds.time;
  const found = new Map<string, Replacement[]>();
  const changes = new Map((await changesOf(git, commits, signal)).map((each) => [each.commit, each.documents]));
  const queue = commits.map((commit) => ({ commit, documents: changes.get(commit) ?? [] }));
  const names = queue.flatMap(({ documents }) => documents.flatMap(({ before, after }) => [before, after]));
  const reader = new RevisionReader();
  let bytes = 0;
  const isEnough = (): boolean => bytes >= bounds.bytes || Date.now() >= until;
  const readAll = async (next: () => Promise<ReadObject>): Promise<void> => {
    for (const { commit, documents } of queue) {
      if (isEnough()) return;
      const own: Replacement[] = [];
      found.set(commit, own);
      for (const { path } of documents) {
        if (isEnough()) return;
        const [before, after] = [await next(), await next()];
        bytes += before.bytes + after.bytes;
        if (before.contents === undefined || after.contents === undefined) continue;
        own.push(...reader.replacements(versionOf(path, before.contents), versionOf(path, after.contents)));
        // Whoever edits meanwhile waits for one page at most.
        await new Promise(setImmediate);
      }
    }
  };
  if (names.length > 0) await readContents(git, names, bounds.largest, readAll, signal);
  else for (const commit of commits) found.set(commit, []);
  return found;
}

function versionOf(path: string, text: string): SourceText {
  return { uri: `file:///${path}`, format: formatOf(path) ?? 'plaintext', text };
}
