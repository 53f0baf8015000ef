// The check on single sentences: what is reported and, above all, what is not. Expectations: common practice, no source.
import { describe, expect, it } from 'vitest';
import type { CheckedTerm } from '../../../server/src/findings/checkedTerm.js';
import { checkBlock, checkProse } from '../../../server/src/findings/check.js';
import { readKept } from '../../../server/src/findings/suppression.js';
import { TermSet } from '../../../server/src/findings/termSet.js';
import type { Tag } from '../../../server/src/tokens/tokens.js';
import { Zone } from '../../../server/src/prose/zones.js';
import { block, content } from './block.js';

const TERMS: CheckedTerm[] = [
  { id: 'k1', text: 'access key', status: 'preferred', conceptId: 'key', partOfSpeech: 'noun' },
  { id: 'k2', text: 'API key', status: 'deprecated', preferred: 'access key', conceptId: 'key', partOfSpeech: 'noun' },
  { id: 'k3', text: 'API key pair', status: 'apart', conceptId: 'pair', partOfSpeech: 'noun' },
  { id: 's1', text: 'sign in', status: 'preferred', conceptId: 'sign', partOfSpeech: 'verb' },
  { id: 's2', text: 'log in', status: 'deprecated', preferred: 'sign in', conceptId: 'sign', partOfSpeech: 'verb' },
  { id: 'j1', text: 'start', status: 'preferred', conceptId: 'start', partOfSpeech: 'verb' },
  {
    id: 'j2',
    text: 'launch',
    status: 'deprecated',
    preferred: 'start',
    conceptId: 'start',
    partOfSpeech: 'verb',
    withObjects: ['job', 'batch run'],
  },
  { id: 'd1', text: 'data center', status: 'undecided', conceptId: 'q1' },
  { id: 'd2', text: 'datacenter', status: 'undecided', preferred: 'data center', conceptId: 'q1' },
  { id: 'c1', text: 'JavaScript', status: 'preferred', conceptId: 'js' },
  { id: 'c2', text: 'Javascript', status: 'deprecated', preferred: 'JavaScript', conceptId: 'js' },
  { id: 'e1', text: 'email', status: 'preferred', conceptId: 'mail' },
  { id: 'e2', text: 'Email', status: 'deprecated', preferred: 'email', conceptId: 'mail' },
  { id: 'n1', text: 'node', status: 'deprecated', preferred: 'station', conceptId: 'node', partOfSpeech: 'noun' },
  { id: 'n2', text: 'worker node', status: 'admitted', conceptId: 'worker', partOfSpeech: 'noun' },
  { id: 'n3', text: 'key store', status: 'preferred', conceptId: 'store', partOfSpeech: 'noun' },
];
const terms = new TermSet(TERMS);

/** The words found, in order. */
function found(marked: string, kind?: Parameters<typeof content>[1], tags: Record<string, Tag> = {}): string[] {
  const one = content(marked, kind);
  return checkBlock(one, terms, (at) => tags[/^[\p{L}]+/u.exec(one.text.slice(at))?.[0] ?? '']).map(
    ({ surface }) => surface,
  );
}

describe('deprecated terms', () => {
  it.each([
    ['Rotate your API keys.', ['API keys']],
    ['An api key and two API keys', ['api key', 'API keys']],
    ['the API key’s owner', ['API key']],
    ['the API\nkey', ['API\nkey']],
    ['An API key-based login', ['API key']],
    ['(API key)', ['API key']],
    ['an API key, an API key; an API key.', ['API key', 'API key', 'API key']],
    ['The node. The nodes...', ['node', 'nodes']],
    ['the API key: what it is', ['API key']],
    ['the API key(s)', ['API key']],
    ['one node—the first', ['node']],
  ])('reports %j', (text, expected) => expect(found(text)).toEqual(expected));

  it.each([
    'Rotate your access keys.',
    'An API key pair is two keys.',
    'the ⟪API key⟫ here',
    'an API-key here',
    'the api_key and apiKey',
    'the @node and #node',
    'in node.js and my.node',
    'see /etc/node or node/run',
    'call node() now',
    'use --node now',
    'a node_id',
    'node™ and Node®',
    'Node (TM) boxes',
    'a worker node here',
    'a super-node and a node-local disk',
    'an access key (formerly API key)',
    'the access key, previously called the API key',
    'say “API key” no more',
    'the term API key is old',
    '\uFFFCnode and node\uFFFC',
    'a <node> or {node}',
    'an API key store here',
    'node=3, $node, node*, node+',
    'dataCenter',
    'client.update( node = "2" )',
  ])('is quiet in %j', (text) => expect(found(text)).toEqual([]));

  it('speaks plainly', () => {
    const [finding] = checkBlock(content('An API key.'), terms);
    expect(finding).toMatchObject({
      code: 'deprecated-term',
      severity: 'warning',
      message: '“API key” is deprecated: this documentation says “access key”.',
      span: { start: 3, end: 10 },
      form: 'base',
      preferred: 'access key',
      conceptId: 'key',
    });
  });

  it('tells the zones, so that a safety message is known as one', () => {
    expect(checkBlock(content('⟪Touch no API key⟫', 'paragraph', Zone.safetyMessage), terms)[0]?.zones).toBe(
      Zone.safetyMessage,
    );
  });

  it('leaves blocks in closed zones alone', () => {
    expect(checkBlock({ ...content('API key'), zones: Zone.quotation }, terms)).toEqual([]);
  });
});

