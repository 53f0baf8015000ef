// The small documentation set that the workbench tests run on.
import { mkdir, writeFile } from 'node:fs/promises';
import path from 'node:path';

/** Files by their paths in the workspace. */
export const files: Readonly<Record<string, string>> = {
  'index.md': '# Drift\n\nThe weather buoys.\n',
};

/** Writes the files into `folder`, which it makes. */
export async function writeWorkspace(folder: string): Promise<void> {
  for (const [name, text] of Object.entries(files)) {
    const file = path.join(folder, name);
    await mkdir(path.dirname(file), { recursive: true });
    await writeFile(file, text);
  }
}
