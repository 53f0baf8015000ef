// Documents to measure on: real documentation where it is at hand, else the sample, repeated to a useful length.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { SourceText } from '../../server/src/text/sourceText.js';

/** The project's folder: the benchmark is run from it. */
export const root = process.cwd();

/** The Markdown files of a set in `../shared/data/docs`, or of the sample where that is absent. */
export function documentsOf(set: string): { name: string; sources: SourceText[] } {
  const real = resolve(root, '../shared/data/docs', set);
  if (existsSync(real)) return { name: set, sources: markdownUnder(real) };
  const sample = markdownUnder(join(root, 'samples/buoys'));
  const copies = Array.from({ length: 12 }, (_, copy) => sample.map((source) => varied(source, copy)));
  return { name: 'the sample, twelve times', sources: copies.flat() };
}

function markdownUnder(folder: string): SourceText[] {
  return readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && entry.name.endsWith('.md'))
    .map((entry) => join(entry.parentPath, entry.name))
    .sort()
    .map((path) => ({ uri: pathToFileURL(path).href, format: 'markdown' as const, text: readFileSync(path, 'utf8') }));
}

/** A copy whose sentences differ, so that no block is counted as a repetition. */
function varied(source: SourceText, copy: number): SourceText {
  return {
    ...source,
    uri: `${source.uri}?${copy}`,
    text: source.text.replace(/\. /g, ` ${'again '.repeat(copy % 3)}${copy}. `),
  };
}
