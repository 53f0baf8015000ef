// Replacing a term in a sentence: the whole sentence before and after. Expected sentences: common practice, no source.
import { describe, expect, it } from 'vitest';
import type { PartOfSpeech } from '../../../server/src/rewrite/inflect.js';
import { isRefusal, replaceTerm } from '../../../server/src/rewrite/replaceTerm.js';
import { applyEdits } from '../../../server/src/text/edits.js';

/** Replaces the words between ⟦ and ⟧; a refusal comes back as `refused: …`, an uncertain result with a question mark in front. */
function replaced(marked: string, from: string, to: string, partOfSpeech?: PartOfSpeech): string {
  const start = marked.indexOf('⟦');
  const end = marked.indexOf('⟧') - 1;
  const text = marked.replace('⟦', '').replace('⟧', '');
  const result = replaceTerm({ text, span: { start, end }, from, to, ...(partOfSpeech ? { partOfSpeech } : {}) });
  if (isRefusal(result)) return `refused: ${result.refused}`;
  return (result.certain ? '' : '? ') + applyEdits(text, result.edits);
}

describe('nouns', () => {
  it.each([
    ['Rotate your ⟦API keys⟧ monthly.', 'API key', 'access key', 'Rotate your access keys monthly.'],
    ['⟦API keys⟧ expire.', 'API key', 'access key', 'Access keys expire.'],
    ['⟦API key⟧ rotation matters.', 'API key', 'access key', 'Access key rotation matters.'],
    ['Use an ⟦API key⟧.', 'API key', 'service key', 'Use a service key.'],
    ['An ⟦API key⟧ is needed.', 'API key', 'service key', 'A service key is needed.'],
    ['A ⟦service key⟧ is needed.', 'service key', 'API key', 'An API key is needed.'],
    ['Use an ⟦API key⟧.', 'API key', 'access key', 'Use an access key.'],
    ['Take a ⟦user ID⟧.', 'user ID', 'account ID', 'Take an account ID.'],
    ['Take a ⟦name⟧.', 'name', 'user name', 'Take a user name.'],
    ['Wait an ⟦hour⟧.', 'hour', 'user-defined period', 'Wait a user-defined period.'],
    ['the ⟦API key⟧’s owner', 'API key', 'access key', 'the access key’s owner'],
    ["the ⟦API keys⟧' owners", 'API key', 'access key', "the access keys' owners"],
    ["the ⟦process⟧' exit code", 'process', 'task', "the task's exit code"],
    ["the ⟦indexes⟧' names", 'index', 'criterion', "the criteria's names"],
    ['# ⟦API Keys⟧ and Tokens', 'API key', 'access key', '# Access Keys and Tokens'],
    ['Managing ⟦API Keys⟧', 'API key', 'access key', 'Managing Access Keys'],
    ['MANAGING ⟦API KEYS⟧', 'API key', 'access key', 'MANAGING ACCESS KEYS'],
    ['AN ⟦API KEY⟧ IS NEEDED', 'API key', 'service key', 'A SERVICE KEY IS NEEDED'],
    ['⟦Datacenter⟧ design', 'datacenter', 'data center', 'Data center design'],
    ['Building the New ⟦Datacenter⟧', 'datacenter', 'data center', 'Building the New Data Center'],
    ['Managing ⟦VM⟧ Disks', 'VM', 'virtual machine', 'Managing Virtual Machine Disks'],
    ['in two ⟦data centers⟧', 'data center', 'datacenter', 'in two datacenters'],
    ['Start two ⟦VMs⟧ now.', 'VM', 'virtual machine', 'Start two virtual machines now.'],
    ['Start an ⟦VM⟧ now.', 'VM', 'instance', 'Start an instance now.'],
    ['⟦VMs⟧ are cheap.', 'VM', 'virtual machine', 'Virtual machines are cheap.'],
    ['two ⟦virtual machines⟧', 'virtual machine', 'VM', 'two VMs'],
    ['the ⟦mice⟧ here', 'mouse', 'pointing device', 'the pointing devices here'],
    ['all ⟦points of sale⟧', 'point of sale', 'till', 'all tills'],
    ['all ⟦tills⟧', 'till', 'point of sale', 'all points of sale'],
    ['for example, e.g. ⟦API keys⟧', 'API key', 'access key', 'for example, e.g. access keys'],
    ['On ⟦mobile devices⟧', 'mobile device', 'iOS device', 'On iOS devices'],
    ['⟦Mobile devices⟧ work.', 'mobile device', 'iOS device', 'iOS devices work.'],
    ['Use the ⟦API\nkey⟧ here.', 'API key', 'access key', 'Use the access\nkey here.'],
    ['Rotate (an ⟦API key⟧).', 'API key', 'service key', 'Rotate (a service key).'],
    ['Choose option A ⟦API keys⟧ or', 'API key', 'service key', 'Choose option A service keys or'],
    ['an ⟦e-mail⟧', 'e-mail', 'email', 'an email'],
    ['⟦E-mail⟧ is fine', 'e-mail', 'email', 'Email is fine'],
    ['⟦Javascript⟧ code', 'Javascript', 'JavaScript', 'JavaScript code'],
    ['a ⟦user interface⟧', 'user interface', 'SQL console', 'a SQL console'],
    ['an ⟦interface⟧', 'interface', 'SQL console', 'an SQL console'],
  ])('%s', (marked, from, to, expected) => {
    expect(replaced(marked, from, to, 'noun')).toBe(expected);
  });
});

