// One document's text at one moment, and the format it is written in.

/** The formats that a reader exists for. */
export type Format = 'markdown' | 'plaintext' | 'restructuredtext' | 'asciidoc' | 'html' | 'xml';

/** An immutable text. Offsets into it are UTF-16 code units everywhere in the engine. */
export interface SourceText {
  readonly uri: string;
  readonly format: Format;
  readonly text: string;
}
