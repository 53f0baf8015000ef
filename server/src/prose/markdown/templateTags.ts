// Template markers around an admonition, each on a line of its own: `{{< warning >}}` … `{{< /warning >}}`, `{% hint %}` … `{% endhint %}`.
import type { BlockContext, Line, MarkdownConfig } from '@lezer/markdown';
import { Zone } from '../zones.js';
import type { Step } from './wrappers.js';

const NAMES = 'danger|warning|caution|notice|note|tip|info|important|alert|callout|admonition|hint|attention|message';
const SHORTCODE = new RegExp(`^\\{\\{[<%]\\s*(/?)\\s*(${NAMES})\\b([^\\n]*?)[>%]\\}\\}\\s*$`, 'i');
const LIQUID = new RegExp(`^\\{%-?\\s*(end)?(${NAMES})\\b([^\\n]*?)-?%\\}\\s*$`, 'i');
const SAFETY = /\b(?:danger|warning|caution|notice)\b/i;

function tagOf(line: string): RegExpExecArray | null {
  return line.startsWith('{{') ? SHORTCODE.exec(line) : line.startsWith('{%') ? LIQUID.exec(line) : null;
}

function parseTag(cx: BlockContext, line: Line): boolean {
  if (line.next !== 123 || tagOf(line.text.slice(line.pos)) === null) return false;
  cx.addElement(cx.elt('TemplateTag', cx.lineStart + line.pos, cx.lineStart + line.text.length));
  cx.nextLine();
  return true;
}

/** What the marker opens or closes; one that nothing closes has no effect. */
export function templateStep(marker: string): Omit<Step, 'at'> | undefined {
  const tag = tagOf(marker);
  if (!tag) return undefined;
  const [, ends, name, rest] = tag;
  const isSafety = SAFETY.test(name!) || SAFETY.test(rest!.replace(/\btitle\s*=\s*(?:"[^"]*"|'[^']*')/i, ''));
  return {
    name: `{${name!.toLowerCase()}}`,
    opens: ends === undefined || ends === '',
    effect: isSafety ? { zones: Zone.safetyMessage, language: undefined } : undefined,
  };
}

/** The extension of the Markdown grammar. */
export const templateTags: MarkdownConfig = {
  defineNodes: [{ name: 'TemplateTag', block: true }],
  parseBlock: [
    {
      name: 'TemplateTag',
      parse: parseTag,
      endLeaf: (_cx, line) => line.next === 123 && tagOf(line.text.slice(line.pos)) !== null,
      before: 'TemplateBlock',
    },
  ],
};
