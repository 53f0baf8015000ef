// From a document's text to its facts, in one step: what a worker does for each file.
import { gatherFacts } from '../facts/documentFacts.js';
import type { DocumentFacts } from '../facts/documentFacts.js';
import { read } from '../prose/read.js';
import type { Prose } from '../prose/prose.js';
import type { SourceText } from '../text/sourceText.js';
import { createEnglishProfile } from '../tokens/english.js';
import { createNeutralProfile } from '../tokens/neutral.js';
import type { LanguageProfile } from '../tokens/tokens.js';

/** Language profiles made when first asked for: the English one takes about half a second to load. */
export class Profiles {
  private readonly made = new Map<string, LanguageProfile>();

  /** The profile for a BCP 47 tag; without a tag a document is English. */
  for(tag: string | undefined): LanguageProfile {
    const language = (tag ?? 'en').toLowerCase().split(/[-_]/)[0]!;
    let profile = this.made.get(language);
    if (profile === undefined) {
      profile = language === 'en' ? createEnglishProfile() : createNeutralProfile(language);
      this.made.set(language, profile);
    }
    return profile;
  }
}

/** Reads a document and gathers its facts. Never fails: what cannot be read as prose yields no tokens. */
export function factsOf(source: SourceText, profiles: Profiles): DocumentFacts {
  return factsOfProse(read(source), profiles, source.text);
}

/** Gathers the facts of a document that was read already, from its text. */
export function factsOfProse(prose: Prose, profiles: Profiles, text: string): DocumentFacts {
  return gatherFacts(prose, profiles.for(prose.language), text);
}
