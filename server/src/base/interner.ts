// Strings to small whole numbers and back; numbers are given once, in order of arrival, and never taken back.

/** An append-only table of distinct strings. The numbers identify; they order nothing. */
export class Interner {
  private readonly ids = new Map<string, number>();
  private readonly texts: string[] = [];

  get size(): number {
    return this.texts.length;
  }

  /** The number of a string, given anew where it was not known. */
  idOf(text: string): number {
    const known = this.ids.get(text);
    if (known !== undefined) return known;
    const id = this.texts.length;
    this.ids.set(text, id);
    this.texts.push(text);
    return id;
  }

  /** The number of a string, or undefined where it was never seen. */
  find(text: string): number | undefined {
    return this.ids.get(text);
  }

  textOf(id: number): string {
    return this.texts[id]!;
  }
}
