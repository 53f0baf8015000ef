// A trie over word numbers whose edges lie in one hash table of typed arrays; its leaves are chains of patterns.
import type { Pattern } from './pattern.js';
import type { WordTable } from './wordTable.js';

const SPACE = 0;
const HYPHEN = 1;

/** The compiled patterns. Nodes are numbers; node 0 is the root and is reached by no edge. */
export class TermTrie {
  /**
   * Two cells for each word, by number: the node that it leads to from the root, negative where a pattern ends there and 0 where no
   * pattern begins with it; and that node's {@link ways}. Side by side, because the scan reads both for every word.
   */
  readonly roots: Int32Array;
  /** One bit for each symbol that leaves the node, by {@link bitOf}: a clear bit spares the look into the edges; 0 where none leaves. */
  readonly ways: Int32Array;
  /** Head of the node's chain of patterns, as pattern index + 1. */
  readonly accept: Int32Array;
  /** The next pattern of a chain, as index + 1. */
  readonly next: Int32Array;
  /** 1 where a pattern of the node's chain asks for more than its words: signs around them, or an exact case. */
  readonly particular: Uint8Array;
  /** The folded spelling of the first pattern of a node's chain: range of `units`, separators as one unit 0. */
  readonly spellings: Int32Array;
  readonly units: Uint16Array;
  /** Edges as (node, symbol, target) in open addressing; target 0 is an empty slot, a negative one has patterns. */
  private readonly edges: Int32Array;
  private mask = 15;
  private readonly separators = new Map<string, number>([
    [' ', SPACE],
    ['-', HYPHEN],
  ]);
  readonly separatorCount: number;

  constructor(patterns: readonly Pattern[], words: WordTable) {
    for (const { separators } of patterns) {
      for (const separator of separators) {
        if (!this.separators.has(separator)) this.separators.set(separator, this.separators.size);
      }
    }
    this.separatorCount = this.separators.size;
    const nodes = 1 + patterns.reduce((sum, { words: own }) => sum + own.length, 0);
    this.ways = new Int32Array(nodes);
    this.accept = new Int32Array(nodes);
    this.next = new Int32Array(patterns.length);
    this.particular = new Uint8Array(nodes);
    this.spellings = new Int32Array(nodes * 2);
    this.units = new Uint16Array(patterns.reduce((sum, pattern) => sum + spelling(pattern).length, 0));
    const first = new Int32Array(words.size);
    const edges = new Map<number, readonly [node: number, symbol: number, target: number]>();
    let count = 1;
    const ends = patterns.map((pattern) => {
      const start = words.find(pattern.words[0]!);
      let node = first[start]!;
      if (node === 0) node = first[start] = count++;
      for (let k = 1; k < pattern.words.length; k++) {
        const symbol =
          words.find(pattern.words[k]!) * this.separatorCount + this.separators.get(pattern.separators[k - 1]!)!;
        const key = node * words.size * this.separatorCount + symbol;
        const target = edges.get(key)?.[2] ?? count++;
        edges.set(key, [node, symbol, target]);
        node = target;
      }
      return node;
    });
    // Chains run in the order of the patterns, so they are built from the back.
    let free = 0;
    for (let index = patterns.length - 1; index >= 0; index--) {
      const pattern = patterns[index]!;
      const node = ends[index]!;
      if (pattern.lead !== '' || pattern.tail !== '' || pattern.exact !== undefined) this.particular[node] = 1;
      if (this.accept[node] === 0) {
        this.spellings[node * 2] = free;
        for (const unit of spelling(pattern)) this.units[free++] = unit;
        this.spellings[node * 2 + 1] = free;
      }
      this.next[index] = this.accept[node]!;
      this.accept[node] = index + 1;
    }
    while ((this.mask + 1) * 2 < edges.size * 3) this.mask = this.mask * 2 + 1;
    this.edges = new Int32Array(3 * (this.mask + 1));
    for (const [node, symbol, target] of edges.values()) this.layEdge(node, symbol, target);
    this.roots = new Int32Array(words.size * 2);
    for (const [word, node] of first.entries()) {
      this.roots[word * 2] = this.accept[node] === 0 ? node : -node;
      this.roots[word * 2 + 1] = this.ways[node]!;
    }
  }

  /** The number of a separator in its normal form, or −1 where no pattern has it. */
  separator(normal: string): number {
    return this.separators.get(normal) ?? -1;
  }

  /** The node that a symbol (word × separatorCount + separator) leads to, negative where a pattern ends there, or 0. */
  step(node: number, symbol: number): number {
    const { edges, mask } = this;
    for (let slot = slotOf(node, symbol) & mask; ; slot = (slot + 1) & mask) {
      const target = edges[slot * 3 + 2]!;
      if (target === 0 || (edges[slot * 3] === node && edges[slot * 3 + 1] === symbol)) return target;
    }
  }

  private layEdge(node: number, symbol: number, target: number): void {
    let slot = slotOf(node, symbol) & this.mask;
    while (this.edges[slot * 3 + 2] !== 0) slot = (slot + 1) & this.mask;
    this.edges[slot * 3] = node;
    this.edges[slot * 3 + 1] = symbol;
    this.edges[slot * 3 + 2] = this.accept[target] === 0 ? target : -target;
    this.ways[node]! |= bitOf(symbol);
  }
}

function spelling({ words, separators }: Pattern): number[] {
  const units: number[] = [];
  for (const [k, word] of words.entries()) {
    for (let at = 0; at < word.length; at++) units.push(word.charCodeAt(at));
    for (let at = 0; at < (separators[k]?.length ?? 0); at++) units.push(0);
  }
  return units;
}

/** The bit of a symbol in {@link TermTrie.ways}. */
export function bitOf(symbol: number): number {
  return 1 << (Math.imul(symbol, 0x9e3779b1) >>> 27);
}

function slotOf(node: number, symbol: number): number {
  const mixed = Math.imul(node, 0x9e3779b1) ^ Math.imul(symbol, 0x85ebca6b);
  return mixed ^ (mixed >>> 16);
}
