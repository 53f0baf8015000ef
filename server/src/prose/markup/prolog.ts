// What stands before the root element of an XML document: the document type and the entities that it defines.
import { decodeReference } from '../characterReferences.js';
import { OPAQUE } from '../prose.js';

/** The prolog of a document. `end` is the offset at which its root element, or what stands for one, begins. */
export interface Prolog {
  readonly end: number;
  /** The document type declaration up to its internal subset, or ''. */
  readonly doctype: string;
  /** Names of the general entities that the internal subset declares. */
  readonly entities: ReadonlySet<string>;
  /** Those of them that stand for a character alone, by name. */
  readonly characters?: ReadonlyMap<string, string> | undefined;
}

/** One character, not one of markup. */
const CHARACTER = /^[^<>&]$/u;
const NONE: ReadonlySet<string> = new Set();
const DOCTYPE = /<!doctype\b/iy;
const ENTITY = /<!ENTITY\s+([A-Za-z_:][\w:.-]*)\s+(?:"([^"<>%]{1,20})"|'([^'<>%]{1,20})')?/y;

/** Reads the prolog at `from` by the grammar of XML 1.0, section 2.8; what does not end there ends the text. */
export function readProlog(text: string, from: number): Prolog {
  let at = from;
  let doctype = '';
  let entities = NONE;
  let characters: Prolog['characters'];
  for (;;) {
    while (at < text.length && text.charCodeAt(at) <= 32) at++;
    if (text.startsWith('<?', at)) at = after(text, '?>', at + 2);
    else if (text.startsWith('<!--', at)) at = after(text, '-->', at + 4);
    else {
      DOCTYPE.lastIndex = at;
      if (!DOCTYPE.test(text)) return { end: at, doctype, entities, characters };
      const declared = readDoctype(text, at);
      doctype = declared.doctype;
      entities = declared.entities;
      characters = declared.characters;
      at = declared.end;
    }
  }
}

function readDoctype(text: string, from: number): Prolog {
  let at = from;
  while (at < text.length) {
    const unit = text[at]!;
    if (unit === '>') return { end: at + 1, doctype: text.slice(from, at), entities: NONE };
    if (unit === '[') {
      const subset = readSubset(text, at + 1);
      return { ...subset, end: after(text, '>', subset.end), doctype: text.slice(from, at) };
    }
    at = unit === '"' || unit === "'" ? after(text, unit, at + 1) : at + 1;
  }
  return { end: text.length, doctype: text.slice(from), entities: NONE };
}

function readSubset(text: string, from: number): Omit<Prolog, 'doctype'> {
  const entities = new Set<string>();
  const characters = new Map<string, string>();
  let at = from;
  while (at < text.length && text[at] !== ']') {
    if (text.startsWith('<!--', at)) at = after(text, '-->', at + 4);
    else if (text.startsWith('<?', at)) at = after(text, '?>', at + 2);
    else if (text.startsWith('<!', at)) {
      ENTITY.lastIndex = at;
      const found = ENTITY.exec(text);
      // The first declaration of a name is the one that binds (XML 1.0, section 4.2).
      if (found && !entities.has(found[1]!)) {
        entities.add(found[1]!);
        const character = characterOf(found[2] ?? found[3] ?? '');
        if (character !== undefined) characters.set(found[1]!, character);
      }
      at = declarationEnd(text, at);
    } else at++;
  }
  return { end: at, entities, characters };
}

/** The one character that an entity's value stands for, be it a reference, or one to a reference; else undefined. */
function characterOf(value: string): string | undefined {
  const reference = value.replace(/^&(?:#38|#x26|amp);(?=#)/i, '&');
  const decoded = /^&#?\w+;$/.test(reference) ? decodeReference(reference) : reference;
  return decoded !== undefined && decoded !== OPAQUE && CHARACTER.test(decoded) ? decoded : undefined;
}

function declarationEnd(text: string, from: number): number {
  let at = from;
  while (at < text.length && text[at] !== '>') {
    const unit = text[at]!;
    at = unit === '"' || unit === "'" ? after(text, unit, at + 1) : at + 1;
  }
  return Math.min(at + 1, text.length);
}

function after(text: string, what: string, from: number): number {
  const found = text.indexOf(what, from);
  return found < 0 ? text.length : found + what.length;
}
