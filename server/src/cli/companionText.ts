// Companions as text for a terminal: by relation and by segment, each with its figures and a sentence.
import { isBehind } from '../engine/companions.js';
import type { TermCompanions, WithExample } from '../engine/companions.js';
import type { Example } from '../engine/examples.js';
import type { CoOccurring, CompanionRelation, Floor, RelatedCompanion } from '../mining/companions/companions.js';
import type { CliHost } from './host.js';
import { count, exampleLines } from './words.js';

const TITLES: Readonly<Record<CompanionRelation, string>> = {
  'object-of': 'Verbs that act on it',
  'subject-of': 'Verbs of which it is the subject',
  'modified-by': 'Words before it',
  modifies: 'Words that it stands before',
  'governed-by': 'Words that lead to it by a preposition',
  'has-object': 'What it acts on',
  'has-subject': 'What does it',
};

/** All companions of a term, for a person. */
export function renderCompanions(found: TermCompanions, host: CliHost): string {
  const { term, uses, documents, related, floor, segments, whole, heldIn } = found;
  const parts = [`“${host.emphasise(term)}”: ${count(uses, 'use')} on ${count(documents, 'page')}.\n`];
  for (const { text, uses: held } of heldIn)
    parts.push(`Not counted: ${count(held, 'use')} inside “${text}”, which names a thing of its own.\n`);
  if (whole?.keptWhole === true)
    parts.push(
      `Kept whole: its words attract one another (${whole.attraction.toFixed(2)} of 1), and it is used unlike them (${Math.round(whole.predicted * 100)} % of its use is what its parts predict).\n`,
    );
  for (const relation of Object.keys(TITLES) as CompanionRelation[]) {
    const own = related.filter((each) => each.relation === relation);
    if (own.length === 0) continue;
    parts.push(`\n${host.emphasise(TITLES[relation])} ${host.faint(saysFloor(floor))}\n`);
    parts.push(...own.map((each) => renderRelated(each, term, host)));
  }
  if (related.length === 0) parts.push('\nNo word stands in a grammatical relation to it more often than chance.\n');
  const { kind, all, withTerm } = segments;
  const share = kind === 'window' ? 'Words near it' : `Words that share its ${kind}s`;
  parts.push(`\n${host.emphasise(share)} ${host.faint(saysFloor(segments.floor))}\n`);
  parts.push(...segments.companions.map((each) => renderCoOccurring(each, term, { kind, withTerm }, host)));
  if (segments.companions.length === 0) parts.push('  None more often than chance.\n');
  const units = kind === 'window' ? 'words of content near it' : `${kind}s with it`;
  parts.push(
    host.faint(
      `\n${count(withTerm, '')}${units} of ${count(all, '')}in all. Strength: log-likelihood ratio, 10.8 is one chance in a thousand.\n`,
    ),
  );
  return parts.join('');
}

function saysFloor({ count: least, documents }: Floor): string {
  return `(${least} times or more, on ${count(documents, 'page')}${documents > 1 ? ' or more' : ''})`;
}

function renderRelated(
  { relation, word, count: times, documents, strength, example }: WithExample<RelatedCompanion>,
  term: string,
  host: CliHost,
): string {
  const phrase = isBehind(relation) ? `${term} … ${word}` : `${word} … ${term}`;
  return `  ${host.emphasise(phrase)}  ${times} times on ${count(documents, 'page')}, strength ${strength.toFixed(1)}\n${sentence(example, host)}`;
}

function renderCoOccurring(
  { word, count: times, documents, strength, lift, mutualInformation, ...rest }: WithExample<CoOccurring>,
  term: string,
  { kind, withTerm }: { readonly kind: string; readonly withTerm: number },
  host: CliHost,
): string {
  const held = kind === 'window' ? `${times} times` : `in ${times} of ${withTerm}`;
  const bits = `${lift.toFixed(1)} bits more than chance`;
  const told = rest.entropy > 0 ? Math.round((100 * mutualInformation) / rest.entropy) : 0;
  const telling = told >= 1 ? `; where “${term}” stands settles ${told} % of where it does` : '';
  return `  ${host.emphasise(word)}  ${held}, on ${count(documents, 'page')}, strength ${strength.toFixed(1)}, ${bits}${telling}\n${sentence(rest.example, host)}`;
}

function sentence(example: Example | undefined, host: CliHost): string {
  return example === undefined ? '' : exampleLines(example, host, '      ');
}
