// Runs the tests that see and use the workbench as a person does, on the packaged extension.
import { execFile } from 'node:child_process';
import { readdirSync } from 'node:fs';
import { rm } from 'node:fs/promises';
import path from 'node:path';
import { promisify } from 'node:util';
import Mocha from 'mocha';
import { findBrowser, launchBrowser } from './host/browser.js';
import { needed } from './host/noWorkbench.js';
import { packagedVsCode } from './host/packagedVsCode.js';
import { projectRoot, temporaryFolder } from './host/places.js';
import { installExtension } from './host/server.js';
import { keepScreenshots, setStage } from './person/stage.js';
import { requireBuild } from './runHostTests.js';
import type { Tally } from './tally.js';

/** Packs the extension, installs it into the packaged VS Code and runs every suite of `person/` in one browser. */
export async function runPersonTests(say: (line: string) => void, grep?: string): Promise<Tally> {
  requireBuild();
  const code = await needed('no packaged VS Code', () => packagedVsCode(say));
  const choice = await needed('no browser', () => findBrowser(say));
  const browser = await needed('the browser does not start', () => launchBrowser(choice));
  say(`running in: packaged VS Code ${code.version}, shown by ${choice.name}`);
  const folder = temporaryFolder('person');
  try {
    const vsix = path.join(folder, 'evenword.vsix');
    const extensions = path.join(folder, 'extensions');
    await pack(vsix);
    await installExtension(code, vsix, extensions);
    setStage({ code, browser, extensions });
    const stats = await runSuites(grep);
    return { passed: stats.passes, failed: stats.failures };
  } finally {
    await browser.close();
    await rm(folder, { recursive: true, force: true, maxRetries: 10, retryDelay: 100 });
  }
}

async function runSuites(grep?: string): Promise<Mocha.Stats> {
  const mocha = new Mocha({
    ui: 'bdd',
    timeout: 180_000,
    color: false,
    ...(grep !== undefined && { fgrep: grep }),
    rootHooks: {
      async afterEach(this: Mocha.Context) {
        const test = this.currentTest;
        if (test?.state === 'failed') await keepScreenshots(test.fullTitle());
      },
    },
  });
  const suites = path.join(import.meta.dirname, 'person');
  for (const name of readdirSync(suites).sort()) {
    if (name.endsWith('.suite.js')) mocha.addFile(path.join(suites, name));
  }
  await mocha.loadFilesAsync();
  return new Promise((resolve) => {
    const runner = mocha.run(() => resolve(runner.stats as Mocha.Stats));
  });
}

/** Packs what the manifest says into `vsix`, without asking any network. */
async function pack(vsix: string): Promise<void> {
  const program = path.join(projectRoot, 'node_modules/@vscode/vsce/vsce');
  const options = [
    'package',
    '--no-dependencies',
    '--no-rewrite-relative-links',
    '--skip-license',
    '--allow-missing-repository',
    '--out',
    vsix,
  ];
  await promisify(execFile)(process.execPath, [program, ...options], { cwd: projectRoot });
}
