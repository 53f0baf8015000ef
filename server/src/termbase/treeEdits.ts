// Additions to a YAML text that leave every other byte alone: where an item or a key goes, and in which style.
import { isMap, isScalar, isSeq, type ParsedNode, type YAMLMap, type YAMLSeq } from 'yaml';
import type { TextEdit } from '../text/edits.js';
import { isEmpty, type Node } from './reading.js';
import { indented, writeFlow, writeItemLines, writePairLines, writeText } from './yamlWriting.js';
import type { Quoting, Style, Value } from './yamlWriting.js';

type Pair = YAMLMap.Parsed['items'][number];

/** A place that holds what no addition can be made to without rewriting it. */
export class Unwritable extends Error {
  override readonly name = 'Unwritable';
  constructor(readonly offset: number) {
    super('the place is written in a way that cannot be added to');
  }
}

/** Makes edits against one text and its tree. */
export class TreeEdits {
  readonly edits: TextEdit[] = [];
  private readonly lineBreak: string;

  constructor(
    private readonly text: string,
    private readonly style: Style,
  ) {
    this.lineBreak = /\r?\n/u.exec(text)?.[0] ?? '\n';
  }

  /** Adds items to the list under a key of a mapping; makes the key, after those of `order` before it, where it is missing. */
  addItems(map: YAMLMap.Parsed, key: string, items: readonly Value[], order: readonly string[]): void {
    const pair = findPair(map, key);
    if (pair === undefined) this.addPair(map, key, items, order);
    else if (isEmpty(pair.value)) this.fillEmpty(map, pair, key, items);
    else if (isSeq(pair.value) && pair.value.items.length === 0) this.fillBrackets(map, pair, key, items);
    else if (isSeq(pair.value)) this.extendList(pair.value, items);
    else this.makeList(pair.value!, items);
  }

  /** Adds a key to a mapping. */
  addPair(map: YAMLMap.Parsed, key: string, value: Value, order: readonly string[]): void {
    const before = order.slice(0, order.indexOf(key));
    const earlier = map.items.filter((pair) => isScalar(pair.key) && before.includes(String(pair.key.value)));
    const previous = earlier.at(-1) ?? map.items.at(-1);
    const isLast = previous === map.items.at(-1);
    if (isFlow(map)) {
      const written = `${writeText(key, this.style.keyQuoting)}: ${writeFlow(value, this.quotedLike(previous?.value))}`;
      if (previous === undefined) this.insert(startOf(map) + 1, written);
      else this.insert(endOfPair(previous), `, ${written}`);
      return;
    }
    if (previous === undefined) throw new Unwritable(startOf(map));
    const column = this.columnOf(startOf(map.items[0]!.key));
    const lines = indented(writePairLines(key, value, this.style), column);
    // Blank lines part the sections of a file, not the keys of an entry.
    const gap = column === 0 && map.items.length > 1 && this.isGapBefore(startOf(map.items.at(-1)!.key));
    this.insertLines(endOfPair(previous), gap ? ['', ...lines] : lines, isLast ? column : undefined);
  }

  /** Puts a list where a key has none: on the key's line, or below it where its items are mappings. */
  private fillEmpty(map: YAMLMap.Parsed, pair: Pair, key: string, items: readonly Value[]): void {
    const node = pair.value;
    const colon = pair.srcToken?.sep?.find(({ type }) => type === 'map-value-ind');
    const from = colon === undefined ? endOf(pair.key) : colon.offset + 1;
    // “null” or “~” goes, with the blanks before it; comments on the line stay.
    const end = node && endOf(node) > startOf(node) ? endOf(node) : from;
    const isBare = colon === undefined;
    const [first, ...below] = isFlow(map)
      ? [`: ${writeFlow(items, this.style)}`]
      : writePairLines(key, items, this.style).map((line, index) =>
          index === 0 ? line.slice(line.indexOf(':')) : line,
        );
    const written = isBare ? first! : first!.slice(1);
    if (end > from || written !== '') this.edits.push({ span: { start: from, end }, newText: written });
    if (below.length > 0) this.insertLines(end, indented(below, this.columnOf(startOf(pair.key))));
  }

