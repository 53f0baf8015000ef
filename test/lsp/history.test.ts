// The server reads a folder's history after its survey: in trusted workspaces, unless a setting says not to.
import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { eventually, temporaryFolder, TestClient } from '../support/languageServer.js';
import { hasGit, movePages, TOLD } from '../support/movingPages.js';

let folder: Awaited<ReturnType<typeof temporaryFolder>>;
let place: Awaited<ReturnType<typeof temporaryFolder>>;
let client: TestClient;

const cacheFolder = (): string => join(place.path, 'history');
const start = async (trust: object | undefined, history?: boolean): Promise<void> => {
  client = await TestClient.start([join(folder.path, 'docs')], {}, trust && { trust });
  client.settings.set('evenword', history === undefined ? {} : { history });
  await eventually('the survey', () => client.states.at(-1)?.state === 'ready');
};
const report = async (): Promise<string> => {
  const { files } = await client.connection.sendRequest<{ files: Record<string, string> }>('evenword/report', {});
  return files['report.json']!;
};
/** Waits until the questions were settled so many times. */
const settled = (times: number): Promise<boolean> =>
  eventually(`settlement ${times}`, () => client.states.filter(({ state }) => state === 'ready').length >= times);

describe.skipIf(!hasGit)('the history in the server (skipped where there is no git)', () => {
  beforeEach(async () => {
    folder = await temporaryFolder({});
    place = await temporaryFolder({});
    movePages(folder.path);
  });
  afterEach(async () => {
    await client.end();
    await folder.dispose();
    await place.dispose();
  });

  it('comes after the first questions, and is kept where the client says', async () => {
    await start({ trusted: true, cacheFolder: cacheFolder() });
    expect(client.states.at(-1)).toMatchObject({ state: 'ready', documents: 1, openQuestions: 1 });
    await settled(2);
    expect(await report()).toContain(TOLD);
    expect(readdirSync(cacheFolder())).toHaveLength(1);
  });

  it('waits for trust', async () => {
    await start(undefined);
    expect(await report()).not.toContain('writers replaced');
    expect(existsSync(cacheFolder())).toBe(false);
    await client.connection.sendNotification('evenword/trust', { trusted: true, cacheFolder: cacheFolder() });
    await settled(2);
    expect(await report()).toContain(TOLD);
  });

  it('is not read where a setting says so, and is forgotten where one comes to say so', async () => {
    await start({ trusted: true, cacheFolder: cacheFolder() }, true);
    await settled(2);
    expect(await report()).toContain(TOLD);
    client.settings.set('evenword', { history: false });
    await client.connection.sendNotification('workspace/didChangeConfiguration', { settings: null });
    await settled(3);
    expect(await report()).not.toContain('writers replaced');
  });
});
