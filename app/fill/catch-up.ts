import { lastSeqOf } from './log';
import type { Phone } from './phone';
import { addToLog } from './store';
import type { EventsAnswer } from './wire';

/** Fetches what the server has of a fill's log and this phone has not. Fails without a word. */
export async function catchUp(phone: Phone, runId: string): Promise<void> {
  const run = phone.store.getState().runs[runId];
  if (!run) return;
  const address = `/api/v1/runs/${runId}/events?after=${lastSeqOf(run.log)}`;
  const answer = await phone.transport.get(address).catch(() => undefined);
  if (answer?.status !== 200) return;
  addToLog(phone.store, runId, (answer.body as EventsAnswer).events);
}

/**
 * Keeps a fill's log up to date while its screen is open. What the former page sent while it was
 * leaving may arrive after this one was made, so the log is asked for once more a little later;
 * and then slowly on, for the taps of another phone.
 */
export function keepCaughtUp(phone: Phone, runId: string, page: Window): () => void {
  const ask = () => {
    if (page.document.visibilityState === 'visible') void catchUp(phone, runId);
  };
  ask();
  const soon = page.setTimeout(ask, soonMs);
  const slowly = page.setInterval(ask, slowlyMs);
  page.document.addEventListener('visibilitychange', ask);
  page.addEventListener('online', ask);
  return () => {
    page.clearTimeout(soon);
    page.clearInterval(slowly);
    page.document.removeEventListener('visibilitychange', ask);
    page.removeEventListener('online', ask);
  };
}

const soonMs = 1500;
const slowlyMs = 5000;
