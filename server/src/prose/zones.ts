// The zones of a document, named once: a token carries a set of them, and findings and rewriting decide by that set.

/** One bit a zone. A set of zones is the bitwise or of its members; the empty set is plain prose. */
export const Zone = {
  prose: 0,
  heading: 1 << 0,
  code: 1 << 1,
  uiLabel: 1 << 2,
  quotation: 1 << 3,
  linkText: 1 << 4,
  linkTarget: 1 << 5,
  definedTerm: 1 << 6,
  tableCell: 1 << 7,
  alternativeText: 1 << 8,
  safetyMessage: 1 << 9,
  frontMatter: 1 << 10,
} as const;

/** A set of {@link Zone} bits. */
export type ZoneSet = number;

/** Zones in which nothing is counted, asked or fixed. */
export const CLOSED_ZONES: ZoneSet = Zone.code | Zone.uiLabel | Zone.quotation | Zone.linkTarget;

/** True where words of these zones are counted, asked about and fixed. */
export function isOpen(zones: ZoneSet, closed: ZoneSet = CLOSED_ZONES): boolean {
  return (zones & closed) === 0;
}

/** The zones that a user may open and close. Code and targets of links are never prose. */
export const SWITCHED_ZONES = [
  'heading',
  'uiLabel',
  'quotation',
  'linkText',
  'definedTerm',
  'tableCell',
  'alternativeText',
  'safetyMessage',
  'frontMatter',
] as const satisfies readonly (keyof typeof Zone)[];

/** Which zones a user has opened (true) or closed (false), by name. */
export type ZoneSwitches = Readonly<Partial<Record<(typeof SWITCHED_ZONES)[number], boolean>>>;

/** The closed zones after some were switched. */
export function closedZones(switches: ZoneSwitches): ZoneSet {
  let closed = CLOSED_ZONES;
  for (const name of SWITCHED_ZONES) {
    if (switches[name] === true) closed &= ~Zone[name];
    else if (switches[name] === false) closed |= Zone[name];
  }
  return closed;
}
