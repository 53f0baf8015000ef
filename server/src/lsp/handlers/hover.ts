// textDocument/hover: the card of the term under the pointer.
import { MarkupKind } from 'vscode-languageserver';
import type { Hover, HoverParams } from 'vscode-languageserver';
import { hoverAt } from '../../ide/hover.js';
import { canonicalUri } from '../../text/uri.js';
import { toRange } from '../conversion.js';
import type { Sessions } from '../sessions.js';

export function provideHover(sessions: Sessions, { textDocument, position }: HoverParams): Hover | null {
  const session = sessions.of(textDocument.uri);
  const uri = canonicalUri(textDocument.uri);
  const { snapshot } = session;
  const document = snapshot.documents.get(uri);
  if (document === undefined) return null;
  const lines = session.linesOf(document.source);
  const hover = hoverAt(snapshot, uri, lines.offsetAt(position));
  if (hover === undefined) return null;
  return { contents: { kind: MarkupKind.Markdown, value: hover.markdown }, range: toRange(hover.span, lines) };
}
