// The language server over a workspace in two languages: counts, hints and answers are those of a block's own language.
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { CodeAction } from 'vscode-languageserver-protocol';
import { LineIndex } from '../../server/src/text/lineIndex.js';
import { BILINGUAL_PAGES } from '../support/bilingualPages.js';
import { TestClient, eventually, temporaryFolder } from '../support/languageServer.js';

let folder: Awaited<ReturnType<typeof temporaryFolder>>;
let client: TestClient;
beforeAll(async () => {
  folder = await temporaryFolder({ ...BILINGUAL_PAGES, 'termbase.yaml': 'evenword: 1\nlanguage: en\n' });
  client = await TestClient.start([folder.path]);
  await eventually('the survey', () => client.states.some(({ state }) => state === 'ready'));
});
afterAll(async () => {
  await client.end();
  await folder.dispose();
});

describe('a workspace in two languages', () => {
  it('counts each page once and asks in both languages', () => {
    const { documents, openQuestions } = client.states.at(-1)!;
    expect([documents, openQuestions]).toEqual([Object.keys(BILINGUAL_PAGES).length, 2]);
  });

  it('shows a hint in the language that it is about, and keeps French out of an English question', async () => {
    const notes = folder.uri('notes.md');
    const page = folder.uri('fr/debut.md');
    await client.open(notes, BILINGUAL_PAGES['notes.md']!);
    await client.open(page, BILINGUAL_PAGES['fr/debut.md']!);
    await eventually('hints in French', () => client.shown(page).length > 0);
    expect(
      client
        .shown(page)
        .every(({ code, message }) => code === 'mixed-terms' && /mot.clé/.test(JSON.stringify(message))),
    ).toBe(true);
    // Only the English paragraph may be asked about the datalogger.
    expect(client.shown(notes).filter(({ range }) => range.start.line > 0)).toEqual([]);
  });

  it('writes the language of a French answer into a termbase that is in English', async () => {
    const text = BILINGUAL_PAGES['fr/debut.md']!;
    const start = new LineIndex(text).positionAt(text.indexOf('mot-clé') + 1);
    const params = {
      ...{ textDocument: { uri: folder.uri('fr/debut.md') }, range: { start, end: start } },
      context: { diagnostics: [] },
    };
    const actions = (await client.connection.sendRequest<CodeAction[] | null>('textDocument/codeAction', params)) ?? [];
    expect(actions.length).toBeGreaterThan(0);
    const prefer = actions.find(({ title }) => title.includes('“mot-clé”'));
    const resolved = await client.connection.sendRequest<CodeAction>('codeAction/resolve', prefer);
    expect(JSON.stringify(resolved.edit)).toContain('language: fr');
  });
});
