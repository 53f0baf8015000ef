// The schema that editors use and the reader must say the same of a file's form.
import { Ajv } from 'ajv';
import { parse } from 'yaml';
import { describe, expect, it } from 'vitest';
import { APART_KEYS, CONCEPT_KEYS, LATER_KEYS, TERM_KEYS, TOP_KEYS } from '../../../server/src/termbase/format.js';
import { parseTermbase } from '../../../server/src/termbase/parse.js';
import schema from '../../../server/src/termbase/schema.json' with { type: 'json' };
import { PARTS_OF_SPEECH, TERM_TYPES } from '../../../server/src/termbase/termbase.js';

const validate = new Ajv({ allowUnionTypes: true }).compile(schema);

describe('schema and reader agree', () => {
  it.each<[text: string, good: boolean]>([
    ['', true],
    ['{}', true],
    ['evenword: 1', true],
    ['evenword: 2', false],
    ['evenword:', false],
    ['evenword: one', false],
    ['- a', false],
    ['word', false],
    ['language: de', true],
    ['language: zh-Hant-TW', true],
    ['language: the German one', false],
    ['language:', false],
    ['concepts:', true],
    ['concepts: []', true],
    ['concepts: {}', false],
    ['concepts: [a]', false],
    ['concepts: [~]', false],
    ['concepts: [{}]', false],
    ['concepts: [{ preferred: a }]', true],
    ['concepts: [{ preferred: "" }]', false],
    ['concepts: [{ preferred: 7 }]', false],
    ['concepts: [{ preferred: [a] }]', false],
    ['concepts: [{ preferred: { term: a } }]', true],
    ['concepts: [{ preferred: { note: a } }]', false],
    ['concepts: [{ preferred: { term: a, caseSensitive: maybe } }]', false],
    ['concepts: [{ preferred: { term: a, termType: acronym, partOfSpeech: noun } }]', true],
    ['concepts: [{ preferred: { term: a, termType: word } }]', false],
    ['concepts: [{ preferred: { term: a, trem: b } }]', false],
    ['concepts: [{ admitted: [a] }]', false],
    ['concepts: [{ preferred: a, admitted: b, deprecated: [c, { term: d }] }]', true],
    ['concepts: [{ preferred: a, deprecated: { term: d } }]', true],
    ['concepts: [{ preferred: a, deprecated: [[c]] }]', false],
    ['concepts: [{ preferred: a, deprecated: [c, c] }]', false],
    ['concepts: [{ preferred: a, deprecated: ~ }]', true],
    ['concepts: [{ preferred: a, with: [b, c] }]', true],
    ['concepts: [{ preferred: a, with: b }]', true],
    ['concepts: [{ preferred: a, with: [{ term: b }] }]', false],
    ['concepts: [{ preferred: a, id: "0" }]', false],
    ['concepts: [{ preferred: a, id: größe.1 }]', true],
    ['concepts: [{ preferred: a, partOfSpeech: verb }]', true],
    ['concepts: [{ preferred: a, language: pt-BR }]', true],
    ['concepts: [{ preferred: a, language: Brazil! }]', false],
    ['concepts: [{ preferred: a, partOfSpeech: pronoun }]', false],
    ['concepts: [{ preferred: a, definition: [b] }]', false],
    ['concepts: [{ preferred: a, note: }]', false],
    ['concepts: [{ preferred: a, x-owner: 3, x-y: [] }]', true],
    ['concepts: [{ preferred: a, owner: b }]', false],
    ['x-team: { a: 1 }', true],
    ['team: b', false],
    ['apart: [[a, b], { terms: [c, d], note: e }]', true],
    ['apart: [[a]]', false],
    ['apart: [[a, a]]', false],
    ['apart: [[a, ""]]', false],
    ['apart: [a]', false],
    ['apart: [{ note: e }]', false],
    ['apart: [{ terms: a }]', false],
    ['apart: [{ terms: [a, b], uses: 1 }]', false],
    ['later: [[a, b], { terms: [c, d], uses: 0 }]', true],
    ['later: [{ terms: [a, b], uses: -1 }]', false],
    ['later: [{ terms: [a, b], uses: 1.5 }]', false],
  ])('%s: %s', (text, good) => {
    expect({ schema: validate(parse(text)), reader: parseTermbase(text, '').problems.length === 0 }).toEqual({
      schema: good,
      reader: good,
    });
  });

  it('know the same keys and words', () => {
    const { concept, term, partOfSpeech } = schema.definitions;
    const term_ = term.anyOf[1]!.properties!;
    expect(Object.keys(schema.properties)).toEqual([...TOP_KEYS]);
    expect(Object.keys(concept.properties)).toEqual([...CONCEPT_KEYS]);
    expect(Object.keys(term_)).toEqual([...TERM_KEYS]);
    expect(Object.keys(schema.properties.apart.items.anyOf[1]!.properties!)).toEqual([...APART_KEYS]);
    expect(Object.keys(schema.properties.later.items.anyOf[1]!.properties!)).toEqual([...LATER_KEYS]);
    expect(partOfSpeech.enum).toEqual([...PARTS_OF_SPEECH]);
    expect(term_.termType.enum).toEqual([...TERM_TYPES]);
  });
});
