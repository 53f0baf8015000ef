// Finding the documents of a folder and reading them, with a reason for everything that is left out.
import { existsSync } from 'node:fs';
import { open, readdir, readFile, realpath, stat } from 'node:fs/promises';
import { basename, dirname, join, relative, sep } from 'node:path';
import { pathToFileURL } from 'node:url';
import { compareCodeUnits } from '../base/order.js';
import { TELLING_START, describesInterface } from '../text/apiDescription.js';
import { DEFAULT_FILES } from '../text/filePolicy.js';
import type { FilePolicy } from '../text/filePolicy.js';
import { FORMATS, formatOf } from '../text/sourceText.js';
import type { SourceText } from '../text/sourceText.js';
import { canonicalUri } from '../text/uri.js';
import { decode } from './decoding.js';
import type { Decoded } from './decoding.js';
import { FolderRules, slashed } from './fileRules.js';
import { saysGenerated } from './generated.js';
import { newerCopy } from './versions.js';

/** Files larger than this are left out: prose is never so long, data often is. In bytes. */
const LARGEST_FILE = 4 * 1024 * 1024;

const TERMBASE = 'termbase.yaml';

const GENERATED = 'says that it is generated';
const DATA = 'a data file: it describes no interface';

/** A file or folder that was not read, and why, in words for a person. */
export interface LeftOut {
  readonly path: string;
  readonly reason: string;
}

/** What was found under a folder. Paths are absolute and in order of their code units. */
export interface FoundFiles {
  readonly documents: readonly string[];
  readonly termbases: readonly string[];
  readonly leftOut: readonly LeftOut[];
}

/** A folder or file that was named cannot be read. */
export class CannotRead extends Error {
  override readonly name = 'CannotRead';
}

/**
 * Lists the documents under a folder (or the one file named), in order. Leaves out what {@link FolderRules} speak against and
 * older copies of pages, and follows no link out of a loop. Other files than documents are passed over.
 * @throws CannotRead where the path does not exist or cannot be listed.
 */
export async function findFiles(path: string, policy: FilePolicy = DEFAULT_FILES): Promise<FoundFiles> {
  const status = await stat(path).catch((error: unknown) => {
    throw new CannotRead(`${path}: ${plainReason(error)}`);
  });
  if (!status.isDirectory()) {
    if (formatOf(path) === undefined)
      throw new CannotRead(
        `${path}: no format that Evenword reads (${Object.keys(FORMATS)
          .map((extension) => `.${extension}`)
          .join(' ')})`,
      );
    return { documents: [path], termbases: [], leftOut: [] };
  }
  const walk = new Walk(policy);
  await walk.enter(path, undefined);
  const all = new Set(walk.documents);
  const documents: string[] = [];
  for (const document of walk.documents) {
    const newer = await newerCopy(
      path,
      document,
      (folder) => walk.names.get(folder) ?? [],
      (other) => all.has(other),
    );
    if (newer === undefined) documents.push(document);
    else walk.leftOut.push({ path: document, reason: olderCopy(path, newer) });
  }
  return {
    documents: documents.sort(compareCodeUnits),
    termbases: walk.termbases.sort(compareCodeUnits),
    leftOut: walk.leftOut,
  };
}

function olderCopy(root: string, newer: string): string {
  return `an older copy of ${slashed(root, newer)}`;
}

/** The canonical URI of a file. */
export function uriOfPath(path: string): string {
  return canonicalUri(pathToFileURL(path).href);
}

/** A file's text, or why it cannot be had. */
export type ReadFile = { readonly source: SourceText } | { readonly leftOut: LeftOut };

/** Reads one document. */
export async function readDocument(path: string): Promise<ReadFile> {
  // Most files in YAML and JSON are data: their start tells, and the rest need not be read.
  if (formatOf(path) === 'apiDescription' && !(await startDescribesInterface(path)))
    return { leftOut: { path, reason: DATA } };
  const file = await readText(path);
  if ('reason' in file) return { leftOut: { path, reason: file.reason } };
  if (saysGenerated(file.text)) return { leftOut: { path, reason: GENERATED } };
  return { source: { uri: uriOfPath(path), format: formatOf(path) ?? 'plaintext', text: file.text } };
}

async function startDescribesInterface(path: string): Promise<boolean> {
  const file = await open(path).catch(() => undefined);
  // A file that cannot be opened says why when it is read.
  if (file === undefined) return true;
  try {
    const { buffer, bytesRead } = await file.read(Buffer.alloc(TELLING_START), 0, TELLING_START, 0);
    return describesInterface(buffer.toString('utf8', 0, bytesRead));
  } finally {
    await file.close();
  }
}

/** Reads a file as text; in the encodings of {@link decode}, unless others are asked for. */
export async function readText(path: string, decoding = decode): Promise<Decoded> {
  try {
    if ((await stat(path)).size > LARGEST_FILE) return { reason: 'larger than 4 MiB' };
    return decoding(await readFile(path));
  } catch (error) {
    return { reason: plainReason(error) };
  }
}

