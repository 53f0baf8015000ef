// The whole pipeline on documentation that npm packages ship, with mixes made on purpose: what must be asked, what must not.
import { readdirSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { finish } from '../../server/src/base/work.js';
import { Engine } from '../../server/src/engine/engine.js';
import { Profiles, factsOf } from '../../server/src/engine/factsOf.js';
import type { DocumentFacts } from '../../server/src/facts/documentFacts.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import { ask } from '../evaluate/asked.js';
import type { Asked } from '../evaluate/asked.js';
import { agreementOf, readDictionary } from '../evaluate/dictionary.js';
import { usesOf } from '../evaluate/funnel.js';
import { placeAsked } from '../evaluate/match.js';
import { rename } from '../evaluate/renaming.js';

const modules = resolve(import.meta.dirname, '../../node_modules');
const PACKAGES =
  'ajv axe-core commander eslint fast-check ignore js-yaml micromark playwright-core/lib/tools/skills'.split(' ');

/** Compounds that those packages write open, and how every second use is written here instead. */
const MIXES: readonly (readonly [string, string])[] = [
  ['command line', 'command-line'],
  ['browser session', 'browser-session'],
  ['action handler', 'action-handler'],
  ['dev server', 'dev-server'],
  ['linting error', 'linting-error'],
  ['error message', 'error-message'],
  ['option value', 'optionvalue'],
];

/** Fewest uses of either form, singular and plural, for a mix to count. */
const FEWEST_USES = 4;
/** Mixes that may be missed: their uses can stand where a hyphen is right as it is. */
const MAY_MISS = 1;

function readPackages(): SourceText[] {
  return PACKAGES.flatMap((name) =>
    readdirSync(join(modules, name), { recursive: true, encoding: 'utf8' })
      .filter((file) => /\.md$/i.test(file) && !/node_modules|licen[cs]e|notices|changelog/i.test(file))
      .sort()
      .map((file) => ({
        uri: `file:///${name}/${file.replaceAll('\\', '/')}`,
        format: 'markdown' as const,
        text: readFileSync(join(modules, name, file), 'utf8'),
      })),
  );
}

describe('questions on documentation from npm packages', { timeout: 60_000 }, () => {
  const profiles = new Profiles();
  let facts: (readonly DocumentFacts[])[];
  let mixed: SourceText[];
  let asked: Asked;
  let used: (readonly [string, string])[];

  beforeAll(() => {
    const sources = readPackages();
    const read = sources.map((source) => factsOf(source, profiles));
    const renamings = MIXES.map(([term, other]) => ({
      term,
      forms: new Map([
        [term, other],
        [`${term}s`, `${other}s`],
      ]),
    }));
    mixed = rename(
      sources,
      read.map((each) => each[0]!),
      renamings,
      'occurrence',
    );
    facts = mixed.map((source, index) =>
      source.text === sources[index]!.text ? read[index]! : factsOf(source, profiles),
    );
    asked = ask(mixed, profiles, facts);
    used = MIXES.filter((mix) => mix.every((form) => usesOf(asked.corpus!, form) >= FEWEST_USES));
  });

  it('asks about compounds of which half of the uses are written with a hyphen or in one word', () => {
    expect(used.length).toBeGreaterThanOrEqual(6);
    const missed = used.filter(([a, b]) => placeAsked(asked.byDefault, a, b, 'kept') === 0);
    expect(missed.length, `not asked: ${missed.map(String).join('; ')}`).toBeLessThanOrEqual(MAY_MISS);
  });

  it('asks about no words that WordNet calls antonyms, look-alikes included', () => {
    const dictionary = readDictionary();
    expect(dictionary.areAntonyms('minimum', 'maximum')).toBe(true);
    expect(dictionary.areSynonyms('car', 'automobile', 'noun')).toBe(true);
    const opposed = { ...asked.byDefault[0]!, terms: ['minimum size', 'maximum sizes'].map(termOf) };
    expect(agreementOf([opposed], dictionary).antonyms).toHaveLength(1);
    expect(agreementOf(asked.withLookAlikes, dictionary).antonyms).toEqual([]);
  });

  it('asks the same whatever the order in which documents come, at once or bit by bit', () => {
    const bitByBit = new Engine(profiles);
    const backwards = mixed.map((_, index) => index).reverse();
    // The first part comes with one document of wrong text, which is put right later, and one that goes away again.
    const half = backwards.slice(0, backwards.length >> 1);
    const rest = backwards.slice(half.length);
    const put = (indexes: readonly number[]): void => {
      bitByBit.apply({
        documents: indexes.map((index) => ({ uri: mixed[index]!.uri, source: mixed[index]!, facts: facts[index]! })),
      });
    };
    put(half);
    const wrong = { ...mixed[rest[0]!]!, text: 'The web-site is a website. A web-site is down, the website is up.' };
    const passing = { ...wrong, uri: 'file:///passing.md' };
    bitByBit.apply({ documents: [wrong, passing].map((source) => ({ uri: source.uri, source })) });
    finish(bitByBit.settle());
    put(rest);
    bitByBit.apply({ documents: [{ uri: passing.uri, source: undefined }] });
    const { relations } = finish(bitByBit.settle());
    expect(relations.questions).toEqual(asked.mined);
  });
});

function termOf(text: string): Asked['mined'][number]['terms'][number] {
  return { text, uses: 5, documents: 2, forms: [{ text, uses: 5 }] };
}
