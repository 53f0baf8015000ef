// An immutable map against the language's own, over random changes; earlier maps stay as they were.
import fc from 'fast-check';
import { expect, it } from 'vitest';
import { LayeredMap } from '../../../server/src/base/layeredMap.js';

const change = fc.tuple(fc.nat({ max: 200 }), fc.option(fc.nat(), { nil: undefined, freq: 3 }));

it('holds what a copied map would hold, whatever the changes', () => {
  fc.assert(
    fc.property(fc.array(fc.array(change, { maxLength: 40 }), { maxLength: 12 }), (steps) => {
      let map = LayeredMap.empty<number, number>();
      let plain = new Map<number, number>();
      const states = steps.map((changes) => {
        map = map.with(new Map(changes));
        plain = new Map(plain);
        for (const [key, value] of changes) {
          if (value === undefined) plain.delete(key);
          else plain.set(key, value);
        }
        return { map, plain };
      });
      for (const state of states) {
        expect(state.map.size).toBe(state.plain.size);
        const sorted = (entries: Iterable<[number, number]>): [number, number][] =>
          [...entries].sort(([a], [b]) => a - b);
        expect(sorted(state.map)).toEqual(sorted(state.plain));
        for (let key = 0; key <= 200; key += 7) {
          expect(state.map.get(key)).toBe(state.plain.get(key));
          expect(state.map.has(key)).toBe(state.plain.has(key));
        }
      }
    }),
  );
});
