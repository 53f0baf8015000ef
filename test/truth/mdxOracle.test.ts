// MDX held against micromark 4 with micromark-extension-mdxjs 3 (MDX's own grammar): the words that are prose, and where they stand.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import fc from 'fast-check';
import { parse, postprocess, preprocess } from 'micromark';
import { gfm } from 'micromark-extension-gfm';
import { mdxjs } from 'micromark-extension-mdxjs';
import { describe, expect, it } from 'vitest';
import { sourceEnd, sourceStart } from '../../server/src/prose/prose.js';
import { read } from '../../server/src/prose/read.js';
import { tell } from './oracleTable.js';
import { MDX_PAGE } from '../unit/prose/mdxPage.js';

const WORD = /[\p{L}\p{N}]+/gu;
const CLOSED = new Set([
  ...['codeText', 'codeFenced', 'resource', 'reference', 'definition', 'literalAutolink', 'gfmFootnoteCall'],
  ...['gfmFootnoteDefinitionLabel', 'taskListCheck', 'mdxjsEsm', 'mdxFlowExpression', 'mdxTextExpression'],
]);
const TAGS = new Set(['mdxJsxFlowTag', 'mdxJsxTextTag']);
/** Elements whose children are code by their names, which the grammar does not know. */
const CODE = /^<(\/?)(?:code|pre|CodeBlock)\b[^>]*?(\/?)>$/;
const FRONT_MATTER = /^---\n[^]*?\n---\n/;

/** Of each unit: 1 text, 2 inside a tag (its attributes are not judged), 0 no prose. Throws where it is no MDX. */
function judge(source: string): Uint8Array {
  const text = source.replace(FRONT_MATTER, (what) => what.replace(/[^\n]/g, ' '));
  const units = new Uint8Array(text.length);
  const events = postprocess(
    parse({ extensions: [gfm(), mdxjs()] })
      .document()
      .write(preprocess()(text, undefined, true)),
  );
  let closed = 0;
  for (const [phase, token] of events) {
    if (CLOSED.has(token.type)) closed += phase === 'enter' ? 1 : -1;
    const [from, to] = [token.start.offset, token.end.offset];
    if (TAGS.has(token.type) && phase === 'enter') {
      units.fill(2, from, to);
      const code = CODE.exec(text.slice(from, to));
      if (code && code[2] === '') closed += code[1] === '' ? 1 : -1;
    }
    if (phase === 'exit' || closed > 0) continue;
    if (token.type === 'data' || token.type === 'characterEscapeValue') units.fill(1, from, to);
  }
  return units;
}

/** What the reader and the grammar do not agree on, and how many words they agree on. */
function differences(source: string): { agreed: number; differing: string[] } {
  const units = judge(source);
  const isAll = (marks: Uint8Array, from: number, to: number): boolean =>
    marks.subarray(from, to).every((m) => m === 1);
  const ours = new Uint8Array(source.length);
  const differing: string[] = [];
  let agreed = 0;
  for (const block of read({ uri: 'file:///page.mdx', format: 'mdx', text: source }).blocks) {
    if (block.content.kind === 'title' || block.content.kind === 'description') continue;
    for (const { 0: word, index } of block.content.text.matchAll(WORD)) {
      const [from, to] = [sourceStart(block, index), sourceEnd(block, index + word.length)];
      const slice = source.slice(from, to);
      const closed = (block.content.zones & 2) !== 0;
      if (!closed) ours.fill(1, from, to);
      if (slice !== word) {
        if (!/[*_~&\\<\]{]/.test(slice)) differing.push(`misplaced ${word}: ${slice}`);
      } else if (!closed && units[from] !== 2) {
        if (isAll(units, from, to)) agreed++;
        else differing.push(`extra ${word}@${from}`);
      }
    }
  }
  for (const { 0: word, index } of source.matchAll(WORD)) {
    if (isAll(units, index, index + word.length) && !isAll(ours, index, index + word.length))
      differing.push(`missing ${word}@${index}`);
  }
  return { agreed, differing };
}

