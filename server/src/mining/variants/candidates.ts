// Candidates: ways of writing that share one key, found among the words of the corpus and its n-grams.
import { compareCodeUnits } from '../../base/order.js';
import type { Corpus } from '../../corpus/corpus.js';
import { singularOf } from '../../lexicon/plurals.js';
import { spellingKey } from '../../lexicon/spelling.js';
import { TokenFlag } from '../../tokens/tokens.js';
import { rowsOfSequence } from '../../corpus/concordance.js';
import { singularKey } from '../wording.js';

/** How the parts of a compound stand together: `dataset`, `data-set`, `data set`. */
export type Shape = 'closed' | 'hyphened' | 'open';

/** One way of writing, in lower case: its words, and the rows of the token stream where it stands. */
export interface Form {
  readonly shape: Shape;
  /** The key of its candidate. */
  readonly key: string;
  readonly folds: readonly number[];
  /** Lower case, one space between words. */
  readonly text: string;
  /** The form with its last part in the singular: inflections of one way of writing share it. */
  readonly style: string;
  /** The last part is a plural, or a verb in -s. */
  readonly plural: boolean;
  readonly parts: readonly string[];
  readonly rows: readonly number[];
}

/** Forms that share a key: their parts folded (spelling, plural of the last) and joined. */
export interface Candidate {
  readonly key: string;
  readonly forms: readonly Form[];
}

/** A chunk that may be a form: letters, then letters or digits, parts joined by hyphens. */
const CHUNK = /^\p{L}[\p{L}\p{N}]*(?:-[\p{L}\p{N}]+)*$/u;

/** The longest open form, in words. */
const LONGEST_OPEN = 4;

interface Chunk {
  readonly fold: number;
  readonly parts: readonly string[];
}

/** All candidates of a corpus. Their order is not defined: whoever shows them sorts. */
export function findCandidates(corpus: Corpus): Candidate[] {
  const { chunksByKey, interior, last } = indexChunks(corpus);
  const candidates: Candidate[] = [];
  for (const [key, chunks] of chunksByKey) {
    const open = openForms(corpus, key, chunks, interior, last);
    if (chunks.length + open.length < 2) continue;
    const forms = [
      ...chunks.map(({ fold, parts }) =>
        makeForm(corpus, key, parts.length > 1 ? 'hyphened' : 'closed', [fold], parts),
      ),
      ...open.map((folds) => {
        const parts = folds.map((fold) => corpus.vocabulary.textOf(fold));
        return makeForm(corpus, key, 'open', folds, parts);
      }),
    ];
    forms.sort((a, b) => compareCodeUnits(a.text, b.text));
    if (forms[0]!.text !== forms[forms.length - 1]!.text) candidates.push({ key, forms });
  }
  return candidates;
}

function makeForm(corpus: Corpus, key: string, shape: Shape, folds: readonly number[], parts: readonly string[]): Form {
  const joint = shape === 'hyphened' ? '-' : shape === 'open' ? ' ' : '';
  const head = parts.slice(0, -1);
  const tail = parts[parts.length - 1]!;
  const rows = folds.length === 1 ? [...corpus.stream.rowsOf(folds[0]!)] : rowsOfSequence(corpus.stream, folds);
  const style = [...head, singularKey(tail)].join(joint);
  return { shape, key, folds, text: parts.join(joint), style, plural: singularOf(tail) !== tail, parts, rows };
}

function indexChunks(corpus: Corpus): {
  chunksByKey: Map<string, Chunk[]>;
  interior: Map<string, number[]>;
  last: Map<string, number[]>;
} {
  const { vocabulary, stream } = corpus;
  const chunksByKey = new Map<string, Chunk[]>();
  const interior = new Map<string, number[]>();
  const last = new Map<string, number[]>();
  for (let id = 0; id < vocabulary.size; id++) {
    if (vocabulary.foldOf(id) !== id) continue;
    const rows = stream.rowsOf(id);
    if (rows.length === 0 || (stream.flags[rows[0]!]! & TokenFlag.word) === 0) continue;
    const text = vocabulary.textOf(id);
    if (!CHUNK.test(text)) continue;
    const parts = text.split('-');
    const tailKey = spellingKey(singularKey(parts[parts.length - 1]!));
    if (parts.length === 1) {
      add(interior, spellingKey(text), id);
      add(last, tailKey, id);
    }
    if (parts.length <= LONGEST_OPEN) {
      add(chunksByKey, parts.slice(0, -1).map(spellingKey).join('') + tailKey, { fold: id, parts });
    }
  }
  return { chunksByKey, interior, last };
}

/** The open forms of a key: where a chunk of it has hyphens, at the hyphens; else wherever two words meet. */
function openForms(
  corpus: Corpus,
  key: string,
  chunks: readonly Chunk[],
  interior: ReadonlyMap<string, readonly number[]>,
  last: ReadonlyMap<string, readonly number[]>,
): number[][] {
  const found = new Map<string, number[]>();
  const tryParts = (parts: readonly string[]): void => {
    let sequences: number[][] = [[]];
    parts.forEach((part, index) => {
      const ids = (index === parts.length - 1 ? last : interior).get(part) ?? [];
      sequences = sequences.flatMap((sequence) => ids.map((id) => [...sequence, id]));
    });
    for (const sequence of sequences) {
      const gram = corpus.grams.find(sequence);
      if (gram !== undefined && corpus.usesOfGram(gram) > 0) found.set(sequence.join(), sequence);
    }
  };
  for (const { parts } of chunks) {
    if (parts.length === 1) continue;
    tryParts([...parts.slice(0, -1).map(spellingKey), spellingKey(singularKey(parts[parts.length - 1]!))]);
  }
  const uses = chunks.reduce((sum, chunk) => sum + corpus.stream.rowsOf(chunk.fold).length, 0);
  if (uses >= 2)
    for (let at = 1; at < key.length; at++) {
      const left = key.slice(0, at);
      if (interior.has(left)) {
        const right = key.slice(at);
        if (last.has(right)) tryParts([left, right]);
      }
    }
  return [...found.values()];
}

function add<V>(map: Map<string, V[]>, key: string, value: V): void {
  const list = map.get(key);
  if (list === undefined) map.set(key, [value]);
  else list.push(value);
}
