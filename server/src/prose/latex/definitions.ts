// Commands and environments that a document defines for itself, by what their definitions do with their arguments.
import { Zone } from '../zones.js';
import { command, type Command, type Environment } from './command.js';
import { COMMANDS_BY_NAME } from './commands.js';
import { environmentOf, withArguments } from './environments.js';
import type { Scanner } from './scanning.js';
import { DIMENSION } from './unknown.js';

/** What a document defines. */
export interface Definitions {
  readonly commands: ReadonlyMap<string, Command>;
  readonly environments: ReadonlyMap<string, Environment>;
  /** Units between two of which text is verbatim. */
  readonly verbatimMarks: string;
}

// Below, what may be missing takes the blanks before it along: two runs of blanks side by side would cost their square.
const COMMAND =
  /\\(?:newcommand|renewcommand|providecommand|DeclareRobustCommand|NewDocumentCommand|RenewDocumentCommand|ProvideDocumentCommand|DeclareDocumentCommand)\*?(?:\s*\{)?\s*\\([A-Za-z@]+)\s*\}?\s*/g;
const ENVIRONMENT = /\\(?:newenvironment|renewenvironment|NewDocumentEnvironment)\*?\s*\{([^{}]{1,60})\}\s*/g;
const LISTING =
  /\\(?:newtcblisting|lstnewenvironment|DefineVerbatimEnvironment|RecustomVerbatimEnvironment|newtcbinputlisting)(?:\s*\[[^\]]{0,200}\])?\s*\{([^{}]{1,60})\}|\\newminted\s*(?:\[([^\]]{1,60})\]\s*)?\{([^{}]{1,60})\}/g;
const INLINE_LISTING = /\\newmintinline\s*(?:\[([^\]]{1,60})\]\s*)?\{([^{}]{1,60})\}/g;
const VERBATIM_MARK =
  /\\(?:MakeShortVerb|lstMakeShortInline)\*?(?:\s*\[[^\]]{0,200}\])?\s*\{?\\?([^\sA-Za-z\\{}%])\}?/g;
/** Classes of LaTeX's own documentation, which make `|` such a mark. */
const MARKING_CLASS = /\\documentclass(?:\s*\[[^\]]{0,200}\])?\s*\{(?:ltxguide|ltxdoc|ltnews|l3doc)\}/;
const COUNT = /\[(\d)\]\s*(\[)?/y;
const XPARSE = /\{([^{}]{0,60})\}/y;
const CALL = /\\([A-Za-z@]+)\*?(?:\s*(?:\[[^[\]]{0,200}\]|\{[^{}]{0,200}\}))*/g;
const LENGTH = /-?[\d.]+\s*(?:pt|em|ex|cm|mm|in|bp|fil+)|\b(?:plus|minus)\b/g;
const LONGEST_BODY = 4_000;
const LISTING_ROLE = environmentOf('lstlisting');

/** Reads the definitions of a document; those that others take in stand elsewhere and are not known. */
export function definitionsIn(scanner: Scanner): Definitions {
  const commands = new Map<string, Command>();
  const environments = new Map<string, Environment>();
  const { text } = scanner;
  const verbatimMarks = [...text.matchAll(VERBATIM_MARK)]
    .map(([, mark]) => mark!)
    .join('')
    .concat(MARKING_CLASS.test(text) ? '|' : '');
  if (!/\\(?:re)?new|\\provide|\\[A-Z][a-z]+[A-Z]|\\lstnew/.test(text))
    return { commands, environments, verbatimMarks };
  for (const match of text.matchAll(COMMAND)) {
    const found = signature(scanner, match.index + match[0].length, match[0].includes('Document'));
    if (found.body === undefined || COMMANDS_BY_NAME.has(match[1]!)) continue;
    commands.set(match[1]!, roleOf(found.body, found.count, found.optional));
  }
  for (const match of text.matchAll(ENVIRONMENT)) {
    const { body, count, optional } = signature(scanner, match.index + match[0].length, match[0].includes('Document'));
    const inner =
      body === undefined ? undefined : /\\(?:begin\s*)?\{?([A-Za-z]+\*?)\}?\s*(?:\[[^\]]*\])?[^\\]*$/.exec(body)?.[1];
    environments.set(match[1]!, withArguments(environmentOf(inner ?? match[1]!), count, optional));
  }
  for (const match of text.matchAll(LISTING))
    environments.set(match[1] ?? match[2] ?? `${match[3]!}code`, LISTING_ROLE);
  for (const match of text.matchAll(INLINE_LISTING)) {
    commands.set(match[1] ?? `${match[2]!}inline`, command('opaque', 'ov'));
  }
  return { commands, environments, verbatimMarks };
}

