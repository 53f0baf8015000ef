// What a command or an environment means to the reader of LaTeX: the shape of the two tables.
import type { BlockKind, GlossaryPart } from '../prose.js';
import type { ZoneSet } from '../zones.js';

/** What becomes of a command in the text around it. */
export type Flow =
  /** It leaves no trace; of its arguments those marked as text run on in the text around. */
  | 'inline'
  /** No prose: one opaque unit. */
  | 'opaque'
  /** Its text arguments are blocks, before which the text around ends. */
  | 'block'
  /** Its text arguments are blocks that stand inside a text without ending it, such as a footnote. */
  | 'aside'
  /** Its text arguments become part of no block; the text around ends. */
  | 'break'
  /** A declaration: what follows in its group lies in its zones. */
  | 'declaration'
  /** White space. */
  | 'space';

/**
 * A command's arguments, one letter each, in the terms of xparse: `*` a star, `o` an optional argument, `d` one in angle
 * brackets, `p` one in parentheses, `m` a mandatory one, `v` a verbatim one; and of those that are read: `t` text,
 * `k` options of which captions are text, `g` options of a glossary entry.
 */
export type Signature = string;

/** The role of a command, or of the arguments of an environment. */
export interface Command {
  readonly flow: Flow;
  readonly signature: Signature;
  /** Zones of its text. */
  readonly zones: ZoneSet;
  /** What its text arguments are where they are blocks, in their order; the last holds for those that follow. */
  readonly kinds: readonly BlockKind[];
  /** A heading's level from 1, else 0. */
  readonly level: number;
  readonly glossary?: readonly GlossaryPart[];
  /** True where the first mandatory argument is a link's target. */
  readonly links?: true;
  /** The language that its text is in, or whose first mandatory argument names it (`named`). */
  readonly language?: string;
}

/** A command without text. */
export function command(flow: Flow, signature: Signature = '', zones: ZoneSet = 0): Command {
  return { flow, signature, zones, kinds: ['paragraph'], level: 0 };
}

/** A command whose text arguments are blocks of these kinds. */
export function block(signature: Signature, kinds: readonly BlockKind[], zones: ZoneSet = 0, level = 0): Command {
  return { flow: 'block', signature, zones, kinds, level };
}

/** What the content of an environment is. */
export type Content =
  /** Blocks. */
  | 'blocks'
  /** Items, and before the first of them blocks. */
  | 'items'
  /** Items with terms for labels. */
  | 'terms'
  | 'table'
  /** Mathematics: one opaque unit in the text around. */
  | 'math'
  /** No prose; ends at the first `\end` of its name, whatever stands before it. */
  | 'verbatim'
  /** What runs on in the text around. */
  | 'inline';

/** The role of an environment. */
export interface Environment {
  readonly content: Content;
  /** Zones of the blocks in it. */
  readonly zones: ZoneSet;
  /** Its arguments, those of which that are text are blocks; undefined where only they themselves can tell. */
  readonly opening: Command | undefined;
  readonly isGlossary?: true;
}

/** An environment whose text arguments are captions. */
export function environment(content: Content, signature: Signature = '', zones: ZoneSet = 0): Environment {
  return { content, zones, opening: block(signature, ['caption']) };
}

/** One line of a table: a role, and the names that have it. */
export type Line<Role> = readonly [role: Role, names: string];

/** The table as a map. */
export function byName<Role>(lines: readonly Line<Role>[]): ReadonlyMap<string, Role> {
  return new Map(lines.flatMap(([role, names]) => names.split(' ').map((name) => [name, role] as const)));
}
