// A column of whole numbers that is never changed: an edit copies only the pages it touches.

const PAGE_BITS = 10;
const PAGE_SIZE = 1 << PAGE_BITS;
const PAGE_MASK = PAGE_SIZE - 1;

/** An immutable column of 32-bit integers; rows never written are 0. */
export class PagedColumn {
  static readonly empty = new PagedColumn([]);

  private constructor(private readonly pages: readonly (Int32Array | undefined)[]) {}

  /** The value of a row. */
  get(row: number): number {
    return this.pages[row >>> PAGE_BITS]?.[row & PAGE_MASK] ?? 0;
  }

  /** Starts an edit; this column stays as it is. */
  edit(): ColumnEdit {
    return new ColumnEdit(this.pages, (pages) => new PagedColumn(pages));
  }
}

/** One edit of a column, made by one writer and finished once. */
export class ColumnEdit {
  private readonly pages: (Int32Array | undefined)[];
  private readonly own: boolean[] = [];

  constructor(
    pages: readonly (Int32Array | undefined)[],
    private readonly make: (pages: readonly (Int32Array | undefined)[]) => PagedColumn,
  ) {
    this.pages = pages.slice();
  }

  /** The value of a row as edited so far. */
  get(row: number): number {
    return this.pages[row >>> PAGE_BITS]?.[row & PAGE_MASK] ?? 0;
  }

  /** Adds to a row and returns its new value. */
  add(row: number, delta: number): number {
    const at = row >>> PAGE_BITS;
    if (this.own[at] !== true) {
      const page = this.pages[at];
      this.pages[at] = page ? page.slice() : new Int32Array(PAGE_SIZE);
      this.own[at] = true;
    }
    return (this.pages[at]![row & PAGE_MASK]! += delta);
  }

  /** The edited column. */
  finish(): PagedColumn {
    return this.make(this.pages);
  }
}
