// Hides from a CommonMark parser what only site generators know, and tells which places it therefore cannot judge.

const FRONT_MATTER = /^\uFEFF?(?:---|\+\+\+)[ \t]*\r?\n[^]*?\n(?:---|\+\+\+|\.\.\.)[ \t]*(?:\r?\n|$)/;
const TEMPLATES =
  /\{\{[^]{0,600}?\}\}|\{%[^]{0,600}?%\}|\$\{[^]{0,600}?\}|\{(?::|\s*[.#][\w-])[^{}\n]*\}|:[a-z][a-z0-9_+-]*:(?![\w:])/g;
const DIRECTIVE = /^(`{3,}|~{3,})\{[a-z]/;
const CONTAINER = /^([ \t]*)(?:!!!|\?\?\?\+?|===[!+]?)[ \t]+["\w]/;

/**
 * The source with front matter, template markers, attribute lists and emoji codes blanked out, length kept; `opened` is true at
 * places inside containers by indentation (`!!! note`) and fenced directives (`{note}`), which CommonMark takes for code or runs into
 * one paragraph.
 */
export function maskGenerators(source: string): { text: string; opened: (offset: number) => boolean } {
  const blank = (what: string): string => what.replace(/[^\n\r]/g, ' ');
  const text = source
    .replace(FRONT_MATTER, blank)
    .replace(/^\uFEFF/, ' ')
    .replace(TEMPLATES, (what) => '\u2060'.repeat(what.length));
  const open = new Uint8Array(source.length + 1);
  let indent = -1;
  let fence = '';
  let at = 0;
  for (const line of source.split('\n')) {
    const own = /^[ \t]*/.exec(line)![0].length;
    const opening = CONTAINER.exec(line);
    const isFence = fence !== '' && line.trim().startsWith(fence);
    fence ||= DIRECTIVE.exec(line)?.[1] ?? '';
    if (fence !== '') open.fill(1, at, at + line.length);
    if (isFence) fence = '';
    if (line.trim() !== '' && own <= indent) indent = -1;
    if (opening && indent < 0) indent = own;
    if (indent >= 0 || /^\s*:::/.test(line)) open.fill(1, at, at + line.length);
    at += line.length + 1;
  }
  return { text, opened: (offset) => open[offset] === 1 };
}
