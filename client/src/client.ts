// The language client: which documents the server sees, and what it is told at the start.
import * as vscode from 'vscode';
import { LanguageClient } from 'vscode-languageclient/node';
import type { LanguageClientOptions, ServerOptions } from 'vscode-languageclient/node';
import {
  DOCUMENT_LANGUAGES,
  STATE_NOTIFICATION,
  TERMBASE_NAME,
  TRUST_NOTIFICATION,
} from '../../server/src/lsp/protocol.js';
import type { ClientOptions, FolderStateParams, TrustParams } from '../../server/src/lsp/protocol.js';

const SCHEMES = ['file', 'vscode-remote', 'vscode-vfs'];

/**
 * Starts the server and connects it to the editor; requests that come before it is up wait for it.
 * @param storage a folder of the extension's own, outside all workspace folders
 */
export function startClient(
  server: ServerOptions,
  storage: vscode.Uri,
  onState: (state: FolderStateParams) => void,
): LanguageClient {
  const options: LanguageClientOptions = {
    documentSelector: [
      ...DOCUMENT_LANGUAGES.flatMap((language) => [...SCHEMES, 'untitled'].map((scheme) => ({ scheme, language }))),
      // Not the old text of a termbase that a view of differences shows.
      ...SCHEMES.map((scheme) => ({ scheme, pattern: `**/${TERMBASE_NAME}` })),
    ],
    // Asked for when the server is there: trust may have come by then.
    initializationOptions: (): ClientOptions => ({ savesTermbase: true, trust: trustNow(storage) }),
    markdown: { isTrusted: false, supportHtml: false },
  };
  const client = new LanguageClient('evenword', 'Evenword', server, options);
  client.onNotification(STATE_NOTIFICATION, onState);
  client.start().catch((error: unknown) => {
    void vscode.window.showErrorMessage(`Evenword's language server could not be started: ${String(error)}`);
  });
  return client;
}

/** Tells the server when the user comes to trust the workspace. */
export function tellTrust(client: LanguageClient, storage: vscode.Uri): vscode.Disposable {
  return vscode.workspace.onDidGrantWorkspaceTrust(() => {
    // A client that is still starting tells it at the start; one that failed has no server to tell.
    client.sendNotification(TRUST_NOTIFICATION, trustNow(storage)).catch(() => undefined);
  });
}

function trustNow(storage: vscode.Uri): TrustParams {
  return {
    trusted: vscode.workspace.isTrusted,
    ...(storage.scheme === 'file' && { cacheFolder: vscode.Uri.joinPath(storage, 'history').fsPath }),
  };
}
