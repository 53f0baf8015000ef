// Contents of a repository's objects, read one after the other from one run of git.
import type { Readable } from 'node:stream';
import { decodeUtf8 } from '../decoding.js';
import type { Git } from './git.js';

/** What was read of an object: its text; undefined where there is none, it is too large, or it is no UTF-8. */
export type Contents = string | undefined;

/** An object that was read, and its size in bytes. */
export interface ReadObject {
  readonly contents: Contents;
  readonly bytes: number;
}

/** Reads objects one after the other, in the order named. `read` may stop where it has enough. */
export async function readContents(
  git: Git,
  names: readonly string[],
  largest: number,
  read: (next: () => Promise<ReadObject>) => Promise<void>,
  signal: AbortSignal,
): Promise<void> {
  if (names.length === 0) return;
  const input = names.map((name) => `${name}\n`).join('');
  const take = async (output: Readable): Promise<void> => {
    const bytes = new ByteReader(output);
    await read(() => nextObject(bytes, largest));
  };
  await git.stream(['cat-file', '--batch'], take, { input, signal });
}

/** Reads what `git cat-file --batch` writes of one object: its name, kind and size on a line, then its contents and a line's end. */
async function nextObject(bytes: ByteReader, largest: number): Promise<ReadObject> {
  const [, kind, digits] = ((await bytes.line()) ?? '').split(' ');
  const size = Number(digits);
  if (digits === undefined || !Number.isSafeInteger(size)) return { contents: undefined, bytes: 0 };
  const body = size <= largest && kind === 'blob' ? await bytes.take(size) : undefined;
  await bytes.skip(body === undefined ? size + 1 : 1);
  const decoded = body && decodeUtf8(body);
  return { contents: decoded !== undefined && 'text' in decoded ? decoded.text : undefined, bytes: size };
}

/** Takes bytes from a stream by lines and by counts. */
class ByteReader {
  private readonly parts: AsyncIterator<Buffer, undefined>;
  private rest: Buffer = Buffer.alloc(0);

  constructor(stream: Readable) {
    // Stopping early must leave the stream to its owner.
    this.parts = stream.iterator({ destroyOnReturn: false }) as AsyncIterator<Buffer, undefined>;
  }

  /** The next line without its end, or undefined at the end of the stream. */
  async line(): Promise<string | undefined> {
    for (;;) {
      const end = this.rest.indexOf(10);
      if (end >= 0) {
        const line = this.rest.toString('latin1', 0, end);
        this.rest = this.rest.subarray(end + 1);
        return line;
      }
      if (!(await this.more())) return undefined;
    }
  }

  /** The next bytes; fewer at the end of the stream. */
  async take(size: number): Promise<Buffer> {
    const parts: Buffer[] = [];
    let missing = size;
    while (missing > 0) {
      if (this.rest.length === 0 && !(await this.more())) break;
      const part = this.rest.subarray(0, missing);
      this.rest = this.rest.subarray(part.length);
      missing -= part.length;
      parts.push(part);
    }
    return Buffer.concat(parts);
  }

  async skip(size: number): Promise<void> {
    let missing = size;
    while (missing > 0) {
      if (this.rest.length === 0 && !(await this.more())) return;
      const length = Math.min(missing, this.rest.length);
      this.rest = this.rest.subarray(length);
      missing -= length;
    }
  }

  private async more(): Promise<boolean> {
    const next = await this.parts.next();
    if (next.done === true) return false;
    this.rest = this.rest.length === 0 ? next.value : Buffer.concat([this.rest, next.value]);
    return true;
  }
}