  /** Fills `[]`; concepts and groups read better on lines of their own, so that empty brackets make way for these. */
  private fillBrackets(map: YAMLMap.Parsed, pair: Pair, key: string, items: readonly Value[]): void {
    const list = pair.value!;
    const isBlank = this.text.slice(startOf(list) + 1, endOf(list) - 1).trim() === '';
    if (!isBlank || isFlow(map) || !items.some((item) => typeof item === 'object')) {
      this.insert(startOf(list) + 1, items.map((item) => writeFlow(item, this.style)).join(', '));
      return;
    }
    const start = endOf(pair.key) + this.text.slice(endOf(pair.key)).indexOf(':') + 1;
    this.edits.push({ span: { start, end: endOf(list) }, newText: '' });
    const lines = writePairLines(key, items, this.style).slice(1);
    this.insertLines(endOf(list), indented(lines, this.columnOf(startOf(pair.key))));
  }

  /** Adds items to a list that has some. */
  extendList(list: YAMLSeq.Parsed, items: readonly Value[]): void {
    const last = list.items.at(-1);
    if (last === undefined) throw new Unwritable(startOf(list));
    if (!isFlow(list)) {
      this.extendBlockList(list, items);
      return;
    }
    const style = this.quotedLike(last);
    this.insert(endOf(last), items.map((item) => `, ${writeFlow(item, style)}`).join(''));
  }

  private extendBlockList(list: YAMLSeq.Parsed, items: readonly Value[]): void {
    const last = list.items.at(-1)!;
    const token = list.srcToken;
    const dash =
      token && 'items' in token ? token.items[0]?.start.find(({ type }) => type === 'seq-item-ind') : undefined;
    if (dash === undefined || !('offset' in dash)) throw new Unwritable(startOf(list));
    const column = this.columnOf(dash.offset);
    const afterDash = this.columnOf(startOf(list.items[0])) - column;
    const style = { ...this.quotedLike(last), afterDash: afterDash >= 2 && afterDash <= 8 ? afterDash : 2 };
    const lines = items.flatMap((item) => {
      const written = indented(writeItemLines(item, style), column);
      return list.items.length > 1 && this.isGapBefore(this.itemStart(list)) ? ['', ...written] : written;
    });
    this.insertLines(contentEnd(last), lines, column);
  }

  /** The line of the last item's dash. */
  private itemStart(list: YAMLSeq.Parsed): number {
    const token = list.srcToken;
    const item = token && 'items' in token ? token.items.at(list.items.length - 1) : undefined;
    const dash = item?.start.find(({ type }) => type === 'seq-item-ind');
    return dash?.offset ?? startOf(list.items.at(-1));
  }

  /** Makes a list of a single value. */
  private makeList(value: ParsedNode, items: readonly Value[]): void {
    const isBlock = isScalar(value) ? value.type === 'BLOCK_LITERAL' || value.type === 'BLOCK_FOLDED' : !isFlow(value);
    const written = this.text.slice(startOf(value), endOf(value));
    if (isBlock || /[\r\n]/u.test(written)) throw new Unwritable(startOf(value));
    const rest = items.map((item) => `, ${writeFlow(item, this.quotedLike(value))}`).join('');
    // Commas and brackets are plain text outside brackets only.
    if (isScalar(value) && value.type === 'PLAIN' && /[,[\]{}]/u.test(written)) {
      const quoted = writeText(String(value.value), 'double');
      this.edits.push({ span: { start: startOf(value), end: endOf(value) }, newText: `[${quoted}${rest}]` });
    } else {
      this.insert(startOf(value), '[');
      this.insert(endOf(value), `${rest}]`);
    }
  }

  private insert(offset: number, newText: string): void {
    this.edits.push({ span: { start: offset, end: offset }, newText });
  }

