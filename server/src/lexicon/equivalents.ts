// Our own list of technical terms that often name one thing: a prior that usage in the documents must confirm.
import { equivalentsText } from './data/equivalents.js';
import { termKey } from './termKey.js';

/** Parts of speech of the list's sets. */
export type EquivalentPos = 'noun' | 'verb' | 'adjective';

/** Terms that name one thing in one field. */
export interface EquivalentSet {
  readonly field: string;
  readonly pos: EquivalentPos;
  readonly terms: readonly string[];
  /** For verbs: with which objects they are equal; absent when with any. */
  readonly objects?: readonly string[];
  /** Where, or in which sense, the terms are distinct. */
  readonly distinct?: string;
}

/** An equivalent of some term, with the set that says so. */
export interface Equivalent {
  readonly term: string;
  readonly set: EquivalentSet;
}

let sets: readonly EquivalentSet[] | undefined;
let setsByKey: ReadonlyMap<string, readonly number[]> | undefined;

/** All sets, in the order of the list. */
export function equivalentSets(): readonly EquivalentSet[] {
  sets ??= parseEquivalents(equivalentsText);
  return sets;
}

/** The other terms of every set that has a term, in the order of the list; a set twice named gives its terms twice. */
export function equivalentsOf(term: string, pos?: EquivalentPos): Equivalent[] {
  const key = termKey(term);
  const all = equivalentSets();
  return (indexOf(key) ?? [])
    .flatMap((i) => all[i] ?? [])
    .filter((set) => pos === undefined || set.pos === pos)
    .flatMap((set) => set.terms.filter((other) => termKey(other) !== key).map((other) => ({ term: other, set })));
}

/**
 * The set in which two terms stand together, or undefined, which proves nothing. Of several sets, one without a note of
 * distinction comes first, then the order of the list. Two forms of one term are no equivalents.
 * @param pos where given, only sets of that part of speech count
 */
export function areEquivalent(a: string, b: string, pos?: EquivalentPos): EquivalentSet | undefined {
  return equivalentByKeys(termKey(a), termKey(b), pos);
}

/** The same for terms whose keys are known already ({@link termKey}). */
export function equivalentByKeys(a: string, b: string, pos?: EquivalentPos): EquivalentSet | undefined {
  const all = equivalentSets();
  const left = indexOf(a);
  const right = indexOf(b);
  if (a === b || left === undefined || right === undefined) return undefined;
  let first: EquivalentSet | undefined;
  for (const i of left) {
    const set = all[i];
    if (set === undefined || !right.includes(i) || (pos !== undefined && set.pos !== pos)) continue;
    if (set.distinct === undefined) return set;
    first ??= set;
  }
  return first;
}

/**
 * Reads the list's format, which its source file explains.
 * @throws Error that names the line which is wrong, counted without comments and blank lines
 */
export function parseEquivalents(text: string): EquivalentSet[] {
  const found: EquivalentSet[] = [];
  let field: string | undefined;
  text.split('\n').forEach((line, i) => {
    const heading = /^\[([a-z ]+)\]$/.exec(line);
    if (heading !== null) {
      field = heading[1];
      return;
    }
    const match = /^(noun|verb|adjective)(?: \(([^)]+)\))?: (.+?)(?: -- (.+))?$/.exec(line);
    if (match === null || field === undefined)
      throw new Error(`equivalents, line ${i + 1}: "${line}" is no set of a field`);
    const [, pos, objects, list = '', distinct] = match;
    const terms = list.split(' | ');
    if (terms.length < 2 || terms.some((term) => term !== term.trim() || term === '')) {
      throw new Error(`equivalents, line ${i + 1}: two or more terms are needed, parted by " | "`);
    }
    found.push({
      field,
      pos: pos as EquivalentPos,
      terms,
      ...(objects === undefined ? {} : { objects: objects.split(', ') }),
      ...(distinct === undefined ? {} : { distinct }),
    });
  });
  return found;
}

/** Places in the list of the sets that have a term. */
function indexOf(key: string): readonly number[] | undefined {
  setsByKey ??= indexByKey(equivalentSets());
  return setsByKey.get(key);
}

function indexByKey(all: readonly EquivalentSet[]): Map<string, number[]> {
  const index = new Map<string, number[]>();
  all.forEach(({ terms }, i) => {
    for (const key of new Set(terms.map(termKey))) {
      const list = index.get(key);
      if (list === undefined) index.set(key, [i]);
      else list.push(i);
    }
  });
  return index;
}
