// Front matter: which values are prose, and where they stand.
import { describe, expect, it } from 'vitest';
import { outline, prose, sourceOf } from './reading.js';

describe('YAML front matter', () => {
  it('gives title and description as prose, and the language', () => {
    const text = '---\ntitle: The keys # comment\ntags: [a, b]\ndescription: "A \\"big\\" page"\nlang: de\n---\nBody\n';
    expect(outline(text)).toEqual([
      'title[frontMatter]: The keys',
      'description[frontMatter]: A "big" page',
      'paragraph: Body',
    ]);
    expect(prose(text).language).toBe('de');
    expect(sourceOf(text, 'keys')).toBe('keys');
    expect(sourceOf(text, 'page')).toBe('page');
  });

  it('reads block scalars, quoted and plain values of several lines', () => {
    const head =
      "---\ntitle: 'It''s\n  here'\nsummary: >-\n  One line\n\n  another\nother: x\ndescription: plain\n  goes on\n---\n";
    expect(outline(head)).toEqual([
      "title[frontMatter]: It's here",
      'description[frontMatter]: One line another',
      'description[frontMatter]: plain goes on',
    ]);
  });

  it('is not what merely stands between two thematic breaks', () => {
    expect(outline('---\nA sentence.\n---\n')).toEqual(['heading2[heading]: A sentence.']);
    expect(outline('---\ntitle: never closed\n')).toEqual(['paragraph: title: never closed']);
  });
});

describe('TOML front matter', () => {
  it('gives title and description as prose', () => {
    const text =
      '+++\ntitle = "The \\u004Beys"\nweight = 3\ndescription = \'plain\'\n[params]\ntitle = "no"\n+++\nBody\n';
    expect(outline(text)).toEqual([
      'title[frontMatter]: The Keys',
      'description[frontMatter]: plain',
      'paragraph: Body',
    ]);
    expect(sourceOf(text, 'Keys')).toBe('\\u004Beys');
  });
});
