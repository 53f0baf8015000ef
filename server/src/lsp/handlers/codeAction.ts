// textDocument/codeAction and its resolve: the preferred term here, and answers to questions.
import { CodeActionKind, CodeActionTriggerKind } from 'vscode-languageserver';
import type { CodeAction, CodeActionParams, TextDocumentEdit, CreateFile } from 'vscode-languageserver';
import { answerQuestion } from '../../ide/answers.js';
import type { Choice } from '../../ide/answers.js';
import { quickFixesAt } from '../../ide/codeActions.js';
import type { QuickFix } from '../../ide/codeActions.js';
import type { Span } from '../../base/span.js';
import { LineIndex } from '../../text/lineIndex.js';
import { canonicalUri } from '../../text/uri.js';
import { findingToDiagnostic, toProtocolEdits, toSpan } from '../conversion.js';
import type { FolderSession } from '../folderSession.js';
import { SAVE_TERMBASE_COMMAND } from '../protocol.js';
import type { ClientOptions } from '../protocol.js';
import type { Sessions } from '../sessions.js';

/** What an answer's code action carries until it is resolved: enough to compute the edit anew. */
interface AnswerData {
  readonly uri: string;
  readonly question: string;
  readonly choice: Choice;
}

export function provideCodeActions(sessions: Sessions, params: CodeActionParams): CodeAction[] | null {
  const { only, triggerKind } = params.context;
  if (only !== undefined && !only.some((kind) => kind === '' || kind === CodeActionKind.QuickFix)) return null;
  const session = sessions.of(params.textDocument.uri);
  const uri = canonicalUri(params.textDocument.uri);
  const document = session.snapshot.documents.get(uri);
  if (document === undefined) return null;
  const lines = session.linesOf(document.source);
  const span: Span = toSpan(params.range, lines);
  return quickFixesAt(session.snapshot, uri, span)
    .filter((fix) => fix.finding !== undefined || triggerKind !== CodeActionTriggerKind.Automatic)
    .map((fix) => toCodeAction(fix, session, uri, lines));
}

/**
 * Fills in the edit of an answer, from the decisions as they are now. Where the question was answered meanwhile, or the
 * answer clashes with the termbase, `refuse` is told why and the action comes back without an edit.
 */
export function resolveCodeAction(
  sessions: Sessions,
  action: CodeAction,
  options: ClientOptions,
  refuse: (message: string) => void,
): CodeAction {
  const data = action.data as AnswerData | undefined;
  if (data === undefined) return action;
  const session = sessions.of(data.uri);
  const { snapshot } = session;
  const answer = answerQuestion(snapshot, data.uri, session.newTermbaseUri, data.question, data.choice);
  if (answer.kind === 'refused') {
    refuse(answer.message);
    return action;
  }
  const lines = new LineIndex(snapshot.termbases.find(({ uri }) => uri === answer.uri)?.text ?? '');
  const version = session.versionOf(answer.uri);
  const edit: TextDocumentEdit = {
    textDocument: { uri: answer.uri, version: version ?? null },
    edits: toProtocolEdits(answer.edits, lines),
  };
  const create: CreateFile = { kind: 'create', uri: answer.uri, options: { ignoreIfExists: true } };
  return {
    ...action,
    edit: { documentChanges: answer.creates ? [create, edit] : [edit] },
    ...(options.savesTermbase === true && {
      command: { title: 'Save the termbase', command: SAVE_TERMBASE_COMMAND, arguments: [answer.uri] },
    }),
  };
}

function toCodeAction(fix: QuickFix, session: FolderSession, uri: string, lines: LineIndex): CodeAction {
  const common = {
    title: fix.title,
    kind: CodeActionKind.QuickFix,
    ...(fix.finding && { diagnostics: [findingToDiagnostic(fix.finding, lines)] }),
  };
  if (fix.kind === 'answer') {
    return { ...common, data: { uri, question: fix.question, choice: fix.choice } satisfies AnswerData };
  }
  const textDocument = { uri, version: session.versionOf(uri) ?? null };
  return {
    ...common,
    isPreferred: fix.certain,
    edit: { documentChanges: [{ textDocument, edits: toProtocolEdits(fix.edits, lines) }] },
  };
}
