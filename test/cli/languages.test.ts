// evenword on a documentation set in two languages: questions apart, each language named, and terms held to their own.
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { BILINGUAL_PAGES } from '../support/bilingualPages.js';
import { evenword } from '../support/commandLine.js';
import { temporaryFolder } from '../support/languageServer.js';

interface Answer {
  documents: number;
  questions: { id: string; language?: string; terms: { text: string }[]; examples: { uri: string }[] }[];
}

let folder: Awaited<ReturnType<typeof temporaryFolder>>;
beforeAll(async () => {
  folder = await temporaryFolder({ ...BILINGUAL_PAGES });
});
afterAll(() => folder.dispose());

describe('evenword on pages in two languages', () => {
  it('asks about each language apart, and says which where it is not English', async () => {
    const { code, out } = await evenword(['ask', folder.path, '--format', 'json']);
    expect(code).toBe(0);
    const { documents, questions } = JSON.parse(out) as Answer;
    expect(documents).toBe(Object.keys(BILINGUAL_PAGES).length);
    expect(questions.map(({ id, language }) => [language, id])).toEqual([
      [undefined, 'variant:data logger|datalogger'],
      ['fr', 'variant:mot clé|mot-clé'],
    ]);
    expect(questions[1]!.examples.every(({ uri }) => uri.includes('/fr/'))).toBe(true);
    expect('language' in questions[0]!).toBe(false);
  });

  it('says so to people too', async () => {
    const { out } = await evenword(['ask', folder.path]);
    expect(out).toContain('Which way of writing: “mot clé” or “mot-clé”? (variant in fr, ');
  });

  it('verifies a block against the terms of its language', async () => {
    const termbase = 'evenword: 1\nlanguage: en\nconcepts:\n  - preferred: data logger\n    deprecated: [datalogger]\n';
    await writeFile(join(folder.path, 'termbase.yaml'), termbase);
    const { code, out } = await evenword(['verify', folder.path]);
    expect(code).toBe(1);
    const lines = out.split('\n').filter((line) => line.includes('notes.md'));
    expect(lines).toHaveLength(1);
    expect(lines[0]).toMatch(/notes\.md:1:/);
  });
});
