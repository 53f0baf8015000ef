// The sentences in which two versions of a document differ, each as its words.
import { OPAQUE } from '../prose/prose.js';
import type { BlockContent, Prose } from '../prose/prose.js';
import { isOpen, Zone } from '../prose/zones.js';
import { TokenFlag } from '../tokens/tokens.js';
import type { BlockTokens, LanguageProfile } from '../tokens/tokens.js';

/** One word of a sentence, or something that stands among its words. */
export interface SentenceWord {
  /** In lower case. */
  readonly text: string;
  /** False for numbers, identifiers, code, and words in a link, a label or a quotation. */
  readonly isPlain: boolean;
  /** True where nothing but white space parts it from the word before it. */
  readonly followsOn: boolean;
}

export type Sentence = readonly SentenceWord[];

/** Sentences that one version has and the other has not, in their order. */
export interface ChangedSentences {
  readonly removed: readonly Sentence[];
  readonly added: readonly Sentence[];
}

/** Compares two versions: blocks that both have are left out, and so are sentences that both have in other blocks. */
export function changedSentences(before: Prose, after: Prose, profile: LanguageProfile): ChangedSentences {
  const [gone, come] = onlyIn(before.blocks, after.blocks, ({ content }) => content.text);
  const sentences = (blocks: typeof gone): Sentence[] => {
    const contents = blocks.map(({ content }) => content);
    return profile.tokens(contents).flatMap((tokens, index) => sentencesOf(contents[index]!, tokens));
  };
  const [removed, added] = onlyIn(sentences(gone), sentences(come), (words) => words.map(({ text }) => text).join(' '));
  return { removed, added };
}

/** What one list has more often than the other, by key, in their order. */
function onlyIn<T>(one: readonly T[], other: readonly T[], keyOf: (item: T) => string): [T[], T[]] {
  const rest = (from: readonly T[], without: readonly T[]): T[] => {
    const counts = new Map<string, number>();
    for (const item of without) counts.set(keyOf(item), (counts.get(keyOf(item)) ?? 0) + 1);
    return from.filter((item) => {
      const count = counts.get(keyOf(item)) ?? 0;
      if (count > 0) counts.set(keyOf(item), count - 1);
      return count === 0;
    });
  };
  return [rest(one, other), rest(other, one)];
}

function sentencesOf({ text, zones, marks, links }: BlockContent, tokens: BlockTokens): Sentence[] {
  const sentences: SentenceWord[][] = [];
  let atBoundary = true;
  for (let row = 0; row < tokens.start.length; row++) {
    const flags = tokens.flags[row]!;
    if (sentences.length === 0 || (flags & TokenFlag.sentenceStart) !== 0) {
      sentences.push([]);
      atBoundary = true;
    }
    const [start, end] = [tokens.start[row]!, tokens.end[row]!];
    const isOpaque = text.slice(start, end).includes(OPAQUE);
    const isWord = (flags & TokenFlag.word) !== 0;
    if (!isWord && !isOpaque && !/[\p{L}\p{N}]/u.test(text.slice(start, end))) {
      atBoundary = true;
      continue;
    }
    const own = marks.reduce((all, mark) => (mark.start < end && mark.end > start ? all | mark.zones : all), zones);
    const inLink = links.some((link) => link.start < end && link.end > start) || (own & Zone.linkText) !== 0;
    sentences[sentences.length - 1]!.push({
      text: tokens.word[row]!.toLowerCase(),
      isPlain: isWord && (flags & TokenFlag.identifier) === 0 && isOpen(own) && !inLink,
      followsOn: !atBoundary && (flags & TokenFlag.spaceBefore) !== 0,
    });
    atBoundary = (flags & TokenFlag.possessive) !== 0;
  }
  return sentences.filter((sentence) => sentence.length > 0);
}
