// English: our words, tagged by wink-nlp, which is shown one word for each of ours, many blocks a call.
import winkNLP, { type ItsFunction, type PartOfSpeech } from 'wink-nlp';
import type { BlockContent } from '../prose/prose.js';
import { mendTags } from './mends.js';
import { Scanner } from './scan.js';
import { markSentenceStarts } from './sentences.js';
import { SHOWN_IDENTIFIER, SHOWN_NUMBER, SHOWN_OPAQUE, ShownForms, shownSign, type WordForm } from './shownForms.js';
import { isTitle } from './titles.js';
import { TokenColumns, TokenKind } from './tokenColumns.js';
import { type BlockTokens, type LanguageProfile, TAG, TokenFlag, tokenSlice } from './tokens.js';
import { openModel, type WinkLexicon } from './winkLexicon.js';

/** A call to the tagger costs as much as some ten words; blocks are joined up to about so many tokens. */
const TOKENS_A_CALL = 400;
/** Of signs and opaque units in a row the tagger sees no more than this many. */
const SIGNS_SHOWN = 2;
/**
 * Stands between two blocks. The tagger's patterns are over parts of speech, and none of them holds the one of a line break:
 * no pattern reaches over it.
 */
const SEPARATOR = '\n';
/** In the list of shown tokens: stands for no row. */
const NO_ROW = -1;

type Tagger = ReturnType<typeof winkNLP>;

interface Pending {
  readonly tokens: BlockTokens;
  readonly lemma: string[];
  readonly forms: (WordForm | undefined)[];
  /** The shown tokens of the block, space between. */
  readonly shown: string;
  /** The row of each shown token. */
  readonly rows: number[];
}

/**
 * The profile of English. Making one loads the tagger's model (some .4 s and 60 MB). The tokens of a block depend on its text alone.
 * Parts of speech by wink-nlp (MIT) with wink-eng-lite-web-model, mended for instructions.
 */
export function createEnglishProfile(): LanguageProfile {
  const opened = openModel();
  const tagger = winkNLP(opened.model, ['pos']);
  return new EnglishProfile(tagger, opened.lexicon());
}

class EnglishProfile implements LanguageProfile {
  readonly language = 'en';
  private readonly scanner = new Scanner();
  private readonly columns = new TokenColumns();
  private readonly shownForms: ShownForms;
  private readonly partOfSpeech: ItsFunction<PartOfSpeech>;

  constructor(
    private readonly tagger: Tagger,
    private readonly lexicon: WinkLexicon,
  ) {
    this.shownForms = new ShownForms(lexicon);
    this.partOfSpeech = (tagger.its as unknown as { readonly pos: ItsFunction<PartOfSpeech> }).pos;
  }

  tokens(contents: readonly BlockContent[]): BlockTokens[] {
    const seen = new Map<string, BlockTokens>();
    const pending: Pending[] = [];
    let waiting = 0;
    const result = contents.map(({ text }) => {
      const known = seen.get(text);
      if (known !== undefined) return known;
      const block = this.scan(text);
      seen.set(text, block.tokens);
      pending.push(block);
      waiting += block.rows.length;
      if (waiting >= TOKENS_A_CALL) {
        this.tag(pending);
        pending.length = waiting = 0;
      }
      return block.tokens;
    });
    this.tag(pending);
    return result;
  }

  /** Cuts a block into tokens and decides what the tagger is shown of it. */
  private scan(text: string): Pending {
    const { columns, shownForms } = this;
    this.scanner.scan(text, columns);
    markSentenceStarts(text, columns);
    const { length, start, end, kind, flags, inLongRun } = columns;
    const forms: (WordForm | undefined)[] = [];
    const words: string[] = [];
    const lemma: string[] = [];
    const shown: string[] = [];
    const rows: number[] = [];
    const title = isTitle(text, columns);
    let signs = 0;
    let opening = false;
    for (let row = 0; row < length; row++) {
      if ((flags[row]! & TokenFlag.sentenceStart) !== 0) opening = true;
      const slice = text.slice(start[row], end[row]);
      const form = kind[row] === TokenKind.word && inLongRun[row] === 0 ? shownForms.of(slice) : undefined;
      forms.push(form);
      words.push(
        (flags[row]! & TokenFlag.invisible) !== 0
          ? tokenSlice(text, start[row]!, end[row]!, flags[row]!)
          : (form?.written ?? slice),
      );
      lemma.push(form === undefined ? slice.toLowerCase() : '');
      columns.tag[row] = FIXED_TAGS[kind[row]!]!;
      signs = kind[row]! >= TokenKind.punctuation ? signs + 1 : 0;
      if (signs > SIGNS_SHOWN || inLongRun[row] !== 0) continue;
      rows.push(row);
      if (form === undefined) {
        shown.push(shownOther(kind[row]!, text.charCodeAt(start[row]!)));
        if (kind[row] === TokenKind.opaque || kind[row] === TokenKind.identifier) opening = false;
        continue;
      }
      shown.push(opening || title ? form.shownUncapitalised : form.shown);
      if (form.count === 2) rows.push(NO_ROW);
      opening = false;
    }
    const tokens = columns.toBlockTokens(words, lemma);
    return { tokens, lemma, forms, shown: shown.join(' '), rows };
  }

  /** Tags blocks together, in one call of the tagger. */
  private tag(blocks: readonly Pending[]): void {
    if (blocks.length === 0) return;
    const text = blocks.map((block) => block.shown).join(` ${SEPARATOR} `);
    const tags = this.tagger.readDoc(text).tokens().out(this.partOfSpeech);
    const expected = blocks.reduce((sum, block) => sum + block.rows.length, blocks.length - 1);
    if (tags.length !== expected) {
      if (blocks.length > 1) for (const block of blocks) this.tag([block]);
      else this.settle(blocks[0]!, [], 0);
      return;
    }
    let at = 0;
    for (const block of blocks) {
      this.settle(block, tags, at);
      at += block.rows.length + 1;
    }
  }

  /** Writes a block's tags and lemmas, of which the tagger's begin at `from`. */
  private settle(block: Pending, tags: readonly string[], from: number): void {
    const { rows, forms, lemma } = block;
    const { tag, flags } = block.tokens;
    for (let k = 0; k < rows.length; k++) {
      const row = rows[k]!;
      if (row !== NO_ROW && forms[row] !== undefined) tag[row] = CODES[tags[from + k] ?? 'X'] ?? TAG.X;
    }
    mendTags({ tag, flags, forms }, this.lexicon);
    for (let row = 0; row < tag.length; row++) {
      const form = forms[row];
      if (form !== undefined) lemma[row] = this.shownForms.lemma(form, tag[row]!);
    }
  }
}

const CODES = TAG as Readonly<Record<string, number>>;
/** The tags of kinds whose tag the scanner knows better than any tagger. */
const FIXED_TAGS: readonly number[] = [TAG.X, TAG.PROPN, TAG.NUM, TAG.PUNCT, TAG.SYM, TAG.OPAQUE];

function shownOther(kind: number, unit: number): string {
  switch (kind) {
    case TokenKind.number:
      return SHOWN_NUMBER;
    case TokenKind.identifier:
      return SHOWN_IDENTIFIER;
    case TokenKind.opaque:
      return SHOWN_OPAQUE;
    default:
      return shownSign(unit, kind === TokenKind.symbol);
  }
}
