// Files by their names: which are termbases, what format a document has, and which of those known are gone.
import type { TextDocument } from 'vscode-languageserver-textdocument';
import { formatOf } from '../text/sourceText.js';
import type { Format } from '../text/sourceText.js';
import { TERMBASE_NAME } from './protocol.js';

/** A termbase file's text, or undefined where it is gone. */
export interface TermbaseText {
  readonly uri: string;
  readonly text: string | undefined;
}

/** Those that are known and were not found again, as changes that take them out. */
export function goneFrom(known: readonly { uri: string }[], found: readonly { uri: string }[]): TermbaseText[] {
  const uris = new Set(found.map(({ uri }) => uri));
  return known.filter(({ uri }) => !uris.has(uri)).map(({ uri }) => ({ uri, text: undefined }));
}

/** True for the URI of a termbase file. */
export function isTermbase(uri: string): boolean {
  return uri.endsWith(`/${TERMBASE_NAME}`);
}

/** Formats by the editor's identifiers of languages, for documents whose name tells none. */
const BY_LANGUAGE: Readonly<Partial<Record<string, Format>>> = {
  ...{ markdown: 'markdown', mdx: 'mdx', html: 'html', xml: 'xml', dita: 'xml', docbook: 'xml' },
  ...{ restructuredtext: 'restructuredtext', asciidoc: 'asciidoc', latex: 'latex', tex: 'latex' },
  ...{ yaml: 'apiDescription', json: 'apiDescription', jsonc: 'apiDescription' },
};

/** By the file's extension, as a survey reads it, whatever the editor takes it for; else by the editor's language. */
export function formatOfDocument({ uri, languageId }: TextDocument): Format {
  return formatOf(uri) ?? BY_LANGUAGE[languageId] ?? 'plaintext';
}
