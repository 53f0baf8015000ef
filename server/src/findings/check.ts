// The check: from blocks of prose and compiled terms to findings. Blocks are checked one by one and can be kept by identity.
import { sourceEnd, sourceStart, type BlockContent, type Prose } from '../prose/prose.js';
import { isOpen } from '../prose/zones.js';
import { deprecatedTerm } from './deprecatedTerm.js';
import type { BlockFinding, Finding } from './finding.js';
import { mixedTerms } from './mixedTerms.js';
import { oddCompanion } from './oddCompanion.js';
import { NOTHING_KEPT, type Kept } from './suppression.js';
import type { Form } from '../rewrite/inflect.js';
import { formAt, type CompiledTerm, type TermSet } from './termSet.js';
import { useOfMatch, type TermUse } from './termUse.js';
import type { TagAt } from './useOfWord.js';

/** Every rule that judges the use of a term; the first that speaks is heard. */
const RULES: readonly ((use: TermUse) => BlockFinding | undefined)[] = [deprecatedTerm, mixedTerms, oddCompanion];

/**
 * The findings of one block, in the order of the text, in offsets of the block's text. They depend on the content, the terms and
 * the tags alone, so they may be kept as long as both objects live.
 * @param tagAt the tagger's part of speech by token start; without it, ambiguous words go unreported more often.
 */
export function checkBlock(content: BlockContent, terms: TermSet, tagAt?: TagAt): readonly BlockFinding[] {
  if (!isOpen(content.zones, terms.closed)) return [];
  // The matches are gathered first: judging one scans its surroundings with the same matcher.
  const matches: { term: CompiledTerm; start: number; end: number; form: Form }[] = [];
  terms.scan(content.text, (index, start, end, formIndex) => {
    const term = terms.terms[index]!;
    const { status } = term.checked;
    if (status === 'deprecated' || status === 'undecided' || status === 'odd')
      matches.push({ term, start, end, form: formAt(formIndex) });
  });
  const findings: BlockFinding[] = [];
  for (const { term, start, end, form } of matches) {
    // Two decisions about one place: the first in the list of terms is enough.
    if (findings[findings.length - 1]?.span.start === start) continue;
    const use = useOfMatch(content, terms, term, start, end, form, tagAt);
    const finding = use && firstOf(use);
    if (finding) findings.push(finding);
  }
  return findings;
}

function firstOf(use: TermUse): BlockFinding | undefined {
  for (const rule of RULES) {
    const finding = rule(use);
    if (finding) return finding;
  }
  return undefined;
}

/** What a document's check may draw on besides its prose and terms. */
export interface CheckOptions {
  /** The findings of a block, from a cache or from {@link checkBlock}. */
  readonly ofBlock?: (content: BlockContent, terms: TermSet, block: number) => readonly BlockFinding[];
  /** The tags of a block's tokens. */
  readonly tagsOf?: (content: BlockContent) => TagAt | undefined;
  /** Places that the document itself asks to be left as they are. */
  readonly kept?: Kept;
}

/** The findings of a document in source order, with spans in its source. */
export function checkProse(prose: Prose, terms: TermSet, options: CheckOptions = {}): Finding[] {
  const { kept = NOTHING_KEPT, tagsOf } = options;
  const ofBlock = options.ofBlock ?? ((content: BlockContent) => checkBlock(content, terms, tagsOf?.(content)));
  const findings: Finding[] = [];
  for (const [index, block] of prose.blocks.entries()) {
    for (const found of ofBlock(block.content, terms, index)) {
      const span = { start: sourceStart(block, found.span.start), end: sourceEnd(block, found.span.end) };
      if (kept.isKept(span, found)) continue;
      // Spreading objects of several shapes is some twenty times slower, on the path of each keystroke.
      findings.push(Object.assign({ block: index, proseSpan: found.span }, found, { span }));
    }
  }
  return findings;
}
