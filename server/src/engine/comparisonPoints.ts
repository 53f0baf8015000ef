// What speaks for and against two terms being one concept, in plain words with the figure behind each.
import type { Apart } from '../lexicon/opposites.js';
import type { ComparedCompanion } from '../mining/comparison/sharedCompanions.js';
import type { Comparison } from '../mining/comparison/comparison.js';
import type { Reason } from '../mining/question.js';
import { times } from '../mining/wording.js';
import { isBehind } from './companions.js';

/** Words and frames that are named in one point. */
const NAMED = 4;
/** Mutual ranks up to this are worth telling. */
const NEAREST = 3;
/** Shares of the yardstick: as alike as one term's own halves; and too unlike for two names of one thing. */
const ALIKE = 0.7;
const UNLIKE = 0.4;

/**
 * Sorts what is known into points for and against; the weightier first.
 * @param asked the reasons of a question that asks about both: other engines than that of synonyms may have some
 */
export function pointsOf(
  figures: Comparison,
  apart: Apart | undefined,
  asked: readonly Reason[],
): { readonly speaksFor: Reason[]; readonly speaksAgainst: Reason[] } {
  const own = pointsFor(figures);
  const added = asked.filter(({ kind }) => !NOT_FOR.has(kind) && !own.some((point) => point.kind === kind));
  return { speaksFor: [...added, ...own], speaksAgainst: pointsAgainst(figures, apart) };
}

/** Reasons of questions that speak against, which are found here anyway. */
const NOT_FOR = new Set(['side-by-side']);

function pointsFor({ terms, usage, companions, lexicalLink, pastEdits, together }: Comparison): Reason[] {
  const [a, b] = terms.map(({ text }) => text) as [string, string];
  const points: Reason[] = [...usage.evidence];
  const has = (kind: string): boolean => points.some((point) => point.kind === kind);
  if (lexicalLink !== undefined && !has('list') && !has('dictionary') && !has('component')) {
    const says =
      lexicalLink.source === 'list'
        ? `the trade uses “${a}” and “${b}” for one thing`
        : `a general dictionary gives “${a}” and “${b}” as synonyms`;
    points.push({ kind: lexicalLink.source, text: says, value: lexicalLink.strength });
  }
  if (pastEdits !== undefined && !has('past-edit')) {
    const { aByB, bByA } = pastEdits;
    if (aByB.sentences + bByA.sentences > 0) {
      const never = (count: number): string => (count === 0 ? 'never' : times(count));
      const text = `writers replaced “${a}” by “${b}” ${never(aByB.sentences)}, “${b}” by “${a}” ${never(bByA.sentences)}`;
      points.push({ kind: 'past-edit', text, value: aByB.sentences + bByA.sentences });
    }
  }
  if (together.targets.length > 0 && !has('link-target')) {
    const text = `links with either name lead to the same place, ${shortName(together.targets[0]!.target)}`;
    points.push({ kind: 'link-target', text, value: together.targets.length });
  }
  if (companions.shared.length > 0) {
    const named = phrases(companions.shared, ({ counts }) => timesBoth(counts));
    points.push({ kind: 'shared-companions', text: `both go with ${named}`, value: companions.shared.length });
  }
  if (usage.frames.shared.length > 0) {
    const named = usage.frames.shared.slice(0, NAMED).map((frame) => `“${frame}”`);
    const text = `both are used in the same places: ${named.join(', ')}`;
    points.push({ kind: 'shared-frames', text, value: usage.frames.shared.length });
  }
  const share = usage.similarity / usage.yardstick;
  if (share >= ALIKE)
    points.push({
      kind: 'similarity',
      text: `they are used ${share >= 1 ? 'as alike as' : `${Math.round(share * 100)} % as alike as`} two halves of one term's own uses`,
      value: share,
    });
  if (usage.rankOfA <= NEAREST && usage.rankOfB <= NEAREST)
    points.push({
      kind: 'likeness',
      text: 'few other terms here are used in sentences so alike',
      value: Math.max(usage.rankOfA, usage.rankOfB),
    });
  return points;
}

function pointsAgainst({ terms, usage, companions, pastEdits }: Comparison, apart: Apart | undefined): Reason[] {
  const points: Reason[] = [];
  const add = (kind: string, value: number, text: string): void => void points.push({ kind, text, value });
  if (apart !== undefined) add(apart.kind, 1, `they are no synonyms: ${apart.detail}`);
  if (usage.refusal === 'separate')
    add('separate', 1, 'the documents give each an entry in a glossary, or a heading on one page, of its own');
  if (usage.coordinated > 0)
    add(
      'coordinated',
      usage.coordinated,
      `they are set side by side as two things ${times(usage.coordinated)} (“A and B”, “A or B”)`,
    );
  if (usage.contrasted > 0)
    add(
      'contrasted',
      usage.contrasted,
      `they are set against one another ${times(usage.contrasted)} (“A instead of B”, “from A to B”)`,
    );
  if (usage.siblings > 0)
    add(
      'siblings',
      usage.siblings,
      `lists, tables or headings give each a place of its own beside the other ${times(usage.siblings)}`,
    );
  const mended = (pastEdits?.aByB.mended ?? 0) + (pastEdits?.bByA.mended ?? 0);
  if (mended > 0) add('past-mistakes', mended, `writers mended one into the other as a mistake ${times(mended)}`);
  for (const side of [0, 1] as const) {
    const alone = companions.alone[side];
    if (alone.length === 0) continue;
    const named = phrases(alone, ({ counts }) => times(counts[side]));
    add('companions-alone', alone.length, `only “${terms[side].text}” goes with ${named}`);
  }
  const share = usage.similarity / usage.yardstick;
  const percent = Math.round(share * 100);
  if (share < UNLIKE)
    add(
      'unlike',
      share,
      percent === 0
        ? 'the sentences around them have nothing telling in common'
        : `they are used only ${percent} % as alike as two halves of one term's own uses`,
    );
  return points;
}

/** “40 and 18 times”, “once and 7 times”. */
function timesBoth([a, b]: readonly [number, number]): string {
  return Math.min(a, b) > 2 ? `${a} and ${b} times` : `${times(a)} and ${times(b)}`;
}

/** The first companions with the place of the term, “rotate ___”, and how many more there are; each phrase once. */
function phrases(companions: readonly ComparedCompanion[], figure: (companion: ComparedCompanion) => string): string {
  const named = new Map<string, string>();
  for (const companion of companions) {
    const { relation, word } = companion;
    const text = isBehind(relation) ? `“___ ${word}”` : `“${word} ___”`;
    if (!named.has(text)) named.set(text, `${text} (${figure(companion)})`);
  }
  const all = [...named.values()];
  const more = all.length - NAMED;
  return `${all.slice(0, NAMED).join(', ')}${more > 0 ? ` and ${more} more` : ''}`;
}

function shortName(address: string): string {
  return address.slice(address.lastIndexOf('/') + 1) || address;
}
