/**
 * Moves labels apart until none is nearer to the next than `step` and all are between `top` and
 * `bottom`, in their order from the top. Answers a height for each, in the order given.
 */
export function spreadHeights(
  wanted: readonly number[],
  { step, top, bottom }: { step: number; top: number; bottom: number },
): number[] {
  const order = wanted.map((_, index) => index).sort((a, b) => wanted[a]! - wanted[b]!);
  const heights = [...wanted];
  let least = top;
  for (const index of order) {
    heights[index] = Math.max(heights[index]!, least);
    least = heights[index] + step;
  }
  let most = bottom;
  for (const index of [...order].reverse()) {
    heights[index] = Math.min(heights[index]!, most);
    most = heights[index] - step;
  }
  return heights;
}
