// A term that the team has deprecated: it is marked, explained and replaced.
import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { findings, findingsOf, hoverAt, quickFixesAt, rangeOf, show, take } from './editor.js';

describe('a deprecated term', () => {
  it('is a warning on each use in prose, and on none in code', async () => {
    const document = await show('connecting.md');
    const found = await findingsOf(document, 'deprecated-term', 2);
    assert.deepEqual(
      found.map((one) => one.range),
      [rangeOf(document, 'API key', 0), rangeOf(document, 'API key', 1)],
    );
    for (const one of found) {
      assert.equal(one.severity, vscode.DiagnosticSeverity.Warning);
      assert.match(one.message, /access key/);
    }
  });

  it('shows the card of its concept in the hover', async () => {
    const document = await show('connecting.md');
    const text = await hoverAt(document, rangeOf(document, 'API key').start);
    assert.match(text, /API key/);
    assert.match(text, /access key/);
    assert.match(text, /deprecated/i);
  });

  it('is replaced by the quick fix', async () => {
    const document = await show('connecting.md');
    const title = 'Use “access key” here';
    await take(await quickFixesAt(document, rangeOf(document, 'API key'), title), title);
    assert.equal(
      document.lineAt(2).text,
      'An access key lets a station send its readings to the archive. Store the API key where',
    );
    await findingsOf(document, 'deprecated-term', 1);
    await vscode.commands.executeCommand('undo');
    await findingsOf(document, 'deprecated-term', 2);
  });
});

describe('a page that keeps to the decisions', () => {
  it('shows nothing', async () => {
    const quiet = await show('quiet.md');
    await findingsOf(await show('connecting.md'), 'deprecated-term', 2); // The survey has been made.
    assert.deepEqual(findings(quiet), []);
  });
});