interface Defined {
  readonly count: number;
  readonly optional: boolean;
  readonly body: string | undefined;
}

function signature(scanner: Scanner, from: number, isXparse: boolean): Defined {
  const { text } = scanner;
  let at = from;
  let count = 0;
  let optional = false;
  const pattern = isXparse ? XPARSE : COUNT;
  pattern.lastIndex = at;
  const found = pattern.exec(text);
  if (found && isXparse) {
    const letters = found[1]!.replace(/[\s+!]/g, '').replace(/[OD]\{[^{}]*\}/g, 'o');
    count = letters.length;
    optional = /^[oO]/.test(letters);
    at += found[0].length;
  } else if (found) {
    count = Number(found[1]);
    optional = found[2] !== undefined;
    at += found[0].length - (optional ? 1 : 0);
    if (optional) at = scanner.optionEnd(at);
  }
  const open = at < 0 ? -1 : scanner.argument(at, '{');
  const end = open < 0 ? -1 : scanner.groupEnd(open);
  const body = end < 0 || end - open > LONGEST_BODY ? undefined : text.slice(open + 1, end - 1);
  return { count, optional, body };
}

/** A command by its body: an argument is read where the body shows it as text. */
function roleOf(body: string, count: number, optional: boolean): Command {
  if (count === 0) return command(hasText(body) ? 'opaque' : 'inline');
  const uses = Array.from({ length: count }, (_, i) => useOf(body, i + 1));
  const letters = uses.map((use, i) => (i === 0 && optional ? 'o' : use === undefined ? 'm' : 't')).join('');
  if (!letters.includes('t')) return command('opaque', letters);
  const zones = uses.reduce<number>((all, use) => all | (use ?? 0), 0);
  return command(/\\(?:begin|par\b|item\b)/.test(body) ? 'block' : 'inline', letters, zones);
}

/** The zones in which a body shows an argument, or undefined where it does not show it as text. */
function useOf(body: string, argument: number): number | undefined {
  const at = body.indexOf(`#${argument}`);
  if (at < 0 || /[A-Za-z@]/.test(body.charAt(at - 1)) || isInName(body.slice(0, at))) return undefined;
  let zones = 0;
  for (const [, name] of body.slice(0, at).matchAll(/\\begin\s*\{([A-Za-z]+\*?)\}/g)) {
    const { content, zones: own } = environmentOf(name!);
    if (content === 'verbatim' || content === 'math') return undefined;
    zones |= own;
  }
  if ((body.slice(0, at).match(/(?<!\\)\$/g)?.length ?? 0) % 2 === 1) return undefined;
  const enclosing = /(?:\\([A-Za-z]+)\*?\s*(?:\[[^\]]*\]\s*)?(\{[^{}]*\}\s*)?)\{[^{}]*$/.exec(body.slice(0, at));
  if (!enclosing) return /\\(?:ttfamily|tt)\b/.test(body.slice(0, at)) ? undefined : zones;
  const outer = COMMANDS_BY_NAME.get(enclosing[1]!);
  if (!outer) return undefined;
  const index = enclosing[2] === undefined ? 0 : 1;
  if (outer.flow === 'opaque' || outer.flow === 'break') return undefined;
  if (outer.signature.replace(/[*odp]/g, '')[index] !== 't') return undefined;
  return zones | (outer.zones & (Zone.uiLabel | Zone.quotation | Zone.definedTerm | Zone.safetyMessage));
}

/** True where what follows is part of a control sequence that is put together from text. */
function isInName(before: string): boolean {
  return before.lastIndexOf('\\csname') > before.lastIndexOf('\\endcsname');
}

/** True where a body puts text into the document rather than setting something. */
function hasText(body: string): boolean {
  const left = body.replace(CALL, (call, name: string) => {
    const known = COMMANDS_BY_NAME.get(name);
    if (known === undefined) return DIMENSION.test(name) ? ' ' : call;
    return known.flow === 'opaque' || /[tkg]/.test(known.signature) ? call : ' ';
  });
  return /[\p{L}\\]/u.test(left.replace(LENGTH, ' '));
}
