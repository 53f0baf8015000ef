// Looks ahead in the text that is being parsed, for blocks whose end decides whether they are any.
import type { BlockContext, Line } from '@lezer/markdown';

/** The whole text of the parse. The parser (1.8.1, pinned) keeps it to itself, but knows one line ahead alone. */
export function wholeText(cx: BlockContext): string {
  return (cx as unknown as { readonly input: { readonly string: string } }).input.string;
}

/** Steps over lines until the one is passed in which `end` lies. */
export function passLinesTo(cx: BlockContext, lineEnd: () => number, end: number): void {
  while (lineEnd() < end && cx.nextLine());
  cx.nextLine();
}

/** True where the line at hand goes on in the innermost block that was open before it; likewise known to the parser alone. */
export function staysInside(cx: BlockContext, line: Line): boolean {
  return (line as unknown as { readonly depth: number }).depth >= cx.depth;
}
