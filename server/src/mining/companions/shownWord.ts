// The word that shows a dictionary form: the form itself where it is a word, else the form that the documents have most.
import { byCountThenText } from '../../base/order.js';
import type { Corpus } from '../../corpus/corpus.js';
import { isKnown } from '../../lexicon/synonyms.js';

const SHOWN = new WeakMap<Corpus, Map<number, string>>();

/** A dictionary form to show; taggers make up some that neither the documents nor a dictionary have (“aliase”). */
export function shownWord(corpus: Corpus, lemma: number): string {
  const { stream, vocabulary } = corpus;
  const text = vocabulary.textOf(lemma);
  if (stream.rowsOf(lemma).length > 0 || isKnown(text, 'verb') || isKnown(text, 'noun')) return text;
  let shown = SHOWN.get(corpus);
  if (shown === undefined) SHOWN.set(corpus, (shown = commonestForms(corpus)));
  return shown.get(lemma) ?? text;
}

function commonestForms({ stream, vocabulary }: Corpus): Map<number, string> {
  const uses = new Uint32Array(vocabulary.size);
  for (let row = 0; row < stream.length; row++) if (stream.counted[row] === 1) uses[stream.fold[row]!]!++;
  const best = new Map<number, { text: string; count: number }>();
  for (let row = 0; row < stream.length; row++) {
    const lemma = stream.lemma[row]!;
    if (stream.counted[row] === 0 || uses[lemma]! > 0) continue;
    const fold = stream.fold[row]!;
    const form = { text: vocabulary.textOf(fold), count: uses[fold]! };
    const known = best.get(lemma);
    if (known === undefined || byCountThenText(form, known) < 0) best.set(lemma, form);
  }
  return new Map([...best].map(([lemma, { text }]) => [lemma, text]));
}
