// Answers written into termbase.yaml: as edits that touch only their own bytes.
import { isMap, isSeq, type YAMLMap, type YAMLSeq } from 'yaml';
import { BrokenInvariant } from '../base/invariant.js';
import type { Span } from '../base/span.js';
import { applyEdits, type TextEdit } from '../text/edits.js';
import { LineIndex } from '../text/lineIndex.js';
import { isRefusal, planAnswer, type Answer, type Change, type Refusal, type RefusalCode } from './answer.js';
import { APART_KEYS, CONCEPT_KEYS, TOP_KEYS } from './format.js';
import { parseTermbase, termbaseOf } from './parse.js';
import { isEmpty, spanOf, type Node } from './reading.js';
import { findPair, isFlow, quotingOf, TreeEdits, Unwritable } from './treeEdits.js';
import { FORMAT_VERSION } from './termbase.js';
import { PLAIN_STYLE, writePairLines, type Style, type Value } from './yamlWriting.js';
import { readYaml } from './yamlTree.js';

/** The edits that write an answer, or why it is not written. */
export type AnswerEdits =
  | {
      readonly kind: 'edits';
      /** Against the text given; empty where the file says so already. */
      readonly edits: readonly TextEdit[];
    }
  | {
      readonly kind: 'refused';
      readonly code: RefusalCode;
      /** For the writer; names the line of the clash. */
      readonly message: string;
      /** One-based. */
      readonly line?: number;
      readonly span?: Span;
    };

/** The comment that opens a file written from nothing. */
const OPENING = '# What this documentation calls things. Edited by hand or by Evenword.';

/**
 * The edits that write an answer into the text of a `termbase.yaml`. Terms join the concept that has one of them;
 * everything else in the file stays as it is, byte for byte. Writing the same answer again gives no edits.
 * Nothing is written into a file with errors, against what the file says, or where the result would not read back.
 */
export function answerEdits(text: string, answer: Answer): AnswerEdits {
  const source = readYaml(text);
  const parsed = termbaseOf(source, '');
  const error = parsed.problems.find(({ severity }) => severity === 'error');
  if (error !== undefined) {
    const message = `The termbase has an error, so nothing is written into it. ${error.message}`;
    return refused(text, { code: 'broken-file', message, span: error.span });
  }
  const plan = planAnswer(parsed.termbase, answer);
  if (plan === undefined) return { kind: 'edits', edits: [] };
  if (isRefusal(plan)) return refused(text, plan);
  try {
    const edits = editsFor(text, source.document?.contents, plan);
    // Whatever odd YAML the file holds: what is written must read back as the answer.
    const after = parseTermbase(applyEdits(text, edits), '');
    if (after.usable && planAnswer(after.termbase, answer) === undefined) return { kind: 'edits', edits };
    return refused(text, cannotWrite(spanOfChange(plan)));
  } catch (thrown) {
    if (!(thrown instanceof Unwritable)) throw thrown;
    return refused(text, cannotWrite({ start: thrown.offset, end: thrown.offset }));
  }
}

function refused(text: string, { code, message, span }: Refusal): AnswerEdits {
  if (span === undefined) return { kind: 'refused', code, message };
  const line = new LineIndex(text).positionAt(span.start).line + 1;
  return { kind: 'refused', code, message: `Line ${line}: ${message}`, line, span };
}

function cannotWrite(span: Span): Refusal {
  const message = 'The answer cannot be added here without rewriting what is there. Add it by hand.';
  return { code: 'cannot-write', message, span };
}

function spanOfChange(change: Change): Span {
  if ('concept' in change) return change.concept.span;
  return 'entry' in change ? change.entry.span : { start: 0, end: 0 };
}

function editsFor(text: string, root: Node, change: Change): readonly TextEdit[] {
  const style = styleOf(root);
  const tree = new TreeEdits(text, style);
  if (isEmpty(root)) {
    const opening = text.replace('\uFEFF', '').trim() === '' ? [OPENING] : [];
    const [key, value] = newEntry(change);
    tree.appendLines([...opening, `evenword: ${FORMAT_VERSION}`, ...writePairLines(key, [value], style)]);
  } else if (isMap(root)) makeChange(tree, root, change);
  return tree.edits;
}

