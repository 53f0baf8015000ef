// DocBook and DITA held against expat: which words are prose, and where they stand.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { compare, expectAgreement, newScore, type Score } from './markupOracle.js';

/** Elements in which text is no prose, by their descriptions in DITA 1.3 and DocBook 5.1; and those that show none. */
const DITA_CLOSED =
  'codeph codeblock filepath cmdname varname parmname option apiname userinput systemoutput msgnum msgblock screen pre pt tt kwd ' +
  'syntaxdiagram synph var oper delim sep proptype sup indexterm prolog draft-comment required-cleanup data foreign unknown';
const DOCBOOK_CLOSED =
  'command filename literal option replaceable systemitem varname parameter function envar uri email package prompt code screen ' +
  'computeroutput userinput property constant markup tag keycode citerefentry superscript programlisting synopsis literallayout ' +
  'xref indexterm remark revhistory refname biblioentry annotation';
/** Of a document's data, titles and abstracts are prose. */
const IN_INFO = new Set(['title', 'subtitle', 'titleabbrev', 'abstract']);
const CLOSED = { dita: new Set(DITA_CLOSED.split(' ')), docbook: new Set(DOCBOOK_CLOSED.split(' ')) };

function isProse(names: readonly string[], vocabulary: keyof typeof CLOSED): boolean {
  if (names.some((name) => CLOSED[vocabulary].has(name) || name.includes(':'))) return false;
  const info = vocabulary === 'docbook' ? names.indexOf('info') : -1;
  return info < 0 || IN_INFO.has(names[info + 1] ?? '');
}

const script = fileURLToPath(new URL('reference/xmlText.py', import.meta.url));
const python = ['/usr/bin/python3', 'python3'].find(
  (command) => spawnSync(command, ['-c', 'import xml.parsers.expat'], { stdio: 'ignore' }).status === 0,
);

const root = path.resolve(import.meta.dirname, '../..');

type Chunk = readonly [at: number, length: number, names: string];

function compareFiles(files: readonly string[], score: Score): void {
  const begun = performance.now();
  const { stdout, status } = spawnSync(python!, [script], {
    input: JSON.stringify(files),
    maxBuffer: 2 ** 28,
    encoding: 'utf8',
  });
  score.theirTime += performance.now() - begun;
  expect(status).toBe(0);
  const results = JSON.parse(stdout) as (readonly Chunk[] | string)[];
  files.forEach((file, index) => {
    const chunks = results[index]!;
    if (typeof chunks === 'string') throw new Error(`${file}: ${chunks}`);
    const bytes = readFileSync(file);
    const vocabulary = file.endsWith('.dita') ? 'dita' : 'docbook';
    let at = 0;
    let offset = 0;
    const offsetOf = (byte: number): number => {
      offset += bytes.subarray(at, byte).toString('utf8').length;
      at = byte;
      return offset;
    };
    const prose: [number, number][] = [];
    for (const [from, length, names] of chunks) {
      const start = offsetOf(from);
      const end = offsetOf(from + length);
      if (isProse(names.split(' '), vocabulary)) prose.push([start, end]);
    }
    compare({ name: path.basename(file), format: 'xml', source: bytes.toString('utf8'), prose }, score);
  });
}

function filesIn(folder: string, ending: RegExp): string[] {
  return readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && ending.test(entry.name))
    .map((entry) => path.join(entry.parentPath, entry.name))
    .sort();
}

const TOPIC = `<?xml version="1.0" encoding="UTF-8"?>
<!DOCTYPE task PUBLIC "-//OASIS//DTD DITA Task//EN" "task.dtd" [ <!ENTITY who "not prose > here"> ]>
<?not prose?>
<task id="a" xml:lang="en"><title>Turning keys</title><shortdesc>How a key is turned, 🙂 na\u00efvely.</shortdesc>
<prolog><author>Not Prose</author></prolog>
<taskbody><context>You need a <term>main key</term> of &who;.</context>
<steps><step><cmd>Choose <menucascade><uicontrol>Keys</uicontrol><uicontrol>Main</uicontrol></menucascade>.</cmd>
<info>Caf&#233; keys &amp; others<!-- not prose --> turn <codeph>not prose</codeph>.</info></step></steps>
<result><![CDATA[Then a < b & c]]> holds<fn>In most cases.</fn>. 漢字 too.<note type="warning">Do not turn twice.</note></result>
</taskbody></task>`;
const CHAPTER = `<chapter xmlns="http://docbook.org/ns/docbook" xmlns:xi="http://www.w3.org/2001/XInclude"><title>Locks</title>
<info><date>2020</date><abstract><para>What locks are.</para></abstract></info><xi:include href="not-prose.xml"/>
<para>A lock <emphasis>keeps</emphasis> things; run <command>not prose</command>, see <xref linkend="not-prose"/>.</para>
<variablelist><varlistentry><term>bolt</term><listitem><para>Part of a lock.</para></listitem></varlistentry></variablelist>
<screen>not prose</screen><warning><para>Never force a <quote>tight</quote> bolt.</para></warning></chapter>`;

describe('XML against expat', () => {
  it('agrees on a topic and a chapter with the usual constructs', (context) => {
    if (python === undefined) return context.skip('needs a Python with its expat module');
    const folder = mkdtempSync(path.join(tmpdir(), 'markup-'));
    try {
      const files = { 'a.dita': TOPIC, 'b.xml': CHAPTER, 'c.dita': TOPIC.replaceAll('\n', '\r\n') };
      for (const [name, text] of Object.entries(files)) writeFileSync(path.join(folder, name), text);
      const score = newScore();
      compareFiles(
        Object.keys(files).map((name) => path.join(folder, name)),
        score,
      );
      expectAgreement(score, 80, 'XML', 'expat', 'a topic and a chapter');
      expect({ missing: score.missing, extra: score.extra }).toEqual({ missing: [], extra: [] });
    } finally {
      rmSync(folder, { recursive: true });
    }
  });

  for (const [set, ending] of [
    ['dita-ot', /\.dita$/],
    ['sleha', /\.xml$/],
  ] as const) {
    const folder = path.join(root, '../shared/data/docs', set);
    it(`agrees on the documentation set ${set}`, (context) => {
      if (python === undefined) return context.skip('needs a Python with its expat module');
      if (!existsSync(folder)) return context.skip('needs ../shared');
      const score = newScore();
      compareFiles(filesIn(folder, ending), score);
      expectAgreement(score, 10_000, 'XML', 'expat', set);
    }, 60_000);
  }
});
