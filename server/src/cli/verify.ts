// evenword verify: every page held to the decisions; for reviews and continuous integration.
import type { Finding } from '../findings/finding.js';
import { LineIndex } from '../text/lineIndex.js';
import type { Position } from '../text/lineIndex.js';
import { toSarif } from '../report/sarif.js';
import { FILE_OPTIONS, sayProblems, surveyOrStop } from './common.js';
import { Exit } from './host.js';
import type { Subcommand } from './subcommand.js';

/** A finding with its document and lines. */
interface PlacedFinding {
  readonly uri: string;
  readonly finding: Finding;
  readonly start: Position;
  readonly end: Position;
  /** The text of the finding's block. */
  readonly blockText: string;
}

export const verify: Subcommand = {
  summary: 'checks every page against the termbase; exit code 1 where a page breaks a decision',
  operands: 'DIR…',
  options: {
    format: {
      value: 'FORMAT',
      choices: ['text', 'json', 'sarif'],
      help: 'text for people (default), json for programs, sarif (2.1.0) for code review',
    },
    ...FILE_OPTIONS,
  },
  async run(given, host) {
    const { options } = given;
    const survey = await surveyOrStop(host, given, false);
    if (survey === undefined) return Exit.cannotRun;
    const { snapshot } = survey;
    const found: PlacedFinding[] = [];
    for (const [uri, { source }] of [...snapshot.documents].sort(([a], [b]) => (a < b ? -1 : 1))) {
      const lines = new LineIndex(source.text);
      const blocks = snapshot.readingOf(uri)?.prose.blocks ?? [];
      for (const finding of snapshot.findingsIn(uri)) {
        // Undecided mixes are questions: nobody has broken a rule that nobody made.
        if (finding.severity === 'hint') continue;
        found.push({
          uri,
          finding,
          start: lines.positionAt(finding.span.start),
          end: lines.positionAt(finding.span.end),
          blockText: blocks[finding.block]?.content.text ?? '',
        });
      }
    }
    sayProblems(host, snapshot, snapshot.documents.keys());
    const pages = new Set(found.map(({ uri }) => uri)).size;
    if (options.get('format') === 'sarif') {
      host.write(toSarif(found, survey.rootUri, host.version));
    } else if (options.get('format') === 'json') {
      host.write(
        `${JSON.stringify({ documents: snapshot.documents.size, findings: found.map(toJson) }, undefined, 2)}\n`,
      );
    } else {
      for (const { uri, finding, start } of found) {
        host.write(
          `${host.pathOf(uri)}:${start.line + 1}:${start.character + 1}: ${finding.message} (${finding.code})\n`,
        );
      }
      host.note(
        snapshot.termbases.length === 0
          ? 'No termbase.yaml was found: nothing is decided yet, so nothing can be broken.\n'
          : `${found.length} finding${found.length === 1 ? '' : 's'} on ${pages} of ${snapshot.documents.size} pages.\n`,
      );
    }
    return found.length === 0 ? Exit.clean : Exit.findings;
  },
};

function toJson({ uri, finding, start, end }: PlacedFinding): object {
  return {
    uri,
    line: start.line + 1,
    column: start.character + 1,
    endLine: end.line + 1,
    endColumn: end.character + 1,
    code: finding.code,
    severity: finding.severity,
    message: finding.message,
  };
}
