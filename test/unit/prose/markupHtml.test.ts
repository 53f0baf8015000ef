// HTML: what each construct reads as, and where it stands in the source.
import { describe, expect, it } from 'vitest';
import { reread, startReading } from '../../../server/src/prose/read.js';
import type { SourceText } from '../../../server/src/text/sourceText.js';
import { outline, prose, sourceOf } from './reading.js';

const html = (text: string): string[] => outline(text, 'html');

describe('HTML blocks', () => {
  it('are paragraphs, headings with their level, list items, cells, captions', () => {
    expect(html('<h1>Keys</h1><h3 id=a>More</h3><p>One\n  <b>key</b>.</p><ul><li>first<li><p>second</p></ul>')).toEqual(
      [
        ...['heading1[heading]: Keys', 'heading3[heading]: More', 'paragraph: One key.'],
        ...['listItem: first', 'listItem: second'],
      ],
    );
    expect(html('<table><caption>All keys</caption><tr><th>Name<td>North</table><figure><figcaption>A mast')).toEqual([
      ...['caption: All keys', 'tableCell[tableCell]: Name', 'tableCell[tableCell]: North', 'caption: A mast'],
    ]);
  });

  it('are terms with their definitions', () => {
    expect(html('<dl><dt>key<dt>lock<dd>It opens.<dt>mast<dd><p>It stands.</dl>')).toEqual([
      ...['definedTerm[definedTerm]: key', 'definedTerm[definedTerm]: lock', 'definition: It opens.'],
      ...['definedTerm[definedTerm]: mast', 'definition: It stands.'],
    ]);
  });

  it('end where their end tags are left out', () => {
    expect(html('<p>one<p>two<div>three</div>four<table><tr><td>a<td>b<tr><td>c</table><p>five</div> six')).toEqual([
      ...['paragraph: one', 'paragraph: two', 'paragraph: three', 'paragraph: four', 'tableCell[tableCell]: a'],
      ...['tableCell[tableCell]: b', 'tableCell[tableCell]: c', 'paragraph: five six'],
    ]);
  });

  it('are split by blocks inside them', () => {
    expect(html('<li>before<ul><li>inner</ul>after</li>')).toEqual([
      ...['listItem: before', 'listItem: inner', 'listItem: after'],
    ]);
  });

  it('are titles and descriptions from the head, and nothing else of it', () => {
    const page =
      '<!DOCTYPE html><html lang="en-GB"><head><title>Keys &amp; locks</title><meta name="description" content="How to keep keys">' +
      '<meta name="keywords" content="no prose"><style>p { color: red }</style><script>let a = "<p>no</p>";</script></head>' +
      '<body><p>Text</p></body></html>';
    expect(html(page)).toEqual([
      ...['title[frontMatter]: Keys & locks', 'description[frontMatter]: How to keep keys', 'paragraph: Text'],
    ]);
    expect(prose(page, 'html').language).toBe('en-GB');
    expect(html('<title>A</title><p>no head tags')).toEqual(['title[frontMatter]: A', 'paragraph: no head tags']);
  });

  it('have front matter where a generator reads it', () => {
    expect(html('---\ntitle: The keys\nlang: de\n---\n<p>Text</p>')).toEqual([
      ...['title[frontMatter]: The keys', 'paragraph: Text'],
    ]);
  });

  it('are quotations and safety messages', () => {
    expect(html('<blockquote><p>Somebody said it.</p></blockquote><p>We did not.')).toEqual([
      ...['paragraph[quotation]: Somebody said it.', 'paragraph: We did not.'],
    ]);
    expect(
      html(
        '<div class="admonition warning"><p class="admonition-title">Warning</p><p>Hot.</p></div><div class="note"><p>Cold.',
      ),
    ).toEqual(['paragraph[safetyMessage]: Warning', 'paragraph[safetyMessage]: Hot.', 'paragraph: Cold.']);
    expect(html('<div class="notice">Small print.</div>')).toEqual(['paragraph: Small print.']);
  });

  it('leave out code, navigation, scripts, comments and what pages hold for machines', () => {
    expect(
      html(
        '<nav><a href=x>Other page</a></nav><pre>let <b>a</b></pre><script>b</script><template><p>c</template>' +
          '<!-- <p>d</p> --><svg><text>e</text><title>f</title></svg><select><option>g</select><?php h ?><p>Text',
      ),
    ).toEqual(['paragraph: @@Text'.replace('@@', '')]);
  });
});

