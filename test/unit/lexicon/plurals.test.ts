// Singulars and plurals of nouns.
import { describe, expect, it } from 'vitest';
import { pluralsOf, singularOf } from '../../../server/src/lexicon/plurals.js';

const pairs = Object.entries({
  indices: 'index',
  indexes: 'index',
  matrices: 'matrix',
  policies: 'policy',
  keys: 'key',
  databases: 'database',
  releases: 'release',
  statuses: 'status',
  aliases: 'alias',
  buses: 'bus',
  boxes: 'box',
  branches: 'branch',
  caches: 'cache',
  axes: 'axis',
  processes: 'process',
  classes: 'class',
  analyses: 'analysis',
  sizes: 'size',
  quizzes: 'quiz',
  leaves: 'leaf',
  archives: 'archive',
  cookies: 'cookie',
  apis: 'api',
  cpus: 'cpu',
  menus: 'menu',
  echoes: 'echo',
  videos: 'video',
  people: 'person',
  children: 'child',
  prefixes: 'prefix',
  lenses: 'lens',
});

describe('singularOf', () => {
  it.each(pairs)('%s → %s', (plural, singular) => {
    expect(singularOf(plural)).toBe(singular);
    expect(singularOf(singular)).toBe(singular);
  });

  it.each([
    'access',
    'status',
    'analysis',
    'news',
    'series',
    'metadata',
    'media',
    'dns',
    'https',
    'kubernetes',
    'canvas',
    'us',
  ])('%s is no plural', (word) => expect(singularOf(word)).toBe(word));
});

describe('pluralsOf', () => {
  it('leads back to the singular', () => {
    for (const [, singular] of pairs) {
      for (const plural of pluralsOf(singular)) expect(singularOf(plural)).toBe(singular);
    }
  });

  it('gives the usual plural first', () => {
    expect(pluralsOf('index')).toEqual(['indexes', 'indices']);
    expect(pluralsOf('policy')).toEqual(['policies']);
    expect(pluralsOf('switch')).toEqual(['switches']);
    expect(pluralsOf('metadata')).toEqual(['metadata']);
  });
});
