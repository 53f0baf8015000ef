// A development runner: reads a folder as the product does, asks about ways of writing and short forms, and prints the
// questions with their sentences, the worthiest first: forms.ts FOLDER [HOW_MANY].
import { compareCodeUnits } from '../../server/src/base/order.js';
import { finish } from '../../server/src/base/work.js';
import { Corpus } from '../../server/src/corpus/corpus.js';
import { DEFAULT_SETTINGS } from '../../server/src/engine/engine.js';
import { factsOf, Profiles } from '../../server/src/engine/factsOf.js';
import { askAbbreviations } from '../../server/src/mining/abbreviations/ask.js';
import type { Question, UsePlace } from '../../server/src/mining/question.js';
import { askVariants } from '../../server/src/mining/variants/ask.js';
import { sourcesUnder } from './asked.js';

/** Words of a sentence that are shown on either side of a use. */
const CONTEXT = 9;

const [folder, most = '60'] = process.argv.slice(2);
if (folder === undefined) {
  console.error('Name a folder of documents: node build/run.mjs test/evaluate/forms.ts FOLDER [HOW_MANY]');
  process.exitCode = 2;
} else void main(folder, Number(most));

async function main(root: string, count: number): Promise<void> {
  const { sources } = await sourcesUnder(root);
  const profiles = new Profiles();
  const documents = sources.map((source) => ({
    uri: source.uri,
    facts: factsOf(source, profiles).find(({ language }) => language === 'en'),
  }));
  const corpus = finish(Corpus.create().apply(documents));
  const all = [...finish(askVariants(corpus)), ...finish(askAbbreviations(corpus))];
  const asked = all
    .filter(({ confidence }) => confidence >= DEFAULT_SETTINGS.leastConfidence)
    .sort((a, b) => b.worth - a.worth || compareCodeUnits(a.id, b.id));
  const rate = ((asked.length / corpus.words) * 1e5).toFixed(1);
  const hidden = all.length - asked.length;
  console.log(`${asked.length} questions, ${rate} per 100,000 words; ${hidden} more below the default threshold`);
  asked.slice(0, count).forEach((question, index) => {
    printQuestion(corpus, question, index + 1);
  });
}

function printQuestion(corpus: Corpus, { kind, terms, confidence, reasons, places }: Question, number: number): void {
  const shown = terms.map(({ text, uses, documents, forms }) => {
    const spellings = forms.map((form) => `${form.text} ${form.uses}`).join(', ');
    return `${text} ${uses} on ${documents} [${spellings}]`;
  });
  console.log(`\n${number}. ${kind}: ${shown.join(' | ')}  confidence ${confidence.toFixed(2)}`);
  for (const reason of reasons) console.log(`      ${reason.kind}: ${reason.text}`);
  for (const place of places) console.log(`   ${place.term} ${sentenceOf(corpus, place)}`);
}

function sentenceOf(corpus: Corpus, { document, firstToken, lastToken }: UsePlace): string {
  const { facts, uri } = corpus.documents[document]!;
  const block = facts.blockFirst.findIndex((first) => first > firstToken) - 1;
  const from = Math.max(facts.blockFirst[block]!, firstToken - CONTEXT);
  const until = Math.min(facts.blockFirst[block + 1]!, lastToken + CONTEXT + 1);
  let text = '';
  for (let token = from; token < until; token++) {
    const word = facts.words[facts.word[token]!]!;
    text += ` ${token === firstToken ? '[[' : ''}${word}${token === lastToken ? ']]' : ''}`;
  }
  return `${text}  {${uri.split('/').slice(-2).join('/')}}`;
}
