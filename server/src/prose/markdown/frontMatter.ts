// Front matter in YAML (`---`) or TOML (`+++`), cut by hand: its title and description are prose, its keys are not.
import { writtenTag } from '../../text/language.js';
import { ContentBuilder } from '../content.js';
import type { BlockKind, ProseBlock } from '../prose.js';
import { Zone } from '../zones.js';
import { readBasicString, readBlockScalar, readLiteralString, readPlainScalar } from './scalars.js';

/** What front matter holds for the reader. `end` is the offset at which the document's body begins. */
export interface FrontMatter {
  readonly end: number;
  readonly blocks: readonly ProseBlock[];
  readonly language: string | undefined;
}

const KINDS: Partial<Record<string, BlockKind>> = {
  title: 'title',
  description: 'description',
  summary: 'description',
};
const LANGUAGE_KEYS = new Set(['lang', 'language', 'locale']);
const YAML_KEY = /^(?:"([\w .-]+)"|'([\w .-]+)'|([\w.-][\w .-]*?))[ \t]*:(?=[ \t]|$)[ \t]*/;
const TOML_KEY = /^[ \t]*(?:"([\w .-]+)"|'([\w .-]+)'|([\w-]+))[ \t]*=[ \t]*/;
const LONGEST = 65536;

/** The front matter at `start` of the text, or undefined where there is none. Line breaks are `\n`. */
export function readFrontMatter(text: string, start: number): FrontMatter | undefined {
  const fence = text.slice(start, start + 3);
  if (fence !== '---' && fence !== '+++') return undefined;
  const first = lineEnd(text, start);
  if (text.slice(start + 3, first).trim() !== '') return undefined;
  const yaml = fence === '---';
  const lines: number[] = [];
  for (let at = first + 1; at < text.length && at - start < LONGEST; at = lineEnd(text, at) + 1) {
    const line = text.slice(at, lineEnd(text, at)).trimEnd();
    if (line === fence || (yaml && line === '...')) {
      if (!looksLikeSettings(text, lines, yaml)) return undefined;
      return { end: Math.min(lineEnd(text, at) + 1, text.length), ...readFields(text, lines, at, yaml) };
    }
    lines.push(at);
  }
  return undefined;
}

/** Two thematic breaks around prose are no front matter: its first line that says anything sets a key. */
function looksLikeSettings(text: string, lines: readonly number[], yaml: boolean): boolean {
  for (const at of lines) {
    const line = text.slice(at, lineEnd(text, at)).trimEnd();
    if (line.trim() === '' || /^\s*#/.test(line)) continue;
    return yaml ? YAML_KEY.test(line) : TOML_KEY.test(line) || line.startsWith('[');
  }
  return true;
}

function readFields(text: string, lines: readonly number[], end: number, yaml: boolean): Omit<FrontMatter, 'end'> {
  const blocks: ProseBlock[] = [];
  let language: string | undefined;
  let readTo = 0;
  for (const at of lines) {
    if (at < readTo) continue;
    const line = text.slice(at, lineEnd(text, at)).trimEnd();
    if (!yaml && line.startsWith('[')) break;
    const match = (yaml ? YAML_KEY : TOML_KEY).exec(line);
    if (!match) continue;
    const key = match[1] ?? match[2] ?? match[3]!;
    const from = at + match[0].length;
    const kind = KINDS[key.toLowerCase()];
    if (kind !== undefined) readTo = readField(text, from, end, yaml, kind, blocks);
    else if (LANGUAGE_KEYS.has(key.toLowerCase())) {
      const value = line.slice(match[0].length).replace(/^["']|["']$/g, '');
      language ??= writtenTag(value);
    }
  }
  return { blocks, language };
}

/** Reads the value at `from` and returns the offset from which the next key is looked for. */
function readField(
  text: string,
  from: number,
  end: number,
  yaml: boolean,
  kind: BlockKind,
  blocks: ProseBlock[],
): number {
  const out = new ContentBuilder(text, from);
  const mark = text[from];
  let to: number;
  if (mark === '"') to = readBasicString(text, from, end, out);
  else if (mark === "'") to = readLiteralString(text, from, end, out, yaml);
  else if (!yaml) return lineEnd(text, from);
  else if (mark === '|' || mark === '>') to = readBlockScalar(text, from, end, out);
  else to = readPlainScalar(text, from, end, out);
  const content = out.finish({ kind, level: 0, zones: Zone.frontMatter }, to);
  if (content) blocks.push({ start: from, content });
  return to;
}

function lineEnd(text: string, at: number): number {
  const end = text.indexOf('\n', at);
  return end < 0 ? text.length : end;
}
