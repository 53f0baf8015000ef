// Owns what was published: sends a document's diagnostics only where they differ from those the client has.
import type { Diagnostic } from 'vscode-languageserver';

/** Sends one `textDocument/publishDiagnostics`. */
export type SendDiagnostics = (uri: string, diagnostics: Diagnostic[], version: number | undefined) => void;

/** Remembers, per document, what the client shows. */
export class Publisher {
  private readonly shown = new Map<string, string>();

  constructor(private readonly send: SendDiagnostics) {}

  /** Shows these diagnostics, and no others, for a document. */
  publish(uri: string, diagnostics: readonly Diagnostic[], version?: number): void {
    const text = JSON.stringify(diagnostics);
    if ((this.shown.get(uri) ?? '[]') === text) return;
    if (diagnostics.length === 0) this.shown.delete(uri);
    else this.shown.set(uri, text);
    this.send(uri, [...diagnostics], version);
  }

  /** Takes back everything that was published for a document. */
  clear(uri: string): void {
    this.publish(uri, []);
  }
}
