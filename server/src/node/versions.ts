// Copies of pages that are kept for earlier versions of a product: which page is an older copy of which.
import { readFile } from 'node:fs/promises';
import { sep } from 'node:path';
import { compareCodeUnits } from '../base/order.js';
import { decode } from './decoding.js';

/** Names of folders that hold one version, the newest of several first (common practice, no source). */
const NAMED = ['next', 'dev', 'main', 'master', 'latest', 'current', 'stable'];
const NUMBERED = /^(?:v|version-|release-)?(\d+(?:[._]\d+)*(?:\.x)?)$/i;
/** Share of its lines that a page must have in common with another to be a copy of it. */
const SAME_LINES = 0.5;

/** A page in the folder of a version: the folder that holds all versions, this one's name, and the way on from there. */
interface Versioned {
  readonly family: string;
  readonly version: string;
  readonly rest: string;
}

/**
 * The page of a newer version that a page is a copy of, or undefined. A copy stands under the same path in a sibling folder
 * with a version's name, and shares at least half of its lines.
 * @param root only folders below it are looked at
 * @param namesIn the names in a folder
 * @param isDocument true for the path of a document that is read
 */
export async function newerCopy(
  root: string,
  path: string,
  namesIn: (folder: string) => readonly string[] | Promise<readonly string[]>,
  isDocument: (path: string) => boolean | Promise<boolean>,
): Promise<string | undefined> {
  for (const { family, version, rest } of versionedParts(root, path)) {
    const newer = (await namesIn(family))
      .filter((name) => isVersion(name) && compareVersions(name, version) > 0)
      .sort((a, b) => compareVersions(b, a) || compareCodeUnits(a, b));
    for (const name of newer) {
      const candidate = [family, name, rest].join(sep);
      if ((await isDocument(candidate)) && (await shareLines(path, candidate))) return candidate;
    }
  }
  return undefined;
}

/** True for the name of a folder that may hold one version. */
export function isVersion(name: string): boolean {
  return NUMBERED.test(name) || NAMED.includes(name.toLowerCase());
}

/** Negative where `a` is older than `b`: numbers by their parts, names after all numbers. */
export function compareVersions(a: string, b: string): number {
  const [one, other] = [rankOf(a), rankOf(b)];
  for (let i = 0; i < Math.max(one.length, other.length); i++) {
    const difference = (one[i] ?? -1) - (other[i] ?? -1);
    if (difference !== 0) return difference;
  }
  return 0;
}

function rankOf(name: string): number[] {
  const named = NAMED.indexOf(name.toLowerCase());
  if (named >= 0) return [Number.MAX_SAFE_INTEGER, NAMED.length - named];
  return NUMBERED.exec(name)![1]!
    .split(/[._]/)
    .map((part) => (part === 'x' ? Number.MAX_SAFE_INTEGER : Number(part)));
}

function* versionedParts(root: string, path: string): Generator<Versioned> {
  const parts = path.slice(root.length).split(sep);
  for (let i = 1; i < parts.length - 1; i++) {
    if (!isVersion(parts[i]!)) continue;
    const family = root + parts.slice(0, i).join(sep);
    yield { family, version: parts[i]!, rest: parts.slice(i + 1).join(sep) };
  }
}

async function shareLines(path: string, candidate: string): Promise<boolean> {
  const [own, others] = [await linesOf(path), new Set(await linesOf(candidate))];
  return own.length > 0 && own.filter((line) => others.has(line)).length >= SAME_LINES * own.length;
}

/** The lines that hold a word, trimmed. */
async function linesOf(path: string): Promise<string[]> {
  const decoded = decode(await readFile(path).catch(() => new Uint8Array(0)));
  const text = 'text' in decoded ? decoded.text : '';
  return text
    .split(/\r\n?|\n/)
    .map((line) => line.trim())
    .filter((line) => /[\p{L}\p{N}]/u.test(line));
}