/**
 * Why {@link findFiles} of a folder would not come to a path below it, or {@link readDocument} not read it. Undefined where
 * nothing is against it.
 */
export async function whyLeftOut(root: string, path: string, policy = DEFAULT_FILES): Promise<string | undefined> {
  const reason = await reasonByRules(root, path, policy);
  // A termbase is law wherever it stands among the documents.
  if (reason !== undefined || basename(path) === TERMBASE) return reason;
  const isDocument = async (other: string): Promise<boolean> =>
    existsSync(other) && (await reasonByRules(root, other, policy)) === undefined;
  const newer = await newerCopy(root, path, namesIn, isDocument);
  if (newer !== undefined) return olderCopy(root, newer);
  if (formatOf(path) === 'apiDescription' && !(await startDescribesInterface(path))) return DATA;
  const file = await readText(path);
  return 'text' in file && saysGenerated(file.text) ? GENERATED : undefined;
}

async function reasonByRules(root: string, path: string, policy: FilePolicy): Promise<string | undefined> {
  const names = relative(root, path).split(sep);
  const last = names.pop()!;
  let rules = await FolderRules.ofRoot(root, await namesIn(root), policy);
  let folder = root;
  for (const name of names) {
    folder = join(folder, name);
    const reason = rules.againstFolder(folder, name);
    if (reason !== undefined) return reason;
    rules = await rules.within(folder, await namesIn(folder));
  }
  return last === TERMBASE ? undefined : rules.againstFile(path, last);
}

async function namesIn(folder: string): Promise<string[]> {
  return readdir(folder).catch(() => []);
}

/** Termbases of the folders above, nearest first, up to the root of the repository; none where there is no repository. */
export function termbasesAbove(folder: string): string[] {
  const found: string[] = [];
  for (let at = folder; ; at = dirname(at)) {
    if (at !== folder && existsSync(join(at, TERMBASE))) found.push(join(at, TERMBASE));
    if (existsSync(join(at, '.git'))) return found;
    if (dirname(at) === at) return [];
  }
}

/** One walk through a folder and all below it. */
class Walk {
  readonly documents: string[] = [];
  readonly termbases: string[] = [];
  readonly leftOut: LeftOut[] = [];
  /** The names in each folder that was entered. */
  readonly names = new Map<string, readonly string[]>();
  private readonly visited = new Set<string>();

  constructor(private readonly policy: FilePolicy) {}

  async enter(folder: string, outer: FolderRules | undefined): Promise<void> {
    const leaveOut = (path: string, reason: string): undefined => {
      this.leftOut.push({ path, reason });
    };
    // A folder may vanish between being listed and being entered, as when a branch is switched.
    const real = await realpath(folder).catch((error: unknown) => leaveOut(folder, plainReason(error)));
    if (real === undefined) return;
    if (this.visited.has(real)) {
      leaveOut(folder, 'a link to a folder that was read already');
      return;
    }
    this.visited.add(real);
    const entries = await readdir(folder, { withFileTypes: true }).catch((error: unknown) => {
      if (outer === undefined) throw new CannotRead(`${folder}: ${plainReason(error)}`);
      leaveOut(folder, plainReason(error));
      return [];
    });
    const names = entries.map(({ name }) => name);
    this.names.set(folder, names);
    const rules = await (outer?.within(folder, names) ?? FolderRules.ofRoot(folder, names, this.policy));
    for (const entry of entries.sort((a, b) => compareCodeUnits(a.name, b.name))) {
      const { name } = entry;
      const path = join(folder, name);
      const kind = entry.isSymbolicLink() ? await stat(path).catch(() => undefined) : entry;
      if (kind === undefined) leaveOut(path, 'a link that leads nowhere');
      else if (kind.isDirectory()) {
        const reason = rules.againstFolder(path, name);
        if (reason === undefined) await this.enter(path, rules);
        else leaveOut(path, reason);
      } else if (kind.isFile() && name === TERMBASE) this.termbases.push(path);
      else if (kind.isFile() && formatOf(path) !== undefined) {
        const reason = rules.againstFile(path, name);
        if (reason === undefined) this.documents.push(path);
        else leaveOut(path, reason);
      }
    }
  }
}

/** The system's reason for a failed call, in plain words. */
export function plainReason(error: unknown): string {
  const code = (error as NodeJS.ErrnoException).code;
  if (code === 'ENOENT') return 'there is no such file or folder';
  if (code === 'EACCES' || code === 'EPERM') return 'permission denied';
  if (code === 'ENOTDIR') return 'a part of the path is no folder';
  if (code === 'ELOOP') return 'a link leads back to itself';
  return error instanceof Error ? error.message : String(error);
}
