import type { RefusedItem, Subject } from './outbox-items';
import type { OutboxState } from './store';

const subjects: Record<Subject, string> = {
  round: 'start of the round',
  cautions: 'cautions',
  reading: 'cold reading',
  run: 'start of the fill',
  event: 'tap',
  closing: 'closing of the round',
};

/** "3 not sent yet. Trying again." Null while nothing is waiting. */
export function pendingWords({ pending, paused, retrying }: OutboxState): string | null {
  if (pending === 0) return null;
  const count = `${pending} not sent yet.`;
  if (paused) return `${count} You are signed out.`;
  return retrying ? `${count} Trying again.` : count;
}

/** "2 refused." Null when none is. */
export function refusedWords({ refused }: OutboxState): string | null {
  return refused.length === 0 ? null : `${refused.length} refused.`;
}

/** "Tap chuck: Another fill is open on this coach. End it first." */
export function refusedLine({ item, problem }: RefusedItem): string {
  const what = item.subject === 'event' ? `tap ${item.body.type}` : subjects[item.subject];
  const expected = problem.field ? ` Expected as ${problem.field}: ${problem.expected}.` : '';
  return `${what.charAt(0).toUpperCase()}${what.slice(1)}: ${problem.detail}${expected}`;
}

/** The fill that is in the way, where one is named. */
export function openFillOf({ problem }: RefusedItem): string | null {
  return problem.code === 'fill-open' && typeof problem.value === 'string' ? problem.value : null;
}
