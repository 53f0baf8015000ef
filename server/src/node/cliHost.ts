// The command line's world on Node: standard streams, the file system, colours where the terminal has them.
import { mkdir, writeFile } from 'node:fs/promises';
import { dirname, join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { CliHost, Survey, SurveyRequest } from '../cli/host.js';
import { CannotSurvey } from '../cli/host.js';
import { Profiles } from '../engine/factsOf.js';
import { CannotRead, plainReason } from './files.js';
import { surveyFolders } from './survey.js';

/** The host of a process. Colours are off where NO_COLOR is set (no-color.org) or output is no terminal. */
export function nodeHost(): CliHost {
  const colours = process.stdout.isTTY && process.env.NO_COLOR === undefined;
  let shown = 0;
  const progress = (text: string): void => {
    if (!process.stderr.isTTY) return;
    process.stderr.write(`\r${text.padEnd(shown)}${text === '' ? '\r' : ''}`);
    shown = text.length;
  };
  return {
    write: (text) => void process.stdout.write(text),
    note: (text) => void process.stderr.write(text),
    progress,
    emphasise: (text) => (colours ? `\u001b[1m${text}\u001b[22m` : text),
    faint: (text) => (colours ? `\u001b[2m${text}\u001b[22m` : text),
    survey(paths, request) {
      return surveyForCli(paths, request, this.progress.bind(this));
    },
    pathOf(uri) {
      if (!uri.startsWith('file:')) return uri;
      const path = fileURLToPath(uri);
      const below = relative(process.cwd(), path);
      return below === '' || below.startsWith('..') ? path : below;
    },
    async writeFiles(folder, files) {
      try {
        for (const [name, text] of files) {
          await makeFolder(dirname(join(folder, name)));
          await writeFile(join(folder, name), text);
        }
      } catch (error) {
        throw new CannotSurvey(`${folder}: ${plainReason(error)}`);
      }
    },
    now() {
      const date = new Date();
      const two = (part: number): string => String(part).padStart(2, '0');
      return `${date.getFullYear()}-${two(date.getMonth() + 1)}-${two(date.getDate())}`;
    },
  };
}

/** Makes a folder and those above it. Node's own recursive mkdir never returns where a file system answers ENOENT to mkdir. */
async function makeFolder(folder: string): Promise<void> {
  const codeOf = (error: unknown): unknown => (error as NodeJS.ErrnoException).code;
  const make = async (): Promise<void> => {
    await mkdir(folder).catch((error: unknown) => {
      if (codeOf(error) !== 'EEXIST') throw error;
    });
  };
  await make().catch(async (error: unknown) => {
    if (codeOf(error) !== 'ENOENT' || dirname(folder) === folder) throw error;
    await makeFolder(dirname(folder));
    await make();
  });
}

async function surveyForCli(
  paths: readonly string[],
  request: SurveyRequest,
  progress: (text: string) => void,
): Promise<Survey> {
  try {
    const { engine, rootUri, leftOut } = await surveyFolders(paths, new Profiles(), {
      ...request,
      progress: (stage, done, all) =>
        progress(stage === 'reading' ? `Reading ${done} of ${all} pages` : 'Comparing terms …'),
    });
    progress('');
    return { snapshot: engine.snapshot, rootUri, leftOut };
  } catch (error) {
    if (error instanceof CannotRead) throw new CannotSurvey(error.message);
    throw error;
  }
}
