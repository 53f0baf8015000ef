// The languages of documents as they are read: what was told of a block holds until it is edited.
import { ToldBlocks, languagesOf } from '../facts/languages.js';
import type { ProseLanguages } from '../facts/languages.js';
import type { Reading } from '../prose/read.js';

const told = new ToldBlocks();

/** The languages of a document that was read; see {@link languagesOf}. */
export function languagesIn({ source, prose }: Reading): ProseLanguages {
  return languagesOf(prose, source.pathLanguage, told);
}
