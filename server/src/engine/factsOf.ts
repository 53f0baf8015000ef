// From a document's text to its facts, in one step: what a worker does for each file.
import { gatherFacts } from '../facts/documentFacts.js';
import type { DocumentFacts } from '../facts/documentFacts.js';
import { languagesOf } from '../facts/languages.js';
import { read } from '../prose/read.js';
import type { Prose } from '../prose/prose.js';
import type { SourceText } from '../text/sourceText.js';
import { primaryLanguage } from '../text/language.js';
import { createEnglishProfile } from '../tokens/english.js';
import { createNeutralProfile } from '../tokens/neutral.js';
import type { LanguageProfile } from '../tokens/tokens.js';

/** Language profiles made when first asked for: the English one takes about half a second to load. */
export class Profiles {
  private readonly made = new Map<string, LanguageProfile>();

  /** The profile for a BCP 47 tag; without a tag a document is English. */
  for(tag: string | undefined): LanguageProfile {
    const language = primaryLanguage(tag) ?? 'en';
    let profile = this.made.get(language);
    if (profile === undefined) {
      profile = language === 'en' ? createEnglishProfile() : createNeutralProfile(language);
      this.made.set(language, profile);
    }
    return profile;
  }
}

/**
 * Reads a document and gathers its facts, apart for each language that it has blocks in; the document's own language first.
 * Never fails: what cannot be read as prose yields no tokens.
 */
export function factsOf(source: SourceText, profiles: Profiles): readonly DocumentFacts[] {
  return factsOfProse(read(source), profiles, source);
}

/** Gathers the facts of a document that was read already. */
export function factsOfProse(prose: Prose, profiles: Profiles, source: SourceText): readonly DocumentFacts[] {
  const { document, blocks } = languagesOf(prose, source.pathLanguage);
  return [...new Set([document, ...blocks])].map((language) =>
    gatherFacts(prose, profiles.for(language), source.text, (block) => blocks[block] === language),
  );
}
