// The extension's commands: the report, the termbase, a new survey, and saving a termbase after an answer.
import * as vscode from 'vscode';
import type { LanguageClient } from 'vscode-languageclient/node';
import { REPORT_REQUEST, SAVE_TERMBASE_COMMAND, SURVEY_REQUEST, TERMBASE_NAME } from '../../server/src/lsp/protocol.js';
import type { ReportParams, ReportResult, SurveyParams } from '../../server/src/lsp/protocol.js';

/** Registers all commands. */
export function registerCommands(client: LanguageClient): vscode.Disposable[] {
  const commands: Record<string, (...args: never[]) => Promise<void>> = {
    'evenword.writeReport': () => writeReport(client),
    'evenword.openTermbase': openTermbase,
    'evenword.surveyAgain': () => surveyAgain(client),
    [SAVE_TERMBASE_COMMAND]: saveTermbase,
  };
  return Object.entries(commands).map(([name, run]) => vscode.commands.registerCommand(name, run));
}

/** Asks for a folder, writes the report's files into it and offers to open the HTML page. */
async function writeReport(client: LanguageClient): Promise<void> {
  const folder = await chosenFolder();
  if (folder === undefined) return;
  const [target] =
    (await vscode.window.showOpenDialog({
      canSelectFolders: true,
      canSelectFiles: false,
      defaultUri: folder.uri,
      openLabel: 'Write Report Here',
      title: 'Folder for the Terminology Report',
    })) ?? [];
  if (target === undefined) return;
  try {
    const report = await client.sendRequest<ReportResult>(REPORT_REQUEST, {
      uri: `${folder.uri.toString()}/`,
    } satisfies ReportParams);
    for (const [name, text] of Object.entries(report.files)) {
      await vscode.workspace.fs.writeFile(vscode.Uri.joinPath(target, name), new TextEncoder().encode(text));
    }
    const open = 'Open Report';
    const questions = `${report.openQuestions} open ${report.openQuestions === 1 ? 'question' : 'questions'}`;
    const chosen = await vscode.window.showInformationMessage(`The report is written: ${questions}.`, open);
    if (chosen === open) await vscode.env.openExternal(vscode.Uri.joinPath(target, 'report.html'));
  } catch (error) {
    void vscode.window.showErrorMessage(`The report could not be written: ${(error as Error).message}`);
  }
}

/** Opens the folder's termbase; where there is none, says how one comes about. */
async function openTermbase(): Promise<void> {
  const folder = await chosenFolder();
  if (folder === undefined) return;
  const uri = vscode.Uri.joinPath(folder.uri, TERMBASE_NAME);
  try {
    await vscode.window.showTextDocument(uri);
  } catch {
    void vscode.window.showInformationMessage(
      `${folder.name} has no ${TERMBASE_NAME} yet. Answering the first question makes it.`,
    );
  }
}

async function surveyAgain(client: LanguageClient): Promise<void> {
  const folder = await chosenFolder();
  if (folder !== undefined)
    await client.sendRequest(SURVEY_REQUEST, { uri: `${folder.uri.toString()}/` } satisfies SurveyParams);
}

/** Saves a termbase that an answer has just edited, so that the answer is kept and reviews see it. */
async function saveTermbase(uri: string): Promise<void> {
  const document = await vscode.workspace.openTextDocument(vscode.Uri.parse(uri));
  await document.save();
}

async function chosenFolder(): Promise<vscode.WorkspaceFolder | undefined> {
  const folders = vscode.workspace.workspaceFolders ?? [];
  if (folders.length === 0) {
    void vscode.window.showInformationMessage(
      'Open a folder of documentation first: Evenword compares the pages of a whole folder.',
    );
    return undefined;
  }
  const active = vscode.window.activeTextEditor;
  const own = active && vscode.workspace.getWorkspaceFolder(active.document.uri);
  if (own !== undefined) return own;
  return folders.length === 1 ? folders[0] : vscode.window.showWorkspaceFolderPick();
}
