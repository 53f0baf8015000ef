// AsciiDoc: glossaries, lists of questions, languages, labels of menus.
import { describe, expect, it } from 'vitest';
import type { Prose } from '../../../server/src/prose/prose.js';
import { read } from '../../../server/src/prose/read.js';
import { outline as outlineOf } from './reading.js';

const outline = (text: string): string[] => outlineOf(text, 'asciidoc');
const proseOf = (text: string): Prose => read({ uri: 'file:///page', format: 'asciidoc', text });

/** Each block's part in a glossary and its text. */
function parts(text: string): string[] {
  return proseOf(text).blocks.map(({ content }) => `${content.glossary ?? '-'}: ${content.text}`);
}

/** Each block's language and its text. */
function languages(text: string): string[] {
  return proseOf(text).blocks.map(({ content }) => `${content.language ?? '-'}: ${content.text}`);
}

describe('glossaries', () => {
  // AsciiDoc documentation, "Glossary": the style `glossary` on a section and on a description list.
  it('are lists of terms in a section or of the style that says so', () => {
    const text =
      '== Terms of trade\n\nmud:: Soft.\n\n[glossary]\nmast:: A pole.\n\nText.\n\n[glossary]\n== Words\n\nkey::\nAPI key::\n  Opens the gate.\n+\nIt is secret.\n\n* A bullet.\n\npasskey:: See <<key,key>>.\nlock:: See also *key*.\ninner::: Not a headword.\n\nText.\n\nbolt:: Shuts.\n\n=== More\n\nbar:: Bars.\n\n== Next\n\nother:: Two.\n';
    expect(parts(text)).toEqual([
      '-: Terms of trade',
      '-: mud',
      '-: Soft.',
      'headword: mast',
      'definition: A pole.',
      '-: Text.',
      '-: Words',
      'headword: key',
      'headword: API key',
      'definition: Opens the gate.',
      'definition: It is secret.',
      'definition: A bullet.',
      'headword: passkey',
      'see: See key.',
      'headword: lock',
      'definition: See also key.',
      'definition: inner',
      'definition: Not a headword.',
      '-: Text.',
      'headword: bolt',
      'definition: Shuts.',
      '-: More',
      'headword: bar',
      'definition: Bars.',
      '-: Next',
      '-: other',
      '-: Two.',
    ]);
  });

  it('are told by a title, of a section or of the page', () => {
    expect(parts('== Glossary\n\nkey:: Opens.\n\n--\nText.\n--\n')).toEqual([
      '-: Glossary',
      'headword: key',
      'definition: Opens.',
      '-: Text.',
    ]);
    expect(parts('= Terminology\n\n== K\n\nkey:: Opens.\n')).toEqual([
      '-: Terminology',
      '-: K',
      'headword: key',
      'definition: Opens.',
    ]);
  });

  it('hold blocks that are attached to a definition', () => {
    expect(parts('[glossary]\nkey:: Opens.\n+\n[NOTE]\n====\nMind it.\n====\nlock:: Shuts.\n')).toEqual([
      'headword: key',
      'definition: Opens.',
      'definition: Mind it.',
      'headword: lock',
      'definition: Shuts.',
    ]);
  });
});

describe('lists of questions', () => {
  // AsciiDoc documentation, "Question and Answer Lists".
  it('define no terms', () => {
    expect(
      outline('[qanda]\nWhat is a key?::\n  It opens.\nWhy?:: Because.\n\nkey:: Opens.\n\nText.\n\nkey:: Opens.\n'),
    ).toEqual([
      'paragraph: What is a key?',
      'paragraph: It opens.',
      'paragraph: Why?',
      'paragraph: Because.',
      'paragraph: key',
      'paragraph: Opens.',
      'paragraph: Text.',
      'definedTerm[definedTerm]: key',
      'definition: Opens.',
    ]);
  });
});

describe('labels', () => {
  // AsciiDoc documentation, "UI Macros": menu, submenu and item between double quotation marks.
  it('are paths through menus in quotation marks', () => {
    expect(outline('Choose "File > Save all" now. Is "a" > "b" or "a>b"?\n')).toEqual([
      'paragraph: Choose <uiLabel:File > Save all> now. Is "a" > "b" or "a>b"?',
    ]);
  });
});

describe('languages', () => {
  it('are stated by the document’s attribute', () => {
    expect(proseOf('= T\n:lang: pt_BR\n\nText.\n').language).toBe('pt-BR');
    expect(proseOf('= T\n:lang: {other}\n\nText.\n').language).toBeUndefined();
  });

  it('are stated for a block, and hold in it', () => {
    const text =
      '[lang=fr]\nUne clé.\n\nA key.\n\n[quote,lang="de"]\n____\nEin Schlüssel.\n\n* Und Schloss.\n____\n\n[source,lang=sh]\n----\nno prose\n----\n\n[lang=es]\n* Uno.\n* Dos.\n\nThree.\n';
    expect(languages(text)).toEqual([
      'fr: Une clé.',
      '-: A key.',
      'de: Ein Schlüssel.',
      'de: Und Schloss.',
      'es: Uno.',
      'es: Dos.',
      '-: Three.',
    ]);
  });
});
