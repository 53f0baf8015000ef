// Entry of the command line; the same file serves as a worker that gathers facts.
import { Exit } from '../cli/host.js';
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
  runCli(process.argv.slice(2), nodeHost(EVENWORD_VERSION)).then(
    (code) => (process.exitCode = code),
    (error: unknown) => {
      // Node's own exit code 1 would say that pages break a decision.
      console.error(error);
      process.exitCode = Exit.cannotRun;
    },
  );
}
