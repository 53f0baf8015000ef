// From a snapshot to the report's data: questions with evidence, decided concepts with uses, and the figures at the top.
import { compareCodeUnits } from '../base/order.js';
import type { Agenda } from '../decisions/decide.js';
import type { DecidedConcept } from '../decisions/decisions.js';
import { ExampleFinder } from '../engine/examples.js';
import type { Snapshot } from '../engine/snapshot.js';
import { countUses, countedNames } from '../engine/usage.js';
import type { CountedTerm, TermUsage } from '../engine/usage.js';
import type { Question } from '../mining/question.js';
import { driftOf, whereDriftLives } from './drift.js';
import type { WhereDriftLives } from './drift.js';
import { folderName, folderOfPages, pathBelow } from './paths.js';
import type { DecidedReportTerm, NamedTogether, ReportConcept, ReportData, ReportQuestion } from './reportData.js';
import { figuresOf, stateOf } from './summary.js';

/** What the caller adds to a snapshot. */
export interface ReportOptions {
  /** The date (and time) as it is to be printed. The report reads no clock. */
  readonly generatedAt?: string;
}

/** Collects what the report says about the folder at `rootUri`, under the decisions in force there. Words count as mined. */
export function collectReport(snapshot: Snapshot, rootUri: string, options: ReportOptions = {}): ReportData {
  const agenda = snapshot.agendaAt(rootUri);
  const places = new Places(snapshot, rootUri);
  const usage = countUses(snapshot.relations, [...decidedTerms(agenda), ...askedTerms(agenda)]);
  const examples = new ExampleFinder(snapshot);
  const concepts = agenda.decisions.concepts.map((decided, at) => conceptOf(decided, at, usage, places)).sort(byNeed);
  const questions = agenda.open.map((question): ReportQuestion => {
    const { id, kind, language, objects, confidence, terms, reasons } = question;
    const isDrift = kind !== 'ambiguous-abbreviation';
    const drift = isDrift ? driftOf(terms.map(({ uses }) => uses)) : undefined;
    const counted = terms.map((_, index) => usage.get(askedId(question, index))!);
    const where = isDrift && countsAgree(counted, terms) ? places.where(counted) : undefined;
    return {
      ...{ id, kind, confidence, reasons },
      ...(language !== undefined && { language }),
      ...(objects !== undefined && { objects }),
      settles: terms.slice(1).reduce((sum, { uses }) => sum + uses, 0),
      terms: terms.map(({ text, uses, documents, forms }) => ({
        text,
        uses,
        documents,
        forms: forms.map((form) => form.text),
      })),
      examples: examples.of(question).map(({ term, uri, line, text, highlight }) => ({
        ...{ term, path: places.path(uri), line, text, highlight: { start: highlight.start, end: highlight.end } },
      })),
      ...(drift && { drift }),
      ...(where && { where }),
    };
  });
  const { documents, words } = snapshot.relations.size;
  const parts = { documents, words, questions, concepts, apart: apartIn(agenda), later: laterIn(agenda) };
  return {
    ...(options.generatedAt !== undefined && { generatedAt: options.generatedAt }),
    ...{ folder: folderName(rootUri), state: stateOf(parts), figures: figuresOf(parts), ...parts },
    otherTermbases: otherTermbases(snapshot, agenda, rootUri),
  };
}

/** Where documents stand, and what their folders say about a concept's names. */
class Places {
  private readonly folderOf: (path: string) => string;

  constructor(
    snapshot: Snapshot,
    private readonly rootUri: string,
  ) {
    this.folderOf = folderOfPages([...snapshot.documents.keys()].map((uri) => this.path(uri)));
  }

  path(uri: string): string {
    return pathBelow(this.rootUri, uri);
  }

  where(names: readonly TermUsage[]): WhereDriftLives | undefined {
    const uris = [...new Set(names.flatMap(({ byDocument }) => [...byDocument.keys()]))].sort(compareCodeUnits);
    const pages = uris.map((uri) => {
      const path = this.path(uri);
      return { path, folder: this.folderOf(path), uses: names.map(({ byDocument }) => byDocument.get(uri) ?? 0) };
    });
    return whereDriftLives(pages);
  }
}

