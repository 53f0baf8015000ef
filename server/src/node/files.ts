// Finding the documents of a folder and reading them, with a reason for everything that is left out.
import { existsSync } from 'node:fs';
import { readdir, readFile, realpath, stat } from 'node:fs/promises';
import { basename, dirname, join, relative, sep } from 'node:path';
import { pathToFileURL } from 'node:url';
import ignore from 'ignore';
import type { Ignore } from 'ignore';
import { compareCodeUnits } from '../base/order.js';
import { FORMATS, formatOf } from '../text/sourceText.js';
import type { SourceText } from '../text/sourceText.js';
import { canonicalUri } from '../text/uri.js';
import { decode } from './decoding.js';
import type { Decoded } from './decoding.js';

/** Files larger than this are left out: prose is never so long, data often is. In bytes. */
export const LARGEST_FILE = 4 * 1024 * 1024;

const TERMBASE = 'termbase.yaml';

/** Folders that hold no documentation of the project's own. */
const NEVER_ENTERED = new Set(['node_modules', '.git', '.hg', '.svn', '.venv', '__pycache__', '.vscode-test', '.idea']);

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
 * Lists the documents under a folder (or the one file named), in order. Honours `.gitignore` files, follows no link out of
 * a loop and enters no dependency folder.
 * @throws CannotRead where the path does not exist or cannot be listed.
 */
export async function findFiles(path: string): Promise<FoundFiles> {
  const found = { documents: [] as string[], termbases: [] as string[], leftOut: [] as LeftOut[] };
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
    return { ...found, documents: [path] };
  }
  await walk(path, [], new Set(), found);
  found.documents.sort(compareCodeUnits);
  found.termbases.sort(compareCodeUnits);
  return found;
}

/** The canonical URI of a file. */
export function uriOfPath(path: string): string {
  return canonicalUri(pathToFileURL(path).href);
}

/** A file's text, or why it cannot be had. */
export type ReadFile = { readonly source: SourceText } | { readonly leftOut: LeftOut };

/** Reads one document. */
export async function readDocument(path: string): Promise<ReadFile> {
  const file = await readText(path);
  if ('reason' in file) return { leftOut: { path, reason: file.reason } };
  return { source: { uri: uriOfPath(path), format: formatOf(path) ?? 'plaintext', text: file.text } };
}

/** Reads a file as text; see {@link decode} for the encodings. */
export async function readText(path: string): Promise<Decoded> {
  try {
    if ((await stat(path)).size > LARGEST_FILE) return { reason: 'larger than 4 MiB' };
    return decode(await readFile(path));
  } catch (error) {
    return { reason: plainReason(error) };
  }
}

/**
 * Why {@link findFiles} of a folder would not come to a path below it: the folders and `.gitignore` files in between say so.
 * Undefined where nothing is against it.
 */
export async function whyLeftOut(root: string, path: string): Promise<string | undefined> {
  const names = relative(root, path).split(sep);
  const rules: Rules[] = [];
  let folder = root;
  for (const [index, name] of names.entries()) {
    const isFolder = index < names.length - 1;
    rules.push(...(await rulesOf(folder, true)));
    folder = join(folder, name);
    if (isFolder && NEVER_ENTERED.has(name)) return 'a folder of dependencies or tools';
    // A termbase is law wherever it stands among the documents.
    if ((isFolder || name !== TERMBASE) && isIgnored(folder, isFolder, rules)) return 'ignored by .gitignore';
  }
  return undefined;
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

interface Rules {
  readonly folder: string;
  readonly rules: Ignore;
}

async function walk(
  folder: string,
  outer: readonly Rules[],
  visited: Set<string>,
  found: { documents: string[]; termbases: string[]; leftOut: LeftOut[] },
): Promise<void> {
  // A folder may vanish between being listed and being entered, as when a branch is switched.
  const real = await realpath(folder).catch((error: unknown) => {
    found.leftOut.push({ path: folder, reason: plainReason(error) });
  });
  if (real === undefined) return;
  if (visited.has(real)) {
    found.leftOut.push({ path: folder, reason: 'a link to a folder that was read already' });
    return;
  }
  visited.add(real);
  const entries = await readdir(folder, { withFileTypes: true }).catch((error: unknown) => {
    if (outer.length === 0 && visited.size === 1) throw new CannotRead(`${folder}: ${plainReason(error)}`);
    found.leftOut.push({ path: folder, reason: plainReason(error) });
    return [];
  });
  const rules = [
    ...outer,
    ...(await rulesOf(
      folder,
      entries.some((entry) => entry.name === '.gitignore'),
    )),
  ];
  for (const entry of entries.sort((a, b) => compareCodeUnits(a.name, b.name))) {
    const path = join(folder, entry.name);
    const kind = entry.isSymbolicLink() ? await stat(path).catch(() => undefined) : entry;
    if (kind === undefined) {
      found.leftOut.push({ path, reason: 'a link that leads nowhere' });
    } else if (kind.isDirectory()) {
      if (NEVER_ENTERED.has(entry.name)) found.leftOut.push({ path, reason: 'a folder of dependencies or tools' });
      else if (isIgnored(path, true, rules)) found.leftOut.push({ path, reason: 'ignored by .gitignore' });
      else await walk(path, rules, visited, found);
    } else if (kind.isFile()) {
      if (basename(path) === TERMBASE) found.termbases.push(path);
      else if (formatOf(path) === undefined) continue;
      else if (isIgnored(path, false, rules)) found.leftOut.push({ path, reason: 'ignored by .gitignore' });
      else found.documents.push(path);
    }
  }
}

async function rulesOf(folder: string, present: boolean): Promise<Rules[]> {
  if (!present) return [];
  const text = await readFile(join(folder, '.gitignore'), 'utf8').catch(() => '');
  return [{ folder, rules: ignore().add(text) }];
}

function isIgnored(path: string, folder: boolean, rules: readonly Rules[]): boolean {
  let ignored = false;
  for (const { folder: base, rules: own } of rules) {
    const name = relative(base, path).split(sep).join('/') + (folder ? '/' : '');
    const verdict = own.test(name);
    if (verdict.ignored) ignored = true;
    else if (verdict.unignored) ignored = false;
  }
  return ignored;
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
