// AsciiDoc by construct: which blocks a document has, in which zones, and what of its lines is text.
import { describe, expect, it } from 'vitest';
import { read, reread, startReading } from '../../../server/src/prose/read.js';
import { prose, sourceOf, outline as outlineOf } from './reading.js';

const outline = (text: string): string[] => outlineOf(text, 'asciidoc');

describe('the header', () => {
  it('is a title, lines of author and revision, and attributes', () => {
    const text =
      '// a comment\n:toc:\n= The *Guide*\nJane Q. Doe <jane@x.org>; Bob Roe\nv1.2, 2020-01-01: First\n:lang: de\n\nBody.';
    expect(outline(text)).toEqual(['heading1[heading]: The Guide', 'paragraph: Body.']);
    expect(prose(text, 'asciidoc').language).toBe('de');
  });

  it('takes a line of text below a title for text', () => {
    expect(outline('= Roles\nRoles are names for groups of rights.')).toEqual([
      'heading1[heading]: Roles',
      'paragraph: Roles are names for groups of rights.',
    ]);
  });

  it('may stand behind front matter', () => {
    expect(outline('---\ntitle: The page\n---\n= A title\n\nBody.')).toEqual([
      'title[frontMatter]: The page',
      'heading1[heading]: A title',
      'paragraph: Body.',
    ]);
  });
});

describe('lines that are no prose', () => {
  it('are attribute entries with all their lines, comments, includes and directives', () => {
    const text =
      ':name: a value \\\n  that goes on\n:!unset:\n// comment\n////\nblock\n\ncomment\n////\ninclude::a.adoc[]\n' +
      'ifdef::x,y[]\nOne\n// within\nline.\nendif::[]\nifndef::z[Short form.]\nifeval::["{a}" == "b"]\nTwo.\nendif::[]';
    expect(outline(text)).toEqual(['paragraph: One line. Short form. Two.']);
  });

  it('are block attributes, anchors, breaks and block macros', () => {
    expect(outline("[[anchor]]\n[.lead,cols=2]\nText.\n\n'''\n\n<<<\n\n---\n\ntoc::[]\n\nvideo::a.mp4[]")).toEqual([
      'paragraph: Text.',
    ]);
  });

  it('are escaped directives only from the backslash on', () => {
    expect(outline('\\include::a.adoc[]')).toEqual(['paragraph: include::a.adoc[]']);
  });
});

describe('titles', () => {
  it('have levels, in both forms', () => {
    const text = '== Two ==\n\n=== Three `x`\n\nUnderlined\n----------\n\n[discrete]\n==== Four\n\n## Two again';
    expect(outline(text)).toEqual([
      'heading2[heading]: Two',
      'heading3[heading]: Three @',
      'heading2[heading]: Underlined',
      'heading4[heading]: Four',
      'heading2[heading]: Two again',
    ]);
  });

  it('of blocks are captions', () => {
    expect(outline('.The _output_\n----\ncode\n----')).toEqual(['caption: The output']);
  });
});

describe('blocks', () => {
  it('of code, literals, passthroughs and indented lines are not read', () => {
    const text =
      '----\na\n----\n\n....\nb\n....\n\n++++\nc\n++++\n\n```js\nd\n```\n\n[source,js]\n--\ne\n--\n\n[source]\nf\ng\n\n[,ruby]\nh\n\n' +
      ' i\nj\n\n[stem]\n++++\nk\n++++\n\n[plantuml]\n--\nl\n--\n\nText.';
    expect(outline(text)).toEqual(['paragraph: Text.']);
  });

  it('that hold blocks are read', () => {
    expect(outline('====\nOne.\n\n****\nTwo.\n****\n====\n\n--\nThree.\n--\n\n[abstract]\nFour.')).toEqual([
      'paragraph: One.',
      'paragraph: Two.',
      'paragraph: Three.',
      'paragraph: Four.',
    ]);
  });

  it('of quotations and verse are quotations', () => {
    const text =
      '____\nOne.\n____\n\n[quote, Somebody, A book]\nTwo.\n\n[verse]\n____\nThree\n____\n\n> Four\n> five\n\n"Six\nseven"\n-- Somebody';
    expect(outline(text)).toEqual([
      'paragraph[quotation]: One.',
      'paragraph[quotation]: Two.',
      'paragraph[quotation]: Three',
      'paragraph[quotation]: Four five',
      'paragraph[quotation]: "Six seven"',
    ]);
  });

  it('of warning have titles that are safety messages, whatever stands first', () => {
    const block = '====\nSwitch it off.\n====\n';
    const shown = ['caption[safetyMessage]: High voltage', 'paragraph[safetyMessage]: Switch it off.'];
    expect(outline(`[CAUTION]\n.High voltage\n${block}`)).toEqual(shown);
    expect(outline(`.High voltage\n[#v]\n[CAUTION]\n${block}`)).toEqual(shown);
    expect(outline(`.High voltage\n[NOTE]\n${block}`)[0]).toBe('caption: High voltage');
  });

  // Asciidoctor takes an indented paragraph for a literal only where no style stands above it.
  it('that are indented below a style are what the style says', () => {
    expect(outline('[WARNING]\n   Mind the\n   gap.\n\n[.lead]\n  code\n\n  code\n')).toEqual([
      'paragraph[safetyMessage]: Mind the gap.',
    ]);
  });

  it('of warning are safety messages; notes are not', () => {
    const text =
      'WARNING: Hot.\n\nNOTE: Cold.\n\n[CAUTION]\n====\nWet.\n\n* Ice\n====\n\n[WARNING]\nDry.\n\n[TIP]\n--\nMild.\n--';
    expect(outline(text)).toEqual([
      'paragraph[safetyMessage]: Hot.',
      'paragraph: Cold.',
      'paragraph[safetyMessage]: Wet.',
      'listItem[safetyMessage]: Ice',
      'paragraph[safetyMessage]: Dry.',
      'paragraph: Mild.',
    ]);
  });

  it('that nothing closes reach to the end, and a problem says so', () => {
    const { blocks, problems } = prose('Text.\n\n----\ncode\n\nmore', 'asciidoc');
    expect(blocks.length).toBe(1);
    expect(problems).toEqual([{ span: { start: 7, end: 11 }, message: expect.stringContaining('closes') as string }]);
  });

  it('end a paragraph without a blank line', () => {
    expect(outline('Some text:\n----\nx\n----\n[NOTE]\nTwo.')).toEqual(['paragraph: Some text:', 'paragraph: Two.']);
    expect(outline('One sentence here:\n* a star\n----\nx\n----\nTwo.')).toEqual([
      'paragraph: One sentence here: * a star',
      'paragraph: Two.',
    ]);
  });
});

