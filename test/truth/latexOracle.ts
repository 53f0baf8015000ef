// Pandoc's view of a LaTeX document: the words that it takes for text, without what no reader calls prose.
import { spawnSync } from 'node:child_process';

/** What counts as a word in both readings. */
export const WORD = /[\p{L}\p{N}]+/gu;

/** True where Pandoc can be run. */
export const hasPandoc = spawnSync('pandoc', ['--version'], { stdio: 'ignore' }).status === 0;

interface Node {
  readonly t: string;
  readonly c?: unknown;
}

interface Document {
  readonly blocks: readonly Node[];
  readonly meta: Readonly<Record<string, Node>>;
}

/** Elements that hold code, mathematics, or what Pandoc does not understand. */
const NO_TEXT = new Set(['Code', 'CodeBlock', 'Math', 'RawInline', 'RawBlock', 'Cite', 'Image']);
/** Elements that run on in the text around them. */
const INLINE = new Set(['Str', 'Space', 'SoftBreak', 'Emph', 'Strong', 'Underline', 'SmallCaps', 'Strikeout', 'Quoted'])
  .add('Link')
  .add('Span');

/** The words of a document, or undefined where Pandoc cannot read it. */
export function oracleWords(source: string): string[] | undefined {
  const input = source.replace(/\\begin\{thebibliography\}[^]*?\\end\{thebibliography\}/g, '');
  const options = ['--from', 'latex', '--to', 'json'];
  const { status, stdout } = spawnSync('pandoc', options, { input, encoding: 'utf8', maxBuffer: 2 ** 28 });
  if (status !== 0) return undefined;
  const { meta, blocks } = JSON.parse(stdout) as Document;
  const out: string[] = [];
  for (const key of ['title', 'subtitle', 'abstract']) if (meta[key]) gather(meta[key], out);
  gather(blocks, out);
  return (
    out
      .join('')
      .replace(/\u00AD/g, '')
      .replaceAll('LaTeX2ε', 'LaTeX2e')
      .match(WORD) ?? []
  );
}

function gather(value: unknown, out: string[]): void {
  if (Array.isArray(value)) {
    for (const one of value) gather(one, out);
    return;
  }
  if (typeof value !== 'object' || value === null || !('t' in value)) return;
  const { t: type, c: content } = value as Node;
  if (type === 'Str') out.push(content as string);
  else if (type === 'Link' && isAddress(content)) out.push('\uFFFC');
  else if (type === 'Note') {
    // A note is read where it stands, and holds the words around it apart.
    out.push('\u0000');
    gather(content, out);
    out.push('\u0000');
  } else if (NO_TEXT.has(type)) out.push('\uFFFC');
  else if (type === 'Space' || type === 'SoftBreak' || type === 'LineBreak') out.push(' ');
  else {
    if (!INLINE.has(type)) out.push('\n');
    gather(content, out);
    if (!INLINE.has(type)) out.push('\n');
  }
}

/** True for a link that shows its own target. */
function isAddress(link: unknown): boolean {
  return JSON.stringify((link as readonly unknown[])[0]).includes('"uri"');
}
