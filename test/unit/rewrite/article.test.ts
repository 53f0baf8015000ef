// A and an: a table from common practice, then every word of a pronouncing dictionary.
import { dictionary } from 'cmu-pronouncing-dictionary';
import { describe, expect, it } from 'vitest';
import { articleFor, articlesFor } from '../../../server/src/rewrite/article.js';

describe('article', () => {
  // Common practice, no source.
  const AN =
    'hour|honest answer|heir|honor|access key|API key|XML file|SSL certificate|SSH key|HTTP request|MFA code|RPC|8-bit byte|11th node|18-core CPU|800|' +
    'x-axis|S3 bucket|N-tier app|A/B test|iOS device|eBPF program|mTLS link|npm package|nginx server|LDAP server|FAQ|IDE|umbrella|unimportant thing|' +
    'uninstall script|unidentified node|XPath expression|upload|update|unknown|onion|element|APIs|e-mail|SDK|RFC|LRU cache|F1 key|OS';
  const A =
    'user|unique key|university|one-time password|once-only step|European site|URL|UUID|USB stick|UI|utility|uniform|used key|JSON file|YAML file|REST API|' +
    'RAM disk|LAN|NAT gateway|SAML token|RAID array|house|historic|key|Unicode character|ubiquitous thing|100|1 GB disk|180|1100 words|T-shirt|U-turn|' +
    'VM|PDF|CPU|GPU|gRPC call|kubectl command|unanimous vote|usual way|yes|MySQL table|ROM';
  it.each(AN.split('|'))('an %s', (phrase) => expect(articleFor(phrase)).toBe('an'));
  it.each(A.split('|'))('a %s', (phrase) => expect(articleFor(phrase)).toBe('a'));
  it('leaves both where usage is divided', () => expect(articlesFor('SQL query')).toEqual(['an', 'a']));

  it('agrees with the CMU Pronouncing Dictionary', () => {
    let sum = 0;
    const wrong: string[] = [];
    for (const [word, phonemes] of Object.entries(dictionary)) {
      if (!/^[a-z]{3,}$/.test(word)) continue;
      sum++;
      if (!articlesFor(word).includes(/^[AEIOU]/.test(phonemes) ? 'an' : 'a')) wrong.push(word);
    }
    expect(sum).toBeGreaterThan(100_000);
    // What remains is proper names and initialisms that the dictionary writes small.
    expect(wrong.length / sum, wrong.join(' ')).toBeLessThan(0.0015);
  });
});
