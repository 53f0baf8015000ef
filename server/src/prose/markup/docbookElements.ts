// The elements of DocBook 5 (and of 4 where they differ) as the reader sees them.
import * as role from './roles.js';

const ELEMENTS: readonly role.RoleLine[] = [
  [
    role.SECTION,
    'set book part partintro chapter appendix preface article section sect1 sect2 sect3 sect4 sect5 topic',
  ],
  [
    role.SECTION,
    'simplesect refentry refsection refsect1 refsect2 refsect3 refsynopsisdiv glossary glossdiv bibliography',
  ],
  [role.SECTION, 'bibliodiv acknowledgements colophon dedication reference qandadiv'],
  [role.CONTAINER, 'varlistentry glossentry qandaentry tgroup thead tbody tfoot row mediaobject'],
  [role.CONTAINER, 'screenshot programlistingco screenco imageobjectco refnamediv tr simplelist seglistitem'],
  [role.CONTAINER, 'msgset msgentry msg msgmain msgsub msgrel cover substeps stepalternatives'],
  [role.CAPTIONED, 'figure informalfigure table informaltable example informalexample equation informalequation'],
  [
    role.CAPTIONED,
    'procedure itemizedlist orderedlist variablelist calloutlist segmentedlist glosslist qandaset formalpara',
  ],
  [role.CAPTIONED, 'note tip important sidebar task tasksummary taskprerequisites taskrelated'],
  [role.CAPTIONED, 'legalnotice msgexplan msginfo formalgroup productionset'],
  [role.SAFETY, 'warning caution danger'],
  [role.TITLE, 'title'],
  [role.SUBTITLE, 'subtitle'],
  [role.OTHER_TITLE, 'titleabbrev'],
  [role.heading(0), 'bridgehead'],
  [{ ...role.CAPTIONED, inMetadata: true }, 'abstract'],
  [role.PARAGRAPH, 'para simpara refpurpose lineannotation attribution question answer'],
  [{ ...role.CAPTIONED, kind: 'listItem' }, 'listitem step callout'],
  [role.LIST_ITEM, 'member'],
  [role.DEFINED_TERM, 'term segtitle'],
  [role.HEADWORD, 'glossentry>glossterm'],
  [role.ALSO_CALLED, 'glossentry>acronym glossentry>abbrev'],
  [{ ...role.DEFINITION, flow: role.Flow.container }, 'varlistentry>listitem'],
  [{ ...role.DEFINITION, flow: role.Flow.container, glossary: 'definition' }, 'glossdef'],
  [role.SEE, 'glosssee'],
  [role.CELL, 'entry td th seg'],
  [role.CAPTION, 'caption'],
  [role.QUOTATION, 'blockquote epigraph'],
  [role.ASIDE, 'footnote'],
  [role.ALTERNATIVE, 'textobject alt'],
  [role.PICTURE, 'imageobject videoobject audioobject graphic inlinegraphic'],
  [
    role.METADATA,
    'info setinfo bookinfo partinfo chapterinfo appendixinfo prefaceinfo articleinfo sectioninfo glossaryinfo',
  ],
  [
    role.METADATA,
    'sect1info sect2info sect3info sect4info sect5info refentryinfo objectinfo blockinfo refmeta topicinfo',
  ],
  [
    role.CLOSED,
    'programlisting screen synopsis funcsynopsis cmdsynopsis classsynopsis constructorsynopsis methodsynopsis',
  ],
  [
    role.CLOSED,
    'fieldsynopsis destructorsynopsis literallayout revhistory biblioentry bibliomixed bibliolist index setindex',
  ],
  [role.CLOSED, 'toc lot tocchap refname refdescriptor refclass areaspec colspec spanspec mathphrase ackno'],
  [role.CLOSED, 'productionrecap production glossseealso synopsisfragment'],
  [role.HIDDEN, 'indexterm remark comment anchor footnoteref co annotation beginpage itermset area sbr'],
  [
    role.OPAQUE_INLINE,
    'code command literal filename option replaceable systemitem varname parameter function classname',
  ],
  [
    role.OPAQUE_INLINE,
    'methodname type returnvalue constant envar uri email computeroutput userinput prompt package property',
  ],
  [
    role.OPAQUE_INLINE,
    'markup sgmltag tag token symbol structname structfield errorcode errorname errortype exceptionname',
  ],
  [
    role.OPAQUE_INLINE,
    'interfacename ooclass ooexception oointerface initializer modifier enumvalue namespacename namespace',
  ],
  [
    role.OPAQUE_INLINE,
    'unionname templatename typedefname macroname nonterminal citerefentry citation coref inlineequation',
  ],
  [role.OPAQUE_INLINE, 'xref biblioref superscript arg group svg math keycode keysym'],
  [role.UI_LABEL, 'guibutton guiicon guilabel guimenu guimenuitem guisubmenu keycap mousebutton interface errortext'],
  [role.UI_PATH, 'menuchoice keycombo shortcut'],
  [role.TERM, 'firstterm glossterm'],
  [role.QUOTE, 'quote citetitle foreignphrase wordasword'],
  [role.NAME, 'trademark'],
  [role.link('xlink:href', 'linkend', 'url', 'targetdoc'), 'link ulink olink'],
  [role.INLINE, 'emphasis phrase abbrev acronym application productname productnumber subscript database hardware'],
  [
    role.INLINE,
    'accel date personname firstname surname orgname inlinemediaobject optional medialabel person org city country',
  ],
];

export const DOCBOOK = role.vocabulary('docbook', ELEMENTS, { 'xlink:title': 'alternativeText' }, 'read');

/** Root elements of DocBook 4 documents and of their parts. */
export const DOCBOOK_ROOTS = new Set(
  'set book part partintro chapter appendix preface article section sect1 sect2 sect3 sect4 sect5 simplesect refentry'
    .concat(' reference glossary bibliography para variablelist itemizedlist orderedlist procedure legalnotice note')
    .concat(' glossentry qandaset dedication colophon')
    .split(' '),
);
