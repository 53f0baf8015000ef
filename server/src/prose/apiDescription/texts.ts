// The texts for readers in a description of an interface: titles, summaries and descriptions, wherever they stand.
import { visit, printParseErrorCode } from 'jsonc-parser';
import { CST, Parser } from 'yaml';
import type { ReadingProblem } from '../prose.js';
import { decodeScalar, type ScalarStyle } from './scalars.js';
import type { Embedded } from '../embedded.js';

/** The keys whose strings are written for readers. */
export type TextKey = 'title' | 'summary' | 'description';

/** One such string. */
export interface DescribingText {
  readonly key: TextKey;
  readonly embedded: Embedded;
}

/** What was found, in source order. */
export interface FoundTexts {
  readonly texts: readonly DescribingText[];
  readonly problems: readonly ReadingProblem[];
}

const TEXT_KEYS: ReadonlySet<string> = new Set<TextKey>(['title', 'summary', 'description']);
/** What lies below these is data, not description. */
const DATA_KEYS = new Set(['example', 'examples', 'default', 'enum', 'const', 'value']);
/** The keys of these objects are names that an author chose. */
const NAMED = new Set([
  ...['properties', 'patternProperties', 'definitions', '$defs', 'schemas', 'dependentSchemas', 'paths', 'webhooks'],
  ...['responses', 'parameters', 'headers', 'callbacks', 'links', 'requestBodies', 'securitySchemes', 'variables'],
]);

/** What a key makes of the value below it, by the key above it. */
function roleOf(key: string, above: string | undefined): 'text' | 'data' | 'object' {
  if (above !== undefined && NAMED.has(above)) return 'object';
  if (DATA_KEYS.has(key) || key.startsWith('x-')) return 'data';
  return TEXT_KEYS.has(key) ? 'text' : 'object';
}

/** The texts of a JSON file. */
export function textsOfJson(text: string): FoundTexts {
  const texts: DescribingText[] = [];
  const problems: ReadingProblem[] = [];
  let key: string | undefined;
  visit(
    text,
    {
      onObjectProperty: (property) => {
        key = property;
      },
      onObjectBegin: (_offset, _length, _line, _column, path) => isDescribed(path()),
      onArrayBegin: (_offset, _length, _line, _column, path) => isDescribed(path()),
      // Without these two, the visitor never comes back from what it was told to skip.
      onObjectEnd: () => undefined,
      onArrayEnd: () => undefined,
      onLiteralValue: (value, offset, length, _line, _column, path) => {
        if (typeof value !== 'string' || key === undefined) return;
        const names = path();
        if (names.at(-1) !== key || roleOf(key, keyAbove(names, names.length - 1)) !== 'text') return;
        texts.push({ key: key as TextKey, embedded: decodeScalar(text, offset, offset + length, 'double') });
      },
      onError: (code, offset, length) => {
        problems.push({
          span: { start: offset, end: offset + length },
          message: `This is no JSON (${printParseErrorCode(code)}).`,
        });
      },
    },
    { allowTrailingComma: true },
  );
  return { texts, problems };
}

/** True where an object or list at a path is description and not data. */
function isDescribed(path: readonly (string | number)[]): boolean {
  const last = path.at(-1);
  return typeof last !== 'string' || roleOf(last, keyAbove(path, path.length - 1)) !== 'data';
}

/** The nearest key above a place in a path; entries of lists are passed over. */
function keyAbove(path: readonly (string | number)[], place: number): string | undefined {
  const above = path[place - 1];
  return typeof above === 'string' ? above : undefined;
}

/** The texts of a YAML file; of several documents in one file, of all. */
export function textsOfYaml(text: string): FoundTexts {
  const texts: DescribingText[] = [];
  const problems: ReadingProblem[] = [];
  const read = (token: CST.Token | null | undefined, above: string | undefined): void => {
    if (token?.type !== 'block-map' && token?.type !== 'flow-collection' && token?.type !== 'block-seq') return;
    for (const item of token.items) {
      if (item.key === undefined || item.key === null) {
        read(item.value, undefined);
        continue;
      }
      const key = CST.isScalar(item.key) ? CST.resolveAsScalar(item.key, true, () => undefined).value : '';
      const role = roleOf(key, above);
      if (role === 'text' && CST.isScalar(item.value)) addScalar(text, key as TextKey, item.value, texts, problems);
      else if (role !== 'data') read(item.value, key);
    }
  };
  for (const token of new Parser().parse(text)) {
    if (token.type === 'document') read(token.value, undefined);
    if (token.type === 'error') {
      const end = Math.min(token.offset + token.source.length, text.length);
      problems.push({ span: { start: Math.min(token.offset, end), end }, message: token.message });
    }
  }
  return { texts, problems };
}

const STYLES: Readonly<Record<string, ScalarStyle>> = {
  scalar: 'plain',
  'single-quoted-scalar': 'single',
  'double-quoted-scalar': 'double',
};

function addScalar(
  text: string,
  key: TextKey,
  token: CST.FlowScalar | CST.BlockScalar,
  texts: DescribingText[],
  problems: ReadingProblem[],
): void {
  const { value } = CST.resolveAsScalar(token, true, (offset, _code, message) => {
    const start = Math.min(offset, text.length);
    problems.push({ span: { start, end: Math.min(start + 1, text.length) }, message });
  });
  let embedded: Embedded;
  if (token.type === 'block-scalar') {
    const header = token.props.find((each) => each.type === 'block-scalar-header');
    const from = token.props.reduce((end, each) => end + ('source' in each ? each.source.length : 0), token.offset);
    const digit = /[1-9]/.exec(header && 'source' in header ? header.source : '');
    const folded = header !== undefined && 'source' in header && header.source.startsWith('>');
    const indent = digit === null ? undefined : token.indent + Number(digit[0]);
    embedded = decodeScalar(text, from, from + token.source.length, folded ? 'folded' : 'literal', indent);
  } else {
    const style = STYLES[token.type];
    if (style === undefined) return;
    embedded = decodeScalar(text, token.offset, token.offset + token.source.length, style);
  }
  // The parser's own reading is the judge: a text that we decode otherwise has a map that nobody may trust.
  if (squeezed(embedded.text) === squeezed(value)) texts.push({ key, embedded });
}

/** A text with single blanks and none at the ends of its lines: more say nothing in prose. */
function squeezed(text: string): string {
  return text
    .replace(/[ \t]+/g, ' ')
    .replace(/ $/gm, '')
    .trimEnd();
}
