// Pages in two languages under one termbase: which terms are looked for where, in which forms, and how they are replaced.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { Engine } from '../../../server/src/engine/engine.js';
import { Profiles } from '../../../server/src/engine/factsOf.js';
import { preferredEdits } from '../../../server/src/engine/fixing.js';
import type { Snapshot } from '../../../server/src/engine/snapshot.js';
import { countUses } from '../../../server/src/engine/usage.js';
import { answerQuestion } from '../../../server/src/ide/answers.js';
import { hoverAt } from '../../../server/src/ide/hover.js';

const root = 'file:///docs/';
const profiles = new Profiles();
const PAGES: Readonly<Record<string, string>> = {
  'start.md':
    'Put the badge of the harbour on the mast of the buoy, and keep the badges dry. You can find a badge in the box that came with it.',
  'fr/debut.md':
    'Le badge de la bouée est dans la boîte, et les badges du port sont sur le mât. Il y a badge et badge dans la vie de la station.',
  // Stated nowhere: the paragraphs tell.
  'both.md':
    'The badge is on the mast of the buoy, and it has been there since the day on which it was moored.\n\nLe badge est sur le mât de la bouée, et il y est depuis le jour où la bouée a été mise dans le port de la ville.\n',
};

function survey(termbase: string): Snapshot {
  const engine = new Engine(profiles);
  engine.apply({
    documents: Object.entries(PAGES).map(([name, text]) => {
      const uri = root + name;
      return { uri, source: { uri, format: 'markdown', text, ...(name.startsWith('fr/') && { pathLanguage: 'fr' }) } };
    }),
    termbases: [{ uri: `${root}termbase.yaml`, text: `evenword: 1\n${termbase}` }],
  });
  return finish(engine.settle());
}

const found = (snapshot: Snapshot, page: string): (string | undefined)[] =>
  snapshot.findingsIn(root + page).map(({ span }) => snapshot.textOf(root + page, span));

const CONCEPT = 'concepts:\n  - preferred: tag\n    deprecated: [badge]\n';

describe('a termbase without a language', () => {
  const snapshot = survey(CONCEPT);

  it('holds on every page: inflected in English, as written elsewhere', () => {
    expect(found(snapshot, 'start.md')).toEqual(['badge', 'badges', 'badge']);
    expect(found(snapshot, 'fr/debut.md')).toEqual(['badge', 'badge', 'badge']);
    expect(found(snapshot, 'both.md')).toEqual(['badge', 'badge']);
  });

  it('has its terms replaced in French without English articles, and never surely', () => {
    // “Il y a badge”: the verb “a” is no article.
    const [, second] = snapshot.findingsIn(`${root}fr/debut.md`);
    const fix = preferredEdits(snapshot, `${root}fr/debut.md`, { ...second!, preferred: 'insigne' });
    expect(fix).toMatchObject({ kind: 'edits', certain: false });
    expect(fix.kind === 'edits' && fix.edits.map(({ newText }) => newText)).toEqual(['insigne']);
  });

  it('has its uses counted by the same forms', () => {
    const { uses, byDocument } = countUses(snapshot.relations, [{ id: 'badge', text: 'badge' }]).get('badge')!;
    expect([uses, Object.fromEntries(byDocument)]).toEqual([
      8,
      { [`${root}start.md`]: 3, [`${root}fr/debut.md`]: 3, [`${root}both.md`]: 2 },
    ]);
  });
});

describe('a termbase with a language', () => {
  it('holds in blocks of that language alone', () => {
    const english = survey(`language: en-GB\n${CONCEPT}`);
    expect(found(english, 'start.md')).toHaveLength(3);
    expect(found(english, 'fr/debut.md')).toEqual([]);
    expect(english.findingsIn(`${root}both.md`).map(({ block }) => block)).toEqual([0]);
    expect(hoverAt(english, `${root}fr/debut.md`, PAGES['fr/debut.md']!.indexOf('badge') + 1)).toBeUndefined();
    const french = survey(`language: fr\n${CONCEPT}`);
    expect(found(french, 'start.md')).toEqual([]);
    expect(french.findingsIn(`${root}both.md`).map(({ block }) => block)).toEqual([1]);
  });
});

describe('an answer about another language than the file’s', () => {
  const german = [
    'Die Boje schreibt jede Stunde in die Logdatei. Wenn die Logdatei voll ist, legt die Station eine neue Log-Datei an, und die alte Log-Datei wird gelöscht.',
    'Öffnen Sie die Logdatei auf der Station. In der Log-Datei steht, wann die Boje zuletzt gesendet hat, und die Logdatei ist nur für den Betreiber.',
  ];
  const english = 'concepts:\n  - preferred: log file\n    deprecated: [Logdatei]\n';

  function ask(termbase: string): { engine: Engine; ids: string[] } {
    const engine = new Engine(profiles);
    engine.apply({
      documents: german.map((text, index) => {
        const uri = `${root}${index}.md`;
        return { uri, source: { uri, format: 'markdown', text } };
      }),
      termbases: [{ uri: `${root}termbase.yaml`, text: termbase }],
    });
    const { open } = finish(engine.settle()).agendaAt(root);
    return { engine, ids: open.map(({ id }) => id) };
  }

  it('is written with its language, and then holds there alone', () => {
    const { engine, ids } = ask(`evenword: 1\nlanguage: en\n${english}`);
    expect(ids).toEqual(['variant:Log-Datei|Logdatei']);
    const answer = answerQuestion(engine.snapshot, root, '', ids[0]!, { kind: 'prefer', preferred: 'Logdatei' });
    if (answer.kind !== 'edit') throw new Error(answer.message);
    const before = engine.snapshot.termbases[0]!.text;
    const text = [...answer.edits]
      .reverse()
      .reduce((all, { span, newText }) => all.slice(0, span.start) + newText + all.slice(span.end), before);
    expect(text).toContain('  - preferred: Logdatei\n    deprecated: [Log-Datei]\n    language: de\n');
    const after = engine.apply({ termbases: [{ uri: `${root}termbase.yaml`, text }] });
    expect(after.termbases[0]!.problems).toEqual([]);
    expect(after.agendaAt(root).open).toEqual([]);
    expect(found(after, '0.md')).toEqual(['Log-Datei', 'Log-Datei']);
  });

  it.each(['apart', 'later'] as const)('settles the question where it is “%s”, which no language limits', (kind) => {
    const { engine, ids } = ask('evenword: 1\nlanguage: en\n');
    const answer = answerQuestion(engine.snapshot, root, '', ids[0]!, { kind });
    if (answer.kind !== 'edit') throw new Error(answer.message);
    const text = engine.snapshot.termbases[0]!.text + answer.edits.map(({ newText }) => newText).join('');
    const after = engine.apply({ termbases: [{ uri: `${root}termbase.yaml`, text }] });
    expect(after.termbases[0]!.problems).toEqual([]);
    expect(after.agendaAt(root).open).toEqual([]);
  });

  it('needs no language where the file states it, and is no longer asked for', () => {
    expect(
      ask('evenword: 1\nlanguage: de\nconcepts:\n  - preferred: Logdatei\n    deprecated: [Log-Datei]\n').ids,
    ).toEqual([]);
    const { engine, ids } = ask('evenword: 1\nlanguage: de\n');
    const answer = answerQuestion(engine.snapshot, root, '', ids[0]!, { kind: 'prefer', preferred: 'Logdatei' });
    expect(answer.kind === 'edit' && answer.edits.map(({ newText }) => newText).join('')).not.toContain('language');
  });
});
