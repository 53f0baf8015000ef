// Contrast of the report's colours, by the formula of WCAG 2.2 (success criteria 1.4.3 and 1.4.11, level AA).
import { describe, expect, it } from 'vitest';
import { DARK, LIGHT } from '../../../server/src/report/palette.js';
import type { Palette } from '../../../server/src/report/palette.js';

/** Relative luminance of `#rrggbb`, as WCAG defines it. */
function luminance(colour: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const channel = parseInt(colour.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r! + 0.7152 * g! + 0.0722 * b!;
}

function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (light! + 0.05) / (dark! + 0.05);
}

const TEXT: readonly (keyof Palette)[] = ['ink', 'faint', 'link'];
const SHAPES: readonly (keyof Palette)[] = ['first', 'second', 'third', 'further'];

describe.each([
  ['light', LIGHT],
  ['dark', DARK],
])('%s colours', (_, palette) => {
  it('knows the extremes: black on white is 21 to 1 (WCAG 2.2)', () =>
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 9));

  it.each(TEXT)('%s is at least 4.5 to 1 on page and panel', (role) => {
    for (const ground of [palette.page, palette.panel])
      expect(contrast(palette[role], ground)).toBeGreaterThanOrEqual(4.5);
  });

  it('highlighted names are at least 4.5 to 1 on their grounds', () => {
    for (const ground of [palette.firstGround, palette.secondGround, palette.thirdGround])
      expect(contrast(palette.ink, ground)).toBeGreaterThanOrEqual(4.5);
  });

  it.each(SHAPES)('bars in %s are at least 3 to 1 on page and panel', (role) => {
    for (const ground of [palette.page, palette.panel])
      expect(contrast(palette[role], ground)).toBeGreaterThanOrEqual(3);
  });
});
