// The identity of a term: what counts as the same name, whatever its capitals and spacing.

/** A term as it is written: NFC, white space collapsed to single spaces and trimmed; capitals kept. */
export function termText(text: string): string {
  return text.normalize('NFC').replace(/\s+/gu, ' ').trim();
}

/**
 * The key under which a term is looked up: {@link termText} in lower case (Unicode default mapping, no locale).
 * `API  Key` and `api key` share a key; `data center`, `data-center` and `datacenter` do not: spacing and hyphens
 * distinguish variants. A key knows no grammar: whoever looks up inflected text tries each of its forms
 * (`access keys`, `access key`), as the forms of a question's term give them.
 */
export function termKey(text: string): string {
  // Lower-casing can leave a sequence that is not composed (İ gives i and a combining dot), hence the second NFC.
  return termText(text).toLowerCase().normalize('NFC');
}
