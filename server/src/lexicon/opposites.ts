// Which two terms must never be asked about as one: opposites, members of a closed set, negations, numbered things.
import { closedSetsText } from './data/closedSets.js';
import { oppositesText } from './data/opposites.js';
import { differenceByAffix, sharedEndings } from './affixes.js';
import { equivalentByKeys } from './equivalents.js';
import { areOpposites } from './synonyms.js';
import { singularOf } from './plurals.js';
import { spellingKey } from './spelling.js';
import { plainWords, splitWords, termKey } from './termKey.js';

/** Why two terms stay apart. */
export interface Apart {
  readonly kind: 'opposite' | 'closed-set' | 'affix' | 'digits';
  /** The parts that differ and what they are, for people: `minimum, maximum: opposites`. */
  readonly detail: string;
}

interface Lists {
  readonly opposites: ReadonlyMap<string, ReadonlySet<string>>;
  /** Term key → names of the closed sets that have it, each made unique by its place in the list. */
  readonly sets: ReadonlyMap<string, readonly string[]>;
}

let lists: Lists | undefined;

/**
 * Why two terms must not be asked about as one, or undefined. Looks at the whole terms and, where they share words at
 * their ends, at what differs ("CPU limit", "memory limit"). Forms of one term are never apart.
 */
export function mustStayApart(a: string, b: string): Apart | undefined {
  const left = plainWords(a);
  const right = plainWords(b);
  const leftKey = keyOf(left);
  const rightKey = keyOf(right);
  if (leftKey === rightKey) return undefined;
  if (withoutDigits(leftKey) === withoutDigits(rightKey)) return apart('digits', a, b, 'they differ in digits only');
  const whole = listed(a, b, leftKey, rightKey);
  if (whole !== undefined) return whole;
  // What our own list says of two whole terms outweighs what their parts suggest (fill in, fill out a form).
  if (equivalentByKeys(leftKey, rightKey) !== undefined) return undefined;
  const [leftRest, rightRest] = differingParts(left, right);
  if (leftRest.length + rightRest.length < left.length + right.length) {
    const part = listed(leftRest.join(' '), rightRest.join(' '), keyOf(leftRest), keyOf(rightRest));
    if (part !== undefined) return part;
  }
  if (leftRest.length > 1 || rightRest.length > 1) return undefined;
  return byWord(leftRest[0] ?? '', rightRest[0] ?? '') ?? byLastWords(splitWords(a), splitWords(b));
}

/** The last words as they are written: what looks like a plural may be a word of its own (apropos, goods). */
function byLastWords(a: readonly string[], b: readonly string[]): Apart | undefined {
  const [left = '', right = ''] = [a.at(-1), b.at(-1)];
  if (a.length !== b.length || (left === singularOf(left) && right === singularOf(right))) return undefined;
  if (!a.slice(0, -1).every((word, i) => sameWord(word, b[i])) || sameWord(left, right)) return undefined;
  return byWord(left, right);
}

/** Names of the closed sets that two terms share. */
export function sharedClosedSets(a: string, b: string): readonly string[] {
  const { sets } = read();
  const others = new Set(sets.get(termKey(b)) ?? []);
  return (sets.get(termKey(a)) ?? []).filter((name) => others.has(name)).map((name) => name.replace(/\d+$/, '').trim());
}

function listed(a: string, b: string, leftKey: string, rightKey: string): Apart | undefined {
  if (leftKey === '' || rightKey === '') return undefined;
  const { opposites, sets } = read();
  if (opposites.get(leftKey)?.has(rightKey)) return apart('opposite', a, b, 'opposites');
  const others = sets.get(rightKey);
  const shared = others && sets.get(leftKey)?.find((name) => others.includes(name));
  if (shared !== undefined) return apart('closed-set', a, b, shared.replace(/ \d+$/, ''));
  return undefined;
}

/** Two single words, or one and nothing. */
function byWord(a: string, b: string): Apart | undefined {
  if (a.length === 1 && b.length === 1) return apart('closed-set', a, b, 'letters');
  const affix = differenceByAffix(a, b);
  if (affix !== undefined) return apart('affix', a, b, affix);
  if (a === '' || b === '') return undefined;
  for (const [x, y] of [[a, b] as const, ...sharedEndings(a, b)]) {
    if (read().opposites.get(x)?.has(y) || areOpposites(x, y)) return apart('opposite', a, b, 'opposites');
  }
  return undefined;
}

/** The key of words already split, as {@link termKey} gives it. */
function keyOf(words: readonly string[]): string {
  return words.map(spellingKey).join('');
}

/** What is left of two word lists when the words they share at their beginnings and ends are gone. */
function differingParts(a: readonly string[], b: readonly string[]): [string[], string[]] {
  let start = 0;
  while (start < a.length && start < b.length && sameWord(a[start], b[start])) start++;
  let end = 0;
  while (end < a.length - start && end < b.length - start && sameWord(a[a.length - 1 - end], b[b.length - 1 - end]))
    end++;
  return [a.slice(start, a.length - end), b.slice(start, b.length - end)];
}

function sameWord(a = '', b = ''): boolean {
  return a === b || spellingKey(a) === spellingKey(b);
}

function withoutDigits(key: string): string {
  return key.replace(/[\d.,]*\d/g, '');
}

function apart(kind: Apart['kind'], a: string, b: string, what: string): Apart {
  return { kind, detail: `${[a, b].filter((part) => part !== '').join(', ')}: ${what}` };
}

function read(): Lists {
  if (lists !== undefined) return lists;
  const opposites = new Map<string, Set<string>>();
  const join = (x: string, y: string) => opposites.set(x, (opposites.get(x) ?? new Set()).add(y));
  for (const line of oppositesText.split('\n')) {
    const [left = '', right = ''] = line.split(' / ');
    for (const other of right.split(', ')) {
      join(termKey(left), termKey(other));
      join(termKey(other), termKey(left));
    }
  }
  const sets = new Map<string, string[]>();
  closedSetsText.split('\n').forEach((line, i) => {
    const colon = line.indexOf(': ');
    for (const member of line.slice(colon + 2).split(', ')) {
      const key = termKey(member);
      sets.set(key, [...(sets.get(key) ?? []), `${line.slice(0, colon)} ${i}`]);
    }
  });
  lists = { opposites, sets };
  return lists;
}
