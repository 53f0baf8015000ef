// Which terms must never be asked about as one, and which may.
import { describe, expect, it } from 'vitest';
import { mustStayApart, sharedClosedSets } from '../../../server/src/lexicon/opposites.js';

const apart: [a: string, b: string, kind: string][] = [
  ['start', 'stop', 'opposite'],
  ['minimum value', 'maximum value', 'opposite'],
  ['source directory', 'target directory', 'opposite'],
  ['opening tag', 'closing tag', 'opposite'],
  ['encoder', 'decoder', 'affix'],
  ['starting point', 'stopping point', 'opposite'],
  ['log in', 'log out', 'opposite'],
  ['hot', 'cold', 'opposite'],
  ['quick', 'sluggish', 'opposite'],
  ['CPU limit', 'memory limit', 'closed-set'],
  ['Monday', 'Tuesdays', 'closed-set'],
  ['GET request', 'POST request', 'closed-set'],
  ['first', 'second', 'closed-set'],
  ['left', 'right', 'opposite'],
  ['MySQL', 'PostgreSQL', 'closed-set'],
  ['option A', 'option B', 'closed-set'],
  ['valid', 'invalid', 'opposite'],
  ['blocking call', 'non-blocking call', 'affix'],
  ['nonterminal', 'terminal', 'affix'],
  ['restart', 'start', 'affix'],
  ['subdirectory', 'directory', 'affix'],
  ['pre-install hook', 'post-install hook', 'affix'],
  ['stateless', 'stateful', 'opposite'],
  ['lossless', 'lossful', 'affix'],
  ['upstroke', 'downstroke', 'affix'],
  ['Python 2', 'Python 3', 'digits'],
  ['IPv4', 'IPv6', 'digits'],
  ['HTTP/1.1', 'HTTP/2', 'digits'],
  ['preinstall', 'postinstall', 'affix'],
  ['version 1.2', 'version 1.10', 'digits'],
];

const together: [a: string, b: string][] = [
  ['folder', 'directory'],
  ['drop-down list', 'dropdown lists'],
  ['behaviour', 'behavior'],
  ['utf8', 'UTF-8'],
  ['fill in', 'fill out'],
  ['memory', 'memory limit'],
  ['host name', 'machine name'],
  ['begin', 'start'],
  ['run', 'execute'],
  ['', ''],
];

describe('mustStayApart', () => {
  it.each(apart)('%s / %s: %s', (a, b, kind) => {
    expect(mustStayApart(a, b)?.kind).toBe(kind);
    expect(mustStayApart(b, a)?.kind).toBe(kind);
    expect(mustStayApart(a, b)?.detail).not.toBe('');
  });

  it.each(together)('%s / %s may be one', (a, b) => {
    expect(mustStayApart(a, b)).toBeUndefined();
    expect(mustStayApart(b, a)).toBeUndefined();
  });

  it('names the closed sets that two terms share', () => {
    expect(sharedClosedSets('january', 'May')).toEqual(['month']);
    expect(sharedClosedSets('january', 'monday')).toEqual([]);
  });
});
