/** A label that wants its middle at `at` and takes `size` along the same axis, both in px. */
export interface LabelWish {
  readonly at: number;
  readonly size: number;
}

export interface SpreadOptions {
  /** Least free space between neighbours, px. */
  readonly gap?: number;
  /** No label reaches below `min` or above `max`, as long as they all fit between. */
  readonly min?: number;
  readonly max?: number;
}

/**
 * Middles of labels along one axis, px, in the order given, so that none overlaps another and the sum of squared
 * displacements is least. Labels keep the order of their wishes; equal wishes keep the order given.
 * With offsets of half sizes taken out, non-overlap is a non-decreasing sequence, so the answer is isotonic regression
 * by pooling adjacent violators; the bounded answer is the unbounded one clamped (both exact for equal weights).
 * Where the labels cannot all fit between `min` and `max` they start at `min` and run over at the end.
 */
export function spreadLabels(wishes: readonly LabelWish[], { gap = 0, min = -Infinity, max = Infinity }: SpreadOptions = {}): number[] {
  const order = wishes.map((_, index) => index).sort((a, b) => wishes[a]!.at - wishes[b]!.at || a - b);
  const sorted = order.map((index) => wishes[index]!);
  const offsets = offsetsOf(sorted, gap);
  const free = isotonic(sorted.map(({ at }, k) => at - offsets[k]!));
  const low = min + (sorted[0]?.size ?? 0) / 2;
  const high = max - (sorted.at(-1)?.size ?? 0) / 2 - (offsets.at(-1) ?? 0);
  const places = Array.from({ length: wishes.length }, () => 0);
  order.forEach((index, k) => {
    places[index] = Math.max(low, Math.min(high, free[k]!)) + offsets[k]!;
  });
  return places;
}

/** Distance of each middle from the first one when all labels stand close together. */
function offsetsOf(labels: readonly LabelWish[], gap: number): number[] {
  let offset = 0;
  return labels.map(({ size }, k) => (offset += k === 0 ? 0 : labels[k - 1]!.size / 2 + gap + size / 2));
}

/** Least-squares non-decreasing sequence by pooling adjacent violators (Barlow et al., Statistical Inference under Order Restrictions, 1972; from memory). */
export function isotonic(values: readonly number[]): number[] {
  const blocks: { mean: number; count: number }[] = [];
  for (const value of values) {
    let block = { mean: value, count: 1 };
    while (blocks.length > 0 && blocks.at(-1)!.mean > block.mean) {
      const before = blocks.pop()!;
      const count = before.count + block.count;
      block = { mean: (before.mean * before.count + block.mean * block.count) / count, count };
    }
    blocks.push(block);
  }
  return blocks.flatMap(({ mean, count }) => Array.from({ length: count }, () => mean));
}

/** Px by which labels have to move in all: the price of an arrangement. */
export const displacement = (wishes: readonly LabelWish[], places: readonly number[]): number =>
  wishes.reduce((sum, { at }, index) => sum + Math.abs(places[index]! - at), 0);
