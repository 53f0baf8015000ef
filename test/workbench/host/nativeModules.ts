// Plain JavaScript in the place of the two native modules that VS Code's server cannot start without.
import { existsSync } from 'node:fs';
import { writeFile } from 'node:fs/promises';
import path from 'node:path';

/** The watchdog ends an orphaned extension host; here the process group is ended as a whole. */
const watchdog = 'exports.start = () => {};\n';

/** Writes the log files as spdlog does; output channels show the lines of such a file, so they must really be there. */
const spdlog = `const fs = require('fs');
const path = require('path');
const names = ['trace', 'debug', 'info', 'warning', 'error', 'critical'];

class Logger {
  constructor(file) { this.file = file; this.level = 2; this.raw = false; }
  write(level, message) {
    if (level < this.level) return;
    const time = new Date().toISOString().replace('T', ' ').replace('Z', '');
    const line = this.raw ? message : time + ' [' + names[level] + '] ' + message + '\\n';
    try { fs.appendFileSync(this.file, line); } catch { /* The folder is gone: the run is over. */ }
  }
  getLevel() { return this.level; }
  setLevel(level) { this.level = level; }
  setPattern() {}
  clearFormatters() { this.raw = true; }
  flush() {}
  drop() {}
}
['trace', 'debug', 'info', 'warn', 'error', 'critical'].forEach((name, level) => {
  Logger.prototype[name] = function (message) { this.write(level, message); };
});

exports.version = 0;
exports.Logger = Logger;
exports.setLevel = exports.setFlushOn = exports.shutdown = () => {};
exports.createRotatingLogger = exports.createAsyncRotatingLogger = async (name, file) => {
  fs.mkdirSync(path.dirname(file), { recursive: true });
  return new Logger(file);
};
`;

/** Replaces the unbuilt modules under `folder/node_modules`; names that a release does not have are passed over. */
export async function replaceNativeModules(folder: string): Promise<void> {
  const replacements = [
    ['native-watchdog', watchdog],
    ['@vscode/native-watchdog', watchdog],
    ['@vscode/spdlog', spdlog],
  ] as const;
  for (const [name, code] of replacements) {
    const home = path.join(folder, 'node_modules', name);
    if (existsSync(home)) await writeFile(path.join(home, 'index.js'), code);
  }
}
