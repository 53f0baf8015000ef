// One document's text at one moment, and the format it is written in.

/** The formats that a reader exists for. */
export type Format =
  | 'markdown'
  | 'mdx'
  | 'notebook'
  | 'plaintext'
  | 'restructuredtext'
  | 'asciidoc'
  | 'html'
  | 'xml'
  | 'latex'
  | 'apiDescription';

/** An immutable text. Offsets into it are UTF-16 code units everywhere in the engine. */
export interface SourceText {
  readonly uri: string;
  readonly format: Format;
  readonly text: string;
  /** The language (BCP 47 primary subtag) that the path below the documentation's root names, where it names one. */
  readonly pathLanguage?: string;
}

/** The formats by file extension, in lower case: the one table for editor, command line and watchers. */
export const FORMATS: Readonly<Record<string, Format>> = {
  html: 'html',
  htm: 'html',
  xhtml: 'xml',
  xml: 'xml',
  dita: 'xml',
  page: 'xml',
  dbk: 'xml',
  md: 'markdown',
  markdown: 'markdown',
  mdx: 'mdx',
  ipynb: 'notebook',
  txt: 'plaintext',
  text: 'plaintext',
  rst: 'restructuredtext',
  rest: 'restructuredtext',
  adoc: 'asciidoc',
  asciidoc: 'asciidoc',
  asc: 'asciidoc',
  tex: 'latex',
  latex: 'latex',
  yaml: 'apiDescription',
  yml: 'apiDescription',
  json: 'apiDescription',
};

/** The format of a file by the extension of its path or URI, or undefined for other files. */
export function formatOf(path: string): Format | undefined {
  const extension = /[^/\\]\.([A-Za-z]+)$/.exec(path)?.[1]?.toLowerCase();
  return extension !== undefined && Object.hasOwn(FORMATS, extension) ? FORMATS[extension] : undefined;
}
