// reStructuredText: blocks, zones and the map back to the source, one construct at a time.
import { describe, expect, it } from 'vitest';
import { outline as outlineOf, prose, sourceOf } from './reading.js';

const outline = (text: string): string[] => outlineOf(text, 'restructuredtext');

describe('titles', () => {
  it('get their levels in the order in which their adornments appear', () => {
    expect(outline('===\nOne\n===\n\nTwo\n---\n\nThree\n~~~~~\n\nTwo again\n---------\n\nText.\n')).toEqual([
      'heading1[heading]: One',
      'heading2[heading]: Two',
      'heading3[heading]: Three',
      'heading2[heading]: Two again',
      'paragraph: Text.',
    ]);
  });

  it('are not dividers, nor what a short line stands under', () => {
    expect(outline('One\n\n----\n\nTwo words\n--\n\nThree\n')).toEqual([
      'paragraph: One',
      'paragraph: Two words --',
      'paragraph: Three',
    ]);
  });

  it('may be wide', () => expect(outline('漢字の\n======\n')).toEqual(['heading1[heading]: 漢字の']));
});

describe('lists', () => {
  it('hold items, nested bodies and paragraphs that go on', () => {
    expect(outline('- one\n  goes on\n\n  more\n\n  1. inner\n  #. next\n- two\n\n(a) three\n\n*\n  four\n')).toEqual([
      'listItem: one goes on',
      'listItem: more',
      'listItem: inner',
      'listItem: next',
      'listItem: two',
      'listItem: three',
      'listItem: four',
    ]);
  });

  it('do not begin where a line merely looks like an item', () => {
    expect(outline('A. Einstein was a\nphysicist in\n1905. He wrote.\n')).toEqual([
      'paragraph: A. Einstein was a physicist in 1905. He wrote.',
    ]);
  });

  it('are definitions of terms, without their classifiers', () => {
    expect(
      outline(
        'access key : string\n  Opens the gate.\n\n  And more.\n\nThis line is no term.\n  Indented.\n\nlint: finds faults\n  Indented.\n',
      ),
    ).toEqual([
      'definedTerm[definedTerm]: access key',
      'definition: Opens the gate.',
      'definition: And more.',
      'paragraph: This line is no term.',
      'definition: Indented.',
      'paragraph: lint: finds faults',
      'definition: Indented.',
    ]);
  });

  it('are fields, whose names and data are no prose', () => {
    expect(
      outline(':Author: Some Body\n:Summary: What it *does*\n  and how.\n:param int x: the width\n:type x: int\n'),
    ).toEqual(['listItem: What it does and how.', 'listItem: the width']);
  });

  it('are options with descriptions', () => {
    expect(outline('-a         All of them\n--long=FILE  Write to\n           a file\n-1 is a number\n')).toEqual([
      'listItem: All of them',
      'listItem: Write to a file',
      'paragraph: -1 is a number',
    ]);
  });
});

describe('literal matter', () => {
  it('is no prose, and the colon before it stays', () => {
    const text = 'Type this::\n\n  code\n\n  more code\n\nThen ::\n\n  code\n\n::\n\n> quoted code\n> here\n\nEnd\n';
    expect(outline(text)).toEqual(['paragraph: Type this:', 'paragraph: Then', 'paragraph: End']);
  });

  it('is taken for such where no blank line stands before it', () => {
    expect(outline('Type this::\n   code\n\nEnd\n')).toEqual(['paragraph: Type this:', 'paragraph: End']);
  });

  it('is a doctest block', () => expect(outline('>>> 1 + 1\n2\n\nEnd\n')).toEqual(['paragraph: End']));
});

describe('quotations', () => {
  it('say whom they quote; mere indentation is layout', () => {
    expect(
      outline('Text\n\n  Wise words.\n\n  -- Somebody\n\n* a\n\n  Indented.\n\n.. epigraph::\n\n   Old words.\n'),
    ).toEqual([
      'paragraph: Text',
      'paragraph[quotation]: Wise words.',
      'listItem: a',
      'listItem: Indented.',
      'paragraph[quotation]: Old words.',
    ]);
  });
});

it('reads line blocks line by line', () => {
  expect(outline('| one\n  goes on\n| *two*\n|\n| three\n')).toEqual([
    'paragraph: one goes on',
    'paragraph: two',
    'paragraph: three',
  ]);
});

