// Character references of HTML: `&amp;`, `&#8217;`, `&#x2014;`.
import { characterEntities } from 'character-entities';

/**
 * The text that a reference stands for, or undefined where it names none or stands for a control character.
 * Names and the rule for zero are those of the HTML standard's and CommonMark 0.31.2's section on entities.
 */
export function decodeReference(reference: string): string | undefined {
  const body = reference.slice(1, -1);
  if (!body.startsWith('#')) return Object.hasOwn(characterEntities, body) ? characterEntities[body] : undefined;
  const hex = body[1] === 'x' || body[1] === 'X';
  const code = hex ? Number.parseInt(body.slice(2), 16) : Number.parseInt(body.slice(1), 10);
  if (Number.isNaN(code)) return undefined;
  if (code === 0 || code > 0x10ffff || (code >= 0xd800 && code <= 0xdfff)) return '\uFFFD';
  if (code < 0x20 && code !== 9 && code !== 10 && code !== 13) return undefined;
  return String.fromCodePoint(code);
}
