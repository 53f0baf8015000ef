// Rule: a deprecated term is used where its concept has a preferred one.
import type { BlockFinding } from './finding.js';
import type { TermUse } from './termUse.js';

/** The finding for the use of a deprecated term; undefined for a term of any other status. */
export function deprecatedTerm(use: TermUse): BlockFinding | undefined {
  const { checked } = use.term;
  if (checked.status !== 'deprecated') return undefined;
  const { preferred } = checked;
  const advice = preferred === undefined ? 'choose another term' : `this documentation says “${preferred}”`;
  return {
    code: 'deprecated-term',
    span: { start: use.start, end: use.end },
    severity: 'warning',
    message: `“${checked.text}” is deprecated: ${advice}${withObjects(checked.withObjects)}.`,
    term: checked.text,
    termId: checked.id,
    surface: use.surface,
    form: use.form,
    conceptId: checked.conceptId,
    ...(preferred === undefined ? {} : { preferred }),
    zones: use.zones,
  };
}

function withObjects(objects: readonly string[] | undefined): string {
  return objects === undefined || objects.length === 0
    ? ''
    : ` with ${objects.map((object) => `“${object}”`).join(', ')}`;
}
