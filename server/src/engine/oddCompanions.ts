// Odd companions: of two verbs that a termbase admits for one concept, the one that hardly ever goes with an object here.
import { compareCodeUnits } from '../base/order.js';
import type { DecidedConcept, Decisions } from '../decisions/decisions.js';
import type { DecidedTerm } from '../decisions/termsInForce.js';
import type { CheckedTerm } from '../findings/checkedTerm.js';
import { companionsByRelation } from '../mining/companions/byRelation.js';
import { NO_ACCIDENT } from '../mining/companions/companion.js';
import { usesOfForms } from '../mining/companions/companions.js';
import { inflectsAs, termForms } from '../rewrite/inflect.js';
import { termKey } from '../termbase/termKey.js';
import type { Relations } from './relations.js';

/** Fewest uses of the usual verb with the object. */
const FEWEST_USUAL = 10;
/** The usual verb stands with the object so many times as often, at least. */
const LEAST_RATIO = 10;

/**
 * The verbs that are odd with an object, as terms to look for: both verbs are decided to be one concept and allowed, the
 * usual one has at least {@link FEWEST_USUAL} uses with the object and {@link LEAST_RATIO} times those of the odd one, and an
 * even choice between the two would hardly ever come out so. A preferred verb is never odd: the termbase is law.
 */
export function oddCompanions(decisions: Decisions, relations: Relations): CheckedTerm[] {
  return decisions.concepts.flatMap((decided) => {
    const allowed = decided.terms.filter((term) => term.entry.status !== 'deprecated' && isVerb(term));
    if (allowed.length < 2 || allowed.every(({ entry }) => entry.status === 'preferred')) return [];
    const objects = allowed.map((term) => objectsOf(term, decided, relations));
    return allowed.flatMap((term, index) =>
      term.entry.status === 'preferred' ? [] : oddWith(decided, allowed, objects, index),
    );
  });
}

function isVerb({ entry }: DecidedTerm): boolean {
  return inflectsAs(entry.text, entry.partOfSpeech) === 'verb';
}

/** How often a verb has each noun as its object, over all languages. */
function objectsOf({ entry }: DecidedTerm, { concept }: DecidedConcept, relations: Relations): Map<string, number> {
  const forms = termForms(entry.text, 'verb').map(({ text }) => text);
  const meant = new Set(concept.with.map(({ key }) => key));
  const counts = new Map<string, number>();
  for (const { corpus } of relations.languages) {
    for (const { relation, word, count } of companionsByRelation(corpus, usesOfForms(corpus, forms))) {
      if (relation !== 'has-object' || (meant.size > 0 && !meant.has(termKey(word)))) continue;
      counts.set(word, (counts.get(word) ?? 0) + count);
    }
  }
  return counts;
}

function oddWith(
  { concept, uri }: DecidedConcept,
  allowed: readonly DecidedTerm[],
  objects: readonly ReadonlyMap<string, number>[],
  odd: number,
): CheckedTerm[] {
  const { entry } = allowed[odd]!;
  const found: CheckedTerm[] = [];
  for (const [object, uses] of [...objects[odd]!].sort(([a], [b]) => compareCodeUnits(a, b))) {
    let usual = 0;
    let usualUses = 0;
    for (const [other, counts] of objects.entries()) {
      const count = counts.get(object) ?? 0;
      // Of two verbs used alike, the one that the termbase names first.
      if (other !== odd && count > usualUses) [usual, usualUses] = [other, count];
    }
    if (usualUses < FEWEST_USUAL || usualUses < LEAST_RATIO * uses) continue;
    if (againstEvenChoice(uses, usualUses) < NO_ACCIDENT) continue;
    const conceptId = concept.id ?? `${uri}#${concept.preferred.key}`;
    found.push({
      ...{ id: `odd ${conceptId} ${entry.text} ${object}`, text: entry.text, status: 'odd', conceptId },
      ...{ preferred: allowed[usual]!.entry.text, partOfSpeech: 'verb', withObjects: [object] },
      ...{ companionUses: { uses, usualUses } },
    });
  }
  return found;
}

/** G² of two counts against an even choice: 2 Σ observed · ln(observed / expected) (Dunning 1993), one degree of freedom. */
function againstEvenChoice(one: number, other: number): number {
  const even = (one + other) / 2;
  const term = (count: number): number => (count === 0 ? 0 : count * Math.log(count / even));
  return 2 * (term(one) + term(other));
}
