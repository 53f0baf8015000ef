// What a subcommand is: its words, its options, and what it does.
import type { CliHost } from './host.js';
import type { Given, OptionRule } from './options.js';

/** One subcommand. `run` gives the exit code. */
export interface Subcommand {
  readonly summary: string;
  readonly operands: string;
  readonly options: Readonly<Record<string, OptionRule>>;
  run(given: Given, host: CliHost): Promise<number>;
}
