// The environments of LaTeX and of its commonest packages as the reader sees them.
import { Zone } from '../zones.js';
import { block, byName, command, environment, type Environment, type Line } from './command.js';

const GLOSSARY: Environment = { ...environment('terms', 'o'), isGlossary: true };
const FRAME: Environment = {
  ...environment('blocks'),
  opening: block('dott', ['heading', 'caption'], Zone.heading, 3),
};

const ENVIRONMENTS: readonly Line<Environment>[] = [
  [environment('blocks'), 'abstract document center flushleft flushright titlepage frontmatter appendices landscape'],
  [environment('blocks'), 'small footnotesize large Large raggedright sloppypar subequations subappendices'],
  [environment('blocks', 'o'), 'figure figure* table table* wrapfigure* marginfigure sidewaysfigure sidewaystable'],
  [environment('blocks', 'o'), 'algorithm proof theorem lemma corollary proposition definition remark example note'],
  [
    environment('blocks', 'o'),
    'tip important exercise solution columns threeparttable tablenotes mdframed framed shaded',
  ],
  [environment('blocks', 'ok'), 'tcolorbox'],
  [environment('blocks', 'omm'), 'wrapfigure wraptable'],
  [environment('blocks', 'om'), 'subfigure subtable floatrow multicols column'],
  [environment('blocks', 'ooom'), 'minipage'],
  [environment('blocks', 'm'), 'adjustbox otherlanguage otherlanguage* spacing addmargin'],
  [environment('blocks', 'dt'), 'block alertblock exampleblock'],
  [FRAME, 'frame'],
  [environment('blocks', 'o', Zone.quotation), 'quote quotation displayquote verse quoting'],
  [environment('blocks', 'm', Zone.quotation), 'foreigndisplayquote'],
  [environment('blocks', '', Zone.safetyMessage), 'dangerblock warningblock cautionblock noticeblock'],
  [environment('items', 'do'), 'itemize enumerate itemize* enumerate* compactitem compactenum asparaenum inparaenum'],
  [environment('items', 'o'), 'tasks dinglist checklist'],
  [environment('items', 'mm'), 'list'],
  [environment('terms', 'do'), 'description description* compactdesc labeling'],
  [GLOSSARY, 'theglossary acronym'],
  [environment('table', 'om'), 'tabular tabbing supertabular mpsupertabular array'],
  [environment('table', 'mom'), 'tabular* tabularx tabulary tabularew'],
  [environment('table', 'om'), 'longtable longtable* longtabu ltablex'],
  [environment('table', 'mm'), 'xltabular'],
  [environment('table', 'km'), 'tblr longtblr talltblr NiceTabular'],
  [environment('math'), 'math displaymath equation equation* align align* alignat alignat* gather gather* multline'],
  [
    environment('math'),
    'multline* flalign flalign* eqnarray eqnarray* dmath dmath* split cases matrix pmatrix bmatrix',
  ],
  [environment('verbatim', 'o'), 'verbatim verbatim* Verbatim Verbatim* BVerbatim LVerbatim alltt semiverbatim'],
  [environment('verbatim', 'k'), 'lstlisting minted minted* code listing* pyglist'],
  [environment('verbatim', 'k'), 'tcblisting pythoncode luacode luacode* pycode sageblock filecontents filecontents*'],
  [environment('verbatim'), 'comment tikzpicture pgfpicture picture axis pspicture forest asy asydef tikzcd prooftree'],
  [
    environment('verbatim'),
    'algorithmic algorithm2e algpseudocode bytefield thebibliography filecontentsdef circuitikz',
  ],
];

const BY_NAME = byName(ENVIRONMENTS);
const UNKNOWN: Environment = { content: 'blocks', zones: 0, opening: undefined };
const SAFETY: Environment = { content: 'blocks', zones: Zone.safetyMessage, opening: undefined };
const VERBATIM = environment('verbatim', 'k');
const SPHINX_ADMONITION = block('mt', ['caption']);
const SAFETY_NAME = /^(?:danger|warning|caution|notice)(?:box)?\*?$/;
/** Names by which classes and packages call their own listings. */
const LISTING_NAME =
  /verbatim|listing|(?:^|[a-z])code\*?$|^(?:shell|console|terminal|bash|sh|python|java|json|yaml|xml|sql)\*?$/i;

/** The role of an environment by its name; one that is not known holds blocks, unless its name says otherwise. */
export function environmentOf(name: string): Environment {
  const known = BY_NAME.get(name);
  if (known) return known;
  if (SAFETY_NAME.test(name)) return SAFETY;
  return LISTING_NAME.test(name) ? VERBATIM : UNKNOWN;
}

/** An admonition as Sphinx writes it: its kind is the first argument, its title the second. */
export function sphinxAdmonition(kind: string): Environment {
  const zones = SAFETY_NAME.test(kind) ? Zone.safetyMessage : 0;
  return { content: 'blocks', zones, opening: { ...SPHINX_ADMONITION, zones } };
}

/** An environment with the content of another and `count` arguments that are no prose. */
export function withArguments(role: Environment, count: number, optional: boolean): Environment {
  const signature = (optional ? 'o' : '') + 'm'.repeat(Math.max(0, count - (optional ? 1 : 0)));
  return { ...role, opening: command('block', signature) };
}
