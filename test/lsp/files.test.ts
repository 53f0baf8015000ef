// Which files the server counts: the editor's own exclusions, change logs, older copies, and settings that change.
import { afterAll, beforeAll, expect, it } from 'vitest';
import { TestClient, eventually, temporaryFolder } from '../support/languageServer.js';

const PAGE = '# Mooring\n\nUse the access key.\n\nMoor the buoy with a chain.\n';

let folder: Awaited<ReturnType<typeof temporaryFolder>>;
let client: TestClient;
beforeAll(async () => {
  folder = await temporaryFolder({
    ...{ 'guide.md': PAGE, 'archive/guide.md': PAGE, 'CHANGELOG.md': PAGE },
    ...{ '1.0/mooring.md': PAGE, '2.0/mooring.md': `${PAGE}\nA line more.\n` },
    ...{ 'openapi.yaml': 'openapi: 3.1.0\ninfo:\n  title: The access key\n', 'data.yaml': 'title: An API key\n' },
    'termbase.yaml': 'evenword: 1\nconcepts:\n  - preferred: API key\n    deprecated: [access key]\n',
  });
  client = await TestClient.start([folder.path]);
});
afterAll(async () => {
  await client.end();
  await folder.dispose();
});

const pages = (): number | undefined => client.states.at(-1)?.documents;

async function set(section: string, value: unknown): Promise<void> {
  client.settings.set(section, value);
  await client.connection.sendNotification('workspace/didChangeConfiguration', { settings: null });
}

it('counts documents, not change logs, older copies or data', async () => {
  await eventually('the survey', () => client.states.some(({ state }) => state === 'ready'));
  expect(pages()).toBe(4);
  expect(client.messages.some((message) => /1\.0\/mooring\.md: an older copy of 2\.0\/mooring\.md/.test(message))).toBe(
    true,
  );
});

it('follows the settings as they change', async () => {
  await set('files.exclude', { archive: true, '**/2.0': true, 'guide.md': false });
  await eventually('fewer pages', () => pages() === 3);
  await set('evenword', { read: { changeLogs: true } });
  await eventually('the change log', () => pages() === 4);
  await set('files.exclude', undefined);
  await eventually('all again', () => pages() === 5);
});

it('checks an open description of an interface, and no other data', async () => {
  const [described, data] = [folder.uri('openapi.yaml'), folder.uri('data.yaml')];
  await client.open(data, 'title: The access key\n', 'yaml');
  await client.open(described, 'openapi: 3.1.0\ninfo:\n  title: The access key\n', 'yaml');
  await eventually('a finding', () => client.shown(described).some(({ code }) => code === 'deprecated-term'));
  expect(client.shown(data)).toEqual([]);
});
