// The elements of HTML (Living Standard, with the obsolete ones that old pages have) as the reader sees them.
import * as role from './roles.js';

const ELEMENTS: readonly role.RoleLine[] = [
  [role.SECTION, 'html body main article section'],
  [role.CONTAINER, 'div header footer aside form fieldset details dialog hgroup search center noframes'],
  [role.CONTAINER, 'ul ol menu dir dl table thead tbody tfoot tr colgroup optgroup'],
  [role.CAPTIONED, 'figure'],
  [role.PARAGRAPH, 'p address'],
  [role.LIST_ITEM, 'li'],
  [role.DEFINED_TERM, 'dt'],
  [role.DEFINITION, 'dd'],
  [role.CELL, 'td th'],
  [role.CAPTION, 'caption figcaption legend summary'],
  [role.QUOTATION, 'blockquote'],
  [role.heading(1), 'h1'],
  [role.heading(2), 'h2'],
  [role.heading(3), 'h3'],
  [role.heading(4), 'h4'],
  [role.heading(5), 'h5'],
  [role.heading(6), 'h6'],
  [role.METADATA, 'head'],
  [role.OTHER_TITLE, 'title'],
  // Navigation repeats the titles of other pages.
  [role.CLOSED, 'pre nav listing xmp plaintext hr'],
  [role.HIDDEN, 'script style template noscript datalist rp rt rtc param source track base link meta col noembed'],
  [role.LINE_BREAK, 'br'],
  [role.PICTURE, 'img area input image embed'],
  // A superscript is an exponent, an ordinal's ending or a note's number: none of them belongs to the word before it.
  [role.OPAQUE_INLINE, 'code samp tt var svg math canvas audio video object iframe applet textarea select sup'],
  [role.OPAQUE_INLINE, 'progress meter output data'],
  [role.UI_LABEL, 'kbd button'],
  [role.TERM, 'dfn'],
  [role.QUOTE, 'q cite'],
  [role.link('href'), 'a'],
  [role.INLINE, 'abbr acronym b bdi bdo big del em font i ins label mark nobr ruby s small span strike strong sub'],
  [role.INLINE, 'time u wbr picture map slot'],
];

export const HTML = role.vocabulary(
  'html',
  ELEMENTS,
  {
    ...{ alt: 'alternativeText', title: 'alternativeText', 'aria-label': 'alternativeText' },
    ...{ 'aria-description': 'alternativeText', placeholder: 'alternativeText', 'table@summary': 'alternativeText' },
    ...{ 'optgroup@label': 'alternativeText', 'meta@content': 'description' },
  },
  'inline',
);

/** Elements without content or end tag. */
export const VOID = new Set(
  'area base br col embed hr img image input link meta param source track wbr basefont bgsound frame keygen'.split(' '),
);

/** Elements whose start ends an open paragraph. */
export const ENDS_PARAGRAPH = new Set(
  'address article aside blockquote center details dialog dir div dl fieldset figcaption figure footer form h1 h2 h3 h4 h5 h6'
    .concat(' header hgroup hr main menu nav ol p pre search section table ul li dt dd summary listing xmp plaintext')
    .split(' '),
);

interface ImpliedEnds {
  readonly ends: ReadonlySet<string>;
  /** How far up the elements to end are looked for. */
  readonly within: ReadonlySet<string>;
}

function ending(ends: string, within: string): ImpliedEnds {
  return { ends: new Set(ends.split(' ')), within: new Set(within.split(' ')) };
}

const ENTRY = ending('dt dd', 'dl table');
const CELL = ending('td th', 'table tr');
const ROWS = ending('thead tbody tfoot tr td th caption', 'table');

/** Elements whose start ends others, the end tags of which may be left out. */
export const IMPLIED_ENDS: Partial<Record<string, ImpliedEnds>> = {
  ...{ li: ending('li', 'ul ol menu dir table'), dt: ENTRY, dd: ENTRY },
  ...{ tr: ending('tr td th caption', 'table'), td: CELL, th: CELL, thead: ROWS, tbody: ROWS, tfoot: ROWS },
  ...{ body: ending('head', 'body'), option: ending('option', 'select optgroup datalist') },
};

/** Elements of a page's head; any other start tag ends a head whose end tag was left out. */
export const IN_HEAD = new Set('title base link meta style script noscript template head html'.split(' '));

/** Words in a class by which generators of HTML mark user interface labels. */
export const LABEL_CLASSES = new Set(
  'guilabel guimenu guimenuitem guisubmenu guibutton menuselection uicontrol wintitle menuchoice keycap keyseq'.split(
    ' ',
  ),
);
/** Words in a class that name an admonition of safety, alone or beside one of {@link ADMONITION_CLASSES}. */
export const SAFETY_CLASSES = new Set('danger warning caution'.split(' '));
export const ADMONITION_CLASSES = new Set('admonition admonitionblock callout'.split(' '));
