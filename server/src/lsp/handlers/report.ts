// evenword/report: the terminology report of a workspace folder.
import { ResponseError, ErrorCodes } from 'vscode-languageserver';
import { makeReport } from '../../report/report.js';
import type { ReportParams, ReportResult } from '../protocol.js';
import type { Sessions } from '../sessions.js';

export function provideReport(sessions: Sessions, { uri }: ReportParams): ReportResult {
  const session = uri === undefined ? sessions.first : sessions.of(uri);
  if (session === undefined || session.uri === '') {
    throw new ResponseError(
      ErrorCodes.InvalidRequest,
      'Open a folder of documentation first: a report is about a whole folder.',
    );
  }
  const { snapshot } = session;
  const files = makeReport(snapshot, session.rootUri, { generatedAt: new Date().toISOString().slice(0, 10) });
  return { files: Object.fromEntries(files), openQuestions: snapshot.agendaAt(session.rootUri).open.length };
}
