// Reads descriptions of interfaces (OpenAPI, AsyncAPI) and JSON Schemas, in YAML or JSON: their texts are in Markdown.
import { describesInterface } from '../../text/apiDescription.js';
import type { SourceText } from '../../text/sourceText.js';
import { liftBlocks } from '../embedded.js';
import { readMarkdown } from '../markdown/markdown.js';
import { normalise } from '../normalise.js';
import type { BlockKind, ProseBlock } from '../prose.js';
import { keepContents, type Reading } from '../reading.js';
import { textsOfJson, textsOfYaml, type TextKey } from './texts.js';

const KINDS: Readonly<Partial<Record<TextKey, BlockKind>>> = { title: 'title', summary: 'description' };

/** Reads a file; one that describes no interface holds no prose. */
export function readApiDescription(source: SourceText): Reading {
  const text = normalise(source.text);
  if (!describesInterface(text)) return { source, prose: { blocks: [], problems: [], language: undefined } };
  const { texts, problems } = /^\uFEFF?\s*\{/.test(text) ? textsOfJson(text) : textsOfYaml(text);
  const blocks = texts.flatMap(({ key, embedded }): ProseBlock[] => {
    // CommonMark may be used in descriptions (OpenAPI 3.1.0, “Rich Text Formatting”).
    const markdown = { ...source, format: 'markdown', text: embedded.text } as const;
    const { prose } = readMarkdown(markdown, { frontMatter: false, glossary: false });
    const kind = KINDS[key];
    return liftBlocks(prose.blocks, embedded).map(({ start, content }) => ({
      start,
      content: kind === undefined ? content : { ...content, kind, level: 0 },
    }));
  });
  return { source, prose: { blocks, problems, language: undefined } };
}

/** Reads a file again; texts that an edit left alone keep their blocks' contents. */
export function rereadApiDescription(previous: Reading, source: SourceText): Reading {
  const reading = readApiDescription(source);
  return { ...reading, prose: { ...reading.prose, blocks: keepContents(previous.prose.blocks, reading.prose.blocks) } };
}
