// Where the harness keeps what it prepares: one cache folder at the project root, temporary folders elsewhere.
import { existsSync, mkdtempSync } from 'node:fs';
import { mkdir, rename, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';

/** The project root. The compiled files lie as deep as their sources, so this holds for both. */
export const projectRoot = path.resolve(import.meta.dirname, '../../..');

/** The cache of downloaded parts (git-ignored). */
export const cacheFolder = path.join(projectRoot, '.vscode-host');

/** The folder of the screenshots (git-ignored). */
export const screenshotFolder = path.join(projectRoot, 'out/screenshots');

/** The folder of what a failure leaves behind: screenshots and logs (git-ignored). */
export const failureFolder = path.join(projectRoot, 'out/workbench-failures');

/** A new temporary folder; its name is short because VS Code makes sockets in it. */
export function temporaryFolder(name: string): string {
  return mkdtempSync(path.join(tmpdir(), `ew-${name}-`));
}

/**
 * The folder `name` of the cache, filled by `fill` on first use. It appears under its name only when it is complete,
 * so an interrupted or a concurrent run never leaves a half of it behind.
 */
export async function cached(name: string, fill: (folder: string) => Promise<void>): Promise<string> {
  const final = path.join(cacheFolder, name);
  if (existsSync(final)) return final;
  const making = path.join(cacheFolder, `.making-${name}-${String(process.pid)}`);
  try {
    await mkdir(making, { recursive: true });
    await fill(making);
    await rename(making, final).catch((error: unknown) => {
      if (!existsSync(final)) throw error;
    });
  } finally {
    await rm(making, { recursive: true, force: true });
  }
  return final;
}
