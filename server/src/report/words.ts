// The report's sentences: counts, shares, titles of questions, and where drift lives, in plain words.
import type { QuestionKind } from '../mining/question.js';
import type { Drift, WhereDriftLives } from './drift.js';
import type { ReportQuestion } from './reportData.js';

/** A whole number with commas: `15,257`. */
export function grouped(count: number): string {
  return count.toString().replace(/\B(?=(\d{3})+$)/g, ',');
}

/** `1 page`, `1,204 pages`. */
export function counted(count: number, noun: string): string {
  return `${grouped(count)} ${noun}${count === 1 ? '' : 's'}`;
}

/** A share as a whole per cent. Neither 0 % nor 100 % is said of what is only nearly so. */
export function percent(share: number): string {
  const rounded = Math.round(share * 100);
  if (share > 0 && rounded === 0) return '< 1 %';
  return `${share < 1 ? Math.min(99, rounded) : rounded} %`;
}

/** Names in quotation marks: `“a”, “b” and “c”`. */
export function listed(names: readonly string[], joint: 'and' | 'or'): string {
  const quoted = names.map((name) => `“${name}”`);
  const last = quoted[quoted.length - 1] ?? '';
  return quoted.length < 2 ? last : `${quoted.slice(0, -1).join(', ')} ${joint} ${last}`;
}

/** What a kind of question is about. */
export const KIND_NAMES: Readonly<Record<QuestionKind, string>> = {
  variant: 'Two ways of writing',
  abbreviation: 'Short form and full form',
  'ambiguous-abbreviation': 'One abbreviation, several full forms',
  synonym: 'Two words, perhaps one concept',
  'verb-object': 'Two verbs, perhaps one operation',
  'look-alike': 'Used in the same places',
};

/** The question in one line. */
export function titleOf({ kind, terms, objects }: ReportQuestion): string {
  const names = terms.map(({ text }) => text);
  if (kind === 'ambiguous-abbreviation') return `Does one abbreviation mean one thing? ${listed(names, 'and')}`;
  if (kind === 'variant' || kind === 'abbreviation') return `${listed(names, 'or')}?`;
  return `${listed(names, 'or')}${objects === undefined ? '' : ` (${objects.join(', ')})`}?`;
}

/** `goes by 1.9 names in effect (0.93 bits)`; one name used alone is said to be that. */
export function driftText({ bits, names }: Drift): string {
  return bits < 0.005
    ? 'goes by one name (0 bits)'
    : `goes by ${names.toFixed(1)} names in effect (${bits.toFixed(2)} bits)`;
}

/** Where drift lives, in one sentence. */
export function whereText({ shares: { folders, pages, inside } }: WhereDriftLives): string {
  if (pages === undefined || inside === undefined) {
    if (folders >= 0.5) return `Most of the mix (${percent(folders)}) is one folder against another.`;
    if (folders >= 0.15)
      return `Part of the mix (${percent(folders)}) is one folder against another, the rest is inside folders.`;
    return 'The folders mix the names alike.';
  }
  const parts = [
    { share: folders, text: 'one folder against another' },
    { share: pages, text: 'one page against another in the same folder' },
    { share: inside, text: 'inside pages' },
  ].sort((a, b) => b.share - a.share);
  const [first, second] = parts;
  const head = `${first!.share >= 0.5 ? 'Most' : 'The largest part'} of the mix (${percent(first!.share)}) is ${first!.text}`;
  return second!.share < 0.15 ? `${head}.` : `${head}; ${percent(second!.share)} is ${second!.text}.`;
}
