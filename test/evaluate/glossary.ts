// RFC 4949, the Internet Security Glossary: what it calls synonyms, and what it forbids to use as synonyms.
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { compareCodeUnits } from '../../server/src/base/order.js';
import type { SourceText } from '../../server/src/text/sourceText.js';
import { ask } from './asked.js';
import { usesOf } from './funnel.js';
import { DATA } from './gold.js';
import { placeAsked } from './match.js';

/** Fewest uses of both terms, in the glossary's own text, of a pair that is looked up. */
const FEWEST_USES = 3;

/** A pair that the glossary relates, by its own words. */
export interface GlossaryPair {
  readonly a: string;
  readonly b: string;
  /** `recommended`: an entry of status I, N or O; `deprecated`: one of status D, whose use is discouraged. */
  readonly status: 'recommended' | 'deprecated';
}

/** The pairs of the glossary. Pairs that it forbids to confuse are in `apart` alone. */
export interface GlossaryPairs {
  readonly synonyms: readonly GlossaryPair[];
  readonly apart: readonly GlossaryPair[];
}

/** One entry: its headword as written and its text. */
export interface GlossaryEntry {
  readonly head: string;
  readonly text: string;
}

/** How the glossary's pairs fared in a mining of its own text. */
export interface GlossaryResult {
  readonly words: number;
  /** By status: pairs read, those with both terms used enough, those asked by default, and with the look-alikes. */
  readonly synonyms: readonly GlossaryFate[];
  readonly apart: GlossaryFate;
  /** The pairs kept apart that are asked about. */
  readonly apartAsked: readonly string[];
}

export interface GlossaryFate {
  readonly status: GlossaryPair['status'] | 'apart';
  readonly read: number;
  readonly used: number;
  readonly asked: number;
  readonly askedWithLookAlikes: number;
}

/** Mines the glossary, one document an initial letter, and looks up its own pairs; undefined where it is not there. */
export function evaluateGlossary(file = join(DATA, 'rfc4949.txt')): GlossaryResult | undefined {
  if (!existsSync(file)) return undefined;
  const entries = readEntries(readFileSync(file, 'utf8'));
  const { synonyms, apart } = readPairs(entries);
  const { corpus, words, byDefault, withLookAlikes } = ask(documentsOf(entries));
  const asked = (pairs: readonly GlossaryPair[], status: GlossaryFate['status']) => {
    const used = pairs.filter(
      ({ a, b }) => corpus !== undefined && Math.min(usesOf(corpus, a), usesOf(corpus, b)) >= FEWEST_USES,
    );
    const found = used.filter(({ a, b }) => placeAsked(withLookAlikes, a, b, 'open') > 0);
    const foundByDefault = used.filter(({ a, b }) => placeAsked(byDefault, a, b, 'open') > 0);
    return {
      fate: {
        ...{ status, read: pairs.length, used: used.length },
        ...{ asked: foundByDefault.length, askedWithLookAlikes: found.length },
      },
      found,
    };
  };
  const forbidden = asked(apart, 'apart');
  return {
    words,
    synonyms: (['recommended', 'deprecated'] as const).map(
      (status) =>
        asked(
          synonyms.filter((pair) => pair.status === status),
          status,
        ).fate,
    ),
    apart: forbidden.fate,
    apartAsked: forbidden.found.map(({ a, b }) => `${a} / ${b}`),
  };
}

/** The entries of section 4, without what belongs to printed pages. */
export function readEntries(rfc: string): GlossaryEntry[] {
  const lines = rfc
    .replace(/\r/g, '')
    .split('\n')
    .filter((line) => !/^\f|^Shirey +Informational +\[Page|^RFC 4949 +Internet Security Glossary/.test(line));
  const from = lines.findIndex((line) => /^4\. +Definitions/.test(line) && !/\d$/.test(line));
  const to = lines.findIndex((line, at) => at > from && /^5\. /.test(line));
  const entries: { head: string; lines: string[] }[] = [];
  for (const line of lines.slice(from + 1, to < 0 ? lines.length : to)) {
    const head = /^ {3}\$ (.+)$/.exec(line)?.[1];
    if (head !== undefined) entries.push({ head: head.trim(), lines: [] });
    else entries.at(-1)?.lines.push(line.replace(/^ {6}/, ''));
  }
  return entries.map(({ head, lines: own }) => ({
    head,
    text: own
      .join('\n')
      .replace(/\n{3,}/g, '\n\n')
      .trim(),
  }));
}

/** Entries by initial letter as plain texts; a headword is a line of its own with a rule under it. */
function documentsOf(entries: readonly GlossaryEntry[]): SourceText[] {
  const pages = new Map<string, string[]>();
  for (const { head, text } of entries) {
    const initial = /[a-z]/.exec(head.toLowerCase())?.[0] ?? '0';
    const page = pages.get(initial) ?? [];
    pages.set(initial, page);
    page.push(`${head}\n${'-'.repeat(Math.max(4, head.length))}\n\n${text}\n`);
  }
  return [...pages]
    .sort(([a], [b]) => compareCodeUnits(a, b))
    .map(([initial, page]) => ({
      uri: `file:///glossary/${initial}.txt`,
      format: 'plaintext',
      text: page.join('\n'),
    }));
}

const DEFINITION = /(?:^|\n\n)(?:\d+[a-z]?\. )?\(([INOD])\) (.*?)(?=\n\n|$)/gs;
const SYNONYM = /(?:^|[;.] )(?:\/[^/]+\/ )*(?:A )?[Ss]ynonyms? for ("[^"]+"(?:(?:,| or|, or) "[^"]+")*)/;
const FORBIDDEN =
  /SHOULD\s+NOT\s+use\s+(?:this|the)\s+term\s+as\s+a?\s*synonym\s+for\s+((?:"[^"]+"(?:,?\s+or\s+|,\s+)?)+)/g;

/** Reads the pairs off the entries: only terms in quotation marks right after the phrase are taken. */
export function readPairs(entries: readonly GlossaryEntry[]): GlossaryPairs {
  const synonyms: GlossaryPair[] = [];
  const apart: GlossaryPair[] = [];
  for (const { head, text } of entries) {
    const a = termOfHead(head);
    const forbidden = [...text.matchAll(FORBIDDEN)].flatMap(([, terms]) => quoted(terms!));
    const deprecatedWhole = [...text.matchAll(DEFINITION)].every(([, status]) => status === 'D');
    for (const b of forbidden) apart.push({ a, b, status: deprecatedWhole ? 'deprecated' : 'recommended' });
    for (const [, status, definition] of text.matchAll(DEFINITION)) {
      const terms = SYNONYM.exec(definition!.replace(/\s+/g, ' '))?.[1];
      for (const b of quoted(terms ?? '')) {
        if (!forbidden.includes(b) && a !== b)
          synonyms.push({ a, b, status: status === 'D' ? 'deprecated' : 'recommended' });
      }
    }
  }
  return { synonyms: distinct(synonyms), apart: distinct(apart) };
}

function quoted(text: string): string[] {
  return [...text.matchAll(/"([^"]+)"/g)].map(([, term]) => term!.replace(/\s+/g, ' ').replace(/[.,;]$/, ''));
}

/** Without the short form in parentheses and the marks that number equal headwords. */
function termOfHead(head: string): string {
  return head.replace(/\s*\(.*$/, '').trim();
}

function distinct(pairs: readonly GlossaryPair[]): GlossaryPair[] {
  return [...new Map(pairs.map((pair) => [`${pair.a}|${pair.b}`.toLowerCase(), pair])).values()];
}
