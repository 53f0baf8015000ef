// What no single entry shows: terms in two concepts, in two statuses, or together and apart at once.
import type { Reading } from './reading.js';
import { areHomonyms, type ConceptEntry, type Termbase, type TermEntry, type TermRef } from './termbase.js';

interface Place {
  readonly term: TermEntry;
  readonly concept: ConceptEntry;
}

/** Notes every contradiction of the termbase as a problem at its later place, with the earlier one as related. */
export function checkConsistency(reading: Reading, termbase: Termbase): void {
  const places = new Map<string, Place[]>();
  const ids = new Map<string, ConceptEntry>();
  for (const concept of termbase.concepts) {
    checkId(reading, ids, concept);
    checkNames(reading, concept.with, 'object');
    for (const term of concept.terms) {
      const earlier = places.get(term.key) ?? [];
      checkTerm(reading, earlier, { term, concept }, termbase.language);
      earlier.push({ term, concept });
      places.set(term.key, earlier);
    }
  }
  for (const { terms } of termbase.apart) {
    checkNames(reading, terms, 'term');
    checkApart(reading, places, terms);
  }
  for (const { terms } of termbase.later) checkNames(reading, terms, 'term');
}

function checkId(reading: Reading, ids: Map<string, ConceptEntry>, concept: ConceptEntry): void {
  if (concept.id === undefined) return;
  const first = ids.get(concept.id);
  if (first === undefined) ids.set(concept.id, concept);
  else {
    const message = `The id “${concept.id}” already belongs to “${first.preferred.text}”. Give each concept an id of its own.`;
    reading.error('duplicate-id', concept.span, message, first.span);
  }
}

function checkTerm(reading: Reading, earlier: readonly Place[], place: Place, usual: string | undefined): void {
  const { term, concept } = place;
  const within = earlier.find((other) => other.concept === concept && other.term.text === term.text);
  if (within !== undefined) {
    if (within.term.status === term.status) {
      reading.warning('duplicate-term', term.span, `“${term.text}” stands twice here. Remove one.`, within.term.span);
    } else {
      const message = `“${term.text}” is both ${within.term.status} and ${term.status} in one concept. Keep it under one of the two.`;
      reading.error('contradiction', term.span, message, within.term.span);
    }
    return;
  }
  const across = earlier.find((other) => other.concept !== concept && !areHomonyms(other, place, usual));
  if (across === undefined) return;
  const message =
    `“${term.text}” already belongs to the concept “${across.concept.preferred.text}” (${across.term.status} there), so it is not clear what it names. ` +
    'Keep it in one concept; if it is a homonym, give both a different partOfSpeech or subject.';
  reading.error('duplicate-term', term.span, message, across.term.span);
}

function checkNames(reading: Reading, names: readonly TermRef[], what: string): void {
  const seen = new Map<string, TermRef>();
  for (const name of names) {
    const first = seen.get(name.text);
    if (first === undefined) seen.set(name.text, name);
    else {
      const message = `The ${what} “${name.text}” stands twice here. Remove one.`;
      reading.warning('duplicate-term', name.span, message, first.span);
    }
  }
}

function checkApart(reading: Reading, places: ReadonlyMap<string, readonly Place[]>, terms: readonly TermRef[]): void {
  for (const [index, term] of terms.entries()) {
    for (const other of terms.slice(0, index)) {
      if (other.text === term.text) continue;
      // Spellings that differ in capitals alone share a key, so there the letters themselves must decide.
      const same = (a: TermRef, b: TermRef): boolean => (term.key === other.key ? a.text === b.text : a.key === b.key);
      const shared = (places.get(term.key) ?? []).find(
        (place) => same(place.term, term) && place.concept.terms.some((rival) => same(rival, other)),
      );
      if (shared === undefined) continue;
      const message =
        `“${other.text}” and “${term.text}” are kept apart here, but both name the concept “${shared.concept.preferred.text}”. ` +
        'Remove one of them from the concept, or remove this entry.';
      reading.error('contradiction', term.span, message, shared.term.span);
    }
  }
}