describe('directives', () => {
  it('are admonitions, of which some warn of harm', () => {
    const text =
      '.. note:: Mind it.\n   Well.\n\n   - one\n\n.. Warning::\n   :class: big\n\n   Stop.\n\n.. admonition:: Caution\n\n   Hot.\n';
    expect(outline(text)).toEqual([
      'paragraph: Mind it. Well.',
      'listItem: one',
      'paragraph[safetyMessage]: Stop.',
      'caption[safetyMessage]: Caution',
      'paragraph[safetyMessage]: Hot.',
    ]);
  });

  it('read a literal block that the first line announces', () => {
    expect(outline('.. note:: Type::\n\n     code\n\n   End.\n')).toEqual(['paragraph: Type:', 'paragraph: End.']);
  });

  it('are versions with text', () => {
    expect(outline('.. versionadded:: 2.1 The new\n   option.\n\n   More.\n\n.. deprecated:: 3.0\n')).toEqual([
      'paragraph: The new option.',
      'paragraph: More.',
    ]);
  });

  it('are figures with captions and alternative texts', () => {
    expect(
      outline('.. figure:: a.png\n   :alt: The old mast\n   :width: 3\n\n   The *mast*.\n\n.. image:: b.png\n'),
    ).toEqual(['alternativeText[alternativeText]: The old mast', 'caption: The mast.']);
  });

  it('are tables of contents with captions, tabs and topics with titles', () => {
    const text =
      '.. toctree::\n   :caption: First steps\n\n   intro\n   More <more>\n\n.. tab:: Linux\n\n   Install it.\n\n.. rubric:: Notes\n';
    expect(outline(text)).toEqual([
      'caption: First steps',
      'caption: Linux',
      'paragraph: Install it.',
      'heading6[heading]: Notes',
    ]);
  });

  it('describe objects', () => {
    expect(outline('.. py:function:: f(a)\n   g(b)\n\n   Draws a line.\n\n   :param a: the line\n')).toEqual([
      'paragraph: Draws a line.',
      'listItem: the line',
    ]);
  });

  it('hold code, raw matter and data that are no prose', () => {
    const names = ['code-block:: sh', 'raw:: html', 'math::', 'literalinclude:: a', 'highlight:: c', 'image:: x'];
    expect(outline(names.map((name) => `.. ${name}\n\n   Some words are here now\n`).join('\n'))).toEqual([]);
  });

  it('are read where nobody knows them if they hold sentences', () => {
    expect(outline('.. fancy:: arg\n\n   This is a sentence in it.\n\n.. drawing::\n\n   a -> b -> c -> d\n')).toEqual([
      'paragraph: This is a sentence in it.',
    ]);
  });

  it('are glossaries', () => {
    expect(
      outline(
        '.. glossary::\n   :sorted:\n\n   access key\n   key\n      What *opens*.\n\n   gate : g\n      A door.\n',
      ),
    ).toEqual([
      'definedTerm[definedTerm]: access key',
      'definedTerm[definedTerm]: key',
      'definition: What opens.',
      'definedTerm[definedTerm]: gate',
      'definition: A door.',
    ]);
  });

  it('describe the page', () => {
    expect(outline('.. meta::\n   :description: How to begin\n   :keywords: a, b\n')).toEqual([
      'description[frontMatter]: How to begin',
    ]);
  });
});

describe('tables', () => {
  it('are drawn as grids, with cells over columns and rows', () => {
    const text = [
      '+-------+-----------+',
      '| Head  | Other 漢  |',
      '+=======+===========+',
      '| a key | - one     |',
      '| goes  | - two     |',
      '+-------+           |',
      '| b     |           |',
      '+-------+-----------+',
      '| wide cell here    |',
      '+-------------------+',
      '',
    ].join('\n');
    expect(outline(text)).toEqual(
      ['Head', 'Other 漢', 'a key goes', 'one', 'two', 'b', 'wide cell here'].map(
        (cell) => `tableCell[tableCell]: ${cell}`,
      ),
    );
    expect(sourceOf(text, 'goes', 'restructuredtext')).toBe('goes');
  });

  it('are not read where their lines do not meet', () => {
    const text = '+----+---+\n| a  | b |\n| c  |\n\nEnd\n';
    expect(outline(text)).toEqual(['paragraph: End']);
    expect(prose(text, 'restructuredtext').problems).toHaveLength(1);
  });

  it('are simple, with rows of several lines and spans', () => {
    const text =
      '=====  ======\nBoth columns\n-------------\nA      B\n=====  ======\none    two\n       three\nfour   five and more\n=====  ======\n';
    expect(outline(text)).toEqual(
      ['Both columns', 'A', 'B', 'one', 'two three', 'four', 'five and more'].map(
        (cell) => `tableCell[tableCell]: ${cell}`,
      ),
    );
  });

  it('are lists or records', () => {
    const text =
      '.. list-table:: Keys\n   :header-rows: 1\n\n   * - Name\n     - Use\n   * - a\n     - b\n\n.. csv-table::\n   :header: "One, two", Three\n\n   four, "five ""six"""\n';
    expect(outline(text)).toEqual([
      'caption: Keys',
      ...['Name', 'Use', 'a', 'b', 'One, two', 'Three', 'four', 'five ""six""'].map(
        (cell) => `tableCell[tableCell]: ${cell}`,
      ),
    ]);
  });
});

