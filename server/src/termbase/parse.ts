// Reading termbase.yaml: the sound parts as data, everything else as problems with their place.
import { isMap, isScalar, isSeq, type ParsedNode } from 'yaml';
import type { Span } from '../base/span.js';
import { checkConsistency } from './consistency.js';
import { APART_KEYS, LATER_KEYS, TOP_KEYS } from './format.js';
import { readConcept, readLanguage, readNames } from './readConcept.js';
import { isEmpty, Reading, spanOf, type Field } from './reading.js';
import {
  emptyTermbase,
  FORMAT_VERSION,
  type ApartEntry,
  type ConceptEntry,
  type LaterEntry,
  type Termbase,
  type TermbaseProblem,
  type TermRef,
} from './termbase.js';
import { readYaml, type YamlTree } from './yamlTree.js';

/** What reading a file gives. */
export interface ParsedTermbase {
  /** The sound parts of the file. */
  readonly termbase: Termbase;
  /** In the order of their places. */
  readonly problems: readonly TermbaseProblem[];
  /** False where there is any error: the caller keeps the last good termbase in force. */
  readonly usable: boolean;
}

/**
 * Reads the text of a `termbase.yaml`; it never throws. An empty file, or one of comments alone, is a sound empty termbase.
 * @param uri where the text is from: kept with the termbase, not opened.
 */
export function parseTermbase(text: string, uri: string): ParsedTermbase {
  return termbaseOf(readYaml(text), uri);
}

/** Reads a file whose YAML tree is at hand already; otherwise as {@link parseTermbase}. */
export function termbaseOf({ document, problems: syntax }: YamlTree, uri: string): ParsedTermbase {
  const reading = new Reading();
  reading.problems.push(...syntax);
  const root = document?.contents;
  let termbase = emptyTermbase(uri);
  // Where the syntax is broken the tree is a guess, and complaints about a guess would only hide the real error.
  if (!isEmpty(root)) termbase = readTop(syntax.length > 0 ? new Reading() : reading, root as ParsedNode, uri);
  checkConsistency(reading, termbase);
  const problems = [...reading.problems].sort((a, b) => a.span.start - b.span.start || a.span.end - b.span.end);
  return { termbase, problems, usable: !problems.some(({ severity }) => severity === 'error') };
}

function readTop(reading: Reading, root: ParsedNode, uri: string): Termbase {
  const map = reading.map(root, spanOf(root), 'A termbase');
  if (map === undefined) return emptyTermbase(uri);
  const fields = reading.fields(map, TOP_KEYS, 'A termbase');
  if (!readVersion(reading, fields.get('evenword'))) return emptyTermbase(uri);
  const language = readLanguage(reading, fields.get('language'));
  return {
    uri,
    ...(language !== undefined && { language }),
    concepts: readItems(reading, fields.get('concepts'), '“concepts”', readConcept),
    apart: readItems(reading, fields.get('apart'), '“apart”', readApart),
    later: readItems(reading, fields.get('later'), '“later”', readLater),
  };
}

function readItems<T extends ConceptEntry | ApartEntry | LaterEntry>(
  reading: Reading,
  field: Field | undefined,
  what: string,
  read: (reading: Reading, node: ParsedNode) => T | undefined,
): T[] {
  if (field === undefined) return [];
  return reading.list(field.value, field.keySpan, what).flatMap((node) => {
    const item = read(reading, node);
    return item === undefined ? [] : [item];
  });
}

/** False where the file is of a format that this program cannot read; then nothing in it may be taken at its word. */
function readVersion(reading: Reading, field: Field | undefined): boolean {
  if (field === undefined) return true;
  const version = isScalar(field.value) ? field.value.value : undefined;
  if (version === FORMAT_VERSION) return true;
  const span = isEmpty(field.value) ? field.keySpan : spanOf(field.value);
  const newer = typeof version === 'number' && Number.isInteger(version) && version > FORMAT_VERSION;
  const message = newer
    ? `This file is in format ${version}, which this version of Evenword does not know (it reads format ${FORMAT_VERSION}). Install a newer Evenword.`
    : `“evenword” gives the version of the file format, which must be the number ${FORMAT_VERSION}. Write “evenword: ${FORMAT_VERSION}”.`;
  reading.error('format-version', span, message);
  return false;
}

function readApart(reading: Reading, node: ParsedNode): ApartEntry | undefined {
  const entry = readGroup(reading, node, APART_KEYS, 'An “apart” entry');
  if (entry === undefined) return undefined;
  const note = reading.text(entry.fields.get('note'), 'The note');
  return { terms: entry.terms, ...(note !== undefined && { note }), span: spanOf(node) };
}

function readLater(reading: Reading, node: ParsedNode): LaterEntry | undefined {
  const entry = readGroup(reading, node, LATER_KEYS, 'A “later” entry');
  if (entry === undefined) return undefined;
  const note = reading.text(entry.fields.get('note'), 'The note');
  const uses = readUses(reading, entry.fields.get('uses'));
  return {
    terms: entry.terms,
    ...(uses !== undefined && { uses }),
    ...(note !== undefined && { note }),
    span: spanOf(node),
  };
}

/** A list of at least two names, or a mapping with that list under `terms`. */
function readGroup<K extends string>(
  reading: Reading,
  node: ParsedNode,
  keys: readonly K[],
  what: string,
): { terms: TermRef[]; fields: Map<K, Field> } | undefined {
  const span: Span = spanOf(node);
  const fields = isMap(node) ? reading.fields(node, keys, what) : new Map<K, Field>();
  const list = isMap(node) ? fields.get('terms' as K) : isSeq(node) ? { keySpan: span, value: node } : undefined;
  if (list === undefined) {
    if (isMap(node)) reading.error('too-few-terms', span, `${what} needs its terms. Add “terms: [one, other]”.`);
    else reading.wrongType(node, span, what, 'a list of terms, such as [one, other]');
    return undefined;
  }
  if (!isEmpty(list.value) && !isSeq(list.value)) {
    reading.wrongType(list.value, list.keySpan, '“terms”', 'a list of terms, such as [one, other]');
    return undefined;
  }
  const terms = readNames(reading, list, 'A term');
  const written = isSeq(list.value) ? list.value.items.length : 0;
  if (new Set(terms.map(({ text }) => text)).size >= 2) return { terms, fields };
  if (written < 2 || terms.length === written) {
    reading.error(
      'too-few-terms',
      span,
      `${what} needs at least two different terms. Add the other, or remove the entry.`,
    );
  }
  return undefined;
}

function readUses(reading: Reading, field: Field | undefined): number | undefined {
  if (field === undefined) return undefined;
  const uses = isScalar(field.value) ? field.value.value : undefined;
  if (typeof uses === 'number' && Number.isSafeInteger(uses) && uses >= 0) return uses;
  reading.wrongType(
    field.value,
    field.keySpan,
    '“uses”',
    'a whole number, the uses counted when the question was put off',
  );
  return undefined;
}
