// Clipped forms (config, repo, admin) and the full words they stand for.
import { clippingsText } from './data/clippings.js';
import { singularOf } from './plurals.js';
import { spellingKey } from './spelling.js';

interface Clippings {
  readonly fullForms: ReadonlyMap<string, readonly string[]>;
  readonly clipped: ReadonlyMap<string, readonly string[]>;
}

let table: Clippings | undefined;

/** What a clipping stands for, the likeliest first; empty for a word that is no clipping. Plurals give singulars. */
export function fullFormsOf(clipping: string): readonly string[] {
  const { fullForms } = read();
  const lower = clipping.toLowerCase();
  return fullForms.get(lower) ?? fullForms.get(singularOf(lower)) ?? [];
}

/** The clippings of a full word or phrase; empty where the list has none. */
export function clippingsOf(full: string): readonly string[] {
  return read().clipped.get(foldFull(full)) ?? [];
}

/**
 * Which of two terms is the clipped one: 'a' or 'b', or undefined where they are not clipping and full form. Terms of
 * several words agree word by word ("config file", "configuration file"), clipped on one side only.
 */
export function clippedSide(a: string, b: string): 'a' | 'b' | undefined {
  if (standsFor(a, b)) return 'a';
  if (standsFor(b, a)) return 'b';
  const left = a.split(' ');
  const right = b.split(' ');
  if (left.length !== right.length || left.length < 2) return undefined;
  let side: 'a' | 'b' | undefined;
  for (const [i, word] of left.entries()) {
    const other = right[i] ?? '';
    if (foldFull(word) === foldFull(other)) continue;
    const here = standsFor(word, other) ? 'a' : standsFor(other, word) ? 'b' : undefined;
    if (here === undefined || (side !== undefined && side !== here)) return undefined;
    side = here;
  }
  return side;
}

function standsFor(clipping: string, full: string): boolean {
  const folded = foldFull(full);
  return folded !== foldFull(clipping) && fullFormsOf(clipping).some((form) => foldFull(form) === folded);
}

function foldFull(term: string): string {
  return term
    .toLowerCase()
    .split(' ')
    .map((word) => spellingKey(singularOf(word)))
    .join(' ');
}

function read(): Clippings {
  if (table !== undefined) return table;
  const fullForms = new Map<string, readonly string[]>();
  const clipped = new Map<string, string[]>();
  for (const line of clippingsText.split('\n')) {
    const [clipping = '', right = ''] = line.split(' = ');
    const forms = right.split(' | ');
    fullForms.set(clipping, forms);
    for (const form of forms) {
      const key = foldFull(form);
      const list = clipped.get(key);
      if (list === undefined) clipped.set(key, [clipping]);
      else list.push(clipping);
    }
  }
  table = { fullForms, clipped };
  return table;
}
