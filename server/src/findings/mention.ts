// Whether a term is spoken about rather than used: quoted, or given as another or former name.

const CUE =
  /(?:\b(?:formerly|previously|originally|historically|a\.k\.a\.|aka)|\b(?:known|called|named|termed|dubbed|referred to|renamed|labelled|labeled)(?: as| from)?|\b(?:deprecated|old|former|obsolete) (?:terms?|words?|names?)|\b(?:the|of the) (?:terms?|words?|names?)|\bsynonyms? (?:for|of))[\s:,]*(?:as\s+|from\s+)?(?:an?\s+|the\s+)?["“'‘(]?$/i;
const QUOTES: Readonly<Record<string, string>> = { '"': '"', '“': '”', '‘': '’', "'": "'", '„': '“', '«': '»' };

/** True where the words at `[start, end)` are a mention: in quotation marks of their own, or after *formerly*, *also called* and the like. */
export function isMention(text: string, start: number, end: number): boolean {
  const open = text.charAt(start - 1);
  const close = QUOTES[open];
  if (close !== undefined && text.charAt(end) === close) return true;
  return CUE.test(text.slice(Math.max(0, start - 48), start));
}
