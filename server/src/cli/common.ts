// What the subcommands share: their folders, the survey, and what is said about files left out and broken termbases.
import { LineIndex } from '../text/lineIndex.js';
import type { CliHost, LeftOutFile, Survey } from './host.js';
import { UsageError } from './options.js';

/** At most this many left-out files are named without being asked. */
const NAMED_LEFT_OUT = 5;

/** The operands of a subcommand that takes folders. @throws UsageError where none is named. */
export function requireFolders(operands: readonly string[]): readonly string[] {
  if (operands.length === 0) throw new UsageError('Name a folder (or a file) of documentation.');
  return operands;
}

/** Surveys the folders; where a termbase is broken, says so by file and line and gives nothing. */
export async function surveyOrStop(
  host: CliHost,
  folders: readonly string[],
  mine: boolean,
): Promise<Survey | undefined> {
  const survey = await host.survey(folders, mine);
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
  return broken ? undefined : survey;
}

/** Says what was not read. Files that the user would miss are named at once, ignored ones only where `all` is asked for. */
export function sayLeftOut(host: CliHost, leftOut: readonly LeftOutFile[], all: boolean): void {
  const missed = leftOut.filter(
    ({ reason }) => all || (!reason.startsWith('ignored') && !reason.startsWith('a folder')),
  );
  for (const { path, reason } of all ? missed : missed.slice(0, NAMED_LEFT_OUT))
    host.note(`left out: ${path}: ${reason}\n`);
  const more = all ? 0 : missed.length - NAMED_LEFT_OUT;
  if (more > 0) host.note(`left out: ${more} more; --explain-files names all\n`);
}
