// Pseudo-synonyms: half of a term's uses renamed to an invented word. Is the mix asked about, and at what place?
import { hashText } from '../../server/src/base/hash.js';
import { finish } from '../../server/src/base/work.js';
import { Corpus } from '../../server/src/corpus/corpus.js';
import { Profiles, factsOf } from '../../server/src/engine/factsOf.js';
import { compareCodeUnits } from '../../server/src/base/order.js';
import { isKnown } from '../../server/src/lexicon/synonyms.js';
import { numberForms } from '../../server/src/mining/wording.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import { ask } from './asked.js';
import { usesOf } from './funnel.js';
import { nounTermsOf } from './knownTerms.js';
import { placeAsked } from './match.js';
import { rename } from './renaming.js';
import type { Renaming, RenamingMode } from './renaming.js';

/** Bands of a term's uses before half of them are renamed: from, up to and without. */
export const BANDS = [
  [20, 50],
  [50, 100],
  [100, 200],
  [200, 400],
  [400, Number.POSITIVE_INFINITY],
] as const;

/** Terms tried in each band. They are renamed together, so few, to leave the rest of the prose as it is. */
const TRIED = 8;

/** How the terms of one band fared. */
export interface PseudoBand {
  readonly mode: RenamingMode;
  readonly from: number;
  readonly terms: number;
  readonly askedByDefault: number;
  /** Asked with the look-alikes. */
  readonly asked: number;
  /** Places with the look-alikes, ascending. */
  readonly places: readonly number[];
  /** The terms that were found, each with its invented name. */
  readonly found: readonly string[];
}

/** Renames half of the uses of some nouns of each band, in both modes, and asks the whole pipeline. */
export function recoverPseudoSynonyms(sources: readonly SourceText[]): PseudoBand[] {
  const profiles = new Profiles();
  const facts = sources.map((source) => factsOf(source, profiles)[0]!);
  const corpus = finish(Corpus.create().apply(sources.map(({ uri }, index) => ({ uri, facts: facts[index]! }))));
  const bands = BANDS.map(([from, to]) => ({ from, terms: chooseTerms(corpus, from, to) }));
  const renamings: Renaming[] = [];
  const invented = new Map<string, string>();
  for (const term of bands.flatMap(({ terms }) => terms)) {
    const word = inventWord(term, (candidate) => corpus.vocabulary.find(candidate) !== undefined);
    invented.set(term, word);
    const forms = numberForms(term).map((form): [string, string] => [form, form === term ? word : `${word}s`]);
    renamings.push({ term, forms: new Map(forms) });
  }
  return (['occurrence', 'document'] as const).flatMap((mode) => {
    const { byDefault, withLookAlikes } = ask(rename(sources, facts, renamings, mode), profiles);
    return bands.map(({ from, terms }) => {
      const fates = terms.map((term) => ({
        name: `${term} / ${invented.get(term)!}`,
        byDefault: placeAsked(byDefault, term, invented.get(term)!, 'open'),
        place: placeAsked(withLookAlikes, term, invented.get(term)!, 'open'),
      }));
      const found = fates.filter(({ place }) => place > 0);
      return {
        ...{ mode, from, terms: terms.length, asked: found.length },
        askedByDefault: fates.filter((fate) => fate.byDefault > 0).length,
        places: found.map(({ place }) => place).sort((x, y) => x - y),
        found: found.map(({ name }) => name),
      };
    });
  });
}

/** Single nouns in the band, chosen by the hash of their texts: the same ones in every run. */
function chooseTerms(corpus: Corpus, from: number, to: number): string[] {
  return nounTermsOf(corpus)
    .flatMap(({ words }) => (words.length === 1 && /^[a-z]{4,}$/.test(words[0]!) ? [words[0]!] : []))
    .filter((term) => {
      const uses = usesOf(corpus, term);
      return uses >= from && uses < to && isKnown(term, 'noun');
    })
    .sort((a, b) => hashText(a) - hashText(b) || compareCodeUnits(a, b))
    .slice(0, TRIED);
}

const ONSETS = 'b d f g k l m n p r s t v z br dr gr kl pr sk tr'.split(' ');
const VOWELS = 'a e i o u'.split(' ');
const CODAS = 'lb ld lk lm lp mp nd nk nt rb rd rk rm rp'.split(' ');

/** A word that nobody uses, with a regular plural; it begins with a vowel where the term does, so that articles stay right. */
export function inventWord(term: string, isTaken: (word: string) => boolean): string {
  for (let seed = 0; ; seed++) {
    let number = hashText(term, seed);
    const take = (list: readonly string[]): string => {
      const piece = list[number % list.length]!;
      number = Math.floor(number / list.length);
      return piece;
    };
    const start = /^[aeiou]/.test(term) ? take(VOWELS) : '';
    const word = start + take(ONSETS) + take(VOWELS) + take(ONSETS) + take(VOWELS) + take(CODAS);
    if (!isTaken(word) && !isKnown(word, 'noun') && !isKnown(word, 'verb') && !isKnown(word, 'adjective')) return word;
  }
}
