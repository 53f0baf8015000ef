// Builds prose blocks for the tests of findings: plain text, zones in brackets of their own.
import type { BlockContent, BlockKind, ProseBlock, ZoneMark } from '../../../server/src/prose/prose.js';
import { Zone, type ZoneSet } from '../../../server/src/prose/zones.js';

/** Content of a block whose source is its text; `⟪…⟫` in the text marks a stretch of the given zones. */
export function content(marked: string, kind: BlockKind = 'paragraph', markZones: ZoneSet = Zone.code): BlockContent {
  const marks: ZoneMark[] = [];
  let text = '';
  let open = -1;
  for (const character of marked) {
    if (character === '⟪') open = text.length;
    else if (character === '⟫') marks.push({ start: open, end: text.length, zones: markZones });
    else text += character;
  }
  const zones = kind === 'heading' ? Zone.heading : kind === 'tableCell' ? Zone.tableCell : 0;
  return {
    kind,
    level: kind === 'heading' ? 1 : 0,
    text,
    zones,
    marks,
    links: [],
    pieces: Uint32Array.of(0, 0, text.length),
    sourceLength: text.length,
  };
}

/** The same at a place in a source. */
export function block(marked: string, start = 0): ProseBlock {
  return { start, content: content(marked) };
}
