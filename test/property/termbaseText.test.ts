// Texts as we write them, read by YAML 1.1 and 1.2 and by a second YAML library (npm js-yaml, not otherwise used here).
import fc from 'fast-check';
import { load } from 'js-yaml';
import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { writeFlow, writeText, PLAIN_STYLE } from '../../server/src/termbase/yamlWriting.js';

/** Words that YAML 1.1 takes for something else (yaml.org/type: bool, null, int, float, timestamp, merge, value). */
const TAKEN = [
  'y',
  'Yes',
  'NO',
  'on',
  'Off',
  'true',
  'FALSE',
  '~',
  'null',
  'Null',
  '0o17',
  '017',
  '0b11',
  '1_000',
  '190:20:30',
  '.5',
  '-.inf',
  '.NaN',
  '2001-12-14',
  '<<',
  '=',
];

const texts = fc.oneof(
  fc.constantFrom(...TAKEN),
  fc.string({ unit: 'binary', minLength: 1, maxLength: 10 }),
  fc.stringMatching(/^[-?:,[\]{}#&*!|>'"%@` a-z0-9.]{1,6}$/),
);

describe('a written text reads back', () => {
  it.each(['plain', 'single', 'double'] as const)('with %s quoting, in block and flow', (quoting) => {
    fc.assert(
      fc.property(texts, (text) => {
        const written = writeText(text, quoting);
        for (const file of [`k:\n  - ${written} # c\n`, `k: [${written}, ${written}]`, `{k: [${written}]}`]) {
          for (const read of [parse(file), parse(file, { version: '1.1' }), load(file)] as { k: string[] }[]) {
            expect(read.k[0]).toBe(text);
          }
        }
      }),
      { numRuns: 400 },
    );
  });

  it('in values of lists and mappings', () => {
    const value = fc.record({ preferred: texts, deprecated: fc.array(texts) });
    fc.assert(
      fc.property(value, (concept) => {
        const written = writeFlow([concept], PLAIN_STYLE);
        expect(parse(written)).toEqual([concept]);
        expect(load(written)).toEqual([concept]);
      }),
    );
  });
});
