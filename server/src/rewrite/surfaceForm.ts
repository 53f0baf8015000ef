// Which form of a term stands in the text, and the same form of the term that takes its place.
import type { Span } from '../base/span.js';
import { startsSentence } from './sentence.js';
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

const ADVERBS = String.raw`(?:(?:not|also|never|already|always|just|now|then|only|still|first|[a-z]+ly)\s+)*`;
const AFTER_AUXILIARY = new RegExp(
  String.raw`\b(?:is|are|was|were|be|been|being|am|has|have|had|having|get|gets|got|getting|isn't|aren't|wasn't|weren't|hasn't|haven't|hadn't)\s+${ADVERBS}$`,
);
const AFTER_MODAL = new RegExp(
  String.raw`\b(?:to|will|would|can|could|may|might|must|shall|should|do|does|did|don't|doesn't|didn't|please|let's)\s+${ADVERBS}$`,
);
const AFTER_SUBJECT = new RegExp(String.raw`(?:^|[\s(])(?:i|you|we|they|he|she|it|who)\s+${ADVERBS}$`);
const BEFORE_OBJECT = /^\s+(?:an?|the|this|these|those|my|your|his|her|its|our|their|it|them)\b/;

/** *Launched* is past or participle, *put* base, past or participle: the words around it tell, or the choice stays uncertain. */
function amongForms(forms: ReadonlySet<Form>, text: string, span: Span): { form: Form; certain: boolean } {
  const before = text
    .slice(Math.max(0, span.start - 60), span.start)
    .toLowerCase()
    .replace(/’/g, "'");
  const after = text.slice(span.end, span.end + 12).toLowerCase();
  const [base, past, participle] = [forms.has('base'), forms.has('past'), forms.has('participle')];
  if (participle && (AFTER_AUXILIARY.test(before) || /^\s+by\b/.test(after)))
    return { form: 'participle', certain: true };
  if (base && AFTER_MODAL.test(before)) return { form: 'base', certain: true };
  // An imperative; "Set up any agent" is none but that.
  if (base && startsSentence(text, span.start)) return { form: 'base', certain: true };
  // A participle takes no object of its own: "…, run the following command".
  if (base && !past) return { form: 'base', certain: BEFORE_OBJECT.test(after) || AFTER_SUBJECT.test(before) };
  if (past && !base && AFTER_SUBJECT.test(before)) return { form: 'past', certain: true };
  if (past && !base && BEFORE_OBJECT.test(after)) return { form: 'past', certain: true };
  return { form: base ? 'base' : 'participle', certain: false };
}

function fold(text: string): string {
  return text
    .toLowerCase()
    .replace(/\s+/g, ' ')
    .replace(/’/g, "'")
    .replace(/[\u2010\u2011]/g, '-');
}
