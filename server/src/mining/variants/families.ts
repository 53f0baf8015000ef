// Families: mixes of the same kind on one stem (customise, customisation; reuse, reused) joined into one question.
import { compareCodeUnits } from '../../base/order.js';
import type { Mix } from './judge.js';
import type { Style } from './styles.js';

/** One way of writing in a family, with the inflections and derivations that are written so. */
export interface Side {
  /** What sets the sides apart: a shape, or the letters that differ. */
  readonly name: string;
  readonly styles: readonly Style[];
}

/** A mix of ways of writing, over all members of a family. */
export interface Family {
  readonly mix: Mix;
  readonly sides: readonly Side[];
}

/** A mix found in one candidate. */
export interface Member {
  readonly mix: Mix;
  readonly styles: readonly Style[];
}

/** Joins the members of each family. */
export function joinFamilies(members: readonly Member[]): Family[] {
  const families = new Map<string, { mix: Mix; sides: Map<string, Style[]> }>();
  const inOrder = [...members].sort(
    (a, b) => b.mix.exchangeable - a.mix.exchangeable || compareCodeUnits(a.styles[0]!.text, b.styles[0]!.text),
  );
  for (const member of inOrder) {
    const { key, names } = placeOf(member);
    const family = families.get(key);
    if (family === undefined) {
      families.set(key, { mix: member.mix, sides: new Map(member.styles.map((style, i) => [names[i]!, [style]])) });
      continue;
    }
    family.mix = { ...family.mix, exchangeable: family.mix.exchangeable + member.mix.exchangeable };
    member.styles.forEach((style, i) => {
      const side = family.sides.get(names[i]!);
      if (side === undefined) family.sides.set(names[i]!, [style]);
      else side.push(style);
    });
  }
  return [...families.values()].map(({ mix, sides }) => ({
    mix,
    sides: [...sides].map(([name, styles]) => ({ name, styles })),
  }));
}

/** The family of a member, and the name of the side that each of its styles is on. */
function placeOf({ styles }: Member): { key: string; names: string[] } {
  const shapes = styles.map((style) => style.shape);
  const [a, b] = styles as [Style, Style];
  if (styles.length === 2 && a.shape === b.shape) {
    const [start, inA, inB] = difference(a.text, b.text);
    return { key: `${start}[${[inA, inB].sort(compareCodeUnits).join('/')}]`, names: [inA, inB] };
  }
  if (new Set(shapes).size < shapes.length) return { key: a.text, names: styles.map((style) => style.text) };
  const parts = styles.find((style) => style.shape !== 'closed')!.forms[0]!.parts;
  const head = parts.slice(0, -1).join(' ');
  return { key: `${head} ${stem(parts[parts.length - 1]!)} ${[...shapes].sort().join()}`, names: shapes };
}

/** The common start of two words, and the letters between it and their common end. */
function difference(a: string, b: string): [start: string, inA: string, inB: string] {
  let start = 0;
  while (start < a.length && start < b.length && a[start] === b[start]) start++;
  let end = 0;
  while (end < a.length - start && end < b.length - start && a[a.length - 1 - end] === b[b.length - 1 - end]) end++;
  return [a.slice(0, start), a.slice(start, a.length - end), b.slice(start, b.length - end)];
}

/** What inflections and the commonest derivations of a word share; used as a key only. */
function stem(word: string): string {
  const cut = word.replace(/(?:ations?|ations?|ions?|ings?|able|ers?|ed|es|e|s)$/, '');
  return cut.length < 3 ? word : cut.replace(/([b-df-hj-np-tv-z])\1$/, '$1');
}
