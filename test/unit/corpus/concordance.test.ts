// Where a sequence of words stands: over pages, in any case, and not across punctuation, sentences or code.
import { describe, expect, it } from 'vitest';
import { findUses } from '../../../server/src/corpus/concordance.js';
import { corpusOf } from '../../support/corpusOf.js';

const corpus = corpusOf([
  'Rotate the access key. The access keys rotate. Access key first, access key last.\n\nIn `access key` nothing counts.',
  'The access: key. They access. Key people do. An access\nkey over two lines. The access’s key.',
  '> Quoted access key of someone else.',
]);

describe('a concordance', () => {
  it.each([
    ['access key', 4, 2],
    ['Access Key', 4, 2],
    ['access keys', 1, 1],
    ['key', 7, 2],
    ['no such words', 0, 0],
    ['', 0, 0],
  ])('finds %j', (term, uses, documents) => {
    const found = findUses(corpus, term);
    expect({ uses: found.rows.length, documents: found.documents }).toEqual({ uses, documents });
  });
});