/**
 * Questions count with their own eye for slots and objects. Where the plain count over pages comes out otherwise by more
 * than a quarter for any name, it says nothing sound about folders.
 */
function countsAgree(counted: readonly TermUsage[], terms: readonly { readonly uses: number }[]): boolean {
  return counted.every(({ uses }, index) => Math.abs(uses - terms[index]!.uses) <= terms[index]!.uses / 4);
}

const decidedId = (concept: number, term: number): string => `decided ${concept} ${term}`;
const askedId = (question: Question, term: number): string => `asked ${term} ${question.id}`;

function decidedTerms({ decisions }: Agenda): CountedTerm[] {
  return decisions.concepts.flatMap(({ concept, terms }, at) =>
    countedNames(
      terms.map(({ entry }) => entry),
      concept.with,
      (index) => decidedId(at, index),
    ),
  );
}

function askedTerms({ open }: Agenda): CountedTerm[] {
  return open.flatMap((question) =>
    question.terms.map(({ text, forms, partOfSpeech }, index): CountedTerm => ({
      ...{ id: askedId(question, index), text, forms: forms.map((form) => form.text) },
      ...(partOfSpeech && { partOfSpeech }),
      exact: question.terms.slice(0, index).some((other) => other.text.toLowerCase() === text.toLowerCase()),
      ...(question.objects !== undefined && { objects: question.objects }),
      ...(question.language !== undefined && { language: question.language }),
    })),
  );
}

function conceptOf(
  { concept, terms }: DecidedConcept,
  at: number,
  usage: ReadonlyMap<string, TermUsage>,
  places: Places,
): ReportConcept {
  const counted = terms.map((_, index) => usage.get(decidedId(at, index))!);
  const listed = terms.map(({ entry }, index): DecidedReportTerm => {
    const { uses, byDocument } = counted[index]!;
    const pages = [...byDocument]
      .map(([uri, count]) => ({ path: places.path(uri), uses: count }))
      .sort((a, b) => b.uses - a.uses || compareCodeUnits(a.path, b.path));
    return {
      ...{ text: entry.text, status: entry.status, uses, documents: byDocument.size, pages },
      ...(entry.note !== undefined && { note: entry.note }),
    };
  });
  const drift = driftOf(counted.map(({ uses }) => uses));
  const where = places.where(counted);
  return {
    name: concept.preferred.text,
    ...(concept.id !== undefined && { id: concept.id }),
    ...(concept.subject !== undefined && { subject: concept.subject }),
    ...(concept.definition !== undefined && { definition: concept.definition }),
    with: concept.with.map(({ text }) => text),
    terms: listed,
    toChange: listed.reduce((sum, { status, uses }) => sum + (status === 'deprecated' ? uses : 0), 0),
    ...(drift && { drift }),
    ...(where && { where }),
  };
}

function byNeed(a: ReportConcept, b: ReportConcept): number {
  return b.toChange - a.toChange || compareCodeUnits(a.name, b.name);
}

function apartIn({ decisions }: Agenda): NamedTogether[] {
  return decisions.chain.flatMap(({ apart }) => apart.map(togetherOf));
}

/** Questions put off that are not asked again. */
function laterIn({ decisions, settled }: Agenda): NamedTogether[] {
  const quiet = settled.filter((each) => each.settled === 'later').map(({ question }) => decisions.putOff(question));
  return decisions.chain.flatMap(({ uri, later }) =>
    later
      .filter(({ span }) => quiet.some((place) => place?.uri === uri && place.span.start === span.start))
      .map(togetherOf),
  );
}

function togetherOf({ terms, note }: { terms: readonly { text: string }[]; note?: string }): NamedTogether {
  return { terms: terms.map(({ text }) => text), ...(note !== undefined && { note }) };
}

function otherTermbases(snapshot: Snapshot, { decisions }: Agenda, rootUri: string): ReportData['otherTermbases'] {
  return snapshot.termbases
    .filter(({ termbase }) => !decisions.chain.includes(termbase))
    .map(({ uri, termbase }) => ({ path: pathBelow(rootUri, uri), concepts: termbase.concepts.length }));
}