/** Pieces of valid MDX, each a block of its own; `inner` stands for nested blocks. */
const leaves = fc.constantFrom(
  '    1. one\n    2. two\n    > three',
  ...[
    'A plain *line* of `code` and words.',
    '# A heading {1 + 1}',
    '- one\n- two <B/> three\n\n  more',
    '1. first {x}',
  ],
  ...['| a | b {c} |\n|---|---|\n| <b>d</b> | e |', '```js\nno {\n```', '> said <i>so</i> {/* no */}\n> again'],
  ...[
    "{list.map(i => <li>Don't {i}</li>)}",
    '{/* no\n\nno */}',
    "Text {' '} with {`a ${b ? `c` : '}'}`} holes {a / b} x {c}.",
  ],
  ...[
    '<Foo bar="baz" {...props} qux={{a: "}"}} />',
    '<Foo\n  bar={<b>no</b>}\n>\ntext here\n</Foo>',
    '<Foo>one line</Foo>',
  ],
  ...[
    "<a.b:c d='e' /> then text",
    'Escaped \\{ brace and \\< sign, "quotes" &amp; more.',
    'two\nlines of <>a fragment</> text',
  ],
  ...[
    '<Note>{children}</Note>',
    '***',
    '[link *text*](/url "title") and ![alt](x.png)',
    '\tindented text\n\t  goes on',
  ],
  ...['        # deep heading', '{/[}\'"]/.test(x) ? 1 : 2}', '{"str\\"ing }"}', '<Foo title="multi\nline" />'],
  ...['**bold <Sub>inner *text*</Sub> end**', 'a~~struck~~ www.example.com http://a.b/c d', '<p>para *graph*</p>'],
);
const modules = fc.constantFrom(
  ...['import a from "a"', "import {\n  b,\n\n  c\n} from 'b'", 'export const d = {\n\n  e: `\n\n${f}`,\n}'],
  ...[
    "export default function G() {\n  // it's\n\n  return <p>Don't</p>\n}",
    'export const h = /[/}]/g; /* no\n\nno */',
  ],
);
const blocks: fc.Arbitrary<string> = fc.letrec<{ block: string; nested: string }>((tie) => ({
  block: fc.oneof({ depthSize: 'small', withCrossShrink: true }, leaves, modules, tie('nested')),
  nested: fc
    .tuple(fc.constantFrom('Tabs', 'div', 'Card.Body'), fc.array(tie('block'), { maxLength: 3 }), fc.nat({ max: 6 }))
    .map(([name, inner, indent]) => {
      const isModule = (text: string): boolean => /^(?:im|ex)port/.test(text);
      const body = inner.filter((text) => !isModule(text)).join('\n\n');
      const shifted = body.replace(/^(?=.)/gm, ' '.repeat(indent));
      return `<${name} label="A label">\n\n${shifted}\n\n</${name}>`;
    }),
})).block;

describe('MDX against its own grammar', () => {
  it('agrees on a realistic page', () => {
    const page = MDX_PAGE.replace(/<!--[^]*?-->/, '')
      .replace(/:::.*/g, '')
      .replace('{#keys}', '');
    const { agreed, differing } = differences(page);
    expect(differing).toEqual([]);
    expect(agreed).toBeGreaterThan(90);
  });

  it('agrees on any mixture of modules, elements, expressions and Markdown that is MDX', () => {
    let agreed = 0;
    let judged = 0;
    fc.assert(
      fc.property(fc.array(blocks, { minLength: 1, maxLength: 8 }), (parts) => {
        const text = parts.join('\n\n');
        let result;
        try {
          result = differences(text);
        } catch {
          // The grammar refuses it, such as an element that a list interrupts.
          return;
        }
        judged++;
        agreed += result.agreed;
        expect(result.differing, text).toEqual([]);
      }),
      { numRuns: 500 },
    );
    console.info(`${judged} of 500 mixtures are MDX; ${agreed} words agreed on`);
    expect(judged).toBeGreaterThan(300);
  });

  it('agrees on the read-me files of npm packages that are MDX too', () => {
    const root = path.resolve(import.meta.dirname, '../..');
    const files = readdirSync(path.join(root, 'node_modules'))
      .filter((name) => /^(?:micromark|mdast|unist|estree|character-|decode-|acorn)/.test(name))
      .flatMap((name) => ['readme.md', 'README.md'].map((file) => path.join('node_modules', name, file)))
      .filter((file) => existsSync(path.join(root, file)));
    let agreed = 0;
    let judged = 0;
    let units = 0;
    const differing: string[] = [];
    for (const file of files.sort()) {
      const source = readFileSync(path.join(root, file), 'utf8').replace(/<!--[^]*?-->/g, (what) =>
        what.replace(/[^\n]/g, ' '),
      );
      try {
        const result = differences(source);
        judged++;
        agreed += result.agreed;
        units += source.length;
        differing.push(...result.differing.map((what) => `${file}: ${what}`));
      } catch {
        // No MDX: an address in angle brackets, say.
      }
    }
    console.info(`${judged} of ${files.length} files are MDX; ${agreed} words agreed on, ${differing.length} not`);
    const wrong = (what: string): number => differing.filter((line) => line.includes(`: ${what} `)).length;
    tell({
      ...{
        format: 'MDX',
        oracle: 'micromark-extension-mdxjs',
        set: 'read-me files',
        misplaced: wrong('misplaced'),
        units,
      },
      ...{ theirs: agreed + wrong('missing'), found: agreed, ours: agreed + wrong('extra'), right: agreed },
    });
    expect(differing).toEqual([]);
    expect(agreed).toBeGreaterThan(1000);
  });
});
