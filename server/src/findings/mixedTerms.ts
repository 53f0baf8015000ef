// Rule: a name is used that an open question asks about, while another name leads.
import type { BlockFinding } from './finding.js';
import type { TermUse } from './termUse.js';

/** The hint for the use of an undecided term that does not lead; undefined for the leading one and for any other status. */
export function mixedTerms(use: TermUse): BlockFinding | undefined {
  const { checked } = use.term;
  const { preferred } = checked;
  if (checked.status !== 'undecided' || preferred === undefined || preferred === checked.text) return undefined;
  return {
    code: 'mixed-terms',
    span: { start: use.start, end: use.end },
    severity: 'hint',
    message: `“${checked.text}” and “${preferred}” may name one thing, and nobody has decided: answer the question once.`,
    term: checked.text,
    termId: checked.id,
    surface: use.surface,
    form: use.form,
    questionId: checked.conceptId,
    preferred,
    zones: use.zones,
  };
}
