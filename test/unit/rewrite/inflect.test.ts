// Inflection of words and terms: tables from common practice, then lists from outside the project.
import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import irregularPlurals from 'irregular-plurals';
import { describe, expect, it } from 'vitest';
import { headOf, inflectTerm, inflectsAs, termForms } from '../../../server/src/rewrite/inflect.js';
import { numberOf, plural, pluralForms, singular } from '../../../server/src/rewrite/noun.js';
import { verbForms } from '../../../server/src/rewrite/verb.js';

// Common practice, no source.
const NOUNS =
  'key keys|query queries|gateway gateways|proxy proxies|alias aliases|status statuses|bus buses|process processes|class classes|' +
  'box boxes|hash hashes|patch patches|cache caches|axis axes|analysis analyses|basis bases|index indexes|schema schemas|matrix matrices|' +
  'repo repos|photo photos|echo echoes|hero heroes|video videos|leaf leaves|life lives|proof proofs|roof roofs|chief chiefs|' +
  'child children|person people|foreman foremen|human humans|API APIs|URL URLs|OS OSes|quiz quizzes|database databases|license licenses|' +
  'response responses|house houses|cause causes|use uses|movie movies|cookie cookies|pie pies|menu menus|replica replicas|canvas canvases|' +
  'lens lenses|bias biases|campus campuses|virus viruses|size sizes|waltz waltzes|epoch epochs|stomach stomachs|headache headaches|' +
  'criterion criteria|shelf shelves|day days|toy toys|soliloquy soliloquies|wiki wikis|sandbox sandboxes|namespace namespaces|' +
  'zombie zombies|wish wishes|bush bushes|match matches|niche niches|cpu cpus|datum data|Key Keys|Person People';

describe('nouns', () => {
  it.each(NOUNS.split('|').map((pair) => pair.split(' ')))('%s, %s', (one, many) => {
    expect(plural(one)).toBe(many);
    if (many !== 'data') expect(singular(many)).toBe(one);
    expect(singular(one)).toBe(one);
  });

  it('knows nouns without a plural', () => {
    expect(['software', 'metadata', 'series'].map(plural)).toEqual(['software', 'metadata', 'series']);
    expect(['software', 'credentials', 'key', 'series', 'settings', 'status'].map(numberOf)).toEqual([
      'uncounted',
      'plural',
      'singular',
      'unchanged',
      'plural',
      'singular',
    ]);
  });

  it('agrees with the npm package irregular-plurals on words of documentation', () => {
    // Its list also holds zoology, anatomy and words that usage leaves uncounted; these are the ones our readers meet.
    const met =
      'analysis antenna antithesis appendix automaton axis basis calf child codex consortium corpus crisis criterion curriculum diagnosis die ' +
      'echo ellipsis embargo emphasis erratum focus foot formula genus goose half hero hypothesis index knife leaf life loaf locus man matrix ' +
      'means medium memorandum millennium mouse news nexus nucleus oasis ox parenthesis passerby person phenomenon photo potato quantum quiz radius ' +
      'referendum schema self series shelf software species spectrum status stimulus stratum syllabus synopsis synthesis tempo thesis thief tooth vertebra vertex virus wife wolf woman';
    const known = met.split(' ').filter((noun) => irregularPlurals.has(noun));
    expect(known.length).toBeGreaterThan(75);
    expect(known.filter((noun) => !pluralForms(noun).includes(irregularPlurals.get(noun)!))).toEqual([]);
  });
});

// Base, third person, past, participle, -ing. Common practice, no source.
const VERBS =
  'log logs logged logged logging|submit submits submitted submitted submitting|visit visits visited visited visiting|' +
  'revisit revisits revisited revisited revisiting|set sets set set setting|reset resets reset reset resetting|run runs ran run running|' +
  'rerun reruns reran rerun rerunning|overwrite overwrites overwrote overwritten overwriting|undo undoes undid undone undoing|' +
  'deploy deploys deployed deployed deploying|copy copies copied copied copying|apply applies applied applied applying|' +
  'debug debugs debugged debugged debugging|commit commits committed committed committing|format formats formatted formatted formatting|' +
  'sync syncs synced synced syncing|panic panics panicked panicked panicking|mimic mimics mimicked mimicked mimicking|' +
  'queue queues queued queued queuing|die dies died died dying|tie ties tied tied tying|agree agrees agreed agreed agreeing|' +
  'free frees freed freed freeing|see sees saw seen seeing|map maps mapped mapped mapping|remap remaps remapped remapped remapping|' +
  'equip equips equipped equipped equipping|quit quits quit quit quitting|fix fixes fixed fixed fixing|show shows showed shown showing|' +
  'push pushes pushed pushed pushing|process processes processed processed processing|go goes went gone going|do does did done doing|' +
  'have has had had having|configure configures configured configured configuring|target targets targeted targeted targeting|' +
  'debit debits debited debited debiting|bootstrap bootstraps bootstrapped bootstrapped bootstrapping|' +
  'snapshot snapshots snapshotted snapshotted snapshotting|relay relays relayed relayed relaying|' +
  'develop develops developed developed developing|delimit delimits delimited delimited delimiting|' +
  'cancel cancels canceled canceled canceling|label labels labeled labeled labeling|control controls controlled controlled controlling|' +
  'begin begins began begun beginning|forget forgets forgot forgotten forgetting|bind binds bound bound binding|' +
  'unbind unbinds unbound unbound unbinding|rebuild rebuilds rebuilt rebuilt rebuilding|offset offsets offset offset offsetting|' +
  'route routes routed routed routing|age ages aged aged aging|dye dyes dyed dyed dyeing|toggle toggles toggled toggled toggling|' +
  'open opens opened opened opening|reopen reopens reopened reopened reopening|enter enters entered entered entering|' +
  'transfer transfers transferred transferred transferring|offer offers offered offered offering|read reads read read reading';

