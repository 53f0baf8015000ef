// What all suites of the tests as a person share, and how a suite gets a workbench window of its own.
import { mkdir, rm } from 'node:fs/promises';
import path from 'node:path';
import type { Browser, Page } from 'playwright-core';
import { openPage } from '../host/browser.js';
import type { PackagedVsCode } from '../host/packagedVsCode.js';
import { failureFolder, temporaryFolder } from '../host/places.js';
import { startServer } from '../host/server.js';
import type { Settings } from '../host/settings.js';
import { Workbench } from '../host/workbench.js';
import { writeWorkspace } from '../workspace.js';

/** The VS Code, the browser and the folder with the installed extension. */
export interface Stage {
  readonly code: PackagedVsCode;
  readonly browser: Browser;
  readonly extensions: string;
}

/** A window on a fresh copy of the workspace. */
export interface Window {
  readonly workbench: Workbench;
  /** The folder that it shows. */
  readonly workspace: string;
  /** Ends the window and its server, and removes the folder. */
  close(): Promise<void>;
}

let stage: Stage | undefined;

/** The pages that are open, for the account of a failure. */
const pages = new Set<Page>();

/** Sets what the suites share, before they are loaded. */
export function setStage(set: Stage): void {
  stage = set;
}

/** Opens a window with a server, user data and a workspace of its own. `settings` are put over the quiet ones. */
export async function openWindow(settings: Settings = {}): Promise<Window> {
  if (stage === undefined) throw new Error('the stage has not been set');
  const folder = temporaryFolder('window');
  const workspace = path.join(folder, 'weather-buoys');
  await writeWorkspace(workspace);
  const server = await startServer(stage.code, { extensions: stage.extensions, settings });
  const page = await openPage(stage.browser);
  pages.add(page);
  const close = async (): Promise<void> => {
    pages.delete(page);
    await page.close();
    await server.stop();
    await rm(folder, { recursive: true, force: true, maxRetries: 10, retryDelay: 100 });
  };
  try {
    const workbench = new Workbench(page, server.authority);
    await workbench.open(workspace);
    return { workbench, workspace, close };
  } catch (error) {
    await keepScreenshots('opening a window');
    await close();
    throw error;
  }
}

/** Leaves a screenshot of every open window in the folder of failures, under the title of the failed test. */
export async function keepScreenshots(title: string): Promise<void> {
  await mkdir(failureFolder, { recursive: true });
  const name = title.replace(/[^\w]+/g, '-').slice(0, 100);
  for (const [index, page] of [...pages].entries()) {
    await page.screenshot({ path: path.join(failureFolder, `${name}-${index}.png`) });
  }
}
