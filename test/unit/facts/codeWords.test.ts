// Names of code: which words of the prose are known to stand in the document's code as well.
import { describe, expect, test } from 'vitest';
import { factsOf, factsOfProse, Profiles } from '../../../server/src/engine/factsOf.js';
import type { DocumentFacts } from '../../../server/src/facts/documentFacts.js';
import { reread, startReading } from '../../../server/src/prose/read.js';
import type { Format } from '../../../server/src/text/sourceText.js';

const profiles = new Profiles();

function inCode(facts: DocumentFacts): string[] {
  return facts.words.filter((_, id) => facts.inCode[id] === 1);
}

function namesIn(format: Format, text: string): string[] {
  return inCode(factsOf({ uri: 'file:///a', format, text }, profiles)[0]!);
}

describe('words in code', () => {
  test.each<[Format, string]>([
    [
      'markdown',
      'Set `lastname` or `mast-light`.\n\n```yaml\nbuoy: x\n```\n\nThe lastname, the mast-light, a buoy, a chain.',
    ],
    [
      'restructuredtext',
      'Set ``lastname``, ``mast-light``::\n\n  buoy = x\n\nThe lastname, the mast-light, a buoy, a chain.',
    ],
    [
      'asciidoc',
      'Set `lastname` or `mast-light`.\n\n----\nbuoy = x\n----\n\nThe lastname, the mast-light, a buoy, a chain.',
    ],
    [
      'html',
      '<p>Set <code>lastname</code> or <code>mast-light</code>.</p><pre>buoy = x</pre><p>The lastname, the mast-light, a buoy, a chain.</p>',
    ],
  ])('in %s', (format, text) => {
    expect(namesIn(format, text)).toEqual(['lastname', 'mast-light', 'buoy']);
  });

  test('options, parts of longer names, paths, addresses and comments are no names', () => {
    const code =
      'moor --dry-run last_name etc/chain/light https://buoy.example/chain # a light chain\nmoor // the chain';
    expect(namesIn('markdown', `\`\`\`sh\n${code}\n\`\`\`\n\nThe dry-run, a name, the chain and the light.`)).toEqual(
      [],
    );
  });

  test('capitals count as written', () => {
    expect(namesIn('markdown', 'Use `BuoyKind`.\n\nA buoykind is a BuoyKind.')).toEqual(['BuoyKind']);
  });

  test('a document read again after an edit has the same', () => {
    const before = { uri: 'file:///a.md', format: 'markdown', text: 'Use `mast`.\n\nA mast, a buoy.\n' } as const;
    const after = { ...before, text: 'Use `mast` and `buoy`.\n\nA mast, a buoy.\n' };
    const again = reread(startReading(before), after);
    expect(inCode(factsOfProse(again.prose, profiles, after)[0]!)).toEqual(['mast', 'buoy']);
    expect(factsOfProse(again.prose, profiles, after)).toEqual(factsOf(after, profiles));
  });

  test('tags are none, what they hold is; a lone sign of one is no tag', () => {
    expect(
      namesIn('markdown', '```html\n<chain light="x">buoy</chain> x <mast\n```\n\nA chain, a light, a buoy, a mast.'),
    ).toEqual(['buoy', 'mast']);
  });

  test.each(['<a', 'ab-', '# ', '/', 'a_'])('a long line of %j costs no more than its length', (sign) => {
    const start = performance.now();
    namesIn('markdown', `\`\`\`\n${sign.repeat(300_000)}\n\`\`\`\n`);
    // A cost that grows with the square would take minutes.
    expect(performance.now() - start).toBeLessThan(5000);
  });
});
