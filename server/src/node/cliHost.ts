// The command line's world on Node: standard streams, the file system, colours where the terminal has them.
import { writeFile } from 'node:fs/promises';
import { homedir, tmpdir } from 'node:os';
import { dirname, isAbsolute, join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { CliHost, Survey, SurveyRequest } from '../cli/host.js';
import { CannotSurvey } from '../cli/host.js';
import { Profiles } from '../engine/factsOf.js';
import { CannotRead, plainReason } from './files.js';
import { makeFolder } from './makeFolder.js';
import { surveyFolders } from './survey.js';

/** The host of a process. Colours are off where NO_COLOR is set (no-color.org) or output is no terminal. `version` is the engine's. */
export function nodeHost(version: string): CliHost {
  const colours = process.stdout.isTTY && process.env.NO_COLOR === undefined;
  let shown = 0;
  const progress = (text: string): void => {
    if (!process.stderr.isTTY) return;
    process.stderr.write(`\r${text.padEnd(shown)}${text === '' ? '\r' : ''}`);
    shown = text.length;
  };
  return {
    version,
    write: (text) => void process.stdout.write(text),
    note: (text) => void process.stderr.write(text),
    progress,
    emphasise: (text) => (colours ? `\u001b[1m${text}\u001b[22m` : text),
    faint: (text) => (colours ? `\u001b[2m${text}\u001b[22m` : text),
    survey(paths, request) {
      return surveyForCli(paths, request, version, this.progress.bind(this));
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

const STAGES = { history: 'Reading what writers replaced …', mining: 'Comparing terms …' };

async function surveyForCli(
  paths: readonly string[],
  request: SurveyRequest,
  version: string,
  progress: (text: string) => void,
): Promise<Survey> {
  const { history, ...wanted } = request;
  try {
    const { engine, rootUri, leftOut } = await surveyFolders(paths, new Profiles(), {
      ...wanted,
      ...(history && { history: { version, cacheFolder: userCacheFolder() } }),
      progress: (stage, done, all) => progress(stage === 'reading' ? `Reading ${done} of ${all} pages` : STAGES[stage]),
    });
    progress('');
    return { snapshot: engine.snapshot, rootUri, leftOut };
  } catch (error) {
    if (error instanceof CannotRead) throw new CannotSurvey(error.message);
    throw error;
  }
}

/** Where programs keep what they can find anew: by the XDG Base Directory Specification 0.8, or the platform's own place. */
function userCacheFolder(): string {
  const { XDG_CACHE_HOME: cache, LOCALAPPDATA: local } = process.env;
  const place = process.platform === 'win32' ? local : cache;
  if (place !== undefined && isAbsolute(place)) return join(place, 'evenword');
  const home = homedir();
  return isAbsolute(home) ? join(home, '.cache', 'evenword') : join(tmpdir(), 'evenword');
}
