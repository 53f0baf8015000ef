// Holds documents to one agenda; what it found in a block is kept for as long as the block's content is.
import type { Agenda } from '../decisions/decide.js';
import { languagesIn } from './languages.js';
import { checkBlock, checkProse } from '../findings/check.js';
import type { CheckedTerm } from '../findings/checkedTerm.js';
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

/** What some terms found in a block. */
interface Found {
  readonly terms: TermSet;
  readonly findings: readonly BlockFinding[];
}

/** The terms of one agenda, and what they found. */
export class Checker {
  private checked: readonly CheckedTerm[] | undefined;
  private readonly compiled = new Map<string, TermSet>();
  private readonly ofBlock = new WeakMap<BlockContent, Found>();

  /** @param relations of the documents, by which an admitted verb can be odd with an object */
  constructor(
    private readonly agenda: Agenda,
    private readonly relations: Relations,
    /** Zones in which nothing is checked. */
    readonly closed: ZoneSet = CLOSED_ZONES,
  ) {}

  /** All terms that are looked for, whatever their language. */
  get terms(): readonly CheckedTerm[] {
    const { agenda, relations } = this;
    this.checked ??= [...checkedTerms(agenda), ...oddCompanions(agenda.decisions, relations)];
    return this.checked;
  }

  /**
   * The terms that are looked for in blocks of a language: its own, and those of no stated language. In languages other than
   * English they are looked for as written. Compiled when first asked for: thousands of terms take some milliseconds.
   */
  termsIn(language: string): TermSet {
    let terms = this.compiled.get(language);
    if (terms === undefined) {
      const own = this.terms.filter((term) => term.language === undefined || term.language === language);
      this.compiled.set(language, (terms = new TermSet(own, this.closed, language === 'en')));
    }
    return terms;
  }

  /** The findings of a document, in order of their places. Blocks that an edit left alone are not checked again. */
  check({ source, prose }: Reading): readonly Finding[] {
    const languages = languagesIn({ source, prose });
    const ofBlock = (content: BlockContent, _: TermSet, block: number): readonly BlockFinding[] => {
      const terms = this.termsIn(languages.blocks[block]!);
      let known = this.ofBlock.get(content);
      if (known?.terms !== terms) this.ofBlock.set(content, (known = { terms, findings: checkBlock(content, terms) }));
      return known.findings;
    };
    return checkProse(prose, this.termsIn(languages.document), { ofBlock, kept: readKept(source) });
  }
}
