// Gathers the facts of many documents on worker threads, or on this one where there is little to do.
import { availableParallelism } from 'node:os';
import { Worker, isMainThread, parentPort, workerData } from 'node:worker_threads';
import type { DocumentFacts } from '../facts/documentFacts.js';
import { Profiles, factsOf } from '../engine/factsOf.js';
import type { SourceText } from '../text/sourceText.js';

/** Texts shorter than this in all, in UTF-16 units, are not worth the start of a worker. */
const WORTH_WORKERS = 600_000;
/** What one message to a worker holds, in UTF-16 units: large enough to make messages rare, small enough to share evenly. */
const BATCH = 60_000;
const ROLE = 'evenword-facts';

/** Called as documents are done: how many of how many. */
export type Progress = (done: number, all: number) => void;

/**
 * The facts of each document, in order.
 * @throws the signal's reason where it is aborted; workers end at once.
 */
export async function gatherAll(
  sources: readonly SourceText[],
  profiles: Profiles,
  options: { readonly progress?: Progress; readonly signal?: AbortSignal; readonly workers?: number } = {},
): Promise<DocumentFacts[]> {
  const { progress, signal } = options;
  const size = sources.reduce((sum, source) => sum + source.text.length, 0);
  const workers = size < WORTH_WORKERS ? 0 : (options.workers ?? Math.min(4, availableParallelism()));
  if (workers > 0) return gatherOnWorkers(sources, workers, progress, signal);
  const all: DocumentFacts[] = [];
  for (const source of sources) {
    signal?.throwIfAborted();
    all.push(factsOf(source, profiles));
    progress?.(all.length, sources.length);
    if (all.length % 8 === 0) await new Promise(setImmediate);
  }
  return all;
}

async function gatherOnWorkers(
  sources: readonly SourceText[],
  count: number,
  progress: Progress | undefined,
  signal: AbortSignal | undefined,
): Promise<DocumentFacts[]> {
  const results: DocumentFacts[] = new Array<DocumentFacts>(sources.length);
  const batches = inBatches(sources);
  let next = 0;
  let done = 0;
  const run = (): Promise<void> =>
    new Promise((resolve, reject) => {
      const worker = new Worker(__filename, { workerData: ROLE });
      const end = (settle: () => void): void => {
        signal?.removeEventListener('abort', abort);
        void worker.terminate();
        settle();
      };
      const abort = (): void => end(() => reject(signal?.reason as Error));
      const feed = (): void => {
        const batch = batches[next++];
        if (batch === undefined) end(resolve);
        else worker.postMessage({ first: batch.first, sources: sources.slice(batch.first, batch.end) } satisfies Task);
      };
      signal?.addEventListener('abort', abort, { once: true });
      worker.on('error', (error) => end(() => reject(error)));
      worker.on('message', ({ first, facts }: Answer) => {
        facts.forEach((one, index) => (results[first + index] = one));
        done += facts.length;
        progress?.(done, sources.length);
        feed();
      });
      feed();
    });
  signal?.throwIfAborted();
  await Promise.all(Array.from({ length: Math.min(count, batches.length) }, run));
  return results;
}

interface Task {
  readonly first: number;
  readonly sources: readonly SourceText[];
}

interface Answer {
  readonly first: number;
  readonly facts: readonly DocumentFacts[];
}

function inBatches(sources: readonly SourceText[]): { first: number; end: number }[] {
  const batches: { first: number; end: number }[] = [];
  let first = 0;
  let size = 0;
  sources.forEach((source, index) => {
    size += source.text.length;
    if (size >= BATCH || index === sources.length - 1) {
      batches.push({ first, end: index + 1 });
      first = index + 1;
      size = 0;
    }
  });
  return batches;
}

/** Serves as a worker where this file was started as one; says whether it was. */
export function serveAsWorker(): boolean {
  if (isMainThread || workerData !== ROLE || parentPort === null) return false;
  const port = parentPort;
  const profiles = new Profiles();
  port.on('message', ({ first, sources }: Task) => {
    const facts = sources.map((source) => factsOf(source, profiles));
    port.postMessage({ first, facts } satisfies Answer, facts.flatMap(buffersOf));
  });
  return true;
}

function buffersOf(facts: DocumentFacts): ArrayBuffer[] {
  return Object.values(facts)
    .filter((column: unknown): column is Uint32Array => ArrayBuffer.isView(column))
    .map((column) => column.buffer as ArrayBuffer);
}
