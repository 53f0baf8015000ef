// Margins for companions at a glance: by uses of words instead of relations, so that a hover need not read the whole corpus.
import type { Corpus } from '../../corpus/corpus.js';
import { TAG } from '../../tokens/tokens.js';
import { WORD_USES } from '../synonyms/wordUse.js';
import { Grammar } from './grammar.js';
import { PartnerKeys } from './partnerKeys.js';
import type { RelationMargins } from './relationCounts.js';

const MARGINS = new WeakMap<Corpus, RelationMargins>();

/** The margins of a corpus by its words' uses: rougher than counting relations, and some thirty times as fast to make. */
export function wordMargins(corpus: Corpus): RelationMargins {
  let margins = MARGINS.get(corpus);
  if (margins === undefined) MARGINS.set(corpus, (margins = makeMargins(corpus)));
  return margins;
}

function makeMargins(corpus: Corpus): RelationMargins {
  const { stream } = corpus;
  const keys = new PartnerKeys(corpus);
  const uses = new Uint32Array(keys.size);
  const classes = new Uint8Array(stream.length);
  const [noun, other] = [WORD_USES.indexOf('noun'), WORD_USES.indexOf('other')];
  for (let row = 0; row < stream.length; row++) {
    if (stream.counted[row] === 1) uses[stream.lemma[row]!]!++;
    const tag = stream.tag[row]!;
    classes[row] = tag === TAG.NOUN || tag === TAG.PROPN ? noun : other;
  }
  const grammar = new Grammar(corpus, classes);
  return {
    ...{ grammar, keys },
    // The term is known to be a term: its last word is a noun, whatever the tagger took it for.
    isHead: (row) => grammar.endsPhrase(row),
    all: () => stream.length,
    ofPartner: (_, key) => uses[keys.lemmaOf(key)]!,
    ofNoun: (_, lemma) => uses[lemma]!,
  };
}
