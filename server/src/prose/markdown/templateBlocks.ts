// Template markers of site generators that hold code, comments or drawings between them: none of it is prose.
import type { BlockContext, Line, MarkdownConfig } from '@lezer/markdown';
import { passLinesTo, wholeText } from './ahead.js';

const BODIES = 'highlight|code|codeblock|code-block|comment|mermaid|katex|math|chart|plantuml|graphviz|goat|gist';
const OPENING = new RegExp(
  `^(?:\\{%-?\\s*(${BODIES})\\b[^\\n]*?%\\}|\\{\\{([<%])\\s*(${BODIES})\\b[^\\n]*?[>%]\\}\\})`,
);

/**
 * `{% highlight %}` … `{% endhighlight %}` (Liquid), `{{< highlight >}}` … `{{< /highlight >}}` (shortcodes). What stands between
 * `{% raw %}` and its end is Markdown like any other. A marker that nothing ends stands for itself.
 */
function parseTemplateBlock(cx: BlockContext, line: Line): boolean {
  if (line.next !== 123) return false;
  const opening = OPENING.exec(line.text.slice(line.pos));
  if (!opening) return false;
  const from = cx.lineStart + line.pos;
  const closing = closingOf(opening);
  closing.lastIndex = from + opening[0].length;
  const found = opening[0].endsWith('/>}}') ? null : closing.exec(wholeText(cx));
  if (found) {
    passLinesTo(cx, () => cx.lineStart + line.text.length, found.index + found[0].length);
    cx.addElement(cx.elt('TemplateBlock', from, Math.max(cx.prevLineEnd(), from)));
  } else {
    cx.addElement(cx.elt('UnendedTemplate', from, cx.lineStart + line.text.length));
    cx.nextLine();
  }
  return true;
}

function closingOf([, tag, , shortcode]: RegExpExecArray): RegExp {
  return tag === undefined
    ? new RegExp(`\\{\\{[<%]\\s*/${shortcode!}\\s*[>%]\\}\\}`, 'g')
    : new RegExp(`\\{%-?\\s*end${tag}\\s*-?%\\}`, 'g');
}

/** The extension of the Markdown grammar. */
export const templateBlocks: MarkdownConfig = {
  defineNodes: [
    { name: 'TemplateBlock', block: true },
    { name: 'UnendedTemplate', block: true },
  ],
  parseBlock: [
    {
      name: 'TemplateBlock',
      parse: parseTemplateBlock,
      endLeaf: (_cx, line) => line.next === 123 && OPENING.test(line.text.slice(line.pos)),
      before: 'FencedCode',
    },
  ],
};
