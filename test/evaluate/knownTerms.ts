// What the synonym engine knows in a corpus: its noun terms, and its verbs with objects. The one place that looks inside it.
import { finish } from '../../server/src/base/work.js';
import type { Corpus } from '../../server/src/corpus/corpus.js';
import { segment } from '../../server/src/mining/synonyms/segment.js';
import { findNounTerms } from '../../server/src/mining/synonyms/terms.js';
import type { Term } from '../../server/src/mining/synonyms/terms.js';
import { readVerbUses } from '../../server/src/mining/synonyms/verbUses.js';
import { countWordUses, readUses } from '../../server/src/mining/synonyms/wordUse.js';
import { nounKey, verbKey } from './match.js';

/** Noun terms by their key, each with its uses outside longer terms; verbs that have an object somewhere, by their key. */
export interface KnownTerms {
  readonly outside: ReadonlyMap<string, number>;
  readonly verbs: ReadonlySet<string>;
}

/** The noun terms of a corpus, most used first. */
export function nounTermsOf(corpus: Corpus): readonly Term[] {
  return finish(findNounTerms(corpus, countWordUses(corpus, readUses(corpus))));
}

/** Reads terms and verbs as the engine does. */
export function knownTermsOf(corpus: Corpus): KnownTerms {
  const classes = readUses(corpus);
  const terms = nounTermsOf(corpus);
  const { uses } = finish(segment(corpus, terms, classes));
  const outside = new Map<string, number>();
  terms.forEach(({ words }, index) => outside.set(nounKey(words.join(' '), 'open'), uses[index]!));
  const read = finish(readVerbUses(corpus, classes));
  const verbs = new Set<string>();
  for (let pair = 0; pair < read.pairs.size; pair++)
    verbs.add(verbKey(read.verbs.textOf(read.pairs.leftOf(pair)), 'open'));
  return { outside, verbs };
}
