// Finding a term's entries in one termbase, with capitals read the way a writer means them.
import { termKey, termText } from './termKey.js';
import type { ConceptEntry, PartOfSpeech, Termbase, TermEntry, TermRef } from './termbase.js';

/** One term in one concept; homonyms have several places. */
export interface TermPlace {
  readonly term: TermEntry;
  readonly concept: ConceptEntry;
  /** The object that the looked-up text named beside the verb (`session` for `start session`). */
  readonly object?: TermRef;
}

/** An index over the concepts of one termbase; it never changes. */
export class TermIndex {
  private readonly byKey = new Map<string, TermPlace[]>();

  constructor(readonly termbase: Termbase) {
    for (const concept of termbase.concepts) {
      for (const term of concept.terms) {
        this.add(term.key, { term, concept });
        for (const object of concept.with) this.add(`${term.key} ${object.key}`, { term, concept, object });
      }
    }
  }

  private add(key: string, place: TermPlace): void {
    const places = this.byKey.get(key);
    if (places === undefined) this.byKey.set(key, [place]);
    else places.push(place);
  }

  /** Every place whose key is the given one, whatever the capitals; in the order of the file. */
  placesOfKey(key: string): readonly TermPlace[] {
    return this.byKey.get(key) ?? [];
  }

  /**
   * The places that a text means. The very spelling wins; then a spelling that differs in its first capital, as at the start
   * of a sentence; then any capitals, unless the term is case-sensitive or its concept tells spellings apart by capitals.
   * A verb with its object (`start session`) finds the concepts that hold for this object; a bare verb finds those that
   * hold for some objects only where none holds for all.
   * @param partOfSpeech leaves out the entries that state another one.
   */
  placesOf(text: string, partOfSpeech?: PartOfSpeech): readonly TermPlace[] {
    const written = termText(text);
    const possible = this.placesOfKey(termKey(text)).filter(
      ({ term }) => !partOfSpeech || !term.partOfSpeech || term.partOfSpeech === partOfSpeech,
    );
    const general = possible.filter(({ concept, object }) => object !== undefined || concept.with.length === 0);
    const candidates = general.length > 0 ? general : possible;
    const exact = candidates.filter((place) => spelling(place) === written);
    if (exact.length > 0) return exact;
    const free = candidates.filter(({ term }) => !term.caseSensitive);
    const initial = free.filter((place) => lowerFirst(spelling(place)) === lowerFirst(written));
    if (initial.length > 0) return initial;
    return free.filter(({ term, concept }) => !isToldApartByCapitals(term, concept));
  }
}

function spelling({ term, object }: TermPlace): string {
  return object === undefined ? term.text : `${term.text} ${object.text}`;
}

/** True where the concept lists another spelling of the term that differs in capitals alone (`GitHub`, not `Github`). */
function isToldApartByCapitals(term: TermEntry, concept: ConceptEntry): boolean {
  return concept.terms.some((other) => other.key === term.key && other.text !== term.text);
}

function lowerFirst(text: string): string {
  const first = String.fromCodePoint(text.codePointAt(0) ?? 0x20);
  return first.toLowerCase() + text.slice(first.length);
}