describe('verbs', () => {
  it.each(VERBS.split('|').map((row) => row.split(' ')))('%s', (base, third, past, participle, gerund) => {
    const forms = verbForms(base);
    expect([forms.thirdPerson[0], forms.past[0], forms.participle[0], forms.gerund[0]]).toEqual([
      third,
      past,
      participle,
      gerund,
    ]);
  });

  it('agrees with the npm package english-verbs-irregular', () => {
    const file = resolve(import.meta.dirname, '../../../node_modules/english-verbs-irregular/dist/verbs.json');
    const list = JSON.parse(readFileSync(file, 'utf8')) as Record<string, [string, string][]>;
    const wrong: string[] = [];
    let sum = 0;
    for (const [verb, entries] of Object.entries(list)) {
      if (!/^[a-z]+$/.test(verb)) continue;
      sum++;
      const { past, participle } = verbForms(verb);
      if (!entries.some(([one, two]) => past.includes(one) && participle.includes(two)))
        wrong.push(`${verb}: ${past.join('/')} ${participle.join('/')}, not ${entries.join(' or ')}`);
    }
    expect(sum).toBeGreaterThan(500);
    expect(wrong.length / sum, wrong.join('\n')).toBeLessThan(0.02);
  });
});

const treebank = resolve(import.meta.dirname, '../../../../shared/data/ud-ewt');

describe.skipIf(!existsSync(treebank))('Universal Dependencies English-EWT (needs ../shared)', () => {
  it('gives the forms that stand in the treebank', () => {
    const counts = { verbs: 0, verbsRight: 0, plurals: 0, pluralsRight: 0, singularsRight: 0 };
    const seen = new Set<string>();
    for (const part of ['dev', 'test']) {
      for (const line of readFileSync(resolve(treebank, `${part}.conllu`), 'utf8').split('\n')) {
        const [, form, lemma, upos, xpos, feats] = line.split('\t');
        if (feats === undefined || /Typo=Yes|Style=|Abbr=/.test(feats) || !/^[a-z]+$/.test(lemma!)) continue;
        const word = form!.toLowerCase();
        if (seen.has(`${word} ${lemma} ${xpos}`)) continue;
        seen.add(`${word} ${lemma} ${xpos}`);
        if (upos === 'VERB' && /^VB[ZDNG]$/.test(xpos!)) {
          const { thirdPerson, past, participle, gerund } = verbForms(lemma!);
          counts.verbs++;
          if ({ Z: thirdPerson, D: past, N: participle, G: gerund }[xpos!.charAt(2)]!.includes(word))
            counts.verbsRight++;
        } else if (xpos === 'NNS') {
          counts.plurals++;
          if (pluralForms(lemma!).includes(word)) counts.pluralsRight++;
          if (singular(word) === lemma) counts.singularsRight++;
        }
      }
    }
    expect(counts.verbs).toBeGreaterThan(900);
    expect(counts.verbsRight / counts.verbs).toBeGreaterThan(0.99);
    expect(counts.pluralsRight / counts.plurals).toBeGreaterThan(0.95);
    expect(counts.singularsRight / counts.plurals).toBeGreaterThan(0.95);
  });
});

describe('terms', () => {
  it('finds the head word', () => {
    const head = (text: string, as: 'noun' | 'verb'): string =>
      text.slice(headOf(text, as).start, headOf(text, as).end);
    expect([
      head('API key', 'noun'),
      head('point of sale', 'noun'),
      head('log in', 'verb'),
      head('copy-paste', 'verb'),
      head('add-on', 'noun'),
    ]).toEqual(['key', 'point', 'log', 'paste', 'on']);
  });

  it('tells how a term inflects', () => {
    expect([
      inflectsAs('log in'),
      inflectsAs('API key'),
      inflectsAs('log in', 'noun'),
      inflectsAs('fast', 'adjective'),
    ]).toEqual(['verb', 'noun', 'noun', 'none']);
  });

  it('inflects the head word alone', () => {
    expect(termForms('log in', 'verb').map(({ text }) => text)).toEqual([
      'log in',
      'logs in',
      'logged in',
      'logged in',
      'logging in',
    ]);
    expect(inflectTerm('point of sale', 'plural', 'noun')).toBe('points of sale');
    expect(inflectTerm('e-mail', 'plural', 'noun')).toBe('e-mails');
    expect(inflectTerm('Log in', 'gerund', 'verb')).toBe('Logging in');
    expect(inflectTerm('software', 'plural', 'noun')).toBeUndefined();
  });
});
