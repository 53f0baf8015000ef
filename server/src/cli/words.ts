// Words that the command line writes for people: counts with their noun, and sentences with their place.
import type { Example } from '../engine/examples.js';
import type { CliHost } from './host.js';

/** "1 page", "1,200 pages"; the number alone, with a space behind it, where no noun is given. */
export function count(number: number, noun: string): string {
  const digits = number.toString().replace(/\B(?=(\d{3})+$)/g, ',');
  return noun === '' ? `${digits} ` : `${digits} ${noun}${number === 1 ? '' : 's'}`;
}

/** A sentence under its file and line, the term made to stand out. */
export function exampleLines({ uri, line, text, highlight }: Example, host: CliHost, indent: string): string {
  const marked =
    text.slice(0, highlight.start) +
    host.emphasise(text.slice(highlight.start, highlight.end)) +
    text.slice(highlight.end);
  return `${indent}${host.faint(`${host.pathOf(uri)}:${line}`)}\n${indent}  ${marked}\n`;
}
