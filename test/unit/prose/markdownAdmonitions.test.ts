// Admonitions as the common generators write them: which of them are safety messages, and what in them is prose.
import { describe, expect, it } from 'vitest';
import { outline, prose, sourceOf } from './reading.js';

// Syntax of each: common practice of the generators named; no standard exists.
describe('safety messages', () => {
  it('are alerts with a signal word, whose own title is a caption', () => {
    expect(outline('> [!WARNING] Hot *surface*\n> Stop.\n\n> [!NOTE]\n> Mind it.\n\n> [!tip]- Fold\n')).toEqual([
      'caption[safetyMessage]: Hot surface',
      'paragraph[safetyMessage]: Stop.',
      'paragraph: Mind it.',
      'caption: Fold',
    ]);
  });

  it('are paragraphs that open with a signal word in bold or in capitals, and a colon', () => {
    expect(outline('**Warning:** Stop.\n\n**Caution**: hot\n\nDANGER: Do not.\n\n- __Notice__! Look.\n')).toEqual([
      'paragraph[safetyMessage]: Warning: Stop.',
      'paragraph[safetyMessage]: Caution: hot',
      'paragraph[safetyMessage]: DANGER: Do not.',
      'listItem[safetyMessage]: Notice! Look.',
    ]);
    expect(outline('**Warning** signs are red.\n\nNotice: this is text.\n\nWARNING signs.\n')).toEqual([
      'paragraph: Warning signs are red.',
      'paragraph: Notice: this is text.',
      'paragraph: WARNING signs.',
    ]);
  });

  it('are paragraphs with such a class (kramdown)', () => {
    expect(outline('Stop.\n{: .warning}\n\nSee it.\n{: .note }\n\n> Said.\n{: .x .danger #id}\n')).toEqual([
      'paragraph[safetyMessage]: Stop.',
      'paragraph: See it.',
      'paragraph[quotation+safetyMessage]: Said.',
    ]);
  });

  it('stand between template markers', () => {
    const text =
      '{{< warning >}}\nStop *now*.\n{{< /warning >}}\nOn.\n\n{% hint style="danger" %}\nDo not.\n\n- one\n{% endhint %}\n\n{{% alert title="Warning" color="info" %}}\nMind it.\n{{% /alert %}}\n\n{{< caution >}}\n\nNever closed.\n';
    expect(outline(text)).toEqual([
      'paragraph[safetyMessage]: Stop now.',
      'paragraph: On.',
      'paragraph[safetyMessage]: Do not.',
      'listItem[safetyMessage]: one',
      'paragraph: Mind it.',
      'paragraph: Never closed.',
    ]);
  });

  it('are containers of colons and exclamation marks', () => {
    expect(
      outline(
        ':::danger[Take care]\nStop.\n:::\n\n::: warning STOP\nx\n:::\n\n!!! caution "Hot"\n    y\n\n!!! note ""\n    z\n',
      ),
    ).toEqual([
      ...['caption[safetyMessage]: Take care', 'paragraph[safetyMessage]: Stop.', 'caption[safetyMessage]: STOP'],
      ...['paragraph[safetyMessage]: x', 'caption[safetyMessage]: Hot', 'paragraph[safetyMessage]: y', 'paragraph: z'],
    ]);
  });
});

describe('fenced directives', () => {
  it('hold Markdown where they are admonitions and the like (MyST), else code', () => {
    const text =
      '````{warning} Hot surface\n:class: wide\n:name: hot\nStop *now*.\n\n```{note}\nInner [link](x).\n```\n````\n\n```{code-block} python\nno\n```\n\n```{figure} mast.png\n---\nwidth: 3\n---\nThe mast.\n```\n\n```python\nno\n```\n';
    expect(outline(text)).toEqual([
      'caption[safetyMessage]: Hot surface',
      'paragraph[safetyMessage]: Stop now.',
      'paragraph[safetyMessage]: Inner <linkText:link>.',
      'paragraph: The mast.',
    ]);
    expect(sourceOf(text, 'Inner link')).toBe('Inner [link');
  });

  it('are read four deep, and to the end of the page where nothing closes them', () => {
    const nested = [9, 8, 7, 6, 5, 4].map((n, i) => `${'`'.repeat(n)}{note}\nlevel ${i}\n`).join('');
    expect(outline(nested)).toEqual([
      'paragraph: level 0',
      'paragraph: level 1',
      'paragraph: level 2',
      'paragraph: level 3',
    ]);
    expect(outline('```{tip}\none\n\ntwo')).toEqual(['paragraph: one', 'paragraph: two']);
    expect(prose('```{tip}').blocks).toEqual([]);
  });
});
