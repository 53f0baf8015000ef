// The top of the report: the state in one sentence, and five figures.
import { meanDrift } from './drift.js';
import type { Figure, ReportData } from './reportData.js';
import { counted, grouped, percent } from './words.js';

type Parts = Pick<ReportData, 'documents' | 'words' | 'questions' | 'concepts' | 'apart' | 'later'>;

/** The state in one sentence, for someone who reads no further. */
export function stateOf(parts: Parts): string {
  const { documents, questions, concepts } = parts;
  const open = questions.length;
  if (documents === 0) return 'No pages were found here, so there is nothing to report yet.';
  const { uses, kept } = decidedUses(parts);
  const asked = `${counted(open, 'question')} ${open === 1 ? 'is' : 'are'} open`;
  const waiting = settledByAnswers(parts);
  if (concepts.length === 0) {
    if (open === 0) return 'No mixed terms were found, and nothing is decided yet.';
    return `Nothing is decided yet: ${asked}, and ${counted(waiting, 'use')} of a second name ${waiting === 1 ? 'waits' : 'wait'} for an answer.`;
  }
  const one = concepts.length === 1;
  const decided =
    uses === 0
      ? `${counted(concepts.length, 'concept')} ${one ? 'is' : 'are'} decided, and no page uses any of ${one ? 'its' : 'their'} names`
      : kept === uses
        ? `${counted(concepts.length, 'concept')} ${one ? 'is' : 'are'} decided, and every use keeps to the ${one ? 'decision' : 'decisions'}`
        : `${counted(concepts.length, 'concept')} ${one ? 'is' : 'are'} decided, and ${percent(kept / uses)} of ${one ? 'its' : 'their'} uses keep to the ${one ? 'decision' : 'decisions'}`;
  return open === 0 ? `${decided}; no question is open.` : `${decided}; ${asked}.`;
}

/** Five figures: pages, open questions, decided concepts, uses that keep to the decisions, drift. */
export function figuresOf(parts: Parts): Figure[] {
  const { documents, words, questions, concepts, apart, later } = parts;
  const { uses, kept } = decidedUses(parts);
  const waiting = settledByAnswers(parts);
  const drift = meanDrift(
    [...concepts, ...questions.filter((question) => question.drift)].map(({ terms }) => terms.map((term) => term.uses)),
  );
  const names = concepts.reduce((sum, { terms }) => sum + terms.length, 0);
  return [
    figure('pages', 'Pages', documents, counted(words, 'word')),
    figure(
      'open-questions',
      'Open questions',
      questions.length,
      questions.length === 0 ? 'nothing waits for an answer' : `${counted(waiting, 'use')} of a second name`,
    ),
    figure('decided-concepts', 'Decided concepts', concepts.length, decidedNote(names, apart.length, later.length)),
    uses === 0
      ? nothingToMeasure(
          'kept',
          'Kept to the decisions',
          concepts.length === 0 ? 'nothing is decided yet' : 'no decided name is used',
        )
      : {
          ...{ id: 'kept', label: 'Kept to the decisions', text: percent(kept / uses), value: kept / uses },
          note:
            kept === uses
              ? `all of ${counted(uses, 'use')}`
              : `${grouped(uses - kept)} of ${counted(uses, 'use')} to change`,
        },
    drift === undefined
      ? nothingToMeasure('drift', 'Drift', 'no concept is known yet')
      : {
          ...{ id: 'drift', label: 'Drift', text: drift.names.toFixed(2), value: drift.names },
          note: 'names in effect for one concept; 1.00 is none',
        },
  ];
}

function figure(id: Figure['id'], label: string, value: number, note: string): Figure {
  return { id, label, text: grouped(value), value, note };
}

function nothingToMeasure(id: Figure['id'], label: string, note: string): Figure {
  return { id, label, text: '–', note };
}

function decidedNote(names: number, apart: number, later: number): string {
  const notes = [
    ...(names > 0 ? [counted(names, 'term')] : []),
    ...(apart > 0 ? [`${grouped(apart)} kept apart`] : []),
    ...(later > 0 ? [`${grouped(later)} put off`] : []),
  ];
  return notes.length === 0 ? 'the first answer begins the termbase' : notes.join(', ');
}

function decidedUses({ concepts }: Parts): { uses: number; kept: number } {
  let uses = 0;
  let toChange = 0;
  for (const concept of concepts) {
    for (const term of concept.terms) uses += term.uses;
    toChange += concept.toChange;
  }
  return { uses, kept: uses - toChange };
}

function settledByAnswers({ questions }: Parts): number {
  return questions.reduce((sum, { settles }) => sum + settles, 0);
}
