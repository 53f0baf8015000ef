// What the documents' own glossary says of a term: the start of its definition and where the entry stands.
import type { Span } from '../base/span.js';
import { contains, touches } from '../base/span.js';
import { languagesIn } from './languages.js';
import { TermMatcher } from '../findings/termMatcher.js';
import { Glossary } from '../mining/glossary/glossary.js';
import { sourceEnd, sourceStart } from '../prose/prose.js';
import type { ProseBlock } from '../prose/prose.js';
import { isOpen } from '../prose/zones.js';
import { LineIndex } from '../text/lineIndex.js';
import { readable } from './examples.js';
import type { LanguageRelations } from './relations.js';
import type { Snapshot } from './snapshot.js';

/** More of a definition than this, in UTF-16 units, is not shown: whole sentences up to it, or the first one cut. */
const LONGEST_DEFINITION = 300;

/** The definition of a headword. */
export interface GlossaryDefinition {
  readonly headword: string;
  /** The name that was looked up, where its entry only sends the reader to the headword. */
  readonly sentFrom?: string;
  /** Its first sentences, as a reader sees them, on one line. */
  readonly text: string;
  readonly uri: string;
  /** Of the headword, counted from 1. */
  readonly line: number;
}

/** A headword that is used at a place of a document. */
export interface DefinedAtPlace {
  readonly name: string;
  readonly language: string;
  /** In the source. */
  readonly span: Span;
}

/** The headword that a place of a document touches, in open zones and outside of glossaries. */
export function definedAt(snapshot: Snapshot, uri: string, offset: number): DefinedAtPlace | undefined {
  const reading = snapshot.readingOf(uri);
  if (reading === undefined) return undefined;
  const { closed } = snapshot.checkerAt(uri);
  const at = reading.prose.blocks.findIndex(
    ({ start, content }) =>
      isOpen(content.zones, closed) && touches({ start, end: start + content.sourceLength }, offset),
  );
  if (at < 0) return undefined;
  const block = reading.prose.blocks[at]!;
  const { content } = block;
  if (content.glossary === 'headword') return undefined;
  const language = languagesIn(reading).blocks[at]!;
  const names = headwordsOf(snapshot, language);
  if (names === undefined) return undefined;
  let found: DefinedAtPlace | undefined;
  names.matcher.scan(content.text, 0, content.text.length, (index, start, end) => {
    const span = { start: sourceStart(block, start), end: sourceEnd(block, end) };
    const isClosed = content.marks.some((mark) => !isOpen(mark.zones, closed) && contains(mark, { start, end }));
    if (found === undefined && !isClosed && touches(span, offset))
      found = { name: names.texts[index]!, language, span };
  });
  return found;
}

/** What the glossary says of a name in a language, or undefined where it explains no such name. */
export function definitionOf(snapshot: Snapshot, name: string, language: string): GlossaryDefinition | undefined {
  const relations = relationsOf(snapshot, language);
  const glossary = relations && headwordsOf(snapshot, language)?.glossary;
  const target = glossary?.entryOf(name) === undefined ? glossary?.sentOn.get(name) : undefined;
  const placed = glossary?.entryOf(target ?? name);
  const definition = placed?.entry.definition;
  if (relations === undefined || glossary === undefined || placed === undefined || definition === undefined)
    return undefined;
  const { uri, facts } = relations.corpus.documents[placed.document]!;
  const reading = snapshot.readingOf(uri);
  const range = placed.entry.headwords.find(
    (each) => glossary.keyOf(glossary.textOf(placed.document, each)) === glossary.keyOf(placed.name),
  )!;
  const begins = facts.start[definition.firstToken]!;
  const block = reading?.prose.blocks.find(
    ({ start, content }) =>
      start <= begins && begins < start + content.sourceLength && content.glossary === 'definition',
  );
  // The document was edited since the relations were settled: its entry may stand elsewhere.
  if (reading === undefined || block === undefined) return undefined;
  return {
    headword: glossary.textOf(placed.document, range),
    ...(target !== undefined && { sentFrom: name }),
    text: beginning(block, reading.source.text),
    uri,
    line: new LineIndex(reading.source.text).positionAt(facts.start[range.firstToken]!).line + 1,
  };
}

/** As many whole sentences as there is room for; the first one is cut where it is longer. */
function beginning(block: ProseBlock, source: string): string {
  const text = readable(block, 0, block.content.text.length, source).trim();
  if (text.length <= LONGEST_DEFINITION) return text;
  let end = 0;
  for (const { index, 0: mark } of text.matchAll(/[.!?。！？]["”’)»]*(?:\s+(?=[^\sa-z])|$)/gu)) {
    if (index + mark.trimEnd().length > LONGEST_DEFINITION) break;
    end = index + mark.trimEnd().length;
  }
  if (end > 0) return text.slice(0, end);
  const space = text.lastIndexOf(' ', LONGEST_DEFINITION);
  return `${text.slice(0, space > 0 ? space : LONGEST_DEFINITION)} …`;
}

interface Headwords {
  readonly glossary: Glossary;
  readonly texts: readonly string[];
  readonly matcher: TermMatcher;
}

const compiled = new WeakMap<LanguageRelations, Headwords>();

/** The headwords of a language, compiled when first asked for and kept as long as the relations are. */
function headwordsOf(snapshot: Snapshot, language: string): Headwords | undefined {
  const relations = relationsOf(snapshot, language);
  if (relations === undefined) return undefined;
  let headwords = compiled.get(relations);
  if (headwords === undefined) {
    const glossary = new Glossary(relations.corpus);
    const texts = [...glossary.explainedNames, ...glossary.sentOn.keys()];
    const forms = texts.map((text) => ({ text, ...(language !== 'en' && { partOfSpeech: 'other' as const }) }));
    compiled.set(relations, (headwords = { glossary, texts, matcher: new TermMatcher(forms) }));
  }
  return headwords;
}

function relationsOf(snapshot: Snapshot, language: string): LanguageRelations | undefined {
  return snapshot.relations.languages.find((each) => each.language === language);
}
