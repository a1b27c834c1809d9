import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';
import { thisPhone } from '~/fill/phone';
import { putRound, putRun } from '~/fill/store';
import type { RoundPageData } from './round-data';

/**
 * What belongs to a round's page beside the phone's own store: its coach, and the fills of others.
 * Kept while the page lives, so that the round opens again without signal.
 */
const kept = createStore<Record<string, RoundPageData>>(() => ({}));

/** Keeps a round's page as the server or this phone made it. */
export function keepRound(page: RoundPageData): RoundPageData {
  const { store } = thisPhone();
  putRound(store, page.round);
  if (page.newestFill) putRun(store, page.newestFill);
  kept.setState({ [page.round.id]: page });
  return page;
}

/** A round's page that was kept, if any. */
export const keptRound = (roundId: string): RoundPageData | undefined => kept.getState()[roundId];

/** The newest of what was kept of a round. */
export const useKeptRound = (loaded: RoundPageData): RoundPageData =>
  useStore(kept, (rounds) => rounds[loaded.round.id]) ?? loaded;
