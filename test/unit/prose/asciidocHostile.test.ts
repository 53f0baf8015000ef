// Hostile AsciiDoc: what would make a reader slow or deep is read in a bounded multiple of the time that prose takes.
import { describe, expect, it } from 'vitest';
import { read } from '../../../server/src/prose/read.js';

const SIZE = 100_000;
/** Reading 100 KB of prose takes a few milliseconds; what is quadratic takes seconds. */
const MOST = 50;

function fill(unit: string): string {
  return unit.repeat(Math.ceil(SIZE / unit.length)).slice(0, SIZE);
}

const UNITS = [
  ...[
    'a',
    '-',
    '=',
    '[',
    '*a ',
    '*a_ ',
    '`a ',
    '+',
    '+a ',
    '$$',
    '^a',
    '"`a ',
    '"`a`"b ',
    '|',
    'a|',
    '2+|',
    '999*|',
    '.999+| ',
  ],
  ...[
    '{a',
    '{a}',
    'link:',
    'link:a[',
    'link:a[\\] ',
    'image:a[',
    'image:a[] ',
    'footnote:[',
    'footnote:[]]',
    'xref:a b',
    'a:b[',
  ],
  ...[
    'https://a[',
    '<<a,',
    '((',
    '(((a))',
    '&a',
    'a@',
    'a@b.',
    '[[a',
    '[.a]*',
    '\\*',
    'pass:[',
    '::',
    'a:: b\n',
    ':a: \\\n',
  ],
  ...[
    '* a\n+\n',
    '////\n',
    '====\n',
    '|===\n',
    'a|\n!===\n',
    '[cols="1a"]\n|===\n| a\n',
    '.a\n',
    '.a\n[b]\n',
    '> ',
    '\n',
    ' ',
    '\0',
    '\ud800',
  ],
];
const HOSTILE: Record<string, string> = {
  'brackets that close once': `${fill('link:a[')}]`,
  'images that close once': `${fill('image:a[')}]`,
  'balanced footnotes': fill('footnote:[').slice(0, SIZE / 2) + fill(']').slice(0, SIZE / 2),
  'references far from a bracket': `${fill('{u}a')}[b]`,
  'examples ever longer': Array.from({ length: 400 }, (_, i) => '='.repeat(i + 4)).join('\n'),
  'columns without end': `[cols="${fill('999*,')}"]\n|===\n${fill('.999+| ')}\n|===`,
  'attributes without end': `[${fill('cols=')}]\n|===\n|a\n|===`,
  'a list full of names': `image::a[${fill('alt= ')}]`,
};

function milliseconds(text: string): number {
  const before = process.cpuUsage();
  const { problems } = read({ uri: 'file:///hostile', format: 'asciidoc', text });
  const { user, system } = process.cpuUsage(before);
  expect(problems.filter(({ message }) => message.includes('could not be read'))).toEqual([]);
  return (user + system) / 1000;
}

describe('reading 100 KB of AsciiDoc', () => {
  const prose = fill('The key opens the gateway, and *every* owner has link:x[one] of `them`.\n\n');
  for (let i = 0; i < 10; i++) milliseconds(prose);
  const usual = Math.max(6, Array.from({ length: 5 }, () => milliseconds(prose)).sort((a, b) => a - b)[2]!);

  it.each([...UNITS.map((unit) => [JSON.stringify(unit), fill(unit)] as const), ...Object.entries(HOSTILE)])(
    'of %s stays within bounds',
    (_name, text) => {
      const taken = Math.min(...Array.from({ length: 3 }, () => milliseconds(text)));
      expect(taken / usual).toBeLessThan(MOST);
    },
  );
});
