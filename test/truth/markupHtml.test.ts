// HTML held against parse5 8, the HTML Standard's algorithm: which words are prose, and where they stand.
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { micromark } from 'micromark';
import { gfm, gfmHtml } from 'micromark-extension-gfm';
import { defaultTreeAdapter as tree, parse, type DefaultTreeAdapterTypes } from 'parse5';
import { describe, expect, it } from 'vitest';
import { sourceStart } from '../../server/src/prose/prose.js';
import { read } from '../../server/src/prose/read.js';
import { compare, expectAgreement, newScore, type Judged, type Score } from './markupOracle.js';

/** Elements in which text is no prose: code and what pages hold for machines (HTML Standard), navigation, superscripts. */
const CLOSED = new Set(
  'script style template noscript pre code samp tt var svg math canvas audio video object iframe textarea select nav sup'
    .concat(' progress meter output data datalist rp rt listing xmp')
    .split(' '),
);

function textOf(source: string): (readonly [number, number])[] {
  const found: (readonly [number, number])[] = [];
  const visit = (node: DefaultTreeAdapterTypes.Node): void => {
    if (tree.isTextNode(node)) {
      const place = node.sourceCodeLocation;
      if (!place) return;
      // A text that goes on behind the page's end tags is one to parse5, and its place holds them.
      const end = source.slice(place.startOffset, place.endOffset).search(/<\/(?:body|html)>/i);
      found.push([place.startOffset, end < 0 ? place.endOffset : place.startOffset + end]);
    } else if (!('childNodes' in node) || (tree.isElementNode(node) && CLOSED.has(node.tagName))) return;
    else for (const child of node.childNodes) visit(child);
  };
  visit(parse(source, { sourceCodeLocationInfo: true, scriptingEnabled: false }));
  return found;
}

/** Elements that do not part the text around them (HTML Standard, "Rendering": those that are not displayed as blocks). */
const PHRASES = new Set(
  'a abbr acronym b bdi bdo big cite code del dfn em font i img ins kbd label mark nobr q s samp small span strike strong sub'
    .concat(' sup time tt u var wbr button')
    .split(' '),
);

/** Blocks whose words lie in different blocks of parse5's tree. */
function torn(source: string): string[] {
  const owner = new Int32Array(source.length);
  let count = 0;
  const visit = (node: DefaultTreeAdapterTypes.Node, block: number): void => {
    if (tree.isTextNode(node)) {
      const place = node.sourceCodeLocation;
      if (place) owner.fill(block, place.startOffset, place.endOffset);
    } else if ('childNodes' in node) {
      const own = tree.isElementNode(node) && PHRASES.has(node.tagName) ? block : ++count;
      for (const child of node.childNodes) visit(child, own);
    }
  };
  visit(parse(source, { sourceCodeLocationInfo: true, scriptingEnabled: false }), 0);
  return read({ uri: 'file:///page.html', format: 'html', text: source })
    .blocks.filter(({ content }) => content.kind !== 'alternativeText' && content.kind !== 'description')
    .filter((block) => {
      const words = [...block.content.text.matchAll(/[\p{L}\p{N}]+/gu)];
      return new Set(words.map(({ index }) => owner[sourceStart(block, index)])).size > 1;
    })
    .map(({ content }) => content.text);
}

function judged(name: string, source: string): Judged {
  return { name, format: 'html', source, prose: textOf(source) };
}

function compareTimed(name: string, source: string, score: Score): void {
  const begun = performance.now();
  const theirs = judged(name, source);
  score.theirTime += performance.now() - begun;
  compare(theirs, score);
}

const PAGE = `<!doctype html>
<html lang=en><head><meta charset=utf-8><title>Keys &amp; locks</title>
<style>p { color: red }</style><script>document.write("<p>not prose</p>")</script></head>
<body><header><h1>Keys</h1></header><nav><ul><li><a href="/">Home page</a></ul></nav>
<main><p>A <b>main</b> key opens <i>every</i> lock<!-- not this one -->; see <a href="locks.html#main">the locks</a>.
<p>Caf&eacute; keys are br<em>and</em> new, 🙂 na\u00efve 漢字 too.<ul><li>one<li>two <code>not this</code><ul><li>three</ul></ul>
<table><caption>All keys</caption><tr><th>Name<th>Use<tr><td>North<td>Opens the mast</table>
<dl><dt>key<dd>It opens.<dt>lock<dd>It keeps.</dl><pre>not this</pre>
<details><summary>More</summary>The rest, with <kbd>Ctrl</kbd> and <q>a word</q>.</details>
<svg><title>not this</title></svg><textarea>nor this</textarea><figure><img alt="A mast" src=a.png><figcaption>The mast</figcaption></figure>
</main></body></html>`;

const root = path.resolve(import.meta.dirname, '../..');

describe('HTML against parse5', () => {
  it('agrees on a page with the usual constructs', () => {
    const score = newScore();
    compare(judged('page.html', PAGE), score);
    compare(judged('page.html', PAGE.replaceAll('\n', '\r\n')), score);
    expectAgreement(score, 80, 'HTML', 'parse5', 'a page');
    expect({ missing: score.missing, extra: score.extra }).toEqual({ missing: [], extra: [] });
    expect(torn(PAGE)).toEqual([]);
  });

  it('agrees on the read-me files of npm packages, as micromark makes pages of them', () => {
    const score = newScore();
    for (const name of [
      'prettier',
      'vitest',
      'esbuild',
      'fast-check',
      'yaml',
      'eslint',
      'mocha',
      'vite',
      'parse5',
      'ajv',
      'ignore',
    ]) {
      const file = path.join(root, 'node_modules', name, 'README.md');
      if (!existsSync(file)) continue;
      const page = micromark(readFileSync(file, 'utf8'), {
        allowDangerousHtml: true,
        extensions: [gfm()],
        htmlExtensions: [gfmHtml()],
      });
      compareTimed(`${name}.html`, page, score);
      expect(torn(page)).toEqual([]);
    }
    expectAgreement(score, 1000, 'HTML', 'parse5', 'read-me files');
  }, 60_000);

  it('agrees on pages of the documentation of Rust', (context) => {
    const { status, stdout } = spawnSync('rustc', ['--print', 'sysroot'], { encoding: 'utf8' });
    const folder = path.join(status === 0 ? stdout.trim() : '/nowhere', 'share/doc/rust/html');
    if (!existsSync(folder)) return context.skip('needs a Rust toolchain with its documentation (rust-docs)');
    const score = newScore();
    for (const book of ['book', 'cargo', 'reference', 'rustdoc', 'std/vec']) {
      const inside = path.join(folder, book);
      if (!existsSync(inside)) continue;
      const files = readdirSync(inside).filter((file) => file.endsWith('.html') && file !== 'print.html');
      const stride = Math.max(1, Math.ceil(files.length / Number(process.env.ORACLE_FILES ?? 8)));
      for (let i = 0; i < files.length; i += stride) {
        const source = readFileSync(path.join(inside, files[i]!), 'utf8');
        if (source.length > 400_000) continue;
        compareTimed(`${book}/${files[i]}`, source, score);
        expect(torn(source)).toEqual([]);
      }
    }
    expectAgreement(score, 1000, 'HTML', 'parse5', 'Rust');
  }, 60_000);
});
