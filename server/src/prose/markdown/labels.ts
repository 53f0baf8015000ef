// What a paragraph says of itself at its start or its end: a label such as `**Warning:**`, an attribute list `{: .warning }`.
import { Zone, type ZoneSet } from '../zones.js';

/** Signal words as ANSI Z535.6 has them: in bold with a colon, or in capitals with a colon. */
const LABEL =
  /(?:\*\*|__)(?:danger|warning|caution|notice)(?:\s*[:!](?:\*\*|__)|(?:\*\*|__)\s*[:!])|(?:DANGER|WARNING|CAUTION|NOTICE)[:!]\s/iy;
const CAPITALS = /^(?:DANGER|WARNING|CAUTION|NOTICE)\b/;
const BOLD = /^[*_]/;
/** An attribute list on the last line belongs to the paragraph (kramdown, "Block IALs"). */
const CLASSES = /(?:^|\n)[ \t>]*\{:[^{}\n]*?\.(?:danger|warning|caution|notice)(?=[\s.#}])[^{}\n]*\}[ \t]*$/;
const OPENINGS = '*_DWCN';
const LONGEST_ATTRIBUTES = 200;

/** The zones that the paragraph `[from, to)` puts itself into. */
export function labelZones(text: string, from: number, to: number): ZoneSet {
  if (text.charCodeAt(to - 1) === 125 && CLASSES.test(text.slice(Math.max(from, to - LONGEST_ATTRIBUTES), to)))
    return Zone.safetyMessage;
  if (!OPENINGS.includes(text.charAt(from))) return 0;
  LABEL.lastIndex = from;
  if (!LABEL.test(text)) return 0;
  const start = text.slice(from, from + 8);
  return BOLD.test(start) || CAPITALS.test(start) ? Zone.safetyMessage : 0;
}