describe('HTML inside a block', () => {
  it('has code as opaque units, labels, terms and quotations as zones', () => {
    expect(
      html('<p>Run <code>a <b>b</b></code>, press <kbd>Enter</kbd>, <dfn>key</dfn>, <q>so</q>, <cite>It</cite>.'),
    ).toEqual(['paragraph: Run @, press <uiLabel:Enter>, <definedTerm:key>, <quotation:so>, <quotation:It>.']);
    expect(html('<p>Choose <span class="guilabel">Save</span> and <strong class="x">go</strong>.')).toEqual([
      'paragraph: Choose <uiLabel:Save> and go.',
    ]);
  });

  it('has links with their targets, in every block that they reach over', () => {
    expect(html('<p>See <a href="a.html#b">the <em>keys</em></a> or <a name=c>this</a>.')).toEqual([
      'paragraph: See <linkText:the keys> or this.',
    ]);
    expect(html('<h2><a name=a></a><a href="#a"></a>Title</h2>')).toEqual(['heading2[heading]: Title']);
    const links = prose('<a href="x"><h2>Title</h2>text</a> more', 'html').blocks.map(({ content }) => content.links);
    expect(links).toEqual([[{ start: 0, end: 5, target: 'x' }], [{ start: 0, end: 4, target: 'x' }]]);
    const [block] = prose('<p>One <a href="a&amp;b">two three</a>', 'html').blocks;
    expect(block!.content.links).toEqual([{ start: 4, end: 13, target: 'a&amp;b' }]);
  });

  it('has texts in the place of pictures as blocks of their own', () => {
    expect(html('<p>A <img src="a.png" alt="north &amp; south mast" title=Masts> stands.')).toEqual([
      ...['paragraph: A @ stands.', 'alternativeText[alternativeText]: north & south mast'],
      'alternativeText[alternativeText]: Masts',
    ]);
  });

  it('folds white space, breaks lines and keeps words whole', () => {
    expect(html('<p>\r\n  one\t two<br>three<i> four</i> <b> five </b>six<wbr>seven\n</p>')).toEqual([
      'paragraph: one two three four five sixseven',
    ]);
  });

  it('decodes references, and keeps what is none', () => {
    expect(html('<p>a&amp;b &eacute;t&#233;&nbsp;x &unknown; AT&T &#x1F642;')).toEqual([
      'paragraph: a&b été\u00A0x &unknown; AT&T 🙂',
    ]);
    expect(html('<p>a&nbspb &copy 2020 &ampx &lt')).toEqual(['paragraph: a&nbspb © 2020 &ampx <']);
    expect(sourceOf('<p>a caf&eacute;s b', 'cafés', 'html')).toBe('caf&eacute;s');
    expect(sourceOf('<p>one\r\n   <b>two</b> 🙂 three', 'one two 🙂 three', 'html')).toBe(
      'one\r\n   <b>two</b> 🙂 three',
    );
  });

  it('has addresses and template markers as opaque units', () => {
    expect(
      html(
        '<p>Open https://a.example/b?c=d&amp;e=f, www.a.example/x. Write to a.b@c.example. {{ page.x }} {% if y %} <%= z %>',
      ),
    ).toEqual(['paragraph: Open @, @. Write to @. @ @ @']);
    expect(html('<p>The &lt;p&gt; and &lt;/br &gt; elements; a &lt; b.')).toEqual([
      'paragraph: The @ and @ elements; a < b.',
    ]);
    expect(html('<p>a @ b :// c {{ d')).toEqual(['paragraph: a @ b :// c {{ d']);
  });

  it('marks quotations between quotation marks', () => {
    expect(html('<p>He said &ldquo;one two three four&rdquo; then.')).toEqual([
      'paragraph: He said <quotation:“one two three four”> then.',
    ]);
  });

  it('has no superscripts in its words', () => {
    expect(html('<p>The key<sup><a href="#f1">1</a></sup> and H<sub>2</sub>O.')).toEqual([
      'paragraph: The key@ and H2O.',
    ]);
  });
});

describe('broken HTML', () => {
  it('is read as far as it goes', () => {
    expect(html('<p>one </b>two</i> <code>three</p><p>four</p')).toEqual(['paragraph: one two @', 'paragraph: four']);
    expect(html('a < b and <p>c')).toEqual(['paragraph: a < b and', 'paragraph: c']);
    expect(html('')).toEqual([]);
  });

  it('is not read beyond 256 levels, and says so', () => {
    const { blocks, problems } = prose(`${'<div>'.repeat(300)}deep${'</div>'.repeat(300)}<p>Text</p>`, 'html');
    expect(blocks.map(({ content }) => content.text)).toEqual(['Text']);
    expect(problems.map(({ message }) => message)).toEqual(['Text nested more than 256 levels deep is not read.']);
  });

  it('keeps the contents of untouched blocks when read again', () => {
    const text = (body: string): SourceText => ({ uri: 'file:///a.html', format: 'html', text: body });
    const before = startReading(text('<p>One.<p>Two.<p>Three.'));
    const after = reread(before, text('<p>One.<p>Two and more.<p>Three.'));
    expect(after.prose).toEqual(startReading(after.source).prose);
    expect(after.prose.blocks[0]!.content).toBe(before.prose.blocks[0]!.content);
    expect(after.prose.blocks[2]!.content).toBe(before.prose.blocks[2]!.content);
  });
});
