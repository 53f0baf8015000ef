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

/** How facts are gathered. */
export interface GatherOptions {
  readonly progress?: Progress;
  /** Aborting it rejects with its reason and ends the workers. */
  readonly signal?: AbortSignal;
}

/**
 * Gathers facts for one process. Workers are started with the first large survey and kept until {@link end}: each loads the
 * language model of its own.
 */
export class FactsPool {
  private workers: Worker[] = [];

  constructor(
    private readonly profiles: Profiles,
    private readonly size = Math.min(4, availableParallelism()),
  ) {}

  /** The facts of each document in each of its languages, in order. One call at a time. */
  async gather(
    sources: readonly SourceText[],
    { progress, signal }: GatherOptions = {},
  ): Promise<(readonly DocumentFacts[])[]> {
    const size = sources.reduce((sum, source) => sum + source.text.length, 0);
    if (size >= WORTH_WORKERS && this.size > 0) return this.gatherOnWorkers(sources, progress, signal);
    const all: (readonly DocumentFacts[])[] = [];
    for (const source of sources) {
      signal?.throwIfAborted();
      all.push(factsOf(source, this.profiles));
      progress?.(all.length, sources.length);
      if (all.length % 8 === 0) await new Promise(setImmediate);
    }
    return all;
  }

  /** Ends the workers; the next large survey starts new ones. */
  async end(): Promise<void> {
    const workers = this.workers.splice(0);
    await Promise.all(workers.map((worker) => worker.terminate()));
  }

  private async gatherOnWorkers(
    sources: readonly SourceText[],
    progress: Progress | undefined,
    signal: AbortSignal | undefined,
  ): Promise<(readonly DocumentFacts[])[]> {
    signal?.throwIfAborted();
    const results = new Array<readonly DocumentFacts[]>(sources.length);
    const batches = inBatches(sources);
    while (this.workers.length < Math.min(this.size, batches.length)) {
      this.workers.push(new Worker(__filename, { workerData: ROLE }));
    }
    let next = 0;
    let done = 0;
    const serve = async (worker: Worker): Promise<void> => {
      for (let batch = batches[next++]; batch !== undefined; batch = batches[next++]) {
        const task: Task = { sources: sources.slice(batch.first, batch.end) };
        const facts = await answerOf(worker, task, signal);
        for (const [index, one] of facts.entries()) results[batch.first + index] = one;
        done += facts.length;
        progress?.(done, sources.length);
      }
    };
    try {
      await Promise.all(this.workers.map(serve));
    } catch (error) {
      await this.end();
      throw error;
    }
    return results;
  }
}

/** Sends a worker one task and waits for its answer. */
function answerOf(
  worker: Worker,
  task: Task,
  signal: AbortSignal | undefined,
): Promise<readonly (readonly DocumentFacts[])[]> {
  return new Promise((resolve, reject) => {
    const settle = (finish: () => void): void => {
      worker.off('message', answered);
      worker.off('error', failed);
      signal?.removeEventListener('abort', aborted);
      finish();
    };
    const answered = (facts: readonly (readonly DocumentFacts[])[]): void => settle(() => resolve(facts));
    const failed = (error: Error): void => settle(() => reject(error));
    const aborted = (): void => settle(() => reject(signal?.reason as Error));
    worker.on('message', answered);
    worker.on('error', failed);
    signal?.addEventListener('abort', aborted);
    worker.postMessage(task);
  });
}

interface Task {
  readonly sources: readonly SourceText[];
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
  port.on('message', ({ sources }: Task) => {
    const facts = sources.map((source) => factsOf(source, profiles));
    port.postMessage(facts, facts.flat().flatMap(buffersOf));
  });
  return true;
}

function buffersOf(facts: DocumentFacts): ArrayBuffer[] {
  return Object.values(facts)
    .filter((column: unknown): column is Uint32Array => ArrayBuffer.isView(column))
    .map((column) => column.buffer as ArrayBuffer);
}
