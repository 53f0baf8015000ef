// Bundles the extension, the language server and the command line into dist/, one file each.
import { build } from 'esbuild';
import { chmod, copyFile, mkdir, readFile, rm } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('..', import.meta.url));
const watching = process.argv.includes('--watch');
const { version } = JSON.parse(await readFile(new URL('../package.json', import.meta.url), 'utf8'));
const shared = {
  absWorkingDir: root,
  bundle: true,
  platform: 'node',
  target: 'node20',
  format: 'cjs',
  sourcemap: process.argv.includes('--source-maps') || watching ? 'linked' : false,
  minify: !watching,
  legalComments: 'none',
  // Its other form looks for its parts in a way that cannot be bundled.
  alias: { 'jsonc-parser': 'jsonc-parser/lib/esm/main.js' },
  define: { EVENWORD_VERSION: JSON.stringify(version) },
  logLevel: 'warning',
};
const bundles = [
  { ...shared, entryPoints: ['client/src/extension.ts'], outfile: 'dist/client.js', external: ['vscode'] },
  { ...shared, entryPoints: ['server/src/node/server.ts'], outfile: 'dist/server.js' },
  { ...shared, entryPoints: ['server/src/node/cli.ts'], outfile: 'dist/cli.js', banner: { js: '#!/usr/bin/env node' } },
];

await rm(new URL('../dist', import.meta.url), { recursive: true, force: true });
await mkdir(new URL('../dist', import.meta.url));
if (watching) {
  const { context } = await import('esbuild');
  await Promise.all(bundles.map(async (options) => (await context({ ...options, logLevel: 'info' })).watch()));
} else {
  await Promise.all(bundles.map((options) => build(options)));
  await chmod(new URL('../dist/cli.js', import.meta.url), 0o755);
}
await copyFile(
  new URL('../server/src/termbase/schema.json', import.meta.url),
  new URL('../dist/termbase.schema.json', import.meta.url),
);
