// Folding of spellings: what must share a key, and what must not.
import { describe, expect, it } from 'vitest';
import { spellingKey } from '../../../server/src/lexicon/spelling.js';

// British and American pairs: general knowledge of English, no source.
const same = [
  ['colour', 'color'],
  ['behaviours', 'behaviors'],
  ['organise', 'organize'],
  ['organisational', 'organizational'],
  ['containerised', 'containerized'],
  ['analyse', 'analyze'],
  ['analysing', 'analyzing'],
  ['centre', 'center'],
  ['centimetre', 'centimeter'],
  ['cancelled', 'canceled'],
  ['labelling', 'labeling'],
  ['modelling', 'modeling'],
  ['catalogue', 'catalog'],
  ['dialogue', 'dialog'],
  ['licence', 'license'],
  ['defence', 'defense'],
  ['grey', 'gray'],
  ['adaptor', 'adapter'],
  ['artefact', 'artifact'],
  ['judgement', 'judgment'],
  ['fulfil', 'fulfill'],
  ['enrolment', 'enrollment'],
  ['towards', 'toward'],
  ['backwards', 'backward'],
  ['upwards', 'upward'],
  ['favourite', 'favorite'],
  ['neighbour', 'neighbor'],
  ['fibre', 'fiber'],
  ['colour-blind', 'color-blind'],
  ['serialise', 'serialize'],
  ['parameterisation', 'parameterization'],
] as const;

// Words of their own, though letters or sounds are alike.
const different = [
  ['check', 'cheque'],
  ['disc', 'disk'],
  ['tire', 'tyre'],
  ['meter', 'metre'],
  ['program', 'programme'],
  ['story', 'storey'],
  ['analyzes', 'analyses'],
  ['four', 'for'],
  ['tour', 'tor'],
  ['prize', 'prise'],
  ['rewards', 'reward'],
  ['affect', 'effect'],
  ['ensure', 'insure'],
  ['principal', 'principle'],
  ['device', 'devise'],
  ['advice', 'advise'],
  ['wise', 'wize'],
] as const;

describe('spellingKey', () => {
  it.each(same)('folds %s and %s', (a, b) => expect(spellingKey(a)).toBe(spellingKey(b)));
  it.each(different)('keeps %s and %s apart', (a, b) => expect(spellingKey(a)).not.toBe(spellingKey(b)));

  it.each([
    'raise',
    'exercises',
    'promised',
    'enterprise',
    'advisable',
    'supervising',
    'otherwise',
    'precise',
    'disable',
  ])('leaves %s alone', (word) => expect(spellingKey(word)).toBe(word));

  it('leaves unknown words as they are, and is its own fixed point', () => {
    expect(spellingKey('kubelet')).toBe('kubelet');
    expect(spellingKey('')).toBe('');
    for (const [a] of same) expect(spellingKey(spellingKey(a))).toBe(spellingKey(a));
  });
});
