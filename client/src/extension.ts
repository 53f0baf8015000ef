// Entry of the extension in the desktop's and the remote's extension host.
import * as vscode from 'vscode';
import { TransportKind } from 'vscode-languageclient/node';
import { startClient } from './client.js';
import { registerCommands } from './commands.js';
import { StatusItem } from './statusItem.js';

/** Starts the language server, without waiting for it, and registers commands; ends both with the extension. */
export function activate(context: vscode.ExtensionContext): void {
  const module = vscode.Uri.joinPath(context.extensionUri, 'dist', 'server.js').fsPath;
  const run = { module, transport: TransportKind.ipc };
  const status = new StatusItem();
  const client = startClient(
    { run, debug: { ...run, options: { execArgv: ['--nolazy', '--inspect=6009'] } } },
    (state) => status.show(state),
  );
  context.subscriptions.push(status, { dispose: () => void client.dispose() }, ...registerCommands(client));
}
