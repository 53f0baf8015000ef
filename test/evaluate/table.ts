// The evaluation as narrow tables for a terminal.
import { DEFAULT_KINDS } from '../../server/src/mining/question.js';
import { STAGES } from './funnel.js';
import type { Stage } from './funnel.js';
import type { GlossaryResult } from './glossary.js';
import type { PseudoBand } from './pseudo.js';
import { CUTS, recallRow, recallRows } from './recall.js';
import type { PairFate, RecallRow } from './recall.js';
import type { Evaluation, SetResult } from './result.js';
import { keyFigures, recallBySet } from './summary.js';

/** The whole evaluation, in lines of at most about 100 columns. */
export function showEvaluation({ sets, skipped, pseudo, glossary }: Evaluation): string {
  const pairs = sets.flatMap((set) => set.pairs);
  return [
    ...(sets.length === 0 ? [] : showSets(sets)),
    ...skipped.map(({ name, reason }) => `${name}: skipped, ${reason}`),
    ...(pairs.length === 0
      ? []
      : [...showRecall(pairs), ...showRecallBySet(sets), ...showMisses(sets), ...showNegatives(sets)]),
    ...(sets.length === 0 ? [] : showAgreement(sets)),
    ...(pseudo === undefined ? [] : showPseudo(pseudo.set, pseudo.bands)),
    ...(glossary === undefined ? [] : showGlossary(glossary)),
    ...(sets.length === 0 ? [] : showKeyFigures(sets)),
    '',
  ].join('\n');
}

function showSets(sets: readonly SetResult[]): string[] {
  const kinds = [...DEFAULT_KINDS, 'all', 'look-alike'] as const;
  const load = (set: SetResult, kind: (typeof kinds)[number]): string => {
    const count =
      kind === 'all'
        ? set.questions.length
        : [...set.questions, ...set.lookAlikes].filter((question) => question.kind === kind).length;
    return ((count / set.words) * 1e5).toFixed(1);
  };
  const sum = (figure: (set: SetResult) => number): number => sets.reduce((total, set) => total + figure(set), 0);
  const whole = { words: sum(({ words }) => words), questions: sum(({ questions }) => questions.length) };
  const hidden = sum(({ hiddenLookAlikes }) => hiddenLookAlikes);
  const lookAlikes = sum((set) => set.lookAlikes.length);
  return [
    '',
    'Sets (* read as plain text)',
    ...table([
      ['set', 'pages', 'words', 'questions', 'reading s', 'mining s', 'peak MB'],
      ...sets.map((set) => [
        `${set.name}${set.asPlainText ? ' *' : ''}`,
        String(set.documents),
        String(set.words),
        String(set.questions.length),
        set.readingSeconds.toFixed(1),
        set.miningSeconds.toFixed(1),
        set.peakMegabytes.toFixed(0),
      ]),
    ]),
    '',
    'Questions per 100,000 words',
    ...table([
      ['set', ...kinds.map((kind) => (kind === 'ambiguous-abbreviation' ? 'ambiguous' : kind))],
      ...sets.map((set) => [set.name, ...kinds.map((kind) => load(set, kind))]),
    ]),
    `all sets together: ${((whole.questions / whole.words) * 1e5).toFixed(1)} per 100,000 words`,
    `look-alikes below the default threshold, so not shown even on request: ${hidden} of ${lookAlikes}`,
  ];
}

/** The groups in which recall is reported: plain pairs first; flagged and rare ones apart. */
export function recallGroups(pairs: readonly PairFate[]): { title: string; rows: readonly RecallRow[] }[] {
  const rare = (pair: PairFate): boolean => pair.flags.includes('low_count');
  const flagged = pairs.filter((pair) => pair.flags.length > 0 && !rare(pair));
  return [
    { title: 'plain', rows: recallRows(pairs.filter(({ flags }) => flags.length === 0)) },
    { title: 'flagged', rows: flagged.length === 0 ? [] : recallRows(flagged) },
    { title: 'rare', rows: pairs.some(rare) ? [recallRow('all', pairs.filter(rare))] : [] },
  ];
}

function showRecall(pairs: readonly PairFate[]): string[] {
  const header = ['kind', 'pairs', ...CUTS.map((cut) => (Number.isFinite(cut) ? `first ${cut}` : 'at all')), 'recall'];
  const lines = ['', 'Recall of real decisions: default kinds, and after the stroke with all look-alikes'];
  for (const { title, rows } of recallGroups(pairs)) {
    if (rows.length === 0) continue;
    lines.push(`- ${GROUPS[title]!}`);
    lines.push(
      ...table([
        header,
        ...rows.map(({ kind, pairs: count, found, foundWithLookAlikes }) => [
          kind,
          String(count),
          ...CUTS.map((_, at) => `${found[at]!}/${foundWithLookAlikes[at]!}`),
          `${share(found.at(-1)!, count)}/${share(foundWithLookAlikes.at(-1)!, count)}`,
        ]),
      ]),
    );
  }
  const short = pairs.filter(({ kind, flags }) => kind === 'abbreviation' && flags.length === 0);
  const explained = short.filter(({ stage }) => stage === 'explained').length;
  const found = short.filter(({ place }) => place > 0).length;
  if (explained > 0)
    lines.push(
      `abbreviations, plain: ${explained} of ${short.length} are explained in the documents and not asked; ` +
        `of the rest ${found} of ${short.length - explained} are found (${share(found, short.length - explained)})`,
    );
  return lines;
}

