// The English profile: parts of speech after the mends, sentences, lemmas. Expected tags follow Universal Dependencies v2,
// save that a participle between determiner and noun is an adjective here.
import { describe, expect, test } from 'vitest';
import winkNLP, { type ItsFunction } from 'wink-nlp';
import { createEnglishProfile } from '../../../server/src/tokens/english.js';
import { type Tag, tokenText } from '../../../server/src/tokens/tokens.js';
import { openModel } from '../../../server/src/tokens/winkLexicon.js';
import { lemmaIn, paragraph, sentences, tagged } from './tokenText.js';

const profile = createEnglishProfile();

describe('parts of speech', () => {
  test.each([
    ['an imperative noun', 'Click the button.', 'Click/VERB the/DET button/NOUN ./PUNCT'],
    ['an imperative in a numbered list', '1. Note the limit.', '1/NUM ./PUNCT Note/VERB the/DET limit/NOUN ./PUNCT'],
    ['a noun after a modal', 'You can access the logs.', 'You/PRON can/AUX access/VERB the/DET logs/NOUN ./PUNCT'],
    [
      'a participle before its noun',
      'The configured server runs.',
      'The/DET configured/ADJ server/NOUN runs/VERB ./PUNCT',
    ],
    ['a full have', 'Pods have a name.', 'Pods/NOUN have/VERB a/DET name/NOUN ./PUNCT'],
    ['an auxiliary have', 'We have changed it.', 'We/PRON have/AUX changed/VERB it/PRON ./PUNCT'],
    ['a title in capitals', 'Configure The Default Server', 'Configure/VERB The/DET Default/NOUN Server/NOUN'],
    ['an opaque object', 'Run \uFFFC now.', 'Run/VERB \uFFFC/OPAQUE now/ADV ./PUNCT'],
    ['a hyphenated chunk by its head', 'the command-line tools', 'the/DET command-line/NOUN tools/NOUN'],
    ['a contraction by its first word', "It can't start.", "It/PRON can't/AUX start/VERB ./PUNCT"],
    [
      'a head noun that could be a verb',
      'It is in the replica set of a pod.',
      'It/PRON is/AUX in/ADP the/DET replica/NOUN set/NOUN of/ADP a/DET pod/NOUN ./PUNCT',
    ],
    [
      'a bare verb after let',
      'Let the user set a name.',
      'Let/VERB the/DET user/NOUN set/VERB a/DET name/NOUN ./PUNCT',
    ],
    ['identifiers as names', 'the foo_bar file', 'the/DET foo_bar/PROPN file/NOUN'],
  ])('%s', (_, text, expected) => {
    expect(tagged(profile, text)).toBe(expected);
  });
});

describe('sentences', () => {
  test.each([
    ['Stop it. Start it! Does it run? Yes.', ['Stop it.', 'Start it!', 'Does it run?', 'Yes.']],
    ['Use a tool, e.g. Docker, i.e. The Engine. Then go.', ['Use a tool, e.g. Docker, i.e. The Engine.', 'Then go.']],
    ['See No. 5 and Fig. 3. It says no. 5 is odd.', ['See No. 5 and Fig. 3.', 'It says no. 5 is odd.']],
    ['Compare vs. The other. Dr. Smith met John J. Doe.', ['Compare vs. The other.', 'Dr. Smith met John J. Doe.']],
    ['Bring pens, paper, etc. Then write.', ['Bring pens, paper, etc.', 'Then write.']],
    ['He said "stop." Then he left (at once.) All fine.', ['He said "stop."', 'Then he left (at once.)', 'All fine.']],
    ['Set the flag. \uFFFC reads it. foo_bar too.', ['Set the flag.', '\uFFFC reads it.', 'foo_bar too.']],
    ['1. Open the lid. 2. Close it.', ['1. Open the lid.', '2. Close it.']],
    ['Version 2.5 of node.js is out. Use it', ['Version 2.5 of node.js is out.', 'Use it']],
    ['Choose plan B. Then wait.', ['Choose plan B.', 'Then wait.']],
  ])('%s', (text, expected) => {
    expect(sentences(profile, text)).toEqual(expected);
  });
});

describe('lemmas', () => {
  test.each([
    ['The servers run.', 'servers', 'server'],
    ['All indices are new.', 'indices', 'index'],
    ['It was running well.', 'running', 'run'],
    ['Keep tuning it.', 'tuning', 'tune'],
    ['The hostnames differ.', 'hostnames', 'hostname'],
    ['It was reindexed.', 'reindexed', 'reindex'],
    ['The sub-directories are empty.', 'sub-directories', 'sub-directory'],
    ['Two APIs exist.', 'APIs', 'api'],
    ['The data is kept.', 'data', 'data'],
    ['Removable media are slow.', 'media', 'media'],
    ['Its behaviours differ.', 'behaviours', 'behaviour'],
    ['Ask Matthias about Kubernetes today.', 'Kubernetes', 'kubernetes'],
  ])('%s', (text, word, lemma) => {
    expect(lemmaIn(profile, text, word)).toBe(lemma);
  });
});

test('identical texts of one call share their tokens', () => {
  const [first, second] = profile.tokens([paragraph('Same words.'), paragraph('Same words.')]);
  expect(second).toBe(first);
});

test('the text of a token leaves soft hyphens out', () => {
  const text = 'We co\u00ADoperate.';
  const tokens = profile.tokens([paragraph(text)])[0]!;
  expect(tokenText(text, tokens, 1)).toBe('cooperate');
  expect(tokenText(text, tokens, 0)).toBe('We');
});

test('the lexicon that we read from the model agrees with the library that owns it', () => {
  const opened = openModel();
  const nlp = winkNLP(opened.model, ['pos']);
  const lexicon = opened.lexicon();
  const words =
    'servers running children went mice boxes configured indices faster studies heavier quickly released'.split(' ');
  const { pos, lemma } = nlp.its as unknown as Record<'pos' | 'lemma', ItsFunction<string>>;
  for (const word of words) {
    const token = nlp.readDoc(word).tokens().itemAt(0);
    expect(lexicon.lemma(word, token.out(pos) as Tag), word).toBe(token.out(lemma));
    expect(lexicon.knows(word), word).toBe(true);
  }
  expect(lexicon.knows('kubectl')).toBe(false);
  expect(lexicon.canBe('click', 'VERB')).toBe(true);
});
