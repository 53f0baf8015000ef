// Variants: what is asked, and what is right as it is.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { Corpus } from '../../../server/src/corpus/corpus.js';
import type { Question } from '../../../server/src/mining/question.js';
import { askVariants } from '../../../server/src/mining/variants/ask.js';
import { corpusOf } from '../../support/corpusOf.js';

function ask(...documents: string[]): Question[] {
  return finish(askVariants(corpusOf(documents)));
}

const idsOf = (questions: readonly Question[]): string[] => questions.map(({ id }) => id);

describe('a way of writing that varies in one slot', () => {
  it('asks one word against two', () => {
    const [question, ...rest] = ask(
      'Load the dataset from disk. The dataset is large. Each dataset has a name.',
      'Load the data set from disk. The data set is large. These data sets have names.',
    );
    expect(rest).toEqual([]);
    expect(question).toMatchObject({ kind: 'variant', id: 'variant:data set|dataset' });
    expect(question!.terms.map(({ text, uses, documents }) => [text, uses, documents])).toEqual([
      ['data set', 3, 1],
      ['dataset', 3, 1],
    ]);
    expect(question!.terms[0]!.forms).toEqual([
      { text: 'data set', uses: 2 },
      { text: 'data sets', uses: 1 },
    ]);
  });

  it('asks one word against a hyphen', () => {
    expect(
      idsOf(
        ask(
          'Install the plugin. Every plugin is signed.',
          'Install the plug-in. Every plug-in is signed. Write a plug-in.',
          'A plugin of yours is welcome.',
        ),
      ),
    ).toEqual(['variant:plug-in|plugin']);
  });

  it('asks a hyphen against two words where both stand before a noun', () => {
    expect(
      idsOf(
        ask(
          'Use real-time data. A real-time feed starts.',
          'Use real time data. A real time feed starts.',
          'Send real-time alerts, and a real time report.',
        ),
      ),
    ).toEqual(['variant:real time|real-time']);
  });

  // VarCon lists behavior as American, behaviour as British.
  it('asks British against American spelling, a family in one question', () => {
    const questions = ask(
      'The behaviour changed. We organise the behavioural data. It was organised well.',
      'The behavior changed. We organize the behavioral data. It was organized well.',
      'Its behaviour and behavior.',
    );
    expect(idsOf(questions).sort()).toEqual(['variant:behavior|behaviour', 'variant:organise|organize']);
  });

  it('asks three ways at once', () => {
    const [question] = ask(
      'The user name is long. A user name is set. Enter the user name.',
      'The username is long. A username is set.',
      'The user-name is long. A user-name is set. The username is short, the user-name too.',
    );
    expect(question!.terms.map(({ text }) => text)).toEqual(['user name', 'user-name', 'username']);
  });
});

describe('what is right as it is', () => {
  it('leaves a hyphen before a noun beside the open noun phrase', () => {
    expect(
      ask(
        'The real-time feed is fast. A real-time view. Real-time data.',
        'It shows prices in real time. This is done in real time. Nothing happens in real time.',
      ),
    ).toEqual([]);
  });

  // Facts of practice: log in is what a user does, login what it is called.
  it.each([
    ['log in', 'login'],
    ['set up', 'setup'],
    ['back up', 'backup'],
    ['shut down', 'shutdown'],
    ['roll back', 'rollback'],
  ])('never asks %s beside %s', (verb, noun) => {
    expect(
      ask(
        `You can ${verb} now. To ${verb}, press Enter. Users ${verb} twice. The ${verb} failed. A ${verb} page.`,
        `The ${noun} failed. A ${noun} is needed. Open the ${noun} page. You can ${noun} now. To ${noun} is easy.`,
      ),
    ).toEqual([]);
  });

  it('leaves code alone', () => {
    expect(
      ask(
        'Set `dataset` and `dataset` and `dataset`. The data set is large.',
        'Set `dataset`. The data set is small. A data set is here.',
      ),
    ).toEqual([]);
  });

  it('leaves identifiers beside prose', () => {
    expect(
      ask(
        'The nodeSelector is set. Each nodeSelector has a value. A nodeSelector of yours.',
        'The node selector is set. Each node selector has a value. A node selector of yours.',
      ),
    ).toEqual([]);
  });

  it('leaves plural and singular', () => {
    expect(ask('The movie is long. A movie ends.', 'The movies are long. Cookies and a cookie. The cookie.')).toEqual(
      [],
    );
  });
});

describe('capitals of a name', () => {
  it('asks GitHub against Github', () => {
    const page = 'We use GitHub for code. Send it to GitHub today. Our GitHub page.';
    expect(idsOf(ask(page, `${page} See Github too.`, 'Look at Github first, then at GitHub.'))).toEqual([
      'variant:GitHub|Github',
    ]);
  });

  it('leaves sentence starts, headings and common words', () => {
    expect(
      ask(
        '# Service Broker\n\nThe service is up. Service is down. A service broker runs.',
        '# Service Broker\n\nEach service waits. Service calls fail. The broker waits for a service.',
      ),
    ).toEqual([]);
  });
});

