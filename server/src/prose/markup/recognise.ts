// Which vocabulary an XML document is written in: by its root's namespace, its document type, its root's name.
import { DITA, DITA_MAPS, DITA_ROOTS } from './ditaElements.js';
import { DOCBOOK, DOCBOOK_ROOTS } from './docbookElements.js';
import { HTML } from './htmlElements.js';
import { MALLARD } from './mallardElements.js';
import { OTHER } from './otherElements.js';
import type { Vocabulary } from './roles.js';

/** The start tag of a root element. */
export interface Root {
  /** With its prefix. */
  readonly name: string;
  /** The value of an attribute as written, or undefined. */
  attribute(name: string): string | undefined;
}

const BY_NAMESPACE: Partial<Record<string, Vocabulary>> = {
  'http://docbook.org/ns/docbook': DOCBOOK,
  'http://www.w3.org/1999/xhtml': HTML,
  'http://projectmallard.org/1.0/': MALLARD,
};
const DITA_BODY = /<(?:conbody|taskbody|refbody|glossdef|troublebody|shortdesc|body|learning\w*body)[\s>]/;
const DOCBOOK_PARA = /<(?:para|simpara)[\s>]/;

/** The vocabulary of a document, or undefined where it holds no prose of its own. */
export function recognise(root: Root, doctype: string, uri: string, text: string): Vocabulary | undefined {
  const colon = root.name.indexOf(':');
  const local = root.name.slice(colon + 1);
  const namespace = root.attribute(colon < 0 ? 'xmlns' : `xmlns:${root.name.slice(0, colon)}`);
  const known = namespace === undefined ? undefined : BY_NAMESPACE[namespace];
  if (known) return known;
  if (/DTD (?:Simplified )?DocBook/i.test(doctype)) return DOCBOOK;
  const isDita =
    /dita/i.test(doctype) ||
    (DITA_ROOTS.has(local) && /\.dtd["']/i.test(doctype)) ||
    root.attribute('xmlns:ditaarch') !== undefined ||
    /\.dita$/i.test(uri);
  if (DITA_MAPS.has(local) && (isDita || /\.ditamap$/i.test(uri))) return undefined;
  if (isDita) return DITA;
  if (/DTD X?HTML/i.test(doctype) || (local === 'html' && namespace === undefined)) return HTML;
  if (namespace === undefined) {
    const schema = root.attribute('xsi:noNamespaceSchemaLocation') ?? '';
    if (DITA_ROOTS.has(local) && (DITA_BODY.test(text) || /dita/i.test(schema))) return DITA;
    if (DOCBOOK_ROOTS.has(local) && DOCBOOK_PARA.test(text)) return DOCBOOK;
    if (local === 'page' && /\.page$/i.test(uri)) return MALLARD;
  }
  return OTHER;
}
