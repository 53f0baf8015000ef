// Rule: a verb that a termbase admits stands with an object with which this documentation nearly always uses another.
import type { BlockFinding } from './finding.js';
import type { TermUse } from './termUse.js';

/** The hint for a verb with an object that it hardly ever has; undefined for a term of any other status. */
export function oddCompanion(use: TermUse): BlockFinding | undefined {
  const { checked } = use.term;
  const { preferred, companionUses, withObjects } = checked;
  if (checked.status !== 'odd' || preferred === undefined || companionUses === undefined) return undefined;
  const object = withObjects?.[0] ?? '';
  const { uses, usualUses } = companionUses;
  return {
    code: 'odd-companion',
    span: { start: use.start, end: use.end },
    severity: 'hint',
    message: `“${checked.text}” seldom goes with “${object}” here: this documentation says “${preferred}” ${usualUses} times and “${checked.text}” ${uses === 1 ? 'once' : `${uses} times`}. Both are allowed; use the usual one unless you mean to differ.`,
    term: checked.text,
    termId: checked.id,
    surface: use.surface,
    form: use.form,
    conceptId: checked.conceptId,
    preferred,
    zones: use.zones,
  };
}