  /**
   * Adds whole lines below the line that holds `offset`.
   * @param pastComments where given, also below the comment lines that follow at once and are indented at least so far.
   */
  private insertLines(offset: number, lines: readonly string[], pastComments?: number): void {
    let at = this.lineEnd(offset);
    for (let next = this.nextLine(at); pastComments !== undefined && next !== undefined; next = this.nextLine(at)) {
      const comment = /^( *)#/u.exec(this.text.slice(next, this.lineEnd(next)));
      if (comment === null || comment[1]!.length < pastComments) break;
      at = this.lineEnd(next);
    }
    this.insert(at, lines.map((line) => this.lineBreak + line).join(''));
  }

  /** Adds lines at the end of a text that holds no mapping yet. */
  appendLines(lines: readonly string[]): void {
    const isFresh = /(?:^\uFEFF?|[\r\n])$/u.test(this.text);
    const written = lines.join(this.lineBreak);
    this.insert(this.text.length, (isFresh ? '' : this.lineBreak) + written + this.lineBreak);
  }

  private lineEnd(offset: number): number {
    const feed = this.text.indexOf('\n', offset);
    if (feed < 0) return this.text.length;
    return feed > offset && this.text[feed - 1] === '\r' ? feed - 1 : feed;
  }

  private nextLine(lineEnd: number): number | undefined {
    const feed = this.text.indexOf('\n', lineEnd);
    return feed < 0 ? undefined : feed + 1;
  }

  private columnOf(offset: number): number {
    const lineStart = this.text.lastIndexOf('\n', offset - 1) + 1;
    const bom = lineStart === 0 && this.text.startsWith('\uFEFF') ? 1 : 0;
    return offset - lineStart - bom;
  }

  /** True where the line above the one at `offset` is blank, comments between skipped. */
  private isGapBefore(offset: number): boolean {
    const above = this.text.slice(0, this.text.lastIndexOf('\n', offset - 1) + 1);
    return /\n[ \t]*\r?\n(?:[ \t]*#[^\n]*\n)*$/u.test(above);
  }

  private quotedLike(node: Node): Style {
    const quoting = quotingOf(node);
    return quoting === undefined ? this.style : { ...this.style, quoting };
  }
}

/** How a text, or the first text of a list or mapping, is quoted; undefined where there is none. */
export function quotingOf(node: Node): Quoting | undefined {
  if (isSeq(node)) return quotingOf(node.items.at(-1));
  if (isMap(node)) return quotingOf(node.items.at(-1)?.value);
  if (!isScalar(node) || typeof node.value !== 'string') return undefined;
  return node.type === 'QUOTE_DOUBLE' ? 'double' : node.type === 'QUOTE_SINGLE' ? 'single' : 'plain';
}

/** The pair of a key. */
export function findPair(map: YAMLMap.Parsed, key: string): Pair | undefined {
  return map.items.find((pair) => isScalar(pair.key) && pair.key.value === key);
}

/** True for `[…]` and `{…}`. */
export function isFlow(node: Node): boolean {
  return (isMap(node) || isSeq(node)) && node.flow === true;
}

/** Where a node's last own character ends; for block collections that of their last part. */
function contentEnd(node: ParsedNode): number {
  if (isSeq(node) && !isFlow(node)) return contentEnd(node.items.at(-1)!);
  if (isMap(node) && !isFlow(node)) return endOfPair(node.items.at(-1)!);
  if (isScalar(node) && (node.type === 'BLOCK_LITERAL' || node.type === 'BLOCK_FOLDED')) {
    const written = node.srcToken && 'source' in node.srcToken ? node.srcToken.source : '';
    // The line breaks that end a block text are its own, but what follows it starts on the next line.
    return endOf(node) - (written.length - written.trimEnd().length);
  }
  return endOf(node);
}

function endOfPair(pair: Pair): number {
  return pair.value ? contentEnd(pair.value) : endOf(pair.key);
}

function startOf(node: ParsedNode | null | undefined): number {
  return node?.range[0] ?? 0;
}

function endOf(node: ParsedNode | null | undefined): number {
  return node?.range[1] ?? 0;
}
