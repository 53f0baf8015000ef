// Clipped words (repo, admin) beside their full forms, by a list; asked where both stand among the same words.
import { compareCodeUnits } from '../../base/order.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { fullFormsOf } from '../../lexicon/clippings.js';
import { isKnown } from '../../lexicon/synonyms.js';
import { TAG, TokenFlag } from '../../tokens/tokens.js';
import { endRowOfBlock, followsOn, isContent } from '../../corpus/stream.js';
import { countDocuments, examplePlacesOf } from '../places.js';
import type { Use } from '../places.js';
import { questionId } from '../question.js';
import type { Question, QuestionTerm } from '../question.js';
import { byUses, pages, singularKey, times } from '../wording.js';
import { framesOf, frameText, sharedFrames } from './frames.js';
import type { SharedFrames } from './frames.js';
import { formsOfLong } from './longForms.js';
import type { FormUses } from './longForms.js';
import { termOf, usesOf } from './shortAndLong.js';

/**
 * The least that is asked about: uses and documents of either form; kinds of frame that both have, with their share in the
 * rarer form's uses; or else so many of its uses and such a share of them in fewer kinds.
 */
const LEAST = { uses: 3, documents: 2, kinds: 3, share: 0.33, usesInFew: 4, shareInFew: 0.6 } as const;

/** In a corpus of so many words, the least uses and pages of a clipping that are no names of code; fewer are a slip of style. */
const WIDESPREAD = { words: 30_000, uses: 10, documents: 8 } as const;

/**
 * How sure it is, by the share of the rarer form's uses in frames that both have; least where the clipping is mostly a name of
 * code or one frame says it all. A free choice, for those who want to see more, are adjectives, which labels and names of features
 * clip (max size, auto mode), clippings that are seldom used, and those that the dictionary has as words of their own (info, demo).
 */
const CONFIDENCE = { choice: 0.45, least: 0.5, shared: 0.4 } as const;

/** From this share of uses on pages where the code has the word, a clipping is mostly a name there. */
const MOSTLY_NAME = 0.58;

/** Words between two resting points. */
const STRIDE = 5000;

interface Side {
  /** In lower case, the last in the singular. */
  readonly words: readonly string[];
  readonly forms: readonly FormUses[];
  readonly uses: readonly Use[];
}

/** Questions about clipped words beside their full forms. Their order is not defined. */
export function* askClippings(corpus: Corpus): Work<Question[]> {
  const questions: Question[] = [];
  for (const clipping of yield* clippingsIn(corpus)) {
    const question = askClipping(corpus, clipping);
    if (question !== undefined) questions.push(question);
  }
  return questions;
}

/** The clippings that the corpus has, in the singular, in order of their code units. */
function* clippingsIn(corpus: Corpus): Work<string[]> {
  const { vocabulary, stream } = corpus;
  const found = new Set<string>();
  for (let id = 0; id < vocabulary.size; id++) {
    if (id % STRIDE === 0) yield;
    if (vocabulary.foldOf(id) !== id || stream.rowsOf(id).length === 0) continue;
    const text = vocabulary.textOf(id);
    if (fullFormsOf(text).length > 0) found.add(singularKey(text));
  }
  return [...found].sort(compareCodeUnits);
}

function askClipping(corpus: Corpus, clipping: string): Question | undefined {
  const short = sideOf(corpus, [clipping]);
  if (short === undefined) return undefined;
  const shortFrames = framesOf(corpus, short.uses);
  const candidates = fullFormsOf(clipping).flatMap((full) => {
    const words = full.split(' ');
    const long = sideOf(corpus, [...words.slice(0, -1), singularKey(words[words.length - 1]!)]);
    return long === undefined ? [] : [{ long, shared: sharedFrames(corpus, shortFrames, framesOf(corpus, long.uses)) }];
  });
  candidates.sort((a, b) => b.shared.kinds.length - a.shared.kinds.length);
  const best = candidates[0];
  if (best === undefined || !standAlike(best.shared)) return undefined;
  // Where two full words fit about as well, the clipping is short for both.
  const second = candidates[1]?.shared;
  if (second !== undefined && standAlike(second) && second.kinds.length * 2 >= best.shared.kinds.length)
    return undefined;
  // Without the uses that may be a name of the page's code it must stand alike as well.
  const words = short.uses.filter((use) => !isName(corpus, use));
  const shared = sharedFrames(corpus, framesOf(corpus, words), framesOf(corpus, best.long.uses));
  if (!standAlike(shared) || countDocuments(corpus.stream, words) < LEAST.documents) return undefined;
  const isMostlyName = short.uses.length - words.length > MOSTLY_NAME * short.uses.length;
  const isSure = !isMostlyName && shared.kinds.length > 1;
  const isChoice = isRare(corpus, words) || isModifier(corpus, best.long.uses) || isKnown(clipping, 'noun');
  const confidence = isChoice ? CONFIDENCE.choice : CONFIDENCE.least + (isSure ? CONFIDENCE.shared * shared.share : 0);
  return makeQuestion(corpus, short, words, best.long, shared, confidence);
}

