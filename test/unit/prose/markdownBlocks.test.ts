// Markdown: definition lists, template blocks, HTML blocks, and elements that close in another block.
import { describe, expect, it } from 'vitest';
import { Zone } from '../../../server/src/prose/zones.js';
import { outline, prose, sourceOf } from './reading.js';

describe('definition lists', () => {
  // Syntax as in PHP Markdown Extra, "Definition Lists" (common practice of kramdown, Python-Markdown, goldmark).
  it('have terms and definitions, each its own block', () => {
    expect(outline('Access *key*\nKey\n: What opens a gate.\n  Goes on.\n: A second sense.\n\nAfter.\n')).toEqual([
      'definedTerm[definedTerm]: Access key',
      'definedTerm[definedTerm]: Key',
      'definition: What opens a gate. Goes on.',
      'definition: A second sense.',
      'paragraph: After.',
    ]);
  });

  it('may have a blank line before the colon, and blocks in a definition', () => {
    expect(outline('Gate\n\n:   A door.\n\n    More of it.\n\n        code\n\nVault\n: A place.\n')).toEqual([
      'definedTerm[definedTerm]: Gate',
      'definition: A door.',
      'definition: More of it.',
      'definedTerm[definedTerm]: Vault',
      'definition: A place.',
    ]);
  });

  it('stand in lists and quotations too', () => {
    expect(outline('- Gate\n  : A door.\n\n> Key\n> : A thing.\n')).toEqual([
      'definedTerm[definedTerm]: Gate',
      'definition: A door.',
      'definedTerm[quotation+definedTerm]: Key',
      'definition[quotation]: A thing.',
    ]);
  });

  it('are not made by a colon behind a long paragraph or inside a line', () => {
    expect(outline(`${'A long line of prose. '.repeat(10)}\n: x\n`)[0]).toMatch(/^paragraph/);
    expect(outline('One : two\n')).toEqual(['paragraph: One : two']);
    expect(outline(':smile: one\n')).toEqual(['paragraph: @ one']);
  });

  it('map to their source', () => {
    expect(sourceOf('> One **key**\n> Two\n> : def &amp; more\n', 'def & more')).toBe('def &amp; more');
    expect(sourceOf('One\r\nTwo\r\n: def\r\n', 'Two')).toBe('Two');
  });
});

describe('template blocks', () => {
  it('hold code from their marker to its end', () => {
    expect(
      outline(
        'Before.\n{% highlight ruby %}\nputs "no"\n\n# no\n{% endhighlight %}\nAfter.\n\n{{< highlight go >}}\nno\n{{< /highlight >}}\nEnd.\n',
      ),
    ).toEqual(['paragraph: Before.', 'paragraph: After.', 'paragraph: End.']);
  });

  it('stand for themselves where nothing ends them, and raw text is Markdown', () => {
    expect(outline('{% highlight x %}\n\nKept *text*.\n')).toEqual(['paragraph: Kept text.']);
    expect(outline('{% raw %}\n\nKept {{ x }} text.\n\n{% endraw %}\n')).toEqual(['paragraph: Kept @ text.']);
  });
});

describe('HTML blocks', () => {
  it('are read by the roles of their elements', () => {
    const text =
      '<table>\n<tr><th>Field</th><td>Meaning of <code>x y</code> and <kbd>Ctrl</kbd></td></tr>\n</table>\n\n' +
      '<details>\n<summary>More</summary>\n<p>Body &amp; <a href="/x">link</a>.</p>\n<ul><li>One<li>Two</ul>\n</details>\n';
    expect(outline(text)).toEqual([
      'tableCell[tableCell]: Field',
      'tableCell[tableCell]: Meaning of @ and <uiLabel:Ctrl>',
      'caption: More',
      'paragraph: Body & <linkText:link>.',
      'listItem: One',
      'listItem: Two',
    ]);
  });

  it('hold no prose in comments, scripts, styles and code', () => {
    const text =
      '<!-- no\n\nno -->\n\n<script>\nno\n\nno\n</script>\n\n<style>no</style>\n\n<pre>\nno\n\nno</pre>\n\n<p>yes</p>\n';
    expect(outline(text)).toEqual(['paragraph: yes']);
  });

  it('hold Markdown’s code and targets as written: both closed', () => {
    expect(outline('<div>\nThe `old flag` and [a page](../old/page.md) here.\n</div>\n')).toEqual([
      'paragraph: The <code:`old flag`> and [a page<linkTarget:](../old/page.md)> here.',
    ]);
  });

  it('stand in quotations and lists, with the places of their words', () => {
    const text = '> <div>\n> one two\n> </div>\n\n- <p>three\n  four</p>\n';
    expect(outline(text)).toEqual(['paragraph[quotation]: one two', 'listItem: three four']);
    expect(sourceOf(text, 'one two')).toBe('one two');
    expect(sourceOf(text, 'three four')).toBe('three\n  four');
  });

  it('never lose the page behind a tag that nothing closes', () => {
    expect(outline('<div class="x\n\nAfter.\n')).toEqual(['paragraph: After.']);
    expect(outline('<blockquote>\n\nAfter.\n')).toEqual(['paragraph: After.']);
  });
});

describe('elements around blocks', () => {
  it('put Markdown in them into their zones and language', () => {
    const text =
      '<div class="warning">\n\nStop **now**.\n\n- <b>one</b>\n\n</div>\n\nOn.\n\n<blockquote>\n\nSaid.\n\n</blockquote>\n\n<div lang="fr">\n\nLa clé.\n\n</div>\n';
    expect(outline(text)).toEqual([
      'paragraph[safetyMessage]: Stop now.',
      'listItem[safetyMessage]: one',
      'paragraph: On.',
      'paragraph[quotation]: Said.',
      'paragraph: La clé.',
    ]);
    expect(prose(text).blocks.map(({ content }) => content.language)).toEqual([
      undefined,
      undefined,
      undefined,
      undefined,
      'fr',
    ]);
  });

  it('close at the tag that is theirs', () => {
    const text = '<div class="danger">\n\n<div>\n\na\n\n</div>\n\nb\n\n</p></div>\n\nc\n';
    expect(outline(text)).toEqual(['paragraph[safetyMessage]: a', 'paragraph[safetyMessage]: b', 'paragraph: c']);
  });

  it('add up where they lie in each other, and the inner one tells the language', () => {
    const text =
      '<div class="danger" lang="fr">\n\na\n\n<blockquote lang="de_CH">\n\nb\n\n</blockquote>\n<blockquote>\n\nc\n\n</blockquote>\n\nd\n\n</div>\n\ne\n';
    expect(prose(text).blocks.map(({ content: { text: said, zones, language } }) => [said, zones, language])).toEqual([
      ['a', Zone.safetyMessage, 'fr'],
      ['b', Zone.safetyMessage | Zone.quotation, 'de-CH'],
      ['c', Zone.safetyMessage | Zone.quotation, 'fr'],
      ['d', Zone.safetyMessage, 'fr'],
      ['e', 0, undefined],
    ]);
  });
});

describe('tags in a line', () => {
  it('close words in another language, and hide what is not to be translated', () => {
    expect(
      outline('A <i lang="fr">bon mot</i> and <span lang=en>a word</span>, <b translate="no">Buoy One</b> too.'),
    ).toEqual(['paragraph: A <quotation:bon mot> and a word, @ too.']);
  });
});
