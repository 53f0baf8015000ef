// Pages that say of themselves that a program wrote them.

/** Only the start of a page speaks for all of it. */
const START = 1024;

/** How pages say so, in a comment of their format (common practice, no source). */
const CLAIM = new RegExp(
  /(?:<!--|\{\/\*|^\.\. |^\/\/|^%|^---\r?\n#)/.source +
    /(?:(?!-->|\*\/\})[^]){0,300}?/.source +
    /(?:@generated\b|(?:this|the) (?:file|page|document) (?:is|was|has been) (?:auto(?:matically)?[- ]?)?generated\b|generated\b[^]{0,120}?\bdo not (?:edit|modify)\b|\bdo not (?:edit|modify)\b[^]{0,120}?\bgenerated\b)/
      .source,
  'im',
);

/** True where a page's first lines say that it is generated. */
export function saysGenerated(text: string): boolean {
  const start = text.slice(0, START);
  return /generated/i.test(start) && CLAIM.test(start);
}
