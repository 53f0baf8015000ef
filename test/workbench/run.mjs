#!/usr/bin/env node
// Compiles the workbench tests and their harness to out/workbench/ and runs them: `node test/workbench/run.mjs [host] [person] [--grep=TEXT]`.
import { build } from 'esbuild';
import { chmodSync, mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';

const source = import.meta.dirname;
const root = path.resolve(source, '../..');
const out = path.join(root, 'out/workbench');

const files = readdirSync(source, { recursive: true })
  .filter((name) => name.endsWith('.ts') && !name.endsWith('.d.ts'))
  .map((name) => path.join(source, name));

const shared = {
  outbase: source,
  outdir: out,
  platform: 'node',
  target: 'node20',
  sourcemap: 'inline',
  logLevel: 'warning',
};
const inHost = (file) => file.startsWith(path.join(source, 'host-tests') + path.sep);

rmSync(out, { recursive: true, force: true });
mkdirSync(out, { recursive: true });
writeFileSync(path.join(out, 'package.json'), '{ "type": "module" }\n');
await Promise.all([
  // The harness and the tests as a person keep their file layout, so that relative imports and import.meta stay true.
  build({ ...shared, format: 'esm', entryPoints: files.filter((file) => !inHost(file)) }),
  // The extension host loads its tests with require().
  build({
    ...shared,
    format: 'cjs',
    bundle: true,
    external: ['vscode', 'mocha'],
    outExtension: { '.js': '.cjs' },
    entryPoints: files.filter(inHost),
  }),
]);
chmodSync(path.join(out, 'host/code.js'), 0o755);

process.setSourceMapsEnabled(true);
const { runWorkbenchTests } = await import(pathToFileURL(path.join(out, 'run.js')).href);
process.exitCode = await runWorkbenchTests(process.argv.slice(2));
