// Texts of OpenAPI, AsyncAPI and JSON Schema files: which are read, and where their words stand in the source.
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parse } from 'yaml';
import { describe, expect, it } from 'vitest';
import { decodeScalar } from '../../../server/src/prose/apiDescription/scalars.js';
import { sourceEnd, sourceStart } from '../../../server/src/prose/prose.js';
import { read, reread, startReading } from '../../../server/src/prose/read.js';
import { describesInterface } from '../../../server/src/text/apiDescription.js';

const source = (text: string, uri = 'file:///api.yaml') => ({ uri, format: 'apiDescription', text }) as const;

/** The blocks of a file, and for each whether all its words stand in the source where the map says. */
function blocksOf(text: string): { kind: string; text: string }[] {
  return read(source(text)).blocks.map((block) => {
    for (const word of block.content.text.matchAll(/[\p{L}\p{N}]+/gu)) {
      const from = sourceStart(block, word.index);
      const to = sourceEnd(block, word.index + word[0].length);
      expect(unescaped(text.slice(from, to))).toBe(word[0]);
    }
    return { kind: block.content.kind, text: block.content.text };
  });
}

const unescaped = (text: string): string =>
  text.replace(/\\u([0-9a-fA-F]{4})/g, (_, code: string) => String.fromCharCode(Number.parseInt(code, 16)));

const API = `openapi: 3.1.0
info:
  title: Buoy "North" API
  summary: 'Reads what the buoys'' sensors send'
  description: |
    Each buoy sends a *reading* an hour.

    - A reading has a **time**.
    - Never read \`raw_value\`.
  x-logo:
    description: not for readers
paths:
  /buoys:
    get:
      operationId: listBuoys
      summary: List the buoys
      description: >-
        Lists all buoys
        of a network,


        moored or adrift.
      parameters:
        - { name: limit, in: query, description: "The most\\tbuoys \\u00e0 page", schema: { type: integer, default: 5 } }
      responses:
        default:
          description: The buoys that
            were found
          content:
            application/json:
              example: { description: an example, title: an example }
components:
  schemas:
    Buoy:
      title: Buoy
      properties:
        title: { type: string, description: The painted name }
        description: { type: string, description: What the keeper notes }
`;

describe('a description of an interface', () => {
  it('gives its titles, summaries and descriptions, and nothing of its data', () => {
    expect(blocksOf(API).map(({ text }) => text)).toEqual([
      'Buoy "North" API',
      "Reads what the buoys' sensors send",
      'Each buoy sends a reading an hour.',
      'A reading has a time.',
      'Never read \uFFFC.',
      'List the buoys',
      'Lists all buoys of a network,',
      'moored or adrift.',
      'The most\tbuoys à page',
      'The buoys that were found',
      'Buoy',
      'The painted name',
      'What the keeper notes',
    ]);
    expect(
      blocksOf(API)
        .slice(0, 3)
        .map(({ kind }) => kind),
    ).toEqual(['title', 'description', 'paragraph']);
  });

  it('reads JSON as it reads YAML', () => {
    const json = JSON.stringify(parse(API), undefined, 2);
    expect(blocksOf(json)).toEqual(blocksOf(API));
    expect(blocksOf(JSON.stringify(parse(API)))).toEqual(blocksOf(API));
    expect(blocksOf(API.replaceAll('\n', '\r\n'))).toEqual(blocksOf(API));
    expect(blocksOf(`\uFEFF${API}`)).toEqual(blocksOf(API));
  });

  it('is told from other files by its start', () => {
    expect(describesInterface('# A comment\nswagger: "2.0"\n')).toBe(true);
    expect(describesInterface('{"$schema":"https://json-schema.org/draft/2020-12/schema"}')).toBe(true);
    expect(describesInterface('{"name":"openapi-tools","description":"openapi: see below"}')).toBe(false);
    expect(read(source('name: a package\ndescription: Not read.\n')).blocks).toEqual([]);
  });

  it('says where it is broken, and reads what stands before and behind', () => {
    const broken = API.replace('summary: List the buoys', 'summary: "List the buoys');
    expect(read(source(broken)).blocks[0]!.content.text).toBe('Buoy "North" API');
    const json = '{"openapi":"3.1.0","info":{"title":"Buoys",,"summary":"All"}}';
    const { blocks, problems } = read(source(json));
    expect(blocks.map(({ content }) => content.text)).toEqual(['Buoys', 'All']);
    expect(problems[0]).toMatchObject({ span: { start: json.indexOf(',,') + 1 } });
  });

  it('keeps the contents of texts that an edit leaves alone', () => {
    const before = startReading(source(API));
    const after = reread(before, source(API.replace('an hour', 'a minute')));
    const changed = after.prose.blocks.filter(({ content }, i) => content !== before.prose.blocks[i]!.content);
    expect(changed.map(({ content }) => content.text)).toEqual(['Each buoy sends a reading a minute.']);
    expect(after.prose).toEqual(read(after.source));
  });

  it('reads the meta-schemas of JSON Schema (json-schema.org, as shipped with ajv)', () => {
    const folder = join(import.meta.dirname, '../../../node_modules/ajv/dist/refs');
    const files = readdirSync(folder).filter((name) => name.endsWith('.json'));
    expect(files.length).toBeGreaterThan(2);
    for (const name of files) {
      const text = readFileSync(join(folder, name), 'utf8');
      const { title, description } = JSON.parse(text) as { title?: string; description?: string };
      if (!describesInterface(text)) continue;
      const texts = blocksOf(text).map((block) => block.text);
      for (const value of [title, description]) if (value !== undefined) expect(texts).toContain(value);
    }
  });
});

// Each string in the words of YAML 1.2.2, and its value by the reference library (npm: yaml).
describe('a string of YAML', () => {
  it.each([
    ["'a ''quoted''\n\n  word'", 'single'],
    ['"a \\"b\\" \\x41\\\n   c\n  d"', 'double'],
    ['plain words\n  go on\n\n  and on', 'plain'],
  ] as const)('%j decodes as the library decodes it', (written, style) => {
    expect(decodeScalar(written, 0, written.length, style).text).toBe((parse(`k: ${written}\n`) as { k: string }).k);
  });

  it.each(['|', '>', '|2', '>-', '|+'])('block scalar %s decodes as the library decodes it', (header) => {
    const lines = `  one\n  two\n\n\n  three\n    deeper\n  four\n   \n  five\n`;
    const body = header === '|2' ? lines.replace('  one', '    one') : lines;
    const style = header.startsWith('>') ? 'folded' : 'literal';
    const { text } = decodeScalar(body, 0, body.length, style, header === '|2' ? 2 : undefined);
    expect(text).toBe((parse(`k: ${header}\n${body}`) as { k: string }).k.replace(/ +\n/g, '\n').trimEnd());
  });
});
