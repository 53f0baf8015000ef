// Where the choice between two terms is made: by folder, by page, or inside pages; in bits.
import { byCountThenText } from '../../base/order.js';
import type { Corpus } from '../../corpus/corpus.js';
import { conditionalEntropy, entropy, mutualInformation } from '../../corpus/statistics/probability.js';
import type { ComparedTerm } from './comparison.js';

/** The uses of both terms in one folder. */
export interface FolderCounts {
  /** URI of the folder, with a closing slash. */
  readonly folder: string;
  readonly uses: readonly [number, number];
}

/** How sure the choice of the term is, by itself and where the place is known (Cover & Thomas, ch. 2). */
export interface Choice {
  /** Most uses first, ties by code units. */
  readonly folders: readonly FolderCounts[];
  /** H(term), in bits: 1 where both are used as often. */
  readonly entropy: number;
  /** H(term | folder) and H(term | document): what stays unsure where the place is known. */
  readonly withinFolders: number;
  readonly withinDocuments: number;
  /** I(term; folder): what the folder tells of the choice. */
  readonly byFolder: number;
  /** Documents that use both. */
  readonly documentsWithBoth: number;
}

/** Counts both terms by folder and document. */
export function choiceByPlace(corpus: Corpus, terms: readonly [ComparedTerm, ComparedTerm]): Choice {
  const byDocument = new Map<number, [number, number]>();
  terms.forEach(({ uses }, side) => {
    for (const { row } of uses) {
      const document = corpus.stream.documentOf(row);
      const counts = byDocument.get(document) ?? [0, 0];
      counts[side]!++;
      byDocument.set(document, counts);
    }
  });
  const byFolder = new Map<string, [number, number]>();
  for (const [document, [a, b]] of byDocument) {
    const { uri } = corpus.documents[document]!;
    const folder = uri.slice(0, uri.lastIndexOf('/') + 1);
    const counts = byFolder.get(folder) ?? [0, 0];
    byFolder.set(folder, [counts[0] + a, counts[1] + b]);
  }
  const folders = [...byFolder]
    .map(([folder, uses]) => ({ folder, uses, text: folder, count: uses[0] + uses[1] }))
    .sort(byCountThenText);
  const table = folders.map(({ uses }) => uses);
  // In the order of the documents, so that sums of floating point come out alike.
  const pages = [...byDocument].sort(([a], [b]) => a - b).map(([, counts]) => counts);
  return {
    folders: folders.map(({ folder, uses }) => ({ folder, uses })),
    entropy: entropy(terms.map(({ uses }) => uses.length)),
    withinFolders: conditionalEntropy(table),
    withinDocuments: conditionalEntropy(pages),
    byFolder: mutualInformation(table),
    documentsWithBoth: pages.filter(([a, b]) => a > 0 && b > 0).length,
  };
}
