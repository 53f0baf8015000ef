// What the subcommands share: their folders, the survey, and what is said about files left out and broken termbases.
import { SWITCHED_ZONES, closedZones } from '../engine/engine.js';
import type { Snapshot } from '../engine/snapshot.js';
import type { ZoneSet } from '../prose/zones.js';
import { LineIndex } from '../text/lineIndex.js';
import type { CliHost, LeftOutFile, Survey } from './host.js';
import { UsageError } from './options.js';
import type { Given, OptionRule } from './options.js';
import { readUsageOptions } from './usageOptions.js';

/** At most this many left-out files are named without being asked. */
const NAMED_LEFT_OUT = 5;

/** The options by which a subcommand that reads folders lets files be chosen. */
export const FILE_OPTIONS: Readonly<Record<string, OptionRule>> = {
  exclude: {
    value: 'GLOBS',
    help: 'leave out what these globs match below a folder, by commas: "archive/**,*.draft.md"',
  },
  'change-logs': { help: 'read change logs too' },
  zones: {
    value: 'ZONES',
    help: `open or close zones, by commas: quotation=on,heading=off; of ${SWITCHED_ZONES.join(', ')}`,
  },
  'explain-files': { help: 'say which files were left out, and why' },
};

/** The options of a subcommand that mines. */
export const MINING_OPTIONS: Readonly<Record<string, OptionRule>> = {
  'no-history': { help: 'do not read in the git history what writers replaced' },
};

/** The operands of a subcommand that takes folders. @throws UsageError where none is named. */
function requireFolders(operands: readonly string[]): readonly string[] {
  if (operands.length === 0) throw new UsageError('Name a folder (or a file) of documentation.');
  return operands;
}

/** Surveys the folders and says what was left out; where a termbase is broken, says so by file and line and gives nothing. */
export async function surveyOrStop(
  host: CliHost,
  { options, operands }: Given,
  mine: boolean,
): Promise<Survey | undefined> {
  const exclude = options.get('exclude');
  const zones = options.get('zones');
  const survey = await host.survey(requireFolders(operands), {
    mine,
    files: {
      exclude: typeof exclude === 'string' ? splitGlobs(exclude) : [],
      changeLogs: options.has('change-logs'),
    },
    history: mine && !options.has('no-history'),
    mining: { ...readUsageOptions({ options }), ...(typeof zones === 'string' && { closedZones: readZones(zones) }) },
  });
  sayLeftOut(host, survey.leftOut, options.has('explain-files'));
  let broken = false;
  for (const { uri, text, problems } of survey.snapshot.termbases) {
    const lines = new LineIndex(text);
    for (const { severity, span, message } of problems) {
      const { line, character } = lines.positionAt(span.start);
      const where = `${host.pathOf(uri)}:${line + 1}:${character + 1}`;
      host.note(`${where}: ${severity}: ${message}\n`, severity === 'error' ? 'error' : undefined);
      if (severity === 'error') broken = true;
    }
  }
  if (mine) sayProblems(host, survey.snapshot, wordless(survey.snapshot));
  return broken ? undefined : survey;
}

/** Says what could not be read of some documents. */
export function sayProblems(host: CliHost, snapshot: Snapshot, uris: Iterable<string>): void {
  for (const uri of uris) {
    const problems = snapshot.problemsIn(uri);
    if (problems.length === 0) continue;
    const lines = new LineIndex(snapshot.documents.get(uri)!.source.text);
    for (const { span, message } of problems) {
      const { line, character } = lines.positionAt(span.start);
      host.note(`${host.pathOf(uri)}:${line + 1}:${character + 1}: note: ${message}\n`);
    }
  }
}

/** The documents of which not one word was read: there may be a reason that a writer should know. */
function* wordless({ documents, relations }: Snapshot): Generator<string> {
  for (const uri of documents.keys()) {
    const isRead = relations.languages.some(({ corpus }) => (corpus.find(uri)?.facts.word.length ?? 0) > 0);
    if (!isRead) yield uri;
  }
}

/** @throws UsageError where a zone is not known or is neither on nor off. */
function readZones(value: string): ZoneSet {
  const switches: Record<string, boolean> = {};
  for (const part of value.split(',')) {
    const [name = '', state] = part.trim().split('=');
    if (!SWITCHED_ZONES.some((zone) => zone === name)) {
      throw new UsageError(`There is no zone “${name}” to switch. There are: ${SWITCHED_ZONES.join(', ')}.`);
    }
    if (state !== 'on' && state !== 'off') throw new UsageError(`Write --zones ${name}=on or --zones ${name}=off.`);
    switches[name] = state === 'on';
  }
  return closedZones(switches);
}

/** Globs by commas; those inside braces part none. */
function splitGlobs(globs: string): string[] {
  return (globs.match(/(?:\{[^}]*\}|[^,])+/g) ?? []).map((glob) => glob.trim()).filter((glob) => glob !== '');
}

/** Beginnings of reasons that say what a file is: such files are left out by rule, and counted rather than named. */
const BY_RULE = [
  ['an older copy', 'older copies of pages'],
  ['a change log', 'change logs'],
  ['says that it is generated', 'generated pages'],
  ['excluded', 'excluded files and folders'],
] as const;

/** Beginnings of reasons for which nobody looks for a file. */
const USUAL = ['ignored', 'a folder', 'a data file'];

/** Says what was not read. Files that the user would miss are named at once, ignored ones only where `all` is asked for. */
function sayLeftOut(host: CliHost, leftOut: readonly LeftOutFile[], all: boolean): void {
  if (all) {
    for (const { path, reason } of leftOut) host.note(`left out: ${path}: ${reason}\n`);
    return;
  }
  const isByRule = ({ reason }: LeftOutFile): boolean => BY_RULE.some(([start]) => reason.startsWith(start));
  const isUsual = ({ reason }: LeftOutFile): boolean => USUAL.some((start) => reason.startsWith(start));
  const missed = leftOut.filter((each) => !isByRule(each) && !isUsual(each));
  for (const { path, reason } of missed.slice(0, NAMED_LEFT_OUT)) host.note(`left out: ${path}: ${reason}\n`);
  const counted = BY_RULE.map(([start, plural]) => {
    const files = leftOut.filter(({ reason }) => reason.startsWith(start)).length;
    return files === 0 ? '' : `${files} ${plural}`;
  });
  const more = missed.length - NAMED_LEFT_OUT;
  const rest = [...counted, more > 0 ? `${more} more` : ''].filter((part) => part !== '');
  if (rest.length > 0) host.note(`left out: ${rest.join(', ')}; --explain-files names all\n`);
}
