// A language client for tests: starts the built server over stdio and speaks JSON-RPC with it.
import { spawn } from 'node:child_process';
import type { ChildProcessWithoutNullStreams } from 'node:child_process';
import { existsSync } from 'node:fs';
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { dirname, join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import { StreamMessageReader, StreamMessageWriter, createMessageConnection } from 'vscode-jsonrpc/node';
import type { MessageConnection } from 'vscode-jsonrpc/node';
import type { Diagnostic, InitializeResult, ServerCapabilities } from 'vscode-languageserver-protocol';

/** The project's folder. */
export const projectRoot = resolve(import.meta.dirname, '../..');
const serverFile = join(projectRoot, 'dist/server.js');

/** A state that the server reported. */
export interface ReportedState {
  readonly state: string;
  readonly documents: number;
  readonly openQuestions: number;
  readonly message?: string;
}

/** A running server and what it has said so far. */
export class TestClient {
  readonly states: ReportedState[] = [];
  readonly published: { uri: string; diagnostics: Diagnostic[] }[] = [];
  readonly messages: string[] = [];
  /** What the editor answers when it is asked for settings, by section. */
  readonly settings = new Map<string, unknown>();
  capabilities: ServerCapabilities = {};
  private readonly versions = new Map<string, number>();

  private constructor(
    readonly process: ChildProcessWithoutNullStreams,
    readonly connection: MessageConnection,
  ) {}

  /** Starts the server and initializes it with workspace folders, telling it further options. */
  static async start(folders: readonly string[], capabilities: object = {}, options: object = {}): Promise<TestClient> {
    if (!existsSync(serverFile)) throw new Error('dist/server.js is missing: run npm run build first');
    const child = spawn(process.execPath, [serverFile, '--stdio'], { stdio: 'pipe' });
    const connection = createMessageConnection(
      new StreamMessageReader(child.stdout),
      new StreamMessageWriter(child.stdin),
    );
    const client = new TestClient(child, connection);
    connection.onNotification('evenword/state', (state: ReportedState) => void client.states.push(state));
    connection.onNotification(
      'textDocument/publishDiagnostics',
      (params: { uri: string; diagnostics: Diagnostic[] }) => {
        client.published.push(params);
      },
    );
    connection.onNotification(
      'window/logMessage',
      ({ message }: { message: string }) => void client.messages.push(message),
    );
    connection.onNotification('window/showMessage', ({ message }: { message: string }) => {
      client.messages.push(message);
    });
    connection.onRequest('window/workDoneProgress/create', () => null);
    connection.onRequest('client/registerCapability', () => null);
    connection.onRequest('workspace/configuration', ({ items }: { items: { section: string }[] }) =>
      items.map(({ section }) => client.settings.get(section) ?? null),
    );
    connection.listen();
    const workspaceFolders = folders.map((folder) => ({ uri: pathToFileURL(folder).href, name: folder }));
    const result = await connection.sendRequest<InitializeResult>('initialize', {
      processId: process.pid,
      rootUri: null,
      workspaceFolders,
      initializationOptions: { savesTermbase: true, ...options },
      capabilities: {
        workspace: {
          configuration: true,
          workspaceFolders: true,
          didChangeWatchedFiles: { dynamicRegistration: true },
        },
        window: { workDoneProgress: true },
        ...capabilities,
      },
    });
    client.capabilities = result.capabilities;
    await connection.sendNotification('initialized', {});
    return client;
  }

  async open(uri: string, text: string, languageId = 'markdown'): Promise<void> {
    this.versions.set(uri, 1);
    await this.connection.sendNotification('textDocument/didOpen', {
      textDocument: { uri, languageId, version: 1, text },
    });
  }

  /** Replaces the whole text of an open document, or a range of it. */
  async change(uri: string, text: string, range?: object): Promise<void> {
    const version = (this.versions.get(uri) ?? 0) + 1;
    this.versions.set(uri, version);
    await this.connection.sendNotification('textDocument/didChange', {
      textDocument: { uri, version },
      contentChanges: [{ text, ...(range && { range }) }],
    });
  }

  /** The diagnostics shown for a document now. */
  shown(uri: string): readonly Diagnostic[] {
    return this.published.filter((each) => each.uri === uri).at(-1)?.diagnostics ?? [];
  }

  async end(): Promise<void> {
    await this.connection.sendRequest('shutdown');
    await this.connection.sendNotification('exit');
    await new Promise((done) => (this.process.exitCode === null ? this.process.once('exit', done) : done(undefined)));
    this.connection.dispose();
  }
}

/** Waits until a check gives something, asking every few milliseconds; fails after 20 s with what was waited for. */
export async function eventually<T>(what: string, check: () => T | false | undefined): Promise<T> {
  for (let waited = 0; waited < 20_000; waited += 20) {
    const result = check();
    if (result !== false && result !== undefined) return result;
    await new Promise((done) => setTimeout(done, 20));
  }
  throw new Error(`waited in vain for ${what}`);
}

/** A folder of its own with files in it, removed by `dispose`. */
export async function temporaryFolder(
  files: Readonly<Record<string, string | Uint8Array>>,
): Promise<{ path: string; uri: (name: string) => string; dispose: () => Promise<void> }> {
  const path = await mkdtemp(join(tmpdir(), 'evenword-test-'));
  for (const [name, content] of Object.entries(files)) {
    await mkdir(dirname(join(path, name)), { recursive: true });
    await writeFile(join(path, name), content);
  }
  return {
    path,
    uri: (name) => pathToFileURL(join(path, name)).href,
    dispose: () => rm(path, { recursive: true, force: true }),
  };
}
