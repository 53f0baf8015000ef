// A fix applied: its finding is gone and none is new, whatever the terms and the sentence; and edits of the source keep the markup.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { CheckedTerm } from '../../server/src/findings/checkedTerm.js';
import { checkBlock } from '../../server/src/findings/check.js';
import { TermSet } from '../../server/src/findings/termSet.js';
import type { BlockContent } from '../../server/src/prose/prose.js';
import { inflectTerm, type Form } from '../../server/src/rewrite/inflect.js';
import { isRefusal, replaceTerm } from '../../server/src/rewrite/replaceTerm.js';
import { articlesFor } from '../../server/src/rewrite/article.js';
import { applyEdits } from '../../server/src/text/edits.js';

const NOUNS = [
  'API key',
  'access key',
  'hourly report',
  'unit',
  'index',
  'data center',
  'datacenter',
  'VM',
  'virtual machine',
  'point of sale',
  'e-mail',
  'email',
  'user ID',
  'SQL query',
  'process',
  'analysis',
];
const VERBS = [
  'log in',
  'sign in',
  'launch',
  'start',
  'run',
  'set up',
  'configure',
  'back up',
  'submit',
  'copy',
  'begin',
  'write',
  'quit',
];
const NOUN_PLACES = [
  'Use an # here.',
  '# rotation matters.',
  'The #’s owner and the other #.',
  'A # is needed.',
  'All of the # are old (see #).',
  'Managing #.',
  'Use the #, then the #.',
];
const VERB_PLACES = [
  'You can # it now.',
  'They # the job.',
  'It was # by them.',
  '# the job first.',
  'By # the jobs, you # them.',
  'To # is easy.',
];
const FORMS_OF: Readonly<Record<'noun' | 'verb', readonly Form[]>> = {
  noun: ['base', 'plural'],
  verb: ['base', 'thirdPerson', 'past', 'participle', 'gerund'],
};

interface Case {
  readonly terms: readonly CheckedTerm[];
  readonly text: string;
  readonly as: 'noun' | 'verb';
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

const cases: fc.Arbitrary<Case> = fc.constantFrom('noun' as const, 'verb' as const).chain((as) => {
  const pool = as === 'noun' ? NOUNS : VERBS;
  return fc
    .record({
      names: fc.shuffledSubarray(pool, { minLength: 4, maxLength: 4 }),
      places: fc.array(fc.constantFrom(...(as === 'noun' ? NOUN_PLACES : VERB_PLACES)), { minLength: 1, maxLength: 3 }),
      picks: fc.array(fc.tuple(fc.nat(3), fc.constantFrom(...FORMS_OF[as])), { minLength: 9, maxLength: 9 }),
    })
    .map(({ names, places, picks }): Case => {
      const terms = [0, 2].flatMap((at): CheckedTerm[] => [
        { id: `p${at}`, text: names[at]!, status: 'preferred', conceptId: `c${at}`, partOfSpeech: as },
        {
          id: `d${at}`,
          text: names[at + 1]!,
          status: 'deprecated',
          preferred: names[at]!,
          conceptId: `c${at}`,
          partOfSpeech: as,
        },
      ]);
      let used = 0;
      const sentences = places.map((place) =>
        place.replace(/#/g, (_, at: number) => {
          const [name, form] = picks[used++ % picks.length]!;
          const written = inflectTerm(names[name]!, form, as) ?? names[name]!;
          return at === 0 ? capital(written) : written;
        }),
      );
      const text = sentences.join(' ').replace(/\b(an?) (\S+)/gi, (_, article: string, next: string) => {
        const right = articlesFor(next)[0]!;
        return `${article.startsWith('A') ? capital(right) : right} ${next}`;
      });
      return { terms, text, as };
    });
});

function contentOf(text: string): BlockContent {
  return {
    kind: 'paragraph',
    level: 0,
    text,
    zones: 0,
    marks: [],
    links: [],
    pieces: Uint32Array.of(0, 0, text.length),
    sourceLength: text.length,
  };
}

describe('a fix applied', () => {
  it('removes its finding and makes no other', () => {
    let [applied, refused] = [0, 0];
    fc.assert(
      fc.property(cases, ({ terms, text, as }) => {
        const set = new TermSet(terms);
        const before = checkBlock(contentOf(text), set);
        for (const [k, finding] of before.entries()) {
          const result = replaceTerm({
            text,
            span: finding.span,
            from: finding.term,
            to: finding.preferred!,
            partOfSpeech: as,
          });
          if (isRefusal(result)) {
            refused++;
            continue;
          }
          applied++;
          const after = applyEdits(text, result.edits);
          const left = checkBlock(contentOf(after), set).map(({ surface, termId }) => `${surface} ${termId}`);
          const expected = before
            .filter((_, other) => other !== k)
            .map(({ surface, termId }) => `${surface} ${termId}`);
          expect(left, `${text} → ${after}`).toEqual(expected);
          // The article before the new term is one that it takes.
          for (const match of after.slice(Math.max(0, finding.span.start - 4)).matchAll(/\b(an?) (\S+)/gi)) {
            expect(articlesFor(match[2]!), after).toContain(match[1]!.toLowerCase());
          }
        }
      }),
      { numRuns: 1500 },
    );
    expect(applied).toBeGreaterThan(10 * refused);
  });
});