describe('names of code', () => {
  const prose = 'Set the mooringline of a buoy. The mooringline is short. Check each mooringline.';
  const open = 'Set the mooring line of a buoy. The mooring line is long. Check each mooring line.';

  it('are no way of writing on pages whose code has them', () => {
    expect(idsOf(ask(prose, open))).toEqual(['variant:mooring line|mooringline']);
    expect(ask(`${prose}\n\n    mooringline = 3\n`, open)).toEqual([]);
  });

  it('do not make small letters of a name a way of writing it', () => {
    const capitals = Array.from(
      { length: 20 },
      (_, i) => `Buoy ${i} sends by MQTT. Then MQTT waits. See how MQTT ends.`,
    );
    const small = Array.from({ length: 4 }, (_, i) => `Buoy ${i} sends by mqtt and waits. It goes by mqtt then.`);
    const inCode = small.map((text) => `${text}\n\n\`\`\`sh\nmqtt --send\n\`\`\`\n`);
    expect(idsOf(ask(...capitals, ...small))).toEqual(['variant:MQTT|mqtt']);
    expect(ask(...capitals, ...inCode)).toEqual([]);
  });
});

describe('a few slips', () => {
  it('of the rule of hyphens before nouns are no mix', () => {
    const rule = Array.from(
      { length: 5 },
      () => 'Read the buoy-level data. A buoy-level alarm starts. It counts at the buoy level.',
    );
    const slips = ['Send the buoy level alarms. A buoy level report waits. It is seen at the buoy level.'];
    expect(ask(...rule, ...slips)).toEqual([]);
  });

  it('of a hyphened word that a determiner stands before are nouns, whatever the tagger says', () => {
    expect(
      ask(
        'Set the go-live date. The go-live date is near. A go-live date waits. Choose the go-live date.',
        'The buoys go live at noon. They will go live soon. You can go live today. We go live.',
      ),
    ).toEqual([]);
  });
});

describe('a hyphen', () => {
  const hyphened = [1, 2, 3].map((buoy) => `Read the shore-station log of buoy ${buoy}. A shore-station alarm starts.`);
  const before = 'Send the shore station log. A shore station alarm waits. Keep the shore station data.';

  it('that is kept before nouns alone is grammar, whatever strays there are', () => {
    const nouns = [1, 2, 3].map((buoy) => `Buoy ${buoy} calls the shore station. It is seen from the shore station.`);
    expect(ask(...hyphened, before, `${before} Again.`, ...nouns)).toEqual([]);
  });

  it('is asked about where the open form is as much at home before nouns', () => {
    expect(idsOf(ask(...hyphened, before, `${before} Again.`))).toEqual(['variant:shore station|shore-station']);
  });

  it('may be the habit of one page', () => {
    const page = 'Read the tide-gauge log. A tide-gauge alarm starts. Keep tide-gauge data.';
    const open = [1, 2].map(
      (buoy) => `Send the tide gauge log of buoy ${buoy}. A tide gauge alarm waits. Keep tide gauge data.`,
    );
    expect(ask(page, ...open)).toEqual([]);
    expect(idsOf(ask(page, `${page} Wait.`, ...open))).toEqual(['variant:tide gauge|tide-gauge']);
  });

  it('makes a verb, which is no way of writing the noun', () => {
    expect(
      ask(
        'The server reads the waves and bulk-loads them. You can bulk-load the tides. Then it writes and bulk-loads into store.',
        'It reads and bulk-loads into the archive. We bulk-load every tide and bulk-loads them.',
        'The bulk load is slow. Start a bulk load. After the bulk load it waits.',
      ),
    ).toEqual([]);
  });

  it('is no count', () => {
    const text = (way: string, i: number): string =>
      `Show the ${way} neighbors of buoy ${i}. It finds ${way} neighbors.`;
    const asked = (open: string): string[] =>
      idsOf(ask(text('k-way', 1), text('k-way', 2), text(open, 3), text(open, 4)));
    expect(asked('top k way')).toEqual([]);
    const one = (way: string, i: number): string => `Show the ${way} label of buoy ${i}. It finds one ${way} label.`;
    expect(idsOf(ask(one('k-way', 1), one('k-way', 2), one('k way', 3), one('k way', 4)))).toEqual([
      'variant:k way|k-way',
    ]);
  });

  it('that a parenthesis holds alone tells nothing', () => {
    const text = (way: string, buoy: number): string => `Names (${way}) of buoy ${buoy}. Its codes (${way}), too.`;
    const asked = ask(
      text('tide-sensitive', 1),
      text('tide-sensitive', 2),
      text('tide sensitive', 3),
      text('tide sensitive', 4),
    );
    expect(asked).toEqual([]);
  });
});

