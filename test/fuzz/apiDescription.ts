// Descriptions of interfaces of any shape: YAML and JSON, whole, torn and cut off.
import fc from 'fast-check';
import { markdownSoup } from './markdown.js';

const YAML = [
  ...['openapi: 3.1.0\n', 'info:\n', 'paths:\n', '  /a:\n', '    get:\n', 'title: ', '  description: ', 'summary: '],
  ...[
    '|\n',
    '>-\n',
    '    ',
    '  ',
    '\n',
    '\n\n',
    '"',
    "'",
    'a: ',
    '- ',
    '# c\n',
    '---\n',
    '&x ',
    '*x',
    '!!str ',
    '\t',
    '\r\n',
  ],
  ...['{', '}', '[', ']', ', ', '\\n', '\\u00e9', '\\', 'two words', '漢字', '🙂', '\uFEFF', '\0', '\ud800'],
];
const yaml = fc.array(fc.constantFrom(...YAML), { maxLength: 40 }).map((parts) => `openapi: 3.1.0\n${parts.join('')}`);
const json = fc
  .tuple(
    fc.array(markdownSoup, { maxLength: 4 }),
    fc.boolean(),
    fc.option(fc.tuple(fc.nat(400), fc.constantFrom('', '"', '\\')), { freq: 2 }),
  )
  .map(([texts, spaced, torn]) => {
    const paths = texts.map((description, i) => [`/${i}`, { get: { summary: 'Two words', description } }]);
    const whole = {
      openapi: '3.1.0',
      info: { title: 'A title', version: '1' },
      paths: Object.fromEntries(paths) as object,
    };
    const written = JSON.stringify(whole, null, spaced ? 2 : 0);
    return torn === null ? written : written.slice(0, torn[0]) + torn[1] + written.slice(torn[0] + 1);
  });

/** Texts in YAML and in JSON. */
export const apiDescriptionSoup = fc.oneof(yaml, json);