describe('verbs and nouns', () => {
  it.each([
    ['Log in to the console.', ['Log in']],
    ['You can log in with a token.', ['log in']],
    ['She is logged in.', ['logged in']],
    ['Launch the job.', ['Launch']],
    ['It launches nightly jobs when asked.', ['launches'], { launches: 'VERB' }],
    ['You launch a batch run.', ['launch']],
    ['The jobs are launched.', ['launched']],
    ['Jobs launched by cron', ['launched']],
    ['The job has been automatically launched at night', ['launched']],
    ['to launch the large nightly job', ['launch']],
  ] as [string, string[], Record<string, Tag>?][])('reports %j', (text, expected, tags) =>
    expect(found(text, 'paragraph', tags)).toEqual(expected),
  );

  it.each([
    'the log in page',
    'the log-in page',
    'Check the logs in the console.',
    'Access logs in CloudWatch',
    'Write to the log in the folder.',
    'Configure logging in the console.',
    'Launch the browser.',
    'Launch the job editor.',
    'Launch the browser from the job.',
    'the launch of a job',
    'after the launch the job ends',
    'The job launcher was launched.',
    'The rocket was launched before the job.',
  ])('is quiet in %j', (text) => expect(found(text)).toEqual([]));

  it('asks the tagger where the neighbours do not tell', () => {
    expect(found('Users log in daily')).toEqual([]);
    expect(found('Users log in daily', 'paragraph', { log: 'VERB' })).toEqual(['log in']);
    expect(found('Error log in daily', 'paragraph', { log: 'NOUN' })).toEqual([]);
  });
});

describe('a particle verb whose objects are named', () => {
  const objects = { partOfSpeech: 'verb', withObjects: ['light', 'breaker'] } as const;
  const switching = new TermSet([
    { id: 't1', text: 'switch on', status: 'preferred', conceptId: 'on', ...objects },
    { id: 't2', text: 'turn on', status: 'deprecated', preferred: 'switch on', conceptId: 'on', ...objects },
  ]);
  const surfaces = (text: string): string[] => checkBlock(content(text), switching).map(({ surface }) => surface);

  it.each([
    ['Turn on the navigation light.', ['Turn on']],
    ['The crew turns on the main breaker.', ['turns on']],
    ['When you have turned on the lights, wait.', ['turned on']],
  ])('is found before one of them: %j', (text, expected) => expect(surfaces(text)).toEqual(expected));

  it.each(['Turn on the spot.', 'The vessel must turn on the tide.', 'a turn on the light'])(
    'is left alone elsewhere: %j',
    (text) => expect(surfaces(text)).toEqual([]),
  );
});

describe('case alone', () => {
  it.each([
    ['Use Javascript here.', 'paragraph', ['Javascript']],
    ['Use JavaScript here.', 'paragraph', []],
    ['Use javascript here.', 'paragraph', []],
    ['Send an Email now.', 'paragraph', ['Email']],
    ['Send it. Email works.', 'paragraph', []],
    ['Email works.', 'paragraph', []],
    ['Sending Email', 'heading', []],
  ] as const)('%j', (text, kind, expected) => expect(found(text, kind)).toEqual(expected));
});

describe('mixed terms', () => {
  it('hints at the names that do not lead', () => {
    const findings = checkBlock(content('A datacenter and a data center'), terms);
    expect(findings).toMatchObject([
      { code: 'mixed-terms', severity: 'hint', surface: 'datacenter', questionId: 'q1', preferred: 'data center' },
    ]);
    expect(findings[0]!.message).toBe(
      '“datacenter” and “data center” may name one thing, and nobody has decided: answer the question once.',
    );
  });
});

describe('a document', () => {
  const text =
    'An API key.\n\n<!-- evenword: keep -->\nAn API key\nand an API key.\n\nAn API key. <!-- evenword: keep "API key" -->\n\nAn API key. <!-- evenword: keep "node" -->\n';
  const prose = {
    blocks: [
      block('An API key.', 0),
      block('An API key\nand an API key.', text.indexOf('An API key\nand')),
      block('An API key.', text.indexOf('An API key. <')),
      block('An API key.', text.lastIndexOf('An API key. <')),
    ],
    problems: [],
    language: undefined,
  };

  it('maps to the source and honours what the document keeps', () => {
    const kept = readKept({ uri: 'a.md', format: 'markdown', text });
    const findings = checkProse(prose, terms, { kept });
    expect(kept.problems).toEqual([]);
    expect(findings.map(({ span, block: at }) => [at, text.slice(span.start, span.end)])).toEqual([
      [0, 'API key'],
      [3, 'API key'],
    ]);
    expect(checkProse(prose, terms)).toHaveLength(5);
  });

  it('reports a comment that it does not understand', () => {
    const kept = readKept({ uri: 'a.md', format: 'markdown', text: 'x\n<!-- evenword: hush -->\n' });
    expect(kept.problems).toMatchObject([{ span: { start: 2, end: 25 } }]);
  });

  it('takes findings of a block from a cache', () => {
    let asked = 0;
    checkProse(prose, terms, { ofBlock: () => (asked++, []) });
    expect(asked).toBe(4);
  });
});
