// Markdown of any shape, also with the markup of MDX and in the cells of a notebook.
import fc from 'fast-check';

/** Pieces of Markdown and of what is read in it. */
export const MARKDOWN_PARTS = [
  ...['word', 'two words', 'naïve', '漢字', '🙂', '\u0301', '"a b c d"', '“e f g h”', '.', ', '],
  ...[
    ' ',
    '  ',
    '\t',
    '\n',
    '\n\n',
    '\r\n',
    '\r',
    '  \n',
    '\\\n',
    '*',
    '**',
    '_',
    '~~',
    '`',
    '``',
    '[',
    ']',
    '](x)',
    '![',
    '[^a]',
    '<b>',
  ],
  ...[
    '</b>',
    '<kbd>',
    '</kbd>',
    '<q>',
    '<a href="y">',
    '</a>',
    '<code>',
    '</code>',
    '<br>',
    '&amp;',
    '&#65;',
    '&no;',
    '\\*',
    '\\',
  ],
  ...[
    '# ',
    '> ',
    '> [!WARNING]\n',
    '- ',
    '1. ',
    '    ',
    '| ',
    '|-|-|\n',
    '```\n',
    '---\n',
    '===\n',
    '!!! note\n    ',
    ':::tip x\n',
    ':::\n',
  ],
  ...[
    '{{ a }}',
    '{% b',
    '${c}',
    ':d:',
    'https://e.f',
    'g@h.i',
    '[j]: k\n',
    '---\ntitle: "l \\" m"\n---\n',
    '\uFEFF',
    '\uFFFC',
    '\0',
    '\ud800',
  ],
  ...[
    'Term\n: ',
    '{% highlight %}\n',
    '{% endhighlight %}\n',
    '<div>\n',
    '</div>\n\n',
    '<table><tr><td>',
    '<p title="n o">',
    '> <blockquote>\n> ',
  ],
  ...[
    '{x}',
    "{' '}",
    '{',
    '}',
    '<A b="c &lt; d" title="e f">',
    '</A>',
    '<B/>',
    'import C from "d"\n\n',
    '<td>',
    '</td>',
  ],
  ...[
    '**term**: ',
    'Glossary\n===\n\n',
    ': definition\n',
    '<!-- c -->',
    '<!--',
    '| Term | Means |\n|-|-|\n',
    '+++\n',
    '{{< x >}}',
    '{{< warning >}}\n',
    '{% endhint %}\n',
    '```{note} a *b*\n:c: d\n',
    '{: .danger}\n',
    '<div class="warning" lang="fr">\n\n',
    '<i lang="de">',
    '<Warning>',
    '</Warning>',
    'export const d = {\n',
    '{/* ',
  ],
  ...['# Glossary\n\n', '**term** 🙂**: said ', '- **one** – `two` &amp; '],
];

/** Mixtures of up to forty pieces. */
export const markdownSoup = fc
  .array(fc.constantFrom(...MARKDOWN_PARTS), { maxLength: 40 })
  .map((parts) => parts.join(''));

/** A notebook (nbformat 4) whose cells hold such mixtures, as one string or line by line; sometimes cut off or torn. */
export const notebookSoup = fc
  .tuple(
    fc.array(fc.tuple(fc.constantFrom('markdown', 'markdown', 'code', 'raw'), markdownSoup, fc.boolean()), {
      maxLength: 4,
    }),
    fc.boolean(),
    fc.option(fc.tuple(fc.nat(400), fc.constantFrom('', '"', '\\', '{', '\\u00e9', ',')), { freq: 3 }),
  )
  .map(([cells, spaced, torn]) => {
    const written = JSON.stringify(
      {
        cells: cells.map(([kind, text, whole]) => ({
          cell_type: kind,
          metadata: {},
          source: whole ? text : text.split(/(?<=\n)/),
        })),
        metadata: { language_info: { name: 'python' } },
        nbformat: 4,
        nbformat_minor: 5,
      },
      null,
      spaced ? 1 : 0,
    );
    return torn === null ? written : written.slice(0, torn[0]) + torn[1] + written.slice(torn[0] + 1);
  });
