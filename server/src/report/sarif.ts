// Findings as SARIF 2.1.0 (OASIS), for code review and continuous integration.
import { hashText } from '../base/hash.js';
import type { Finding, FindingCode, Severity } from '../findings/finding.js';
import { startsSentence } from '../rewrite/sentence.js';
import type { Position } from '../text/lineIndex.js';
import { RULES } from './sarifRules.js';

/** A finding with its document, its zero-based places in the source, and the text of its block. */
export interface SarifFinding {
  readonly uri: string;
  readonly finding: Finding;
  readonly start: Position;
  readonly end: Position;
  readonly blockText: string;
}

/** The name under which a run gives the folder that its relative addresses start from. */
const BASE = 'DOCUMENTATION';

const LEVELS: Readonly<Record<Severity, 'note' | 'warning'>> = {
  hint: 'note',
  information: 'note',
  warning: 'warning',
};

/**
 * Writes findings as one SARIF run, results in the order given. Lines and columns count from 1, columns in UTF-16 units, the
 * end exclusive. The fingerprint `contextHash/v1` comes from the term and its sentence, so that it survives edits elsewhere.
 */
export function toSarif(findings: readonly SarifFinding[], rootUri: string, version: string): string {
  const base = rootUri.endsWith('/') ? rootUri : `${rootUri}/`;
  const rules = Object.entries(RULES) as [FindingCode, (typeof RULES)[FindingCode]][];
  const seen = new Map<string, number>();
  const results = findings.map((placed) => {
    const { uri, finding, start, end } = placed;
    const hash = contextHash(placed);
    // A sentence may hold one term twice: the second is told apart by its number.
    const nth = (seen.get(`${uri} ${hash}`) ?? 0) + 1;
    seen.set(`${uri} ${hash}`, nth);
    return {
      ruleId: finding.code,
      ruleIndex: rules.findIndex(([code]) => code === finding.code),
      level: LEVELS[finding.severity],
      message: { text: finding.message },
      locations: [
        {
          physicalLocation: {
            artifactLocation: uri.startsWith(base) ? { uri: uri.slice(base.length), uriBaseId: BASE } : { uri },
            region: {
              startLine: start.line + 1,
              startColumn: start.character + 1,
              endLine: end.line + 1,
              endColumn: end.character + 1,
            },
          },
        },
      ],
      partialFingerprints: { 'contextHash/v1': `${hash}:${nth}` },
      properties: { term: finding.term, ...(finding.preferred !== undefined && { preferred: finding.preferred }) },
    };
  });
  const log = {
    $schema: 'https://json.schemastore.org/sarif-2.1.0.json',
    version: '2.1.0',
    runs: [
      {
        tool: {
          driver: {
            name: 'Evenword',
            semanticVersion: version,
            rules: rules.map(([id, { short, full, help, level }]) => ({
              id,
              shortDescription: { text: short },
              fullDescription: { text: full },
              help: { text: help },
              defaultConfiguration: { level },
            })),
          },
        },
        columnKind: 'utf16CodeUnits',
        originalUriBaseIds: {
          [BASE]: { uri: base, description: { text: 'The folder that holds the documentation.' } },
        },
        results,
      },
    ],
  };
  return `${JSON.stringify(log, undefined, 2)}\n`;
}

/** A hash, in hexadecimal digits, of a finding's rule, its term and its sentence with white space folded. */
export function contextHash({ finding, blockText }: Pick<SarifFinding, 'finding' | 'blockText'>): string {
  const { code, term, proseSpan } = finding;
  const sentence = sentenceAround(blockText, proseSpan.start, proseSpan.end).replace(/\s+/g, ' ').trim();
  return hashText(`${code}\n${term}\n${sentence}`).toString(16).padStart(14, '0');
}

/** The sentence (or several, where the span crosses their border) that holds a span of a block's text. */
function sentenceAround(text: string, start: number, end: number): string {
  let from = start;
  while (from > 0 && !startsSentence(text, from)) from--;
  let until = end;
  while (until < text.length && !(/\S/.test(text.charAt(until)) && startsSentence(text, until))) until++;
  return text.slice(from, until);
}
