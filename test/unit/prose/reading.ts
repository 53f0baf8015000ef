// One way to state what a text reads as, for the tests of the readers.
import { expect } from 'vitest';
import { OPAQUE, sourceEnd, sourceStart, type Prose } from '../../../server/src/prose/prose.js';
import { read } from '../../../server/src/prose/read.js';
import { Zone, type ZoneSet } from '../../../server/src/prose/zones.js';
import type { Format } from '../../../server/src/text/sourceText.js';

const NAMES = Object.entries(Zone).filter(([, bit]) => bit !== 0);

function zoneNames(zones: ZoneSet): string {
  return NAMES.filter(([, bit]) => (zones & bit) !== 0)
    .map(([name]) => name)
    .join('+');
}

/** Reads a text. */
export function prose(text: string, format: Format = 'markdown'): Prose {
  return read({ uri: 'file:///page', format, text });
}

/**
 * The blocks of a text, one line each: `kind` or `heading2`, the block's zones, then its text with an opaque unit as `@` and
 * marked stretches as `<zones:text>`. Checks on the way that every piece in step maps to itself.
 */
export function outline(text: string, format: Format = 'markdown'): string[] {
  return prose(text, format).blocks.map((block) => {
    const { kind, level, zones, marks } = block.content;
    let shown = '';
    let at = 0;
    for (const mark of marks) {
      expect(mark.start).toBeGreaterThanOrEqual(at);
      shown += `${block.content.text.slice(at, mark.start)}<${zoneNames(mark.zones)}:${block.content.text.slice(mark.start, mark.end)}>`;
      at = mark.end;
    }
    shown += block.content.text.slice(at);
    const head = `${kind}${level > 0 ? String(level) : ''}${zones === 0 ? '' : `[${zoneNames(zones)}]`}`;
    return `${head}: ${shown.replaceAll(OPAQUE, '@')}`;
  });
}

/** The source between the places of the first and the last unit of `words` in the first block that holds them. */
export function sourceOf(text: string, words: string, format: Format = 'markdown'): string {
  for (const block of prose(text, format).blocks) {
    const at = block.content.text.indexOf(words);
    if (at >= 0) return text.slice(sourceStart(block, at), sourceEnd(block, at + words.length));
  }
  throw new Error(`“${words}” is in no block`);
}
