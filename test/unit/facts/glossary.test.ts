// Glossary entries as facts: which blocks make an entry, and the names that its text gives.
import { describe, expect, test } from 'vitest';
import type { GlossaryPart } from '../../../server/src/prose/prose.js';
import { gatherFacts } from '../../../server/src/facts/documentFacts.js';
import type { TokenRange } from '../../../server/src/facts/glossary.js';
import { createNeutralProfile } from '../../../server/src/tokens/neutral.js';

const profile = createNeutralProfile('en');

/** The entries of blocks given as [part, text]. */
function entriesOf(blocks: readonly (readonly [GlossaryPart | undefined, string])[]): unknown[] {
  const prose = {
    blocks: blocks.map(([glossary, text]) => ({
      start: 0,
      content: {
        ...{ kind: 'paragraph' as const, level: 0, text, zones: 0, marks: [], links: [], glossary },
        ...{ pieces: new Uint32Array([0, 0, text.length]), sourceLength: text.length },
      },
    })),
    problems: [],
    language: 'en',
  };
  const facts = gatherFacts(prose, profile);
  const textOf = ({ firstToken, endToken }: TokenRange): string =>
    Array.from({ length: endToken - firstToken }, (_, i) => facts.words[facts.word[firstToken + i]!]!).join(' ');
  return facts.glossary.map(({ headwords, definition, see, alsoCalled, shortFor }) => ({
    names: headwords.map(textOf),
    ...(definition && { says: textOf(definition) }),
    ...(see && { see: textOf(see) }),
    ...(alsoCalled.length > 0 && { also: alsoCalled.map(textOf) }),
    ...(shortFor.length > 0 && { short: shortFor.map(textOf) }),
  }));
}

const entry = (name: string, ...said: string[]): unknown => {
  const [found] = entriesOf([['headword', name], ...said.map((text) => ['definition', text] as const)]);
  return found;
};

describe('an entry', () => {
  test('is one or more headwords and what is said after them', () => {
    expect(
      entriesOf([
        [undefined, 'Words of this guide.'],
        ['headword', 'anchor'],
        ['headword', 'mooring weight:'],
        ['definition', 'Holds a buoy.'],
        ['definition', 'It lies on the ground.'],
        ['headword', 'beacon (lit)'],
        ['definition', 'A light.'],
        [undefined, 'The end.'],
        ['definition', 'Of nothing.'],
      ]),
    ).toEqual([
      { names: ['anchor', 'mooring weight'], says: 'Holds a buoy .' },
      { names: ['beacon'], says: 'A light .' },
    ]);
  });

  test.each<[string, unknown]>([
    ['See mooring.', { see: 'mooring' }],
    ['See “mooring line”.', { see: 'mooring line' }],
    ['See the entry for mooring.', { see: 'mooring' }],
    // RFC 4949 writes entries so: "See: firewall.", "Synonym for …".
    ['See: mooring.', { see: 'mooring' }],
    ['See also mooring.', { says: 'See also mooring .' }],
    ['See mooring and chain.', { says: 'See mooring and chain .' }],
    ['See how it floats.', { says: 'See how it floats .' }],
    ['A buoy. See mooring.', { says: 'A buoy . See mooring .' }],
  ])('that says “%s”', (text, expected) => {
    expect(entry('tether', text)).toEqual({ names: ['tether'], ...(expected as object) });
  });

  test.each<[string, unknown]>([
    ['A line to the ground. Also called mooring line.', { also: ['mooring line'] }],
    ['A line (also known as a mooring line) that holds.', { also: ['mooring line'] }],
    ['A line, also called tether or mooring line.', { also: ['tether', 'mooring line'] }],
    ['A line. Also called a tether, mooring line, or cable.', { also: ['tether', 'mooring line', 'cable'] }],
    ['Synonym for “mooring line”.', { also: ['mooring line'] }],
    ['Formerly known as Tether. It holds.', { also: ['Tether'] }],
    // Here the script has another name, not what is defined.
    ['A file that a mooring script (sometimes called a rigging script) writes.', {}],
    ['Also called a line that holds a buoy.', {}],
    ['It is also called for in storms.', {}],
    ['Abbreviation for mooring line attachment.', { short: ['mooring line attachment'] }],
    ['A mooring line attachment, short for nothing at all that anyone would know of.', {}],
  ])('with the statement “%s”', (text, expected) => {
    const rest = { ...(entry('cord', text) as { says?: string }) };
    delete rest.says;
    expect(rest).toEqual({ names: ['cord'], ...(expected as object) });
  });

  test('with parts of their own for other names', () => {
    expect(
      entriesOf([
        ['headword', 'cord'],
        ['alsoCalled', 'tether'],
        ['alsoCalled', 'mooring line'],
        ['definition', 'Holds.'],
        ['headword', 'rope'],
        ['see', 'See cord.'],
      ]),
    ).toEqual([
      { names: ['cord'], says: 'Holds .', also: ['tether', 'mooring line'] },
      { names: ['rope'], see: 'cord' },
    ]);
  });
});
