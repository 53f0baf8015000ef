// The options by which the use of terms is compared: weights, likeness and contexts.
import { CONTEXT_KINDS, SIMILARITIES, WEIGHTINGS } from '../engine/engine.js';
import type { ContextKind, MiningOptions, SimilarityName, Weighting } from '../mining/options.js';
import { UsageError } from './options.js';
import type { Given, OptionRule } from './options.js';

/** The options of subcommands that compare terms. */
export const USAGE_OPTIONS: Readonly<Record<string, OptionRule>> = {
  weighting: { value: 'WEIGHT', choices: WEIGHTINGS, help: 'how much a context says of a term (tf-idf by default)' },
  similarity: { value: 'MEASURE', choices: SIMILARITIES, help: 'how alike contexts are (lin by default)' },
  context: {
    value: 'CONTEXTS',
    choices: CONTEXT_KINDS,
    help: 'which contexts are compared (all: adjacent and syntactic, by default)',
  },
  window: { value: 'N', help: 'words to either side for --context window, 1 to 50 (5 by default)' },
};

/** The choices of a command line; empty where none was made. @throws UsageError for a window that is none. */
export function readUsageOptions({ options }: Pick<Given, 'options'>): MiningOptions {
  const window = options.get('window');
  if (typeof window === 'string' && !(/^\d{1,2}$/.test(window) && Number(window) >= 1 && Number(window) <= 50))
    throw new UsageError(`--window takes a whole number from 1 to 50, not “${window}”.`);
  if (window !== undefined && options.get('context') !== 'window')
    throw new UsageError('--window goes with --context window.');
  return {
    ...(options.has('weighting') && { weighting: options.get('weighting') as Weighting }),
    ...(options.has('similarity') && { similarity: options.get('similarity') as SimilarityName }),
    ...(options.has('context') && { contexts: options.get('context') as ContextKind }),
    ...(typeof window === 'string' && { windowWords: Number(window) }),
  };
}
