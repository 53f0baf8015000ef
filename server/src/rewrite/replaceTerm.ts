// Replaces one use of a term as a writer would: number, verb form, possessive, article, particle, capitals.
import type { Span } from '../base/span.js';
import type { TextEdit } from '../text/edits.js';
import { CLOSED_ZONES, type ZoneSet } from '../prose/zones.js';
import { articleEdit } from './articleEdit.js';
import { matchCase } from './casing.js';
import { headOf, inflectsAs, type Form, type PartOfSpeech } from './inflect.js';
import { numberOf } from './noun.js';
import { possessiveEdit } from './possessive.js';
import { formOfSurface, inflectLike } from './surfaceForm.js';
import { wordEdits } from './wordEdits.js';

/** What to replace; offsets count UTF-16 units of `text`, one block's prose. */
export interface ReplaceRequest {
  readonly text: string;
  /** The zones that the place lies in. */
  readonly zones?: ZoneSet;
  /** The term as it stands, without a possessive ending. */
  readonly span: Span;
  /** The term in its base form as its termbase writes it, and the term that takes its place. */
  readonly from: string;
  readonly to: string;
  /** Of both terms. */
  readonly partOfSpeech?: PartOfSpeech;
  /** False in a language of which no grammar is known: one written form takes the place of the other. */
  readonly inflects?: boolean;
}

/** The edits of the text, ascending; `span` is the replaced term's own range. Not certain: a person should look before it is applied. */
export interface Replacement {
  readonly span: Span;
  readonly edits: readonly TextEdit[];
  readonly certain: boolean;
}

/** Why a place is not replaced, as a sentence for the writer. */
export interface Refusal {
  readonly refused: string;
}

/** True where nothing is replaced. */
export function isRefusal(result: Replacement | Refusal | readonly TextEdit[]): result is Refusal {
  return 'refused' in result;
}

/** Replaces the use of `from` at `span` by `to`. Refuses wherever the sentence would come out wrong or in doubt of its meaning. */
export function replaceTerm(request: ReplaceRequest): Replacement | Refusal {
  const { text, zones = 0, span, from, to, inflects = true } = request;
  const partOfSpeech = inflects ? request.partOfSpeech : 'other';
  const surface = text.slice(span.start, span.end);
  if ((zones & CLOSED_ZONES) !== 0)
    return { refused: 'This place is code, a quotation, a label or a link target, which stay as they are.' };
  const found = formOfSurface(surface, from, partOfSpeech, text, span);
  if (!found) return { refused: `“${surface}” is no form of “${from}” that can be carried over to “${to}”.` };
  const as = inflectsAs(from, partOfSpeech);
  const inflect = (form: Form): string | undefined =>
    inflectLike(to, form, partOfSpeech ?? (as === 'none' ? undefined : as));
  const inflected = inflect(found.form);
  if (inflected === undefined) return { refused: `“${to}” has no form that fits in the place of “${surface}”.` };
  const wrong = misfit(text, span, surface, from, to, inflected, as);
  if (wrong !== undefined) return { refused: wrong };

  const replacement = matchCase(inflected, { text, start: span.start, end: span.end, written: found.written });
  const moved = as === 'verb' ? aroundPronoun(text, span, replacement) : undefined;
  const ownEdits = wordEdits(text, span, moved?.verb ?? replacement);
  const edits = [
    ...(inflects ? articleEdit(text, span, replacement) : []),
    ...ownEdits,
    ...(moved ? [moved.edit] : []),
    ...(inflects ? possessiveEdit(text, span, surface, replacement) : []),
  ];
  if (edits.length === 0) return { refused: `“${surface}” already stands there.` };
  // Which form it was does not matter where the new term writes them alike too.
  const certain = found.certain || found.forms.every((form) => inflect(form) === inflected);
  // Words around it may have to agree with the new term.
  return { span, edits, certain: certain && inflects };
}

