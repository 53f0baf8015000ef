// What the general dictionary says; the expectations are WordNet's, looked at in its database.
import { describe, expect, it } from 'vitest';
import { areOpposites, isKnown, synonymy } from '../../../server/src/lexicon/synonyms.js';

describe('synonymy', () => {
  it('gives the smallest sum of sense ranks', () => {
    expect(synonymy('begin', 'start', 'verb')).toEqual({ kind: 'synonym', rankSum: 2 });
    expect(synonymy('car', 'automobile', 'noun')).toEqual({ kind: 'synonym', rankSum: 2 });
    expect(synonymy('hard disk', 'hard disc', 'noun')).toEqual({ kind: 'synonym', rankSum: 2 });
    expect(synonymy('gather', 'collect', 'verb')).toEqual({ kind: 'synonym', rankSum: 4 });
  });

  it('knows wider words and sisters', () => {
    expect(synonymy('computer', 'machine', 'noun')).toBe('broader');
    expect(synonymy('machine', 'computer', 'noun')).toBe('broader');
    expect(synonymy('hammer', 'session', 'noun')).toBeUndefined();
    expect(synonymy('monday', 'tuesday', 'noun')).toBeUndefined();
    expect(synonymy('whisper', 'shout', 'verb')).toBe('sister');
  });

  it('says nothing of unknown words, of a word and itself, and of the wrong part of speech', () => {
    expect(synonymy('hostname', 'start', 'noun')).toBeUndefined();
    expect(synonymy('start', 'start', 'verb')).toBeUndefined();
    expect(synonymy('automobile', 'car', 'verb')).toBeUndefined();
    expect(isKnown('hostname', 'noun')).toBe(false);
    expect(isKnown('server', 'noun')).toBe(true);
  });
});

describe('areOpposites', () => {
  it.each([
    ['hot', 'cold'],
    ['open', 'close'],
    ['minimum', 'maximum'],
    ['quick', 'slow'],
    ['quick', 'sluggish'],
    ['begin', 'terminate'],
  ])('%s and %s', (a, b) => {
    expect(areOpposites(a, b)).toBe(true);
    expect(areOpposites(b, a)).toBe(true);
  });

  it.each([
    ['fast', 'quick'],
    ['begin', 'start'],
    ['server', 'client'],
    ['hot', 'hot'],
  ])('not %s and %s', (a, b) => expect(areOpposites(a, b)).toBe(false));
});
