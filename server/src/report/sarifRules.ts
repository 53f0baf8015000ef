// What the rules say of themselves in SARIF: a line, a sentence or two, and what to do.
import type { FindingCode } from '../findings/finding.js';

/** One rule's description. */
export interface RuleText {
  readonly short: string;
  readonly full: string;
  readonly help: string;
  readonly level: 'note' | 'warning';
}

export const RULES: Readonly<Record<FindingCode, RuleText>> = {
  'deprecated-term': {
    short: 'A deprecated term is used.',
    full: 'The termbase deprecates this term for its concept and prefers another one, so that readers meet one name for one thing.',
    help: 'Use the preferred term that the message names, in the form that the sentence needs. If the decision is wrong, change the concept in termbase.yaml.',
    level: 'warning',
  },
  'mixed-terms': {
    short: 'A second name for what may be one thing.',
    full: 'The documentation uses several names that may stand for one concept, and nobody has decided between them yet.',
    help: 'Answer the question once: prefer one name, admit both, or keep two concepts apart. The answer is kept in termbase.yaml.',
    level: 'note',
  },
  'odd-companion': {
    short: 'A word with a companion that it hardly ever has.',
    full: 'The termbase admits several verbs for one operation, and the documentation nearly always uses another one of them with this object.',
    help: 'Use the usual verb that the message names, or keep this one where the difference is meant.',
    level: 'note',
  },
};
