// The keys of termbase.yaml, level by level: the one list that the reader, the writer and the schema's test share.

/** Keys at the top of the file, in their usual order. */
export const TOP_KEYS = ['evenword', 'language', 'concepts', 'apart', 'later'] as const;

/** Keys of a concept, in the order of ISO 10241-1: terms by status, then definition, notes, source. */
export const CONCEPT_KEYS = [
  'id',
  'preferred',
  'admitted',
  'deprecated',
  'language',
  'partOfSpeech',
  'with',
  'subject',
  'definition',
  'note',
  'source',
] as const;

/** Keys of a term that is written as a mapping. */
export const TERM_KEYS = ['term', 'partOfSpeech', 'termType', 'caseSensitive', 'note', 'source'] as const;

/** Keys of an `apart` entry that is written as a mapping. */
export const APART_KEYS = ['terms', 'note'] as const;

/** Keys of a `later` entry that is written as a mapping. */
export const LATER_KEYS = ['terms', 'uses', 'note'] as const;

/** Keys that begin so are the team's own: they are kept and never read. */
export const OWN_KEY_PREFIX = 'x-';

/** An id must be usable as an xs:ID in ISO 30042 files (an NCName of XML 1.0, here without its rarest letters). */
export const ID_PATTERN = /^[\p{L}_][\p{L}\p{N}_.-]*$/u;

/** A language tag in the form of BCP 47 (RFC 5646), its subtags not looked up. */
export const LANGUAGE_PATTERN = /^[A-Za-z]{2,8}(-[A-Za-z0-9]{1,8})*$/;
