// A 53-bit hash of text, for identity of blocks and files within a corpus; not for security.

/**
 * Hashes UTF-16 code units into a whole number below 2^53.
 * Two 32-bit FNV-1a style lanes (Fowler, Noll & Vo 1991) with the finaliser of MurmurHash3 (Appleby 2011).
 * With 10^6 distinct texts the chance of any collision is about 6 in 10^5.
 */
export function hashText(text: string, seed = 0): number {
  let a = 0x811c9dc5 ^ seed;
  let b = 0x9e3779b9 ^ seed;
  for (let i = 0; i < text.length; i++) {
    const unit = text.charCodeAt(i);
    a = Math.imul(a ^ unit, 0x01000193);
    b = Math.imul(b ^ unit, 0x85ebca6b);
    b ^= b >>> 15;
  }
  a = finalise(a ^ text.length);
  b = finalise(b ^ a);
  return (a >>> 0) * 0x200000 + (b >>> 11);
}

function finalise(lane: number): number {
  let h = lane;
  h = Math.imul(h ^ (h >>> 16), 0x85ebca6b);
  h = Math.imul(h ^ (h >>> 13), 0xc2b2ae35);
  return h ^ (h >>> 16);
}
