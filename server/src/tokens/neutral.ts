// Any language: our words, cut by Unicode's rules where a script has no spaces, without parts of speech.
import type { BlockContent } from '../prose/prose.js';
import { CharClass, pointClassAt } from './charClass.js';
import { Scanner } from './scan.js';
import { TokenColumns, TokenKind } from './tokenColumns.js';
import { type BlockTokens, type LanguageProfile, TAG, TokenFlag, tokenSlice } from './tokens.js';

/**
 * Longest stretch handed to the segmenter at once, in UTF-16 units: longer ones are cut, so that time stays in proportion.
 * Stretches end at punctuation: sentences of prose are shorter.
 */
const STRETCH = 256;
/** The same for sentences. */
const SENTENCES = 2048;
/** What a segment must have to be a word: some are made of marks and invisible characters alone. */
const HAS_WORD = /[\p{L}\p{N}]/u;
/** A single letter with a stop at the end of what is taken for a sentence. */
const SHORTENED = /(?:^|[^\p{L}\p{M}\p{N}])\p{L}\.\s*$/u;
const TAGS_BY_KIND = [TAG.X, TAG.X, TAG.NUM, TAG.PUNCT, TAG.SYM, TAG.OPAQUE];

/**
 * A profile without a tagger for a BCP 47 language; a tag that is none gives `und`. Words get the tag X, lemmas are the words in lower case.
 * Scripts without spaces are cut by the text segmentation of Unicode (UAX #29 and its dictionaries) as the platform has it.
 */
export function createNeutralProfile(language: string): LanguageProfile {
  const subtag = primarySubtag(language);
  return new NeutralProfile(
    subtag,
    new Intl.Segmenter(subtag, { granularity: 'word' }),
    new Intl.Segmenter(subtag, { granularity: 'sentence' }),
  );
}

class NeutralProfile implements LanguageProfile {
  private readonly scanner = new Scanner();
  private readonly scanned = new TokenColumns();
  private readonly columns = new TokenColumns();

  constructor(
    readonly language: string,
    private readonly segmenter: Intl.Segmenter,
    private readonly sentences: Intl.Segmenter,
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
    this.markSentenceStarts(text);
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

  /** By the text segmentation of Unicode; but no sentence starts after a letter with a stop, as in z. B. and in initials. */
  private markSentenceStarts(text: string): void {
    const { columns } = this;
    let row = 0;
    for (const start of this.sentenceStarts(text)) {
      while (row < columns.length && columns.start[row]! < start) row++;
      if (row === columns.length) return;
      if (row === 0 || !SHORTENED.test(text.slice(Math.max(0, start - 5), start)))
        columns.flags[row]! |= TokenFlag.sentenceStart;
    }
  }

  /** Offsets of sentences, stretch by stretch: what a stretch cuts off is seen again from its start on. */
  private *sentenceStarts(text: string): Generator<number> {
    yield 0;
    for (let at = 0; at < text.length;) {
      const end = stretchEnd(text, at, text.length, SENTENCES);
      let last = at;
      for (const { index } of this.sentences.segment(text.slice(at, end))) if (index > 0) yield (last = at + index);
      at = last === at || end === text.length ? end : last;
    }
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
function stretchEnd(text: string, from: number, to: number, stretch = STRETCH): number {
  const end = from + stretch;
  if (end >= to) return to;
  const unit = text.charCodeAt(end);
  return unit >= 0xdc00 && unit <= 0xdfff ? end + 1 : end;
}

function primarySubtag(language: string): string {
  const subtag = /^[a-z]{2,3}(?=$|[-_])/i.exec(language)?.[0].toLowerCase();
  return subtag ?? 'und';
}
