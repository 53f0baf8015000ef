// Our own lists: every line well formed, no set that contradicts another list, nothing said twice.
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { clippedSide, clippingsOf, fullFormsOf } from '../../../server/src/lexicon/clippings.js';
import {
  areEquivalent,
  equivalentSets,
  equivalentsOf,
  parseEquivalents,
} from '../../../server/src/lexicon/equivalents.js';
import { isFunctionWord, isParticle } from '../../../server/src/lexicon/functionWords.js';
import { mustStayApart } from '../../../server/src/lexicon/opposites.js';
import { termKey } from '../../../server/src/lexicon/termKey.js';
import { isVerbNounPair, nounsOfVerb, verbOfNoun } from '../../../server/src/lexicon/verbNounPairs.js';

/** The lines of a source list with their numbers, comments and blank lines left out. */
function linesOf(name: string): { line: string; where: string }[] {
  const text = readFileSync(new URL(`../../../server/lexicon-data/${name}.txt`, import.meta.url), 'utf8');
  return text
    .split(/\r?\n/)
    .map((line, i) => ({ line, where: `${name}.txt, line ${i + 1}: ${line}` }))
    .filter(({ line }) => line.trim() !== '' && !line.startsWith('#'));
}

describe('equivalents', () => {
  const sets = equivalentSets();

  it('holds several hundred sets, most of terms of several words or phrases', () => {
    expect(sets.length).toBeGreaterThanOrEqual(700);
    const long = sets.filter(({ terms }) => terms.some((term) => /[ -]/.test(term)));
    expect(long.length / sets.length).toBeGreaterThan(0.6);
  });

  it('has no two forms of one term in a set', () => {
    for (const { terms } of sets) expect(new Set(terms.map(termKey)).size, terms.join(' | ')).toBe(terms.length);
  });

  it('has no pair that must stay apart', () => {
    for (const { terms } of sets) {
      for (const a of terms)
        for (const b of terms) if (a !== b) expect(mustStayApart(a, b), `${a} | ${b}`).toBeUndefined();
    }
  });

  it('does not say the same of two terms twice', () => {
    const seen = new Set<string>();
    for (const { terms, pos, objects } of sets) {
      for (const a of terms) {
        for (const b of terms) {
          if (a >= b) continue;
          const said = `${pos} (${objects?.join(', ') ?? ''}) ${[termKey(a), termKey(b)].sort().join(' = ')}`;
          expect(seen.has(said), said).toBe(false);
          seen.add(said);
        }
      }
    }
  });

  it('finds a set by any form of its terms', () => {
    expect(areEquivalent('Dropdown lists', 'pull-down menu', 'noun')?.field).toBe('interface');
    expect(areEquivalent('sign in', 'log in', 'verb')?.pos).toBe('verb');
    expect(areEquivalent('sign in', 'log in', 'noun')).toBeUndefined();
    expect(areEquivalent('colour scheme', 'color theme')?.field).toBe('interface');
    expect(areEquivalent('folder', 'directory')?.distinct).toMatch(/directory/);
    expect(areEquivalent('folder', 'Folders')).toBeUndefined();
    expect(areEquivalent('folder', 'router')).toBeUndefined();
    expect(areEquivalent('throw', 'raise', 'verb')?.objects).toContain('exception');
    expect(equivalentsOf('hostname').map(({ term }) => term)).toContain('machine name');
    expect(equivalentsOf('login', 'adjective')).toEqual([]);
  });

  it.each([
    ['noun: a | b', /line 1/],
    ['[field]\nnoun: alone', /line 2.*two or more/],
    ['[field]\nnoun a | b', /line 2.*no set/],
    ['[field]\nnoun: a || b', /line 2/],
    ['[field]\nnoun: a |  | b', /line 2/],
    ['[field]\npronoun: a | b', /line 2/],
  ])('refuses %j', (text, message) => expect(() => parseEquivalents(text)).toThrow(message));
});

