// Real reStructuredText held against docutils (Debian python3-docutils 0.19): the words that are prose, and where they stand.
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read } from '../../server/src/prose/read.js';
import { commonWords } from './commonWords.js';
import { tell } from './oracleTable.js';

const WORD = /[\p{L}\p{N}]+/gu;
const root = path.resolve(import.meta.dirname, '../..');
/** Debian's own Python has docutils from its packages; another may have it from elsewhere. */
const PYTHON = ['/usr/bin/python3', 'python3'].find((one) => spawnSync(one, ['-c', 'import docutils']).status === 0);
const SAMPLE = Number(process.env.ORACLE_FILES ?? 40);

const hasOracle = PYTHON !== undefined;
if (!hasOracle) console.info('docutils (python3-docutils) is not installed: its comparison is skipped.');

interface OracleResult {
  readonly words: readonly (readonly string[])[];
  readonly seconds: number;
}

function oracle(texts: readonly string[]): OracleResult {
  const script = path.join(root, 'test/truth/restructuredtextOracle.py');
  const run = spawnSync(PYTHON!, [script], { input: JSON.stringify(texts), maxBuffer: 1 << 28, encoding: 'utf8' });
  if (run.status !== 0) throw new Error(run.stderr);
  return JSON.parse(run.stdout) as OracleResult;
}

interface Word {
  readonly word: string;
  readonly at: number;
}

/** Our words in order; words at a wrong offset are told. An escape inside a word may part its halves in the source. */
function wordsOf(text: string, misplaced: string[]): Word[] {
  const words: Word[] = [];
  for (const block of read({ uri: 'file:///page', format: 'restructuredtext', text }).blocks) {
    if (block.content.kind === 'alternativeText' || block.content.kind === 'description') continue;
    for (const { 0: word, index } of block.content.text.matchAll(WORD)) {
      const at = sourceStart(block, index);
      const slice = text.slice(at, sourceEnd(block, index + word.length));
      if (slice !== word && slice.replace(/\\\s?|[*_`]/g, '') !== word) misplaced.push(`${at}: ${word} is ${slice}`);
      words.push({ word, at });
    }
  }
  return words;
}

function expectAgreement(set: string, files: readonly string[], texts: readonly string[]): void {
  const { words: theirs, seconds } = oracle(texts);
  const misplaced: string[] = [];
  const [missing, extra]: [string[], string[]] = [[], []];
  let [all, found, own] = [0, 0, 0];
  const started = performance.now();
  for (const text of texts) read({ uri: 'file:///page', format: 'restructuredtext', text });
  const ownSeconds = (performance.now() - started) / 1000;
  texts.forEach((text, i) => {
    const ours = wordsOf(text, misplaced);
    const { missed, added } = commonWords(
      theirs[i]!,
      ours.map(({ word }) => word),
    );
    all += theirs[i]!.length;
    own += ours.length;
    found += ours.length - added.length;
    for (const at of missed) missing.push(`${files[i]}: ${theirs[i]!.slice(Math.max(0, at - 3), at + 4).join(' ')}`);
    for (const at of added)
      extra.push(
        `${files[i]}@${ours[at]!.at}: ${ours
          .slice(at, at + 4)
          .map(({ word }) => word)
          .join(' ')}`,
      );
  });
  const recall = found / all;
  const precision = found / own;
  tell({
    format: 'reStructuredText',
    oracle: 'docutils',
    set,
    theirs: all,
    ours: own,
    found,
    right: found,
    misplaced: misplaced.length,
    units: texts.reduce((sum, text) => sum + text.length, 0),
    ourTime: ownSeconds * 1000,
    theirTime: seconds * 1000,
  });
  if (process.env.ORACLE_DETAILS) {
    console.info(['missing', ...missing.slice(0, Number(process.env.ORACLE_DETAILS))].join('\n'));
    console.info(['extra', ...extra.slice(0, Number(process.env.ORACLE_DETAILS))].join('\n'));
  }
  expect(misplaced).toEqual([]);
  expect(recall, missing.slice(0, 20).join('\n')).toBeGreaterThanOrEqual(0.985);
  expect(precision, extra.slice(0, 20).join('\n')).toBeGreaterThanOrEqual(0.985);
}

function filesIn(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true })
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .flatMap((entry) => {
      const full = path.join(folder, entry.name);
      if (entry.isDirectory()) return filesIn(full);
      return entry.isFile() && entry.name.endsWith('.rst') ? [full] : [];
    });
}

/** A page with the constructs that differ most from how they look. */
const PAGE = `
=====
Gates
=====

A gate *opens* \\*twice\\*; see :ref:\`the manual <gates>\`, \`a page <http://a.example/>\`_ and other_ things (*).
It costs 2 * 3 \`\`coins\`\`, or some_name [1]_::

  no prose here

Term of art : classifier
    Explains
    itself.

- one

  - two::

      code
- three
* four

A. Person wrote
this.

.. warning:: Mind
   the gap.

   | Line one
   | Line two
     goes on

.. code-block:: sh
   :caption: Turn a key

   no prose

+------+---------+
| Left | Right   |
| cell |         |
+------+---------+
| Both           |
+----------------+

=====  =====
Key    Lock
=====  =====
brass  iron
       steel
=====  =====

-v       Be loud
:Owner:  Nobody
         else

.. glossary::

   key
   brass key
      Opens gates.

.. [1] A note.
.. A comment
.. _other: http://b.example/
`;

/** What docutils 0.19 makes of it, recorded. */
const PAGE_WORDS =
  'Gates A gate opens twice see the manual a page and other things It costs 2 3 or some name Term of art Explains itself one two three four A Person wrote this' +
  ' Mind the gap Line one Line two goes on Turn a key Left cell Right Both Key Lock brass iron steel Be loud Nobody else key brass key Opens gates A note';

it('reads a page as docutils was seen to read it', () => {
  const misplaced: string[] = [];
  expect(
    wordsOf(PAGE, misplaced)
      .map(({ word }) => word)
      .join(' '),
  ).toBe(PAGE_WORDS);
  expect(misplaced).toEqual([]);
});

describe.skipIf(!hasOracle)('reStructuredText against docutils', () => {
  it('has the recorded words of the page from docutils', () =>
    expect(oracle([PAGE]).words[0]!.join(' ')).toBe(PAGE_WORDS));

  for (const set of ['ansible', 'celery', 'wagtail']) {
    const folder = path.join(root, '../shared/data/docs', set);
    it.skipIf(!existsSync(folder))(
      `agrees on the documentation set ${set} (needs ../shared)`,
      () => {
        const files = filesIn(folder);
        const stride = Math.max(1, Math.ceil(files.length / SAMPLE));
        const chosen = files.filter((_, i) => i % stride === 0);
        expectAgreement(
          set,
          chosen.map((file) => path.relative(folder, file)),
          chosen.map((file) => readFileSync(file, 'utf8')),
        );
      },
      180_000,
    );
  }
});
