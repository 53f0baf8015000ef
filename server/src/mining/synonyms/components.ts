// Candidates among terms of several words that differ in one word only, where those two words are themselves synonyms.
import type { PairCollector } from './evidence.js';
import { lexicalLink, Meanings } from './links.js';
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
  const ofHeads = new Meanings(['noun']);
  const ofModifiers = new Meanings(['noun', 'adjective', 'verb']);
  for (const [frame, members] of frames) {
    if (members.length < 2) continue;
    const gap = Number(frame.slice(0, frame.indexOf(' ')));
    const isHead = gap === terms[members[0]!]!.words.length - 1;
    const words = members.map((term) => terms[term]!.words[gap]!);
    (isHead ? ofHeads : ofModifiers).forEachRelated(words, (i, j) => {
      const link = linkOfParts(words[i]!, words[j]!, isHead, ofModifiers.keyOf);
      if (link === undefined) return;
      const says = link.source === 'list' ? 'the trade often uses for one thing' : 'a dictionary gives as synonyms';
      pairs.add(members[i]!, members[j]!, {
        kind: 'component',
        // A differing head makes two kinds of thing more easily than a differing modifier.
        strength: link.strength * (isHead ? 0.8 : 1),
        text: `they differ only in “${words[i]!}” and “${words[j]!}”, which ${says}`,
        parts: { words: [words[i]!, words[j]!], says },
        value: link.strength,
      });
    });
  }
}

function linkOfParts(
  left: string,
  right: string,
  isHead: boolean,
  keyOf: (word: string) => string,
): LexicalLink | undefined {
  const noun = lexicalLink(left, right, 'noun', keyOf);
  if (noun !== undefined || isHead) return noun;
  return lexicalLink(left, right, 'adjective', keyOf) ?? lexicalLink(left, right, 'verb', keyOf);
}
