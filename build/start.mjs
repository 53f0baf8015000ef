// npm start: the main job on the sample. Questions in the terminal, the report written, and how to go on in VS Code.
import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('..', import.meta.url));
const run = (...words) => {
  const { status } = spawnSync(process.execPath, words, { cwd: root, stdio: 'inherit' });
  if (status !== 0) process.exit(status ?? 1);
};

run('build/bundle.mjs');
run('dist/cli.js', 'ask', 'samples/buoys');
run('dist/cli.js', 'report', 'samples/buoys', '--out', 'out/report', '--quiet');
console.log(`
The report is written: open out/report/report.html in a browser.
To answer the questions in VS Code: npm run package, then
  code --install-extension evenword.vsix
  code samples/buoys
Open a page, put the caret on a word with faint dots under it, and press Ctrl+. (on macOS Cmd+.).`);
