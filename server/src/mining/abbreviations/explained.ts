// Short forms with their explanations gathered: one short form, one or several expansions.
import { byCountThenText, compareCodeUnits } from '../../base/order.js';
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

/** Gathers explanations by short form, whatever its capitals (IdP, IDP), in order of its code units. */
export function groupDefinitions(definitions: readonly Definition[]): Explained[] {
  const byShort = new Map<string, Map<string, Definition[]>>();
  for (const definition of definitions) {
    const key = definition.short.toLowerCase();
    const byLong = byShort.get(key) ?? new Map<string, Definition[]>();
    byShort.set(key, byLong);
    const list = byLong.get(definition.longKey);
    if (list === undefined) byLong.set(definition.longKey, [definition]);
    else list.push(definition);
  }
  return [...byShort]
    .sort(([a], [b]) => compareCodeUnits(a, b))
    .map(([, byLong]) => ({
      short: commonest([...byLong.values()].flat().map(({ short }) => short)),
      expansions: [...byLong]
        .sort(([a, m], [b, n]) => n.length - m.length || compareCodeUnits(a, b))
        .map(([longKey, list]) => ({ words: longKey.split(' '), definitions: list })),
    }));
}

/** The text that is there most often, ties by code units. */
function commonest(texts: readonly string[]): string {
  const counts = new Map<string, number>();
  for (const text of texts) counts.set(text, (counts.get(text) ?? 0) + 1);
  return [...counts].map(([text, count]) => ({ text, count })).sort(byCountThenText)[0]!.text;
}
