// Terms and lists on the command line: reading them, and saying what is near where a term is not known.
import type { UnknownTerm } from '../engine/knownTerms.js';
import type { CliHost } from './host.js';
import { Exit } from './host.js';
import { UsageError } from './options.js';

/** Says that no document uses a term and which names are near; gives the exit code. */
export function refuseUnknown(host: CliHost, command: string, { term, nearest }: UnknownTerm): number {
  const names = nearest.map((name) => `“${name}”`).join(' or ');
  const hint = names === '' ? '' : ` Did you mean ${names}?`;
  host.note(`evenword ${command}: no page uses “${term}” in open text.${hint}\n`, 'error');
  return Exit.cannotRun;
}

/** A list by commas of which each member is known; undefined where none was given. @throws UsageError */
export function readList<T extends string>(
  value: string | true | undefined,
  known: readonly T[],
  what: string,
): readonly T[] | undefined {
  if (typeof value !== 'string') return undefined;
  const names = value.split(',').map((name) => name.trim());
  const unknown = names.find((name) => !known.some((each) => each === name));
  if (unknown !== undefined) throw new UsageError(`There is no ${what} “${unknown}”. There are: ${known.join(', ')}.`);
  return known.filter((each) => names.includes(each));
}

/** The value of `--most`. @throws UsageError where it is no whole number from 1. */
export function readMost(value: string | true | undefined): number | undefined {
  if (typeof value !== 'string') return undefined;
  if (!/^[1-9]\d{0,8}$/.test(value)) throw new UsageError(`--most takes a whole number from 1, not “${value}”.`);
  return Number(value);
}