function isRare({ stream }: Corpus, words: readonly Use[]): boolean {
  if (stream.length < WIDESPREAD.words) return false;
  return words.length < WIDESPREAD.uses || countDocuments(stream, words) < WIDESPREAD.documents;
}

function standAlike({ kinds, uses, share }: SharedFrames): boolean {
  return (
    (kinds.length >= LEAST.kinds && share >= LEAST.share) || (uses >= LEAST.usesInFew && share >= LEAST.shareInFew)
  );
}

function sideOf(corpus: Corpus, words: readonly string[]): Side | undefined {
  const forms = formsOfLong(corpus, words)
    .map(({ folds, uses }) => ({ folds, uses: uses.filter((use) => isPlain(corpus, use)) }))
    .filter(({ uses }) => uses.length > 0);
  const uses = usesOf(forms);
  if (uses.length < LEAST.uses || countDocuments(corpus.stream, uses) < LEAST.documents) return undefined;
  return { words, forms, uses };
}

/** A use that is neither an identifier nor set in capitals. */
function isPlain(corpus: Corpus, { row, length }: Use): boolean {
  const { stream, vocabulary } = corpus;
  if ((stream.flags[row]! & TokenFlag.identifier) !== 0)
    return length === 1 && /\d/.test(vocabulary.textOf(stream.fold[row]!));
  return !/\p{Lu}\p{Lu}/u.test(vocabulary.textOf(stream.spelling[row]!));
}

/** True where most uses stand before a noun, as adjectives. */
function isModifier({ stream }: Corpus, uses: readonly Use[]): boolean {
  const modifying = uses.filter(({ row, length }) => {
    const end = row + length;
    if (stream.tag[end - 1] !== TAG.ADJ || end >= endRowOfBlock(stream, row)) return false;
    return followsOn(stream, end) && isContent(stream, end);
  });
  return modifying.length * 2 > uses.length;
}

/** A use on a page where the code has the word as a name: as likely that name without its marks. */
function isName(corpus: Corpus, { row, length }: Use): boolean {
  return length === 1 && corpus.stream.isNameInCode(row);
}

/** `words` are the clipping's uses that are no names of code. */
function makeQuestion(
  corpus: Corpus,
  short: Side,
  words: readonly Use[],
  long: Side,
  shared: SharedFrames,
  confidence: number,
): Question {
  const sides = [{ ...short, uses: words }, long]
    .map(({ forms, uses, words: lead }) => ({ term: termOf(corpus, forms, lead.join(' ')), uses }))
    .sort((a, b) => byUses(a.term, b.term));
  const [clip, full] = [short, long].map(({ forms, words }) => termOf(corpus, forms, words.join(' '))) as [
    QuestionTerm,
    QuestionTerm,
  ];
  const shown = shared.kinds.slice(0, 3).map((frame) => `“${frameText(corpus, frame)}”`);
  return {
    id: questionId(
      'abbreviation',
      sides.map(({ term }) => term),
    ),
    kind: 'abbreviation',
    confidence,
    // A choice of style, settled once for all its uses: it comes after words that are written in two ways.
    worth: confidence * Math.log(1 + Math.min(words.length, long.uses.length)),
    terms: sides.map(({ term }) => term),
    reasons: [
      {
        kind: 'clipping',
        text: `“${clip.text}” is short for “${full.text}”; written ${times(clip.uses)} on ${pages(clip.documents)} and in full ${times(full.uses)} on ${pages(full.documents)}`,
        value: sides[1]!.term.uses,
      },
      {
        kind: 'shared-frames',
        text: `both stand beside the same ${shared.kinds.length === 1 ? 'word' : `${shared.kinds.length} words`}: ${shown.join(', ')}`,
        value: shared.kinds.length,
      },
    ],
    places: examplePlacesOf(
      corpus.stream,
      sides.map(({ uses }) => uses),
    ),
  };
}
