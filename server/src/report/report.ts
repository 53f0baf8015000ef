// The report: three files from one snapshot, the same for the command line and the editor.
import type { Snapshot } from '../engine/snapshot.js';
import { collectReport } from './collect.js';
import type { ReportOptions } from './collect.js';
import { toHtml } from './html.js';
import { toJson } from './json.js';
import { toMarkdown } from './markdown.js';

export type { ReportOptions } from './collect.js';

/**
 * Writes the report on the folder at `rootUri`, under the decisions in force there.
 * @returns the texts of `report.html`, `report.md` and `report.json` by file name; a function of the arguments alone.
 */
export function makeReport(
  snapshot: Snapshot,
  rootUri: string,
  options: ReportOptions = {},
): ReadonlyMap<string, string> {
  const data = collectReport(snapshot, rootUri, options);
  return new Map([
    ['report.html', toHtml(data)],
    ['report.md', toMarkdown(data)],
    ['report.json', toJson(data)],
  ]);
}
