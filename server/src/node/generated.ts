// Pages that say of themselves that a program wrote them.

/** Only the start of a page speaks for all of it, in UTF-16 units. */
const START = 1024;

/** Comments of all formats; one that goes on behind the start of the page ends there. */
const COMMENTS = [
  /<!--[^]*?(?:-->|(?![^]))/g,
  /\{\/\*[^]*?(?:\*\/\}|(?![^]))/g,
  // In reStructuredText, with the lines indented below; not a target, footnote, substitution or directive.
  /^\.\.(?![^\S\n]+(?:_|\[|\||[\w:+.-]+::))(?:[^\S\n].*)?(?:\n[^\S\n]+\S.*)*/gm,
  /^(?:\/\/|%).*(?:\n(?:\/\/|%).*)*/gm,
  // In front matter, where it begins with them.
  /(?<![^])---\r?\n#.*(?:\n#.*)*/g,
];

/** How pages say so (common practice, no source). */
const CLAIM = new RegExp(
  [
    /@generated\b/,
    /(?:this|the) (?:file|page|document) (?:is|was|has been) (?:auto(?:matically)?[- ]?)?generated\b/,
    /generated\b[^]{0,120}?\bdo not (?:edit|modify)\b/,
    /\bdo not (?:edit|modify)\b[^]{0,120}?\bgenerated\b/,
  ]
    .map(({ source }) => source)
    .join('|'),
  'i',
);

/** True where a comment in a page's first lines says that it is generated. */
export function saysGenerated(text: string): boolean {
  const start = text.slice(0, START);
  if (!/generated/i.test(start)) return false;
  return COMMENTS.some((comment) =>
    (start.match(comment) ?? []).some((found) => CLAIM.test(found.replace(/\s+/g, ' '))),
  );
}
