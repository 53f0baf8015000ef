// The word scanner, one habit of writers a case. What counts as one word is our own definition (tokens.ts); no outside source.
import { describe, expect, test } from 'vitest';
import { scanned } from './tokenText.js';

describe('the scanner cuts', () => {
  test.each([
    ['plain words and edge punctuation', 'Restart the server, then wait.', 'Restart the server ,:p then wait .:p'],
    ['hyphenated chunks whole', 'a command-line read-only tool', 'a command-line read-only tool'],
    ['a suspended hyphen off', 'pre- and post-install', 'pre -:p and post-install'],
    ['contractions whole', "don't isn’t they'll I'm", "don't isn’t they'll I'm"],
    ['a possessive ending away', "the server's port and the API’s key", 'the server+s port and the API+s key'],
    ['a plural possessive away', "the users' data", 'the users+s data'],
    ["but not a quotation's end", "the 'active users' list", "the ':p active users ':p list"],
    ['nor the contraction of is', "it's what's there's", "it's what's there's"],
    ['names with apostrophes', "O'Reilly at two o'clock", "O'Reilly at two o'clock"],
    ['identifiers whole', 'foo_bar node.js .NET __init__ a::b', 'foo_bar:id node.js:id .NET:id __init__:id a::b:id'],
    ['languages with signs', 'C++, C# and F#.', 'C++ ,:p C# and F# .:p'],
    ['options', 'use --dry-run, -v or --to=x.', 'use --dry-run:id ,:p -v:id or --to=x:id .:p'],
    ['variables and scopes', '$HOME @scope/pkg #define', '$HOME:id @scope/pkg:id #define:id'],
    ['paths', '/etc/hosts ./run ~/x a/b/c.txt src/', '/etc/hosts:id ./run:id ~/x:id a/b/c.txt:id src/:id'],
    ['Windows paths', 'C:\\Temp\\x.txt.', 'C:\\Temp\\x.txt:id .:p'],
    ['alternatives at the slash', 'and/or client/server/proxy', 'and /:p or client /:p server /:p proxy'],
    ['but single letters not', 'I/O and N/A and A/B', 'I/O and N/A and A/B'],
    ['addresses', 'see https://a.example/b?c=d, or x@y.org.', 'see https://a.example/b?c=d:id ,:p or x@y.org:id .:p'],
    ['at dashes', 'one–two three—four five--six', 'one –:p two three —:p four five --:p six'],
    ['numbers', '1,000 3.14 -5 10:30 2020-01-02', '1,000:num 3.14:num -5:num 10:30:num 2020-01-02:num'],
    ['numbers with units', '10ms 5GB 1.5kHz', '10ms:num 5GB:num 1.5kHz:num'],
    ['percent and money', '50% of $5', '50:num %:p of $:sym 5:num'],
    ['words with digits', 'IPv4 UTF-8 x86_64 2nd 3D', 'IPv4* UTF-8 x86_64:id 2nd 3D*'],
    ['camel case, marked', 'GitHub lowerCamel APIs iOS READ', 'GitHub* lowerCamel* APIs iOS* READ'],
    ['calls, marked', 'call foo() now', 'call foo* (:p ):p now'],
    ['dotted abbreviations with their stops', 'e.g. this, i.e. that', 'e.g. this ,:p i.e. that'],
    ['versions', 'v1.2.3 and 1.2.3.', 'v1.2.3:id and 1.2.3:num .:p'],
    ['ampersands in names', 'R&D at AT&T, this & that', 'R&D at AT&T ,:p this &:p that'],
    ['trade marks apart, and marks the name', 'Platform™ and Thing®', 'Platform+tm ™:sym and Thing+tm ®:sym'],
    ['opaque units', 'run \uFFFC, then\uFFFCit', 'run \uFFFC:opaque ,:p then \uFFFC:opaque it'],
    ['soft hyphens within words', 'co\u00ADoperate', 'co\u00ADoperate'],
    ['edges free of zero-width characters', '\u200Bword\u200B \uFEFFnext', 'word next'],
    ['combining marks with their letters', 'cafe\u0301 nai\u0308ve', 'cafe\u0301 nai\u0308ve'],
    ['emoji whole', 'ok 👩‍👩‍👧 👍🏽 ☕️', 'ok 👩‍👩‍👧:sym 👍🏽:sym ☕️:sym'],
    ['runs of one sign', 'wait... ---- !!', 'wait ...:p ----:p !!:p'],
    ['letters beyond the first plane', '𝒳𝒴 𐐀', '𝒳𝒴 𐐀'],
    ['scripts without spaces, by the run', '你好,世界', '你好 ,:p 世界'],
    ['keys pressed together', 'Ctrl+C', 'Ctrl +:sym C'],
  ])('%s', (_, text, expected) => {
    expect(scanned(text)).toBe(expected);
  });
});
