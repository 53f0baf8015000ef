// Character references of HTML: `&amp;`, `&#8217;`, `&#x2014;`.
import { characterEntities } from 'character-entities';
import { OPAQUE } from './prose.js';

/** The form that CommonMark 0.31.2 allows ("Entity and numeric character references"). */
const NUMERIC = /^#(?:\d{1,7}|[xX][\da-fA-F]{1,6})$/;

/**
 * The text that a reference stands for, {@link OPAQUE} where that is a control character, or undefined where it is no
 * reference and hence text. Names are those of the HTML standard.
 */
export function decodeReference(reference: string): string | undefined {
  const body = reference.slice(1, -1);
  if (!body.startsWith('#')) return Object.hasOwn(characterEntities, body) ? characterEntities[body] : undefined;
  if (!NUMERIC.test(body)) return undefined;
  const hex = body[1] === 'x' || body[1] === 'X';
  const code = hex ? Number.parseInt(body.slice(2), 16) : Number.parseInt(body.slice(1), 10);
  if (code === 0 || code > 0x10ffff || (code >= 0xd800 && code <= 0xdfff)) return '\uFFFD';
  if (code < 0x20) return code === 9 || code === 10 || code === 13 ? ' ' : OPAQUE;
  return String.fromCodePoint(code);
}
