// The language server's world on Node: the file system and worker threads.
import { join, sep } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { ServerHost } from '../lsp/host.js';
import { decodeUtf8 } from './decoding.js';
import { FactsPool } from './factsPool.js';
import { readHistory } from './history/history.js';
import { Profiles } from '../engine/factsOf.js';
import type { FilePolicy } from '../text/filePolicy.js';
import { formatOf } from '../text/sourceText.js';
import { findFiles, readDocument, readText, termbasesAbove, uriOfPath, whyLeftOut } from './files.js';

/** A host over `file:` URIs; folders of other schemes hold nothing that it could read. `version` is the engine's. */
export function nodeServerHost(version: string): ServerHost {
  const profiles = new Profiles();
  return {
    profiles,
    async readFolder(uri, files, signal) {
      const path = pathOf(uri);
      if (path === undefined) return { sources: [], termbases: [], leftOut: [] };
      const { documents, termbases, leftOut } = await findFiles(path, files);
      const sources = [];
      const missed = [...leftOut];
      for (const document of documents) {
        signal.throwIfAborted();
        const file = await readDocument(document);
        if ('source' in file) sources.push(file.source);
        else missed.push(file.leftOut);
      }
      const texts = [];
      for (const file of [...termbases, ...termbasesAbove(path)]) {
        const read = await readText(file, decodeUtf8);
        if ('text' in read) texts.push({ uri: uriOfPath(file), text: read.text });
        else missed.push({ path: file, reason: read.reason });
      }
      return { sources, termbases: texts, leftOut: missed };
    },
    async readDocument(folder, uri, files) {
      const path = pathOf(uri);
      if (path === undefined || formatOf(path) === undefined) return undefined;
      if ((await reasonAgainst(folder, path, files)) !== undefined) return undefined;
      const file = await readDocument(path);
      return 'source' in file ? file.source : undefined;
    },
    async readTermbase(folder, uri, files) {
      const path = pathOf(uri);
      if (path === undefined || (await reasonAgainst(folder, path, files)) !== undefined) return undefined;
      const file = await readText(path, decodeUtf8);
      return 'text' in file ? file.text : undefined;
    },
    async whyLeftOut(folder, uri, files) {
      const path = pathOf(uri);
      return path === undefined ? undefined : reasonAgainst(folder, path, files);
    },
    async readHistory(folder, cacheFolder, signal) {
      const path = pathOf(folder);
      return path === undefined ? undefined : readHistory(path, { cacheFolder, version, signal });
    },
    async gather(sources, progress, signal) {
      // The workers' memory is wanted back: after a survey there is little left for them to do.
      const pool = new FactsPool(profiles);
      try {
        return await pool.gather(sources, { progress, signal });
      } finally {
        await pool.end();
      }
    },
  };
}

/** Files outside the folder, such as a termbase above it, are left out by nothing in it. */
async function reasonAgainst(folder: string, path: string, files: FilePolicy): Promise<string | undefined> {
  const root = folder === '' ? undefined : pathOf(folder);
  if (root === undefined || !path.startsWith(join(root, sep))) return undefined;
  return whyLeftOut(root, path, files);
}

function pathOf(uri: string): string | undefined {
  return uri.startsWith('file:') ? fileURLToPath(uri) : undefined;
}
