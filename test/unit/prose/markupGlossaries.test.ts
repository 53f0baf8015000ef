// Glossaries in HTML, DITA, DocBook and Mallard: which block is a headword, and which says something of it.
import { describe, expect, it } from 'vitest';
import type { Format } from '../../../server/src/text/sourceText.js';
import { prose } from './reading.js';

const parts = (text: string, format: Format = 'html'): string[] =>
  prose(text, format).blocks.map(({ content }) => `${content.glossary ?? '-'}: ${content.text}`);
const LIST = '<dl><dt>key<dt>access key<dd><p>It opens.</p><p>So it does.</p><dt>lock<dd>See <i>access key</i>.</dl>';
const READ = ['headword: key', 'headword: access key', 'definition: It opens.', 'definition: So it does.'].concat([
  'headword: lock',
  'see: See access key.',
]);

describe('glossaries', () => {
  it('of HTML are lists below such a heading, up to the next of its level', () => {
    expect(parts(`<h1>Buoys</h1><h2>Glossary</h2><h3>K</h3>${LIST}<h2>Use</h2><dl><dt>step<dd>It goes.</dl>`)).toEqual([
      ...['-: Buoys', '-: Glossary', '-: K', ...READ, '-: Use', '-: step', '-: It goes.'],
    ]);
  });

  it('of HTML are what their attributes say', () => {
    expect(parts(`<section role="doc-glossary">${LIST}</section>`)).toEqual(READ);
    expect(parts(`<div class="wide glossary">${LIST}</div><dl><dt>step<dd>It goes.</dl>`)).toEqual([
      ...[...READ, '-: step', '-: It goes.'],
    ]);
    expect(parts('<h1>Terminology</h1><p><dfn>key</dfn> opens a <dfn>lock</dfn>.<p>No term.')).toEqual([
      ...['-: Terminology', 'headword: key', 'definition: opens a lock.', '-: No term.'],
    ]);
    expect(parts('<p>A <dfn>key</dfn> opens.')).toEqual(['-: A key opens.']);
  });

  it('of DITA are entries with other names', () => {
    expect(
      parts(
        '<!DOCTYPE glossentry PUBLIC "-//OASIS//DTD DITA Glossary Entry//EN" "glossentry.dtd"><glossentry id="a"><glossterm>access key</glossterm>' +
          '<glossdef>It <b>opens</b>.<p>So.</p></glossdef><glossBody><glossSurfaceForm>access key (AK)</glossSurfaceForm><glossAlt><glossAcronym>AK</glossAcronym></glossAlt>' +
          '<glossAlt><glossSynonym>opener</glossSynonym><glossUsage>Do not use.</glossUsage></glossAlt></glossBody></glossentry>',
        'xml',
      ),
    ).toEqual([
      ...[
        'headword: access key',
        'definition: It opens.',
        'definition: So.',
        'alsoCalled: access key (AK)',
        'alsoCalled: AK',
      ],
      ...['alsoCalled: opener', '-: Do not use.'],
    ]);
  });

  it('of DocBook are entries that can send to others', () => {
    expect(
      parts(
        '<glossary xmlns="http://docbook.org/ns/docbook"><title>Words</title><glossentry><glossterm>access key</glossterm><acronym>AK</acronym><glossdef><para>It opens ' +
          'a <glossterm>lock</glossterm>.</para><glossseealso otherterm="b">lock</glossseealso></glossdef></glossentry><glossentry><glossterm>opener</glossterm>' +
          '<glosssee otherterm="a">access key</glosssee></glossentry></glossary>',
        'xml',
      ),
    ).toEqual([
      ...['-: Words', 'headword: access key', 'alsoCalled: AK', 'definition: It opens a lock.', 'headword: opener'],
      'see: access key',
    ]);
  });

  it('of Mallard and other vocabularies are lists below such a title', () => {
    expect(
      parts(
        '<page xmlns="http://projectmallard.org/1.0/"><title>Glossary</title><terms><item><title>key</title><p>It opens.</p></item></terms></page>',
        'xml',
      ),
    ).toEqual(['-: Glossary', 'headword: key', 'definition: It opens.']);
  });
});
