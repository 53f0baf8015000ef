// SARIF: against the schema of the standard, and places and fingerprints by hand.
import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import Ajv from 'ajv-draft-04';
import addFormats from 'ajv-formats';
import { describe, expect, it } from 'vitest';
import type { Snapshot } from '../../../server/src/engine/snapshot.js';
import { toSarif } from '../../../server/src/report/sarif.js';
import type { SarifFinding } from '../../../server/src/report/sarif.js';
import { LineIndex } from '../../../server/src/text/lineIndex.js';
import { ROOT, snapshotOf } from './workspace.js';

// The schema as OASIS publishes it (SARIF 2.1.0, Errata 01).
const schemaFile = resolve(import.meta.dirname, '../../../../shared/data/sarif/sarif-schema-2.1.0.json');

const TERMBASE = 'concepts:\n  - preferred: access key\n    deprecated: [API key]\n';
const PAGES = { 'deep%20folder/b%20c.md': 'Intro.\n\n😀 The API key expires. An API key and an API key are two.\n' };

interface Result {
  readonly ruleId: string;
  readonly ruleIndex: number;
  readonly locations: readonly {
    readonly physicalLocation: { readonly artifactLocation: object; readonly region: object };
  }[];
  readonly partialFingerprints: Readonly<Record<string, string>>;
}

interface Log {
  readonly runs: readonly {
    readonly columnKind: string;
    readonly originalUriBaseIds: Readonly<Record<string, { readonly uri: string }>>;
    readonly tool: { readonly driver: { readonly rules: readonly { readonly id: string }[] } };
    readonly results: readonly Result[];
  }[];
}

function findingsIn(snapshot: Snapshot): SarifFinding[] {
  return [...snapshot.documents].flatMap(([uri, { source }]) => {
    const lines = new LineIndex(source.text);
    const { blocks } = snapshot.readingOf(uri)!.prose;
    return snapshot.findingsIn(uri).map((finding) => ({
      ...{ uri, finding, blockText: blocks[finding.block]!.content.text },
      start: lines.positionAt(finding.span.start),
      end: lines.positionAt(finding.span.end),
    }));
  });
}

function runOf(pages: Readonly<Record<string, string>>): Log['runs'][number] {
  return (JSON.parse(toSarif(findingsIn(snapshotOf(pages, TERMBASE)), ROOT, '1.2.3')) as Log).runs[0]!;
}

describe('findings as SARIF', () => {
  it.skipIf(!existsSync(schemaFile))(`is valid by the schema of OASIS (skipped without ../shared)`, () => {
    const ajv = new Ajv({ strict: false, allErrors: true });
    addFormats(ajv);
    const validate = ajv.compile(JSON.parse(readFileSync(schemaFile, 'utf8')) as object);
    for (const pages of [PAGES, { 'a.md': 'Nothing.' }]) {
      const log: unknown = JSON.parse(toSarif(findingsIn(snapshotOf(pages, TERMBASE)), ROOT, '1.2.3'));
      expect(validate(log), JSON.stringify(validate.errors)).toBe(true);
    }
    const broken = toSarif([], ROOT, '1.2.3').replace('utf16CodeUnits', 'utf8CodeUnits');
    expect(validate(JSON.parse(broken))).toBe(false);
  });

  it('gives places from 1 in UTF-16 units, the end exclusive, addresses relative to the folder', () => {
    const { columnKind, results, originalUriBaseIds } = runOf(PAGES);
    expect(columnKind).toBe('utf16CodeUnits');
    const [{ artifactLocation, region }] = results.map(({ locations }) => locations[0]!.physicalLocation) as [
      Result['locations'][number]['physicalLocation'],
    ];
    // "😀 The " is 7 units, the emoji two of them.
    expect(region).toEqual({ startLine: 3, startColumn: 8, endLine: 3, endColumn: 15 });
    expect(artifactLocation).toEqual({ uri: 'deep%20folder/b%20c.md', uriBaseId: 'DOCUMENTATION' });
    expect(originalUriBaseIds.DOCUMENTATION!.uri).toBe(ROOT);
  });

  it('names its rules', () => {
    const { tool, results } = runOf(PAGES);
    expect(results).toHaveLength(3);
    for (const { ruleId, ruleIndex } of results) expect(tool.driver.rules[ruleIndex]!.id).toBe(ruleId);
  });

  it('has fingerprints that differ within a page and survive edits elsewhere', () => {
    const prints = (pages: Readonly<Record<string, string>>): string[] =>
      runOf(pages).results.map(({ partialFingerprints }) => partialFingerprints['contextHash/v1']!);
    const before = prints(PAGES);
    expect(new Set(before).size).toBe(3);
    const moved = {
      'other.md': `# New\n\nMore text here.\n\n${PAGES['deep%20folder/b%20c.md'].replace('expires. An', 'expires.\nAn')}`,
    };
    expect(prints(moved)).toEqual(before);
    const reworded = { 'other.md': PAGES['deep%20folder/b%20c.md'].replace('expires', 'ends') };
    expect(prints(reworded)).toEqual([expect.not.stringMatching(before[0]!), ...before.slice(1)]);
  });
});
