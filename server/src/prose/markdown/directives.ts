// Fenced directives that hold Markdown, as MyST has them: the fence of a code block whose language stands in braces.
import { Zone, type ZoneSet } from '../zones.js';

/** A directive's parts as offsets; its title may be empty. */
export interface Directive {
  readonly zones: ZoneSet;
  readonly titleFrom: number;
  readonly titleTo: number;
  readonly bodyFrom: number;
  readonly bodyTo: number;
}

/** Directives (MyST, Sphinx) whose bodies are prose; the others hold code, tables of contents, data. */
const PROSE = new Set(
  'note tip hint important warning caution danger attention error seealso admonition dropdown card grid grid-item tab-set'
    .concat(
      ' grid-item-card tab-item margin sidebar topic epigraph versionadded versionchanged deprecated figure glossary',
    )
    .split(' '),
);
/** What stands behind the names of these is a file or a number. */
const NO_TITLE = new Set('figure grid versionadded versionchanged deprecated'.split(' '));
const OPENING = /(`{3,}|~{3,})\{([a-z][\w-]*)\}[ \t]*([^\n]*)\n/y;
const OPTION = /[ \t]*:[a-z][\w-]*:(?:[ \t][^\n]*)?\n/y;
const SETTINGS = /---\n(?:[^]*?\n)?---\n/y;

/** The directive that the fenced block `[from, to)` is, or undefined where it is code. */
export function directiveAt(text: string, from: number, to: number): Directive | undefined {
  // Inside lists and quotations its lines have marks before them.
  if (from > 0 && text[from - 1] !== '\n') return undefined;
  OPENING.lastIndex = from;
  const opening = OPENING.exec(text);
  if (!opening || OPENING.lastIndex > to) return undefined;
  const [, fence, name, title] = opening;
  if (!PROSE.has(name!)) return undefined;
  let bodyFrom = OPENING.lastIndex;
  const titleTo = bodyFrom - 1;
  SETTINGS.lastIndex = bodyFrom;
  if (SETTINGS.test(text) && SETTINGS.lastIndex <= to) bodyFrom = SETTINGS.lastIndex;
  for (OPTION.lastIndex = bodyFrom; OPTION.test(text) && OPTION.lastIndex <= to;) bodyFrom = OPTION.lastIndex;
  const lastLine = text.lastIndexOf('\n', to - 1) + 1;
  const isClosed = lastLine >= bodyFrom && text.slice(lastLine, to).trim().startsWith(fence!);
  return {
    zones: /^(?:warning|caution|danger)$/.test(name!) ? Zone.safetyMessage : 0,
    titleFrom: NO_TITLE.has(name!) ? titleTo : titleTo - title!.length,
    titleTo,
    bodyFrom,
    bodyTo: Math.max(bodyFrom, isClosed ? lastLine : to),
  };
}
