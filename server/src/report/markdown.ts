// report.md: the report as Markdown (CommonMark with tables), written to read well as plain text too.
import { driftText, counted, grouped, KIND_NAMES, listed, percent, titleOf, whereText } from './words.js';
import type { NamedTogether, ReportConcept, ReportData, ReportExample, ReportQuestion } from './reportData.js';

/** Writes the report as Markdown. */
export function toMarkdown(data: ReportData): string {
  const { questions, concepts, apart, later, otherTermbases } = data;
  const parts = [
    `# Terminology report: ${escapeMarkdown(data.folder)}`,
    ...(data.generatedAt === undefined ? [] : [escapeMarkdown(data.generatedAt)]),
    `**${escapeMarkdown(data.state)}**`,
    table(
      ['Figure', 'Value', ''],
      data.figures.map(({ label, text, note }) => [label, text, note]),
      [1],
    ),
    '## Open questions',
    ...(questions.length === 0
      ? ['No question is open.']
      : ['In the order of what an answer settles, weighed by how sure the evidence is.']),
    ...questions.flatMap(questionOf),
    '## Decided concepts',
    ...(concepts.length === 0 ? ['Nothing is decided yet.'] : []),
    ...concepts.flatMap(conceptOf),
    ...(apart.length === 0
      ? []
      : ['## Kept apart', 'These look alike and name different concepts.', together(apart, 'and')]),
    ...(later.length === 0 ? [] : ['## Put off', 'These questions rest until their use grows.', together(later, 'or')]),
    ...(otherTermbases.length === 0
      ? []
      : [
          '## Folders with decisions of their own',
          bullets(otherTermbases.map(({ path, concepts: count }) => `${path}: ${counted(count, 'concept')}`)),
        ]),
    '## How to read the figures',
    'Uses are counted in running text, in every inflected form; code, quotations and repeated passages are left out. ' +
      'Drift is the entropy H of a concept’s names in bits (Shannon 1948); 2^H reads as the number of names that would be as ' +
      'mixed in equal use: 1 where one name is used alone, 2 where two are used half and half.',
  ];
  return `${parts.join('\n\n')}\n`;
}

function questionOf(question: ReportQuestion, index: number): string[] {
  const { kind, confidence, terms, reasons, examples, drift, where } = question;
  return [
    `### ${index + 1}. ${escapeMarkdown(titleOf(question))}`,
    `${KIND_NAMES[kind]}, ${percent(confidence)} sure. An answer settles ${counted(question.settles, 'use')}.` +
      `${drift === undefined ? '' : ` The concept ${driftText(drift)}.`}${where === undefined ? '' : ` ${whereText(where)}`}`,
    table(
      ['Name', 'Uses', 'Pages', 'Share'],
      terms.map(({ text, uses, documents }) => [text, grouped(uses), grouped(documents), shareOf(uses, terms)]),
      [1, 2, 3],
    ),
    ...(reasons.length === 0 ? [] : ['Why it is asked:', bullets(reasons.map(({ text }) => text))]),
    ...terms.flatMap(({ text }) => {
      const own = examples.filter(({ term }) => term === text);
      return own.length === 0 ? [] : [`Where ${escapeMarkdown(`“${text}”`)} stands:`, own.map(exampleLine).join('\n')];
    }),
  ];
}

function exampleLine({ path, line, text, highlight: { start, end } }: ReportExample): string {
  const term = text.slice(start, end);
  const strong = term.trim() === '' ? escapeMarkdown(term) : `**${escapeMarkdown(term)}**`;
  return `- ${escapeMarkdown(`${path}:${line}:`)} ${escapeMarkdown(text.slice(0, start))}${strong}${escapeMarkdown(text.slice(end))}`;
}

function conceptOf(concept: ReportConcept): string[] {
  const { name, definition, terms, toChange, drift, where } = concept;
  const pages = terms
    .filter(({ status }) => status === 'deprecated')
    .flatMap(({ text, pages: own }) => own.map(({ path, uses }) => `${path}: “${text}”, ${counted(uses, 'use')}`));
  return [
    `### ${escapeMarkdown(name)}${concept.with.length > 0 ? escapeMarkdown(` (${concept.with.join(', ')})`) : ''}`,
    ...(definition === undefined ? [] : [escapeMarkdown(oneLine(definition))]),
    drift === undefined
      ? 'No page uses any of its names.'
      : `The concept ${driftText(drift)}.${where === undefined ? '' : ` ${whereText(where)}`}`,
    table(
      ['Term', 'Status', 'Uses', 'Pages', 'Share'],
      terms.map(({ text, status, uses, documents }) => [
        ...[text, status, grouped(uses), grouped(documents), shareOf(uses, terms)],
      ]),
      [2, 3, 4],
    ),
    ...(toChange === 0 ? [] : [`Still to change, ${counted(toChange, 'use')}:`, bullets(pages)]),
  ];
}

function together(entries: readonly NamedTogether[], joint: 'and' | 'or'): string {
  return bullets(
    entries.map(({ terms, note }) => `${listed(terms, joint)}${note === undefined ? '' : `: ${oneLine(note)}`}`),
  );
}

function shareOf(uses: number, terms: readonly { readonly uses: number }[]): string {
  const total = terms.reduce((sum, term) => sum + term.uses, 0);
  return total === 0 ? '–' : percent(uses / total);
}

function bullets(lines: readonly string[]): string {
  return lines.map((line) => `- ${escapeMarkdown(oneLine(line))}`).join('\n');
}

/** A table with columns padded to one width, so that it lines up as plain text; `right` lists right-aligned columns. */
function table(head: readonly string[], rows: readonly (readonly string[])[], right: readonly number[]): string {
  const cells = [head, ...rows].map((row) => row.map((cell) => escapeMarkdown(oneLine(cell))));
  const widths = head.map((_, column) => Math.max(3, ...cells.map((row) => row[column]!.length)));
  const lines = cells.map(
    (row) => `| ${row.map((cell, column) => padded(cell, widths[column]!, right.includes(column))).join(' | ')} |`,
  );
  const rule = `| ${widths.map((width, column) => (right.includes(column) ? `${'-'.repeat(width - 1)}:` : '-'.repeat(width))).join(' | ')} |`;
  return [lines[0]!, rule, ...lines.slice(1)].join('\n');
}

function padded(cell: string, width: number, right: boolean): string {
  return right ? cell.padStart(width) : cell.padEnd(width);
}

function oneLine(text: string): string {
  return text.replace(/\s+/g, ' ').trim();
}

/**
 * Escapes what Markdown would read as markup anywhere in a line, the bars of tables among them, and leaves the rest
 * readable: an underscore inside a word and an ampersand that begins no character reference mean nothing.
 */
export function escapeMarkdown(text: string): string {
  return text
    .replace(/[\\`*[\]<>|~]/g, '\\$&')
    .replace(/(?<![\p{L}\p{N}])_|_(?![\p{L}\p{N}])/gu, '\\_')
    .replace(/&(?=#?[A-Za-z0-9]+;)/g, '\\&')
    .replace(
      /^(\s*)([#+-]|\d+[.)](?=\s|$))/,
      (_, space: string, mark: string) => `${space}${mark.slice(0, -1)}\\${mark.slice(-1)}`,
    );
}
