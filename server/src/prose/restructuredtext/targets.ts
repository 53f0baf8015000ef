// The addresses that named targets stand for: `.. _name: address`.

const TARGET = /^[ \t]*\.\. +_(`[^`\n]+`|(?:[^:`\\\n]|:(?!\s)|\\.)+):[ \t]+(\S.*)$/gm;

/** True where a text may hold targets. */
export function hasTargets(text: string): boolean {
  return text.includes('.. _');
}

/** Folded name → address, of all targets on lines of their own that name an address. The first of a name counts. */
export function targetsIn(text: string): Map<string, string> {
  const targets = new Map<string, string>();
  if (!hasTargets(text)) return targets;
  for (const [, name, address] of text.matchAll(TARGET)) {
    const folded = foldName(name!.replace(/^`|`$/g, ''));
    if (!targets.has(folded)) targets.set(folded, address!.trimEnd());
  }
  return targets;
}

/** A reference name as docutils compares it: in lower case, white space folded. */
export function foldName(name: string): string {
  return name.trim().toLowerCase().replace(/\s+/g, ' ');
}
