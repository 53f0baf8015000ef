// Which entries of a termbase hold for a language: those that state it, and those that state none.
import { primaryLanguage } from '../text/language.js';
import type { ConceptEntry, Termbase } from './termbase.js';

/** The language that a concept's terms are in (BCP 47 primary subtag): its own statement, else the file's, else undefined. */
export function languageOfConcept(concept: ConceptEntry, termbase: Termbase): string | undefined {
  return primaryLanguage(concept.language ?? termbase.language);
}

/** A termbase without what it says of other languages; the same object where all of it holds. Without a language all does. */
export function inLanguage(termbase: Termbase, language: string | undefined): Termbase {
  if (language === undefined) return termbase;
  const holds = (stated: string | undefined): boolean => stated === undefined || stated === language;
  const concepts = termbase.concepts.filter((concept) => holds(languageOfConcept(concept, termbase)));
  const isWhole = holds(primaryLanguage(termbase.language));
  if (isWhole && concepts.length === termbase.concepts.length) return termbase;
  return { ...termbase, concepts, ...(!isWhole && { apart: [], later: [] }) };
}