describe('verbs', () => {
  it.each([
    ['She ⟦logs in⟧ daily.', 'log in', 'sign in', 'She signs in daily.'],
    ['She is ⟦logged in⟧.', 'log in', 'sign in', 'She is signed in.'],
    ['⟦Logging in⟧ is easy.', 'log in', 'sign in', 'Signing in is easy.'],
    ['⟦Log in⟧ to the console.', 'log in', 'sign in', 'Sign in to the console.'],
    ['⟦Launching⟧ a job', 'launch', 'start', 'Starting a job'],
    ['The job was ⟦launched⟧.', 'launch', 'run', 'The job was run.'],
    ['They ⟦launched⟧ it.', 'launch', 'run', 'They ran it.'],
    ['We ⟦launched⟧ it.', 'launch', 'begin', 'We began it.'],
    ['A job ⟦launched⟧ by cron', 'launch', 'begin', 'A job begun by cron'],
    ['jobs ⟦launched⟧ today', 'launch', 'begin', '? jobs begun today'],
    ['jobs ⟦launched⟧ today', 'launch', 'start', 'jobs started today'],
    ['It ⟦launches⟧ jobs.', 'launch', 'submit', 'It submits jobs.'],
    ['by ⟦launching⟧ jobs', 'launch', 'submit', 'by submitting jobs'],
    ['You can ⟦configure⟧ it.', 'configure', 'set up', 'You can set it up.'],
    ['⟦Configuring⟧ the server', 'configure', 'set up', 'Setting up the server'],
    ['⟦Setting up⟧ the server', 'set up', 'configure', 'Configuring the server'],
    ['⟦Backing up⟧ data', 'back up', 'save', 'Saving data'],
    ['To list all, ⟦run⟧ the command.', 'run', 'begin', 'To list all, begin the command.'],
    ['You can also ⟦set up⟧ a policy.', 'set up', 'configure', 'You can also configure a policy.'],
    ['They ⟦set up⟧ a policy.', 'set up', 'configure', '? They configure a policy.'],
    ['It ⟦copy-pastes⟧ text', 'copy-paste', 'clone', 'It clones text'],
  ])('%s', (marked, from, to, expected) => {
    expect(replaced(marked, from, to, 'verb')).toBe(expected);
  });
});

describe('refusals', () => {
  it.each([
    ['Use an ⟦API key⟧ here.', 'API key', 'credentials', /is a plural/],
    ['The ⟦API key⟧ is old.', 'API key', 'credentials', /is a plural/],
    ['Install the ⟦programs⟧.', 'program', 'software', /has no plural/],
    ['Install a ⟦program⟧.', 'program', 'software', /is not counted/],
    ['Start the ⟦VM⟧ machine.', 'VM', 'virtual machine', /twice/],
    ['an access ⟦API key⟧', 'API key', 'access key', /twice/],
    ['a virtual machine (⟦VM⟧) runs', 'VM', 'virtual machine', /explains/],
    ['a ⟦virtual machine⟧ (VM) runs', 'virtual machine', 'guest', /explains/],
    ['the ⟦API token⟧ here', 'API key', 'access key', /no form/],
    ['⟦set the server up⟧', 'set up', 'configure', /no form/],
    ['the ⟦access key⟧', 'access key', 'access key', /already/],
  ])('%s', (marked, from, to, expected) => {
    expect(replaced(marked, from, to)).toMatch(expected);
  });

  it('leaves closed zones alone', () => {
    const result = replaceTerm({
      text: 'API key',
      zones: 2,
      span: { start: 0, end: 7 },
      from: 'API key',
      to: 'access key',
    });
    expect(isRefusal(result)).toBe(true);
  });

  it('takes a plural for a plural-only term', () => {
    expect(replaced('Rotate the ⟦API keys⟧.', 'API key', 'credentials', 'noun')).toBe('Rotate the credentials.');
  });
});
