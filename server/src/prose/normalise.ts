// The text that parsers see: as long as the source, so that offsets hold, but with one kind of line break and no odd units.

const ODD = /[\r\0\uFFFC]/;

/**
 * The source with `\r\n` and `\r` as `\n` (a blank stands for the first half of the pair), and U+0000 and U+FFFC as U+FFFD:
 * the first as CommonMark asks, the second because U+FFFC has a meaning of its own in a block's text. Same length.
 */
export function normalise(source: string): string {
  if (!ODD.test(source)) return source;
  return source
    .replaceAll('\r\n', ' \n')
    .replaceAll('\r', '\n')
    .replace(/[\0\uFFFC]/g, '\uFFFD');
}

/** Where a document's text begins: behind a byte order mark, where there is one. */
export function textStart(text: string): number {
  return text.charCodeAt(0) === 0xfeff ? 1 : 0;
}