const GROUPS: Readonly<Record<string, string>> = {
  plain: 'plain pairs, both forms used at least 5 times',
  flagged: 'flagged pairs (residual, pos_dependent, sense_limited, function_phrase), used as often',
  rare: 'pairs with a form used less than 5 times',
};

function showRecallBySet(sets: readonly SetResult[]): string[] {
  return ['', 'Plain pairs found by default, by set', ...table(recallBySet(sets))];
}

function showKeyFigures(sets: readonly SetResult[]): string[] {
  return ['', 'In short (plain pairs, default kinds, at all)', ...table(keyFigures(sets))];
}

function showMisses(sets: readonly SetResult[]): string[] {
  const missed = sets.flatMap(({ name, pairs }) =>
    pairs.filter(({ flags, stage }) => flags.length === 0 && stage !== undefined).map((pair) => ({ name, ...pair })),
  );
  const lines = ['', `Where the plain pairs were lost that the default kinds miss: ${missed.length}`];
  for (const stage of Object.keys(STAGES) as Stage[]) {
    const here = missed.filter((pair) => pair.stage === stage);
    if (here.length === 0) continue;
    lines.push(`${String(here.length).padStart(4)} ${stage}: ${STAGES[stage]}`);
    for (const { name, kind, a, b, countA, countB, detail } of here)
      lines.push(
        `       ${name}, ${kind}: ${a} ${countA} | ${b} ${countB}${detail === undefined ? '' : ` (${detail})`}`,
      );
  }
  return lines;
}

function showNegatives(sets: readonly SetResult[]): string[] {
  const asked = sets.flatMap(({ name, negativesAsked }) => negativesAsked.map((pair) => ({ name, ...pair })));
  const all = sets.reduce((sum, { negatives }) => sum + negatives, 0);
  const byDefault = asked.filter(({ place }) => place > 0).length;
  return [
    '',
    `Terms kept apart (${all} pairs): ${byDefault} asked by default, ${asked.length} with look-alikes`,
    ...asked.map(
      ({ name, a, b, basis, place, placeWithLookAlikes, question }) =>
        `     ${name}: ${a} | ${b} (${basis}) ${place > 0 ? `at ${place}` : `look-alike at ${placeWithLookAlikes}`}: ${question}`,
    ),
  ];
}

function showAgreement(sets: readonly SetResult[]): string[] {
  const rows = (['agreement', 'agreementOfLookAlikes'] as const).map((which) => {
    const sum = (figure: 'pairs' | 'known' | 'synonyms'): number =>
      sets.reduce((total, set) => total + set[which][figure], 0);
    return {
      which,
      antonyms: sets.flatMap((set) => set[which].antonyms.map((id) => `     ${set.name}: ${id}`)),
      ...{ pairs: sum('pairs'), known: sum('known'), synonyms: sum('synonyms') },
    };
  });
  return [
    '',
    'WordNet 3.1 on the questions',
    ...rows.flatMap(({ which, antonyms, pairs, known, synonyms }) =>
      which === 'agreement'
        ? [
            `  antonyms asked by default: ${antonyms.length} (must be 0)`,
            ...antonyms,
            `  pairs of synonyms and of verbs asked: ${pairs}; it knows both terms of ${known}, calls ${synonyms} synonyms`,
          ]
        : [`  antonyms among look-alikes: ${antonyms.length}`, ...antonyms],
    ),
  ];
}

function showPseudo(set: string, bands: readonly PseudoBand[]): string[] {
  return [
    '',
    `Pseudo-synonyms in ${set}: half of the uses of a noun renamed to an invented word`,
    ...table([
      ['renamed by', 'uses from', 'terms', 'default', 'with look-alikes', 'places'],
      ...bands.map(({ mode, from, terms, askedByDefault, asked, places }) => [
        mode,
        String(from),
        String(terms),
        String(askedByDefault),
        String(asked),
        places.join(' '),
      ]),
    ]),
  ];
}

function showGlossary({ words, synonyms, apart, apartAsked }: GlossaryResult): string[] {
  return [
    '',
    `RFC 4949 on its own text (${words} words); both terms used at least 3 times`,
    ...table([
      ['pairs', 'read', 'used', 'default', 'with look-alikes'],
      ...[...synonyms, apart].map(({ status, read, used, asked, askedWithLookAlikes }) => [
        status === 'apart' ? 'not to be used as synonyms' : `synonyms, ${status}`,
        ...[read, used, asked, askedWithLookAlikes].map(String),
      ]),
    ]),
    ...apartAsked.map((pair) => `     asked though kept apart: ${pair}`),
  ];
}

function share(part: number, whole: number): string {
  return whole === 0 ? '–' : (part / whole).toFixed(2);
}

/** Columns as wide as their widest cell; the first to the left, the rest to the right. */
function table(rows: readonly (readonly string[])[]): string[] {
  const widths = rows[0]!.map((_, column) => Math.max(...rows.map((row) => row[column]!.length)));
  return rows.map((row) =>
    `  ${row.map((cell, column) => (column === 0 ? cell.padEnd(widths[0]!) : cell.padStart(widths[column]!))).join('  ')}`.trimEnd(),
  );
}
