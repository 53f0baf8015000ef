// Making a folder where its place may be missing as well.
import { mkdir } from 'node:fs/promises';
import { dirname } from 'node:path';

/** Makes a folder and those above it. Node's own recursive mkdir never returns where a file system answers ENOENT to mkdir. */
export async function makeFolder(folder: string, mode?: number): Promise<void> {
  const codeOf = (error: unknown): unknown => (error as NodeJS.ErrnoException).code;
  const make = async (): Promise<void> => {
    await mkdir(folder, mode).catch((error: unknown) => {
      if (codeOf(error) !== 'EEXIST') throw error;
    });
  };
  await make().catch(async (error: unknown) => {
    if (codeOf(error) !== 'ENOENT' || dirname(folder) === folder) throw error;
    await makeFolder(dirname(folder), mode);
    await make();
  });
}
