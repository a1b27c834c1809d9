/** Seconds between two looks: short at first, since most results are there within a second or two. */
const waits = [0.7, 1, 1, 1.5, 1.5, 2, 2, 3, 3, 4, 5, 5, 10, 10, 10];

/** After this many looks the page says that it takes long. */
export const looksUntilLong = 6;

/**
 * Milliseconds until the page should ask again whether the result is there; undefined when it has
 * asked often enough (a minute) and leaves it to the person.
 */
export function nextLookMs(looks: number): number | undefined {
  const wait = waits[looks];
  return wait === undefined ? undefined : wait * 1000;
}
