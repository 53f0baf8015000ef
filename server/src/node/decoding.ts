// From a file's bytes to its text: Unicode by its own marks, older encodings where they can be told for certain.
import { analyse } from 'chardet';
import iconv from 'iconv-lite';

/** A text, or why the bytes cannot be read as one, in words that go on after a file's name. */
export type Decoded = { readonly text: string } | { readonly reason: string };

/** Least confidence, of 100, with which an encoding without a mark is believed, … */
const LEAST_CONFIDENCE = 30;
/** … and how many times that of the next likely encoding it must be. */
const LEAST_LEAD = 1.5;
/** In so many bytes at the start a zero means that the file is no text. */
const BINARY_PROBE = 8192;
/** Bytes that an encoding has no letter for, and control characters, which no prose holds: the guess was wrong. */
const UNSOUND = /(?![\t\n\v\f\r])\p{Cc}|\uFFFD/u;

/**
 * Decodes UTF-8 (with or without a byte order mark), UTF-16 with its mark, and whatever single- or double-byte encoding the
 * statistics of its letters give away (Latin-1, as Windows extends it, among them). Anything else is refused: a wrong guess
 * would put wrong letters into words. A byte order mark of UTF-8 stays in the text, as U+FEFF.
 */
export function decode(bytes: Uint8Array): Decoded {
  const marked = utf16Label(bytes);
  if (marked !== undefined) return decodeAs(marked, bytes) ?? { reason: 'is in UTF-16, but damaged' };
  if (bytes.subarray(0, BINARY_PROBE).includes(0)) return { reason: 'is a binary file, or UTF-16 without its mark' };
  return (
    decodeAs('utf-8', bytes) ??
    decodeGuessed(bytes) ?? {
      reason: `is not in UTF-8 (line ${brokenLine(bytes)}) and its encoding cannot be told; save it as UTF-8 to have it read`,
    }
  );
}

/** Decodes UTF-8 alone: for files that we write ourselves, and for earlier versions of pages. */
export function decodeUtf8(bytes: Uint8Array): Decoded {
  return decodeAs('utf-8', bytes) ?? { reason: `is not in UTF-8 (line ${brokenLine(bytes)}); save it as UTF-8` };
}

function utf16Label(bytes: Uint8Array): 'utf-16le' | 'utf-16be' | undefined {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  return bytes[0] === 0xfe && bytes[1] === 0xff ? 'utf-16be' : undefined;
}

function decodeGuessed(bytes: Uint8Array): Decoded | undefined {
  const [best, next] = analyse(bytes);
  if (best === undefined || best.confidence < LEAST_CONFIDENCE || !iconv.encodingExists(best.name)) return undefined;
  if (next !== undefined && best.confidence < LEAST_LEAD * next.confidence) return undefined;
  // What calls itself Latin-1 is read as its extension by Windows (WHATWG Encoding Standard, § 4.2).
  const text = iconv.decode(bytes, best.name === 'ISO-8859-1' ? 'windows-1252' : best.name);
  return UNSOUND.test(text) ? undefined : { text };
}

/** Undefined where the bytes are not sound in an encoding of Unicode. */
function decodeAs(label: 'utf-8' | 'utf-16le' | 'utf-16be', bytes: Uint8Array): Decoded | undefined {
  try {
    return { text: new TextDecoder(label, { fatal: true, ignoreBOM: label === 'utf-8' }).decode(bytes) };
  } catch {
    return undefined;
  }
}

/** The line, from 1, of the first byte that is no UTF-8. */
function brokenLine(bytes: Uint8Array): number {
  const decoder = new TextDecoder('utf-8', { fatal: true });
  let line = 1;
  let start = 0;
  for (let i = 0; i <= bytes.length; i++) {
    if (i < bytes.length && bytes[i] !== 10) continue;
    try {
      decoder.decode(bytes.subarray(start, i));
    } catch {
      break;
    }
    start = i + 1;
    line++;
  }
  return line;
}
