// XML: DITA, DocBook, Mallard, XHTML and other vocabularies, recognised and read.
import { describe, expect, it } from 'vitest';
import { read } from '../../../server/src/prose/read.js';
import { outline, prose, sourceOf } from './reading.js';

const xml = (text: string): string[] => outline(text, 'xml');
const DOCBOOK = 'xmlns="http://docbook.org/ns/docbook" xmlns:xlink="http://www.w3.org/1999/xlink"';
const docbook = (body: string): string[] => xml(`<section ${DOCBOOK}>${body}</section>`);
const CONCEPT = '<!DOCTYPE concept PUBLIC "-//OASIS//DTD DITA Concept//EN" "concept.dtd">';
const dita = (body: string): string[] => xml(`${CONCEPT}<concept id="a"><conbody>${body}</conbody></concept>`);
const mallard = (body: string): string[] => xml(`<page xmlns="http://projectmallard.org/1.0/" id="a">${body}</page>`);

describe('DITA', () => {
  it('has titles by depth, short descriptions and titles for lists', () => {
    expect(
      xml(
        `<?xml version="1.0"?>\n${CONCEPT}<concept id="a" xml:lang="en-us"><title>Keys</title><titlealts><navtitle>All keys</navtitle>` +
          '</titlealts><shortdesc>What keys do.</shortdesc><prolog><author>No One</author></prolog><conbody><section><title>Use</title>' +
          '<p>Turn it.</p><fig><title>A key</title></fig></section></conbody><concept id="b"><title>Locks</title></concept></concept>',
      ),
    ).toEqual([
      ...[
        'heading1[heading]: Keys',
        'title[frontMatter]: All keys',
        'paragraph: What keys do.',
        'heading2[heading]: Use',
      ],
      ...['paragraph: Turn it.', 'caption: A key', 'heading2[heading]: Locks'],
    ]);
    expect(prose(`${CONCEPT}<concept xml:lang="en-us"><title>A</title></concept>`, 'xml').language).toBe('en-us');
  });

  it('has steps, choices, definitions and cells', () => {
    expect(
      dita(
        '<steps><step><cmd>Turn the <uicontrol>Main</uicontrol> key.</cmd><info>It clicks.</info></step></steps>' +
          '<dl><dlentry><dt>key</dt><dd>It opens.</dd></dlentry></dl><parml><plentry><pt>--force</pt><pd>Turns it.</pd></plentry></parml>' +
          '<simpletable><strow><stentry>a cell</stentry></strow></simpletable><p>Before<ul><li>item</li></ul>after</p>',
      ),
    ).toEqual([
      ...['listItem: Turn the <uiLabel:Main> key.', 'listItem: It clicks.', 'definedTerm[definedTerm]: key'],
      ...['definition: It opens.', 'definition: Turns it.', 'tableCell[tableCell]: a cell', 'paragraph: Before'],
      ...['listItem: item', 'paragraph: after'],
    ]);
  });

  it('has safety messages by the type of a note', () => {
    expect(
      dita(
        '<note type="warning">Hot.</note><note type="tip">Cold.</note><note>Plain.</note><note type="caution"><p>Wet.</p></note>',
      ),
    ).toEqual([
      'paragraph[safetyMessage]: Hot.',
      'paragraph: Cold.',
      'paragraph: Plain.',
      'paragraph[safetyMessage]: Wet.',
    ]);
    expect(
      dita(
        '<hazardstatement type="danger"><messagepanel><typeofhazard>Voltage</typeofhazard></messagepanel></hazardstatement>',
      ),
    ).toEqual(['paragraph[safetyMessage]: Voltage']);
  });

  it('has code, empty references and pictures as opaque units, and index terms not at all', () => {
    expect(
      dita(
        '<p>Run <codeph>a</codeph> in <filepath>/b</filepath>; see <xref href="c.dita"/><indexterm>keys<indexterm>main</indexterm></indexterm>' +
          ' or <xref href="d.dita">the <term>lock</term></xref>. <image href="e.png"><alt>A lock</alt></image> <q>So</q> <ph>it</ph> <cite>is</cite>.</p>',
      ),
    ).toEqual([
      'paragraph: Run @ in @; see @ or <linkText:the ><linkText+definedTerm:lock>. @ <quotation:So> it <quotation:is>.',
      'alternativeText[alternativeText]: A lock',
    ]);
    expect(dita('<p>The <ph keyref="product"/> server, <keyword conkeyref="a/b"></keyword> or <b/>none.</p>')).toEqual([
      'paragraph: The @ server, @ or none.',
    ]);
    expect(dita('<codeblock>x <b>y</b></codeblock><draft-comment>Not yet</draft-comment><p>Text</p>')).toEqual([
      'paragraph: Text',
    ]);
  });

  it('has the steps through a menu apart, and footnotes as blocks of their own', () => {
    expect(
      dita(
        '<p>Choose <menucascade><uicontrol>File</uicontrol><uicontrol>Save as</uicontrol></menucascade><fn>It saves.</fn> now.</p>',
      ),
    ).toEqual(['paragraph: Choose <uiLabel:File Save as> now.', 'paragraph: It saves.']);
  });

  it('keeps names with a trademark sign closed', () => {
    expect(dita('<p>The <tm tmtype="reg">Main Gate</tm> key.</p>')).toEqual([
      'paragraph: The <quotation:Main Gate> key.',
    ]);
    expect(docbook('<para>The <trademark class="registered">Main Gate</trademark> key.</para>')).toEqual([
      'paragraph: The <quotation:Main Gate> key.',
    ]);
  });

  it('is no prose in maps', () => {
    expect(xml('<!DOCTYPE map PUBLIC "-//OASIS//DTD DITA Map//EN" "map.dtd"><map><title>Book</title></map>')).toEqual(
      [],
    );
  });

  it('reads elements of other specialisations by what they lie in', () => {
    expect(dita('<mysection><p>One <myphrase>big</myphrase> key.</p></mysection>')).toEqual([
      'paragraph: One big key.',
    ]);
  });
});

