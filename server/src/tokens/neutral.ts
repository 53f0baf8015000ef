// Any language: our words, cut by Unicode's rules where a script has no spaces, without parts of speech.
import type { BlockContent } from '../prose/prose.js';
import { CharClass, pointClassAt } from './charClass.js';
import { Scanner } from './scan.js';
import { markSentenceStarts } from './sentences.js';
import { TokenColumns, TokenKind } from './tokenColumns.js';
import { type BlockTokens, type LanguageProfile, TAG, TokenFlag, tokenSlice } from './tokens.js';

/** Longest stretch handed to the segmenter at once, in UTF-16 units: longer ones are cut, so that time stays in proportion. */
const STRETCH = 4096;
/** What a segment must have to be a word: some are made of marks and invisible characters alone. */
const HAS_WORD = /[\p{L}\p{N}]/u;
const TAGS_BY_KIND = [TAG.X, TAG.X, TAG.NUM, TAG.PUNCT, TAG.SYM, TAG.OPAQUE];

/**
 * A profile without a tagger for a BCP 47 language; a tag that is none gives `und`. Words get the tag X, lemmas are the words in lower case.
 * Scripts without spaces are cut by the text segmentation of Unicode (UAX #29 and its dictionaries) as the platform has it.
 */
export function createNeutralProfile(language: string): LanguageProfile {
  const subtag = primarySubtag(language);
  return new NeutralProfile(subtag, new Intl.Segmenter(subtag, { granularity: 'word' }));
}

class NeutralProfile implements LanguageProfile {
  private readonly scanner = new Scanner();
  private readonly scanned = new TokenColumns();
  private readonly columns = new TokenColumns();

  constructor(
    readonly language: string,
    private readonly segmenter: Intl.Segmenter,
  ) {}

  tokens(contents: readonly BlockContent[]): BlockTokens[] {
    return contents.map(({ text }) => this.tokensOf(text));
  }

  private tokensOf(text: string): BlockTokens {
    const { scanned, columns } = this;
    this.scanner.scan(text, scanned);
    columns.clear();
    for (let row = 0; row < scanned.length; row++) {
      const start = scanned.start[row]!;
      const end = scanned.end[row]!;
      const flags = scanned.flags[row]!;
      if (scanned.kind[row] === TokenKind.word && pointClassAt(text, start) === CharClass.unspaced) {
        this.segment(text, start, end, flags);
      } else columns.add(start, end, scanned.kind[row]!, flags);
    }
    markSentenceStarts(text, columns);
    const words: string[] = [];
    for (let row = 0; row < columns.length; row++) {
      columns.tag[row] = TAGS_BY_KIND[columns.kind[row]!]!;
      words.push(tokenSlice(text, columns.start[row]!, columns.end[row]!, columns.flags[row]!));
    }
    return columns.toBlockTokens(
      words,
      words.map((word) => word.toLowerCase()),
    );
  }

  private segment(text: string, from: number, to: number, flags: number): void {
    let own = flags;
    for (let at = from; at < to;) {
      const end = stretchEnd(text, at, to);
      for (const { index, segment } of this.segmenter.segment(text.slice(at, end))) {
        if (!HAS_WORD.test(segment)) continue;
        this.columns.add(at + index, at + index + segment.length, TokenKind.word, own);
        own = flags & ~TokenFlag.spaceBefore;
      }
      at = end;
    }
  }
}

/** The end of the next stretch, never within a pair of surrogates. */
function stretchEnd(text: string, from: number, to: number): number {
  const end = from + STRETCH;
  if (end >= to) return to;
  const unit = text.charCodeAt(end);
  return unit >= 0xdc00 && unit <= 0xdfff ? end + 1 : end;
}

function primarySubtag(language: string): string {
  const subtag = /^[a-z]{2,3}(?=$|[-_])/i.exec(language)?.[0].toLowerCase();
  return subtag ?? 'und';
}
