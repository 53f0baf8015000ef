// The report's three files over small workspaces: figures, escaping, soundness of the HTML, determinism, emptiness.
import { micromark } from 'micromark';
import { gfm, gfmHtml } from 'micromark-extension-gfm';
import { parse, type DefaultTreeAdapterTypes } from 'parse5';
import { describe, expect, it } from 'vitest';
import { collectReport } from '../../../server/src/report/collect.js';
import { toHtml } from '../../../server/src/report/html.js';
import { escapeMarkdown, toMarkdown } from '../../../server/src/report/markdown.js';
import { makeReport } from '../../../server/src/report/report.js';
import type { ReportData } from '../../../server/src/report/reportData.js';
import { ROOT, snapshotOf } from './workspace.js';

const PAGES = {
  'guide/a.md':
    'Choose the data set first. The data set is checked, and each data set is kept.\n\nRotate the access key daily.',
  'guide/b.md': 'The dataset is large. Load the dataset again. Each dataset has a name. The API key expires.',
  'api/c.md': 'A data set has rows. Keep the access keys apart. The access key is long. The access key is secret.',
};
const TERMBASE = 'concepts:\n  - preferred: access key\n    deprecated: [API key]\napart:\n  - [alarm, alert]\n';

describe('the report’s data', () => {
  const data = collectReport(snapshotOf(PAGES, TERMBASE), ROOT, { generatedAt: '2024-05-31' });

  it('counts decided concepts by status and page, and their drift', () => {
    const [concept] = data.concepts;
    expect(concept!.terms.map(({ text, status, uses, documents }) => [text, status, uses, documents])).toEqual([
      ['access key', 'preferred', 4, 2],
      ['API key', 'deprecated', 1, 1],
    ]);
    expect(concept!.terms[1]!.pages).toEqual([{ path: 'guide/b.md', uses: 1 }]);
    expect(concept!.toChange).toBe(1);
    // H(⅘, ⅕) = log2 5 − ⅘ · 2 bits, by hand.
    expect(concept!.drift!.bits).toBeCloseTo(Math.log2(5) - 1.6, 12);
    expect(data.apart).toEqual([{ terms: ['alarm', 'alert'] }]);
  });

  it('lists open questions with sentences that hold the names where it says', () => {
    const [question] = data.questions;
    expect(question!.terms.map(({ text, uses }) => [text, uses])).toEqual([
      ['data set', 4],
      ['dataset', 3],
    ]);
    expect(question!.settles).toBe(3);
    expect(question!.examples.length).toBeGreaterThan(2);
    for (const { path, line, text, highlight } of question!.examples) {
      expect(Object.keys(PAGES)).toContain(path);
      expect(line).toBe(1);
      expect(text.slice(highlight.start, highlight.end)).toMatch(/^data ?sets?$/);
    }
  });

  it('says the state in a sentence and five figures', () => {
    expect(data.state).toBe('1 concept is decided, and 80 % of its uses keep to the decision; 1 question is open.');
    expect(data.figures.map(({ id, text }) => `${id} ${text}`)).toEqual([
      ...['pages 3', 'open-questions 1', 'decided-concepts 1', 'kept 80 %'],
      // (5 · H(⅘, ⅕) + 7 · H(4⁄7, 3⁄7)) / 12 = .875511 bits, 2 to the power of it 1.834661; by hand.
      'drift 1.83',
    ]);
  });

  it('is a function of texts and termbase, not of the order in which pages came', () => {
    const backwards = Object.fromEntries(Object.entries(PAGES).reverse());
    const options = { generatedAt: '2024-05-31' };
    expect([...makeReport(snapshotOf(backwards, TERMBASE), ROOT, options)]).toEqual([
      ...makeReport(snapshotOf(PAGES, TERMBASE), ROOT, options),
    ]);
  });
});

