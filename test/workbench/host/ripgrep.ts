// Gives the packaged VS Code the ripgrep that it searches files with.
import { existsSync } from 'node:fs';
import { copyFile, mkdir } from 'node:fs/promises';
import { createRequire } from 'node:module';
import path from 'node:path';

/**
 * Puts `rg` where VS Code looks for it, unless it is there. It comes from the npm package whose platform parts carry
 * the binary, else from the PATH.
 * @returns whether VS Code has one now.
 */
export async function provideRipgrep(folder: string): Promise<boolean> {
  const home = path.join(folder, 'node_modules/@vscode/ripgrep');
  if (!existsSync(home)) return true; // Newer releases bring their own.
  const place = path.join(home, 'bin/rg');
  if (existsSync(place)) return true;
  const found = fromPackage() ?? fromPath();
  if (found === undefined) return false;
  await mkdir(path.dirname(place), { recursive: true });
  await copyFile(found, place);
  return true;
}

function fromPackage(): string | undefined {
  try {
    return createRequire(import.meta.url).resolve(`@vscode/ripgrep-${process.platform}-${process.arch}/bin/rg`);
  } catch {
    return undefined;
  }
}

function fromPath(): string | undefined {
  const folders = (process.env['PATH'] ?? '').split(path.delimiter);
  return folders.map((folder) => path.join(folder, 'rg')).find((file) => existsSync(file));
}
