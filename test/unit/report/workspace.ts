// A settled engine over documents given as texts, for the report's tests.
import { finish } from '../../../server/src/base/work.js';
import { Engine } from '../../../server/src/engine/engine.js';
import { Profiles } from '../../../server/src/engine/factsOf.js';
import type { Snapshot } from '../../../server/src/engine/snapshot.js';

const profiles = new Profiles();

/** The folder of all documents. */
export const ROOT = 'file:///docs/';

/** A snapshot of Markdown pages by path, under one termbase where it is given. */
export function snapshotOf(pages: Readonly<Record<string, string>>, termbase?: string): Snapshot {
  const engine = new Engine(profiles);
  engine.apply({
    documents: Object.entries(pages).map(([path, text]) => {
      const uri = `${ROOT}${path}`;
      return { uri, source: { uri, format: path.endsWith('.txt') ? 'plaintext' : 'markdown', text } };
    }),
    ...(termbase !== undefined && { termbases: [{ uri: `${ROOT}termbase.yaml`, text: termbase }] }),
  });
  return finish(engine.settle());
}
