// evenword companions: the words that go with a term, by grammar and by the text that they share, with figures and sentences.
import { COMPANION_RELATIONS, SEGMENT_KINDS, companionsOfTerm } from '../engine/companions.js';
import type { TermCompanions } from '../engine/companions.js';
import type { CompanionRelation, SegmentKind } from '../mining/companions/companions.js';
import { FILE_OPTIONS, MINING_OPTIONS, surveyOrStop } from './common.js';
import { renderCompanions } from './companionText.js';
import { Exit } from './host.js';
import type { Subcommand } from './subcommand.js';
import { UsageError } from './options.js';
import { rounded } from './rounded.js';
import { readList, readMost, refuseUnknown } from './termOperands.js';

/** Companions of each relation that are listed unless more are asked for. */
const USUAL_MOST = 10;

export const companions: Subcommand = {
  summary: 'lists the words that go with a term: verbs, modifiers, prepositions, and what shares its sentences',
  operands: 'TERM DIR…',
  options: {
    format: { value: 'FORMAT', choices: ['text', 'json'], help: 'text for people (default), json for programs' },
    segment: {
      value: 'SEGMENT',
      choices: SEGMENT_KINDS,
      help: 'the stretch of text in which words are counted as going together (sentence by default)',
    },
    relation: { value: 'RELATIONS', help: `only these relations, by commas: ${COMPANION_RELATIONS.join(', ')}` },
    most: { value: 'N', help: `list no more than N companions of each relation (${USUAL_MOST} by default)` },
    ...FILE_OPTIONS,
    ...MINING_OPTIONS,
  },
  async run({ options, operands: [term, ...operands] }, host) {
    if (term === undefined || term.trim() === '' || operands.length === 0)
      throw new UsageError('Name a term, then a folder of documentation.');
    const relations = readList<CompanionRelation>(options.get('relation'), COMPANION_RELATIONS, 'relation');
    const most = readMost(options.get('most')) ?? USUAL_MOST;
    const segment = (options.get('segment') ?? 'sentence') as SegmentKind;
    const survey = await surveyOrStop(host, { options, operands }, true);
    if (survey === undefined) return Exit.cannotRun;
    const found = companionsOfTerm(survey.snapshot, term, { segment, most, ...(relations && { relations }) });
    if (found.kind === 'unknown') return refuseUnknown(host, 'companions', found);
    if (options.get('format') === 'json') host.write(`${JSON.stringify(toJson(found), undefined, 2)}\n`);
    else host.write(renderCompanions(found, host));
    return Exit.clean;
  },
};

/** The JSON of `companions`, as the README documents it. */
function toJson(found: TermCompanions): object {
  const { term, language, uses, documents, related, floor, segments, whole, heldIn } = found;
  const example = (each: TermCompanions['related'][number]['example']): object | undefined =>
    each && { uri: each.uri, line: each.line, text: each.text };
  return {
    ...{ term, language, uses, documents, floor },
    related: related.map(({ relation, word, count, documents: pages, strength, example: sentence }) => ({
      ...{ relation, word, count, documents: pages, strength: rounded(strength), example: example(sentence) },
    })),
    segments: {
      ...{ kind: segments.kind, all: segments.all, withTerm: segments.withTerm, floor: segments.floor },
      companions: segments.companions.map((each) => ({
        ...{ word: each.word, count: each.count, documents: each.documents, segments: each.segments },
        ...{ strength: rounded(each.strength), lift: rounded(each.lift) },
        ...{ mutualInformation: each.mutualInformation, entropy: each.entropy },
        ...{ conditionalEntropy: each.conditionalEntropy, example: example(each.example) },
      })),
    },
    ...(whole && { whole: { ...whole, attraction: rounded(whole.attraction), predicted: rounded(whole.predicted) } }),
    heldIn: heldIn.map(({ text, uses: count }) => ({ text, uses: count })),
  };
}
