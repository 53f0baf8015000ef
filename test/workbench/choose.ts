// Chooses the VS Code that the tests in the extension host run in: a desktop build where one can be had, else the packaged one.
import { existsSync } from 'node:fs';
import path from 'node:path';
import { downloadAndUnzipVSCode, SilentReporter } from '@vscode/test-electron';
import { findBrowser } from './host/browser.js';
import { packagedVsCode } from './host/packagedVsCode.js';
import { projectRoot } from './host/places.js';

/** An executable for `runTests()`, and what it is. */
export interface Choice {
  readonly executable: string;
  readonly name: string;
}

/** The release that a download fetches; `VSCODE_VERSION` names another. It is the packaged one's version. */
const desktopVersion = process.env['VSCODE_VERSION'] ?? '1.100.3';
const desktopCache = path.join(projectRoot, '.vscode-test');

/** How long the update server may take to answer, and how long a whole download may take (milliseconds). */
const answerLimit = 3000;
const downloadLimit = 180_000;

/**
 * Takes `VSCODE_EXECUTABLE`, else a download of VS Code, else the packaged VS Code.
 * @throws when not even the packaged one, with a browser to show it in, can be had.
 */
export async function chooseVsCode(say: (line: string) => void): Promise<Choice> {
  const named = process.env['VSCODE_EXECUTABLE'];
  if (named !== undefined && named !== '') {
    if (!existsSync(named)) throw new Error(`VSCODE_EXECUTABLE names ${named}, which does not exist`);
    return { executable: named, name: `desktop VS Code (VSCODE_EXECUTABLE=${named})` };
  }
  const hindrance = await whyNoDesktop();
  if (hindrance === undefined) {
    const executable = await download().catch((error: unknown) => say(`no desktop VS Code: ${String(error)}`));
    if (executable !== undefined) return { executable, name: `desktop VS Code ${desktopVersion} (downloaded)` };
  } else say(`no desktop VS Code: ${hindrance}`);
  const packaged = await packagedVsCode(say);
  const browser = await findBrowser(say);
  const executable = path.join(import.meta.dirname, 'host/code.js');
  return { executable, name: `packaged VS Code ${packaged.version}, shown by ${browser.name}` };
}

async function whyNoDesktop(): Promise<string | undefined> {
  const { DISPLAY, WAYLAND_DISPLAY, CI } = process.env;
  if (process.platform === 'linux' && !DISPLAY && !WAYLAND_DISPLAY) return 'this machine has no display';
  if (existsSync(desktopCache)) return undefined;
  if (CI === 'true') return 'nothing is downloaded in CI; VSCODE_EXECUTABLE can name one';
  try {
    const url = 'https://update.code.visualstudio.com/api/releases/stable';
    const { ok, status } = await fetch(url, { method: 'HEAD', signal: AbortSignal.timeout(answerLimit) });
    return ok ? undefined : `the update server answers ${String(status)}`;
  } catch {
    return 'the update server cannot be reached';
  }
}

async function download(): Promise<string> {
  const late = new Promise<never>((_, reject) => {
    setTimeout(
      () => reject(new Error(`the download took more than ${String(downloadLimit / 1000)} s`)),
      downloadLimit,
    ).unref();
  });
  const reporter = new SilentReporter();
  return Promise.race([downloadAndUnzipVSCode({ version: desktopVersion, cachePath: desktopCache, reporter }), late]);
}
