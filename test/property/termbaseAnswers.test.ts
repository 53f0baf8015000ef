// The whole round: a question, an answer on offer, the file written and read, the question settled.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decide } from '../../server/src/decisions/decide.js';
import { answersOf } from '../../server/src/decisions/preference.js';
import type { Question } from '../../server/src/mining/question.js';
import { answerEdits } from '../../server/src/termbase/edit.js';
import { parseTermbase } from '../../server/src/termbase/parse.js';
import { applyEdits } from '../../server/src/text/edits.js';

const pool = ['access key', 'API key', 'api-key', 'key pair', 'token', 'GitHub', 'Github', 'log in', 'sign in', 'C#'];

const question: fc.Arbitrary<Question> = fc
  .uniqueArray(fc.constantFrom(...pool), { minLength: 2, maxLength: 4 })
  .chain((texts) =>
    fc.array(fc.integer({ min: 1, max: 40 }), { minLength: texts.length, maxLength: texts.length }).map((counts) => {
      const uses = [...counts].sort((a, b) => b - a);
      const terms = texts.map((text, index) => ({
        text,
        uses: uses[index]!,
        documents: 1,
        forms: [{ text, uses: uses[index]! }],
      }));
      const rivals = uses.slice(1).reduce((sum, count) => sum + count, 0);
      return {
        id: `synonym:${[...texts].sort().join('|')}`,
        kind: 'synonym',
        confidence: 0.5,
        worth: rivals / 2,
        terms,
        reasons: [],
        places: texts.map((_, term) => ({ term, document: 0, firstToken: term, lastToken: term })),
      };
    }),
  );

describe('answering every question as offered', () => {
  it('is never refused, settles the question asked, and comes to an end', () => {
    fc.assert(
      fc.property(
        fc.array(question, { minLength: 1, maxLength: 5 }),
        fc.infiniteStream(fc.nat(11)),
        (questions, picks) => {
          let text = '# ours\n';
          const bound = 4 * pool.length * pool.length;
          for (let rounds = 0; ; rounds++) {
            expect(rounds).toBeLessThan(bound);
            const agenda = decide([parseTermbase(text, 'file:///termbase.yaml').termbase], questions);
            const [asked] = agenda.open;
            if (asked === undefined) break;
            const answers = answersOf(asked, agenda.decisions, agenda.precedents);
            const answer = answers[picks.next().value % answers.length]!;
            const result = answerEdits(text, answer);
            if (result.kind === 'refused') throw new Error(`${JSON.stringify(answer)} in\n${text}\n${result.message}`);
            expect(result.edits.length).toBeGreaterThan(0);
            text = applyEdits(text, result.edits);
            const after = decide([parseTermbase(text, 'file:///termbase.yaml').termbase], questions);
            expect(after.open.map(({ id }) => id)).not.toContain(asked.id);
          }
        },
      ),
      { numRuns: 200 },
    );
  });
});
