// The language server: registration of capabilities and handlers over one connection.
import {
  CodeActionKind,
  MessageType,
  ShowMessageNotification,
  TextDocumentSyncKind,
  TextDocuments,
} from 'vscode-languageserver';
import type { Connection, InitializeParams, InitializeResult } from 'vscode-languageserver';
import { TextDocument } from 'vscode-languageserver-textdocument';
import { canonicalUri } from '../text/uri.js';
import { SOURCE } from './conversion.js';
import { provideCodeActions, resolveCodeAction } from './handlers/codeAction.js';
import { provideHover } from './handlers/hover.js';
import { provideReport } from './handlers/report.js';
import type { ServerHost } from './host.js';
import { REPORT_REQUEST, SURVEY_REQUEST, TRUST_NOTIFICATION } from './protocol.js';
import type { ClientOptions, ReportParams, SurveyParams, TrustParams } from './protocol.js';
import { Sessions } from './sessions.js';

/** Serves a connection until it is closed. */
export function serve(connection: Connection, host: ServerHost, version: string): void {
  const documents = new TextDocuments(TextDocument);
  const sessions = new Sessions(connection, host);
  let options: ClientOptions = {};

  connection.onInitialize((params: InitializeParams): InitializeResult => {
    options = (params.initializationOptions as ClientOptions | null | undefined) ?? {};
    sessions.setClient(params.capabilities);
    if (options.trust !== undefined) sessions.setTrust(options.trust);
    for (const { uri } of params.workspaceFolders ?? []) sessions.add(uri);
    return {
      serverInfo: { name: SOURCE, version },
      capabilities: {
        textDocumentSync: { openClose: true, change: TextDocumentSyncKind.Incremental },
        hoverProvider: true,
        codeActionProvider: { codeActionKinds: [CodeActionKind.QuickFix], resolveProvider: true },
        workspace: { workspaceFolders: { supported: true, changeNotifications: true } },
      },
    };
  });
  connection.onInitialized(() => {
    // A client that refuses a registration has its folders surveyed all the same.
    void guarded(() => sessions.register()).then(() => guarded(() => sessions.surveyAll()));
  });
  connection.onDidChangeConfiguration(() => void guarded(() => sessions.configureAll()));
  connection.onDidChangeWatchedFiles(({ changes }) => {
    void guarded(() => sessions.filesChanged(changes.map(({ uri }) => canonicalUri(uri))));
  });
  documents.onDidChangeContent(({ document }) => {
    for (const session of sessions.concernedBy(document.uri)) void guarded(() => session.edited(document));
  });
  documents.onDidClose(({ document }) => {
    for (const session of sessions.concernedBy(document.uri)) void guarded(() => session.closed(document));
  });

  connection.onHover((params) => guarded(() => provideHover(sessions, params)));
  connection.onCodeAction((params) => guarded(() => provideCodeActions(sessions, params)));
  connection.onCodeActionResolve(async (action) => {
    const refuse = (message: string): void =>
      void connection.sendNotification(ShowMessageNotification.type, { type: MessageType.Warning, message });
    return (await guarded(() => resolveCodeAction(sessions, action, options, refuse))) ?? action;
  });
  connection.onRequest(REPORT_REQUEST, (params: ReportParams | undefined) => provideReport(sessions, params ?? {}));
  connection.onRequest(SURVEY_REQUEST, ({ uri }: SurveyParams) => guarded(() => sessions.of(uri).survey()));
  connection.onNotification(TRUST_NOTIFICATION, (trust: TrustParams) => sessions.setTrust(trust));
  connection.onShutdown(() => sessions.end());
  documents.listen(connection);
  connection.listen();

  /** One failing feature must not end the server: the failure is logged, the request is answered with nothing. */
  async function guarded<T>(handle: () => T | Promise<T>): Promise<T | null> {
    try {
      return await handle();
    } catch (error) {
      connection.console.error(error instanceof Error ? (error.stack ?? error.message) : String(error));
      return null;
    }
  }
}
