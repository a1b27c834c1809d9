import { afterAll, expect, it } from 'vitest';
import { appendEvents } from '~/commands/append-events.server';
import { resultsSettled } from '~/commands/compute-result.server';
import { loadReview } from '~/queries/review.server';
import { stopReplayPool } from '~/services/replay-pool.server';
import { batchOf, createOpenFill, endFillAt, eventOf, readingsOf } from './factories/run';

afterAll(async () => {
  await resultsSettled();
  await stopReplayPool();
});

it('shows a fill at once whose result is still being worked out, and the rest later', async () => {
  const { actor, runId } = await createOpenFill({ startedAt: new Date(Date.now() - 600_000) });
  const chuck = [
    eventOf({ type: 'chuck', on: true }, 10_000),
    eventOf({ type: 'chuck', on: false }, 30_000),
  ];
  await appendEvents(actor, runId, batchOf([...readingsOf(3), ...chuck]));
  await endFillAt(actor, runId, 40_000);
  const early = await loadReview(actor, runId, 0);
  expect(early).toMatchObject({ pending: true, samples: [], position: 'steer-left' });
  expect(early.log).toHaveLength(6);
  const late = await loadReview(actor, runId);
  expect(late).toMatchObject({
    pending: false,
    result: { secondsOn: 20, timesOn: 1, outcome: 'stopped', lastSeq: 6 },
  });
  expect(late.samples.at(-1)?.at).toBe(40);
});
