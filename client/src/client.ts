// The language client: which documents the server sees, and what it is told at the start.
import * as vscode from 'vscode';
import { LanguageClient } from 'vscode-languageclient/node';
import type { LanguageClientOptions, ServerOptions } from 'vscode-languageclient/node';
import { DOCUMENT_LANGUAGES, STATE_NOTIFICATION, TERMBASE_NAME } from '../../server/src/lsp/protocol.js';
import type { ClientOptions, FolderStateParams } from '../../server/src/lsp/protocol.js';

const SCHEMES = ['file', 'vscode-remote', 'vscode-vfs'];

/** Starts the server and connects it to the editor; requests that come before it is up wait for it. */
export function startClient(server: ServerOptions, onState: (state: FolderStateParams) => void): LanguageClient {
  const options: LanguageClientOptions = {
    documentSelector: [
      ...DOCUMENT_LANGUAGES.flatMap((language) => [...SCHEMES, 'untitled'].map((scheme) => ({ scheme, language }))),
      // Not the old text of a termbase that a view of differences shows.
      ...SCHEMES.map((scheme) => ({ scheme, pattern: `**/${TERMBASE_NAME}` })),
    ],
    initializationOptions: { savesTermbase: true } satisfies ClientOptions,
    markdown: { isTrusted: false, supportHtml: false },
  };
  const client = new LanguageClient('evenword', 'Evenword', server, options);
  client.onNotification(STATE_NOTIFICATION, onState);
  client.start().catch((error: unknown) => {
    void vscode.window.showErrorMessage(`Evenword's language server could not be started: ${String(error)}`);
  });
  return client;
}
