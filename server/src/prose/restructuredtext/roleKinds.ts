// The interpreted text roles of docutils, Sphinx and its common extensions: what of them is prose.

/**
 * What interpreted text is: text; the title of a work; a user interface's label; a term where it is defined or used; a
 * reference or the name of an object in code, prose only where they carry a text of their own; or code.
 */
export type RoleKind = 'text' | 'work' | 'uiLabel' | 'definedTerm' | 'term' | 'reference' | 'object' | 'code';

const KINDS = new Map<string, RoleKind>();

function define(names: string, kind: RoleKind): void {
  for (const name of names.split(' ')) KINDS.set(name, kind);
}

define('emphasis strong sub subscript sup superscript abbr abbreviation ac acronym index', 'text');
define('title title-reference t', 'work');
define('guilabel menuselection kbd', 'uiLabel');
define('dfn', 'definedTerm');
define('term', 'term');
define('ref doc any numref download', 'reference');
define('mod func class meth attr exc data const obj macro type member option envvar', 'object');
define('confval setting signal event control state', 'object');

/** What the interpreted text of a role (in lower case, perhaps with a domain before it) is. */
export function roleKind(name: string): RoleKind {
  return KINDS.get(name) ?? KINDS.get(name.slice(name.indexOf(':') + 1)) ?? 'code';
}
