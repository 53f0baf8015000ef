// From two versions of a document to the terms that were replaced: sentences paired, compared word by word.
import { hashText } from '../base/hash.js';
import { compareCodeUnits } from '../base/order.js';
import { isFunctionWord } from '../lexicon/functionWords.js';
import { singularOf } from '../lexicon/plurals.js';
import type { Replacement } from '../mining/pastEdits.js';
import { read } from '../prose/read.js';
import type { SourceText } from '../text/sourceText.js';
import { createNeutralProfile } from '../tokens/neutral.js';
import type { LanguageProfile } from '../tokens/tokens.js';
import { mayReplaceTerm } from './changedText.js';
import { changedSentences } from './sentences.js';
import type { Sentence } from './sentences.js';
import { differingStretches } from './wordDifference.js';
import type { Stretch } from './wordDifference.js';

/** The longest term, in words. */
const LONGEST_TERM = 4;
/** Fewest words of the sentence that stayed as they were … */
const FEWEST_KEPT = 4;
/** … and as a share of the longer version. */
const LEAST_KEPT = 0.5;
/** Longer sentences are lists or tables rather than prose. In words. */
const LONGEST_SENTENCE = 120;
/** Words that are told of the surroundings, on each side. */
const WORDS_BESIDE = 2;
/** Sentences are compared with those of the other version up to so many places away. */
const REACH = 40;

/** Reads what was replaced between two versions of a document. */
export class RevisionReader {
  private readonly profile: LanguageProfile = createNeutralProfile('und');

  /** The replacements in order of their code units; the URI stands for the page. Never throws. */
  replacements(before: SourceText, after: SourceText): Replacement[] {
    return addUp(
      this.sentences(before, after).map(({ from, to, before: left, after: right, mends, earlier }) => ({
        ...{ from, to, before: left, after: right, mends },
        page: hashText(after.uri),
        sentences: [hashText(textsOf(earlier).join(' '))],
      })),
    );
  }

  /** The same, each with the sentence in both versions. */
  sentences(before: SourceText, after: SourceText): ReplacedInSentence[] {
    if (!mayReplaceTerm(before.text, after.text)) return [];
    const { removed, added } = changedSentences(read(before), read(after), this.profile);
    return pairSentences(removed, added).flatMap(([earlier, later]) => {
      const found = replacementIn(earlier, later);
      return found === undefined ? [] : [{ ...found, earlier, later }];
    });
  }
}

type Single = Omit<Replacement, 'page' | 'sentences'>;

/** A replacement in one sentence. */
export interface ReplacedInSentence extends Single {
  readonly earlier: Sentence;
  readonly later: Sentence;
}

/** Adds up replacements that are the same, and puts them in order. */
function addUp(replacements: readonly Replacement[]): Replacement[] {
  const found = new Map<string, Replacement>();
  for (const one of replacements) {
    const key = [one.from, one.to, one.before, one.after, one.mends].join('\n');
    const sentences = new Set([...(found.get(key)?.sentences ?? []), ...one.sentences]);
    found.set(key, { ...one, sentences: [...sentences].sort((a, b) => a - b) });
  }
  return [...found].sort(([a], [b]) => compareCodeUnits(a, b)).map(([, replacement]) => replacement);
}

/** Pairs each removed sentence with the added one that keeps most of its words, where each is the other's best. */
function pairSentences(removed: readonly Sentence[], added: readonly Sentence[]): [Sentence, Sentence][] {
  const counts = added.map(countWords);
  const bestOf = removed.map(() => ({ at: -1, kept: 0 }));
  const bestFor = added.map(() => ({ at: -1, kept: 0 }));
  removed.forEach((sentence, i) => {
    if (sentence.length > LONGEST_SENTENCE) return;
    // Sentences keep about their place among those that changed.
    const middle = Math.round((i * added.length) / removed.length);
    for (let j = Math.max(0, middle - REACH); j < Math.min(added.length, middle + REACH + 1); j++) {
      const other = added[j]!;
      if (other.length > LONGEST_SENTENCE) continue;
      const kept = sharedWords(sentence, counts[j]!);
      if (kept < FEWEST_KEPT || kept < LEAST_KEPT * Math.max(sentence.length, other.length)) continue;
      if (kept > bestOf[i]!.kept) bestOf[i] = { at: j, kept };
      if (kept > bestFor[j]!.kept) bestFor[j] = { at: i, kept };
    }
  });
  return removed.flatMap((sentence, i): [Sentence, Sentence][] => {
    const { at } = bestOf[i]!;
    return at >= 0 && bestFor[at]!.at === i ? [[sentence, added[at]!]] : [];
  });
}

