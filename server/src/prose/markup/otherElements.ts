// Elements by names that most documentation vocabularies share, for documents of none that the reader knows.
import * as role from './roles.js';

const ELEMENTS: readonly role.RoleLine[] = [
  [role.SECTION, 'section sec chapter div body article topic appendix document'],
  [role.CAPTIONED, 'fig figure table note tip important example'],
  [role.SAFETY, 'warning caution danger'],
  [role.TITLE, 'title head heading'],
  [role.PARAGRAPH, 'p para simpara shortdesc'],
  [role.LIST_ITEM, 'li item listitem list-item'],
  [role.DEFINED_TERM, 'dt'],
  [role.DEFINITION, 'dd'],
  [role.CELL, 'td th entry cell'],
  [role.CAPTION, 'caption'],
  [role.QUOTATION, 'blockquote disp-quote lq'],
  [role.ASIDE, 'fn footnote'],
  [role.ALTERNATIVE, 'alt'],
  [role.PICTURE, 'image img graphic'],
  [role.METADATA, 'metadata info prolog teiHeader front-matter'],
  [role.CLOSED, 'pre code-block codeblock source programlisting screen listing script style'],
  [role.OPAQUE_INLINE, 'code tt codeph literal command filename option var monospace sup math svg'],
  [role.HIDDEN, 'indexterm index comment'],
  [role.UI_LABEL, 'uicontrol guilabel guimenu guibutton gui kbd key keycap'],
  [role.UI_PATH, 'menucascade menuchoice guiseq keyseq keycombo'],
  [role.TERM, 'term dfn firstterm'],
  [role.QUOTE, 'q quote cite'],
  [role.link('href', 'xlink:href', 'url', 'target'), 'a link xref ref ulink ext-link'],
  [role.LINE_BREAK, 'br lb break'],
];

export const OTHER = role.vocabulary('other', ELEMENTS, { alt: 'alternativeText' }, 'skip');
