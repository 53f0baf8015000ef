#!/usr/bin/env node
// Stands in for the executable of VS Code: `runTests({ vscodeExecutablePath })` runs its tests in the packaged one.
import { mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { format } from 'node:util';
import type { Browser, Page } from 'playwright-core';
import { readArguments } from './arguments.js';
import { findBrowser, launchBrowser, openPage } from './browser.js';
import { packagedVsCode } from './packagedVsCode.js';
import { startServer, type Server } from './server.js';
import { workbenchUrl } from './url.js';

/** Lines of the workbench that say nothing about the tests. */
const noise = [
  /^(Resolv(ing|ed) connection token|Creating a socket|Ignoring fetching|Updating additional|\[reconnection)/,
  /^(\[AgentHost|\[ChatModel|\[AccountPolicy|\[RemoteAgentHost|ChatSessionStore|\[Service Worker\])/,
  /^(Creation of workbench|Timed out waiting for authentication|Error: Timed out waiting for authentication)/,
  /^Error: Could not locate the bindings file/,
  /^Error: Cannot find module '[^']*(watchdog|vscode-|spdlog)/,
];

interface LogFile {
  readonly relativePath: string;
  readonly contents: string;
}

/** How the tests ended: 0 when all passed. */
interface Report {
  readonly status: number;
  readonly logs: readonly LogFile[];
}

const verbose = process.env['VSCODE_HOST_VERBOSE'] === '1';
const limit = Number(process.env['VSCODE_HOST_TIMEOUT_MS'] ?? 300_000);

let server: Server | undefined;
let browser: Browser | undefined;

async function finish(code: number): Promise<never> {
  await browser?.close().catch(() => undefined);
  await server?.stop();
  process.exit(code);
}

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.once(signal, () => void finish(130));
for (const stream of [process.stdout, process.stderr]) stream.on('error', () => void finish(1));

try {
  await finish(await main());
} catch (error) {
  console.error(error);
  await finish(1);
}

async function main(): Promise<number> {
  const asked = readArguments(process.argv.slice(2));
  const say = (line: string): void => console.error(line);
  const code = await packagedVsCode(say);
  const choice = await findBrowser(say);
  server = await startServer(code, { userData: asked.userData, extensions: asked.extensions });
  browser = await launchBrowser(choice);
  const page = await openPage(browser);
  const [report] = await listen(page);
  await page.goto(workbenchUrl({ authority: server.authority, ...asked }), {
    timeout: 120_000,
    waitUntil: 'domcontentloaded',
  });
  try {
    const { status, logs } = await Promise.race([report, server.died]);
    if (status !== 0) await keepAccount(page, logs);
    return status;
  } catch (error) {
    console.error(String(error));
    if (verbose) console.error(server.log());
    await keepAccount(page, []);
    return 1;
  }
}

/**
 * Gives the page the two functions that the workbench reports through, as it does to VS Code's own automation.
 * @returns the report to come, in an array because a promise in a promise would be awaited at once.
 */
async function listen(page: Page): Promise<[Promise<Report>]> {
  await page.exposeFunction('codeAutomationLog', (type: string, args: unknown[]) => {
    const line = format(...args);
    if (!verbose && noise.some((pattern) => pattern.test(line))) return;
    if (type === 'error' || type === 'warn') console.error(line);
    else console.log(line);
  });
  let resolve!: (report: Report) => void;
  let reject!: (error: Error) => void;
  const report = new Promise<Report>((...settle) => ([resolve, reject] = settle));
  report.catch(() => undefined);
  await page.exposeFunction('codeAutomationExit', (status: number, logs?: readonly LogFile[]) => {
    resolve({ status, logs: logs ?? [] });
  });
  page.on('crash', () => reject(new Error('the page of the workbench crashed')));
  setTimeout(() => reject(new Error(`no result within ${String(limit)} ms`)), limit).unref();
  return [report];
}

/** Leaves a screenshot and the logs of a failure in the folder `VSCODE_HOST_LOGS`. */
async function keepAccount(page: Page, logs: readonly LogFile[]): Promise<void> {
  const folder = process.env['VSCODE_HOST_LOGS'];
  if (folder === undefined) return;
  mkdirSync(folder, { recursive: true });
  await page.screenshot({ path: path.join(folder, 'failure.png') }).catch(() => undefined);
  writeFileSync(path.join(folder, 'server.log'), server?.log() ?? '');
  for (const log of logs) writeFileSync(path.join(folder, log.relativePath.replace(/[^\w.-]+/g, '_')), log.contents);
}