/** The one term by which another was replaced, be it more than once; undefined where the sentences differ in anything else. */
function replacementIn(from: Sentence, to: Sentence): Single | undefined {
  const stretches = differingStretches(textsOf(from), textsOf(to));
  let found: Single | undefined;
  let changed = 0;
  for (const stretch of stretches) {
    const one = termOf(from, stretch.start, stretch.end);
    const other = termOf(to, stretch.otherStart, stretch.otherEnd);
    if (one === undefined || other === undefined) return undefined;
    changed += stretch.end - stretch.start;
    // An article follows the word behind it (“an image”, “a picture”).
    if (one.length === 0 && other.length === 0) continue;
    if (one.length === 0 || other.length === 0) return undefined;
    const mends = holds(from, other) || holds(to, one);
    const next = { from: textsOf(one).join(' '), to: textsOf(other).join(' '), ...besides(from, stretch, one), mends };
    if (found !== undefined && (found.from !== next.from || found.to !== next.to)) return undefined;
    found ??= next;
  }
  if (found === undefined || from.length - changed < FEWEST_KEPT) return undefined;
  return isInflection(found.from, found.to) ? undefined : found;
}

/** The words of a stretch without articles at its ends; undefined where they are no term. */
function termOf(sentence: Sentence, start: number, end: number): Sentence | undefined {
  let [first, past] = [start, end];
  while (first < past && isArticle(sentence[first]!.text)) first++;
  while (past > first && isArticle(sentence[past - 1]!.text)) past--;
  const words = sentence.slice(first, past);
  if (words.length > LONGEST_TERM || words.some(({ isPlain }) => !isPlain)) return undefined;
  if (words.slice(1).some(({ followsOn }) => !followsOn)) return undefined;
  return words.length > 0 && words.every(({ text }) => isFunctionWord(text)) ? undefined : words;
}

function besides(sentence: Sentence, { end }: Stretch, term: Sentence): { before: string; after: string } {
  const first = sentence.indexOf(term[0]!);
  const past = first + term.length;
  const before: string[] = [];
  for (let at = first; at > 0 && before.length < WORDS_BESIDE && sentence[at]!.followsOn; at--) {
    if (!sentence[at - 1]!.isPlain) break;
    before.unshift(sentence[at - 1]!.text);
  }
  const after: string[] = [];
  for (let at = past; at < sentence.length && after.length < WORDS_BESIDE; at++) {
    if (!sentence[at]!.followsOn || !sentence[at]!.isPlain || at < end) break;
    after.push(sentence[at]!.text);
  }
  return { before: before.join(' '), after: after.join(' ') };
}

/** True where some words stand in a sentence one behind the other, in whichever number. */
function holds(sentence: Sentence, term: Sentence): boolean {
  const text = (words: Sentence): string => ` ${textsOf(words).map(singularOf).join(' ')} `;
  return text(sentence).includes(text(term));
}

function isArticle(word: string): boolean {
  return word === 'a' || word === 'an' || word === 'the';
}

/** True where two terms are one in another number. */
function isInflection(from: string, to: string): boolean {
  return lastSingular(from) === lastSingular(to);
}

function lastSingular(term: string): string {
  const at = term.lastIndexOf(' ') + 1;
  return term.slice(0, at) + singularOf(term.slice(at));
}

function textsOf(sentence: Sentence): string[] {
  return sentence.map(({ text }) => text);
}

function countWords(sentence: Sentence): ReadonlyMap<string, number> {
  const counts = new Map<string, number>();
  for (const { text } of sentence) counts.set(text, (counts.get(text) ?? 0) + 1);
  return counts;
}

function sharedWords(sentence: Sentence, counts: ReadonlyMap<string, number>): number {
  const own = countWords(sentence);
  let shared = 0;
  for (const [word, count] of own) shared += Math.min(count, counts.get(word) ?? 0);
  return shared;
}
