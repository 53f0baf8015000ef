// Entry of the command line; the same file serves as a worker that gathers facts.
import { runCli } from '../cli/main.js';
import { nodeHost } from './cliHost.js';
import { serveAsWorker } from './factsPool.js';

declare const EVENWORD_VERSION: string;

if (!serveAsWorker()) {
  // A reader that closes the pipe early (such as head) is no failure.
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code === 'EPIPE') process.exit(0);
    throw error;
  });
  void runCli(process.argv.slice(2), nodeHost(), EVENWORD_VERSION).then((code) => (process.exitCode = code));
}
