// Writing aid of the token tests: contents from text, and tokens as one readable line.
import type { BlockContent } from '../../../server/src/prose/prose.js';
import { Scanner } from '../../../server/src/tokens/scan.js';
import { TokenColumns, TokenKind } from '../../../server/src/tokens/tokenColumns.js';
import { type BlockTokens, type LanguageProfile, TAGS, TokenFlag } from '../../../server/src/tokens/tokens.js';

/** A paragraph of this text, all of it prose. */
export function paragraph(text: string): BlockContent {
  return {
    kind: 'paragraph',
    level: 0,
    text,
    zones: 0,
    marks: [],
    links: [],
    pieces: new Uint32Array(),
    sourceLength: 0,
  };
}

const KIND_MARKS = ['', ':id', ':num', ':p', ':sym', ':opaque'];

/** The scanner's tokens, each with its kind: `foo_bar:id`, `10ms:num`, `(:p`; words bare, possessives with `+s`, code-like words with `*`. */
export function scanned(text: string): string {
  const columns = new TokenColumns();
  new Scanner().scan(text, columns);
  return Array.from({ length: columns.length }, (_, row) => {
    const flags = columns.flags[row]!;
    const kind = columns.kind[row]!;
    const codeLike = kind === TokenKind.word && (flags & TokenFlag.identifier) !== 0;
    return (
      text.slice(columns.start[row], columns.end[row]) +
      KIND_MARKS[kind]! +
      (codeLike ? '*' : '') +
      ((flags & TokenFlag.possessive) !== 0 ? '+s' : '') +
      ((flags & TokenFlag.trademark) !== 0 ? '+tm' : '')
    );
  }).join(' ');
}

/** Word/TAG of each token. */
export function tagged(profile: LanguageProfile, text: string): string {
  const tokens = profile.tokens([paragraph(text)])[0]!;
  return rows(tokens)
    .map((row) => `${text.slice(tokens.start[row], tokens.end[row])}/${TAGS[tokens.tag[row]!]!}`)
    .join(' ');
}

/** The sentences as the profile cuts them. */
export function sentences(profile: LanguageProfile, text: string): string[] {
  const tokens = profile.tokens([paragraph(text)])[0]!;
  const starts = rows(tokens).filter((row) => (tokens.flags[row]! & TokenFlag.sentenceStart) !== 0);
  return starts.map((row, k) => text.slice(tokens.start[row], tokens.start[starts[k + 1] ?? -1] ?? text.length).trim());
}

/** The lemma of the token that is this word. */
export function lemmaIn(profile: LanguageProfile, text: string, word: string): string | undefined {
  const tokens = profile.tokens([paragraph(text)])[0]!;
  const row = rows(tokens).find((at) => text.slice(tokens.start[at], tokens.end[at]) === word);
  return row === undefined ? undefined : tokens.lemma[row];
}

function rows(tokens: BlockTokens): number[] {
  return Array.from(tokens.start, (_, row) => row);
}
