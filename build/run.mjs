// Bundles one TypeScript file of the tests and runs it: node build/run.mjs FILE.ts [words …].
import { build } from 'esbuild';
import { spawnSync } from 'node:child_process';
import { basename, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const [file, ...words] = process.argv.slice(2);
if (file === undefined) {
  console.error('Name a TypeScript file: node build/run.mjs FILE.ts [words …]');
  process.exit(2);
}
const root = fileURLToPath(new URL('..', import.meta.url));
const outfile = join(root, 'out/run', basename(file).replace(/\.ts$/, '.cjs'));
await build({
  entryPoints: [file],
  outfile,
  bundle: true,
  platform: 'node',
  target: 'node20',
  format: 'cjs',
  sourcemap: 'inline',
  // Node keeps a map in memory as long as the program runs: without the texts it is a fifth of its size.
  sourcesContent: false,
  alias: { 'jsonc-parser': 'jsonc-parser/lib/esm/main.js' },
  define: { 'import.meta.dirname': '__dirname' },
  logLevel: 'warning',
});
const { status } = spawnSync(process.execPath, ['--enable-source-maps', '--expose-gc', outfile, ...words], {
  stdio: 'inherit',
});
process.exit(status ?? 1);
