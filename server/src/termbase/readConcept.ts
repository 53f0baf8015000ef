// One concept of the file: its terms by status and what is said about it.
import { isMap, isScalar, isSeq, type ParsedNode } from 'yaml';
import type { Span } from '../base/span.js';
import { CONCEPT_KEYS, ID_PATTERN, LANGUAGE_PATTERN, TERM_KEYS } from './format.js';
import { isEmpty, spanOf, type Field, type Node, type Reading } from './reading.js';
import {
  PARTS_OF_SPEECH,
  TERM_TYPES,
  type ConceptEntry,
  type PartOfSpeech,
  type TermEntry,
  type TermRef,
  type TermStatus,
} from './termbase.js';

type ConceptFields = Map<(typeof CONCEPT_KEYS)[number], Field>;

/** Reads one item of `concepts`; undefined, with a problem, where it has no preferred term to stand for it. */
export function readConcept(reading: Reading, node: ParsedNode): ConceptEntry | undefined {
  const span = spanOf(node);
  const map = reading.map(node, span, 'A concept');
  if (map === undefined) return undefined;
  const fields = reading.fields(map, CONCEPT_KEYS, 'A concept');
  const partOfSpeech = readPartOfSpeech(reading, fields);
  const preferred = readPreferred(reading, fields, partOfSpeech, span);
  const admitted = readTerms(reading, fields.get('admitted'), 'admitted', partOfSpeech);
  const deprecated = readTerms(reading, fields.get('deprecated'), 'deprecated', partOfSpeech);
  const id = readId(reading, fields.get('id'));
  const language = readLanguage(reading, fields.get('language'));
  const subject = reading.text(fields.get('subject'), 'The subject');
  const definition = reading.text(fields.get('definition'), 'The definition');
  const note = reading.text(fields.get('note'), 'The note');
  const source = reading.text(fields.get('source'), 'The source');
  const objects = readNames(reading, fields.get('with'), 'An object under “with”');
  if (preferred === undefined) return undefined;
  return {
    ...(id !== undefined && { id }),
    terms: [preferred, ...admitted, ...deprecated],
    preferred,
    ...(language !== undefined && { language }),
    ...(partOfSpeech && { partOfSpeech }),
    ...(subject !== undefined && { subject }),
    ...(definition !== undefined && { definition }),
    ...(note !== undefined && { note }),
    ...(source !== undefined && { source }),
    with: objects,
    span,
  };
}

/** A language tag; its subtags are not looked up. */
export function readLanguage(reading: Reading, field: Field | undefined): string | undefined {
  const language = reading.text(field, 'The language');
  if (language === undefined || LANGUAGE_PATTERN.test(language)) return language;
  const message = `“${language}” is not a language tag (BCP 47). Write one such as “en”, “en-GB” or “de”.`;
  reading.error('unknown-value', spanOf(field!.value), message);
  return undefined;
}

/** Objects can only go with a verb, so `with` implies it where nothing else is said. */
function readPartOfSpeech(reading: Reading, fields: ConceptFields): PartOfSpeech | undefined {
  const stated = reading.choice(fields.get('partOfSpeech'), 'The part of speech', PARTS_OF_SPEECH);
  const objects = fields.get('with');
  if (objects === undefined) return stated;
  if (stated !== undefined && stated !== 'verb') {
    const message = `“with” lists the objects of a verb, but this concept is named by a ${stated}. Remove one of the two.`;
    reading.warning('no-verb', objects.keySpan, message);
    return stated;
  }
  return 'verb';
}

function readPreferred(
  reading: Reading,
  fields: ConceptFields,
  partOfSpeech: PartOfSpeech | undefined,
  concept: Span,
): TermEntry | undefined {
  const field = fields.get('preferred');
  if (field === undefined || isEmpty(field.value)) {
    const at = field?.keySpan ?? { start: concept.start, end: concept.start };
    const message =
      'This concept has no preferred term, so nothing can be used in place of the others. Add “preferred:”.';
    reading.error('no-preferred-term', at, message);
    return undefined;
  }
  if (isSeq(field.value)) {
    const message =
      'A concept has one preferred term, but this is a list. Keep one, and move the others to “admitted”.';
    reading.error('two-preferred-terms', spanOf(field.value), message);
    return undefined;
  }
  return readTerm(reading, field.value, field.keySpan, 'preferred', partOfSpeech);
}

/** A list of terms; a single term may stand without a list. */
function readTerms(
  reading: Reading,
  field: Field | undefined,
  status: TermStatus,
  partOfSpeech: PartOfSpeech | undefined,
): TermEntry[] {
  return itemsOf(field).flatMap((node) => {
    const term = readTerm(reading, node, node === null ? field!.keySpan : spanOf(node), status, partOfSpeech);
    return term === undefined ? [] : [term];
  });
}

/** A list of plain names; a single name may stand without a list. */
export function readNames(reading: Reading, field: Field | undefined, what: string): TermRef[] {
  return itemsOf(field).flatMap((node) => {
    const name = reading.name(node, node === null ? field!.keySpan : spanOf(node), what);
    return name === undefined ? [] : [name];
  });
}

function itemsOf(field: Field | undefined): readonly (ParsedNode | null)[] {
  if (field === undefined || isEmpty(field.value)) return [];
  return isSeq(field.value) ? field.value.items : [field.value!];
}

/** A term is a plain string, or a mapping with the string under `term`. */
function readTerm(
  reading: Reading,
  node: Node,
  at: Span,
  status: TermStatus,
  ofConcept: PartOfSpeech | undefined,
): TermEntry | undefined {
  const what = status === 'admitted' ? 'An admitted term' : `A ${status} term`;
  if (!isMap(node)) {
    const name = reading.name(node, at, what);
    return name && { ...name, status, ...(ofConcept && { partOfSpeech: ofConcept }), caseSensitive: false };
  }
  const fields = reading.fields(node, TERM_KEYS, 'A term');
  const name = reading.name(fields.get('term')?.value, fields.get('term')?.keySpan ?? spanOf(node), what);
  const own = reading.choice(fields.get('partOfSpeech'), 'The part of speech', PARTS_OF_SPEECH);
  const termType = reading.choice(fields.get('termType'), 'The term type', TERM_TYPES);
  const caseSensitive = readTruth(reading, fields.get('caseSensitive'), '“caseSensitive”');
  const note = reading.text(fields.get('note'), 'The note');
  const source = reading.text(fields.get('source'), 'The source');
  if (name === undefined) return undefined;
  const partOfSpeech = own ?? ofConcept;
  return {
    ...name,
    status,
    ...(partOfSpeech && { partOfSpeech }),
    ...(termType && { termType }),
    caseSensitive,
    ...(note !== undefined && { note }),
    ...(source !== undefined && { source }),
  };
}

function readTruth(reading: Reading, field: Field | undefined, what: string): boolean {
  if (field === undefined) return false;
  if (isScalar(field.value) && typeof field.value.value === 'boolean') return field.value.value;
  reading.wrongType(field.value, field.keySpan, what, '“true” or “false”');
  return false;
}

function readId(reading: Reading, field: Field | undefined): string | undefined {
  const id = reading.text(field, 'The id');
  if (id === undefined || ID_PATTERN.test(id)) return id;
  const message = `The id “${id}” cannot be written to exchange formats: an id starts with a letter and holds letters, digits, “.”, “-” and “_” alone.`;
  reading.error('unknown-value', spanOf(field!.value), message);
  return undefined;
}
