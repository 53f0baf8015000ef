// The language of a document and of each of its blocks: by what they state, else as far as the text tells for certain.
import { compareCodeUnits } from '../base/order.js';
import { canBeTold, languageOfText, mayBeIn } from '../lexicon/languageOfText.js';
import { isOpen } from '../prose/zones.js';
import type { BlockContent, Prose } from '../prose/prose.js';
import { primaryLanguage } from '../text/language.js';

/** Languages as BCP 47 primary subtags. */
export interface ProseLanguages {
  readonly document: string;
  /** One for each block, in order. */
  readonly blocks: readonly string[];
}

/** What a document is in where nothing says otherwise. */
const DEFAULT_LANGUAGE = 'en';
/** Blocks, spread evenly over a document, that its language is told by. */
const SAMPLED = 24;
/** Blocks shorter than this, in UTF-16 units, tell nothing. */
const SHORTEST_SAMPLE = 80;
/** Share of the telling text that must be in one language. */
const LEAST_SHARE = 2 / 3;
/** So many UTF-16 units of a document of short blocks are told as one text. */
const MOST_JOINED = 3000;

/**
 * The languages of a document. A block's own statement holds for it, else a language that its text is in for certain, else
 * the document's. That is what the document states, else what its blocks are mostly in, else what its path names, else English.
 * Equal prose and equal paths have equal languages.
 * @param pathLanguage what the document's path names, where it names a language
 * @param kept keeps what blocks are told to be: worth its memory for documents that are being edited alone
 */
export function languagesOf(prose: Prose, pathLanguage?: string, kept?: ToldBlocks): ProseLanguages {
  const tell: Tell = (content, expected) =>
    kept === undefined ? languageOfText(content.text, expected) : kept.of(content, expected);
  const contents = prose.blocks.map(({ content }) => content);
  const sampled = new Map<BlockContent, string | undefined>();
  const sample: Tell = (content, expected) => {
    const language = tell(content, expected);
    sampled.set(content, language);
    return language;
  };
  const document = primaryLanguage(prose.language) ?? documentLanguage(contents, pathLanguage, sample);
  // Samples were taken with the default expected: where the document is in that, they need not be told again.
  const told = (content: BlockContent): string | undefined =>
    document === DEFAULT_LANGUAGE && sampled.has(content) ? sampled.get(content) : tell(content, document);
  const ofBlock = (content: BlockContent): string =>
    primaryLanguage(content.language) ?? (isOpen(content.zones) ? told(content) : undefined) ?? document;
  return { document, blocks: contents.map(ofBlock) };
}

/** The language that a block's text is in for certain, where another is expected. */
type Tell = (content: BlockContent, expected: string) => string | undefined;

function documentLanguage(contents: readonly BlockContent[], pathLanguage: string | undefined, tell: Tell): string {
  const open = contents.filter(({ zones, language }) => isOpen(zones) && language === undefined);
  const told = mostlyTold(open, tell) ?? languageOfText(joinedText(open));
  // A relative that the detector does not know (Indonesian, Galician) is taken for one that it knows, but never for English.
  if (told !== undefined && (told === 'en' || pathLanguage === undefined || canBeTold(pathLanguage))) return told;
  return pathLanguage !== undefined && mayBeIn(pathLanguage, joinedText(open)) ? pathLanguage : DEFAULT_LANGUAGE;
}

/** The language of most of the text in sampled blocks that are told. */
function mostlyTold(contents: readonly BlockContent[], tell: Tell): string | undefined {
  const long = contents.filter(({ text }) => text.length >= SHORTEST_SAMPLE);
  const step = Math.max(1, long.length / SAMPLED);
  const sizes = new Map<string, number>();
  let all = 0;
  for (let at = 0; at < long.length; at += step) {
    const content = long[Math.floor(at)]!;
    const language = tell(content, DEFAULT_LANGUAGE);
    if (language === undefined) continue;
    all += content.text.length;
    sizes.set(language, (sizes.get(language) ?? 0) + content.text.length);
  }
  const [most] = [...sizes].sort((a, b) => b[1] - a[1] || compareCodeUnits(a[0], b[0]));
  return most !== undefined && most[1] >= LEAST_SHARE * all ? most[0] : undefined;
}

function joinedText(contents: readonly BlockContent[]): string {
  let text = '';
  for (const content of contents) {
    if (text.length >= MOST_JOINED) break;
    text += `${content.text}\n`;
  }
  return text;
}

/** What {@link languageOfText} says of blocks, kept as long as the blocks are: an edit leaves most of them alone. */
export class ToldBlocks {
  private readonly known = new WeakMap<BlockContent, Told[]>();

  of(content: BlockContent, expected: string): string | undefined {
    let known = this.known.get(content);
    if (known === undefined) this.known.set(content, (known = []));
    let found = known.find((each) => each.expected === expected);
    if (found === undefined) known.push((found = { expected, language: languageOfText(content.text, expected) }));
    return found.language;
  }
}

interface Told {
  readonly expected: string;
  readonly language: string | undefined;
}
