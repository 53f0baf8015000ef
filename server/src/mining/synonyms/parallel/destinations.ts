// Where a link leads inside the documents: the title or first heading of a page, or the heading that an anchor names.
import type { Corpus } from '../../../corpus/corpus.js';
import { BLOCK_KINDS } from '../../../prose/prose.js';
import { resolveTarget } from '../linkTargets.js';
import type { Passage } from './passages.js';

const HEADING = BLOCK_KINDS.indexOf('heading');
const TITLE = BLOCK_KINDS.indexOf('title');

/** The headings that links lead to. */
export interface Destinations {
  /** The headings (of a page: its title and its first heading) that the target of a link in a document names; may be empty. */
  of(uri: string, target: string): readonly Passage[];
}

/** Reads the titles and headings of all documents; anchors are made of those headings alone that some link may lead to. */
export function readDestinations(corpus: Corpus): Destinations {
  const { stream, documents } = corpus;
  const pages = new Map<string, number>();
  /** Pages by the last steps of their path; −1 where two share them. */
  const byEnding = new Map<string, number>();
  const names: Passage[][] = [];
  const headings: Passage[][] = [];
  let block = 0;
  documents.forEach(({ uri, facts }, document) => {
    const place = resolveTarget(uri, '');
    pages.set(place, document);
    for (const ending of endingsOf(place)) byEnding.set(ending, byEnding.has(ending) ? -1 : document);
    const titles: Passage[] = [];
    const own: Passage[] = [];
    for (let at = 0; at < facts.blockKind.length; at++, block++) {
      const kind = facts.blockKind[at]!;
      if (kind !== TITLE && kind !== HEADING) continue;
      const passage = { first: stream.blockFirst[block]!, end: stream.blockFirst[block + 1]! };
      (kind === TITLE ? titles : own).push(passage);
    }
    names.push([...titles, ...own.slice(0, 1)]);
    headings.push(own);
  });
  const anchors: (ReadonlyMap<string, Passage> | undefined)[] = [];
  const anchorsOf = (document: number): ReadonlyMap<string, Passage> =>
    (anchors[document] ??= new Map(
      [...headings[document]!].reverse().map((heading) => [anchorOf(textOf(corpus, heading)), heading]),
    ));
  let anywhere: Map<string, Passage | undefined> | undefined;
  const findAnywhere = (label: string): Passage | undefined => {
    if (anywhere === undefined) {
      anywhere = new Map();
      for (const heading of headings.flat()) {
        const anchor = anchorOf(textOf(corpus, heading));
        anywhere.set(anchor, anywhere.has(anchor) ? undefined : heading);
      }
    }
    return label === '' ? undefined : anywhere.get(label);
  };
  return {
    of: (uri, target) => {
      const [path = '', anchor = ''] = target.replace(/\{\{[^}]*\}\}/g, '').split('#', 2);
      if (/^[a-z][a-z\d+.-]*:/i.test(path)) return [];
      const document = pages.get(resolveTarget(uri, path)) ?? ofEnding(byEnding, path);
      if (anchor !== '') {
        const found = document === undefined ? undefined : anchorsOf(document).get(anchorOf(anchor));
        return found === undefined ? [] : [found];
      }
      if (document !== undefined) return names[document]!;
      // A label without a path, as cross-references have it, names a heading by its words.
      const labelled = /[/.]/.test(path) ? undefined : findAnywhere(anchorOf(path));
      return labelled === undefined ? [] : [labelled];
    },
  };
}

/** A path that names a page from the root of a site: the one page whose path ends so. */
function ofEnding(byEnding: ReadonlyMap<string, number>, path: string): number | undefined {
  const steps = resolveTarget('', path.replace(/^\/+/, '/')).replace(/^\/+/, '');
  const found = byEnding.get(steps);
  return steps === '' || found === -1 ? undefined : found;
}

const LONGEST_ENDING = 6;

/** The endings of one to six steps that a path has, underscores that open a folder left out as sites do. */
function endingsOf(place: string): string[] {
  const steps = place
    .replace(/^[a-z][a-z\d+.-]*:\/*/i, '')
    .split('/')
    .map((step) => step.replace(/^_+/, ''));
  return Array.from({ length: Math.min(LONGEST_ENDING, steps.length) }, (_, at) => steps.slice(-at - 1).join('/'));
}

/** An anchor or heading as slugs of every kind have it in common: its letters and digits. */
function anchorOf(text: string): string {
  return text.toLowerCase().replace(/[^\p{L}\p{N}]+/gu, '');
}

function textOf({ stream, vocabulary }: Corpus, { first, end }: Passage): string {
  let text = '';
  for (let row = first; row < end; row++) text += vocabulary.textOf(stream.fold[row]!);
  return text;
}
