// Real AsciiDoc held against Asciidoctor: the words that are prose, and where ours stand.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { sourceEnd, sourceStart, type ProseBlock } from '../../server/src/prose/prose.js';
import { read } from '../../server/src/prose/read.js';
import { commonLength, oracleWords, WORD } from './asciidocOracle.js';
import { tell } from './oracleTable.js';

/*
 * Where the two differ on purpose: a sentence right below a document's title is text here and an author's name there (many such files
 * are only ever included, where it is text); passthroughs (`+x+`) and escaped or shown addresses are no prose here; the
 * letters that number appendices are not in the source.
 */

interface Score {
  oracle: number;
  ours: number;
  common: number;
  /** Milliseconds, and the text read in them. */
  oracleTime: number;
  ourTime: number;
  units: number;
  misplaced: string[];
  details: string[];
}

/** Markup that may stand inside a word and vanishes: marks, role lists, anchors, index terms, references to nothing. */
const MARKUP = /[*_#^~`\\]|\[\[[^\]]*\]\]|\[[^\]]*\]|\(\(\([^)]*\)\)\)|\{[^}]*\}/g;

/** Alternative texts are no text of the converted page; everything else that is read is. */
function isCompared({ content }: ProseBlock): boolean {
  return !['alternativeText', 'title', 'description'].includes(content.kind);
}

async function compare(name: string, text: string, score: Score): Promise<void> {
  const before = performance.now();
  const theirs = await oracleWords(text);
  const between = performance.now();
  read({ uri: name, format: 'asciidoc', text });
  score.oracleTime += between - before;
  score.ourTime += performance.now() - between;
  score.units += text.length;
  const words: string[] = [];
  for (const block of read({ uri: name, format: 'asciidoc', text }).blocks) {
    for (const { 0: word, index } of block.content.text.matchAll(WORD)) {
      const slice = text.slice(sourceStart(block, index), sourceEnd(block, index + word.length));
      if (slice !== word && slice.replace(MARKUP, '') !== word) score.misplaced.push(`${name}: ${word} is ${slice}`);
      if (isCompared(block)) words.push(word);
    }
  }
  const common = commonLength(theirs, words);
  score.oracle += theirs.length;
  score.ours += words.length;
  score.common += common;
  if (common < Math.max(theirs.length, words.length)) score.details.push(`${name}: ${difference(theirs, words)}`);
}

function difference(theirs: readonly string[], ours: readonly string[]): string {
  const count = new Map<string, number>();
  for (const word of theirs) count.set(word, (count.get(word) ?? 0) + 1);
  for (const word of ours) count.set(word, (count.get(word) ?? 0) - 1);
  const show = (sign: number): string =>
    [...count]
      .filter(([, n]) => n * sign > 0)
      .map(([word, n]) => (n * sign > 1 ? `${word}*${n * sign}` : word))
      .join(' ');
  return `MISSING ${show(1).slice(0, 400)} EXTRA ${show(-1).slice(0, 400)}`;
}

async function scoreOf(set: string, files: readonly (readonly [string, string])[]): Promise<Score> {
  const score: Score = {
    oracle: 0,
    ours: 0,
    common: 0,
    oracleTime: 0,
    ourTime: 0,
    units: 0,
    misplaced: [],
    details: [],
  };
  for (const [name, text] of files) await compare(name, text, score);
  tell({
    format: 'AsciiDoc',
    oracle: 'Asciidoctor',
    set,
    theirs: score.oracle,
    ours: score.ours,
    found: score.common,
    right: score.common,
    misplaced: score.misplaced.length,
    units: score.units,
    ourTime: score.ourTime,
    theirTime: score.oracleTime,
  });
  if (process.env.ORACLE_DETAILS) console.info(score.details.join('\n'));
  return score;
}

function adocFiles(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true })
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .flatMap((entry) => {
      const full = path.join(folder, entry.name);
      if (entry.isDirectory()) return adocFiles(full);
      return entry.isFile() && entry.name.endsWith('.adoc') ? [full] : [];
    });
}

/** Without what the two see differently on purpose; the footnote comes last, as Asciidoctor prints it there. */
const SMALL = `= Keys of the *buoy* gateway
Ada Harbour <ada@buoys.example>
v1.2, 2024-02-03
:summary: not \\
  read

[[keys]]
[.lead]
A gateway signs each message with its *access key*. Keep it in the _vault_, never in \`a.toml\`;
see link:vault.adoc#store[how to store it,window=_blank] and <<rules,the rules>>.

ifdef::network[]
Every key has one owner. Press kbd:[Ctrl+K] or choose menu:File[Keys > New] and btn:[Search].
endif::[]
ifndef::network[Keys are off.]
// a comment
The list is at https://buoys.example/list?all=1 and at https://buoys.example[the "\`desk\`"^].

== Rotating keys ==

.Rotate a key
[source,sh]
----
buoy rotate # <1>
----
<1> The name of the key.

WARNING: A lost key opens the whole network.

[CAUTION]
====
Switch the mast off.

* Wait for five minutes.
** Then measure again.
+
....
0 V
....
+
And write it down.

. [x] a task
====

[quote, Somebody, A letter]
____
Somebody wrote this long ago.
____

Underlined title
----------------

buoy:: A float with a mast.
mast::
  The pole on a buoy.
+
It is H~2~O-proof.
vault:::: Where keys rest.

.Fields
[%header,cols="1,2a,1m"]
|===
|Field |Meaning |Default

|Name of the \\| key
|* item

NOTE: Mind the gap.
|none
2+|wide cell
|last
|===

image::buoy.png[title="The northern buoy"]

****
Old keys expire (((expiry)))after a year. ((Renewal)) is at the desk &amp; free.
****

 literal

[verse]
____
One line
another
____

\\*not bold* but **bo**ld, \`\`mo\`\`no, [.role]#marked# and (C) signs. +
The last one has a note.footnote:[It *really* has.]
`;

const root = path.resolve(import.meta.dirname, '../..');
const SAMPLE = Number(process.env.ORACLE_FILES ?? 40);

describe('AsciiDoc against Asciidoctor', () => {
  it('agrees word by word on a page with every construct', async () => {
    const score = await scoreOf('a page', [['page', SMALL]]);
    expect(score.misplaced).toEqual([]);
    expect(score.details).toEqual([]);
    expect(score.oracle).toBeGreaterThan(100);
  });

  for (const set of ['keycloak', 'spring-boot']) {
    const folder = path.join(root, '../shared/data/docs', set);
    it.skipIf(!existsSync(folder))(
      `agrees on the documentation set ${set} (needs ../shared)`,
      async () => {
        const files = adocFiles(folder);
        const stride = Math.max(1, Math.ceil(files.length / SAMPLE));
        const sample = files.filter((_, i) => i % stride === 0);
        const score = await scoreOf(
          set,
          sample.map((file) => [file, readFileSync(file, 'utf8')] as const),
        );
        const { oracle, ours, common, misplaced, details } = score;
        expect(misplaced).toEqual([]);
        expect(oracle).toBeGreaterThan(1000);
        expect(common / oracle, details.slice(0, 20).join('\n')).toBeGreaterThanOrEqual(0.985);
        expect(common / ours, details.slice(0, 20).join('\n')).toBeGreaterThanOrEqual(0.985);
      },
      120_000,
    );
  }
});
