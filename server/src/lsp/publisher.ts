// Owns what was published: sends a document's diagnostics only where they differ from those the client has.
import type { Diagnostic } from 'vscode-languageserver';

/** Sends one `textDocument/publishDiagnostics`. */
export type SendDiagnostics = (uri: string, diagnostics: Diagnostic[], version: number | undefined) => void;

/** Remembers, per document, what the client shows. */
export class Publisher {
  private readonly shown = new Map<string, readonly Diagnostic[]>();

  constructor(private readonly send: SendDiagnostics) {}

  /** Shows these diagnostics, and no others, for a document. */
  publish(uri: string, diagnostics: readonly Diagnostic[], version?: number): void {
    const before = this.shown.get(uri) ?? [];
    if (before.length === diagnostics.length && diagnostics.every((one, at) => isSame(one, before[at]!))) return;
    if (diagnostics.length === 0) this.shown.delete(uri);
    else this.shown.set(uri, diagnostics);
    this.send(uri, [...diagnostics], version);
  }

  /** Takes back everything that was published for a document. */
  clear(uri: string): void {
    this.publish(uri, []);
  }
}

/** Compares what this server fills in. */
function isSame(a: Diagnostic, b: Diagnostic): boolean {
  return (
    a.message === b.message &&
    a.range.start.line === b.range.start.line &&
    a.range.start.character === b.range.start.character &&
    a.range.end.line === b.range.end.line &&
    a.range.end.character === b.range.end.character &&
    a.severity === b.severity &&
    a.code === b.code
  );
}
