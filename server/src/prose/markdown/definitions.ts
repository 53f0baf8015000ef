// Link reference definitions: `[label]: target`. They decide which brackets are links, in the whole document.
import type { Tree } from '@lezer/common';
import { Role, ROLE_OF } from './roles.js';

/** One definition; `label` is folded as references to it are. */
export interface Definition {
  readonly label: string;
  readonly target: string;
}

/** Folds a label as CommonMark 0.31.2 compares them ("matches"): case and runs of white space do not count. */
export function foldLabel(label: string): string {
  return label.trim().replace(/\s+/g, ' ').toLowerCase().toUpperCase();
}

/** A target as written, without the angle brackets around it. */
export function bareTarget(written: string): string {
  return written.startsWith('<') && written.endsWith('>') ? written.slice(1, -1) : written;
}

/** The definitions of a parsed text with the offsets at which they begin, in order. */
export function definitionsIn(tree: Tree, text: string): { at: number; definition: Definition }[] {
  const found: { at: number; definition: Definition }[] = [];
  if (!text.includes(']:')) return found;
  tree.iterate({
    enter(node) {
      const role = ROLE_OF[node.type.id]!;
      if (role !== Role.definition)
        return (
          (role >= Role.container && role <= Role.admonition) || role === Role.definitionBody || role === Role.list
        );
      let label = '';
      let target = '';
      for (let child = node.node.firstChild; child; child = child.nextSibling) {
        const childRole = ROLE_OF[child.type.id];
        if (childRole === Role.linkLabel) label = foldLabel(text.slice(child.from + 1, child.to - 1));
        else if (childRole === Role.url) target = bareTarget(text.slice(child.from, child.to));
      }
      found.push({ at: node.from, definition: { label, target } });
      return false;
    },
  });
  return found;
}
