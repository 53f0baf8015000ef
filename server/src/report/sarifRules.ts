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
  'variant-form': {
    short: 'A term is written in another way than decided.',
    full: 'The spelling, spacing, hyphen or capitals differ from the form that the termbase prefers.',
    help: 'Write the term as the termbase has it. Where the other way is right too, list it there as admitted.',
    level: 'warning',
  },
  'odd-companion': {
    short: 'A word that does not go with its term elsewhere.',
    full: 'The documentation pairs this term with another word for the same operation or quality.',
    help: 'Use the word that the message names, or leave the sentence if something else is meant.',
    level: 'note',
  },
  'unexplained-abbreviation': {
    short: 'An abbreviation is used before it is explained.',
    full: 'The page uses a short form whose full form it does not give at first use.',
    help: 'Give the full form with the short form in parentheses at the first use on the page.',
    level: 'note',
  },
};
