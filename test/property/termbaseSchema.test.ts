// Over generated files, mostly nearly right: the schema accepts exactly what the reader finds nothing to say about.
import { Ajv } from 'ajv';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseTermbase } from '../../server/src/termbase/parse.js';
import schema from '../../server/src/termbase/schema.json' with { type: 'json' };
import type { TermbaseProblemCode } from '../../server/src/termbase/termbase.js';

const validate = new Ajv({ allowUnionTypes: true }).compile(schema);

/** What a schema cannot say: relations between places of the file. */
const RELATIONS: readonly TermbaseProblemCode[] = ['contradiction', 'duplicate-id', 'no-verb'];

const names = ['a', 'b', 'c', 'd', 'e', 'f', 'g', 'h'];
const name = fc.constantFrom(...names);
const wrong = fc.constantFrom<unknown>(null, '', ' ', 3, true, [], {}, ['a'], { term: 'a' }, { terms: ['a', 'b'] });
/** The value wanted, or now and then any other. */
const mostly = <T>(wanted: fc.Arbitrary<T>): fc.Arbitrary<unknown> =>
  fc.oneof({ weight: 40, arbitrary: wanted }, { weight: 1, arbitrary: wrong });

const term = fc.oneof(
  name,
  fc.record(
    {
      term: mostly(name),
      partOfSpeech: mostly(fc.constantFrom('noun', 'verb', 'adverb')),
      termType: mostly(fc.constantFrom('acronym', 'fullForm')),
      caseSensitive: mostly(fc.boolean()),
      note: mostly(name),
      'x-own': wrong,
    },
    { requiredKeys: ['term'] },
  ),
);
const terms = fc.oneof(term, fc.uniqueArray(mostly(term), { maxLength: 3, selector: (item) => JSON.stringify(item) }));
const concept = fc.record(
  {
    preferred: mostly(term),
    admitted: mostly(terms),
    deprecated: mostly(terms),
    id: mostly(fc.constantFrom('a', '_b', 'c.1-x')),
    language: mostly(fc.constantFrom('fr', 'pt-BR')),
    partOfSpeech: mostly(fc.constantFrom('verb', 'other')),
    with: mostly(fc.uniqueArray(name)),
    definition: mostly(name),
  },
  { requiredKeys: ['preferred'] },
);
const group = fc.oneof(
  fc.uniqueArray(mostly(name), { minLength: 2, maxLength: 3 }),
  fc.record(
    { terms: mostly(fc.uniqueArray(name, { minLength: 2, maxLength: 3 })), note: mostly(name) },
    { requiredKeys: ['terms'] },
  ),
);
const file = fc.record(
  {
    evenword: mostly(fc.constant(1)),
    language: mostly(fc.constantFrom('en', 'en-GB')),
    concepts: mostly(fc.array(mostly(concept), { maxLength: 2 })),
    apart: mostly(fc.array(mostly(group), { maxLength: 2 })),
    later: mostly(fc.array(mostly(group), { maxLength: 2 })),
    'x-own': wrong,
  },
  { requiredKeys: [] },
);

describe('the schema', () => {
  it('accepts what the reader accepts', () => {
    let good = 0;
    let bad = 0;
    fc.assert(
      fc.property(file, fc.nat(40), (clean, slip) => {
        // Now and then one key is misspelt or a word is none of its list.
        const text = JSON.stringify(clean);
        const slips = [/"preferred"/u, /"language"/u, /"noun"/u, /"en"/u, /"terms"/u, /"_b"/u];
        const data: unknown = JSON.parse(text.replace(slips[slip] ?? /$^/u, '"8 "'));
        const { problems } = parseTermbase(JSON.stringify(data), '');
        // One term in two concepts is a relation too; twice in one list is form.
        const form = problems.filter(({ code, severity }) => {
          return !RELATIONS.includes(code) && !(code === 'duplicate-term' && severity === 'error');
        });
        const valid = validate(data);
        if (valid) good++;
        else bad++;
        // A term as a string and the same as a mapping differ in form alone, which uniqueItems cannot see.
        fc.pre(!(valid && form.every(({ code }) => code === 'duplicate-term')) || form.length === 0);
        expect({ data, valid, form }).toEqual({ data, valid: form.length === 0, form });
      }),
      { numRuns: 600 },
    );
    expect(Math.min(good, bad)).toBeGreaterThan(60);
  });
});
