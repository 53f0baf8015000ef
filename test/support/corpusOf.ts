// Makes a corpus of Markdown texts, as a workspace with these documents would.
import { finish } from '../../server/src/base/work.js';
import { Corpus } from '../../server/src/corpus/corpus.js';
import { factsOf, Profiles } from '../../server/src/engine/factsOf.js';

const profiles = new Profiles();

/** A corpus of documents by URI; a list of texts is named `file:///0.md` and so on. */
export function corpusOf(documents: readonly string[] | Readonly<Record<string, string>>): Corpus {
  const named = Array.isArray(documents)
    ? Object.fromEntries(documents.map((text, i) => [`file:///${i}.md`, text as string]))
    : documents;
  const changes = Object.entries(named as Readonly<Record<string, string>>).map(([uri, text]) => ({
    uri,
    facts: factsOf({ uri, format: 'markdown', text }, profiles)[0],
  }));
  return finish(Corpus.create().apply(changes));
}
