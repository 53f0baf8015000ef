// Which termbases hold for a document: those of the folders above it, the nearest first.
import { compareCodeUnits } from '../base/order.js';
import type { Termbase } from '../termbase/termbase.js';

/** A termbase and the file it was read from; it holds for the file's folder and everything below. */
export interface PlacedTermbase {
  /** URI of the termbase file. */
  readonly uri: string;
  readonly termbase: Termbase;
}

/** The termbases in force in one part of the tree. */
export interface Scope {
  /** The URI of the nearest termbase, or `''` where none holds. Within one list of termbases it names the scope. */
  readonly id: string;
  /** Nearest first. */
  readonly chain: readonly Termbase[];
}

/**
 * The termbases in force for a document: those whose folder is a prefix, by whole segments, of the document's URI. No other
 * termbase is fallen back on. Escapes (`%20`), a drive's letter case and its escaped colon do not matter.
 * Of two termbases in one folder the one with the smaller URI counts as nearer.
 */
export function scopeOf(documentUri: string, termbases: readonly PlacedTermbase[]): Scope {
  const document = plainUri(documentUri);
  const holding = termbases
    .map(({ uri, termbase }) => ({ uri, termbase, folder: folderOf(plainUri(uri)) }))
    .filter(({ folder }) => document.startsWith(folder))
    .sort((a, b) => b.folder.length - a.folder.length || compareCodeUnits(a.uri, b.uri));
  return { id: holding[0]?.uri ?? '', chain: holding.map(({ termbase }) => termbase) };
}

/** The folder of a file, with its closing slash: `/docs` is thus no prefix of `/docs2/page.md`. */
function folderOf(uri: string): string {
  return uri.slice(0, uri.lastIndexOf('/') + 1);
}

function plainUri(uri: string): string {
  const path = uri.replace(/[?#].*$/su, '');
  return path
    .split('/')
    .map(unescaped)
    .join('/')
    .replace(/^([a-z][a-z0-9+.-]*:)/iu, (scheme) => scheme.toLowerCase())
    .replace(/^(file:\/\/\/)([A-Za-z]):/u, (_, start: string, drive: string) => `${start}${drive.toLowerCase()}:`);
}

/** A segment without its escapes; an escaped slash stays escaped, since it parts no segments. */
function unescaped(segment: string): string {
  try {
    return decodeURIComponent(segment).replaceAll('/', '%2F');
  } catch {
    return segment;
  }
}
