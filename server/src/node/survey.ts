// Reading folders into an engine: documents found and read, facts gathered on workers, relations settled.
import { existsSync } from 'node:fs';
import { stat } from 'node:fs/promises';
import { dirname, join, resolve } from 'node:path';
import { finish } from '../base/work.js';
import { Engine } from '../engine/engine.js';
import type { MiningOptions } from '../mining/options.js';
import type { PastEdits } from '../mining/pastEdits.js';
import type { Profiles } from '../engine/factsOf.js';
import type { FilePolicy } from '../text/filePolicy.js';
import { withPathLanguage } from '../text/language.js';
import type { SourceText } from '../text/sourceText.js';
import { decodeUtf8 } from './decoding.js';
import { FactsPool } from './factsPool.js';
import { readHistory } from './history/history.js';
import type { HistoryOptions } from './history/history.js';
import { CannotRead, findFiles, readDocument, readText, termbasesAbove, uriOfPath } from './files.js';
import type { LeftOut } from './files.js';

/** How far a survey has come. */
export type SurveyProgress = (stage: 'reading' | 'history' | 'mining', done: number, all: number) => void;

/** Folders read into an engine. */
export interface SurveyedFolders {
  readonly engine: Engine;
  /** The folder that holds all named paths, as a URI with a closing slash. */
  readonly rootUri: string;
  readonly leftOut: readonly LeftOut[];
}

/**
 * Reads all documents and termbases under the paths, and the termbases of the folders above up to the repository's root.
 * @throws CannotRead where a named path is missing or unreadable.
 */
export async function surveyFolders(
  paths: readonly string[],
  profiles: Profiles,
  options: {
    readonly mine: boolean;
    readonly files?: FilePolicy;
    readonly mining?: MiningOptions;
    /** How the folders' history is read, where it is wanted. */
    readonly history?: Omit<HistoryOptions, 'signal'>;
    readonly progress?: SurveyProgress;
    readonly signal?: AbortSignal;
  },
): Promise<SurveyedFolders> {
  const { mine, files, mining, history, progress, signal } = options;
  const absolute = paths.map((path) => resolve(path));
  const found = [];
  for (const path of absolute) found.push(await findFiles(path, files));
  const root = await commonFolder(absolute);
  const documents = [...new Set(found.flatMap((each) => each.documents))];
  const above = [...new Set((await foldersOf(absolute)).flatMap((folder) => termbasesInForce(folder, root)))];
  const termbases = [...new Set([...above, ...found.flatMap((each) => each.termbases)])];
  const leftOut = found.flatMap((each) => each.leftOut);
  const rootUri = uriOfPath(join(root, '/'));
  const sources: SourceText[] = [];
  for (const path of documents) {
    const file = await readDocument(path);
    if ('source' in file) sources.push(withPathLanguage(file.source, rootUri));
    else leftOut.push(file.leftOut);
  }
  const past = mine && history !== undefined ? pastEditsOf(await foldersOf(absolute), history, signal) : undefined;
  // Where reading pages fails first, that is what is told.
  past?.catch(() => undefined);
  const pool = new FactsPool(profiles);
  const facts = mine
    ? await pool.gather(sources, {
        ...(signal && { signal }),
        progress: (done, all) => progress?.('reading', done, all),
      })
    : [];
  await pool.end();
  if (past !== undefined) progress?.('history', 0, 1);
  const pastEdits = await past;
  const engine = new Engine(profiles);
  engine.apply({
    mining: { ...mining, pastEdits },
    documents: sources.map((source, index) => {
      const known = facts[index];
      return { uri: source.uri, source, ...(known && { facts: known }) };
    }),
    termbases: await Promise.all(
      termbases.map(async (path) => ({ uri: uriOfPath(path), text: await readTermbase(path) })),
    ),
  });
  if (mine) {
    progress?.('mining', 0, 1);
    finish(engine.settle());
  }
  return { engine, rootUri, leftOut };
}

/** What the history of some folders tells; nothing where there is none. */
async function pastEditsOf(
  folders: readonly string[],
  options: Omit<HistoryOptions, 'signal'>,
  signal: AbortSignal | undefined,
): Promise<PastEdits | undefined> {
  const read = [];
  for (const folder of new Set(folders))
    read.push(await readHistory(folder, { ...options, ...(signal && { signal }) }));
  const commits = read.flatMap((history) => history?.edits.commits ?? []);
  return commits.length === 0 ? undefined : { commits };
}

async function readTermbase(path: string): Promise<string> {
  const file = await readText(path, decodeUtf8);
  if ('reason' in file) throw new CannotRead(`${path}: ${file.reason}`);
  return file.text;
}

/** The folder of each path: a folder itself, or the one that holds a file. */
async function foldersOf(paths: readonly string[]): Promise<string[]> {
  return Promise.all(paths.map(async (path) => ((await stat(path)).isDirectory() ? path : dirname(path))));
}

/** The deepest folder that holds all paths. */
async function commonFolder(paths: readonly string[]): Promise<string> {
  const folders = await foldersOf(paths);
  let common = folders[0]!;
  for (const folder of folders)
    while (folder !== common && !folder.startsWith(join(common, '/'))) common = dirname(common);
  return common;
}

/** Termbases that hold for a named folder: its own, those up to the folder of all names, and those above in the repository. */
function termbasesInForce(folder: string, common: string): string[] {
  const found = termbasesAbove(folder);
  for (let at = folder; ; at = dirname(at)) {
    if (existsSync(join(at, 'termbase.yaml'))) found.push(join(at, 'termbase.yaml'));
    if (at === common || dirname(at) === at) return found;
  }
}
