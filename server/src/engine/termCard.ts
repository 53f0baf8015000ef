// The card of the term at a place: its status, its concept's names with their uses, its companions, and what is asked.
import type { Span } from '../base/span.js';
import { contains, touches } from '../base/span.js';
import { languagesIn } from './languages.js';
import type { CheckedTerm } from '../findings/checkedTerm.js';
import { companionsOf } from '../mining/companions/companions.js';
import type { RelatedCompanion } from '../mining/companions/companions.js';
import type { Question } from '../mining/question.js';
import { sourceEnd, sourceStart } from '../prose/prose.js';
import { isOpen } from '../prose/zones.js';
import { termForms } from '../rewrite/inflect.js';
import type { PartOfSpeech } from '../rewrite/inflect.js';
import type { TermStatus } from '../termbase/termbase.js';
import type { Snapshot } from './snapshot.js';
import { countUses, countedNames } from './usage.js';

/** How many companions a card shows. */
const SHOWN_COMPANIONS = 5;

/** One name of a concept. Uses are counted over the whole workspace folder, in every inflected form. */
export interface NameOnCard {
  readonly text: string;
  /** Undefined for a name that is still asked about. */
  readonly status: TermStatus | undefined;
  readonly uses: number;
  readonly documents: number;
}

/** What is known of a term. */
export interface TermCard {
  /** The term as decided or asked, not as inflected in the text. */
  readonly text: string;
  readonly names: readonly NameOnCard[];
  readonly companions: readonly RelatedCompanion[];
  readonly definition?: string;
  readonly note?: string;
  readonly question?: Question;
}

/** A term found in a document. */
export interface TermAtPlace {
  readonly checked: CheckedTerm;
  /** In the source. */
  readonly span: Span;
}

/** The decided or asked-about term that a place of a document touches, in open zones. */
export function termAt(snapshot: Snapshot, uri: string, offset: number): TermAtPlace | undefined {
  const reading = snapshot.readingOf(uri);
  if (reading === undefined) return undefined;
  const checker = snapshot.checkerAt(uri);
  const languages = languagesIn(reading);
  for (const [index, block] of reading.prose.blocks.entries()) {
    const { content } = block;
    const terms = checker.termsIn(languages.blocks[index]!);
    if (
      !touches({ start: block.start, end: block.start + content.sourceLength }, offset) ||
      !isOpen(content.zones, terms.closed)
    )
      continue;
    let found: TermAtPlace | undefined;
    terms.scan(content.text, (term, start, end) => {
      const span = { start: sourceStart(block, start), end: sourceEnd(block, end) };
      const closed = content.marks.some((mark) => !isOpen(mark.zones, terms.closed) && contains(mark, { start, end }));
      if (found === undefined && !closed && touches(span, offset))
        found = { checked: terms.terms[term]!.checked, span };
    });
    if (found !== undefined) return found;
  }
  return undefined;
}

/** The card of a term that {@link termAt} found. */
export function cardOf(snapshot: Snapshot, uri: string, { checked }: TermAtPlace): TermCard {
  const { decisions, open } = snapshot.agendaAt(uri);
  const question = checked.status === 'undecided' ? open.find(({ id }) => id === checked.conceptId) : undefined;
  if (question !== undefined) {
    const names = question.terms.map(({ text, uses, documents }) => ({ text, status: undefined, uses, documents }));
    const forms = question.terms.find(({ text }) => text === checked.text)?.forms.map(({ text }) => text) ?? [
      checked.text,
    ];
    return { text: checked.text, names, companions: companions(snapshot, forms), question };
  }
  const decided = decisions.termsOf(checked.text, checked.partOfSpeech)[0];
  const entries = decided === undefined ? [] : decided.names.terms;
  const usage = countUses(snapshot.relations, countedNames(entries, decided?.names.with ?? [], String));
  const names = entries.map(({ text, status }, index) => {
    const { uses, byDocument } = usage.get(String(index))!;
    return { text, status, uses, documents: byDocument.size };
  });
  const { definition, note } = decided?.names ?? {};
  return {
    ...{ text: checked.text, names, companions: companions(snapshot, formsOf(checked.text, checked.partOfSpeech)) },
    ...(definition !== undefined && { definition }),
    ...(note !== undefined && { note }),
  };
}

function formsOf(text: string, partOfSpeech?: PartOfSpeech): string[] {
  return [...new Set(termForms(text, partOfSpeech).map((form) => form.text.toLowerCase()))];
}

function companions(snapshot: Snapshot, forms: readonly string[]): RelatedCompanion[] {
  return snapshot.relations.languages
    .flatMap(({ corpus }) => companionsOf(corpus, forms, SHOWN_COMPANIONS))
    .sort((a, b) => b.strength - a.strength)
    .slice(0, SHOWN_COMPANIONS);
}
