// Holds documents to one agenda; what it found in a block is kept for as long as the block's content is.
import type { Agenda } from '../decisions/decide.js';
import { checkBlock, checkProse } from '../findings/check.js';
import type { BlockFinding, Finding } from '../findings/finding.js';
import { readKept } from '../findings/suppression.js';
import { TermSet } from '../findings/termSet.js';
import { CLOSED_ZONES } from '../prose/zones.js';
import type { ZoneSet } from '../prose/zones.js';
import type { BlockContent } from '../prose/prose.js';
import type { Reading } from '../prose/read.js';
import { checkedTerms } from './checkedTerms.js';
import { oddCompanions } from './oddCompanions.js';
import type { Relations } from './relations.js';

/** The terms of one agenda, and what they found. */
export class Checker {
  private compiled: TermSet | undefined;
  private readonly ofBlock = new WeakMap<BlockContent, readonly BlockFinding[]>();

  /** @param relations of the documents, by which an admitted verb can be odd with an object */
  constructor(
    private readonly agenda: Agenda,
    private readonly relations: Relations,
    private readonly closed: ZoneSet = CLOSED_ZONES,
  ) {}

  /** The terms that are looked for. Compiled when first asked for: thousands of terms take some milliseconds. */
  get terms(): TermSet {
    const { agenda, relations, closed } = this;
    this.compiled ??= new TermSet([...checkedTerms(agenda), ...oddCompanions(agenda.decisions, relations)], closed);
    return this.compiled;
  }

  /** The findings of a document, in order of their places. Blocks that an edit left alone are not checked again. */
  check({ source, prose }: Reading): readonly Finding[] {
    const ofBlock = (content: BlockContent): readonly BlockFinding[] => {
      let known = this.ofBlock.get(content);
      if (known === undefined) this.ofBlock.set(content, (known = checkBlock(content, this.terms)));
      return known;
    };
    return checkProse(prose, this.terms, { ofBlock, kept: readKept(source) });
  }
}
