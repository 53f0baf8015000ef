// Odd companions: a verb that is allowed beside another, with an object with which the documents nearly always use the other.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { Engine } from '../../../server/src/engine/engine.js';
import { Profiles } from '../../../server/src/engine/factsOf.js';
import type { Snapshot } from '../../../server/src/engine/snapshot.js';
import { quickFixesAt } from '../../../server/src/ide/codeActions.js';

const profiles = new Profiles();
const ROOT = 'file:///docs/';

const DECIDED = 'concepts:\n  - preferred: run\n    admitted: [execute]\n    partOfSpeech: verb\n';
/** Pages that say “run the job” so many times, each sentence in words of its own. */
const usual = (times: number): Record<string, string> =>
  Object.fromEntries(
    Array.from({ length: times }, (_, at) => [`run${at}.md`, `You can run the job at ${at} o'clock. It ends at noon.`]),
  );
const ODD = 'At night the operator must execute the job by hand. The crew will execute the order.';

function snapshotOf(pages: Readonly<Record<string, string>>, termbase = DECIDED): Snapshot {
  const engine = new Engine(profiles);
  engine.apply({
    documents: Object.entries(pages).map(([name, text]) => ({
      uri: ROOT + name,
      source: { uri: ROOT + name, format: 'markdown', text },
    })),
    termbases: [{ uri: `${ROOT}termbase.yaml`, text: termbase }],
  });
  return finish(engine.settle());
}

const findings = (snapshot: Snapshot, page = 'odd.md') =>
  snapshot
    .findingsIn(ROOT + page)
    .map(({ code, severity, surface, preferred }) => [code, severity, surface, preferred]);

describe('an odd companion', () => {
  it('is a hint where the documents say the other verb with this object far more often', () => {
    const snapshot = snapshotOf({ ...usual(20), 'odd.md': ODD });
    expect(findings(snapshot)).toEqual([['odd-companion', 'hint', 'execute', 'run']]);
    expect(snapshot.findingsIn(`${ROOT}odd.md`)[0]!.message).toBe(
      '“execute” seldom goes with “job” here: this documentation says “run” 20 times and “execute” once. Both are allowed; use the usual one unless you mean to differ.',
    );
    expect(findings(snapshot, 'run3.md')).toEqual([]);
  });

  it('is found in the passive and in other forms, and its fix keeps the form', () => {
    const text = 'The operator sees that the job is executed at night.';
    const snapshot = snapshotOf({ ...usual(20), 'odd.md': text });
    expect(findings(snapshot)).toEqual([['odd-companion', 'hint', 'executed', 'run']]);
    const at = text.indexOf('executed');
    const [fix] = quickFixesAt(snapshot, `${ROOT}odd.md`, { start: at, end: at });
    expect(fix).toMatchObject({ kind: 'replace', title: 'Use “run” here', edits: [{ newText: 'run' }] });
    const past = snapshotOf({ ...usual(20), 'odd.md': 'The operator has executed the job.' });
    expect(findings(past)).toEqual([['odd-companion', 'hint', 'executed', 'run']]);
  });

  it('is none below ten times as often, below ten uses, or where an even choice could come out so', () => {
    expect(findings(snapshotOf({ ...usual(9), 'odd.md': ODD }))).toEqual([]);
    // 10 to 1 against an even choice is G² 8.55: worth p = .0035, which is not enough.
    expect(findings(snapshotOf({ ...usual(10), 'odd.md': ODD }))).toEqual([]);
    const twice = 'Execute the job at dawn. The crew must execute the job at dusk.';
    expect(findings(snapshotOf({ ...usual(19), 'odd.md': twice }))).toEqual([]);
  });

  it('is none for verbs that nobody has decided to be one, and none for the preferred verb', () => {
    expect(findings(snapshotOf({ ...usual(20), 'odd.md': ODD }, ''))).toEqual([]);
    const apart = 'apart:\n  - [run, execute]\n';
    expect(findings(snapshotOf({ ...usual(20), 'odd.md': ODD }, apart))).toEqual([]);
    const turned = 'concepts:\n  - preferred: execute\n    admitted: [run]\n    partOfSpeech: verb\n';
    expect(findings(snapshotOf({ ...usual(20), 'odd.md': ODD }, turned))).toEqual([]);
    const deprecated = 'concepts:\n  - preferred: run\n    deprecated: [execute]\n    partOfSpeech: verb\n';
    expect(findings(snapshotOf({ ...usual(20), 'odd.md': ODD }, deprecated)).map(([code]) => code)).toEqual([
      'deprecated-term',
      'deprecated-term',
    ]);
  });

  it('minds the objects that a decision is about', () => {
    const other = `${DECIDED}    with: [script]\n`;
    expect(findings(snapshotOf({ ...usual(20), 'odd.md': ODD }, other))).toEqual([]);
    const same = `${DECIDED}    with: [job]\n`;
    expect(findings(snapshotOf({ ...usual(20), 'odd.md': ODD }, same))).toHaveLength(1);
  });

  it('stays as it is where the document asks for it', () => {
    const kept = `<!-- evenword: keep -->\n${ODD}`;
    expect(findings(snapshotOf({ ...usual(20), 'odd.md': kept }))).toEqual([]);
  });

  it('depends on the documents alone, not on the order in which they came', () => {
    const pages = { ...usual(20), 'odd.md': ODD };
    const engine = new Engine(profiles);
    engine.apply({ termbases: [{ uri: `${ROOT}termbase.yaml`, text: DECIDED }] });
    for (const [name, text] of Object.entries(pages).reverse()) {
      engine.apply({
        documents: [{ uri: ROOT + name, source: { uri: ROOT + name, format: 'markdown', text: `${text} More.` } }],
      });
      finish(engine.settle());
      engine.apply({ documents: [{ uri: ROOT + name, source: { uri: ROOT + name, format: 'markdown', text } }] });
    }
    const incremental = finish(engine.settle());
    expect(incremental.findingsIn(`${ROOT}odd.md`)).toEqual(snapshotOf(pages).findingsIn(`${ROOT}odd.md`));
  });
});
