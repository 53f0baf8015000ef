// The hover: a term's card as Markdown.
import type { Span } from '../base/span.js';
import { cardOf, termAt } from '../engine/termCard.js';
import { isBehind } from '../engine/companions.js';
import type { RelatedCompanion } from '../mining/companions/companions.js';
import type { NameOnCard, TermCard } from '../engine/termCard.js';
import type { Snapshot } from '../engine/snapshot.js';

/** A hover's text and the place that it is about. */
export interface HoverCard {
  readonly span: Span;
  readonly markdown: string;
}

/** The hover at a place of a document, or undefined where no known term stands. */
export function hoverAt(snapshot: Snapshot, uri: string, offset: number): HoverCard | undefined {
  const found = termAt(snapshot, uri, offset);
  if (found === undefined) return undefined;
  return { span: found.span, markdown: render(cardOf(snapshot, uri, found)) };
}

function render(card: TermCard): string {
  const parts = [headline(card), table(card.names)];
  if (card.definition !== undefined) parts.push(escape(card.definition));
  if (card.note !== undefined) parts.push(`*${escape(card.note)}*`);
  if (card.question !== undefined) {
    parts.push(card.question.reasons.map(({ text }) => `- ${escape(text)}`).join('\n'));
  }
  if (card.companions.length > 0) parts.push(`Goes with: ${card.companions.map(companion).join(', ')}`);
  if (card.question !== undefined) parts.push('Answer once with a quick fix, and every page is held to it.');
  return parts.filter((part) => part !== '').join('\n\n');
}

function headline({ text, names, question }: TermCard): string {
  const name = `**${escape(text)}**`;
  if (question !== undefined) {
    const rivals = names.filter((each) => each.text !== text).map((each) => `**${escape(each.text)}**`);
    const objects = question.objects === undefined ? '' : ` ${listed(question.objects)}`;
    return `${name}${objects}: one thing with ${rivals.join(', ')}? Nobody has decided yet.`;
  }
  const status = names.find((each) => each.text === text)?.status;
  const preferred = names.find((each) => each.status === 'preferred');
  if (status === 'deprecated')
    return `${name} is a deprecated term.${preferred ? ` Preferred: **${escape(preferred.text)}**.` : ''}`;
  if (status === 'admitted')
    return `${name} is an admitted term.${preferred ? ` Preferred: **${escape(preferred.text)}**.` : ''}`;
  if (status === 'preferred') return `${name} is the preferred term.`;
  return `${name} is kept apart from terms that look like it.`;
}

function table(names: readonly NameOnCard[]): string {
  if (names.length === 0) return '';
  const rows = names.map(
    ({ text, status, uses, documents }) => `| ${escape(text)} | ${status ?? 'undecided'} | ${uses} | ${documents} |`,
  );
  return ['| Name | Status | Uses | Pages |', '|---|---|--:|--:|', ...rows].join('\n');
}

function companion({ word, relation, count }: RelatedCompanion): string {
  return `${isBehind(relation) ? `___ ${escape(word)}` : `${escape(word)} ___`} (${count})`;
}

function listed(words: readonly string[]): string {
  return words.map((word) => escape(word)).join(' / ');
}

/** Text of documents shown in Markdown: nothing in it may act as markup. */
function escape(text: string): string {
  return text.replace(/[\\`*_{}[\]<>()#+!|~&]/g, (sign) => `\\${sign}`).replace(/\s+/g, ' ');
}
