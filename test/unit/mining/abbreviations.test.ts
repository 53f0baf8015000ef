// Abbreviations: how they are read, what is asked, and what is right as it is.
import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { Corpus } from '../../../server/src/corpus/corpus.js';
import { aligns, longestAlignment } from '../../../server/src/mining/abbreviations/alignment.js';
import { askAbbreviations } from '../../../server/src/mining/abbreviations/ask.js';
import { groupDefinitions } from '../../../server/src/mining/abbreviations/explained.js';
import type { Explained } from '../../../server/src/mining/abbreviations/explained.js';
import { freeUses } from '../../../server/src/mining/abbreviations/freeUses.js';
import { formsOfLong, formsOfShort } from '../../../server/src/mining/abbreviations/longForms.js';
import { usesOf } from '../../../server/src/mining/abbreviations/shortAndLong.js';
import { findDefinitions, partsOf, shortFormOf } from '../../../server/src/mining/abbreviations/definitions.js';
import type { Question } from '../../../server/src/mining/question.js';
import { corpusOf } from '../../support/corpusOf.js';

const ask = (...documents: string[]): Question[] => finish(askAbbreviations(corpusOf(documents)));
const definitionsIn = (text: string): string[] =>
  findDefinitions(corpusOf([text])).map(({ short, longKey }) => `${short} = ${longKey}`);

describe('alignment', () => {
  // Common abbreviations of the trade: common practice, no source.
  it.each([
    ['crd', 'custom resource definition'],
    ['pit', 'point in time'],
    ['iam', 'identity and access management'],
    ['rag', 'retrieval augmented generation'],
    ['idp', 'identity provider'],
    ['xml', 'extensible markup language'],
    ['genai', 'generative ai'],
    ['oidc', 'open id connect'],
    ['sso', 'single sign -on'],
  ])('%s is made of %s', (short, long) => {
    expect(aligns(short, long.split(' '))).toBe(true);
  });

  it.each([
    ['crd', 'custom definition'],
    ['ca', 'custom resource'],
    ['pit', 'in time'],
    ['ml', 'machine learning model'],
    ['sso', 'single sign on'],
  ])('%s is not made of %s', (short, long) => {
    expect(aligns(short, long.split(' '))).toBe(false);
  });

  it('takes the longest run of words before', () => {
    expect(longestAlignment('crd', [['the'], ['knative'], ['custom'], ['resource'], ['definition']])).toBe(3);
  });

  const glossary = resolve(import.meta.dirname, '../../../../shared/data/rfc4949.txt');
  // RFC 4949 (Shirey 2007): its entries "$ ABC (x) See: long form" for an abbreviation and its long form.
  it.skipIf(!existsSync(glossary))('explains the abbreviations of a published glossary', () => {
    const pattern = /^ {3}\$ ([A-Z]{2,6})\n {6}\([A-Z]\) See: ([A-Za-z][A-Za-z -]+)\.$/gm;
    const pairs = [...readFileSync(glossary, 'utf8').matchAll(pattern)].map(([, short, long]) => ({ short, long }));
    const aligned = pairs.filter(({ short, long }) => aligns(short!.toLowerCase(), long!.split(' ').flatMap(partsOf)));
    expect(pairs.length).toBeGreaterThan(50);
    expect(aligned.length / pairs.length).toBeGreaterThan(0.85);
  });
});

describe('short forms', () => {
  it.each([
    ['CRDs', 'CRD'],
    ['k-NN', 'k-NN'],
    ['OTel', 'OTel'],
    ['K8s', 'K8s'],
  ])('%s is the short form %s', (spelling, short) => {
    expect(shortFormOf(spelling)).toBe(short);
  });

  it.each(['Note', 'a', 'word', 'ABCDEFGHIJKLM'])('%s is none', (spelling) => {
    expect(shortFormOf(spelling)).toBeUndefined();
  });
});

describe('explanations', () => {
  it('are read in three ways', () => {
    expect(definitionsIn('Add a custom resource definition (CRD) first.')).toEqual([
      'CRD = custom resource definition',
    ]);
    expect(definitionsIn('Set the PIT (point in time) of the search.')).toEqual(['PIT = point in time']);
    expect(definitionsIn('RBAC stands for role-based access control.')).toEqual(['RBAC = role based access control']);
  });

  it('fold the plural', () => {
    expect(definitionsIn('These are virtual machines (VMs).')).toEqual(['VM = virtual machine']);
  });

  it('leave other parentheses alone', () => {
    expect(definitionsIn('Restart the server (SIGHUP). See the list (PDF).')).toEqual([]);
  });
});

