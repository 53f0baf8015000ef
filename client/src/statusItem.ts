// The status bar's item: how many questions are open, or that a survey is under way.
import * as vscode from 'vscode';
import type { FolderStateParams } from '../../server/src/lsp/protocol.js';

/** One item for all workspace folders. */
export class StatusItem implements vscode.Disposable {
  private readonly item = vscode.window.createStatusBarItem('evenword.state', vscode.StatusBarAlignment.Right);
  private readonly states = new Map<string, FolderStateParams>();

  constructor() {
    this.item.name = 'Evenword';
    this.item.command = 'evenword.writeReport';
  }

  /** Takes in the state of one folder. */
  show(state: FolderStateParams): void {
    if (state.folder === '') return;
    if (state.state === 'ended') this.states.delete(state.folder);
    else this.states.set(state.folder, state);
    const all = [...this.states.values()];
    if (all.length === 0) {
      this.item.hide();
      return;
    }
    const failed = all.find((each) => each.state === 'failed');
    const open = all.reduce((sum, { openQuestions }) => sum + openQuestions, 0);
    const pages = all.reduce((sum, { documents }) => sum + documents, 0);
    if (all.some((each) => each.state === 'surveying')) this.item.text = '$(sync~spin) Evenword';
    else if (failed) this.item.text = '$(warning) Evenword';
    else this.item.text = `$(comment-unresolved) ${open} ${open === 1 ? 'question' : 'questions'}`;
    this.item.tooltip =
      failed?.message ??
      `Evenword: ${open} open ${open === 1 ? 'question' : 'questions'} about ${pages} pages. Click to write the report.`;
    this.item.show();
  }

  dispose(): void {
    this.item.dispose();
  }
}