describe('a camel name', () => {
  const pages = (closed: string, open: string): string[] => [
    `Write ${closed} here. Wait for ${closed}. Look at ${closed}.`,
    `Then wait for ${closed}. Look at ${closed} again.`,
    `Write ${open} here. Wait for ${open}. Look at ${open}.`,
    `Then wait for ${open}. Look at ${open} again.`,
  ];

  it('that is a name without articles is one with the name in two words', () => {
    const [question] = ask(...pages('PortEllish', 'Port Ellish'));
    expect(question).toMatchObject({ id: 'variant:Port Ellish|PortEllish', confidence: 0.75 });
  });

  it('of a kind stands beside the component that it is made of', () => {
    const kinds = 'Make a SanderlingSource. The SanderlingSource waits for a SanderlingSource.';
    const [question] = ask(...pages('SanderlingSource', 'Sanderling Source'), kinds);
    expect(question).toMatchObject({ id: 'variant:Sanderling Source|SanderlingSource', confidence: 0.45 });
  });
});

it('takes no title of a link for a way of writing a name', () => {
  const right = [1, 2, 3, 4].map((buoy) => `Buoy ${buoy} calls WaveDeck by noon. Then WaveDeck draws it.`);
  const wrong = (text: string): string[] => [1, 2].map((buoy) => `Read of buoy ${buoy} in ${text} of last year.`);
  expect(idsOf(ask(...right, ...wrong('our Wavedeck book')))).toEqual(['variant:WaveDeck|Wavedeck']);
  expect(ask(...right, ...wrong('[our Wavedeck book](https://example.org/)'))).toEqual([]);
});

describe('a question', () => {
  const documents = {
    'file:///a.md': 'Load the dataset from disk. The dataset is large.',
    'file:///b.md': 'Load the data set from disk. The data set is large.',
    'file:///c.md': 'A dataset here, and the data set there.',
  };

  it('shows places of both ways, other documents first', () => {
    const corpus = corpusOf(documents);
    const [question] = finish(askVariants(corpus));
    const shown = question!.places.map(({ term, document, firstToken, lastToken }) => {
      const { facts, ids } = corpus.documents[document]!;
      const words = Array.from(facts.word.subarray(firstToken, lastToken + 1), (word) =>
        corpus.vocabulary.textOf(ids[word]!),
      );
      return [question!.terms[term]!.text, document, words.join(' ')];
    });
    expect(shown).toEqual([
      ['data set', 1, 'data set'],
      ['data set', 2, 'data set'],
      ['data set', 1, 'data set'],
      ['dataset', 0, 'dataset'],
      ['dataset', 0, 'dataset'],
      ['dataset', 2, 'dataset'],
    ]);
  });

  it('shows the ways beside one word first, and running text before headings', () => {
    const corpus = corpusOf({
      'file:///a.md': '# A yearly dataset of waves\n\nLoad the dataset. The dataset is large.',
      'file:///b.md': 'Load the data set. The data set is large. Read the data set of waves. Name a yearly data set.',
      'file:///c.md': 'The folder has a dataset. A yearly dataset is here. Name each dataset.',
    });
    const [question] = finish(askVariants(corpus));
    const shown = question!.places.map(({ term, document, firstToken }) => {
      const { facts, ids } = corpus.documents[document]!;
      return `${corpus.vocabulary.textOf(ids[facts.word[firstToken - 1]!]!)} ${question!.terms[term]!.text}`;
    });
    expect(shown).toHaveLength(6);
    expect(shown.filter((text) => text.startsWith('yearly'))).toEqual([shown[0], shown[3]]);
  });

  it('says why in plain words', () => {
    const [question] = ask(...Object.values(documents));
    expect(question!.reasons.map(({ kind, text }) => `${kind}: ${text}`)).toEqual([
      'same-slot: both stand where a noun stands (after “the”, “of” and the like): “data set” 3 times and “dataset” 3 times',
      'compound: written as two words (“data set”) 3 times on 2 pages and as one word (“dataset”) 3 times on 2 pages',
      'mixed-page: 1 page mixes them',
    ]);
  });

  it('does not depend on the order in which documents came', () => {
    const forwards = finish(askVariants(corpusOf(documents)));
    const backwards = finish(askVariants(corpusOf(Object.fromEntries(Object.entries(documents).reverse()))));
    expect(backwards).toEqual(forwards);
  });

  it('forgets documents that went', () => {
    const corpus = corpusOf(documents);
    const gone = finish(
      corpus.apply([
        { uri: 'file:///b.md', facts: undefined },
        { uri: 'file:///c.md', facts: undefined },
      ]),
    );
    expect(finish(askVariants(gone))).toEqual([]);
  });

  it('has nothing to ask of an empty corpus', () => {
    expect(finish(askVariants(Corpus.create()))).toEqual([]);
  });
});
