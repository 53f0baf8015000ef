// Languages and what is not to be translated, in HTML and XML.
import { describe, expect, it } from 'vitest';
import type { Format } from '../../../server/src/text/sourceText.js';
import { outline, prose } from './reading.js';

const blocks = (text: string, format: Format = 'html'): string[] =>
  prose(text, format).blocks.map(({ content }) => `${content.language ?? '-'}: ${content.text}`);
const DOCBOOK = 'xmlns="http://docbook.org/ns/docbook"';

describe('the language of a page', () => {
  it('is that of its root, its body or its head, in this order', () => {
    const stated = (page: string): string | undefined => prose(page, 'html').language;
    expect(stated('<html lang="de"><body lang="fr"><p>A')).toBe('de');
    expect(stated('<html><body lang="fr"><p>A')).toBe('fr');
    expect(stated('<head><meta http-equiv="Content-Language" content="nl"></head><p>A')).toBe('nl');
    expect(stated('<html lang="de"><head><meta http-equiv="content-language" content="nl"></head><p>A')).toBe('de');
    // The HTML Standard: a list of languages states none.
    expect(stated('<head><meta http-equiv="content-language" content="nl, de"></head><p>A')).toBeUndefined();
    expect(stated('<html lang="no language"><p>A')).toBeUndefined();
    expect(stated('<html lang=""><p>A')).toBeUndefined();
    expect(prose('<topic xml:lang="en_us"><title>A</title><body><p>B</p></body></topic>', 'xml').language).toBe(
      'en-us',
    );
  });
});

describe('the language of a block', () => {
  it('is that of the innermost element that states one, where it is not the document’s', () => {
    expect(
      blocks(
        '<html lang="en"><p>One<div lang="fr"><p>Deux<p lang="de">Drei<p lang="en">Four</div><h2 lang="fr-CA">Cinq</h2><img lang=es alt="Seis"><p>Seven',
      ),
    ).toEqual(['-: One', 'fr: Deux', 'de: Drei', '-: Four', 'fr-CA: Cinq', 'es: Seis', '-: Seven']);
    expect(blocks('<p lang="">Unknown<p>Open')).toEqual(['und: Unknown', '-: Open']);
  });

  it('is stated so in DITA, DocBook and Mallard too', () => {
    expect(
      blocks(
        '<!DOCTYPE topic PUBLIC "x" "topic.dtd"><topic xml:lang="en"><title>A</title><body><p xml:lang="de">B</p><p>C</p></body></topic>',
        'xml',
      ),
    ).toEqual([...['-: A', 'de: B', '-: C']]);
    expect(
      blocks(
        `<section ${DOCBOOK} xml:lang="en"><para>A</para><note xml:lang="fr"><para>B</para></note></section>`,
        'xml',
      ),
    ).toEqual([...['-: A', 'fr: B']]);
    expect(
      blocks('<page xmlns="http://projectmallard.org/1.0/" xml:lang="en"><p>A</p><p xml:lang="cs">B</p></page>', 'xml'),
    ).toEqual(['-: A', 'cs: B']);
  });

  it('stays where a few words in it are in another, which are closed as a quotation is', () => {
    expect(
      outline('<html lang="en"><p>A <i lang="fr">mot juste</i> and <span lang="en-GB">one colour</span>.', 'html'),
    ).toEqual(['paragraph: A <quotation:mot juste> and one colour.']);
    expect(blocks('<html lang="en"><p><i lang="fr">Mot</i> juste.')).toEqual(['-: Mot juste.']);
    expect(outline(`<para ${DOCBOOK}>A <phrase xml:lang="de">ein Wort</phrase>.</para>`, 'xml')).toEqual([
      'paragraph: A <quotation:ein Wort>.',
    ]);
  });
});

describe('what is not to be translated', () => {
  it('is no prose: a unit in a text, nothing as a block', () => {
    expect(
      outline(
        '<p>The <b translate="no">Main Gate</b> opens, <i class="x notranslate">so</i> it is.<div translate=no><p>No</div><p translate="yes">Yes',
        'html',
      ),
    ).toEqual([...['paragraph: The @ opens, @ it is.', 'paragraph: Yes']]);
    expect(
      outline(
        `<section ${DOCBOOK} xmlns:its="http://www.w3.org/2005/11/its"><para>The <phrase its:translate="no">Gate</phrase>.</para><para translate="no">No</para></section>`,
        'xml',
      ),
    ).toEqual(['paragraph: The @.']);
  });

  it('is read where the whole page says so, which keeps a browser from offering to', () => {
    expect(blocks('<html translate="no"><body class="notranslate"><p>Yes')).toEqual(['-: Yes']);
  });
});

describe('elements that hold code by their names', () => {
  it('are no prose', () => {
    expect(
      outline(
        '<p>Run <x-code>a b</x-code> now.<code-block>no</code-block><x-terminal><p>no</x-terminal><my-note>Yes</my-note>',
        'html',
      ),
    ).toEqual([...['paragraph: Run @ now.', 'paragraph: Yes']]);
  });
});

describe('entities that a document defines', () => {
  it('are read where they stand for a character', () => {
    const page =
      '<!DOCTYPE article [<!ENTITY eacute "&#233;"><!ENTITY mdash "&#38;#8212;"><!ENTITY zcaron \'ž\'><!ENTITY prod "Evenword"><!ENTITY lt "&#38;#60;">]>' +
      `<article ${DOCBOOK}><para>caf&eacute; &mdash; &zcaron; &prod; &lt;</para></article>`;
    expect(outline(page, 'xml')).toEqual(['paragraph: café — ž @ <']);
  });

  // XML 1.0, section 4.2: of several declarations of one entity the first is binding.
  it('are what they are first declared to be', () => {
    const page =
      '<!DOCTYPE article [<!ENTITY a "é"><!ENTITY a "ž"><!ENTITY b "Evenword"><!ENTITY b "x">]>' +
      `<article ${DOCBOOK}><para>caf&a; &b; now</para></article>`;
    expect(outline(page, 'xml')).toEqual(['paragraph: café @ now']);
  });
});
