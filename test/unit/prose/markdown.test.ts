// Markdown: blocks, zones and the map back to the source, one construct at a time.
import { describe, expect, it } from 'vitest';
import { read } from '../../../server/src/prose/read.js';
import { outline, prose, sourceOf } from './reading.js';

describe('blocks', () => {
  it('are headings of both styles, paragraphs and list items', () => {
    const text = '# One #\n\nTwo\n---\n\nA para\ngraph.\n\n- item\n  goes on\n\n  more\n- [x] done\n';
    expect(outline(text)).toEqual([
      'heading1[heading]: One',
      'heading2[heading]: Two',
      'paragraph: A para graph.',
      'listItem: item goes on',
      'listItem: more',
      'listItem: done',
    ]);
  });

  it('are the cells of a table, each its own', () => {
    expect(outline('| a | b `c` |\n|---|---|\n| d \\| e | *f* |\n')).toEqual([
      'tableCell[tableCell]: a',
      'tableCell[tableCell]: b @',
      'tableCell[tableCell]: d | e',
      'tableCell[tableCell]: f',
    ]);
  });

  it('are not code, comments, definitions or thematic breaks', () => {
    const text = '```js\nlet a;\n```\n\n    indented\n\n<!-- no -->\n\n[a]: /url "t"\n\n***\n';
    expect(outline(text)).toEqual([]);
  });

  it('are alternative texts, behind the block that holds the image', () => {
    expect(outline('See ![the *old* mast](m.png "t") here.')).toEqual([
      'paragraph: See @ here.',
      'alternativeText[alternativeText]: the old mast',
    ]);
  });

  it('leave out those without a word', () => expect(outline('`code`\n\n---\n\n| * |\n|---|\n')).toEqual([]));

  it('are footnotes, whose labels are no prose', () => {
    expect(outline('Text[^n].\n\n[^n]: The note\n    goes on.\n\n    And on.\n')).toEqual([
      'paragraph: Text.',
      'paragraph: The note goes on.',
      'paragraph: And on.',
    ]);
  });
});

describe('quotations', () => {
  it('are blockquotes', () => expect(outline('> a\n> b\n')).toEqual(['paragraph[quotation]: a b']));

  it('are not alerts, which may be safety messages', () => {
    expect(outline('> [!NOTE]\n> Mind it.\n\n> [!WARNING]\n> Stop.\n> - one\n\n> **Caution**: hot.\n')).toEqual([
      'paragraph: Mind it.',
      'paragraph[safetyMessage]: Stop.',
      'listItem[safetyMessage]: one',
      'paragraph[safetyMessage]: Caution: hot.',
    ]);
  });

  it('are four or more words between double marks, straight or curly', () => {
    expect(outline('The "access key" and "the key of the gate" and “one two three four” and 3" "x.')).toEqual([
      'paragraph: The "access key" and <quotation:"the key of the gate"> and <quotation:“one two three four”> and 3" "x.',
    ]);
  });

  it('split the marks that they cross', () => {
    expect(outline('He said "see [the long rules](r) there" then.')).toEqual([
      'paragraph: He said <quotation:"see ><quotation+linkText:the long rules><quotation: there"> then.',
    ]);
  });
});

describe('generators’ containers', () => {
  it('by indentation hold blocks, and end where the indentation ends', () => {
    expect(outline('!!! danger "Look *here*"\n    Body.\n\n        code\n\n    More.\n\nAfter.\n')).toEqual([
      'caption[safetyMessage]: Look here',
      'paragraph[safetyMessage]: Body.',
      'paragraph[safetyMessage]: More.',
      'paragraph: After.',
    ]);
    expect(outline('???note\n    Body.\n\n=== "Tab one"\n\n    - item\n')).toEqual([
      'paragraph: Body.',
      'caption: Tab one',
      'listItem: item',
    ]);
  });

  it('by colons hold blocks, and end at their closing colons', () => {
    expect(outline('::::warning My title\ntext\n:::tip\ninner\n:::\n::::\nafter\n')).toEqual([
      'caption[safetyMessage]: My title',
      'paragraph[safetyMessage]: text',
      'paragraph[safetyMessage]: inner',
      'paragraph: after',
    ]);
    expect(outline('::: {.callout-caution}\nx\n:::\n')).toEqual(['paragraph[safetyMessage]: x']);
  });
});

