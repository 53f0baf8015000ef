// A development runner: what each choice of weight, likeness and contexts does: node build/run.mjs test/evaluate/measures.ts SET…
import { finish } from '../../server/src/base/work.js';
import { Corpus } from '../../server/src/corpus/corpus.js';
import { Engine } from '../../server/src/engine/engine.js';
import { Profiles, factsOf } from '../../server/src/engine/factsOf.js';
import type { DocumentFacts } from '../../server/src/facts/documentFacts.js';
import { usageMeasures } from '../../server/src/mining/options.js';
import type { MiningOptions } from '../../server/src/mining/options.js';
import { gatherContexts } from '../../server/src/mining/synonyms/contexts.js';
import { compareTerms } from '../../server/src/mining/synonyms/neighbours.js';
import { segment } from '../../server/src/mining/synonyms/segment.js';
import { readUses } from '../../server/src/mining/synonyms/wordUse.js';
import { numberForms } from '../../server/src/mining/wording.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import { sourcesUnder } from './asked.js';
import { readGold } from './gold.js';
import type { GoldSet } from './gold.js';
import { nounTermsOf } from './knownTerms.js';
import { placeAsked } from './match.js';
import { inventWord } from './pseudo.js';
import { rename } from './renaming.js';

const CHOICES: readonly MiningOptions[] = [
  {},
  { weighting: 'ppmi' },
  { weighting: 'bm25' },
  { weighting: 'log-likelihood' },
  { similarity: 'cosine' },
  { similarity: 'jaccard' },
  { weighting: 'ppmi', similarity: 'cosine' },
  { contexts: 'adjacent' },
  { contexts: 'syntactic' },
  { contexts: 'window' },
  { contexts: 'window', windowWords: 2 },
];
/** Nouns that are renamed, of at least so many uses. */
const RENAMED = 60;
const FEWEST_USES = 20;

void main();

async function main(): Promise<void> {
  const sets = readGold() ?? [];
  console.log(
    'set | choice | pseudo-synonyms nearest first | mean reciprocal rank | asked | look-alikes | gold asked | s',
  );
  for (const name of process.argv.slice(2)) {
    const set = sets.find((each) => each.name === name);
    if (set === undefined)
      throw new Error(`${name}: no such set; there are ${sets.map((each) => each.name).join(', ')}`);
    await measure(set);
  }
}

async function measure(set: GoldSet): Promise<void> {
  const { sources } = await sourcesUnder(set.folder);
  const profiles = new Profiles();
  const facts = sources.map((source) => factsOf(source, profiles));
  const engine = new Engine(profiles);
  engine.apply({ documents: sources.map((source, at) => ({ uri: source.uri, source, facts: facts[at]! })) });
  const pseudo = pseudoSynonyms(
    sources,
    facts.map((each) => each[0]!),
    profiles,
  );
  for (const mining of CHOICES) {
    const started = process.cpuUsage();
    engine.apply({ mining });
    const snapshot = finish(engine.settle());
    const { user, system } = process.cpuUsage(started);
    const asked = snapshot.agendaAt('').open;
    const mined = snapshot.relations.questions;
    const gold = set.positives.filter(({ a, b }) => placeAsked(asked, a, b, 'open') > 0).length;
    const ranks = pseudo(mining);
    const first = ranks.filter((rank) => rank === 1).length;
    const reciprocal = ranks.reduce((sum, rank) => sum + 1 / rank, 0) / Math.max(1, ranks.length);
    const figures = [
      `${first} of ${ranks.length}`,
      reciprocal.toFixed(3),
      asked.filter(({ kind }) => kind === 'synonym' || kind === 'verb-object').length,
      mined.filter(({ kind }) => kind === 'look-alike').length,
      `${gold} of ${set.positives.length}`,
      ((user + system) / 1e6).toFixed(1),
    ];
    console.log([set.name, JSON.stringify(mining), ...figures].join(' | '));
  }
}

/** Renames nouns on half of their documents; gives the places of the halves among each other's neighbours. */
function pseudoSynonyms(
  sources: readonly SourceText[],
  facts: readonly DocumentFacts[],
  profiles: Profiles,
): (mining: MiningOptions) => number[] {
  const corpusOf = (some: readonly DocumentFacts[]): Corpus =>
    finish(Corpus.create().apply(sources.map(({ uri }, at) => ({ uri, facts: some[at]! }))));
  const before = corpusOf(facts);
  const able = nounTermsOf(before).filter(({ words, uses }) => words.length === 1 && uses >= FEWEST_USES);
  const step = Math.max(1, able.length / RENAMED);
  const pairs = Array.from({ length: Math.min(RENAMED, able.length) }, (_, at) => {
    const term = able[Math.floor(at * step)]!.words[0]!;
    const word = inventWord(term, (candidate) => before.vocabulary.find(candidate) !== undefined);
    return { term, word };
  });
  const renamings = pairs.map(({ term, word }) => ({
    term,
    forms: new Map(numberForms(term).map((form): [string, string] => [form, form === term ? word : `${word}s`])),
  }));
  const renamed = rename(sources, facts, renamings, 'document');
  const corpus = corpusOf(renamed.map((source) => factsOf(source, profiles)[0]!));
  const terms = nounTermsOf(corpus);
  const segments = finish(segment(corpus, terms, readUses(corpus)));
  const indexOf = (word: string): number => terms.findIndex(({ words }) => words.length === 1 && words[0] === word);
  const found = pairs
    .map(({ term, word }) => [indexOf(term), indexOf(word)].sort((x, y) => x - y))
    .flatMap(([a, b]) => (a! >= 0 && b! >= 0 ? [{ a: a!, b: b! }] : []));
  return (mining) => {
    const measures = usageMeasures(mining);
    const { vectors } = finish(gatherContexts(corpus, segments, terms.length, [], measures));
    const { likeness } = finish(compareTerms(vectors, found, [], 0, measures.similarity));
    return [...likeness.values()].flatMap(({ rankOfA, rankOfB }) => [rankOfA, rankOfB]);
  };
}
