// Why two or more terms are asked about, in plain words: what speaks for them, and how they are used.
import type { Reason } from '../question.js';
import { times } from '../wording.js';
import type { Contexts } from './contexts.js';
import { sharedFrames } from './frames.js';
import type { JudgedPair } from './judge.js';

/** Mutual ranks up to this are worth telling. */
const NEAREST = 3;

/** The reasons for the pairs of one concept; the evidence for identity first, then usage. */
export function reasonsOf(pairs: readonly JudgedPair[], contexts: Contexts): Reason[] {
  const reasons: Reason[] = [];
  const said = new Set<string>();
  const say = (reason: Reason | undefined): void => {
    if (reason === undefined || said.has(reason.text)) return;
    said.add(reason.text);
    reasons.push(reason);
  };
  for (const { evidence } of pairs) {
    for (const { kind, text, value, parts } of evidence) {
      say(parts === undefined || pairs.length === 1 ? { kind, text, value } : differingParts(pairs));
    }
  }
  const terms = [...new Set(pairs.flatMap(({ a, b }) => [a, b]))];
  say(
    sharedFrames(
      contexts,
      terms.map((term) => contexts.vectors[term]!),
    ),
  );
  for (const { known } of pairs) {
    const { rankOfA, rankOfB } = known.likeness;
    if (rankOfA <= NEAREST && rankOfB <= NEAREST) {
      say({
        kind: 'likeness',
        text: 'few other terms here are used in sentences so alike',
        value: Math.max(rankOfA, rankOfB),
      });
    }
    const beside = known.sideBySide.coordinated + known.sideBySide.contrasted;
    if (beside > 0)
      say({ kind: 'side-by-side', text: `against it: both stand side by side ${times(beside)}`, value: beside });
  }
  return reasons;
}

/** What three or more terms differ in, said once. */
function differingParts(pairs: readonly JudgedPair[]): Reason {
  const parts = pairs.flatMap(({ evidence }) => evidence.filter((each) => each.parts !== undefined));
  const words = [...new Set(parts.flatMap((each) => each.parts!.words))].map((word) => `“${word}”`);
  const listed = `${words.slice(0, -1).join(', ')} and ${words.at(-1)!}`;
  const value = Math.min(...parts.map((each) => each.value));
  return { kind: 'component', text: `they differ only in ${listed}, which ${parts[0]!.parts!.says}`, value };
}
