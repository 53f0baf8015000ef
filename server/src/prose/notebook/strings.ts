// Strings of JSON (RFC 8259, section 7), decoded with a map to their source.
import { EmbeddedBuilder, type Embedded } from '../embedded.js';
import type { Span } from '../../base/span.js';

const ESCAPES: Partial<Record<string, string>> = { b: '\b', f: '\f', n: '\n', r: '\r', t: '\t' };

/** The strings at these places, quotation marks included, as one text. */
export function decodeStrings(text: string, strings: readonly Span[]): Embedded {
  const out = new EmbeddedBuilder(text);
  for (const { start, end } of strings) {
    let at = start + 1;
    while (at < end - 1) {
      const escape = text.indexOf('\\', at);
      const stop = escape < 0 || escape >= end - 1 ? end - 1 : escape;
      out.run(at, stop);
      if (stop === end - 1) break;
      const letter = text[stop + 1]!;
      const to = stop + (letter === 'u' ? 6 : 2);
      // Of a pair of surrogates each half has an escape of its own.
      const unit =
        letter === 'u' ? String.fromCharCode(Number.parseInt(text.slice(stop + 2, to), 16)) : ESCAPES[letter];
      out.substitute(unit ?? letter, stop, to);
      at = to;
    }
  }
  return out.finish();
}
