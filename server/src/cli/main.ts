// The command line's front door: subcommands, help, and how a run ends.
import { ask } from './ask.js';
import { companions } from './companions.js';
import { compare } from './compare.js';
import type { CliHost } from './host.js';
import { CannotSurvey, Exit } from './host.js';
import { UsageError, readOptions } from './options.js';
import type { OptionRule } from './options.js';
import { report } from './report.js';
import type { Subcommand } from './subcommand.js';
import { verify } from './verify.js';

const SUBCOMMANDS: Readonly<Record<string, Subcommand>> = { ask, companions, compare, report, verify };

const COMMON: Readonly<Record<string, OptionRule>> = {
  quiet: { help: 'write no progress and no notes' },
  help: { help: 'show this help' },
};

/** Where the help of an option or subcommand begins, behind the indentation of two. */
const HELP_COLUMN = 28;
const INDENT = ' '.repeat(HELP_COLUMN + 2);

/** Runs one command line and gives the exit code: 0 clean, 1 findings, 2 cannot run. */
export async function runCli(words: readonly string[], host: CliHost): Promise<number> {
  const [name, ...rest] = words;
  if (name === undefined || name === '--help' || name === '-h' || name === 'help') {
    host.write(overview());
    return name === undefined ? Exit.cannotRun : Exit.clean;
  }
  if (name === '--version') {
    host.write(`${host.version}\n`);
    return Exit.clean;
  }
  const command = Object.hasOwn(SUBCOMMANDS, name) ? SUBCOMMANDS[name] : undefined;
  if (command === undefined) {
    host.note(`There is no subcommand “${name}”. There are: ${Object.keys(SUBCOMMANDS).join(', ')}.\n`);
    return Exit.cannotRun;
  }
  try {
    const given = readOptions(rest, { ...command.options, ...COMMON });
    if (given.options.has('help')) {
      host.write(helpOf(name, command));
      return Exit.clean;
    }
    return await command.run(given, given.options.has('quiet') ? silenced(host) : host);
  } catch (error) {
    if (!(error instanceof UsageError) && !(error instanceof CannotSurvey)) throw error;
    host.note(`evenword ${name}: ${error.message}\n`);
    return Exit.cannotRun;
  }
}

function overview(): string {
  const lines = Object.entries(SUBCOMMANDS).map(
    ([name, { operands, summary }]) => `  ${`${name} ${operands}`.padEnd(HELP_COLUMN)}${summary}`,
  );
  return `evenword: one concept, one term

${lines.join('\n')}

evenword SUBCOMMAND --help says more. Results go to standard output, notes and progress to standard error.
Exit codes: 0 clean, 1 findings, 2 cannot run.
`;
}

function helpOf(name: string, { summary, operands, options }: Subcommand): string {
  const rows = Object.entries({ ...options, ...COMMON }).map(([option, { value, choices, help }]) => {
    const left = `--${option}${value === undefined ? '' : ` ${choices === undefined ? value : choices.join('|')}`}`;
    // What is too long for its column has the help on a line of its own.
    return left.length < HELP_COLUMN ? `  ${left.padEnd(HELP_COLUMN)}${help}` : `  ${left}\n${INDENT}${help}`;
  });
  return `evenword ${name} ${operands}\n${summary}\n\n${rows.join('\n')}\n`;
}

/** A host whose notes and progress are dropped; why a run cannot go on is still said. */
function silenced(host: CliHost): CliHost {
  const quiet = Object.create(host) as CliHost;
  const note: CliHost['note'] = (text, weight) => {
    if (weight === 'error') host.note(text, weight);
  };
  return Object.assign(quiet, { note, progress: () => undefined });
}
