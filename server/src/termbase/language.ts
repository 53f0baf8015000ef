// Which concepts of a termbase hold for a language: those that state it, and those that state none.
import { primaryLanguage } from '../text/language.js';
import type { ConceptEntry, Termbase } from './termbase.js';

/** The language that a concept's terms are in (BCP 47 primary subtag): its own statement, else the file's, else undefined. */
export function languageOfConcept(concept: ConceptEntry, termbase: Termbase): string | undefined {
  return primaryLanguage(concept.language ?? termbase.language);
}

/**
 * A termbase without the concepts of other languages; the same object where all of them hold. Without a language all do. What is
 * kept apart or put off states no language: it is about its spellings wherever they stand, so that no answer is lost.
 */
export function inLanguage(termbase: Termbase, language: string | undefined): Termbase {
  if (language === undefined) return termbase;
  const concepts = termbase.concepts.filter((concept) => {
    const stated = languageOfConcept(concept, termbase);
    return stated === undefined || stated === language;
  });
  return concepts.length === termbase.concepts.length ? termbase : { ...termbase, concepts };
}
