// evenword ask: the undecided mixes of a documentation set, most worth first, with their evidence.
import { QUESTION_KINDS } from '../engine/engine.js';
import { ExampleFinder } from '../engine/examples.js';
import type { Snapshot } from '../engine/snapshot.js';
import type { Question, QuestionKind } from '../mining/question.js';
import { FILE_OPTIONS, MINING_OPTIONS, surveyOrStop } from './common.js';
import { Exit } from './host.js';
import type { Subcommand } from './subcommand.js';
import { UsageError } from './options.js';
import { renderQuestions } from './questionText.js';
import { rounded } from './rounded.js';
import { USAGE_OPTIONS } from './usageOptions.js';

export const ask: Subcommand = {
  summary: 'lists the undecided mixes: terms that may name one thing',
  operands: 'DIR…',
  options: {
    format: { value: 'FORMAT', choices: ['text', 'json'], help: 'text for people (default), json for programs' },
    kinds: {
      value: 'KINDS',
      help: `kinds of question, by commas: ${QUESTION_KINDS.join(', ')}; all but look-alike by default`,
    },
    most: { value: 'N', help: 'list no more than N questions (all by default)' },
    ...USAGE_OPTIONS,
    ...FILE_OPTIONS,
    ...MINING_OPTIONS,
  },
  async run(given, host) {
    const { options } = given;
    const kinds = readKinds(options.get('kinds'));
    const most = readCount(options.get('most'));
    const survey = await surveyOrStop(host, given, true);
    if (survey === undefined) return Exit.cannotRun;
    const snapshot = kinds === undefined ? survey.snapshot : survey.snapshot.asking(kinds);
    const { open } = snapshot.agendaAt(survey.rootUri);
    const shown = open.slice(0, most);
    if (options.get('format') === 'json') host.write(`${JSON.stringify(toJson(snapshot, shown), undefined, 2)}\n`);
    else {
      host.write(renderQuestions(snapshot, shown, host, open.length));
      if (shown.length > 0) host.note(`\nAnswer in VS Code, or write the answers into termbase.yaml.\n`);
    }
    return Exit.clean;
  },
};

/** The JSON of `ask`, as the README documents it. */
function toJson(snapshot: Snapshot, questions: readonly Question[]): object {
  const { documents, words } = snapshot.relations.size;
  const examples = new ExampleFinder(snapshot);
  return {
    documents,
    words,
    questions: questions.map((question) => ({
      id: question.id,
      kind: question.kind,
      // English goes without saying.
      ...(question.language !== undefined && question.language !== 'en' && { language: question.language }),
      confidence: rounded(question.confidence),
      terms: question.terms.map(({ text, uses, documents: pages, forms }) => ({
        ...{ text, uses, documents: pages },
        forms: forms.map((form) => form.text),
      })),
      reasons: question.reasons.map(({ kind, text, value }) => ({
        kind,
        text,
        value: rounded(value),
      })),
      examples: examples.of(question).map(({ term, uri, line, text }) => ({ term, uri, line, text })),
    })),
  };
}

function readKinds(value: string | true | undefined): readonly QuestionKind[] | undefined {
  if (typeof value !== 'string') return undefined;
  const names = value.split(',').map((name) => name.trim());
  const unknown = names.find((name) => !QUESTION_KINDS.some((kind) => kind === name));
  if (unknown !== undefined)
    throw new UsageError(`There is no kind “${unknown}”. There are: ${QUESTION_KINDS.join(', ')}.`);
  return QUESTION_KINDS.filter((kind) => names.includes(kind));
}

function readCount(value: string | true | undefined): number | undefined {
  if (typeof value !== 'string') return undefined;
  if (!/^[1-9]\d{0,8}$/.test(value)) throw new UsageError(`--most takes a whole number from 1, not “${value}”.`);
  return Number(value);
}
