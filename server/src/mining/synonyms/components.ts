// Candidates among terms of several words that differ in one word only, where those two words are themselves synonyms.
import type { PairCollector } from './evidence.js';
import { forEachPair } from './lexical.js';
import { lexicalLink } from './links.js';
import type { LexicalLink } from './links.js';
import type { Term } from './terms.js';

/** Adds the pairs of terms of as many words that differ in one, where list or dictionary relates the two. */
export function pairByComponents(terms: readonly Term[], pairs: PairCollector): void {
  const frames = new Map<string, number[]>();
  terms.forEach(({ words }, index) => {
    if (words.length < 2) return;
    for (let gap = 0; gap < words.length; gap++) {
      const frame = `${gap} ${words.map((word, at) => (at === gap ? '_' : word)).join(' ')}`;
      const members = frames.get(frame);
      if (members === undefined) frames.set(frame, [index]);
      else members.push(index);
    }
  });
  const known = new Map<string, LexicalLink | undefined>();
  for (const [frame, members] of frames) {
    const gap = Number(frame.slice(0, frame.indexOf(' ')));
    forEachPair(members, (a, b) => {
      const left = terms[a]!.words[gap]!;
      const right = terms[b]!.words[gap]!;
      const isHead = gap === terms[a]!.words.length - 1;
      const key = `${isHead} ${left} ${right}`;
      if (!known.has(key)) known.set(key, linkOfParts(left, right, isHead));
      const link = known.get(key);
      if (link === undefined) return;
      const says = link.source === 'list' ? 'the trade uses for one thing' : 'a dictionary gives as synonyms';
      pairs.add(a, b, {
        kind: 'component',
        // A differing head makes two kinds of thing more easily than a differing modifier.
        strength: link.strength * (isHead ? 0.8 : 1),
        text: `they differ only in “${left}” and “${right}”, which ${says}`,
        value: link.strength,
      });
    });
  }
}

function linkOfParts(left: string, right: string, isHead: boolean): LexicalLink | undefined {
  const noun = lexicalLink(left, right, 'noun');
  if (noun !== undefined || isHead) return noun;
  return lexicalLink(left, right, 'adjective') ?? lexicalLink(left, right, 'verb');
}