describe('explicit markup', () => {
  it('reads footnotes and citations, and leaves out targets, substitutions and comments', () => {
    const text =
      '.. [1] The note\n   goes on.\n.. [#name] Another.\n.. [Key97] A book.\n.. _t: http://a/b\n.. |s| replace:: No\n.. A comment\n   here\n\n..\n\n  Indented.\n\n__ anonymous\n';
    expect(outline(text)).toEqual([
      'paragraph: The note goes on.',
      'paragraph: Another.',
      'paragraph: A book.',
      'paragraph: Indented.',
    ]);
  });
});

describe('inline', () => {
  it('markup shows its text', () => {
    expect(outline('*a b* **c** ``d e`` |f| [1]_ g\\ *h* \\*i* _`j k` (*) "*" 2 * 3 a_b __init__ *x\n')).toEqual([
      'paragraph: a b c @ @ gh *i* j k (*) "*" 2 * 3 a_b __init__ *x',
    ]);
  });

  it('roles are labels, links, terms or code', () => {
    expect(
      outline(
        ':guilabel:`&Save as` :kbd:`Ctrl` :ref:`the page <p>` :ref:`p` :term:`access key` :file:`a b` :dfn:`new`\n',
      ),
    ).toEqual([
      'paragraph: <uiLabel:Save as> <uiLabel:Ctrl> <linkText:the page> @ <linkText:access key> @ <definedTerm:new>',
    ]);
    expect(outline('`a phrase` `word` :meth:`the method <m>` :meth:`m <n>` `two words`:strong:\n')).toEqual([
      'paragraph: a phrase @ <linkText:the method> @ two words',
    ]);
  });

  it('links have targets', () => {
    const text = 'See `the docs <http://a.b/c>`_, Name_, `Other page`_ and `that <name_>`__.\n\n.. _name: http://n/\n';
    expect(prose(text, 'restructuredtext').blocks[0]!.content.links.map(({ target }) => target)).toEqual([
      'http://a.b/c',
      'http://n/',
      'Other page',
      'http://n/',
    ]);
  });

  it('addresses stand opaque', () => {
    expect(outline('Go to http://a.b/c_d?e=f. Or (redis://h:1/0), me@x.org.\n')).toEqual([
      'paragraph: Go to @. Or (@), @.',
    ]);
  });

  it('markup goes over lines', () => {
    const text = '  A *long\n  phrase* and ``code\n  here`` end.\n';
    expect(outline(text)).toEqual(['paragraph: A long phrase and @ end.']);
    expect(sourceOf(text, 'long phrase', 'restructuredtext')).toBe('long\n  phrase');
  });
});

describe('hostile text', () => {
  it('is read in time that grows with its length alone', () => {
    const n = 20_000;
    const texts = [
      ...['*a ', '`a ', '``a ', '|a ', ':a:', ':a:`b ', '\\*', '[a', 'a@', 'a_-', '- ', '+-', ': '].map((part) =>
        part.repeat(n),
      ),
      ...['__ a\n', '.. _a: b\n', '+--+\n', '== ==\n', ' a\n\n -- b\n\n', 'a\n b\n', '>>> a\n'].map((part) =>
        part.repeat(n),
      ),
      `${'=' + ' ='.repeat(n)}\n${'a b\n'.repeat(1000)}${'=' + ' ='.repeat(n)}\n`,
      `+-${'+-'.repeat(n)}+\n${'| a |\n'.repeat(n)}+-+\n`,
    ];
    const started = performance.now();
    for (const text of texts) prose(text, 'restructuredtext');
    expect(performance.now() - started).toBeLessThan(10_000);
  });

  it('is not read where it is nested too deep', () => {
    const text = Array.from({ length: 60 }, (_, i) => `${' '.repeat(2 * i)}- a`).join('\n\n');
    expect(prose(text, 'restructuredtext').problems).toHaveLength(1);
  });
});
