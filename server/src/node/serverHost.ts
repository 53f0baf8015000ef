// The language server's world on Node: the file system and worker threads.
import { readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import type { ServerHost } from '../lsp/host.js';
import { gatherAll } from './factsPool.js';
import { Profiles } from '../engine/factsOf.js';
import { findFiles, formatOf, readDocument, uriOfPath } from './files.js';

/** A host over `file:` URIs; folders of other schemes hold nothing that it could read. */
export function nodeServerHost(): ServerHost {
  const profiles = new Profiles();
  return {
    async readFolder(uri, signal) {
      const path = pathOf(uri);
      if (path === undefined) return { sources: [], termbases: [], leftOut: [] };
      const { documents, termbases, leftOut } = await findFiles(path);
      const sources = [];
      const missed = [...leftOut];
      for (const document of documents) {
        signal.throwIfAborted();
        const file = await readDocument(document);
        if ('source' in file) sources.push(file.source);
        else missed.push(file.leftOut);
      }
      const texts = await Promise.all(
        termbases.map(async (file) => ({ uri: uriOfPath(file), text: await readFile(file, 'utf8') })),
      );
      return { sources, termbases: texts, leftOut: missed };
    },
    async readDocument(uri) {
      const path = pathOf(uri);
      if (path === undefined || formatOf(path) === undefined) return undefined;
      const file = await readDocument(path);
      return 'source' in file ? file.source : undefined;
    },
    async readTermbase(uri) {
      const path = pathOf(uri);
      return path === undefined ? undefined : readFile(path, 'utf8').catch(() => undefined);
    },
    gather: (sources, progress, signal) => gatherAll(sources, profiles, { progress, signal }),
  };
}

function pathOf(uri: string): string | undefined {
  return uri.startsWith('file:') ? fileURLToPath(uri) : undefined;
}
