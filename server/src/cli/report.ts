// evenword report: the state of a documentation set's wording, written as files to keep and to forward.
import type { Subcommand } from './main.js';
export const report: Subcommand = { summary: '', operands: '', options: {}, run: async () => 0 };
