// The committed modules are what the compiler makes of the committed sources.
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

describe('server/src/lexicon/data', () => {
  it(
    'is up to date with server/lexicon-data and WordNet (run node build/compileLexicon.mjs if not)',
    { timeout: 120_000 },
    async () => {
      const compiler = (await import(new URL('../../../build/compileLexicon.mjs', import.meta.url).href)) as {
        compiledModules(): Map<string, string>;
      };
      const modules = compiler.compiledModules();
      expect(modules.size).toBe(9);
      for (const [name, text] of modules) {
        const committed = readFileSync(new URL(`../../../server/src/lexicon/data/${name}`, import.meta.url), 'utf8');
        expect(committed === text, `${name} is out of date`).toBe(true);
      }
    },
  );
});
