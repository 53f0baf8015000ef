// The shape of npm commonmark-spec, which ships no types.
declare module 'commonmark-spec' {
  /** The specification's examples in order; a tab is written as `→`. */
  export const tests: readonly {
    readonly number: number;
    readonly section: string;
    readonly markdown: string;
    readonly html: string;
  }[];
  /** The specification itself, in Markdown. */
  export const text: string;
}
