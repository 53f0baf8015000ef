// What marks a glossary and its entries in words, whatever the format.
import type { BlockContent } from './prose.js';

const TITLE =
  /^(?:[\dA-Z]{1,3}[.)]\s*)?(?:(?:glossary|list) of (?:key )?terms|(?:key )?terms(?: and definitions)?|glossary|terminology|definitions)$/i;
const SENDS_ON = /^\(?see:?\s+(?!also\b)(.{1,80}?)\.?\)?$/is;
/** What follows *see* is no name where it has an article, or says where to look. */
const NO_NAME =
  /[.;:]|^(?:the|a|an|our|your|this|that|these|how|what|where|it|below|above|here)\b|\b(?:for|section|chapter|page|appendix|below|above|documentation)\b/i;
const LONGEST_NAME = 6;

/** True for a section's title that says that its definition list is a glossary. */
export function isGlossaryTitle(title: string): boolean {
  return title.length < 60 && TITLE.test(title.trim());
}

/** Behind a section's title, the level of the title that says that its section is a glossary, or 0; `before` is that before it. */
export function glossaryLevelBehind(title: string, level: number, before: number): number {
  if (isGlossaryTitle(title)) return level;
  return level <= before ? 0 : before;
}

/** The content; as a reference (`see`) where it is a glossary's definition that only names another entry. */
export function definitionOrSee(content: BlockContent): BlockContent {
  return content.glossary === 'definition' && sendsOn(content.text) ? { ...content, glossary: 'see' } : content;
}

/** True for the whole text of a definition that only names another entry: “See access key.” */
export function sendsOn(text: string): boolean {
  const name = text.length < 100 ? SENDS_ON.exec(text.trim())?.[1] : undefined;
  return name !== undefined && !NO_NAME.test(name) && name.split(/\s+/).length <= LONGEST_NAME;
}
