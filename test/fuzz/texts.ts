// The texts of any shape that each format is tried with: one table for the command and the tests.
import type fc from 'fast-check';
import type { Format } from '../../server/src/text/sourceText.js';
import { apiDescriptionSoup } from './apiDescription.js';
import { asciidocSoup } from './asciidoc.js';
import { latexSoup } from './latex.js';
import { markdownSoup, notebookSoup } from './markdown.js';
import { markupSoup } from './markup.js';
import { plaintextSoup } from './plaintext.js';
import { restructuredtextSoup } from './restructuredtext.js';

/** A format without texts of its own does not compile. */
export const TEXTS: Readonly<Record<Format, fc.Arbitrary<string>>> = {
  markdown: markdownSoup,
  mdx: markdownSoup,
  notebook: notebookSoup,
  plaintext: plaintextSoup,
  restructuredtext: restructuredtextSoup,
  asciidoc: asciidocSoup,
  html: markupSoup('html'),
  xml: markupSoup('xml'),
  latex: latexSoup,
  apiDescription: apiDescriptionSoup,
};

/** All formats. */
export const ALL_FORMATS = Object.keys(TEXTS) as Format[];
