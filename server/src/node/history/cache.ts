// What was found in commits, kept in a folder outside the repository: a commit never changes, so it is read once.
import { createHash, randomUUID } from 'node:crypto';
import { readFile, rename, rm, stat, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { makeFolder } from '../makeFolder.js';
import type { Replacement } from '../../mining/pastEdits.js';

/** Replacements by the name of their commit. */
export type KnownCommits = ReadonlyMap<string, readonly Replacement[]>;

/** Which file of the cache is meant. */
export interface CachePlace {
  readonly folder: string;
  /** The folder of the documents, absolute: each has a file of its own. */
  readonly documents: string;
  /** What another version of the engine has written counts for nothing. */
  readonly version: string;
}

/** To be raised where replacements are found in another way, or written in another form. */
const FORM = 1;
/** A larger file was not written by us. In bytes. */
const LARGEST = 64 * 1024 * 1024;

interface Written {
  readonly form: number;
  readonly version: string;
  readonly documents: string;
  readonly commits: readonly (readonly [string, readonly Row[]])[];
}

type Row = readonly [
  from: string,
  to: string,
  before: string,
  after: string,
  mends: 0 | 1,
  page: number,
  sentences: readonly number[],
];

/** What is known; nothing where the file is not there, was written by another version, or is broken. */
export async function readCache(place: CachePlace): Promise<KnownCommits> {
  try {
    const path = pathOf(place);
    if ((await stat(path)).size > LARGEST) return new Map();
    const text = await readFile(path, 'utf8');
    const line = text.indexOf('\n');
    if (text.slice(0, line) !== checksum(text.slice(line + 1))) return new Map();
    const written = JSON.parse(text.slice(line + 1)) as Written;
    const isOurs = written.form === FORM && written.version === place.version && written.documents === place.documents;
    if (!isOurs) return new Map();
    return new Map(written.commits.map(([commit, rows]) => [commit, rows.map(replacementOf)]));
  } catch {
    return new Map();
  }
}

/** Writes what is known. A cache that cannot be written is none: the next reading takes longer. */
export async function writeCache(place: CachePlace, known: KnownCommits): Promise<void> {
  const commits = [...known].map(([commit, replacements]) => [commit, replacements.map(rowOf)] as const);
  const { version, documents } = place;
  const text = JSON.stringify({ form: FORM, version, documents, commits } satisfies Written);
  const path = pathOf(place);
  const draft = `${path}.${randomUUID()}`;
  try {
    await makeFolder(place.folder, 0o700);
    // Two programs may write at once: each file that is read is whole.
    await writeFile(draft, `${checksum(text)}\n${text}`, { mode: 0o600, flag: 'wx' });
    await rename(draft, path);
  } catch {
    await rm(draft, { force: true }).catch(() => undefined);
  }
}

function pathOf({ folder, documents }: CachePlace): string {
  return join(folder, `history-${checksum(documents).slice(0, 24)}.json`);
}

function checksum(text: string): string {
  return createHash('sha256').update(text).digest('hex');
}

function rowOf({ from, to, before, after, mends, page, sentences }: Replacement): Row {
  return [from, to, before, after, mends ? 1 : 0, page, sentences];
}

function replacementOf([from, to, before, after, mends, page, sentences]: Row): Replacement {
  return { from, to, before, after, mends: mends === 1, page, sentences };
}