describe('DocBook', () => {
  it('has headings, captions and metadata by what they are of', () => {
    expect(
      xml(
        `<?xml version="1.0"?><!-- <para>no</para> --><book ${DOCBOOK}><info><title>Keys</title><author><personname>N. O.</personname></author>` +
          '<abstract><para>In short.</para></abstract></info><chapter><title>Main keys</title><figure><title>A key</title></figure>' +
          '<sect1><title>Use</title><bridgehead>Then</bridgehead><note><title>Mind</title><para>It turns.</para></note></sect1></chapter></book>',
      ),
    ).toEqual([
      ...['heading1[heading]: Keys', 'paragraph: In short.', 'heading2[heading]: Main keys', 'caption: A key'],
      ...['heading3[heading]: Use', 'heading3[heading]: Then', 'caption: Mind', 'paragraph: It turns.'],
    ]);
  });

  it('has lists, steps, terms, glossaries and cells', () => {
    expect(
      docbook(
        '<itemizedlist><listitem><para>item</para></listitem></itemizedlist><procedure><title>Do</title><step><para>Turn.</para></step></procedure>' +
          '<variablelist><varlistentry><term>key</term><listitem><para>It opens.</para></listitem></varlistentry></variablelist>' +
          '<glossary><glossentry><glossterm>lock</glossterm><glossdef><para>It keeps <glossterm>keys</glossterm>.</para></glossdef></glossentry></glossary>' +
          '<informaltable><tgroup><tbody><row><entry>cell</entry></row></tbody></tgroup></informaltable>',
      ),
    ).toEqual([
      ...['listItem: item', 'caption: Do', 'listItem: Turn.', 'definedTerm[definedTerm]: key', 'definition: It opens.'],
      ...['definedTerm[definedTerm]: lock', 'definition: It keeps <definedTerm:keys>.', 'tableCell[tableCell]: cell'],
    ]);
  });

  it('has zones, opaque units and links', () => {
    expect(
      docbook(
        '<para>Run <command>a</command>, choose <menuchoice><guimenu>File</guimenu> <guimenuitem>Save</guimenuitem></menuchoice>, see ' +
          '<xref linkend="b"/>, <link xlink:href="c">the <quote>site</quote></link> &product; <indexterm><primary>x</primary></indexterm>and<footnote>' +
          '<para>Or not.</para></footnote> go.</para><warning><para>Hot.</para></warning><screen>no <emphasis>prose</emphasis></screen>' +
          '<blockquote><para>Said.</para></blockquote><mediaobject><imageobject><imagedata/></imageobject><textobject><phrase>A mast</phrase>' +
          '</textobject></mediaobject>',
      ),
    ).toEqual([
      'paragraph: Run @, choose <uiLabel:File Save>, see @, <linkText:the ><quotation+linkText:site> @ and go.',
      ...['paragraph: Or not.', 'paragraph[safetyMessage]: Hot.', 'paragraph[quotation]: Said.'],
      'alternativeText[alternativeText]: A mast',
    ]);
  });

  it('is read with a prefix, and by its document type alone', () => {
    expect(
      xml(
        '<d:article xmlns:d="http://docbook.org/ns/docbook" xmlns:m="urn:m"><d:glossentry><d:glossterm>key</d:glossterm></d:glossentry><m:para>no</m:para></d:article>',
      ),
    ).toEqual(['definedTerm[definedTerm]: key']);
    expect(
      xml(
        '<!DOCTYPE article PUBLIC "-//OASIS//DTD DocBook XML V4.5//EN" "docbookx.dtd"><article><para>See <ulink url="a">b c</ulink></para></article>',
      ),
    ).toEqual(['paragraph: See <linkText:b c>']);
  });
});

