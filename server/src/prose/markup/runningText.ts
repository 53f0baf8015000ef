// Puts character data into a block: white space folds, references are decoded, addresses stand opaque.
import { decodeReference } from '../characterReferences.js';
import type { ContentBuilder } from '../content.js';
import { OPAQUE } from '../prose.js';
import { AddressFinder } from './addresses.js';

const REFERENCE = /&(?:#[0-9]{1,8}|#[xX][0-9A-Fa-f]{1,7}|[A-Za-z_:][\w:.-]{0,80});/y;
/** The commonest names that HTML decodes without a semicolon (HTML Standard, "Named character references"). */
const UNENDED = /&(nbsp|amp|lt|gt|quot|copy|reg)(?![A-Za-z0-9=])/y;
const PREDEFINED = new Set(['&amp;', '&lt;', '&gt;', '&quot;', '&apos;']);
const AMPERSAND = 38;

/** What names of references mean in a document. */
export interface References {
  /** True in XML, where a name that nobody defined is still a reference. */
  readonly xml: boolean;
  /** Names that the document itself defines. */
  readonly defined: ReadonlySet<string>;
  /** Those of them that stand for a character alone. */
  readonly characters?: ReadonlyMap<string, string> | undefined;
}

/** Reads stretches of one document's character data, from left to right. */
export class TextReader {
  private addresses: AddressFinder;
  /** The start of the stretch that was read last. */
  private last = 0;

  constructor(
    private readonly text: string,
    private readonly references: References,
  ) {
    this.addresses = new AddressFinder(text);
  }

  /** Where the first visible thing in `[from, to)` stands; `to` where there is none. */
  visibleFrom(from: number, to: number): number {
    while (from < to && isSpace(this.text.charCodeAt(from))) from++;
    return from;
  }

  /** Where the last visible thing in `[from, to)` ends; `from` where there is none. */
  visibleEnd(from: number, to: number): number {
    while (to > from && isSpace(this.text.charCodeAt(to - 1))) to--;
    return to;
  }

  /** Adds `[from, to)` to the block. In a CDATA section (`plain`) an ampersand is one. */
  read(from: number, to: number, out: ContentBuilder, plain: boolean): void {
    const { text } = this;
    if (from < this.last) this.addresses = new AddressFinder(text);
    this.last = from;
    let address = this.addresses.next(from, to);
    let stop = address?.start ?? to;
    let run = from;
    for (let at = from; at < to;) {
      const unit = text.charCodeAt(at);
      if (at === stop) {
        out.run(run, at);
        out.opaque(at, address!.end);
        run = at = address!.end;
        address = this.addresses.next(at, to);
        stop = address?.start ?? to;
      } else if (isSpace(unit)) {
        const end = this.visibleFrom(at, to);
        // A single blank between two words runs on; before a reference it may be one of several.
        if (unit === 32 && end === at + 1 && at > run && end < stop && text.charCodeAt(end) !== AMPERSAND) {
          at = end;
          continue;
        }
        out.run(run, at);
        out.space(at, end);
        run = at = end;
      } else if (unit === AMPERSAND && !plain) {
        const end = this.reference(run, at, to, out);
        if (end > at) run = end;
        at = Math.max(end, at + 1);
        if (stop < at) {
          address = this.addresses.next(at, to);
          stop = address?.start ?? to;
        }
      } else at++;
    }
    out.run(run, to);
  }

  /** Adds the reference at `at`, with the text before it, and returns its end; `at` itself where it is text. */
  private reference(run: number, at: number, to: number, out: ContentBuilder): number {
    const unended = this.references.xml ? undefined : matchAt(UNENDED, this.text, at)?.[1];
    const written = unended === undefined ? matchAt(REFERENCE, this.text, at)?.[0] : `&${unended};`;
    if (written === undefined) return at;
    const end = at + written.length - (unended === undefined || this.text[at + written.length - 1] === ';' ? 0 : 1);
    if (end > to) return at;
    const decoded = this.decode(written);
    if (decoded === undefined) return at;
    out.run(run, at);
    if (isSpace(decoded.charCodeAt(0))) out.space(at, end);
    else out.substitute(decoded, at, end);
    return end;
  }

  private decode(reference: string): string | undefined {
    const { xml, defined, characters } = this.references;
    if (!xml || reference.charCodeAt(1) === 35) return decodeReference(reference);
    if (PREDEFINED.has(reference)) return decodeReference(reference);
    const name = reference.slice(1, -1);
    if (defined.has(name)) return characters?.get(name) ?? OPAQUE;
    const decoded = decodeReference(reference);
    return decoded !== undefined && isCommon(decoded) ? decoded : OPAQUE;
  }
}

function matchAt(pattern: RegExp, text: string, at: number): RegExpExecArray | null {
  pattern.lastIndex = at;
  return pattern.exec(text);
}

/**
 * True for letters and punctuation as the character entity sets of documentation have them. A name from mathematics is rather one that
 * the documentation set defines for itself outside the document.
 */
function isCommon(decoded: string): boolean {
  const unit = decoded.charCodeAt(0);
  return decoded.length === 1 && unit >= 0xa0 && (unit < 0x250 || (unit >= 0x2000 && unit < 0x2070) || unit === 0x2122);
}

function isSpace(unit: number): boolean {
  return unit === 32 || unit === 10 || unit === 9 || unit === 13 || unit === 12;
}
