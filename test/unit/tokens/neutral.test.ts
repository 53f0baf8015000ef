// The neutral profile: any language, no parts of speech.
import { expect, test } from 'vitest';
import { createNeutralProfile } from '../../../server/src/tokens/neutral.js';
import { lemmaIn, sentences, tagged } from './tokenText.js';

test('German words and sentences', () => {
  const profile = createNeutralProfile('de-AT');
  expect(profile.language).toBe('de');
  expect(tagged(profile, 'Der Schlüssel fehlt, 5 mal.')).toBe('Der/X Schlüssel/X fehlt/X ,/PUNCT 5/NUM mal/X ./PUNCT');
  expect(sentences(profile, 'Gut so. Öffnen Sie es! Fertig.')).toEqual(['Gut so.', 'Öffnen Sie es!', 'Fertig.']);
  expect(lemmaIn(profile, 'Der Schlüssel', 'Schlüssel')).toBe('schlüssel');
});

test('Japanese is cut into words, and sentences need no space', () => {
  const profile = createNeutralProfile('ja');
  const text = '端末を起動する。次に設定を開く。';
  expect(sentences(profile, text)).toEqual(['端末を起動する。', '次に設定を開く。']);
  expect(tagged(profile, text).split(' ').length).toBeGreaterThan(6);
});

test('a tag that is no language gives the undetermined one', () => {
  expect(createNeutralProfile('not a tag').language).toBe('und');
  expect(createNeutralProfile('').language).toBe('und');
});
