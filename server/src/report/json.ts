// report.json: the report's data for programs.
import type { ReportData } from './reportData.js';

/** The version of the shape below; fields may join it, none leaves or changes its meaning without a new number. */
export const JSON_VERSION = 1;

/**
 * Writes the data as JSON, indented, with a line break at its end:
 *
 *     { version: 1, generatedAt?, folder, state, documents, words,
 *       figures: [{id, label, text, value?, note}],
 *       questions: [{id, kind, language?, objects?: [text], confidence, settles, terms: [{text, uses, documents, forms: [text]}],
 *         reasons: [{kind, text, value}], examples: [{term, path, line, text, highlight: {start, end}}], drift?, where?}],
 *       concepts: [{name, id?, subject?, definition?, with: [text], terms: [{text, status, uses, documents, note?,
 *         pages: [{path, uses}]}], toChange, drift?, where?}],
 *       apart: [{terms: [text], note?}], later: [{terms: [text], note?}], otherTermbases: [{path, concepts}] }
 *
 * with drift = {bits, names} and where = {givenFolder, givenPage, information, shares: {folders, pages?, inside?},
 * folders: [{folder, uses: [count]}]}, all entropies in bits. Fractions are rounded to six decimal places.
 */
export function toJson(data: ReportData): string {
  const rounded = (_key: string, value: unknown): unknown =>
    typeof value === 'number' && !Number.isInteger(value) ? Math.round(value * 1e6) / 1e6 : value;
  return `${JSON.stringify({ version: JSON_VERSION, ...data }, rounded, 2)}\n`;
}