describe('an empty workspace', () => {
  it.each([
    ['no pages', {}, undefined, 'No pages were found here, so there is nothing to report yet.'],
    [
      'no questions and no termbase',
      { 'a.md': 'One page.' },
      undefined,
      'No mixed terms were found, and nothing is decided yet.',
    ],
    [
      'decided names that nobody uses',
      { 'a.md': 'One page.' },
      'concepts:\n  - preferred: anchor\n',
      '1 concept is decided, and no page uses any of its names; no question is open.',
    ],
  ])('%s: reads sensibly', (_, pages, termbase, state) => {
    const files = makeReport(snapshotOf(pages, termbase), ROOT);
    expect([...files.keys()]).toEqual(['report.html', 'report.md', 'report.json']);
    expect(files.get('report.html')).toContain(`<p class="state">${state}</p>`);
    expect(files.get('report.md')).toContain(`**${state}**`);
    const json = JSON.parse(files.get('report.json')!) as { version: number; state: string };
    expect(json).toMatchObject({ version: 1, state, questions: [] });
    for (const text of files.values()) expect(text).not.toMatch(/NaN|undefined|Infinity|\[object/);
  });
});

const HOSTILE = `</p><script>alert("1")</script> & 'x' \`y\` | *z* [l](u) <b> &lt; _e_ ~~s~~ \\ \u0001\uD800 # 1. a`;

/** Data in which every text is hostile. */
function hostileData(): ReportData {
  const term = { text: HOSTILE, uses: 3, documents: 1 };
  return {
    ...{ generatedAt: HOSTILE, folder: HOSTILE, state: HOSTILE, documents: 1, words: 9 },
    figures: [{ id: 'pages', label: HOSTILE, text: HOSTILE, note: HOSTILE }],
    questions: [
      {
        ...{ id: HOSTILE, kind: 'synonym', language: '"><i>', objects: [HOSTILE], confidence: 0.5, settles: 3 },
        terms: [{ ...term, forms: [HOSTILE] }],
        reasons: [{ kind: 'x', text: HOSTILE, value: 1 }],
        examples: [{ term: HOSTILE, path: HOSTILE, line: 1, text: HOSTILE, highlight: { start: 0, end: 9 } }],
        drift: { bits: 0.5, names: 1.4 },
      },
    ],
    concepts: [
      {
        ...{ name: HOSTILE, definition: HOSTILE, subject: HOSTILE, with: [HOSTILE], toChange: 3 },
        terms: [{ ...term, status: 'deprecated', note: HOSTILE, pages: [{ path: HOSTILE, uses: 3 }] }],
        where: {
          givenFolder: 1,
          givenPage: 1,
          information: 1,
          shares: { folders: 0.5 },
          folders: [{ folder: HOSTILE, uses: [3] }],
        },
        drift: { bits: 0.5, names: 1.4 },
      },
    ],
    apart: [{ terms: [HOSTILE, HOSTILE], note: HOSTILE }],
    later: [{ terms: [HOSTILE] }],
    otherTermbases: [{ path: HOSTILE, concepts: 1 }],
  };
}

type Node = DefaultTreeAdapterTypes.ChildNode | DefaultTreeAdapterTypes.Document;

function elements(node: Node): DefaultTreeAdapterTypes.Element[] {
  const below = 'childNodes' in node ? node.childNodes.flatMap(elements) : [];
  return 'tagName' in node ? [node, ...below] : below;
}

/** Parses by the HTML standard (npm `parse5`), which names every parse error. */
function parsed(text: string): { elements: DefaultTreeAdapterTypes.Element[]; errors: string[] } {
  const errors: string[] = [];
  const document = parse(text, { onParseError: ({ code, startLine }) => errors.push(`${startLine}: ${code}`) });
  return { elements: elements(document), errors };
}

describe.each([
  ['of a workspace', collectReport(snapshotOf(PAGES, TERMBASE), ROOT, {})],
  ['of hostile texts', hostileData()],
])('report.html %s', (_, data) => {
  const text = toHtml(data);
  const found = parsed(text);

  it('is free of parse errors', () => expect(found.errors).toEqual([]));

  it('holds nothing that runs, loads or leaves the page', () => {
    const names = new Set(found.elements.map(({ tagName }) => tagName));
    for (const name of ['script', 'link', 'img', 'iframe', 'object', 'embed', 'form', 'b', 'i'])
      expect(names).not.toContain(name);
    for (const { attrs } of found.elements) {
      for (const { name, value } of attrs) {
        expect(name).not.toMatch(/^(src|srcset|style|on.*|action|data|background)$/);
        if (name === 'href') expect(value).toMatch(/^#/);
      }
    }
    const styles = /<style>([^]*?)<\/style>/.exec(text)![1]!;
    expect(styles).not.toMatch(/url\(|@import|@font-face|https?:/);
  });

  it('has landmarks, headings in order, scoped heads of tables, and targets for its links', () => {
    const names = found.elements.map(({ tagName }) => tagName);
    for (const name of ['main', 'header', 'footer', 'nav', 'title']) expect(names).toContain(name);
    const levels = names.flatMap((name) => (/^h[1-6]$/.test(name) ? [Number(name[1])] : []));
    expect(levels[0]).toBe(1);
    levels.forEach((level, i) => expect(level).toBeLessThanOrEqual((levels[i - 1] ?? 0) + 1));
    const attribute = (element: DefaultTreeAdapterTypes.Element, name: string): string | undefined =>
      element.attrs.find((each) => each.name === name)?.value;
    for (const element of found.elements) {
      if (element.tagName === 'th') expect(['col', 'row']).toContain(attribute(element, 'scope'));
    }
    const ids = found.elements.flatMap((element) => attribute(element, 'id') ?? []);
    expect(new Set(ids).size).toBe(ids.length);
    for (const element of found.elements) {
      const target = attribute(element, 'href') ?? attribute(element, 'aria-labelledby');
      if (target !== undefined) expect(ids).toContain(target.replace('#', ''));
    }
  });
});

describe('report.md', () => {
  const render = (text: string): string =>
    micromark(text, { extensions: [gfm()], htmlExtensions: [gfmHtml()], allowDangerousHtml: true });

  it.each([
    HOSTILE.replace('\u0001\uD800', ''),
    '# a',
    '1. a',
    '- a',
    '+ a',
    'a_b_c',
    '__init__',
    'AT&T &amp; &copy;',
    '![a](b)',
    '***',
    '| a |',
  ])('shows %j as it is', (text) => {
    const shown = render(escapeMarkdown(text))
      .replace(/^<p>|<\/p>$/g, '')
      .replace(/&lt;/g, '<')
      .replace(/&gt;/g, '>')
      .replace(/&quot;/g, '"')
      .replace(/&amp;/g, '&');
    expect(shown).toBe(text);
  });

  it('keeps rows of tables whole, whatever the texts', () => {
    const rendered = render(toMarkdown(hostileData()));
    expect(rendered).not.toMatch(/<script|<b>|<em>|<del>|<a /);
    for (const [row] of rendered.matchAll(/<tr>[^]*?<\/tr>/g))
      expect([3, 4, 5]).toContain(row.match(/<t[hd]/g)!.length);
    expect(rendered.match(/<table>/g)).toHaveLength(3);
  });
});
