/** A 32-bit seed of a text: FNV-1a (value from memory). */
export function seedOf(text: string): number {
  let hash = 0x811c9dc5;
  for (const letter of text) hash = Math.imul(hash ^ (letter.codePointAt(0) ?? 0), 0x01000193);
  return hash >>> 0;
}

/** Uniform numbers in [0, 1) that follow from a text: mulberry32 (value from memory). */
export function uniforms(text: string): () => number {
  let state = seedOf(text);
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** Standard normal numbers that follow from a text: twelve uniform ones added, so that only sums are needed and every machine agrees. */
export function normals(text: string): () => number {
  const uniform = uniforms(text);
  return () => {
    let sum = -6;
    for (let count = 0; count < 12; count++) sum += uniform();
    return sum;
  };
}