function makeChange(tree: TreeEdits, root: YAMLMap.Parsed, change: Change): void {
  switch (change.kind) {
    case 'add-terms':
      tree.addItems(nodeAt(root, 'concepts', change.concept.span), change.status, change.terms, CONCEPT_KEYS);
      return;
    case 'add-objects':
      tree.addItems(nodeAt(root, 'concepts', change.concept.span), 'with', change.objects, CONCEPT_KEYS);
      return;
    case 'extend-apart':
      extendGroup(tree, root, change.entry.span, change.terms);
      return;
    case 'set-uses': {
      const entry = nodeAt(root, 'later', change.entry.span);
      const span = spanOf(findPair(entry, 'uses')?.value);
      tree.edits.push({ span, newText: String(change.uses) });
      return;
    }
    default: {
      const [key, value] = newEntry(change);
      tree.addItems(root, key, [value], TOP_KEYS);
    }
  }
}

/** The key and the entry that a change makes. */
function newEntry(change: Change): [key: string, value: Value] {
  switch (change.kind) {
    case 'new-concept': {
      const { language, partOfSpeech, with: objects = [] } = change.answer;
      const [preferred, ...others] = change.terms;
      const concept: Record<string, Value> = { preferred: preferred!, [change.status]: others };
      if (language !== undefined) concept['language'] = language;
      if (partOfSpeech !== undefined) concept['partOfSpeech'] = partOfSpeech;
      if (objects.length > 0) concept['with'] = objects;
      return ['concepts', concept];
    }
    case 'new-apart':
      return ['apart', change.terms];
    case 'new-later':
      return ['later', change.uses === undefined ? change.terms : { terms: change.terms, uses: change.uses }];
    default:
      throw new BrokenInvariant(`“${change.kind}” makes no new entry`);
  }
}

function extendGroup(tree: TreeEdits, root: YAMLMap.Parsed, entry: Span, terms: readonly string[]): void {
  const node = itemAt(root, 'apart', entry);
  if (isMap(node)) tree.addItems(node, 'terms', terms, APART_KEYS);
  else if (isSeq(node)) tree.extendList(node, terms);
  else throw new Unwritable(entry.start);
}

function nodeAt(root: YAMLMap.Parsed, key: string, span: Span): YAMLMap.Parsed {
  const node = itemAt(root, key, span);
  if (!isMap(node)) throw new Unwritable(span.start);
  return node;
}

function itemAt(root: YAMLMap.Parsed, key: string, span: Span): Node {
  const list = findPair(root, key)?.value;
  return isSeq(list) ? list.items.find((item) => spanOf(item).start === span.start) : undefined;
}

/** The style that the file's own entries show, so that additions look like their neighbours. */
function styleOf(root: Node): Style {
  if (!isMap(root)) return PLAIN_STYLE;
  const firstKey = root.items[0]?.key;
  const keyQuoting = quotingOf(firstKey) ?? 'plain';
  const concepts = findPair(root, 'concepts')?.value;
  const entries = isSeq(concepts) ? concepts.items.filter((item) => isMap(item)) : [];
  const last = entries.at(-1) as YAMLMap.Parsed | undefined;
  const quoting = (last && quotingOf(findPair(last, 'preferred')?.value)) ?? 'plain';
  const style = { ...PLAIN_STYLE, keyQuoting, quoting };
  for (const entry of entries.reverse()) {
    for (const pair of entry.items) {
      if (!isSeq(pair.value)) continue;
      if (isFlow(pair.value)) return style;
      const dash = blockIndent(pair.value);
      const key = blockIndent(entry);
      const beforeDash = dash === undefined || key === undefined ? style.beforeDash : Math.max(0, dash - key);
      return { ...style, lists: 'block', beforeDash };
    }
  }
  return style;
}

/** The column of a block collection. */
function blockIndent(node: YAMLMap.Parsed | YAMLSeq.Parsed): number | undefined {
  return node.srcToken && 'indent' in node.srcToken ? node.srcToken.indent : undefined;
}
