// The documents' own glossary: two entries are two concepts, an entry sends to its preferred name, duplicates are no conflict.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { answersOf, preferenceOf } from '../../../server/src/decisions/preference.js';
import { Engine } from '../../../server/src/engine/engine.js';
import { Profiles } from '../../../server/src/engine/factsOf.js';
import type { Snapshot } from '../../../server/src/engine/snapshot.js';
import type { Format } from '../../../server/src/text/sourceText.js';

const profiles = new Profiles();

function survey(pages: Readonly<Record<string, string>>): Snapshot {
  const engine = new Engine(profiles);
  engine.apply({
    documents: Object.entries(pages).map(([name, text]) => {
      const uri = `file:///docs/${name}`;
      const format: Format = name.endsWith('.rst') ? 'restructuredtext' : 'markdown';
      return { uri, source: { uri, format, text } };
    }),
  });
  return finish(engine.settle());
}

const termsAsked = (snapshot: Snapshot): string[][] =>
  snapshot.agendaAt('file:///docs/').open.map(({ terms }) => terms.map(({ text }) => text).sort());

const glossaryOf = (entries: Readonly<Record<string, string>>): string =>
  `.. glossary::\n\n${Object.entries(entries)
    .map(([name, text]) => `   ${name}\n      ${text}\n`)
    .join('\n')}`;

/** Pages on which both ways of writing stand in one slot, which is asked about. */
const MIXED = {
  'a.md':
    'The datalogger keeps the samples. Open the datalogger on the buoy. A datalogger is dry. Read the datalogger now.',
  'b.md':
    'The data logger keeps the samples. Open the data logger on the buoy. A data logger is dry. Read the data logger now.',
};

describe('two entries', () => {
  it('are two concepts, whatever else speaks for one', () => {
    expect(termsAsked(survey(MIXED))).toEqual([['data logger', 'datalogger']]);
    const entries = { Datalogger: 'The part of a buoy.', 'Data logger': 'The person who writes data down.' };
    expect(termsAsked(survey({ ...MIXED, 'glossary.rst': glossaryOf(entries) }))).toEqual([]);
  });

  it('on two pages under one headword are no conflict', () => {
    const entries = { Datalogger: 'The part of a buoy.' };
    const snapshot = survey({ ...MIXED, 'glossary.rst': glossaryOf(entries), 'terms.rst': glossaryOf(entries) });
    expect(termsAsked(snapshot)).toEqual([['data logger', 'datalogger']]);
  });
});

describe('an entry', () => {
  it('has the name preferred that it stands under, and the question says so', () => {
    const snapshot = survey({ ...MIXED, 'glossary.rst': glossaryOf({ Datalogger: 'The part of a buoy.' }) });
    const { open, decisions, precedents } = snapshot.agendaAt('file:///docs/');
    expect(preferenceOf(open[0]!, decisions, precedents)).toEqual({
      text: 'datalogger',
      reason: { kind: 'glossary', text: 'it has an entry in the glossary on glossary.rst', value: 1 },
    });
    expect(answersOf(open[0]!, decisions, precedents)[0]).toMatchObject({ kind: 'prefer', preferred: 'datalogger' });
    expect(open[0]!.reasons.at(-1)!.text).toBe('“datalogger” has an entry in the glossary on glossary.rst');
  });

  const lines = {
    'a.md': 'Check the tether of the buoy before you go. The tether must not be worn. Tethers last two years.',
    'b.md': 'Check the mooring line of the buoy. A mooring line must not be worn. Mooring lines last two years.',
  };

  it('that sends the reader to another name raises a question that prefers the other', () => {
    const entries = { Tether: 'See mooring line.', 'Mooring line': 'What holds a buoy.' };
    const snapshot = survey({ ...lines, 'glossary.rst': glossaryOf(entries) });
    const { open, decisions, precedents } = snapshot.agendaAt('file:///docs/');
    expect(open).toHaveLength(1);
    expect(open[0]).toMatchObject({ kind: 'synonym', confidence: 0.9 });
    expect(open[0]!.terms.map(({ text, uses, documents }) => [text, uses, documents])).toEqual([
      ['mooring line', 3, 1],
      ['tether', 3, 1],
    ]);
    expect(open[0]!.reasons[0]!.text).toBe('the glossary on glossary.rst sends “Tether” to “mooring line”');
    expect(preferenceOf(open[0]!, decisions, precedents).text).toBe('mooring line');
    expect(open[0]!.places.map(({ term }) => term).sort()).toEqual([0, 0, 0, 1, 1, 1]);
  });

  it('that gives further names prefers its own', () => {
    const entries = { Tether: 'What holds a buoy. Also called mooring line.' };
    const { open, decisions, precedents } = survey({ ...lines, 'glossary.rst': glossaryOf(entries) }).agendaAt(
      'file:///docs/',
    );
    expect(open.map(({ reasons }) => reasons[0]!.text)).toEqual([
      'the glossary on glossary.rst also calls “Tether” “mooring line”',
    ]);
    expect(preferenceOf(open[0]!, decisions, precedents).text).toBe('tether');
  });

  it('is not asked about where pages keep to one of its names', () => {
    const entries = { Tether: 'See mooring line.', 'Mooring line': 'What holds a buoy.' };
    expect(termsAsked(survey({ 'b.md': lines['b.md'], 'glossary.rst': glossaryOf(entries) }))).toEqual([]);
  });
});
