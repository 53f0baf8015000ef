// Finds a Chromium, from the machine or from npm alone, and opens pages in it that reach this machine only.
import { spawnSync, execFile } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { writeFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import path from 'node:path';
import { promisify } from 'node:util';
import { chromium, type Browser, type Page } from 'playwright-core';
import { cached, projectRoot } from './places.js';

/** A browser that can be started. */
export interface BrowserChoice {
  readonly executable: string;
  /** Environment variables that it needs beside those of this process. */
  readonly environment: Readonly<Record<string, string>>;
  /** What it is, for the log. */
  readonly name: string;
}

const installed = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];

/**
 * The browser of the tests: `CHROMIUM` if set, else the machine's, else the one in the npm package
 * `@sparticuz/chromium` (a headless Chromium for Linux on x64 with the libraries and the font that a bare machine lacks).
 * @throws when none of them can be started.
 */
export async function findBrowser(say: (line: string) => void): Promise<BrowserChoice> {
  const named = process.env['CHROMIUM'];
  if (named !== undefined && named !== '') return { executable: named, environment: {}, name: `CHROMIUM=${named}` };
  const local = installed.find((file) => existsSync(file));
  if (local !== undefined) return { executable: local, environment: {}, name: local };
  if (process.platform !== 'linux' || process.arch !== 'x64') {
    throw new Error('no browser: set CHROMIUM to the executable of a Chromium or Chrome');
  }
  return packagedBrowser(say);
}

/** The machine's fonts and the one of the package: the headless Chromium ends itself on a machine without any font. */
const fontsFile = 'fonts.conf';
const fontsConfiguration = `<?xml version="1.0"?>
<!DOCTYPE fontconfig SYSTEM "fonts.dtd">
<fontconfig>
  <include ignore_missing="yes">/etc/fonts/fonts.conf</include>
  <dir prefix="relative">fonts</dir>
  <cachedir prefix="relative">fonts-cache</cachedir>
</fontconfig>
`;

async function packagedBrowser(say: (line: string) => void): Promise<BrowserChoice> {
  const entry = createRequire(import.meta.url).resolve('@sparticuz/chromium');
  const manifest = path.join(entry.slice(0, entry.lastIndexOf('/build/')), 'package.json');
  const { version } = JSON.parse(readFileSync(manifest, 'utf8')) as { version: string };
  const home = await cached(`chromium-${version}`, async (making) => {
    say(`unpacking Chromium from the npm package @sparticuz/chromium ${version} …`);
    // The package unpacks into the temporary folder, and its extra libraries only on the platform named here.
    await promisify(execFile)(
      process.execPath,
      ['--input-type=module', '-e', "import c from '@sparticuz/chromium'; await c.executablePath();"],
      { cwd: projectRoot, env: { ...process.env, TMPDIR: making, AWS_EXECUTION_ENV: 'AWS_Lambda_nodejs20.x' } },
    );
    await writeFile(path.join(making, fontsFile), fontsConfiguration);
  });
  const executable = path.join(home, 'chromium');
  const environment: Record<string, string> = { FONTCONFIG_FILE: path.join(home, fontsFile) };
  if (!starts(executable, environment)) {
    const libraries = [path.join(home, 'al2023/lib'), process.env['LD_LIBRARY_PATH']].filter(Boolean);
    environment['LD_LIBRARY_PATH'] = libraries.join(':');
  }
  if (!starts(executable, environment)) {
    throw new Error(
      `the Chromium of @sparticuz/chromium ${version} does not start on this machine: set CHROMIUM to another one`,
    );
  }
  return { executable, environment, name: `@sparticuz/chromium ${version}` };
}

function starts(executable: string, environment: Readonly<Record<string, string>>): boolean {
  return spawnSync(executable, ['--version'], { env: { ...process.env, ...environment } }).status === 0;
}

/** Starts the browser, headless. Its sandbox is off (it fails for root and in containers); it shows only our own pages. */
export function launchBrowser(choice: BrowserChoice): Promise<Browser> {
  const off = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--disable-sync'];
  return chromium.launch({
    executablePath: choice.executable,
    headless: true,
    args: [...off, '--no-first-run', '--disable-background-networking', '--disable-component-update'],
    env: { ...process.env, ...choice.environment },
  });
}

/** Opens an empty page of 1400 × 900 pixels. Requests that would leave this machine fail. */
export async function openPage(browser: Browser): Promise<Page> {
  const page = await browser.newPage({ viewport: { width: 1400, height: 900 } });
  const leaves = (url: URL): boolean => /^(https?|wss?):$/.test(url.protocol) && url.hostname !== '127.0.0.1';
  await page.route(leaves, (route) => route.abort());
  return page;
}
