// Zones that a user opens or closes: what counts, what is checked and what can be fixed follows.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { Engine, closedZones } from '../../../server/src/engine/engine.js';
import { Profiles } from '../../../server/src/engine/factsOf.js';
import { preferredEdits } from '../../../server/src/engine/fixing.js';
import type { ZoneSwitches } from '../../../server/src/prose/zones.js';

const profiles = new Profiles();
const uri = 'file:///docs/page.md';
const PAGE = '# Your API key\n\nThe API key opens it.\n\nThe sign says “keep the API key to yourself”.\n';

function engineOf(): Engine {
  const engine = new Engine(profiles);
  engine.apply({
    documents: [{ uri, source: { uri, format: 'markdown', text: PAGE }, open: true }],
    termbases: [
      {
        uri: 'file:///docs/termbase.yaml',
        text: 'evenword: 1\nconcepts:\n  - preferred: access key\n    deprecated: [API key]\n',
      },
    ],
  });
  finish(engine.settle());
  return engine;
}

function seen(engine: Engine, zones: ZoneSwitches): { words: number; lines: number[] } {
  engine.apply({ mining: { closedZones: closedZones(zones) } });
  finish(engine.settle());
  const { snapshot } = engine;
  const lines = snapshot.findingsIn(uri).map(({ span }) => PAGE.slice(0, span.start).split('\n').length);
  return { words: snapshot.relations.size.words, lines };
}

describe('zones', () => {
  it('open and close at once, for counting and for checking', () => {
    const engine = engineOf();
    expect(seen(engine, {})).toEqual({ words: 11, lines: [1, 3] });
    expect(seen(engine, { quotation: true })).toEqual({ words: 17, lines: [1, 3, 5] });
    expect(seen(engine, { heading: false })).toEqual({ words: 8, lines: [3] });
    expect(seen(engine, {})).toEqual({ words: 11, lines: [1, 3] });
  });

  it('are the same whether they were switched before or after the survey', () => {
    const before = new Engine(profiles);
    before.apply({ mining: { closedZones: closedZones({ quotation: true }) } });
    before.apply({ documents: [{ uri, source: { uri, format: 'markdown', text: PAGE } }] });
    finish(before.settle());
    expect(before.snapshot.relations.size.words).toBe(17);
    expect(before.needsSettling).toBe(false);
  });

  it('are fixed like prose where they are open', () => {
    const engine = engineOf();
    seen(engine, { quotation: true });
    const { snapshot } = engine;
    const fix = preferredEdits(snapshot, uri, snapshot.findingsIn(uri)[2]!);
    expect(fix).toMatchObject({ kind: 'edits', edits: [{ newText: 'access' }] });
  });
});
