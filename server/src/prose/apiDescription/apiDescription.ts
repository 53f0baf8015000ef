// Reads descriptions of interfaces (OpenAPI, AsyncAPI) and JSON Schemas, in YAML or JSON: their texts are in Markdown.
import { describesInterface } from '../../text/apiDescription.js';
import type { SourceText } from '../../text/sourceText.js';
import { liftBlocks, type Embedded } from '../embedded.js';
import { readMarkdown } from '../markdown/markdown.js';
import { normalise } from '../normalise.js';
import type { BlockKind, ProseBlock } from '../prose.js';
import { keepContents, type Reading } from '../reading.js';
import { textsOfJson, textsOfYaml, type DescribingText, type TextKey } from './texts.js';

const KINDS: Readonly<Partial<Record<TextKey, BlockKind>>> = { title: 'title', summary: 'description' };

/** A text with its blocks at the places that it was read at. */
interface ReadText {
  readonly embedded: Embedded;
  readonly blocks: readonly ProseBlock[];
}

/** A description read; what was read of each text, by its key and words, is kept for the next edit. */
export interface ApiDescriptionReading extends Reading {
  readonly byText: ReadonlyMap<string, ReadText>;
}

/** Reads a file; one that describes no interface holds no prose. */
export function readApiDescription(source: SourceText, previous?: ApiDescriptionReading): ApiDescriptionReading {
  const text = normalise(source.text);
  const byText = new Map<string, ReadText>();
  if (!describesInterface(text)) return { source, prose: { blocks: [], problems: [], language: undefined }, byText };
  const { texts, problems } = /^\uFEFF?\s*\{/.test(text) ? textsOfJson(text) : textsOfYaml(text);
  const blocks: ProseBlock[] = [];
  for (const found of texts) {
    const name = `${found.key} ${found.embedded.text}`;
    const known = previous?.byText.get(name);
    const read = (known && moved(known, found.embedded)) ?? blocksOf(found);
    byText.set(name, { embedded: found.embedded, blocks: read });
    blocks.push(...read);
  }
  return { source, prose: { blocks, problems, language: undefined }, byText };
}

/** Reads a file again; texts that an edit left alone are not read again, and keep their blocks' contents. */
export function rereadApiDescription(previous: ApiDescriptionReading, source: SourceText): ApiDescriptionReading {
  const reading = readApiDescription(source, previous);
  return { ...reading, prose: { ...reading.prose, blocks: keepContents(previous.prose.blocks, reading.prose.blocks) } };
}

function blocksOf({ key, embedded }: DescribingText): ProseBlock[] {
  // CommonMark may be used in descriptions (OpenAPI 3.1.0, “Rich Text Formatting”).
  const markdown = { uri: '', format: 'markdown', text: embedded.text } as const;
  const { prose } = readMarkdown(markdown, { frontMatter: false, glossary: false });
  const kind = KINDS[key];
  return liftBlocks(prose.blocks, embedded).map(({ start, content }) => ({
    start,
    content: kind === undefined ? content : { ...content, kind, level: 0 },
  }));
}

/** The blocks of a text that was read at another place, or undefined where it is written otherwise there. */
function moved({ embedded: before, blocks }: ReadText, { pieces }: Embedded): ProseBlock[] | undefined {
  if (pieces.length !== before.pieces.length) return undefined;
  const shift = (pieces[1] ?? 0) - (before.pieces[1] ?? 0);
  for (let i = 0; i < pieces.length; i += 3) {
    const same = pieces[i] === before.pieces[i] && pieces[i + 1] === before.pieces[i + 1]! + shift;
    if (!same || pieces[i + 2] !== before.pieces[i + 2]) return undefined;
  }
  return blocks.map(({ start, content }) => ({ start: start + shift, content }));
}
