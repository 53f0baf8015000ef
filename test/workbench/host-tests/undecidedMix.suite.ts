// A mix that nobody has decided: it is a hint, and its answer lands in termbase.yaml and is held from then on.
import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { until } from '../until.js';
import { termbase } from '../workspace.js';
import { findings, findingsOf, hoverAt, onDisk, quickFixesAt, rangeOf, show, take } from './editor.js';

describe('an undecided mix', () => {
  const prefer = 'Prefer “data logger”';

  it('is a hint, never a warning', async () => {
    const document = await show('installing.md');
    const [first] = await until('a hint on the mix', () => {
      const found = findings(document, 'mixed-terms');
      return found.length > 0 && found;
    });
    assert.ok(first);
    assert.equal(first.severity, vscode.DiagnosticSeverity.Hint);
    assert.match(document.getText(first.range), /^data ?logger$/);
    assert.deepEqual(findings(document, 'deprecated-term'), []);
  });

  it('names its rival in the hover', async () => {
    const document = await show('installing.md');
    assert.match(await hoverAt(document, rangeOf(document, 'datalogger').start), /data logger/);
  });

  it('offers every answer', async () => {
    const document = await show('installing.md');
    const titles = (await quickFixesAt(document, rangeOf(document, 'datalogger'), prefer)).map(
      (action) => action.title,
    );
    for (const start of ['Prefer “datalogger”', 'Either is fine: ', 'Two concepts: ']) {
      assert.ok(
        titles.some((title) => title.startsWith(start)),
        `${start} is among ${titles.join(' | ')}`,
      );
    }
  });

  it('is decided by an answer, which is written to termbase.yaml and touches nothing else in it', async () => {
    const document = await show('installing.md');
    await take(await quickFixesAt(document, rangeOf(document, 'datalogger'), prefer), prefer);
    const after = await until('the answer on disk', async () => {
      const text = await onDisk('termbase.yaml');
      return text !== termbase && text;
    });
    assert.ok(after.startsWith(termbase), after);
    assert.match(after.slice(termbase.length), /preferred: data logger/);
    assert.match(after.slice(termbase.length), /deprecated:[\s\S]*datalogger/);
  });

  it('is then a decision: no hint is left, and the deprecated name is a warning', async () => {
    const document = await show('installing.md');
    const found = await findingsOf(document, 'deprecated-term', 3);
    for (const one of found) assert.equal(document.getText(one.range), 'datalogger');
    await findingsOf(document, 'mixed-terms', 0);
  });
});
