// Typed reading of YAML nodes: each read returns the value or notes a problem with its place.
import { isAlias, isMap, isScalar, isSeq, type ParsedNode, type YAMLMap } from 'yaml';
import type { Span } from '../base/span.js';
import { OWN_KEY_PREFIX } from './format.js';
import { nearestName } from './nearestName.js';
import type { TermbaseProblem, TermbaseProblemCode, TermRef } from './termbase.js';
import { termKey, termText } from './termKey.js';

/** A node of a parsed tree, or nothing where a key has no value. */
export type Node = ParsedNode | null | undefined;

/** One key of a mapping with its value. */
export interface Field {
  readonly keySpan: Span;
  readonly value: Node;
}

/** Collects the problems of one file while its nodes are read. */
export class Reading {
  readonly problems: TermbaseProblem[] = [];

  error(code: TermbaseProblemCode, span: Span, message: string, related?: Span): void {
    this.problems.push({ severity: 'error', code, span, message, ...(related && { related }) });
  }

  warning(code: TermbaseProblemCode, span: Span, message: string, related?: Span): void {
    this.problems.push({ severity: 'warning', code, span, message, ...(related && { related }) });
  }

  /** The fields of a mapping by key; unknown keys are reported: as an error where they look mistyped. */
  fields<K extends string>(map: YAMLMap.Parsed, known: readonly K[], where: string): Map<K, Field> {
    const fields = new Map<K, Field>();
    for (const pair of map.items) {
      const keySpan = spanOf(pair.key);
      const name = isScalar(pair.key) ? pair.key.value : undefined;
      if (typeof name === 'string' && (known as readonly string[]).includes(name)) {
        fields.set(name as K, { keySpan, value: pair.value });
      } else if (typeof name !== 'string' || !name.startsWith(OWN_KEY_PREFIX)) {
        this.unknownKey(String(isScalar(pair.key) ? name : 'a collection'), keySpan, known, where);
      }
    }
    return fields;
  }

  private unknownKey(name: string, span: Span, known: readonly string[], where: string): void {
    const near = nearestName(name, known);
    const what = `${where} has no key “${name}”, so what stands under it has no effect.`;
    if (near !== undefined) this.error('unknown-key', span, `${what} Write “${near}” if you mean that.`);
    else {
      const advice = `Known keys: ${known.join(', ')}. A key of your own must start with “${OWN_KEY_PREFIX}”.`;
      this.warning('unknown-key', span, `${what} ${advice}`);
    }
  }

  /** A mapping, or undefined with a problem. */
  map(node: Node, at: Span, what: string): YAMLMap.Parsed | undefined {
    if (isMap(node)) return node;
    this.wrongType(node, at, what, 'a mapping (“key: value” lines)');
    return undefined;
  }

  /** A list's nodes; nothing under the key counts as an empty list. */
  list(node: Node, at: Span, what: string): readonly ParsedNode[] {
    if (isEmpty(node)) return [];
    if (isSeq(node)) return node.items;
    this.wrongType(node, at, what, 'a list (“- item” lines, or items in brackets)');
    return [];
  }

  /** Free text, trimmed; undefined with a problem where it is not text. */
  text(field: Field | undefined, what: string): string | undefined {
    if (field === undefined) return undefined;
    const { value, keySpan } = field;
    if (isScalar(value) && typeof value.value === 'string') {
      const text = value.value.normalize('NFC').trim();
      if (text !== '') return text;
    }
    if (isEmpty(value) || isBlankText(value)) {
      const message = `${what} is empty. Write its text, or remove the key.`;
      this.error('wrong-type', isEmpty(value) ? keySpan : spanOf(value), message);
    } else this.wrongType(value, keySpan, what, 'text');
    return undefined;
  }

  /** One of a fixed list of words. */
  choice<V extends string>(field: Field | undefined, what: string, values: readonly V[]): V | undefined {
    const text = this.text(field, what);
    if (text === undefined || (values as readonly string[]).includes(text)) return text as V | undefined;
    const near = nearestName(text, values);
    const advice = near === undefined ? `Use one of: ${values.join(', ')}.` : `Write “${near}” if you mean that.`;
    this.error('unknown-value', spanOf(field!.value), `${what} cannot be “${text}”. ${advice}`);
    return undefined;
  }

  /** A name: a non-empty string on one line. */
  name(node: Node, at: Span, what: string): TermRef | undefined {
    if (isScalar(node) && typeof node.value === 'string') {
      const text = termText(node.value);
      if (text !== '') return { text, key: termKey(text), span: spanOf(node) };
      this.error('empty-term', spanOf(node), `${what} is empty, so it can name nothing. Write the term, or remove it.`);
    } else if (isEmpty(node)) {
      this.error('empty-term', at, `${what} is missing here. Write the term, or remove the key or dash.`);
    } else this.wrongType(node, at, what, 'text');
    return undefined;
  }

  /** Reports a node of another type than wanted. */
  wrongType(node: Node, at: Span, what: string, wanted: string): void {
    const span = isEmpty(node) ? at : spanOf(node);
    this.error('wrong-type', span, `${what} must be ${wanted}, but this is ${describe(node)}.${remedy(node, wanted)}`);
  }
}

/** The node's own characters; comments and white space after it are not part of it. */
export function spanOf(node: ParsedNode | null | undefined): Span {
  const range = node?.range;
  return range ? { start: range[0], end: range[1] } : { start: 0, end: 0 };
}

/** True where a key has no value: nothing stands there, or `null` or `~`. */
export function isEmpty(node: Node): boolean {
  return node === null || node === undefined || (isScalar(node) && node.value === null);
}

function isBlankText(node: Node): boolean {
  return isScalar(node) && typeof node.value === 'string';
}

function describe(node: Node): string {
  if (isAlias(node)) return 'an alias (“*name”), which a termbase does not use';
  if (isMap(node)) return 'a mapping';
  if (isSeq(node)) return 'a list';
  if (!isScalar(node) || node.value === null) return 'empty';
  if (typeof node.value === 'number' || typeof node.value === 'bigint') return `the number ${node.source}`;
  if (typeof node.value === 'boolean') return `the truth value ${node.source}`;
  return 'text';
}

function remedy(node: Node, wanted: string): string {
  if (isAlias(node)) return ' Write the value out.';
  const bare = isScalar(node) && node.value !== null && typeof node.value !== 'string';
  return bare && wanted === 'text' ? ` Put it in quotes if you mean the word: "${node.source}".` : '';
}
