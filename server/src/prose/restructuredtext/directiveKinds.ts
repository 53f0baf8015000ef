// The directives of docutils, Sphinx and its common extensions: what of them is prose.

/** What a directive's argument is: nothing it takes, no prose, names of classes, a title over what follows, or text behind a version number. */
export type Argument = 'none' | 'opaque' | 'classes' | 'caption' | 'heading' | 'title' | 'paragraph' | 'version';

/** What a directive's body is. */
export type Body = 'none' | 'prose' | 'caption' | 'cells' | 'records' | 'glossary' | 'meta';

/** How a directive is read. */
export interface DirectiveKind {
  readonly argument: Argument;
  readonly body: Body;
  /** Options whose values are prose. */
  readonly options?: Readonly<Record<string, 'caption' | 'alternativeText' | 'tableCell'>>;
  /** True where the directive warns of harm. */
  readonly safety?: true;
}

const KINDS = new Map<string, DirectiveKind>();

function define(names: string, kind: DirectiveKind): void {
  for (const name of names.split(' ')) KINDS.set(name, kind);
}

define('danger warning caution notice', { argument: 'none', body: 'prose', safety: true });
define('note tip hint important attention error seealso todo epigraph highlights pull-quote compound', {
  argument: 'none',
  body: 'prose',
});
define('header footer hlist centered-block tabs tab-set grid-body info success', { argument: 'none', body: 'prose' });
define('admonition topic sidebar', { argument: 'caption', body: 'prose' });
define('tab group-tab tab-item grid-item-card card dropdown details collapse panels step', {
  argument: 'caption',
  body: 'prose',
});
define('versionadded versionchanged versionremoved deprecated deprecated-removed', {
  argument: 'version',
  body: 'prose',
});
define('figure', { argument: 'opaque', body: 'caption', options: { alt: 'alternativeText' } });
define('image thumbnail', { argument: 'opaque', body: 'none', options: { alt: 'alternativeText' } });
define('table', { argument: 'caption', body: 'prose' });
define('list-table flat-table', { argument: 'caption', body: 'cells' });
define('csv-table', { argument: 'caption', body: 'records', options: { header: 'tableCell' } });
define('toctree', { argument: 'opaque', body: 'none', options: { caption: 'caption' } });
define('contents', { argument: 'caption', body: 'none' });
define('rubric', { argument: 'heading', body: 'none' });
define('centered', { argument: 'paragraph', body: 'none' });
define('title', { argument: 'title', body: 'none' });
define('glossary', { argument: 'none', body: 'glossary' });
define('meta', { argument: 'none', body: 'meta' });
define('container class rst-class', { argument: 'classes', body: 'prose' });
define('only ifconfig grid grid-item tab-content', { argument: 'opaque', body: 'prose' });
// What describes an object names it in its argument, in code, and says the rest in prose.
define('function method classmethod staticmethod attribute property data exception decorator decoratormethod module', {
  argument: 'opaque',
  body: 'prose',
});
define('describe object option cmdoption confval envvar setting signal event control state program type', {
  argument: 'opaque',
  body: 'prose',
});
define('automodule autoclass autofunction automethod autoattribute autodata autoexception autodecorator', {
  argument: 'opaque',
  body: 'prose',
});
define('code code-block sourcecode literalinclude graphviz digraph graph mermaid uml plantuml inheritance-diagram', {
  argument: 'opaque',
  body: 'none',
  options: { caption: 'caption', alt: 'alternativeText' },
});
define('code-tab highlight include raw math parsed-literal productionlist', { argument: 'opaque', body: 'none' });
define('testcode testsetup testoutput testcleanup doctest prompt console', { argument: 'opaque', body: 'none' });
define('role default-role default-domain index tabularcolumns sectnum currentmodule plot ipython jinja autosummary', {
  argument: 'opaque',
  body: 'none',
});
define('codeauthor sectionauthor moduleauthor acks target-notes todolist aafig ditaa', {
  argument: 'opaque',
  body: 'none',
});

const DESCRIBED: DirectiveKind = { argument: 'opaque', body: 'prose' };

/**
 * How a directive of this name (in lower case) is read, or undefined where nobody knows it. A name with a domain before
 * it (`py:method`) describes an object (Sphinx, "Domains").
 */
export function directiveKind(name: string): DirectiveKind | undefined {
  return KINDS.get(name) ?? (name.includes(':') ? DESCRIBED : undefined);
}
