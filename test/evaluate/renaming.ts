// Renames half of a term's uses in the texts of documents: a made-up mix whose answer is known.
import type { DocumentFacts } from '../../server/src/facts/documentFacts.js';
import { isOpen } from '../../server/src/prose/zones.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import { TokenFlag } from '../../server/src/tokens/tokens.js';

/** `occurrence` renames every second use, `document` all uses in some documents, about half in all. */
export type RenamingMode = 'document' | 'occurrence';

/** A term and the name that half of its uses get: by way of writing, in lower case with one space between words. */
export interface Renaming {
  readonly term: string;
  readonly forms: ReadonlyMap<string, string>;
}

/** The longest way of writing that is renamed, in words. */
const LONGEST = 3;

interface Place {
  readonly document: number;
  readonly term: string;
  readonly from: number;
  readonly to: number;
  readonly replacement: string;
  /** Uses in the same prose, such as a repeated block, share it. */
  readonly twin: string;
}

/**
 * Renames uses in prose; which ones is a function of the texts alone. A use counts where its words stand next to each
 * other in one sentence with white space between them.
 */
export function rename(
  sources: readonly SourceText[],
  facts: readonly DocumentFacts[],
  renamings: readonly Renaming[],
  mode: RenamingMode,
): SourceText[] {
  const places = sources.flatMap((source, document) => placesIn(source, facts[document]!, document, renamings));
  const chosen = mode === 'occurrence' ? everySecond(places) : halfByDocument(places);
  return sources.map((source, document) => ({
    ...source,
    text: replaceAll(
      source.text,
      chosen.filter((place) => place.document === document),
    ),
  }));
}

/** Every second use of each term; uses in the same prose fare alike, so that a repeated block stays one. */
function everySecond(places: readonly Place[]): Place[] {
  const renamed = new Map<string, boolean>();
  const met = new Map<string, number>();
  for (const { term, twin } of places) {
    if (renamed.has(twin)) continue;
    const before = met.get(term) ?? 0;
    met.set(term, before + 1);
    renamed.set(twin, before % 2 === 0);
  }
  return places.filter(({ twin }) => renamed.get(twin) === true);
}

/** Documents with the most uses first, each to the side that has fewer so far. */
function halfByDocument(places: readonly Place[]): Place[] {
  const renamed = new Set<string>();
  for (const [term, own] of groupBy(places, (place) => place.term)) {
    const documents = [...groupBy(own, ({ document }) => String(document))];
    documents.sort(([a, m], [b, n]) => n.length - m.length || Number(a) - Number(b));
    let balance = 0;
    for (const [document, { length }] of documents) {
      if (balance >= 0) renamed.add(`${term} ${document}`);
      balance += balance >= 0 ? -length : length;
    }
  }
  return places.filter(({ term, document }) => renamed.has(`${term} ${document}`));
}

function placesIn(
  { text }: SourceText,
  facts: DocumentFacts,
  document: number,
  renamings: readonly Renaming[],
): Place[] {
  const byForm = new Map(
    renamings.flatMap(({ term, forms }) => [...forms].map(([form, replacement]) => [form, { term, replacement }])),
  );
  const places: Place[] = [];
  facts.blockKind.forEach((_, block) => {
    const first = facts.blockFirst[block]!;
    const end = facts.blockFirst[block + 1]!;
    for (let row = first; row < end; row++) {
      const form = longestAt(facts, row, end, (phrase) => byForm.has(phrase));
      if (form === undefined) continue;
      const { term, replacement } = byForm.get(form)!;
      const length = form.split(' ').length;
      const from = facts.start[row]!;
      const to = facts.end[row + length - 1]!;
      const twin = `${term} ${facts.blockHash[block]!} ${row - first}`;
      row += length - 1;
      if (text.slice(from, to).toLowerCase().replace(/\s+/g, ' ') !== form) continue;
      places.push({ document, term, from, to, replacement, twin });
    }
  });
  return places;
}

function longestAt(
  facts: DocumentFacts,
  row: number,
  end: number,
  isForm: (phrase: string) => boolean,
): string | undefined {
  let phrase = '';
  let found: string | undefined;
  for (let length = 1; length <= LONGEST && row + length <= end; length++) {
    const at = row + length - 1;
    const flags = facts.flags[at]!;
    if ((flags & TokenFlag.word) === 0 || !isOpen(facts.zones[at]!)) break;
    if (length > 1 && ((flags & TokenFlag.spaceBefore) === 0 || (flags & TokenFlag.sentenceStart) !== 0)) break;
    phrase += (length > 1 ? ' ' : '') + facts.words[facts.word[at]!]!.toLowerCase();
    if (isForm(phrase)) found = phrase;
  }
  return found;
}

/** Blocks need not come in the order of the text, and one stretch of it may be read twice. */
function replaceAll(text: string, places: readonly Place[]): string {
  let out = '';
  let done = 0;
  for (const { from, to, replacement } of [...places].sort((a, b) => a.from - b.from)) {
    if (from < done) continue;
    out += text.slice(done, from) + inCaseOf(text.slice(from, to), replacement);
    done = to;
  }
  return out + text.slice(done);
}

/** All capitals, a first capital, or small letters, as the written use has it. */
function inCaseOf(written: string, replacement: string): string {
  if (written.length > 1 && written === written.toUpperCase()) return replacement.toUpperCase();
  if (/^\p{Lu}/u.test(written)) return replacement.charAt(0).toUpperCase() + replacement.slice(1);
  return replacement;
}

function groupBy<T>(items: readonly T[], key: (item: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>();
  for (const item of items) {
    const group = groups.get(key(item));
    if (group === undefined) groups.set(key(item), [item]);
    else group.push(item);
  }
  return groups;
}
