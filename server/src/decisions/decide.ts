// From termbases and mined questions to what is decided and what is still asked.
import { compareCodeUnits } from '../base/order.js';
import type { Question } from '../mining/question.js';
import { inLanguage } from '../termbase/language.js';
import type { Termbase } from '../termbase/termbase.js';
import { Decisions } from './decisions.js';
import { byHabit, habitKeyOf } from './habits.js';
import { Precedents } from './precedents.js';
import { narrow, type Settlement } from './narrow.js';

/** A question that the termbase answers. */
export interface SettledQuestion {
  readonly question: Question;
  readonly settled: Settlement;
}

/** The questions of a corpus, sorted by the decisions. */
export interface Agenda {
  readonly decisions: Decisions;
  /** What of it holds for a question: decisions about its language, and about none. */
  readonly decisionsFor: (question: Question) => Decisions;
  /** What earlier decisions have in common, for suggesting an answer. */
  readonly precedents: Precedents;
  /** Still asked, reduced to what is undecided; by worth, ties by id. */
  readonly open: readonly Question[];
  /** Undecided, and asked when an open one about the same habit of writing is answered. */
  readonly waiting: readonly Question[];
  /** No longer asked, in the order given. */
  readonly settled: readonly SettledQuestion[];
}

/**
 * Sorts questions by the termbases in force.
 * @param chain nearest first, as `scopeOf` gives it.
 */
export function decide(chain: readonly Termbase[], questions: readonly Question[]): Agenda {
  const decisions = new Decisions(chain);
  const byLanguage = new Map<string | undefined, Decisions>();
  const decisionsFor = ({ language }: Question): Decisions => {
    let found = byLanguage.get(language);
    if (found === undefined) {
      const own = chain.map((termbase) => inLanguage(termbase, language));
      found = own.every((termbase, index) => termbase === chain[index]) ? decisions : new Decisions(own);
      byLanguage.set(language, found);
    }
    return found;
  };
  const open: Question[] = [];
  const settled: SettledQuestion[] = [];
  for (const question of questions) {
    const rest = narrow(question, decisionsFor(question));
    if (rest.settled === undefined) open.push(...rest.open);
    else settled.push({ question, settled: rest.settled });
  }
  open.sort(byWorth);
  const putOff = settled.flatMap(({ question, settled: how }) => (how === 'later' ? (habitKeyOf(question) ?? []) : []));
  const asked = byHabit(open, new Set(putOff));
  return {
    ...{ decisions, decisionsFor, precedents: new Precedents(decisions.concepts), settled, waiting: asked.waiting },
    open: [...asked.open].sort(byWorth),
  };
}

function byWorth(a: Question, b: Question): number {
  return b.worth - a.worth || compareCodeUnits(a.id, b.id);
}
