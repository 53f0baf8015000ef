// Languages without a grammar: ways of writing are asked about, and nothing that is known of English is applied to them.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { Engine } from '../../../server/src/engine/engine.js';
import { Profiles, factsOf } from '../../../server/src/engine/factsOf.js';
import type { Snapshot } from '../../../server/src/engine/snapshot.js';

const profiles = new Profiles();

function survey(pages: readonly string[], pathLanguage?: string): Snapshot {
  const engine = new Engine(profiles);
  engine.apply({
    documents: pages.map((text, index) => {
      const uri = `file:///docs/${index}.md`;
      return {
        uri,
        source: { uri, format: 'markdown', text, ...(pathLanguage !== undefined && { pathLanguage }) },
      };
    }),
  });
  return finish(engine.settle());
}

const asked = (snapshot: Snapshot): string[] =>
  snapshot.relations.questions.map(({ terms }) => terms.map(({ text }) => text).join(' / '));

describe('German pages', () => {
  const pages = [
    'Die Boje schreibt jede Stunde in die Logdatei. Wenn die Logdatei voll ist, legt die Station eine neue Log-Datei an, und die alte Log-Datei wird gelöscht.',
    'Öffnen Sie die Logdatei auf der Station. In der Log Datei steht, wann die Boje zuletzt gesendet hat. Die Log Datei ist nur für den Betreiber, und die Logdateien der Nachbarn sind es auch. Alle Logdateien und Log-Dateien werden am Ende des Monats in das Archiv gelegt, und die Log-Dateien bleiben dort.',
  ];

  it('are asked about a compound that is joined, hyphened and open, its plural with it', () => {
    const snapshot = survey(pages);
    expect(snapshot.relations.languages.map(({ language }) => language)).toEqual(['de']);
    const [question, ...others] = snapshot.relations.questions;
    expect(others).toEqual([]);
    expect(question).toMatchObject({ kind: 'variant', language: 'de' });
    expect(question!.terms.map(({ text, uses }) => [text, uses])).toEqual([
      ['Logdatei', 5],
      ['Log-Datei', 4],
      ['Log Datei', 2],
    ]);
    expect(question!.places.length).toBeGreaterThanOrEqual(3);
  });

  it('are asked the same in any order', () => {
    expect(asked(survey([...pages].reverse()))).toEqual(asked(survey(pages)));
  });
});

describe('Japanese pages', () => {
  it('are asked about katakana with and without the last long vowel', () => {
    // JIS Z 8301 leaves out the sign at the end of longer words, other house styles write it (common practice, from memory).
    const pages = [
      '観測データは毎時サーバに送られます。サーバが停止すると、ブイはデータを保存します。次にサーバが起動すると送信します。',
      '管理者はサーバーの設定を変更できます。サーバーの時計は毎日合わせてください。古いデータはサーバーから削除されます。',
    ];
    expect(asked(survey(pages))).toEqual(['サーバ / サーバー']);
  });
});

describe('French pages', () => {
  it('are not asked what only English would have one ask', () => {
    // Words that the English engines would pair: spellings in -ise and -ize, a clipping and its full form, plurals, an
    // abbreviation in brackets, and words that the lexicon of equivalents knows.
    const text =
      'On peut organiser les données de la bouée, et la station les organise pour vous. Le service (SMS) que l’on optimize ou que l’on optimise est dans la configuration. ' +
      'La config de la station est dans la config du port. Les images et l’image sont sur la page, et le client est dans la session du dialogue ou de la conversation.';
    const snapshot = survey([text, `${text} Il y a aussi un message pour vous.`, `Voici la suite. ${text}`], 'fr');
    expect(snapshot.relations.languages.map(({ language }) => language)).toEqual(['fr']);
    expect(asked(snapshot)).toEqual([]);
  });

  it('have their own words of grammar, and none of English', () => {
    const text =
      'Les données de la station sont dans le port, et la bouée est sur le pont avec une ancre pour les tenir.';
    const [facts] = factsOf({ uri: 'file:///a.md', format: 'markdown', text, pathLanguage: 'fr' }, profiles);
    const grammar = facts!.words.filter((_, id) =>
      facts!.flags.some((flags, row) => facts!.word[row] === id && flags & 128),
    );
    expect(facts!.language).toBe('fr');
    expect(grammar).toEqual(
      expect.arrayContaining(['les', 'dans', 'et', 'avec'].filter((word) => facts!.words.includes(word))),
    );
    expect(grammar).not.toContain('port');
  });
});

describe('a page in two languages', () => {
  const english =
    'The buoy sends its data to the station, and the station keeps them for thirty days before they are sent on to the archive of the harbour.';
  const french =
    'La bouée envoie ses données à la station, et la station les garde pendant trente jours avant de les envoyer aux archives du port.';

  it('has facts in each', () => {
    const facts = factsOf(
      { uri: 'file:///a.md', format: 'markdown', text: `${english}\n\n${english}\n\n${french}\n` },
      profiles,
    );
    expect(facts.map(({ language }) => language)).toEqual(['en', 'fr']);
    expect(facts[0]!.words).toContain('buoy');
    expect(facts[0]!.words).not.toContain('bouée');
    expect(facts[1]!.words).toContain('bouée');
    expect(facts[1]!.blockKind).toHaveLength(1);
  });

  it('counts as one page', () => {
    const snapshot = survey([`${english}\n\n${french}\n`, french]);
    expect(snapshot.relations.languages.map(({ language, corpus }) => [language, corpus.documents.length])).toEqual([
      ['en', 1],
      ['fr', 2],
    ]);
    expect(snapshot.relations.size.documents).toBe(2);
  });
});
