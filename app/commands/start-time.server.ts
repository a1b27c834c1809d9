import { startProblem } from '~/fill/start-window';
import { Refusal } from '~/services/refusal.server';

/**
 * The moment that a phone names, when it is possible by the server's clock.
 * @throws Refusal `impossible-time` when it lies over 90 days back or in the future
 */
export function possibleMoment(field: string, moment: string): Date {
  const expected = startProblem(moment, Date.now());
  if (!expected) return new Date(moment);
  throw new Refusal('bad-input', 'impossible-time', `It cannot have been then: ${expected}.`, [
    { field, value: moment, expected },
  ]);
}
