// Plain text of any shape: words, marks and white space in any order.
import fc from 'fast-check';

const PARTS = [
  ...['word', 'two words', 'naïve', '漢字', '🙂', '\u0301', '"a b c d"', '“e f g h”', '.', ', ', '\u200f', '\u00ad'],
  ...['\n', '\n\n', '\n\n', ' ', '  ', '    ', '\t', '\f', '\r\n', '\r', ' \n', '\n    ', '\n\n    '],
  ...['- ', '* ', '1. ', '(a) ', '•  ', '====\n', 'Title\n----\n', '~~~\n', '***', '`code`', '``more``', '`'],
  ...['x = 1\n', '$ ls\n', 'f(x)\n', 'end;\n', '.. note\n', ':a: b\n', 'https://a.b/c', 'www.d.e', 'f@g.h', '://', '@'],
  ...['\uFEFF', '\uFFFC', '\0', '\ud800'],
];

/** Mixtures of up to forty pieces. */
export const plaintextSoup = fc.array(fc.constantFrom(...PARTS), { maxLength: 40 }).map((parts) => parts.join(''));
