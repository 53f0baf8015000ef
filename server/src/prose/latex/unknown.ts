// Commands that no table knows: what is skipped by its form, and what a name or an argument tells.
import { Zone } from '../zones.js';
import { command, type Command, type Signature } from './command.js';
import type { Scanner } from './scanning.js';

const DEFINES =
  /^(?:(?:re)?newcommand|providecommand|DeclareRobustCommand|(?:re)?newenvironment|(?:New|Renew|Provide|Declare)(?:Document|Expandable\w*)(?:Command|Environment)|(?:lstnew|newtc|DefineVerbatim|RecustomVerbatim)\w+|newtcolorbox|newminted|newmintinline|(?:lst)?(?:Make|Delete)Short\w+)$/;
const PLAIN_TEX_DEFINITION = /^(?:[gex]def|def)$/;
/** Commands and registers of plain TeX that a length follows. */
export const DIMENSION =
  /^(?:[hv]skip|[m]?kern|parindent|parskip|baselineskip|[hv]size|tabcolsep|itemsep|topsep|textwidth|advance)$/;
const GLUE =
  /[ \t]*(?:\\[A-Za-z@]+[ \t]*)?(?:=[ \t]*)?(?:by[ \t]*)?-?(?:[\d.,]+[ \t]*(?:true[ \t]*)?(?:pt|em|ex|cm|mm|in|bp|pc|dd|cc|sp|mu|fil+|\\[A-Za-z@]+)?|\\[A-Za-z@]+)(?:[ \t]*(?:plus|minus)[ \t]*-?[\d.]*[ \t]*(?:pt|em|ex|cm|mm|in|fil+)?)*[ \t]?/y;
/** What is defined, where it stands without braces: a control sequence, or a unit that is to mark verbatim text. */
const DEFINED = /[ \t]*(?:\\(?:[A-Za-z@]+|.)|[|!+"/@])/y;
const LET = /[ \t]*\\[A-Za-z@]+[ \t]*=?[ \t]*(?:\\(?:[A-Za-z@]+|.)|.)/y;
const CODE_NAME =
  /code|file|path|^dir|folder|cmd|command|class|func|method|module|^var|variable|option|param|^pkg|package|^lib|^api|^env|macro|^sym|const|struct|^type$|^arg|flag|shell|bash|script|listing|verb|^tt|literal|regex|url|uri|host|port|version|keyword$|token|attr|field|^tag$|^sql|json|yaml|xml/i;
const LABEL_NAME = /^(?:menu|button|btn|gui|ui|key|keys|kbd|label|tab|dialog|icon)(?:item|label|text|path|menu|cap)*$/i;
const WORD = /[A-Za-z\u00C0-\u024F]{2,}/g;
/** Words from which on the argument of an unknown command is prose rather than a name, a length or a key. */
const PROSE_WORDS = 3;
const WINDOW = 240;
const MOST_ARGUMENTS = 8;

/** Where reading goes on behind a command that defines or sets something; undefined for any other. */
export function skippedBy(name: string, scanner: Scanner, behind: number): number | undefined {
  const { text } = scanner;
  if (DEFINES.test(name)) return behindDefinition(scanner, behind);
  if (PLAIN_TEX_DEFINITION.test(name)) {
    const open = text.indexOf('{', behind);
    if (open < 0 || open - behind > 200) return behind;
    const end = scanner.groupEnd(open);
    return end < 0 ? scanner.lineEnd(behind) : end;
  }
  if (name === 'let' || name === 'futurelet') return stickyEnd(LET, text, behind) ?? behind;
  if (DIMENSION.test(name)) return stickyEnd(GLUE, text, behind) ?? behind;
  if (name === 'iffalse') {
    const end = scanner.find('\\fi', behind);
    return end < 0 ? undefined : end + 3;
  }
  return undefined;
}

function stickyEnd(pattern: RegExp, text: string, at: number): number | undefined {
  pattern.lastIndex = at;
  return pattern.test(text) ? pattern.lastIndex : undefined;
}

/** Behind all arguments of a definition: its name, with or without braces, and then groups and options. */
function behindDefinition(scanner: Scanner, behind: number): number {
  const { text } = scanner;
  let at = text[behind] === '*' ? behind + 1 : behind;
  at = stickyEnd(DEFINED, text, at) ?? at;
  for (let i = 0; i < 6; i++) {
    const group = scanner.argument(at, '{');
    const option = group < 0 ? scanner.argument(at, '[') : -1;
    const end = group >= 0 ? scanner.groupEnd(group) : option >= 0 ? scanner.optionEnd(option) : -1;
    if (end < 0) return group >= 0 ? scanner.lineEnd(at) : at;
    at = end;
  }
  return at;
}

/**
 * The role of a command that is not known, by its name and by the arguments that stand right behind it. Arguments of three
 * words or more are read, unless the name is one for code; anything else is one opaque unit, as it may be a name.
 */
export function unknownCommand(name: string, text: string, behind: number, startsBlock: boolean): Command {
  const signature = signatureAt(name, text, behind);
  if (signature.endsWith('t')) return command(startsBlock ? 'block' : 'inline', signature);
  if (!LABEL_NAME.test(name) || !signature.endsWith('m')) return command('opaque', signature);
  return command('inline', `${signature.slice(0, -1)}t`, Zone.uiLabel);
}

/** The arguments that stand right behind what is not known, up to the first that is prose. */
export function signatureAt(name: string, text: string, behind: number): Signature {
  let at = text[behind] === '*' ? behind + 1 : behind;
  let signature = '*';
  while (signature.length < MOST_ARGUMENTS && (text[at] === '[' || text[at] === '{')) {
    const closing = closingIn(text, at);
    const isOption = text[at] === '[';
    if (isOption && closing < 0) break;
    if (!isOption && !CODE_NAME.test(name) && isProse(text, at)) return `${signature}t`;
    signature += isOption ? 'o' : 'm';
    if (closing < 0) break;
    at = closing;
  }
  return signature;
}

/** Behind what closes the bracket or brace at `open`, if that is near; else -1. */
function closingIn(text: string, open: number): number {
  const closing = text[open] === '[' ? ']' : '}';
  let depth = 0;
  for (let at = open + 1; at < Math.min(text.length, open + WINDOW); at++) {
    const unit = text[at];
    if (unit === '\\') at++;
    else if (unit === closing && depth === 0) return at + 1;
    else if (unit === '{') depth++;
    else if (unit === '}') depth--;
  }
  return -1;
}

function isProse(text: string, open: number): boolean {
  const closing = closingIn(text, open);
  const inner = text.slice(open + 1, closing < 0 ? open + WINDOW : closing - 1).replace(/\\[A-Za-z]+/g, ' ');
  if (/[=<>|]|\b\w+[_/]\w+|^\s*[\w-]+\s*,|::/.test(inner.slice(0, 80))) return false;
  return (inner.match(WORD)?.length ?? 0) >= PROSE_WORDS;
}
