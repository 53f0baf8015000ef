// HTML blocks in Markdown: their prose by the reader of markup, and the tags that they leave open or close.
import { Tokenizer } from 'htmlparser2';
import type { TreeCursor } from '@lezer/common';
import { isVoid } from '../markup/frames.js';
import { MarkupStream } from '../markup/stream.js';
import type { BlockContent, BlockKind, ProseBlock } from '../prose.js';
import { addZone } from '../quotations.js';
import { Zone, type ZoneSet } from '../zones.js';
import { effectOf, type Step } from './wrappers.js';

/** What is code or a link's target to a writer of Markdown stands as it is written in HTML. */
const MARKDOWN_CODE = /`[^`\n]+`/g;
const MARKDOWN_TARGET = /\]\([^)\s]*\)/g;

/** Reads the HTML block at the cursor; `zones` and `kind` are those of what it stands in. */
export function readHtmlBlock(
  cx: { readonly text: string; readonly blocks: ProseBlock[]; readonly steps: Step[] },
  cursor: TreeCursor,
  zones: ZoneSet,
  kind: BlockKind,
): void {
  const { from } = cursor;
  const text = htmlOf(cx.text, cursor);
  const stream = new MarkupStream(text, '', { end: 0, doctype: '', entities: new Set() }, false);
  stream.read(0);
  const before = cx.blocks.length;
  const starts: number[] = [];
  for (const { start, content } of stream.blocks()) {
    starts.push(start);
    cx.blocks.push({ start: start + from, content: inMarkdown(content, zones, kind) });
  }
  let count = 0;
  for (const { at, ...step } of unpaired(text)) {
    while (count < starts.length && starts[count]! < at) count++;
    cx.steps.push({ ...step, at: before + count });
  }
}

/** The block's text, with the marks of quotations around it blanked out. */
function htmlOf(text: string, cursor: TreeCursor): string {
  const { from, to } = cursor;
  let html = '';
  let at = from;
  if (cursor.firstChild()) {
    do {
      html += text.slice(at, cursor.from) + ' '.repeat(cursor.to - cursor.from);
      at = cursor.to;
    } while (cursor.nextSibling());
    cursor.parent();
  }
  return html + text.slice(at, to);
}

function inMarkdown(content: BlockContent, zones: ZoneSet, kind: BlockKind): BlockContent {
  let { marks } = content;
  const { text } = content;
  if (text.includes('`')) marks = marked(marks, text, MARKDOWN_CODE, Zone.code);
  if (text.includes('](')) marks = marked(marks, text, MARKDOWN_TARGET, Zone.linkTarget);
  return {
    ...content,
    kind: content.kind === 'paragraph' ? kind : content.kind,
    zones: content.zones | zones,
    marks,
  };
}

function marked(marks: BlockContent['marks'], text: string, what: RegExp, zone: ZoneSet): BlockContent['marks'] {
  let result = marks;
  for (const { index, 0: found } of text.matchAll(what)) result = addZone(result, index, index + found.length, zone);
  return result;
}

/** The tags of a piece of HTML that have no partner in it, with the offsets at which they begin. */
function unpaired(text: string): Step[] {
  const steps: Step[] = [];
  const open: number[] = [];
  const openBy = new Map<string, number>();
  const attributes = new Map<string, string>();
  let name = '';
  let at = 0;
  let attribute = '';
  const start = (): void => {
    if (isVoid(name)) return;
    open.push(steps.length);
    openBy.set(name, (openBy.get(name) ?? 0) + 1);
    steps.push({ at, name, opens: true, effect: effectOf(name, (key) => attributes.get(key), false) });
  };
  const nothing = (): void => {};
  const tokenizer = new Tokenizer(
    { xmlMode: false, decodeEntities: false },
    {
      onopentagname(from, to) {
        name = text.slice(from, to).toLowerCase();
        at = from - 1;
        attributes.clear();
      },
      onattribname(from, to) {
        attribute = text.slice(from, to).toLowerCase();
      },
      onattribdata(from, to) {
        attributes.set(attribute, text.slice(from, to));
      },
      onopentagend: start,
      onselfclosingtag: start,
      onclosetag(from, to) {
        const closed = text.slice(from, to).toLowerCase();
        if ((openBy.get(closed) ?? 0) === 0) {
          steps.push({ at: from - 2, name: closed, opens: false, effect: undefined });
          return;
        }
        for (let last = ''; last !== closed;) {
          const index = open.pop()!;
          last = steps[index]!.name;
          openBy.set(last, openBy.get(last)! - 1);
          steps.length = index;
        }
      },
      isInForeignContext: () => false,
      ...{
        onattribend: nothing,
        onattribentity: nothing,
        oncdata: nothing,
        oncomment: nothing,
        ondeclaration: nothing,
      },
      ...{ onend: nothing, onprocessinginstruction: nothing, ontext: nothing, ontextentity: nothing },
    },
  );
  tokenizer.write(text);
  tokenizer.end();
  return steps;
}
