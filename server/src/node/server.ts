// Entry of the language server on Node, over stdio or an IPC channel; the same file serves as a worker that gathers facts.
import { createConnection, ProposedFeatures } from 'vscode-languageserver/node';
import { serve } from '../lsp/server.js';
import { serveAsWorker } from './factsPool.js';
import { nodeServerHost } from './serverHost.js';

declare const EVENWORD_VERSION: string;

if (!serveAsWorker()) {
  // A promise that nobody waits for must not end the server: the failure is logged, and work goes on.
  process.on('unhandledRejection', (reason) => console.error(reason));
  serve(createConnection(ProposedFeatures.all), nodeServerHost(EVENWORD_VERSION), EVENWORD_VERSION);
}