describe('a short and a long form', () => {
  const explained = 'A custom resource (CR) holds the settings. Each CR has a name.';

  it('are asked where the long form goes on', () => {
    const [question, ...rest] = ask(
      `${explained} The custom resource is read. Every custom resource counts. Delete the CR.`,
      'The custom resources wait. A CR waits. The custom resources stop.',
    );
    expect(rest).toEqual([]);
    expect(question).toMatchObject({ kind: 'abbreviation', id: 'abbreviation:CR|custom resource' });
    expect(question!.terms.map(({ text, uses }) => [text, uses])).toEqual([
      ['custom resource', 5],
      ['CR', 4],
    ]);
    expect(question!.reasons.map(({ text }) => text)).toEqual([
      'the documents explain “CR” as “custom resource” once',
      '“custom resource” is spelled out 3 times on 2 pages where it is no explanation',
      '2 pages write “CR” and then “custom resource” again',
    ]);
  });

  it('are asked where most pages leave the short form unexplained and both stand beside the same words', () => {
    const short = ['Open a CR today. The CR waits.', 'Delete a CR. The CR goes.', 'Read each CR, then the CR list.'];
    const long = ['Open a custom resource.', 'Delete a custom resource.', 'Read each custom resource.'];
    expect(ask(explained, ...short, ...long).map(({ id }) => id)).toEqual(['abbreviation:CR|custom resource']);
    // Comma-separated values are seldom a file in that format: what has no neighbour in common may be two things.
    const other = [
      'These are custom resources of ours.',
      'Those were custom resources too.',
      'Our custom resources ended.',
    ];
    expect(ask(explained, ...short, ...other)).toEqual([]);
  });

  it('are right where the long form stands on pages that have no need of the short one', () => {
    const long = Array.from(
      { length: 5 },
      (_, i) => `A custom resource is read here ${i}. The custom resource is open.`,
    );
    expect(ask(explained, `${explained} Add a CR.`, ...long)).toEqual([]);
  });

  it('are read across hyphens', () => {
    expect(definitionsIn('Log in by single sign-on (SSO) once.')).toEqual(['SSO = single sign on']);
  });

  it('are right where the long form is explained and the short one goes on', () => {
    expect(ask(`${explained} Delete the CR.`, `${explained} Add a CR.`, 'A custom resource is read here.')).toEqual([]);
  });

  it('are right where the long form is part of a longer one', () => {
    expect(
      ask(
        `${explained} A custom resource definition (CRD) is a type. The custom resource definition is read.`,
        'See the custom resource definition of yours. A custom resource definition is here. The CRD and the CR.',
      ).map(({ id }) => id),
    ).not.toContain('abbreviation:CR|custom resource');
  });

  it('do not depend on the order in which documents came', () => {
    const pages = {
      'file:///a.md': `${explained} The custom resource is read. Every custom resource counts.`,
      'file:///b.md': 'The custom resources wait. A CR waits. The custom resources stop.',
    };
    const forwards = finish(askAbbreviations(corpusOf(pages)));
    expect(finish(askAbbreviations(corpusOf(Object.fromEntries(Object.entries(pages).reverse()))))).toEqual(forwards);
    expect(forwards).toHaveLength(1);
  });
});

describe('a free long form', () => {
  const explained = 'A pressure relief valve (PRV) sits in the hatch. Open the PRV.';
  const short = [1, 2, 3].map((buoy) => `Check the PRV of buoy ${buoy}. The PRV opens by itself.`);
  const withLong = (long: (buoy: number) => string): Question[] => ask(explained, ...short, ...[1, 2, 3].map(long));

  it('stands in a sentence, on pages other than those that leave the short form unexplained', () => {
    const asked = withLong((buoy) => `Check the pressure relief valve of buoy ${buoy}.`);
    expect(asked.map(({ id }) => id)).toEqual(['abbreviation:PRV|pressure relief valve']);
  });

  /** How many free uses a page has beside one that explains the short form. */
  function freeIn(page: string): number {
    const corpus = corpusOf([explained, page]);
    const [{ short: name, expansions }] = groupDefinitions(findDefinitions(corpus)) as [Explained];
    const long = usesOf(formsOfLong(corpus, expansions[0]!.words));
    return freeUses(corpus, long, usesOf(formsOfShort(corpus, name)), expansions[0]!).all.length;
  }

  it.each([
    ['in a sentence', 'Check the pressure relief valve first.', 1],
    ['in a heading', '# Check the pressure relief valve', 0],
    ['in the text of a link', 'See [check the pressure relief valve](valve.md) first.', 0],
    ['in an image description', '![The pressure relief valve](valve.png)', 0],
    ['in a cell of a table', '| Part | Buoy |\n|---|---|\n| Check the pressure relief valve | 7 |', 0],
    ['alone in an item', '- Pressure relief valve', 0],
    ['as the label of an item', '- Pressure relief valve: in the hatch', 0],
    ['as the name of a page', 'Open the Pressure Relief Valve page first.', 0],
    ['first on a page with the short form', 'Check the pressure relief valve. Then wait. Open the PRV.', 0],
    ['after the short form on it', 'Open the PRV. Check the pressure relief valve.', 1],
    ['again on it', 'A pressure relief valve opens. Open the PRV. Check the pressure relief valve.', 1],
    ['beside the short form', 'A pressure relief valve opens. Check the pressure relief valve, or PRV, first.', 0],
  ])('%s: %s', (_, page, count) => {
    expect(freeIn(page)).toBe(count);
  });

  it('is not the one in capitals where most are not', () => {
    const plain = (buoy: number): string => `Check the pressure relief valve of buoy ${buoy}.`;
    const capitals = (buoy: number): string => `Check the Pressure Relief Valve of buoy ${buoy}.`;
    const [few] = withLong((buoy) => (buoy === 1 ? capitals(buoy) : plain(buoy)));
    const [many] = withLong(capitals);
    // What few pages mix is asked after all else.
    expect(few!.confidence).toBe(0.5);
    expect(few!.worth).toBeLessThan(many!.worth / 5);
  });

  it('comes back more than once on a page that explains the short form', () => {
    const back = 'Clean the pressure relief valve of this buoy.';
    const page = (buoy: number, returns: number): string =>
      `${explained} Test the PRV of buoy ${buoy}. ${Array.from({ length: returns }, () => back).join(' Then wait. ')}`;
    expect(ask(page(1, 1), page(2, 1), page(3, 1))).toEqual([]);
    expect(ask(page(1, 3), page(2, 3), page(3, 3))).toHaveLength(1);
  });

  it('needs no neighbour in common where it is a name', () => {
    const atlas = [
      'The Coastal Wave Atlas (CWA) is free.',
      ...[1, 2, 3].map((i) => `Our CWA has sheet ${i}. A CWA is big.`),
    ];
    const named = [1, 2, 3].map((i) => `Waves of bay ${i} are in the Coastal Wave Atlas.`);
    expect(ask(...atlas, ...named).map(({ id }) => id)).toEqual(['abbreviation:CWA|Coastal Wave Atlas']);
    expect(ask(...atlas, ...named.map((text) => text.replace(/Coastal.*/, 'coastal wave atlas.')))).toEqual([]);
  });
});

