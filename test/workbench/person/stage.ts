// What all suites of the tests as a person share, and how a suite gets a workbench window of its own.
import { rm } from 'node:fs/promises';
import path from 'node:path';
import type { Browser } from 'playwright-core';
import { openPage } from '../host/browser.js';
import type { PackagedVsCode } from '../host/packagedVsCode.js';
import { temporaryFolder } from '../host/places.js';
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
  const close = async (): Promise<void> => {
    await page.close();
    await server.stop();
    await rm(folder, { recursive: true, force: true, maxRetries: 10, retryDelay: 100 });
  };
  try {
    const workbench = new Workbench(page, server.authority);
    await workbench.open(workspace);
    return { workbench, workspace, close };
  } catch (error) {
    await close();
    throw error;
  }
}
