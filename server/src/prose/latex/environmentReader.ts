// Where environments begin and end, and the items of lists.
import { Zone } from '../zones.js';
import type { ArgumentReader } from './argumentReader.js';
import { block, type Environment } from './command.js';
import { environmentOf, sphinxAdmonition } from './environments.js';
import { Frame } from './frames.js';
import { languageTag, namedLanguage } from './languages.js';
import type { Page } from './page.js';
import { signatureAt } from './unknown.js';

const LONGEST_NAME = 80;
/** Environments whose first argument is the language of what is in them. */
const NAMES_LANGUAGE = /^(?:otherlanguage\*?|foreigndisplayquote)$/;
const FIRST_ARGUMENT = /^\s*(?:\[[^\]]*\])?\{([^{}]*)\}/;

/** Reads environments. */
export class EnvironmentReader {
  constructor(
    private readonly page: Page,
    private readonly args: ArgumentReader,
  ) {}

  /** Takes `\begin` or `\end`, which stands at `at`; `behind` is the offset behind its name. */
  tag(at: number, behind: number, begins: boolean): number {
    const { text, scanner } = this.page;
    const open = scanner.argument(behind, '{');
    const length = open < 0 ? -1 : text.slice(open, open + LONGEST_NAME).indexOf('}');
    if (length < 0) return behind;
    const name = text.slice(open + 1, open + length).trim();
    const end = open + length + 1;
    if (begins) return this.begin(name, at, end);
    this.end(name, at);
    return end;
  }

  /** Takes `\item`, behind whose name `behind` stands. */
  item(behind: number): number {
    const { page, args } = this;
    const list = page.frames.findLastIndex(({ type }) => type === 'environment');
    if (list > 0) page.closeTo(list + 1);
    page.out.flush();
    const frame = page.top;
    const isTerms = frame.content === 'terms';
    if (frame.type === 'environment') frame.kind = isTerms ? 'definition' : 'listItem';
    if (frame.isGlossary) frame.glossary = 'definition';
    const overlay = /^[ \t]*<[^<>\n]{0,40}>/.exec(page.text.slice(behind, behind + 60))?.[0].length ?? 0;
    const open = page.scanner.argument(behind + overlay, '[');
    const end = open < 0 ? -1 : page.scanner.optionEnd(open);
    if (end < 0) return args.afterWord(behind + overlay);
    if (!isTerms || page.isDeep) return end;
    const label = new Frame('label', '', open, frame);
    label.kind = 'definedTerm';
    label.blockZones = (frame.blockZones & (Zone.quotation | Zone.safetyMessage)) | Zone.definedTerm;
    label.glossary = frame.isGlossary ? 'headword' : undefined;
    label.inlineZones = 0;
    page.push(label);
    return open + 1;
  }

  private begin(name: string, at: number, end: number): number {
    const { page, args } = this;
    const role = this.roleOf(name, end);
    const { content } = role;
    const opening = role.opening ?? block(signatureAt(name, page.text, end), ['caption']);
    if (content === 'math' || content === 'verbatim') return this.skip(name, at, end, role);
    if (page.isDeep) return end;
    page.out.flush();
    const frame = new Frame('environment', name, at, page.top);
    frame.content = content;
    frame.isGlossary = role.isGlossary === true || (content === 'terms' && page.out.glossaryLevel > 0);
    if (content === 'table') frame.kind = 'tableCell';
    else if (frame.kind === 'tableCell') frame.kind = 'paragraph';
    frame.blockZones |= role.zones | (content === 'table' ? Zone.tableCell : 0);
    const tag = NAMES_LANGUAGE.test(name)
      ? languageTag(FIRST_ARGUMENT.exec(page.text.slice(end, end + 60))?.[1] ?? '')
      : namedLanguage(name);
    if (tag !== undefined) frame.language = tag;
    page.push(frame);
    return args.take({ command: opening, name, start: at, signature: opening.signature, index: 0 }, end);
  }

  private roleOf(name: string, end: number): Environment {
    const { definitions, text } = this.page;
    const defined = definitions.environments.get(name);
    if (defined) return defined;
    if (name !== 'sphinxadmonition') return environmentOf(name);
    return sphinxAdmonition(/^\{(\w+)\}/.exec(text.slice(end, end + 40))?.[1] ?? '');
  }

  /** Leaves out an environment that is no prose, but for the captions among its options. */
  private skip(name: string, at: number, end: number, { content, opening }: Environment): number {
    const { page, args } = this;
    const closing = `\\end{${name}}`;
    const found = page.scanner.find(closing, end);
    if (content === 'verbatim') page.out.flush();
    if (opening?.signature.includes('k') === true && page.text[end] === '[') {
      const option = page.scanner.optionEnd(end);
      if (option > 0 && (found < 0 || option <= found)) args.captions(end + 1, option - 1);
    }
    if (found < 0) page.report(at, `\\begin{${name}} has no end in the document.`);
    const last = found < 0 ? page.scanner.paragraphEnd(end) : found + closing.length;
    if (content === 'math') page.opaque(at, last);
    return last;
  }

  private end(name: string, at: number): void {
    const { page } = this;
    const begun = page.frames.findLastIndex((frame) => frame.type === 'environment' && frame.name === name);
    if (begun > 0) {
      page.closeUnended(begun + 1, `before \\end{${name}}`);
      page.closeTo(begun);
    } else if (name === 'document') page.isEnded = true;
    else page.report(at, `\\end{${name}} ends nothing that is open.`);
  }
}
