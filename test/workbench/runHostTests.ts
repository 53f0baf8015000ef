// Runs the tests in the extension host, where VS Code's API is the truth.
import { existsSync } from 'node:fs';
import { rm } from 'node:fs/promises';
import path from 'node:path';
import { runTests, TestRunFailedError } from '@vscode/test-electron';
import { chooseVsCode } from './choose.js';
import { needed } from './host/noWorkbench.js';
import { failureFolder, projectRoot, temporaryFolder } from './host/places.js';
import { writeUserSettings } from './host/settings.js';
import { grepVariable, readTally, tallyVariable, type Tally } from './tally.js';
import { writeWorkspace } from './workspace.js';

/** Runs them on a workspace, user settings and an extensions folder of their own. */
export async function runHostTests(say: (line: string) => void, grep?: string): Promise<Tally> {
  requireBuild();
  const choice = await needed('no VS Code for the extension host', () => chooseVsCode(say));
  say(`running in: ${choice.name}`);
  const folder = temporaryFolder('host');
  const tally = path.join(folder, 'tally.json');
  const userData = path.join(folder, 'user');
  const workspace = path.join(folder, 'workspace');
  writeUserSettings(userData);
  await writeWorkspace(workspace);
  try {
    await runTests({
      vscodeExecutablePath: choice.executable,
      extensionDevelopmentPath: projectRoot,
      extensionTestsPath: path.join(import.meta.dirname, 'host-tests/index.cjs'),
      launchArgs: [workspace, `--user-data-dir=${userData}`, `--extensions-dir=${path.join(folder, 'extensions')}`],
      extensionTestsEnv: {
        VSCODE_HOST_LOGS: failureFolder,
        [tallyVariable]: tally,
        ...(grep !== undefined && { [grepVariable]: grep }),
      },
    });
    return readTally(tally);
  } catch (error) {
    if (!(error instanceof TestRunFailedError)) throw error;
    say(`${error.message}; see ${path.relative(projectRoot, failureFolder)}/`);
    const { passed, failed } = readTally(tally);
    return { passed, failed: Math.max(failed, 1) };
  } finally {
    await rm(folder, { recursive: true, force: true, maxRetries: 10, retryDelay: 100 });
  }
}

/** @throws when the extension has not been built, for then VS Code would only say that it cannot be activated. */
export function requireBuild(): void {
  for (const name of ['client.js', 'server.js']) {
    if (!existsSync(path.join(projectRoot, 'dist', name)))
      throw new Error(`dist/${name} is missing: run “npm run build”`);
  }
}
