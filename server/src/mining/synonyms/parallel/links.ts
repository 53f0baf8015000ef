// Parallel places that links make: a link's text and the heading it leads to, and the texts of links to one place.
import type { Work } from '../../../base/work.js';
import type { Corpus } from '../../../corpus/corpus.js';
import { resolveTarget } from '../linkTargets.js';
import { readDestinations } from './destinations.js';
import type { Parallel, Passage } from './passages.js';

/** A place to which more links lead is a page of several things: its links are held against its heading alone. */
const MOST_LINKS = 12;

/** Every link's text with the headings it leads to, and with the texts of other links to the same place. */
export function* findLinkParallels(corpus: Corpus): Work<Parallel[]> {
  const { stream, documents } = corpus;
  const destinations = readDestinations(corpus);
  yield;
  const found: Parallel[] = [];
  const byTarget = new Map<string, Passage[]>();
  documents.forEach(({ uri, facts }, document) => {
    const offset = stream.documentFirst[document]!;
    for (const { firstToken, endToken, target } of facts.links) {
      const one = { first: offset + firstToken, end: offset + endToken };
      for (const other of destinations.of(uri, target)) found.push({ source: 'link-heading', one, other });
      const place = resolveTarget(uri, target);
      const same = byTarget.get(place);
      if (same === undefined) byTarget.set(place, [one]);
      else same.push(one);
    }
  });
  yield;
  for (const links of byTarget.values()) {
    if (links.length > MOST_LINKS) continue;
    links.forEach((one, at) => {
      for (const other of links.slice(at + 1)) found.push({ source: 'same-target', one, other });
    });
  }
  return found;
}
