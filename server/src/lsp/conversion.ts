// Between the engine's offsets and the protocol's ranges.
import { DiagnosticSeverity } from 'vscode-languageserver';
import type { Diagnostic, Range, TextEdit as ProtocolEdit } from 'vscode-languageserver';
import type { Span } from '../base/span.js';
import type { TermbaseProblem } from '../termbase/termbase.js';
import type { Finding } from '../findings/finding.js';
import type { ReadingProblem } from '../prose/prose.js';
import type { TextEdit } from '../text/edits.js';
import type { LineIndex } from '../text/lineIndex.js';

/** The name under which an editor lists what this server says. */
export const SOURCE = 'Evenword';

const SEVERITIES = {
  error: DiagnosticSeverity.Error,
  warning: DiagnosticSeverity.Warning,
  information: DiagnosticSeverity.Information,
  hint: DiagnosticSeverity.Hint,
} as const;

export function toRange(span: Span, lines: LineIndex): Range {
  return { start: lines.positionAt(span.start), end: lines.positionAt(span.end) };
}

export function toSpan(range: Range, lines: LineIndex): Span {
  return { start: lines.offsetAt(range.start), end: lines.offsetAt(range.end) };
}

export function toProtocolEdits(edits: readonly TextEdit[], lines: LineIndex): ProtocolEdit[] {
  return edits.map(({ span, newText }) => ({ range: toRange(span, lines), newText }));
}

export function findingToDiagnostic(finding: Finding, lines: LineIndex): Diagnostic {
  return {
    range: toRange(finding.span, lines),
    severity: SEVERITIES[finding.severity],
    source: SOURCE,
    code: finding.code,
    message: finding.message,
  };
}

/** Something on a page that could not be read: the writer's to know, not to be scolded for. */
export function readingProblemToDiagnostic({ span, message }: ReadingProblem, lines: LineIndex): Diagnostic {
  return { range: toRange(span, lines), severity: DiagnosticSeverity.Information, source: SOURCE, message };
}

export function problemToDiagnostic(problem: TermbaseProblem, lines: LineIndex): Diagnostic {
  return {
    range: toRange(problem.span, lines),
    severity: SEVERITIES[problem.severity],
    source: SOURCE,
    code: problem.code,
    message: problem.message,
  };
}
