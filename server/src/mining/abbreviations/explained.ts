// Short forms with their explanations gathered: one short form, one or several expansions.
import { compareCodeUnits } from '../../base/order.js';
import type { Use } from '../places.js';
import type { Definition } from './definitions.js';

/** One thing that a short form is explained to stand for. */
export interface Expansion {
  /** Lower case, the last word in the singular, hyphens resolved. */
  readonly words: readonly string[];
  readonly definitions: readonly Definition[];
}

/** A short form and what it is explained to stand for, the commonest explanation first. */
export interface Explained {
  readonly short: string;
  readonly expansions: readonly Expansion[];
}

/** Gathers explanations by short form, in order of its code units. */
export function groupDefinitions(definitions: readonly Definition[]): Explained[] {
  const byShort = new Map<string, Map<string, Definition[]>>();
  for (const definition of definitions) {
    const byLong = byShort.get(definition.short) ?? new Map<string, Definition[]>();
    byShort.set(definition.short, byLong);
    const list = byLong.get(definition.longKey);
    if (list === undefined) byLong.set(definition.longKey, [definition]);
    else list.push(definition);
  }
  return [...byShort]
    .sort(([a], [b]) => compareCodeUnits(a, b))
    .map(([short, byLong]) => ({
      short,
      expansions: [...byLong]
        .sort(([a, m], [b, n]) => n.length - m.length || compareCodeUnits(a, b))
        .map(([longKey, list]) => ({ words: longKey.split(' '), definitions: list })),
    }));
}

/** The uses of the long form inside explanations. */
export function explainedUses(expansion: Expansion): Use[] {
  return expansion.definitions.map(({ longRow, longLength }) => ({ row: longRow, length: longLength }));
}
