// Variants: one word or compound written in several ways, asked where the ways stand in the same slot of a sentence.
import { compareCodeUnits } from '../../base/order.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import type { Question } from '../question.js';
import { askCapitals } from './capitals.js';
import { findCandidates } from './candidates.js';
import { joinFamilies } from './families.js';
import type { Member } from './families.js';
import { judge } from './judge.js';
import type { Mix } from './judge.js';
import { Mentions } from './mentions.js';
import { makeQuestion } from './question.js';
import { askPhrases } from './phrases.js';
import { SlotReader } from './slots.js';
import { stylesOf } from './styles.js';
import type { Style } from './styles.js';

/** Candidates between two resting points. */
const STRIDE = 200;

/** All questions about ways of writing, the worthiest first. */
export function* askVariants(corpus: Corpus): Work<Question[]> {
  const readers = { slots: new SlotReader(corpus), mentions: new Mentions(corpus) };
  const candidates = findCandidates(corpus);
  yield;
  const members: Member[] = [];
  for (let i = 0; i < candidates.length; i++) {
    if (i % STRIDE === 0) yield;
    const member = largestMix(stylesOf(corpus, readers, candidates[i]!));
    if (member !== undefined) members.push(member);
  }
  yield;
  const questions = joinFamilies(members).flatMap((family) => makeQuestion(corpus, family) ?? []);
  const settled = new Set(
    questions.flatMap(({ terms }) => terms.flatMap(({ forms }) => forms.map(({ text }) => text.toLowerCase()))),
  );
  questions.push(...(yield* askCapitals(corpus, readers.mentions, settled)), ...(yield* askPhrases(corpus, settled)));
  return questions.sort((a, b) => b.worth - a.worth || compareCodeUnits(a.id, b.id));
}

/** The strongest pair of ways of writing, and each further way that is a mix with all of those already in. */
function largestMix(styles: readonly Style[]): Member | undefined {
  const pairs: { readonly mix: Mix; readonly pair: readonly [Style, Style] }[] = [];
  styles.forEach((a, i) => {
    for (const b of styles.slice(i + 1)) {
      const mix = judge(a, b);
      if (mix !== undefined) pairs.push({ mix, pair: a.text < b.text ? [a, b] : [b, a] });
    }
  });
  if (pairs.length === 0) return undefined;
  pairs.sort(
    (x, y) =>
      y.mix.exchangeable - x.mix.exchangeable ||
      compareCodeUnits(x.pair[0].text, y.pair[0].text) ||
      compareCodeUnits(x.pair[1].text, y.pair[1].text),
  );
  const { mix, pair } = pairs[0]!;
  const chosen: Style[] = [...pair];
  const holds = (a: Style, b: Style): boolean => pairs.some((p) => p.pair.includes(a) && p.pair.includes(b));
  const others = styles.filter((style) => !chosen.includes(style));
  others.sort((a, b) => b.uses.length - a.uses.length || compareCodeUnits(a.text, b.text));
  for (const style of others) if (chosen.every((member) => holds(member, style))) chosen.push(style);
  return { mix, styles: chosen };
}
