// A map that is never changed: an edit copies a small layer over a large base, not the whole.

/** Changes that a layer holds before it is merged into a new base. */
const LAYER = 64;

/**
 * An immutable map with cheap successors, for thousands of entries of which one changes at a keystroke. Keys come in the order
 * of the base, new ones behind.
 */
export class LayeredMap<K, V> implements ReadonlyMap<K, V> {
  private constructor(
    private readonly base: ReadonlyMap<K, V>,
    /** What differs from the base; undefined for an entry that is gone. */
    private readonly layer: ReadonlyMap<K, V | undefined>,
    readonly size: number,
  ) {}

  /** The empty map. */
  static empty<K, V>(): LayeredMap<K, V> {
    return new LayeredMap<K, V>(new Map(), new Map(), 0);
  }

  get(key: K): V | undefined {
    return this.layer.has(key) ? this.layer.get(key) : this.base.get(key);
  }

  has(key: K): boolean {
    return this.get(key) !== undefined;
  }

  /** The map after changes, undefined for entries to take out; this one stays as it is. */
  with(changes: ReadonlyMap<K, V | undefined>): LayeredMap<K, V> {
    if (changes.size === 0) return this;
    let { size } = this;
    for (const [key, value] of changes) size += (value === undefined ? 0 : 1) - (this.has(key) ? 1 : 0);
    const layer = new Map([...this.layer, ...changes]);
    const next = new LayeredMap(this.base, layer, size);
    return layer.size <= LAYER ? next : new LayeredMap(new Map(next), new Map<K, V | undefined>(), size);
  }

  *entries(): MapIterator<[K, V]> {
    for (const [key, value] of this.base) {
      if (!this.layer.has(key)) yield [key, value];
      else if (this.layer.get(key) !== undefined) yield [key, this.layer.get(key)!];
    }
    for (const [key, value] of this.layer) if (value !== undefined && !this.base.has(key)) yield [key, value];
  }

  *keys(): MapIterator<K> {
    for (const [key] of this.entries()) yield key;
  }

  *values(): MapIterator<V> {
    for (const [, value] of this.entries()) yield value;
  }

  [Symbol.iterator](): MapIterator<[K, V]> {
    return this.entries();
  }

  forEach(each: (value: V, key: K, map: ReadonlyMap<K, V>) => void): void {
    for (const [key, value] of this.entries()) each(value, key, this);
  }
}
