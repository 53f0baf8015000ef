// Entry of the extension in the desktop's and the remote's extension host.
import * as vscode from 'vscode';
import { TransportKind } from 'vscode-languageclient/node';
import { startClient, tellTrust } from './client.js';
import { registerCommands } from './commands.js';
import { StatusItem } from './statusItem.js';

/** Starts the language server, without waiting for it, and registers commands; ends both with the extension. */
export function activate(context: vscode.ExtensionContext): void {
  const module = vscode.Uri.joinPath(context.extensionUri, 'dist', 'server.js').fsPath;
  const run = { module, transport: TransportKind.ipc };
  const status = new StatusItem();
  const client = startClient(
    { run, debug: { ...run, options: { execArgv: ['--nolazy', '--inspect=6009'] } } },
    context.globalStorageUri,
    (state) => status.show(state),
  );
  // A client that is still starting, or failed to, cannot be stopped; there is nothing to do about it then.
  const ending = { dispose: () => void client.dispose().catch(() => undefined) };
  context.subscriptions.push(status, ending, tellTrust(client, context.globalStorageUri), ...registerCommands(client));
}
