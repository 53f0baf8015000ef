// The hover: a term's card as Markdown.
import type { Span } from '../base/span.js';
import { overlaps } from '../base/span.js';
import { preferredEdits } from '../engine/fixing.js';
import { definedAt, definitionOf } from '../engine/glossaryCard.js';
import type { DefinedAtPlace, GlossaryDefinition } from '../engine/glossaryCard.js';
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

/** The hover at a place of a document, or undefined where no known term and no headword of a glossary stands. */
export function hoverAt(snapshot: Snapshot, uri: string, offset: number): HoverCard | undefined {
  const found = termAt(snapshot, uri, offset);
  const defined = definedAt(snapshot, uri, offset);
  if (found === undefined) return defined && glossaryCard(snapshot, defined);
  const card = cardOf(snapshot, uri, found);
  const names = [card.text, ...card.names.map(({ text }) => text)];
  const definition =
    card.definition === undefined && defined !== undefined && names.some((name) => isSameName(name, defined.name))
      ? definitionOf(snapshot, defined.name, defined.language)
      : undefined;
  const refused = whyNoFix(snapshot, uri, found.span);
  const parts = [render(card, definition), ...(refused === undefined ? [] : [`No quick fix here: ${escape(refused)}`])];
  return { span: found.span, markdown: parts.join('\n\n') };
}

/** Why a term that should be replaced has no quick fix, as a sentence; undefined where it has one or needs none. */
function whyNoFix(snapshot: Snapshot, uri: string, span: Span): string | undefined {
  const finding = snapshot
    .findingsIn(uri)
    .find((each) => each.code === 'deprecated-term' && each.preferred !== undefined && overlaps(each.span, span));
  const fix = finding && preferredEdits(snapshot, uri, finding);
  return fix?.kind === 'refused' ? fix.reason : undefined;
}

/** The hover of a term that nothing is decided or asked about: its definition in the documents' own glossary. */
function glossaryCard(snapshot: Snapshot, { name, language, span }: DefinedAtPlace): HoverCard | undefined {
  const definition = definitionOf(snapshot, name, language);
  return definition && { span, markdown: `${heading(definition)}\n\n${definitionText(definition)}` };
}

function heading({ headword, sentFrom }: GlossaryDefinition): string {
  const name = `**${escape(headword)}**`;
  return sentFrom === undefined ? name : `**${escape(sentFrom)}**: the glossary sends you to ${name}.`;
}

function definitionText({ text, uri, line }: GlossaryDefinition): string {
  const page = uri.slice(uri.lastIndexOf('/') + 1);
  return `${escape(text)}\n\n[Glossary: ${escape(unescaped(page))}](<${uri}#L${line}>)`;
}

function isSameName(a: string, b: string): boolean {
  return a.toLowerCase() === b.toLowerCase();
}

function unescaped(page: string): string {
  try {
    return decodeURIComponent(page);
  } catch {
    return page;
  }
}

function render(card: TermCard, definition?: GlossaryDefinition): string {
  const parts = [headline(card), table(card.names)];
  if (card.definition !== undefined) parts.push(escape(card.definition));
  if (definition !== undefined) parts.push(definitionText(definition));
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
