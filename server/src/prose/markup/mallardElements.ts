// The elements of Mallard 1.1 pages as the reader sees them.
import * as role from './roles.js';

const NOTE: role.ElementRole = { flow: role.Flow.container, zones: 0, titled: 'caption', safetyBy: 'style' };

const ELEMENTS: readonly role.RoleLine[] = [
  [role.SECTION, 'page section stack'],
  [role.CONTAINER, 'list steps terms tree table thead tbody tfoot tr colgroup div links'],
  [role.CAPTIONED, 'figure example listing synopsis'],
  [NOTE, 'note'],
  [role.TITLE, 'title'],
  [role.DEFINED_TERM, 'item>title'],
  [role.SUBTITLE, 'subtitle'],
  [role.OTHER_TITLE, 'info>title info>subtitle'],
  [role.CAPTION, 'desc'],
  [role.DESCRIPTION, 'info>desc'],
  [role.PARAGRAPH, 'p'],
  [role.LIST_ITEM, 'item'],
  [{ ...role.DEFINITION, flow: role.Flow.container }, 'terms>item'],
  [role.CELL, 'td th'],
  [{ ...role.QUOTATION, titled: 'caption' }, 'quote'],
  [role.METADATA, 'info'],
  [role.CLOSED, 'screen comment col'],
  [role.ALTERNATIVE, 'media'],
  [role.OPAQUE_INLINE, 'code cmd file input output sys var email svg math'],
  [role.UI_LABEL, 'gui key'],
  [role.UI_PATH, 'guiseq keyseq'],
  [role.QUOTE, 'cite q'],
  [role.link('href', 'xref', 'action'), 'link'],
  [role.INLINE, 'em app span hi sub name'],
  [role.OPAQUE_INLINE, 'sup'],
];

export const MALLARD = role.vocabulary('mallard', ELEMENTS, {}, 'read', ['if', 'ui']);
