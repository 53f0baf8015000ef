// Starts and ends the server of the packaged VS Code on a free loopback port.
import { execFile, spawn, type ChildProcess } from 'node:child_process';
import { rmSync } from 'node:fs';
import { rm } from 'node:fs/promises';
import path from 'node:path';
import { promisify } from 'node:util';
import type { PackagedVsCode } from './packagedVsCode.js';
import { temporaryFolder } from './places.js';
import { writeUserSettings, type Settings } from './settings.js';

/** What a server is started with. Folders left out are temporary and go with the server. */
export interface ServerOptions {
  readonly userData?: string | undefined;
  readonly extensions?: string | undefined;
  readonly settings?: Settings | undefined;
}

/** A server that listens. */
export interface Server {
  /** Host and port, such as `127.0.0.1:41237`. */
  readonly authority: string;
  /** Rejects when the server ends before `stop` is called. */
  readonly died: Promise<never>;
  /** What it has written so far, for the account of a failure. */
  log(): string;
  /** Ends the server with its extension hosts and removes its temporary folders. */
  stop(): Promise<void>;
}

/** Starts the server. @throws with the server's own words when it does not come to listen. */
export async function startServer(code: PackagedVsCode, options: ServerOptions = {}): Promise<Server> {
  const folder = temporaryFolder('server');
  const userData = options.userData ?? path.join(folder, 'user');
  writeUserSettings(userData, options.settings);
  const process_ = spawn(
    code.node,
    [
      path.join(code.folder, 'out/server-main.js'),
      ...['--host', '127.0.0.1', '--port', '0', '--without-connection-token', '--accept-server-license-terms'],
      ...['--telemetry-level', 'off', '--disable-workspace-trust'],
      '--enable-smoke-test-driver', // Newer builds ignore the payload of the page without it.
      ...['--server-data-dir', path.join(folder, 'data'), '--user-data-dir', userData],
      ...['--extensions-dir', options.extensions ?? path.join(folder, 'extensions')],
    ],
    { detached: true, stdio: ['ignore', 'pipe', 'pipe'], env: serverEnvironment(folder) },
  );
  const killAtExit = (): void => {
    signalGroup(process_, 'SIGKILL');
    rmSync(folder, { recursive: true, force: true });
  };
  process.once('exit', killAtExit);
  let log = '';
  let stopping = false;
  process_.stderr.on('data', (chunk: Buffer) => (log += chunk.toString()));
  process_.stdout.on('data', (chunk: Buffer) => (log += chunk.toString()));
  const died = new Promise<never>((_, reject) => {
    process_.once('exit', (status) => {
      if (!stopping) reject(new Error(`the VS Code server ended with ${String(status)}:\n${log}`));
    });
  });
  died.catch(() => undefined);
  const port = await Promise.race([listeningPort(process_, () => log), died]);
  return {
    authority: `127.0.0.1:${port}`,
    died,
    log: () => log,
    stop: async () => {
      stopping = true;
      signalGroup(process_, 'SIGTERM');
      for (let tries = 0; tries < 50 && signalGroup(process_, 0); tries++) await pause(100);
      signalGroup(process_, 'SIGKILL');
      process.off('exit', killAtExit);
      await rm(folder, { recursive: true, force: true, maxRetries: 10, retryDelay: 100 });
    },
  };
}

/** Installs a packaged extension into `extensions`, by the server's own command line. */
export async function installExtension(code: PackagedVsCode, vsix: string, extensions: string): Promise<void> {
  const folder = temporaryFolder('install');
  try {
    await promisify(execFile)(
      code.node,
      [
        path.join(code.folder, 'out/server-main.js'),
        ...['--accept-server-license-terms', '--install-extension', vsix, '--extensions-dir', extensions],
        ...['--server-data-dir', path.join(folder, 'data'), '--user-data-dir', path.join(folder, 'user')],
      ],
      { env: serverEnvironment(folder) },
    );
  } finally {
    await rm(folder, { recursive: true, force: true, maxRetries: 10, retryDelay: 100 });
  }
}

/** No marketplace, and temporary files where they are removed with the server. */
const serverEnvironment = (folder: string): NodeJS.ProcessEnv => ({
  ...process.env,
  TMPDIR: folder,
  EXTENSIONS_GALLERY: '{}',
});

function listeningPort(server: ChildProcess, log: () => string): Promise<string> {
  return new Promise((resolve) => {
    server.stdout?.on('data', () => {
      const port = /agent listening on (\d+)/.exec(log())?.[1];
      if (port !== undefined) resolve(port);
    });
  });
}

/** Signals the server and the extension hosts that it started; signal 0 asks whether any of them lives. */
function signalGroup(server: ChildProcess, signal: NodeJS.Signals | 0): boolean {
  if (server.pid === undefined) return false;
  try {
    return process.kill(-server.pid, signal);
  } catch {
    return false;
  }
}

const pause = (milliseconds: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, milliseconds));