describe('a short form with two explanations', () => {
  it('is asked about as ambiguous', () => {
    const [question] = ask(
      'The Advanced Packaging Tool (APT) installs it. Run APT again.',
      'An advanced persistent threat (APT) hides. Each APT is different. The advanced persistent threat stays.',
    );
    expect(question).toMatchObject({ kind: 'ambiguous-abbreviation' });
    expect(question!.terms.map(({ text }) => text)).toEqual([
      'APT',
      'advanced persistent threat',
      'Advanced Packaging Tool',
    ]);
  });

  it('is none where the words are only inflected', () => {
    expect(
      ask('It reached general availability (GA) today.', 'It is generally available (GA) today. GA is near.'),
    ).toEqual([]);
  });
});

describe('clipped words', () => {
  it('are asked among the same words as their full forms', () => {
    const [question] = ask(
      'Open the config file. Check config values. A config change is logged. The config directory is here.',
      'Open the configuration file. Check configuration values. A configuration change is logged.',
      'The config file and the configuration directory.',
    );
    expect(question).toMatchObject({ kind: 'abbreviation', id: 'abbreviation:config|configuration' });
    expect(question!.reasons[1]!.text).toContain('“___ change”, “check ___”');
  });

  const clipped = (short: string, full: string): string[] => [
    `Open the ${short} file. Check ${short} values. A ${short} change is logged. The ${short} list is here.`,
    `Open the ${full} file. Check ${full} values. A ${full} change is logged. Each ${full} list waits.`,
    `The ${short} file and the ${full} list.`,
  ];

  it('are a free choice where the dictionary has them as words of their own', () => {
    expect(ask(...clipped('config', 'configuration')).map(({ confidence }) => confidence >= 0.5)).toEqual([true]);
    expect(ask(...clipped('spec', 'specification')).map(({ confidence }) => confidence >= 0.5)).toEqual([false]);
  });

  it('come after words that are written in two ways', () => {
    const [{ worth, terms, confidence } = { worth: 0, terms: [], confidence: 0 }] = ask(
      ...clipped('config', 'configuration'),
    );
    expect(worth).toBeGreaterThan(0);
    expect(worth).toBeLessThan((confidence * terms[1]!.uses) / 2);
  });

  it('are slips of style where a larger set has few of them', () => {
    const much = Array.from({ length: 4000 }, (_, i) => `Buoy ${i} sends its waves to the shore by noon.`).join('\n\n');
    const [question] = ask(...clipped('config', 'configuration'), much);
    expect(question!.confidence).toBeLessThan(0.5);
  });

  it('are left where they stand among other words', () => {
    expect(
      ask(
        'Start the app store. An app icon. The app drawer opens. Your app list.',
        'Send the application form. A job application waits. The application deadline passed. Visa application rules.',
        'The app icon. A grant application.',
      ),
    ).toEqual([]);
  });
});

it('has nothing to ask of an empty corpus', () => {
  expect(finish(askAbbreviations(Corpus.create()))).toEqual([]);
});
