// One tag of JSX: where it ends, its name, its attributes by their places.
import { expressionEnd, failure } from './script.js';

/** A tag; offsets into the text that it was scanned in. */
export interface JsxTag {
  readonly end: number;
  /** Empty for a fragment. */
  readonly name: string;
  readonly closes: boolean;
  readonly isEmpty: boolean;
  /** Those whose values are strings; `[from, to)` lies between the quotation marks. */
  readonly attributes: readonly { readonly name: string; readonly from: number; readonly to: number }[];
}

const NAME = /[A-Za-z_$][\w$-]*(?:[.:][A-Za-z_$][\w$-]*)*/y;
const ATTRIBUTE_NAME = /[A-Za-z_$][\w$:.-]*/y;
const SPACE = /\s*/y;

/** The tag at `from`, or a {@link failure}. */
export function scanTag(text: string, from: number): JsxTag | number {
  let at = from + 1;
  const closes = text[at] === '/';
  if (closes) at = behind(SPACE, text, at + 1);
  const nameEnd = behind(NAME, text, at);
  const name = text.slice(at, nameEnd);
  if (name === '' && text[at] !== '>') return failure(at);
  const attributes: { name: string; from: number; to: number }[] = [];
  at = nameEnd;
  for (;;) {
    const spaced = behind(SPACE, text, at);
    if (spaced >= text.length) return failure(spaced);
    if (text[spaced] === '>') return { end: spaced + 1, name, closes, isEmpty: false, attributes };
    if (text[spaced] === '/') {
      const end = behind(SPACE, text, spaced + 1);
      if (end >= text.length) return failure(end);
      if (text[end] === '>' && !closes) return { end: end + 1, name, closes, isEmpty: true, attributes };
      return failure(end);
    }
    if (closes || (spaced === at && text[at - 1] !== '"' && text[at - 1] !== "'" && text[at - 1] !== '}'))
      return failure(spaced);
    at = text[spaced] === '{' ? expressionEnd(text, spaced) : attributeEnd(text, spaced, attributes);
    if (at < 0) return at;
  }
}

function attributeEnd(text: string, from: number, attributes: { name: string; from: number; to: number }[]): number {
  const nameEnd = behind(ATTRIBUTE_NAME, text, from);
  if (nameEnd === from) return failure(from);
  const sign = behind(SPACE, text, nameEnd);
  if (sign >= text.length) return failure(sign);
  if (text[sign] !== '=') return nameEnd;
  const value = behind(SPACE, text, sign + 1);
  if (value >= text.length) return failure(value);
  const mark = text[value]!;
  if (mark === '{') return expressionEnd(text, value);
  if (mark !== '"' && mark !== "'") return failure(value);
  const end = text.indexOf(mark, value + 1);
  if (end < 0) return failure(text.length);
  attributes.push({ name: text.slice(from, nameEnd), from: value + 1, to: end });
  return end + 1;
}

function behind(pattern: RegExp, text: string, at: number): number {
  pattern.lastIndex = at;
  return pattern.test(text) ? pattern.lastIndex : at;
}
