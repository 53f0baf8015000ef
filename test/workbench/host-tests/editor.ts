// What the suites ask VS Code for: documents of the workspace, and what Evenword says about them.
import assert from 'node:assert/strict';
import { readFile } from 'node:fs/promises';
import * as vscode from 'vscode';
import { until } from '../until.js';

/** The address of a file of the workspace. */
export function uriOf(name: string): vscode.Uri {
  const folder = vscode.workspace.workspaceFolders?.[0];
  assert.ok(folder, 'the workspace has a folder');
  return vscode.Uri.joinPath(folder.uri, name);
}

/** Shows a file of the workspace in the editor. */
export async function show(name: string): Promise<vscode.TextDocument> {
  const document = await vscode.workspace.openTextDocument(uriOf(name));
  await vscode.window.showTextDocument(document);
  return document;
}

/** Evenword's diagnostics of a document, of one code if it is given. */
export function findings(document: vscode.TextDocument, code?: string): vscode.Diagnostic[] {
  const own = vscode.languages.getDiagnostics(document.uri).filter((one) => one.source === 'Evenword');
  return code === undefined ? own : own.filter((one) => codeOf(one) === code);
}

function codeOf(diagnostic: vscode.Diagnostic): string {
  const { code } = diagnostic;
  return String(typeof code === 'object' ? code.value : code);
}

/** Waits until a document has `count` diagnostics of a code. */
export function findingsOf(document: vscode.TextDocument, code: string, count: number): Promise<vscode.Diagnostic[]> {
  return until(`${count} × ${code} in ${document.fileName}`, () => {
    const found = findings(document, code);
    return found.length === count && found;
  });
}

/** The range of the `nth` (from 0) `text` in a document. */
export function rangeOf(document: vscode.TextDocument, text: string, nth = 0): vscode.Range {
  let start = -1;
  for (let i = 0; i <= nth; i++) start = document.getText().indexOf(text, start + 1);
  assert.ok(start >= 0, `“${text}” stands in the document`);
  return new vscode.Range(document.positionAt(start), document.positionAt(start + text.length));
}

/** The text of the hover at a place, once there is one. */
export function hoverAt(document: vscode.TextDocument, position: vscode.Position): Promise<string> {
  return until('a hover', async () => {
    const hovers = await vscode.commands.executeCommand<vscode.Hover[]>(
      'vscode.executeHoverProvider',
      document.uri,
      position,
    );
    const parts = hovers.flatMap((hover) => hover.contents);
    return (
      parts.map((part) => (typeof part === 'string' ? part : (part as vscode.MarkdownString).value)).join('\n') ||
      undefined
    );
  });
}

/** The quick fixes at a place, once one of them has a title that begins with `title`. */
export function quickFixesAt(
  document: vscode.TextDocument,
  range: vscode.Range,
  title: string,
): Promise<vscode.CodeAction[]> {
  return until(`the quick fix “${title}”`, async () => {
    const all = await vscode.commands.executeCommand<vscode.CodeAction[]>(
      'vscode.executeCodeActionProvider',
      document.uri,
      range,
      vscode.CodeActionKind.QuickFix.value,
      100, // Resolve them, so that their edits are there.
    );
    return all.some((action) => action.title.startsWith(title)) && all;
  });
}

/** Takes the code action whose title begins with `title`: its edit first, then its command, as the editor does. */
export async function take(actions: readonly vscode.CodeAction[], title: string): Promise<void> {
  const action = actions.find((one) => one.title.startsWith(title));
  assert.ok(action, `there is “${title}”`);
  assert.ok(action.edit ?? action.command, `“${title}” does something`);
  if (action.edit) assert.ok(await vscode.workspace.applyEdit(action.edit), 'the edit is taken');
  if (action.command) {
    await vscode.commands.executeCommand(action.command.command, ...((action.command.arguments ?? []) as unknown[]));
  }
}

/** The text of a file of the workspace on disk. */
export function onDisk(name: string): Promise<string> {
  return readFile(uriOf(name).fsPath, 'utf8');
}
