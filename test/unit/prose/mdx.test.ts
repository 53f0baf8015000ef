// MDX: module code, elements, expressions; what is prose in them and what is not.
import { describe, expect, it } from 'vitest';
import { outline as outlineOf, prose as proseOf, sourceOf } from './reading.js';

const outline = (text: string): string[] => outlineOf(text, 'mdx');
const problems = (text: string): string[] =>
  proseOf(text, 'mdx').problems.map(({ span, message }) => `${text.slice(span.start, span.end)}: ${message}`);

describe('module code', () => {
  it('is no prose, over blank lines in its brackets and to the next blank line', () => {
    const text =
      'import A from "a"\nimport {\n  B,\n} from "b";\n\nOne.\n\nexport const c = `\n\n${"}"}\n\n`\n\nexport function D() {\n\n  return <p>Don\'t</p>;\n}\n\nTwo.\n';
    expect(outline(text)).toEqual(['paragraph: One.', 'paragraph: Two.']);
  });

  it('is not what merely begins with such a word', () => {
    expect(outline('import the key first.\n\nexport it then.\n\n> import A from "a"\n')).toEqual([
      'paragraph: import the key first.',
      'paragraph: export it then.',
      'paragraph[quotation]: import A from "a"',
    ]);
  });
});

describe('elements', () => {
  it('hold Markdown, at any indentation', () => {
    const text =
      '<Tabs>\n    <TabItem>\n        # Deep\n        Text *here*\n        </TabItem>\n    <TabItem>\n\n        ```sh\n        no\n        ```\n\n        - one\n        - two\n\n    </TabItem>\n</Tabs>\n';
    expect(outline(text)).toEqual([
      'heading1[heading]: Deep',
      'paragraph: Text here',
      'listItem: one',
      'listItem: two',
    ]);
  });

  it('vanish in a line, but for those without children, which stand for something', () => {
    expect(outline('A <B c={d > 1 ? "x" : `y`}>bold</B> <Icon/> <>word</> <a.b>x</a.b><C>y</C>.')).toEqual([
      'paragraph: A bold @ word x y.',
    ]);
  });

  it('part a paragraph where they are cells, items or headings of HTML', () => {
    expect(outline('<tr><td>one</td><td>two *three*</td></tr>')).toEqual([
      'tableCell[tableCell]: one',
      'tableCell[tableCell]: two three',
    ]);
    expect(outline('<h2>Head</h2> <li>item</li>after')).toEqual([
      'heading2[heading]: Head',
      'listItem: item',
      'paragraph: after',
    ]);
  });

  it('put their text into zones', () => {
    const text =
      '<Warning>Stop.</Warning>\n\n<Callout type="danger" title="Look">\n\nA.\n\n</Callout>\n\n<Callout type="info">\n\nB.\n\n</Callout>\n\n<blockquote>\nC.\n</blockquote>\n\n<div className="caution">\nD.\n</div>\n\n<CodeBlock>\nE.\n</CodeBlock>\n\nPress <Kbd>F</Kbd> or <kbd>G</kbd>.\n';
    expect(outline(text)).toEqual([
      'paragraph: <safetyMessage:Stop.>',
      'caption[safetyMessage]: Look',
      'paragraph[safetyMessage]: A.',
      'paragraph: B.',
      'paragraph[quotation]: C.',
      'paragraph[safetyMessage]: D.',
      'paragraph[code]: E.',
      'paragraph: Press <uiLabel:F> or <uiLabel:G>.',
    ]);
  });

  it('give languages', () => {
    const { blocks } = proseOf('<div lang="fr">\n\nLa clé.\n\n</div>\n\nThe key.\n', 'mdx');
    expect(blocks.map(({ content }) => content.language)).toEqual(['fr', undefined]);
  });

  it('are links with targets', () => {
    const { links } = proseOf('<Link to="/a">the page</Link> <a href="/b">b</a>', 'mdx').blocks[0]!.content;
    expect(links.map(({ target }) => target)).toEqual(['/a', '/b']);
  });
});

describe('attributes', () => {
  it('are prose where readers are shown them as strings', () => {
    const text =
      '<Card title="Rotate a &quot;key&quot;" icon="key" href="/x" description="Every ninety days">\n\nSee <Image alt="A mast" title={"no"} src="a.png"/>.\n\n</Card>\n';
    expect(outline(text)).toEqual([
      'caption: Rotate a "key"',
      'paragraph: Every ninety days',
      'paragraph: See @.',
      'alternativeText[alternativeText]: A mast',
    ]);
    expect(sourceOf(text, '"key"', 'mdx')).toBe('&quot;key&quot;');
  });

  it('are not file names, and nothing of code', () => {
    expect(
      outline('<File title="src/app.js" label="useKey" />\n\n<CodeBlock title="The config">\n</CodeBlock>\n'),
    ).toEqual([]);
  });
});

describe('expressions', () => {
  it('are never prose: opaque in a line, nothing for comments, a blank for one', () => {
    expect(
      outline("{intro}\n\nA{' '}b {x ? 'y' : {z: `}`}} c{/* no */} d.\n\n{\n  list.map(i => <li>Don't</li>)\n\n}\n"),
    ).toEqual(['paragraph: A b @ c d.']);
  });

  it('are not identifiers of headings or what stands in code', () => {
    expect(outline('## Head `{x` {#id}\n\n`{a` b `c}`\n')).toEqual(['heading2[heading]: Head @', 'paragraph: @ b @']);
  });
});

describe('what MDX does not have', () => {
  it('is code by indentation', () => expect(outline('    text\n')).toEqual(['paragraph: text']));

  it('is taken as older pages have it: comments, addresses, tags of HTML', () => {
    expect(outline('<!-- no\n\nno -->\n\nA <!-- no --> <https://b.example/c> <br> <p align=center>d.\n')).toEqual([
      'paragraph: A @ d.',
    ]);
  });
});

describe('broken MDX', () => {
  it('costs the rest of a line inside a paragraph, and is said', () => {
    const text = 'One {two\nthree <Four five="\nsix < 7 <8.\n';
    expect(outline(text)).toEqual(['paragraph: One @ three @ six < 7 <8.']);
    expect(problems(text)).toHaveLength(2);
    expect(problems(text)[0]).toMatch(/^\{two: .*rest of the line/);
  });

  it('costs what stands before the next blank line where a block begins with it', () => {
    const text = '<Tabs label="\nx\n\nOne.\n\nexport const a = {\n\nTwo.\n\n{\n\nThree.\n';
    expect(outline(text)).toEqual(['paragraph: One.', 'paragraph: Two.', 'paragraph: Three.']);
    expect(problems(text)).toHaveLength(3);
  });

  it('never loses the page behind an element that nothing closes', () => {
    expect(outline('<CodeBlock>\n\nOne.\n\n</Other>\n\nTwo.\n')).toEqual(['paragraph: One.', 'paragraph: Two.']);
  });
});
