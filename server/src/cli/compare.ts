// evenword compare: everything known for and against two terms being one concept, for whoever has to decide.
import { compareTwoTerms } from '../engine/comparison.js';
import type { TermComparison } from '../engine/comparison.js';
import type { Example } from '../engine/examples.js';
import type { ComparedCompanion } from '../mining/comparison/sharedCompanions.js';
import type { Reason } from '../mining/question.js';
import { FILE_OPTIONS, MINING_OPTIONS, surveyOrStop } from './common.js';
import { below, renderComparison } from './compareText.js';
import { Exit } from './host.js';
import type { Subcommand } from './subcommand.js';
import { UsageError } from './options.js';
import { rounded } from './rounded.js';
import { refuseUnknown } from './termOperands.js';
import { USAGE_OPTIONS } from './usageOptions.js';

export const compare: Subcommand = {
  summary: 'tells what speaks for and against two terms being one thing, and what would be asked',
  operands: 'A B DIR…',
  options: {
    format: { value: 'FORMAT', choices: ['text', 'json'], help: 'text for people (default), json for programs' },
    ...USAGE_OPTIONS,
    ...FILE_OPTIONS,
    ...MINING_OPTIONS,
  },
  async run({ options, operands: [a, b, ...operands] }, host) {
    if (a === undefined || b === undefined || a.trim() === '' || b.trim() === '' || operands.length === 0)
      throw new UsageError('Name two terms, then a folder of documentation.');
    const survey = await surveyOrStop(host, { options, operands }, true);
    if (survey === undefined) return Exit.cannotRun;
    const found = compareTwoTerms(survey.snapshot, survey.rootUri, a, b);
    if (found.kind === 'unknown') return refuseUnknown(host, 'compare', found);
    if (found.kind === 'same') throw new UsageError(`“${a}” and “${b}” are forms of one term.`);
    if (found.kind === 'within')
      throw new UsageError(`“${found.term}” stands within “${found.whole}” alone: there is nothing to compare.`);
    if (found.kind === 'two-languages') throw new UsageError(`No language of the pages has both “${a}” and “${b}”.`);
    if (options.get('format') === 'json')
      host.write(`${JSON.stringify(toJson(found, survey.rootUri), undefined, 2)}\n`);
    else host.write(renderComparison(found, survey.rootUri, host));
    return Exit.clean;
  },
};

/** The JSON of `compare`, as the README documents it. */
function toJson(
  { language, terms, speaksFor, speaksAgainst, verdict, figures, ...examples }: TermComparison,
  root: string,
): object {
  const { choice, companions, together, usage, pastEdits } = figures;
  const sentence = ({ term, uri, line, text }: Example): object => ({ term, uri, line, text });
  const companion = ({ relation, word, counts, strength }: ComparedCompanion): object => {
    return { relation, word, counts, strength: rounded(strength) };
  };
  const point = ({ kind, text, value }: Reason): object => ({ kind, text, value: rounded(value) });
  return {
    language,
    terms: terms.map(({ text, uses, documents, partOfSpeech }) => {
      return { text, uses: uses.length, documents, partOfSpeech };
    }),
    for: speaksFor.map(point),
    against: speaksAgainst.map(point),
    verdict: { ...verdict, ...(verdict.question && { question: { ...verdict.question } }) },
    alternating: examples.alternating.map(sentence),
    together: examples.together.map(sentence),
    figures: {
      folders: choice.folders.map(({ folder, uses }) => ({ folder: below(folder, root), uses })),
      documentsWithBoth: choice.documentsWithBoth,
      entropy: rounded(choice.entropy),
      entropyWithinFolders: rounded(choice.withinFolders),
      entropyWithinDocuments: rounded(choice.withinDocuments),
      informationOfFolders: rounded(choice.byFolder),
      sentences: { all: together.sentences, a: together.withA, b: together.withB, both: together.withBoth },
      mutualInformation: together.mutualInformation,
      linkTargets: together.targets,
      sharedCompanions: companions.shared.map(companion),
      companionsAlone: companions.alone.map((list) => list.map(companion)),
      frames: usage.frames,
      similarity: rounded(usage.similarity),
      yardstick: rounded(usage.yardstick),
      ranks: [usage.rankOfA, usage.rankOfB],
      coordinated: usage.coordinated,
      contrasted: usage.contrasted,
      siblings: usage.siblings,
      ...(pastEdits && { pastEdits }),
    },
  };
}
