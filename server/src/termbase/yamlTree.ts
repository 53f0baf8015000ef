// From text to a YAML tree: guarded against hostile nesting, with syntax errors in words a writer can act on.
import { Composer, Parser, type CST, type Document, type ErrorCode, type ParsedNode } from 'yaml';
import type { Span } from '../base/span.js';
import type { TermbaseProblem } from './termbase.js';

/** A YAML tree with the syntax problems of its text; `document` is undefined where the text is not fit to be read. */
export interface YamlTree {
  readonly document: Document.Parsed | undefined;
  readonly problems: readonly TermbaseProblem[];
}

/** A termbase nests five levels deep; deeper text is hostile and would exhaust the composer's stack. */
const DEEPEST = 40;

/** Reads YAML 1.2 without ever throwing. Spans are UTF-16 offsets into `text`. */
export function readYaml(text: string): YamlTree {
  const tokens = [...new Parser().parse(text)];
  if (isDeeperThan(tokens, DEEPEST)) {
    const message = `The file nests more than ${DEEPEST} levels deep: a termbase needs five. Take out the surplus brackets or dashes.`;
    return { document: undefined, problems: [syntaxError({ start: 0, end: 0 }, message)] };
  }
  const composer = new Composer<ParsedNode>({ keepSourceTokens: true, logLevel: 'silent', prettyErrors: false });
  const [document, second] = [...composer.compose(tokens, true, text.length)];
  const problems: TermbaseProblem[] = [];
  for (const error of [...(document?.errors ?? []), ...(document?.warnings ?? [])]) {
    problems.push(syntaxError(placeOf(error.pos, text), inWords(error.code, error.message)));
  }
  if (second !== undefined) {
    const start = second.range[0];
    const message =
      'A second document starts here (“---”): a termbase is one document. Move its entries into the first.';
    problems.push(syntaxError({ start, end: Math.min(start + 3, text.length) }, message));
  }
  return { document: document, problems };
}

function syntaxError(span: Span, message: string): TermbaseProblem {
  return { severity: 'error', code: 'yaml-syntax', span, message };
}

function placeOf([start, end]: readonly [number, number], text: string): Span {
  const from = Math.max(0, Math.min(start, text.length));
  return { start: from, end: Math.max(from, Math.min(end, text.length)) };
}

const ADVICE: Partial<Record<ErrorCode, string>> = {
  BAD_INDENT: 'Close the bracket or quote, or line the entry up with its neighbours.',
  BLOCK_AS_IMPLICIT_KEY: 'Put text that holds a colon and a space in quotes, or start a new line.',
  BAD_SCALAR_START: 'Put text that starts with this character in quotes.',
  DUPLICATE_KEY: 'Join the two entries under one key.',
  MISSING_CHAR: 'Add the missing closing character.',
  TAB_AS_INDENT: 'Indent with spaces.',
  TAG_RESOLVE_FAILED: 'Remove the tag, or put text that starts with “!” in quotes.',
  UNEXPECTED_TOKEN: 'Check the indentation and the quotes here.',
};

function inWords(code: ErrorCode, message: string): string {
  const what = code === 'DUPLICATE_KEY' ? 'This key stands twice in one mapping' : message.replace(/[.:]?\s*$/u, '');
  return `The file is not valid YAML: ${what}. ${ADVICE[code] ?? 'Mend the line, or put the text in quotes.'}`;
}

/** Looks at the syntax tokens alone, with a stack of its own instead of recursion. */
function isDeeperThan(tokens: readonly CST.Token[], limit: number): boolean {
  const stack: { token: CST.Token; depth: number }[] = tokens.map((token) => ({ token, depth: 0 }));
  for (let top = stack.pop(); top !== undefined; top = stack.pop()) {
    const { token, depth } = top;
    if (depth > limit) return true;
    const push = (child: CST.Token | null | undefined): void => {
      if (child) stack.push({ token: child, depth: depth + 1 });
    };
    if (token.type === 'document') push(token.value);
    if (!('items' in token)) continue;
    for (const item of token.items) {
      if ('key' in item) push(item.key);
      push(item.value);
    }
  }
  return false;
}
