// Batch equals incremental, end to end: questions and findings are a function of texts and termbases, not of the edits that led there.
import fc from 'fast-check';
import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { finish } from '../../server/src/base/work.js';
import { Engine } from '../../server/src/engine/engine.js';
import { Profiles } from '../../server/src/engine/factsOf.js';
import type { Snapshot } from '../../server/src/engine/snapshot.js';
import { withPathLanguage } from '../../server/src/text/language.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import { BILINGUAL_PAGES } from '../support/bilingualPages.js';

const profiles = new Profiles();
const folder = join(import.meta.dirname, '../../samples/buoys');
const pages = readdirSync(folder, { recursive: true, encoding: 'utf8' })
  .filter((name) => name.endsWith('.md'))
  .sort()
  .map((name) => readFileSync(join(folder, name), 'utf8'));
const paragraphs = pages.flatMap((page) => page.split(/\n{2,}/)).filter((text) => text.length > 40);
const root = 'file:///docs/';
const termbaseUri = `${root}termbase.yaml`;
const TERMBASES = [
  undefined,
  'evenword: 1\nconcepts:\n  - preferred: dataset\n    deprecated: [data set]\n',
  'evenword: 1\napart:\n  - [email, e-mail]\nconcepts:\n  - preferred: timestamp\n    admitted: [time stamp]\n',
  'evenword: 1\nconcepts: [broken\n',
];

const sourceOf = (uri: string, text: string): SourceText => withPathLanguage({ uri, format: 'markdown', text }, root);

/** Everything that a user can see of a snapshot. */
function seen(snapshot: Snapshot): unknown {
  const { open } = snapshot.agendaAt(root);
  const findings = [...snapshot.documents.keys()].sort().map((uri) => [uri, snapshot.findingsIn(uri)]);
  return JSON.parse(JSON.stringify({ open, findings, size: snapshot.relations.size })) as unknown;
}

// Every third page is in a folder of translations, whatever language it comes to be in.
const uri = fc.integer({ min: 0, max: 5 }).map((n) => `${root}${n % 3 === 0 ? 'fr/' : ''}page${n}.md`);
const french = Object.entries(BILINGUAL_PAGES).flatMap(([name, page]) =>
  name.includes('fr') ? page.split(/\n{2,}/) : [],
);
const text = fc
  .array(
    fc.oneof(
      { weight: 4, arbitrary: fc.nat({ max: paragraphs.length - 1 }).map((at) => paragraphs[at]!) },
      { weight: 1, arbitrary: fc.constantFrom(...french) },
    ),
    { maxLength: 40 },
  )
  .map((picks) => picks.join('\n\n'));
const step = fc.oneof(
  { weight: 4, arbitrary: fc.record({ kind: fc.constant('write' as const), uri, text, open: fc.boolean() }) },
  { weight: 1, arbitrary: fc.record({ kind: fc.constant('delete' as const), uri }) },
  {
    weight: 2,
    arbitrary: fc.record({
      kind: fc.constant('splice' as const),
      uri,
      at: fc.nat(),
      length: fc.nat({ max: 300 }),
      insert: text,
    }),
  },
  // A broken termbase leaves the last good one in force: that is the one thing that may depend on history.
  {
    weight: 1,
    arbitrary: fc.record({ kind: fc.constant('termbase' as const), which: fc.integer({ min: 0, max: 2 }) }),
  },
  { weight: 2, arbitrary: fc.record({ kind: fc.constant('settle' as const), rests: fc.nat({ max: 30 }) }) },
);

describe('an engine', () => {
  it('shows the same after any history of edits as when it is given the last texts at once', () => {
    fc.assert(
      fc.property(fc.array(step, { minLength: 3, maxLength: 14 }), (steps) => {
        const incremental = new Engine(profiles);
        const texts = new Map<string, string>();
        let termbase: string | undefined;
        for (const each of steps) {
          if (each.kind === 'settle') {
            // Some settlements are given up halfway, as an editor does when the next key comes.
            const work = incremental.settle();
            for (let rest = 0; rest < each.rests; rest++) if (work.next().done === true) break;
          } else if (each.kind === 'termbase') {
            termbase = TERMBASES[each.which];
            incremental.apply({ termbases: [{ uri: termbaseUri, text: termbase }] });
          } else if (each.kind === 'delete') {
            texts.delete(each.uri);
            incremental.apply({ documents: [{ uri: each.uri, source: undefined }] });
          } else {
            const before = texts.get(each.uri) ?? '';
            const at = each.kind === 'splice' ? each.at % (before.length + 1) : 0;
            const after =
              each.kind === 'write' ? each.text : before.slice(0, at) + each.insert + before.slice(at + each.length);
            texts.set(each.uri, after);
            const open = each.kind === 'splice' || each.open;
            incremental.apply({ documents: [{ uri: each.uri, source: sourceOf(each.uri, after), open }] });
          }
        }
        finish(incremental.settle());
        const batch = new Engine(profiles);
        batch.apply({
          documents: [...texts].map(([at, last]) => ({ uri: at, source: sourceOf(at, last) })),
          termbases: [{ uri: termbaseUri, text: termbase }],
        });
        finish(batch.settle());
        expect(seen(incremental.snapshot)).toEqual(seen(batch.snapshot));
      }),
      { numRuns: 25 },
    );
  }, 120_000);

  it('keeps the last good decisions in force while a termbase is broken', () => {
    const engine = new Engine(profiles);
    const page = `${root}page.md`;
    engine.apply({
      documents: [{ uri: page, source: sourceOf(page, 'Send the data set today.\n') }],
      termbases: [{ uri: termbaseUri, text: TERMBASES[1] }],
    });
    expect(engine.snapshot.findingsIn(page).map(({ code }) => code)).toEqual(['deprecated-term']);
    const broken = engine.apply({ termbases: [{ uri: termbaseUri, text: TERMBASES[3] }] });
    expect(broken.termbases[0]!.usable).toBe(false);
    expect(broken.findingsIn(page).map(({ code }) => code)).toEqual(['deprecated-term']);
    expect(engine.apply({ termbases: [{ uri: termbaseUri, text: undefined }] }).findingsIn(page)).toEqual([]);
  });

  it('hands out snapshots that later changes leave alone', () => {
    const engine = new Engine(profiles);
    const page = `${root}page.md`;
    const first = engine.apply({ documents: [{ uri: page, source: sourceOf(page, pages[0]!), open: true }] });
    const before = seen(first);
    engine.apply({
      documents: [{ uri: page, source: sourceOf(page, pages[1]!), open: true }],
      termbases: [{ uri: termbaseUri, text: TERMBASES[1] }],
    });
    finish(engine.settle());
    expect(seen(first)).toEqual(before);
  });
});
