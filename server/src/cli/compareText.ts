// A comparison of two terms as text for a terminal: plain words first, sentences, then the figures.
import type { TermComparison } from '../engine/comparison.js';
import type { Example } from '../engine/examples.js';
import type { Reason } from '../mining/question.js';
import type { CliHost } from './host.js';
import { count, exampleLines } from './words.js';

/** The folder says which name is used from this share of the choice on. */
const MOSTLY_FOLDERS = 0.5;
/** Folders that are listed. */
const LISTED_FOLDERS = 8;

/** The whole comparison, for a person; it ends with what the tool itself would ask. */
export function renderComparison(found: TermComparison, root: string, host: CliHost): string {
  const { terms, speaksFor, speaksAgainst, alternating, together, verdict } = found;
  const [a, b] = terms.map(({ text }) => `“${text}”`);
  const head = `${a} and ${b}: one thing, or two?\n`;
  const width = Math.max(...terms.map(({ text }) => text.length)) + 2;
  const uses = terms.map(
    ({ text, uses: all, documents, partOfSpeech }) =>
      `    ${host.emphasise(text.padEnd(width))}${count(all.length, 'use')} on ${count(documents, 'page')}, mostly as a ${partOfSpeech}\n`,
  );
  return [
    ...[head, ...uses],
    section('For one thing', points(speaksFor), 'Nothing speaks for it.', host),
    section('Against it', points(speaksAgainst), 'Nothing speaks against it.', host),
    section('Each in its place', sentences(alternating, host), '', host),
    section('Both in one sentence', sentences(together, host), '', host),
    section('Who says which', folders(found, root), '', host),
    section('Figures', figures(found), '', host),
    `\n${host.emphasise(verdict.text)}\n`,
  ].join('');
}

function section(title: string, lines: readonly string[], none: string, host: CliHost): string {
  if (lines.length > 0) return `\n${host.emphasise(title)}\n${lines.join('')}`;
  return none === '' ? '' : `\n${host.emphasise(title)}\n    ${none}\n`;
}

function points(reasons: readonly Reason[]): string[] {
  return reasons.map(({ text }) => `    · ${text}\n`);
}

function sentences(examples: readonly Example[], host: CliHost): string[] {
  return examples.map((example) => exampleLines(example, host, '    '));
}

function folders({ terms, figures: { choice } }: TermComparison, root: string): string[] {
  const shown = choice.folders.slice(0, LISTED_FOLDERS);
  const width = Math.max(...shown.map(({ folder }) => below(folder, root).length)) + 2;
  const lines = shown.map(({ folder, uses }) => {
    const counts = terms.map(({ text }, side) => `${text} ${uses[side as 0 | 1]}`).join(', ');
    return `    ${below(folder, root).padEnd(width)}${counts}\n`;
  });
  const more = choice.folders.length - shown.length;
  if (more > 0) lines.push(`    and ${count(more, 'more folder')}\n`);
  const both = choice.documentsWithBoth;
  lines.push(both === 0 ? '    No page has both.\n' : `    Both stand on ${count(both, 'page')}.\n`);
  if (choice.entropy > 0 && choice.byFolder >= MOSTLY_FOLDERS * choice.entropy) {
    const share = Math.round((100 * choice.byFolder) / choice.entropy);
    lines.push(`    The folder settles ${share} % of the choice: two teams may name one thing, or write about two.\n`);
  }
  return lines;
}

/** A folder as it stands below the root; the root itself is `.`. */
export function below(folder: string, root: string): string {
  const path = folder.startsWith(root) ? folder.slice(root.length) : folder;
  return path === '' ? '.' : path;
}

function figures({ figures: { choice, usage, together, companions } }: TermComparison): string[] {
  const bits = (value: number): string => `${value.toFixed(2)} bits`;
  const rows: [string, string][] = [
    ['choice of the name, H(term)', bits(choice.entropy)],
    ['… where the folder is known, H(term | folder)', bits(choice.withinFolders)],
    ['… where the page is known, H(term | page)', bits(choice.withinDocuments)],
    ['what the folder tells, I(term; folder)', bits(choice.byFolder)],
    ['likeness in use', `${usage.similarity.toFixed(3)}; two halves of one term: ${usage.yardstick.toFixed(3)}`],
    ['places among each other’s neighbours', `${usage.rankOfA} and ${usage.rankOfB}`],
    ['sentences', `${together.withA} and ${together.withB}, ${together.withBoth} with both`],
    ['information of one’s presence about the other’s', `${together.mutualInformation.toPrecision(2)} bits`],
    [
      'companions',
      `${companions.shared.length} shared, ${companions.alone.map((list) => list.length).join(' and ')} alone`,
    ],
  ];
  return rows.map(([name, value]) => `    ${name.padEnd(50)}${value}\n`);
}
