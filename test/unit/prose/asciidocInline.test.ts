// Inline AsciiDoc: what is text, what stands opaque (shown as @), what vanishes, and the zones in between.
import { describe, expect, it } from 'vitest';
import { outline, prose, sourceOf } from './reading.js';

function inline(text: string): string {
  const [first, ...rest] = outline(`${text}\n`, 'asciidoc').map((line) => line.replace(/^paragraph: /, ''));
  return [first, ...rest].join(' / ');
}

function links(text: string): string[] {
  return prose(text, 'asciidoc').blocks.flatMap(({ content }) =>
    content.links.map(({ start, end, target }) => `${content.text.slice(start, end)} → ${target}`),
  );
}

const READS: readonly (readonly [string, string, string])[] = [
  ['formatting vanishes', 'A *bold* _it_ #marked# **b**old H~2~O x^2^.', 'A bold it marked bold H2O x2.'],
  ['and nests', '*bold _and italic_*, **_both_**', 'bold and italic, both'],
  ['over lines', 'A *bold\nline* end', 'A bold line end'],
  ['but not inside words', 'a_b_c 2*3*4 C#x#', 'a_b_c 2*3*4 C#x#'],
  ['nor without an end', 'a *b and _c', 'a *b and _c'],
  ['roles vanish too', '[.path]#text# and [red]*bold*', 'text and bold'],
  ['monospace is opaque', 'Set `a b` or ``c``d; [.x]`e`.', 'Set @ or @d; @.'],
  ['also before letters and apostrophes', "The `Key`s and `Lock`'s ends", "The @s and @'s ends"],
  ['passthroughs are opaque', 'Of +a+ ++b++ +++c+++ $$d$$ pass:q[e] `+f+`', 'Of @ @ @ @ @ @'],
  ['formulas are opaque', 'Of stem:[x^2] latexmath:[y] asciimath:[z]', 'Of @ @ @'],
  ['attribute references are opaque', 'The {name} of {a-b} {counter:x}', 'The @ of @ @'],
  ['unless they stand for characters', 'a{nbsp}b{empty}c {plus} {lt}', 'a\u00A0bc + <'],
  ['curved quotation marks', 'The "`word`" and \'`it`\'', 'The “word” and ‘it’'],
  ['quotations', 'He said "`one two three four`".', 'He said <quotation:“one two three four”>.'],
  ['code in curved marks', 'Click "`+`" or "`OK`" in `x`.', 'Click “+” or “OK” in @.'],
  [
    'labels',
    'kbd:[Ctrl+C] btn:[OK] menu:File[Save > As] menu:Go[] kbd:[ A ]',
    '<uiLabel:Ctrl+C> <uiLabel:OK> <uiLabel:File Save > As> <uiLabel:Go> <uiLabel:A>',
  ],
  ['escapes', '\\*a* \\_b_ \\{c} \\`d` C:\\e', '*a* _b_ {c} `d` C:\\e'],
  ['character references', 'a &amp; b &#167; &nope;', 'a & b § &nope;'],
  ['signs', 'X(C) Y(R) Z(TM) (c)', 'X© Y® Z™ (c)'],
  ['hard breaks', 'one +\ntwo + three +', 'one two + three'],
  ['anchors vanish', 'a [[id]]b [[i,label]] c anchor:x[] d', 'a b c d'],
  ['index terms', 'a ((shown)) (((not, shown)))b indexterm:[x] indexterm2:[y] c', 'a shown b y c'],
  ['addresses are opaque', 'See https://a.b/c_d, <http://e.f> or me@x.org.', 'See @, <@> or @.'],
  ['macros of extensions are opaque', 'Of configprop:a.b[] javadoc:C[format=full]', 'Of @ @'],
  ['no macros', 'note: this [x], a:b, std::vec[0], 10:30', 'note: this [x], a:b, std::vec[0], 10:30'],
  ['footnotes are blocks of their own', 'Text.footnote:[The *note*.] More.', 'Text. More. / The note.'],
  [
    'one blank where markup stands between two',
    'a <<x, b>> c <<y,d >> e (((f))) g',
    'a <linkText:b> c <linkText:d> e g',
  ],
  ['named footnotes', 'A footnote:n[One.] b footnote:n[] footnoteref:[r,Two.]', 'A b / One. / Two.'],
  ['images', 'An image:a b.png[The view, 200] and icon:x[]', 'An @ and @ / alternativeText[alternativeText]: The view'],
  ['named alternative text', 'image:a.png[alt="A b, c"]', 'alternativeText[alternativeText]: A b, c'],
];

describe('inline AsciiDoc', () => {
  it.each(READS)('%s', (_name, text, shown) => {
    expect(inline(text)).toBe(shown);
  });

  it('has links with their targets', () => {
    expect(
      links(
        'link:a.html[one] https://b.c[two^] xref:d.adoc#e[three] <<f,four `x`>> {url}/g[five] link:h[six,role=i] ' +
          'mailto:j@k.l[seven,Subject] https://m.n["eight, nine",window=_blank] link:o[role=p] <<q>> https://r.s[]',
      ),
    ).toEqual([
      'one → a.html',
      'two → https://b.c',
      'three → d.adoc#e',
      'four \uFFFC → f',
      'five → {url}/g',
      'six → h',
      'seven → j@k.l',
      'eight, nine → https://m.n',
    ]);
  });

  it('reads images in link texts', () => {
    expect(inline('https://a.b[image:c.png[A badge] more] end')).toBe(
      '<linkText:@ more> end / alternativeText[alternativeText]: A badge',
    );
  });

  it('maps to the source across marks', () => {
    expect(sourceOf('A **b**old `x` move', 'bold', 'asciidoc')).toBe('b**old');
    expect(sourceOf('The "`word`" here', '“word”', 'asciidoc')).toBe('"`word`"');
  });
});
