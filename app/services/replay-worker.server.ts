import { parentPort } from 'node:worker_threads';
import { replayFill } from '~/fill/replay';
import type { ReplayAnswer, ReplayOrder } from './replay-pool.server';

/** Runs beside the server that answers people: replaying takes a second of computing. */
parentPort?.on('message', ({ setup, log }: ReplayOrder) => {
  parentPort?.postMessage(answer(() => replayFill(setup, log)));
});

function answer(replay: () => ReturnType<typeof replayFill>): ReplayAnswer {
  try {
    return { replayed: replay() };
  } catch (thrown) {
    return { fault: thrown instanceof Error ? (thrown.stack ?? thrown.message) : String(thrown) };
  }
}
