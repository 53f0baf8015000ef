// Which form of a term stands in the text, and the same form of the term that takes its place.
import type { Span } from '../base/span.js';
import { inflectTerm, termForms, type Form, type PartOfSpeech } from './inflect.js';

/** The form found: `written` is the term in that form with its termbase's capitals. */
export interface SurfaceForm {
  readonly form: Form;
  readonly written: string;
  readonly certain: boolean;
  /** Every form that is written so: past and participle of most verbs. */
  readonly forms: readonly Form[];
}

/** The form of `term` that the words at `span` are; undefined where they are none. */
export function formOfSurface(
  surface: string,
  term: string,
  partOfSpeech: PartOfSpeech | undefined,
  text: string,
  span: Span,
): SurfaceForm | undefined {
  const folded = fold(surface);
  const candidates = termForms(term, partOfSpeech).filter((inflected) => fold(inflected.text) === folded);
  const first = candidates[0];
  if (!first) return undefined;
  const forms = new Set(candidates.map(({ form }) => form));
  if (forms.size === 1) return { form: first.form, written: first.text, certain: true, forms: [first.form] };
  return { written: first.text, forms: [...forms], ...amongForms(forms, text, span) };
}

/** A term in the form of another; base where both its numbers look alike. */
export function inflectLike(term: string, form: Form, partOfSpeech: PartOfSpeech | undefined): string | undefined {
  if (form === 'base') return term;
  const inflected = inflectTerm(term, form, partOfSpeech);
  // Nouns without a plural form of their own (software, credentials) stand as they are.
  return inflected ?? (form === 'plural' ? term : undefined);
}

/** *Launched* is past or participle, *put* base, past or participle: the words before it tell, or the choice stays uncertain. */
function amongForms(forms: ReadonlySet<Form>, text: string, span: Span): { form: Form; certain: boolean } {
  const before = text.slice(Math.max(0, span.start - 60), span.start).toLowerCase();
  const after = text.slice(span.end, span.end + 10).toLowerCase();
  const afterAuxiliary =
    /\b(?:is|are|was|were|be|been|being|am|has|have|had|having|get|gets|got|getting|isn't|aren't|wasn't|weren't|hasn't|haven't|hadn't)\s+(?:(?:not|also|never|already|always|just|now|then|only|still|[a-z]+ly)\s+)*$/.test(
      before.replace(/’/g, "'"),
    );
  if (forms.has('participle') && (afterAuxiliary || /^\s+by\b/.test(after)))
    return { form: 'participle', certain: true };
  if (
    forms.has('base') &&
    /\b(?:to|will|would|can|could|may|might|must|shall|should|do|does|did|don't|please|not)\s+$/.test(before)
  ) {
    return { form: 'base', certain: true };
  }
  if (
    forms.has('past') &&
    !forms.has('base') &&
    /(?:^|[\s(])(?:i|you|we|they|he|she|it|who)\s+(?:[a-z]+ly\s+)?$/.test(before)
  )
    return { form: 'past', certain: true };
  if (forms.has('base') && !forms.has('participle')) return { form: 'base', certain: false };
  return { form: forms.has('base') ? 'base' : 'participle', certain: false };
}

function fold(text: string): string {
  return text
    .toLowerCase()
    .replace(/\s+/g, ' ')
    .replace(/’/g, "'")
    .replace(/[\u2010\u2011]/g, '-');
}