describe('Mallard', () => {
  it('has pages, terms, notes and interface labels', () => {
    expect(
      mallard(
        '<info><desc>What keys do.</desc><credit><name>No One</name></credit></info><title>Keys</title><p>Press <gui>Save</gui> or ' +
          '<keyseq><key>Ctrl</key><key>S</key></keyseq>; run <cmd>a</cmd>; see <link xref="b"/>.</p><note style="warning"><p>Hot.</p></note>' +
          '<terms><item><title>key</title><p>It opens.</p></item></terms><steps><item><p>Turn.</p></item></steps><screen>no</screen>' +
          '<section><title>Locks</title></section>',
      ),
    ).toEqual([
      ...['description[frontMatter]: What keys do.', 'heading1[heading]: Keys'],
      'paragraph: Press <uiLabel:Save> or <uiLabel:Ctrl S>; run @; see @.',
      ...[
        'paragraph[safetyMessage]: Hot.',
        'definedTerm[definedTerm]: key',
        'definition: It opens.',
        'listItem: Turn.',
      ],
      'heading2[heading]: Locks',
    ]);
  });
});

describe('other XML', () => {
  it('is XHTML by its root', () => {
    expect(
      xml(
        '<html xmlns="http://www.w3.org/1999/xhtml"><head><title>A</title></head><body><p>B<br/>c &nbsp;<img alt="D"/></p></body></html>',
      ),
    ).toEqual([...['title[frontMatter]: A', 'paragraph: B c \u00A0@', 'alternativeText[alternativeText]: D']]);
  });

  it('is no prose in files of data and settings', () => {
    const data = [
      '<project name="a"><description>Builds it all</description><target name="b"><echo>Done</echo></target></project>',
      '<project xmlns="http://maven.apache.org/POM/4.0.0"><name>A name</name><description>What it is</description></project>',
      '<rss><channel><title>News</title><item><title>One</title><description>Long text</description></item></channel></rss>',
      '<resources><string name="a">Press the key</string></resources>',
      '<task><title>Call</title></task>',
      '<svg xmlns="http://www.w3.org/2000/svg"><title>Mast</title><text>Mast</text></svg>',
    ];
    expect(data.flatMap(xml)).toEqual([]);
  });

  it('is prose in paragraphs of vocabularies that are not known', () => {
    expect(
      xml(
        '<document><properties><owner>No One</owner></properties><body><section><title>Keys</title><p>A <big>main</big> key, <code>x</code>.</p><source>no</source></section></body></document>',
      ),
    ).toEqual(
      ['heading4[heading]: Keys', 'paragraph: A main key, @.'].map((line) => line.replace('heading4', 'heading3')),
    );
  });

  it('has CDATA, character references, entities of the document and of nobody', () => {
    expect(
      xml(
        '<!DOCTYPE article [\n<!-- ]> -->\n<!ENTITY prod "<para>Some > product</para>">\n<!ENTITY % x SYSTEM "x">\n%x;\n]>\n' +
          `<article ${DOCBOOK}><para>A &prod; and &other; &amp; &lt; &eacute;&#233; &mdash; &prod<![CDATA[ a & <b> ]]>&smt; &hellip;</para></article>`,
      ),
    ).toEqual(['paragraph: A @ and @ & < éé — &prod a & <b> @ …']);
    expect(docbook('<para>one<![CDATA[]]>two, &#10;three</para>')).toEqual(['paragraph: onetwo, three']);
    const text = `<article ${DOCBOOK}><para>One <![CDATA[two < three]]> four</para></article>`;
    expect(sourceOf(text, 'two < three', 'xml')).toBe('two < three');
  });

  it('is taken for a topic or a page by the name of its file', () => {
    const blocks = (uri: string, text: string): number => read({ uri, format: 'xml', text }).blocks.length;
    expect(blocks('file:///a.dita', '<topic><title>Keys</title></topic>')).toBe(1);
    expect(blocks('file:///a.xml', '<topic><title>Keys</title></topic>')).toBe(0);
    expect(blocks('file:///a.page', '<page><title>Keys</title></page>')).toBe(1);
    expect(blocks('file:///a.xml', '<page><title>Keys</title></page>')).toBe(0);
  });

  it('is read as far as it goes where it is broken', () => {
    expect(docbook('<para>one <emphasis>two</para><para>three</wrong> four</para>')).toEqual([
      ...['paragraph: one two', 'paragraph: three four'],
    ]);
    expect(xml('')).toEqual([]);
    expect(xml('<!DOCTYPE a [ <!ENTITY b "')).toEqual([]);
    expect(xml('text without markup')).toEqual([]);
  });
});
