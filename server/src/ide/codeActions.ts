// Quick fixes at a place: the preferred term here, and the answers to an open question.
import type { Span } from '../base/span.js';
import { overlaps, touches } from '../base/span.js';
import { preferredEdits } from '../engine/fixing.js';
import { termAt } from '../engine/termCard.js';
import type { Snapshot } from '../engine/snapshot.js';
import type { Finding } from '../findings/finding.js';
import type { TextEdit } from '../text/edits.js';
import { offeredAnswers } from './answers.js';
import type { Choice } from './answers.js';

/** A quick fix that replaces text, or one that answers a question (its edits are made when it is chosen). */
export type QuickFix =
  | {
      readonly kind: 'replace';
      readonly title: string;
      readonly finding: Finding;
      readonly edits: readonly TextEdit[];
      readonly certain: boolean;
    }
  | {
      readonly kind: 'answer';
      readonly title: string;
      readonly finding: Finding | undefined;
      readonly question: string;
      readonly choice: Choice;
    };

/** The quick fixes for a span of a document, most helpful first. */
export function quickFixesAt(snapshot: Snapshot, uri: string, span: Span): QuickFix[] {
  const findings = snapshot
    .findingsIn(uri)
    .filter((finding) => overlaps(finding.span, span) || touches(finding.span, span.start));
  const fixes: QuickFix[] = [];
  for (const finding of findings) {
    if (finding.code === 'mixed-terms' || finding.preferred === undefined) continue;
    const fix = preferredEdits(snapshot, uri, finding);
    if (fix.kind === 'edits') {
      fixes.push({
        kind: 'replace',
        title: `Use “${finding.preferred}” here`,
        finding,
        edits: fix.edits,
        certain: fix.certain,
      });
    }
  }
  const { open } = snapshot.agendaAt(uri);
  const asked = new Map<string, Finding | undefined>();
  for (const finding of findings) if (finding.questionId !== undefined) asked.set(finding.questionId, finding);
  const here = termAt(snapshot, uri, span.start)?.checked;
  if (here?.status === 'undecided' && !asked.has(here.conceptId)) asked.set(here.conceptId, undefined);
  for (const [id, finding] of asked) {
    const question = open.find((each) => each.id === id);
    if (question === undefined) continue;
    for (const { title, choice } of offeredAnswers(snapshot, uri, question)) {
      fixes.push({ kind: 'answer', title, finding, question: id, choice });
    }
  }
  return fixes;
}