describe('inline markup', () => {
  it('makes code, URLs, addresses, templates and emoji codes opaque', () => {
    const text = 'a `b` <https://c.d> https://e.f/g_h me_x@i.jk {{ l }} {% m %} ${n} :o_p: {{< q "r" >}} s';
    expect(outline(text)).toEqual(['paragraph: a @ @ @ @ @ @ @ @ @ s']);
  });

  it('makes addresses without a dot opaque too', () => {
    expect(outline('Open http://localhost:8080/a, or https://{host}/b.')).toEqual(['paragraph: Open @, or @.']);
  });

  it('vanishes where it only styles', () => {
    expect(outline('a **b** *c*~~d~~ e{: .f } <b>g</b><!-- h -->')).toEqual(['paragraph: a b cd e g']);
  });

  it('puts keys into the zone of interface labels and hides HTML code', () => {
    expect(outline('Press <kbd>Ctrl</kbd>+<kbd>C</kbd>, not <code>a b</code> or <tag>.')).toEqual([
      'paragraph: Press <uiLabel:Ctrl>+<uiLabel:C>, not @ or @.',
    ]);
  });

  it('keeps link texts and their targets', () => {
    const text =
      'See [the *rules*](/r "t"), [the list][l], [l], [none] and <a href="/x">there</a>.\n\n[l]: <list.md>\n';
    expect(outline(text)).toEqual([
      'paragraph: See <linkText:the rules>, <linkText:the list>, <linkText:l>, [none] and <linkText:there>.',
    ]);
    expect(prose(text).blocks[0]!.content.links.map(({ target }) => target)).toEqual([
      '/r',
      'list.md',
      'list.md',
      '/x',
    ]);
  });

  it('keeps brackets inside a link’s text, and blanks in a template inside its target', () => {
    expect(outline('[a[0] b](x) and [c](/{{ v }}/d)')).toEqual(['paragraph: <linkText:a[0] b> and <linkText:c>']);
    expect(prose('[c](/{{ v }}/d)').blocks[0]!.content.links[0]!.target).toBe('/{{ v }}/d');
  });

  it('folds breaks and decodes references and escapes', () => {
    expect(outline('a  \nb\\\n  c &amp; d&nbsp;e \\* &nope; f')).toEqual(['paragraph: a b c & d\u00A0e * &nope; f']);
  });
});

describe('the map to the source', () => {
  it('reaches through markup, references, breaks and surrogate pairs', () => {
    expect(sourceOf('🙂 un**known** word', 'unknown')).toBe('un**known');
    expect(sourceOf('🙂 caf&eacute;s here', 'cafés')).toBe('caf&eacute;s');
    expect(sourceOf('> one\n> two', 'one two')).toBe('one\n> two');
    expect(sourceOf('a \\*b', '*b')).toBe('\\*b');
    expect(sourceOf('x\r\ny 漢字 z', 'y 漢字 z')).toBe('y 漢字 z');
  });

  it('counts pieces from the block’s start', () => {
    const text = 'one\n\n  two [three](x)\n';
    const block = prose(text).blocks[1]!;
    expect(block.start).toBe(7);
    expect(block.content.sourceLength).toBe('two [three](x)'.length);
    expect([...block.content.pieces]).toEqual([0, 0, 4, 4, 5, 5]);
  });
});

describe('odd input', () => {
  it('reads CRLF and lone CR as line breaks', () => {
    expect(outline('# a\r\n\r\nb\r\nc\\\r\nd\r\n\r\n<div>\r\nx\r\n</div>\r\n\r\ne')).toEqual([
      'heading1[heading]: a',
      'paragraph: b c d',
      'paragraph: x',
      'paragraph: e',
    ]);
    expect(outline('# a\r\rb\rc')).toEqual(['heading1[heading]: a', 'paragraph: b c']);
  });

  it('passes over a byte order mark and replaces NUL and U+FFFC', () => {
    expect(outline('\uFEFF# a')).toEqual(['heading1[heading]: a']);
    expect(outline('a\0b \uFFFC c')).toEqual(['paragraph: a\uFFFDb \uFFFD c']);
  });

  it('keeps lone surrogates in place', () => expect(sourceOf('a \ud800 word', 'word')).toBe('word'));

  it('says what is nested too deep', () => {
    expect(prose(`${'> '.repeat(50)}deep`).problems[0]!.message).toMatch(/more than 24 levels/);
    expect(outline(`${'> '.repeat(20)}deep`)).toEqual(['paragraph[quotation]: deep']);
  });

  it('never throws on nothing', () => {
    expect(read({ uri: '', format: 'markdown', text: '' })).toEqual({ blocks: [], problems: [], language: undefined });
  });
});
