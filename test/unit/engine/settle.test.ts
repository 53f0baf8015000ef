// Settling while changes come in: what is counted in the end is the text as it is, whatever came when.
import { describe, expect, it } from 'vitest';
import { finish } from '../../../server/src/base/work.js';
import { Engine } from '../../../server/src/engine/engine.js';
import { Profiles, factsOf } from '../../../server/src/engine/factsOf.js';
import type { SourceText } from '../../../server/src/text/sourceText.js';

const profiles = new Profiles();
const page = (name: string, text: string): SourceText => ({ uri: `file:///docs/${name}.md`, format: 'markdown', text });
const update = (source: SourceText, withFacts = false): Parameters<Engine['apply']>[0] => ({
  documents: [{ uri: source.uri, source, ...(withFacts && { facts: factsOf(source, profiles) }) }],
});

describe('a settlement', () => {
  it('leaves an edit made while it rests to the next one, even where facts of the old text had come along', () => {
    const engine = new Engine(profiles);
    engine.apply(update(page('a', 'One two.'), true));
    engine.apply(update(page('b', 'Three four five.'), true));
    const work = engine.settle();
    work.next();
    engine.apply(update(page('b', 'Six.')));
    finish(work);
    finish(engine.settle());
    expect(engine.snapshot.relations.size).toEqual({ documents: 2, words: 3 });
    expect(engine.needsSettling).toBe(false);
  });

  it('keeps the facts that it has gathered when a later one takes over', () => {
    const counted = { gathered: 0 };
    const counting = new (class extends Profiles {
      override for(tag: string | undefined): ReturnType<Profiles['for']> {
        counted.gathered++;
        return super.for(tag);
      }
    })();
    const engine = new Engine(counting);
    for (const name of ['a', 'b', 'c']) engine.apply(update(page(name, `Text of ${name}.`)));
    const first = engine.settle();
    first.next();
    first.next();
    finish(engine.settle());
    finish(first);
    expect(counted.gathered).toBe(3);
    expect(engine.snapshot.relations.size.documents).toBe(3);
  });

  it('mines anew with other options, and takes equal ones for the same', () => {
    const engine = new Engine(profiles);
    engine.apply(update(page('a', 'One two.')));
    finish(engine.settle());
    const { relations } = engine.snapshot;
    engine.apply({ mining: { pastEdits: undefined } });
    expect(engine.needsSettling).toBe(false);
    const pastEdits = { commits: [] };
    engine.apply({ mining: { pastEdits } });
    expect(engine.needsSettling).toBe(true);
    finish(engine.settle());
    expect(engine.needsSettling).toBe(false);
    expect(engine.snapshot.relations).not.toBe(relations);
    expect(engine.snapshot.relations.mining.pastEdits).toBe(pastEdits);
    expect(engine.snapshot.relations.languages[0]?.corpus).toBe(relations.languages[0]?.corpus);
  });
});
