// Candidates from links: two texts that lead to one place name what is there.
import { compareCodeUnits } from '../../base/order.js';
import type { Corpus } from '../../corpus/corpus.js';
import { FactFlag } from '../../facts/flags.js';
import type { PairCollector } from './evidence.js';
import { forEachPair } from './lexical.js';
import type { Segments } from './segment.js';

/** A place to which more names lead than this is a page of several things. */
const MOST_NAMES = 5;

/** Adds the pairs of terms that are the whole texts of links with one target. */
export function pairByLinkTargets(corpus: Corpus, segments: Segments, pairs: PairCollector): void {
  const { stream } = corpus;
  const names = new Map<string, Map<number, number>>();
  const startOf = new Map<number, number>();
  for (let i = 0; i < segments.count; i++) startOf.set(segments.first[i]!, i);
  corpus.documents.forEach(({ uri, facts }, document) => {
    const offset = stream.documentFirst[document]!;
    for (const link of facts.links) {
      let first = offset + link.firstToken;
      const end = offset + link.endToken;
      while (first < end && (stream.flags[first]! & FactFlag.functionWord) !== 0) first++;
      const occurrence = startOf.get(first);
      if (occurrence === undefined || first + segments.length[occurrence]! !== end) continue;
      const target = resolveTarget(uri, link.target);
      let terms = names.get(target);
      if (terms === undefined) names.set(target, (terms = new Map<number, number>()));
      const term = segments.term[occurrence]!;
      terms.set(term, (terms.get(term) ?? 0) + 1);
    }
  });
  const shared = new Map<string, { a: number; b: number; targets: string[] }>();
  for (const [target, terms] of names) {
    if (terms.size > MOST_NAMES) continue;
    forEachPair(
      [...terms.keys()].sort((a, b) => a - b),
      (a, b) => {
        const key = `${a} ${b}`;
        const known = shared.get(key);
        if (known === undefined) shared.set(key, { a, b, targets: [target] });
        else known.targets.push(target);
      },
    );
  }
  for (const { a, b, targets } of shared.values()) {
    const first = targets.sort(compareCodeUnits)[0]!;
    const place = first.slice(first.lastIndexOf('/') + 1) || first;
    pairs.add(a, b, {
      kind: 'link-target',
      strength: Math.min(1, 0.4 + 0.2 * targets.length),
      text: `links with either name lead to the same place, ${place}${targets.length > 1 ? ` and ${targets.length - 1} more` : ''}`,
      value: targets.length,
    });
  }
}

/** A target as one name for one place: relative to its document, without extension, index page and closing slash. */
export function resolveTarget(uri: string, target: string): string {
  const [path = '', anchor] = target.split('#', 2);
  let whole = path;
  if (path === '') whole = uri;
  else if (!/^([a-z][a-z\d+.-]*:|\/)/i.test(path)) {
    const scheme = /^[a-z][a-z\d+.-]*:\/\/[^/]*/i.exec(uri)?.[0] ?? '';
    const steps = uri.slice(scheme.length).split('/').slice(0, -1);
    for (const step of path.split('/')) {
      if (step === '..') steps.pop();
      else if (step !== '.' && step !== '') steps.push(step);
    }
    whole = scheme + steps.join('/');
  }
  const place = whole
    .replace(/\/+$/, '')
    .replace(/\.(md|html?|rst|adoc)$/i, '')
    .replace(/\/(index|readme|_index)$/i, '');
  return anchor === undefined || anchor === '' ? place : `${place}#${anchor}`;
}
