/** How long ago something recorded on a phone may have begun, days. */
const oldestStartDays = 90;

/** How far ahead of the server a phone's clock may be, minutes. */
const clockAllowanceMinutes = 5;

/**
 * What is expected of a time at which a round, reading or fill began, or undefined when `startedAt`
 * is possible. A phone may have been without signal for long, but nothing begins in the future.
 * @param startedAt ISO 8601; @param now milliseconds since the epoch, the server's clock
 */
export function startProblem(startedAt: string, now: number): string | undefined {
  const age = now - Date.parse(startedAt);
  if (age > oldestStartDays * 86_400_000) return `a time at most ${oldestStartDays} days ago`;
  if (age < -clockAllowanceMinutes * 60_000) {
    return `a time not in the future (${clockAllowanceMinutes} min are allowed for clocks)`;
  }
  return undefined;
}