describe('clippings', () => {
  const lines = linesOf('clippings');

  it('are well formed, are found both ways, and are shorter than what they stand for', () => {
    for (const { line, where } of lines) {
      expect(line, where).toMatch(/^[a-z0-9]+( [a-z]+)? = [a-z]+( [a-z]+)*( \| [a-z]+( [a-z]+)*)*$/);
      const [clipping = '', forms = ''] = line.split(' = ');
      expect(fullFormsOf(clipping)).toEqual(forms.split(' | '));
      for (const form of forms.split(' | ')) {
        expect(clippingsOf(form)).toContain(clipping);
        expect(form.length).toBeGreaterThan(clipping.length);
      }
    }
  });

  it('lists each clipping once', () => {
    expect(new Set(lines.map(({ line }) => line.split(' = ')[0])).size).toBe(lines.length);
  });

  it('tells which side is clipped, in terms of several words as well', () => {
    expect(clippedSide('config', 'configuration')).toBe('a');
    expect(clippedSide('repositories', 'repos')).toBe('b');
    expect(clippedSide('config file', 'configuration files')).toBe('a');
    expect(clippedSide('config directory', 'configuration dir')).toBeUndefined();
    expect(clippedSide('config file', 'configuration setting')).toBeUndefined();
    expect(clippedSide('auth', 'authorisation')).toBe('a');
    expect(clippedSide('configuration', 'configuration')).toBeUndefined();
  });
});

describe('opposites and closed sets', () => {
  it('has well-formed opposites, which stay apart both ways', () => {
    for (const { line, where } of linesOf('opposites')) {
      const match = /^([^/,]+) \/ ([^/]+)$/.exec(line);
      expect(match, where).not.toBeNull();
      for (const other of match?.[2]?.split(', ') ?? []) {
        expect(mustStayApart(match?.[1] ?? '', other), other).toBeDefined();
        expect(mustStayApart(other, match?.[1] ?? ''), other).toBeDefined();
      }
    }
  });

  it('has well-formed closed sets, whose members stay apart', () => {
    for (const { line, where } of linesOf('closedSets')) {
      expect(line, where).toMatch(/^[a-z -]+: [^,:]+(, [^,:]+)+$/);
      const members = line.slice(line.indexOf(': ') + 2).split(', ');
      expect(new Set(members.map(termKey)).size, where).toBe(members.length);
      for (const [i, member] of members.entries()) {
        expect(member).toBe(member.trim().toLowerCase());
        const other = members[(i + 1) % members.length] ?? '';
        expect(mustStayApart(member, other), `${member}, ${other}`).toBeDefined();
      }
    }
  });

  it('are many', () => {
    expect(linesOf('opposites').length).toBeGreaterThanOrEqual(150);
    expect(linesOf('closedSets').length).toBeGreaterThanOrEqual(150);
  });
});

describe('words of grammar', () => {
  it('knows them, and which are particles', () => {
    for (const word of ['the', 'of', 'and', 'should', 'they', 'because', "don't"])
      expect(isFunctionWord(word), word).toBe(true);
    for (const word of ['server', 'up', 'one', 'need', '']) expect(isFunctionWord(word), word).toBe(false);
    for (const word of ['up', 'out', 'in', 'off']) expect(isParticle(word), word).toBe(true);
    expect(isParticle('the')).toBe(false);
  });
});

describe('phrasal verbs and their nouns', () => {
  it('are well formed, and are found both ways', () => {
    for (const { line, where } of linesOf('verbNounPairs')) {
      expect(line, where).toMatch(/^[a-z]+ [a-z]+ = [a-z-]+(, [a-z-]+)*$/);
      const [verb = '', nouns = ''] = line.split(' = ');
      for (const noun of nouns.split(', ')) {
        expect(noun.replace('-', ''), where).toBe(verb.replace(' ', ''));
        expect(verbOfNoun(noun)).toBe(verb);
        expect(isVerbNounPair(verb, noun) && isVerbNounPair(noun, verb)).toBe(true);
      }
      expect(isParticle(verb.split(' ')[1] ?? '')).toBe(true);
    }
  });

  it('knows the pairs that every style page lists', () => {
    for (const verb of [
      'log in',
      'back up',
      'set up',
      'sign in',
      'check out',
      'roll back',
      'time out',
      'shut down',
      'fail over',
    ]) {
      expect(nounsOfVerb(verb), verb).toContain(verb.replace(' ', ''));
    }
    expect(isVerbNounPair('login', 'log-in')).toBe(false);
    expect(nounsOfVerb('configure')).toEqual([]);
  });
});
