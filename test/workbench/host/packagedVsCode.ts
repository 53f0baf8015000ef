// Unpacks the VS Code server and workbench that the npm package code-server carries: no install script, no compiler.
import { execFile } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { mkdir, readFile, rm, symlink, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { promisify } from 'node:util';
import { replaceNativeModules } from './nativeModules.js';
import { cached } from './places.js';
import { provideRipgrep } from './ripgrep.js';

const run = promisify(execFile);

/** The releases that these tests know, with the checksums that the npm registry publishes for them. */
const releases: Readonly<Record<string, string>> = {
  '4.100.3': 'sha512-q/Fh2DOxCRNhC/WiG/6sAhSKnj7ZACTVBaeeZ+rWjol//0FCbl/qg1ln5ecZ99jYcfqMxZZAyWcN+YBIo0DgpA==',
  '4.139.1': 'sha512-fUYvJVdz4ZoVJfakGiGWXFMpF8K1ObsrpGvX17ZxNpKOzdNHs7lANT670JTr4ZhA8DnWqyvvmFG/d3HV9Yy6ew==',
};

/** A VS Code that is ready to be served. */
export interface PackagedVsCode {
  /** The folder with `out/server-main.js`. */
  readonly folder: string;
  /** The Node executable that runs its server. */
  readonly node: string;
  /** The version of VS Code, such as `1.100.3`. */
  readonly version: string;
}

/**
 * Prepares the packaged VS Code in the cache, or takes it from there. `VSCODE_HOST_VERSION` names another release of
 * code-server than the default.
 * @throws when the registry cannot be reached or gives other bytes than expected.
 */
export async function packagedVsCode(say: (line: string) => void): Promise<PackagedVsCode> {
  const release = process.env['VSCODE_HOST_VERSION'] ?? '4.100.3';
  const root = await cached(`code-server-${release}`, async (making) => {
    say(`preparing the packaged VS Code (code-server ${release} from the npm registry) …`);
    await unpack(release, making);
    await replaceNativeModules(path.join(making, 'lib/vscode'));
  });
  const folder = path.join(root, 'lib/vscode');
  if (!(await provideRipgrep(folder))) say('no ripgrep was found: searching files fails in this workbench');
  return { folder, node: nodeFor(root), version: readVersion(folder) };
}

async function unpack(release: string, root: string): Promise<void> {
  await run('npm', ['pack', '--loglevel=error', '--pack-destination', root, `code-server@${release}`], { cwd: root });
  const archive = path.join(root, `code-server-${release}.tgz`);
  const checksum = `sha512-${createHash('sha512')
    .update(await readFile(archive))
    .digest('base64')}`;
  const expected = releases[release];
  if (expected !== undefined && checksum !== expected) {
    throw new Error(`code-server ${release} is not what was published: expected ${expected}, got ${checksum}`);
  }
  await run('tar', ['xzf', archive, '--strip-components=1'], { cwd: root });
  await rm(archive);
  const folder = path.join(root, 'lib/vscode');
  const quiet = ['--ignore-scripts', '--omit=dev', '--legacy-peer-deps', '--no-audit', '--no-fund', '--loglevel=error'];
  await run('npm', ['ci', ...quiet], { cwd: folder, maxBuffer: 64 << 20 });
  if (!existsSync(path.join(folder, 'node_modules.asar')))
    await symlink('node_modules', path.join(folder, 'node_modules.asar'));
  await installMatchingNode(root);
}

/** Brings the Node that a release asks for, as a binary inside a registry package, where this Node is older than that. */
async function installMatchingNode(root: string): Promise<void> {
  const wanted = wantedNode(root);
  if (wanted <= ownNode()) return;
  const own = path.join(root, 'node');
  await mkdir(own);
  await writeFile(path.join(own, 'package.json'), '{"private":true}');
  const name = `node-${process.platform}-${process.arch}@${String(wanted)}`;
  await run('npm', ['install', '--ignore-scripts', '--no-audit', '--no-fund', '--loglevel=error', name], { cwd: own });
}

function nodeFor(root: string): string {
  const own = path.join(root, `node/node_modules/node-${process.platform}-${process.arch}/bin/node`);
  return existsSync(own) ? own : process.execPath;
}

const ownNode = (): number => Number.parseInt(process.versions.node, 10);

function wantedNode(root: string): number {
  const manifest = readJson(path.join(root, 'package.json')) as { engines?: { node?: string } };
  return Number.parseInt(manifest.engines?.node ?? '0', 10);
}

function readVersion(folder: string): string {
  const product = readJson(path.join(folder, 'product.json')) as { version?: string };
  const manifest = readJson(path.join(folder, 'package.json')) as { version: string };
  return product.version ?? manifest.version;
}

const readJson = (file: string): unknown => JSON.parse(readFileSync(file, 'utf8'));
