// Real pages of a format, from the documentation sets beside the project where these are there.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { formatOf, type Format } from '../../server/src/text/sourceText.js';

const ROOT = path.resolve(process.cwd(), '../shared/data/docs');
const MOST_PAGES = 200;
const LONGEST = 60_000;

let byFormat: Map<Format, string[]> | undefined;

/** Up to 200 pages of a format, evenly from all sets, none longer than 60,000 units. */
export function pagesOf(format: Format): { readonly name: string; readonly text: string }[] {
  byFormat ??= filesByFormat();
  const files = byFormat.get(format) ?? [];
  const step = Math.max(1, files.length / MOST_PAGES);
  const chosen: { name: string; text: string }[] = [];
  for (let at = 0; at < files.length && chosen.length < MOST_PAGES; at += step) {
    const name = files[Math.floor(at)]!;
    chosen.push({ name, text: readFileSync(name, 'utf8').slice(0, LONGEST) });
  }
  return chosen;
}

function filesByFormat(): Map<Format, string[]> {
  const found = new Map<Format, string[]>();
  if (!existsSync(ROOT)) return found;
  for (const entry of readdirSync(ROOT, { withFileTypes: true, recursive: true })) {
    const format = entry.isFile() ? formatOf(entry.name) : undefined;
    if (format === undefined) continue;
    const files = found.get(format) ?? [];
    files.push(path.join(entry.parentPath, entry.name));
    found.set(format, files);
  }
  for (const files of found.values()) files.sort((a, b) => (a < b ? -1 : 1));
  return found;
}