describe('lists', () => {
  it('have items with marks of all kinds', () => {
    const text =
      '* one\n  goes on\n** two\n- three\n\n. four\n.. five\n\n1. six\na. seven\n\n* [x] eight\n* [ ] nine\n\n<1> ten\n<.> eleven';
    expect(outline(text).map((line) => line.replace('listItem: ', ''))).toEqual([
      'one goes on',
      'two',
      'three',
      'four',
      'five',
      'six',
      'seven',
      'eight',
      'nine',
      'ten',
      'eleven',
    ]);
  });

  it('go on behind a plus sign', () => {
    const text =
      '* one\n+\ntwo\n+\n----\ncode\n----\n+\n====\nthree\n====\n* four\n\nfive\n\n* six\n\n  literal\n\n+\nseven';
    expect(outline(text)).toEqual([
      'listItem: one',
      'listItem: two',
      'listItem: three',
      'listItem: four',
      'paragraph: five',
      'listItem: six',
      'listItem: seven',
    ]);
  });

  it('of descriptions define terms', () => {
    const text =
      '[glossary]\nkey:: opens\nlock::\n  is opened\nbolt:: bar::: closes\n\nhinge::\n\nTurns.\n+\nMore.\n\nrail;; guides';
    expect(outline(text)).toEqual([
      'definedTerm[definedTerm]: key',
      'definition: opens',
      'definedTerm[definedTerm]: lock',
      'definition: is opened',
      'definedTerm[definedTerm]: bolt',
      'definition: bar::: closes',
      'definedTerm[definedTerm]: hinge',
      'definition: Turns.',
      'definition: More.',
      'definedTerm[definedTerm]: rail',
      'definition: guides',
    ]);
  });

  it('do not begin inside a paragraph', () => {
    expect(outline('Text with\n* a star\nand std::vector here')).toEqual([
      'paragraph: Text with * a star and std::vector here',
    ]);
  });
});

describe('tables', () => {
  it('have cells, with specifications, over lines', () => {
    const text =
      '.Title\n[%header,cols="1,2"]\n|===\n|A |B\n2+^.>s|wide\n|one\ntwo\n\nthree | a \\| b\n// comment\n3*|same\n|===';
    expect(outline(text)).toEqual([
      'caption: Title',
      ...['A', 'B', 'wide', 'one two', 'three', 'a | b', 'same'].map((cell) => `tableCell[tableCell]: ${cell}`),
    ]);
  });

  it('read blocks in cells of style a, leave out code cells, and know the styles of columns', () => {
    const text =
      '[cols="1a,1m,1"]\n|===\n|H |I |J\n\n|* item\n\n----\ncode\n----\n|code |text\na|NOTE: Hear.\nl|literal |*last*\n|===';
    expect(outline(text)).toEqual([
      'tableCell[tableCell]: H',
      'tableCell[tableCell]: I',
      'tableCell[tableCell]: J',
      'listItem[tableCell]: item',
      'tableCell[tableCell]: text',
      'tableCell[tableCell]: Hear.',
      'tableCell[tableCell]: last',
    ]);
  });

  it('nest, and of other separators are left out', () => {
    expect(
      outline('|===\na|\n!===\n!one !two\n!===\n|===\n\n,===\na,b\n,===\n\n[format=csv]\n|===\nc,d\n|==='),
    ).toEqual(['tableCell[tableCell]: one', 'tableCell[tableCell]: two']);
  });
});

describe('reading again', () => {
  it('keeps the contents of blocks that are left alone', () => {
    const source = (text: string) => ({ uri: 'file:///a.adoc', format: 'asciidoc' as const, text });
    const before = startReading(source('= A\n\nOne.\n\n* two\n\nThree.'));
    const after = reread(before, source('= A\n\nOne.\n\n* two and more\n\nThree.'));
    expect(after.prose).toEqual(read(after.source));
    expect(after.prose.blocks[1]!.content).toBe(before.prose.blocks[1]!.content);
    expect(after.prose.blocks[3]!.content).toBe(before.prose.blocks[3]!.content);
  });

  it('maps every line of a paragraph to the source', () => {
    expect(sourceOf('* one\r\n  two\r\n// no\r\n  *three* 🙂 four', 'one two three 🙂 four', 'asciidoc')).toBe(
      'one\r\n  two\r\n// no\r\n  *three* 🙂 four',
    );
  });
});