/** Reasons against the replacement that lie in the sentence around it. */
function misfit(
  text: string,
  span: Span,
  surface: string,
  from: string,
  to: string,
  inflected: string,
  as: 'noun' | 'verb' | 'none',
): string | undefined {
  const before = text.slice(0, span.start);
  const after = text.slice(span.end);
  const first = /^[\p{L}\p{N}]+/u.exec(inflected)?.[0].toLowerCase();
  const last = /[\p{L}\p{N}]+$/u.exec(inflected)?.[0].toLowerCase();
  const previous = /([\p{L}\p{N}]+)[\s-]+$/u.exec(before)?.[1]?.toLowerCase();
  const next = /^[\s-]+([\p{L}\p{N}]+)/u.exec(after)?.[1]?.toLowerCase();
  const startsSame = surface.toLowerCase().startsWith(first ?? ' ');
  const endsSame = surface.toLowerCase().endsWith(last ?? ' ');
  if (first !== undefined && first === previous && !startsSame) return `“${first}” would stand there twice.`;
  if (last !== undefined && last === next && !endsSame) return `“${last}” would stand there twice.`;
  if (isExplained(before, after, surface, from))
    return 'A full form and its abbreviation stand side by side here: one explains the other.';
  if (as !== 'noun') return undefined;
  return numberMisfit(before, from, to, surface);
}

function numberMisfit(before: string, from: string, to: string, surface: string): string | undefined {
  const headOfTerm = (term: string): string => {
    const { start, end } = headOf(term, 'noun');
    return term.slice(start, end);
  };
  const [old, now] = [numberOf(headOfTerm(from)), numberOf(headOfTerm(to))];
  const counted = /(?:^|\s)(?:an?|another|one|each|every|either|neither|this|that)\s+(?:[\p{L}-]+\s+)?$/iu.test(before);
  if (now === 'plural' && old !== 'plural' && counted) return `“${to}” is a plural: the sentence speaks of one thing.`;
  if (now === 'plural' && old === 'singular' && surface.toLowerCase() === from.toLowerCase()) {
    return `“${to}” is a plural where “${from}” is none: the verb may have to change.`;
  }
  if (now !== 'plural' && old === 'plural')
    return `“${from}” is a plural and “${to}” is none: the verb may have to change.`;
  if (now === 'uncounted' && old === 'singular') {
    if (
      /(?:^|\s)(?:an?|another|one|each|every|these|those|many|few|several|two|three|\d+)\s+(?:[\p{L}-]+\s+)?$/iu.test(
        before,
      )
    ) {
      return `“${to}” is not counted: the words before it would not fit.`;
    }
    if (surface.toLowerCase() !== from.toLowerCase()) return `“${to}” has no plural: the verb may have to change.`;
  }
  return undefined;
}

/** "access key (AK)" and "AK (access key)": the parenthesis explains, whichever of the two is replaced. */
function isExplained(before: string, after: string, surface: string, from: string): boolean {
  if (/\($/.test(before) && /^\)/.test(after)) return true;
  const inner = /^\s*\(([^()]{1,60})\)/.exec(after)?.[1];
  if (inner === undefined) return false;
  const compact = (text: string): string => text.replace(/[^\p{L}\p{N}]/gu, '').toLowerCase();
  const initials = (text: string): string =>
    (text.match(/[\p{L}\p{N}]+/gu) ?? [])
      .map((word) => word.charAt(0))
      .join('')
      .toLowerCase();
  const short = compact(inner).replace(/s$/, '');
  if (/^\p{Lu}[\p{Lu}\d]{1,6}s?$/u.test(inner.trim()) && initials(surface).startsWith(short.charAt(0))) return true;
  return initials(inner) === compact(from).replace(/s$/, '');
}

/** "configure it" becomes "set it up": before a pronoun the particle goes behind it. */
function aroundPronoun(text: string, span: Span, replacement: string): { verb: string; edit: TextEdit } | undefined {
  const particle = /^(\S+)\s+(up|out|off|down|back|over|away)$/i.exec(replacement);
  const pronoun = /^\s+(?:it|them|him|her|me|us)(?![\p{L}\p{N}'’-])/iu.exec(text.slice(span.end));
  if (!particle || !pronoun) return undefined;
  const at = span.end + pronoun[0].length;
  return { verb: particle[1]!, edit: { span: { start: at, end: at }, newText: ` ${particle[2]!}` } };
}
