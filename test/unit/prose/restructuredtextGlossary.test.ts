// reStructuredText: glossaries, languages and zones that stand in directives' options.
import { describe, expect, it } from 'vitest';
import { read } from '../../../server/src/prose/read.js';
import type { Prose } from '../../../server/src/prose/prose.js';
import { outline as outlineOf } from './reading.js';

const outline = (text: string): string[] => outlineOf(text, 'restructuredtext');
const proseOf = (text: string): Prose => read({ uri: 'file:///page', format: 'restructuredtext', text });

/** Each block's part in a glossary and its text. */
function parts(text: string): string[] {
  return proseOf(text).blocks.map(({ content }) => `${content.glossary ?? '-'}: ${content.text}`);
}

/** Each block's language and its text. */
function languages(text: string): string[] {
  return proseOf(text).blocks.map(({ content }) => `${content.language ?? '-'}: ${content.text}`);
}

describe('glossaries', () => {
  // Sphinx, "Glossary": several terms, each on a line, may stand above one definition; a grouping key may follow " : ".
  it('in the directive have one or more headwords for each definition', () => {
    const text =
      '.. glossary::\n   :sorted:\n\n   access key\n   API key : A\n      Opens the gate.\n\n      - It is secret.\n\n   passkey\n      See :term:`access key`.\n\nText.\n';
    expect(parts(text)).toEqual([
      'headword: access key',
      'headword: API key',
      'definition: Opens the gate.',
      'definition: It is secret.',
      'headword: passkey',
      'see: See access key.',
      '-: Text.',
    ]);
  });

  it('are definition lists under a title that says so, down to the next title of its level', () => {
    const text =
      'Book\n====\n\nterm\n  One.\n\nGlossary\n--------\n\nkey\n  Opens.\n\n  inner\n    Not a headword.\n\npassword\n  See *key*.\n\nMore\n~~~~\n\nlock\n  Shuts.\n\nNext\n----\n\nother\n  Two.\n';
    expect(parts(text)).toEqual([
      '-: Book',
      '-: term',
      '-: One.',
      '-: Glossary',
      'headword: key',
      'definition: Opens.',
      'definition: inner',
      'definition: Not a headword.',
      'headword: password',
      'see: See key.',
      '-: More',
      'headword: lock',
      'definition: Shuts.',
      '-: Next',
      '-: other',
      '-: Two.',
    ]);
  });

  it('tell a definition that names another entry from one that says where to read on', () => {
    const entry = (text: string) => parts(`.. glossary::\n\n   a\n      ${text}\n`)[1];
    expect(entry('See :term:`access key`')).toMatch(/^see/);
    expect(entry('See also *key*.')).toMatch(/^definition/);
    expect(entry('See the manual for details.')).toMatch(/^definition/);
    expect(entry('See the lock close.')).toMatch(/^definition/);
    expect(entry('See *key*. It opens the gate.')).toMatch(/^definition/);
    expect(entry('Opens.\n\n      See *key*.')).toMatch(/^definition/);
  });
});

describe('languages', () => {
  it('are stated in the field list at the top', () => {
    expect(proseOf('=====\nTitle\n=====\n\n:author: A\n:lang: pt_BR\n\nText.\n').language).toBe('pt-BR');
    expect(proseOf('.. comment\n\n:language: fr\n').language).toBe('fr');
    expect(proseOf('Text.\n\n:lang: fr\n').language).toBeUndefined();
    expect(proseOf('Title\n=====\n\nText.\n\n:lang: fr\n').language).toBeUndefined();
    expect(proseOf(':language: Python\n').language).toBeUndefined();
  });

  // docutils, "The Docutils Document Tree", `classes`: "language-" and a BCP 47 tag.
  it('are stated by a class, for what it holds or for the next element', () => {
    const text =
      'One.\n\n.. class:: language-fr\n\n.. a comment\n\nDeux.\n\nThree.\n\n.. class:: x language-de\n\n   Vier.\n\n   - Fünf.\n\nSix.\n\n.. note::\n   :class: language-es\n\n   Siete.\n\nEight.\n';
    expect(languages(text)).toEqual([
      '-: One.',
      'fr: Deux.',
      '-: Three.',
      'de: Vier.',
      'de: Fünf.',
      '-: Six.',
      'es: Siete.',
      '-: Eight.',
    ]);
  });

  it('are not stated for the next element by the class of another', () => {
    expect(languages('.. autoclass:: Key\n   :class: language-fr\n\nText.\n')).toEqual(['-: Text.']);
  });

  // docutils, "reStructuredText Directives", "Metadata": `:description lang=en: …`.
  it('are stated in a description', () => {
    expect(languages('.. meta::\n   :description lang=fr: Une clé.\n   :description: A key.\n')).toEqual([
      'fr: Une clé.',
      '-: A key.',
    ]);
  });
});

describe('zones', () => {
  it('of safety messages are told by an admonition’s class too', () => {
    expect(outline('.. admonition:: Take care\n   :class: warning\n\n   It is hot.\n')).toEqual([
      'caption[safetyMessage]: Take care',
      'paragraph[safetyMessage]: It is hot.',
    ]);
    expect(outline('.. admonition:: Take care\n   :class: nowarning\n\n   It is hot.\n')[1]).toBe(
      'paragraph: It is hot.',
    );
    expect(outline('.. important::\n\n   It is hot.\n')).toEqual(['paragraph: It is hot.']);
  });

  it('close over the titles of works', () => {
    expect(outline('Read :title:`The Key` now.\n')).toEqual(['paragraph: Read <quotation:The Key> now.']);
  });

  it('hold captions of code and alternative texts of images in the text', () => {
    const text =
      '.. code-block:: sh\n   :caption: Turn a key\n\n   turn key\n\n.. |k| image:: key.png\n   :alt: A brass key\n\n.. |r| replace:: no prose\n';
    expect(outline(text)).toEqual(['caption: Turn a key', 'alternativeText[alternativeText]: A brass key']);
  });
});
