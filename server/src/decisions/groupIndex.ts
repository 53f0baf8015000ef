// Finding the groups of a chain of termbases (kept apart, put off) that list certain terms.
import { termKey, termText } from '../termbase/termKey.js';
import type { Termbase, TermRef } from '../termbase/termbase.js';

/** A group of one file of the chain. */
export interface PlacedGroup<G> {
  readonly entry: G;
  readonly uri: string;
  /** 0 for the nearest file. */
  readonly level: number;
}

/** An index over the groups of a chain of termbases, nearest first; it never changes. */
export class GroupIndex<G extends { readonly terms: readonly TermRef[] }> {
  private readonly byKey = new Map<string, PlacedGroup<G>[]>();

  constructor(chain: readonly Termbase[], groupsOf: (termbase: Termbase) => readonly G[]) {
    for (const [level, termbase] of chain.entries()) {
      for (const entry of groupsOf(termbase)) {
        const group = { entry, uri: termbase.uri, level };
        for (const key of new Set(entry.terms.map((term) => term.key))) {
          const known = this.byKey.get(key);
          if (known === undefined) this.byKey.set(key, [group]);
          else known.push(group);
        }
      }
    }
  }

  /**
   * The groups that list each of the terms, no two by the same name; nearest file first.
   * @param terms each by all its spellings.
   */
  entriesWith(terms: readonly (readonly string[])[]): readonly PlacedGroup<G>[] {
    const first = terms[0] ?? [];
    const candidates = new Set(first.flatMap((spelling) => this.byKey.get(termKey(spelling)) ?? []));
    return [...candidates].filter(({ entry }) => holdsAll(entry.terms, terms)).sort((a, b) => a.level - b.level);
  }

  /** The level of the nearest file with a group of all the terms. */
  levelOf(terms: readonly (readonly string[])[]): number | undefined {
    return this.entriesWith(terms)[0]?.level;
  }
}

function holdsAll(names: readonly TermRef[], terms: readonly (readonly string[])[]): boolean {
  const taken = new Set<TermRef>();
  for (const spellings of terms) {
    const name = spellings
      .map((spelling) => findName(names, spelling))
      .find((found) => found !== undefined && !taken.has(found));
    if (name === undefined) return false;
    taken.add(name);
  }
  return true;
}

function findName(names: readonly TermRef[], spelling: string): TermRef | undefined {
  const key = termKey(spelling);
  const sameKey = names.filter((name) => name.key === key);
  // Names that differ in capitals alone are told apart by them.
  return sameKey.length > 1 ? sameKey.find(({ text }) => text === termText(spelling)) : sameKey[0];
}
