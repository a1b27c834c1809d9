import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createFill, ENGINE_VERSION, type FillSetup } from '~/air';
import { appendEvents } from '~/commands/append-events.server';
import { resultsSettled } from '~/commands/compute-result.server';
import { fillEventsOf, mergeLog } from '~/fill/log';
import type { WireEvent } from '~/fill/wire-events';
import { AirProfileRow } from '~/models/air-profile.server';
import { Run } from '~/models/run.server';
import { RunEvent } from '~/models/run-event.server';
import { RunResult } from '~/models/run-result.server';
import { loadCoachBasis } from '~/queries/coach-basis.server';
import { loadFill } from '~/queries/fill.server';
import { loadReview } from '~/queries/review.server';
import { stopReplayPool } from '~/services/replay-pool.server';
import { type SimulatedFill, simulateFill } from '../db/seed/simulated-fill';
import { addMember } from './factories/coach';
import {
  batchOf,
  createFillFor,
  createOpenRound,
  endFillAt,
  eventOf,
  eventsOf,
  usualSetup,
} from './factories/run';
import { createUser } from './factories/user';

afterAll(async () => {
  await resultsSettled();
  await stopReplayPool();
});

/** A whole fill by the engine's own simulator, played once: it takes seconds. */
let simulated: SimulatedFill;
const rig = { hose: 'Grey hose, 15 m', chuck: 'Closed clip-on', gaugeName: 'Tee gauge' };
const setup: FillSetup = { ...usualSetup, rig: { ...usualSetup.rig!, ...rig } };
beforeAll(() => {
  simulated = simulateFill(setup, { seed: 11, tire: { startKpa: 689.5, volumeL: 143 } });
});

const endMs = () => Math.round(simulated.endedAt * 1000);
const endEvent = () => eventOf({ type: 'ended', how: simulated.how }, endMs());

/** Events with ids of their own, since a log keeps an id once. */
const freshEvents = (): WireEvent[] => eventsOf(simulated.events.map(({ id, ...event }) => event));

/** A simulated fill that has ended and whose result is there. */
async function createEndedFill() {
  const place = await createOpenRound();
  const fill = await createFillFor(place, { setup });
  await appendEvents(fill.actor, fill.runId, batchOf([...freshEvents(), endEvent()]));
  await resultsSettled();
  return fill;
}

const resultsOf = (runId: string) =>
  RunResult.findAll({ where: { runId }, order: [['lastSeq', 'ASC']] });

describe('the result of a fill', () => {
  it('is computed after the end, with the engine’s version and the last number', async () => {
    const { runId, actor } = await createEndedFill();
    const [row, ...more] = await resultsOf(runId);
    expect(more).toEqual([]);
    const run = await Run.findByPk(runId);
    expect(row).toMatchObject({ engineVersion: ENGINE_VERSION, lastSeq: run?.lastSeq });
    const chuck = simulated.events.filter((event) => event.type === 'chuck');
    const gauged = simulated.events.findLast((event) => event.type === 'tire-reading');
    expect(row?.result).toMatchObject({
      startKpa: 689.5,
      endKpa: gauged?.kpa,
      targetKpa: 724,
      toleranceKpa: 7,
      timesOn: chuck.filter(({ on }) => on).length,
      seconds: endMs() / 1000,
      outcome: simulated.how,
    });
    const { secondsOn, lostKpa, secondsBelow, highestSupplyKpa, lowestSupplyKpa } = row!
      .result as Record<string, number>;
    const expected = chuck.reduce((sum, { on, at }) => sum + (on ? -at : at), 0);
    expect(secondsOn).toBeCloseTo(expected, 2);
    expect(lostKpa).toBeGreaterThanOrEqual(0);
    expect(secondsBelow).toBeLessThanOrEqual(secondsOn!);
    expect(highestSupplyKpa).toBeGreaterThan(lowestSupplyKpa!);
    const review = await loadReview(actor, runId);
    expect(review.result).toEqual({ ...(row?.result as object), ...pick(row!) });
  });

  it('is computed anew when events from before the end arrive late, and the first row stays', async () => {
    const place = await createOpenRound();
    const { runId, actor } = await createFillFor(place, { setup });
    const events = freshEvents();
    const late = events.filter(({ type }) => type === 'tire-reading').slice(-1);
    const inTime = events.filter((event) => !late.includes(event));
    await appendEvents(actor, runId, batchOf([...inTime, endEvent()]));
    await resultsSettled();
    await appendEvents(actor, runId, batchOf(late));
    await resultsSettled();
    const rows = await resultsOf(runId);
    expect(rows.map(({ lastSeq }) => lastSeq)).toEqual([inTime.length + 1, events.length + 1]);
    const [before, after] = rows.map(({ result }) => (result as { endKpa: number | null }).endKpa);
    expect(after).toBe((late[0] as { kpa?: number }).kpa);
    expect(before).not.toBe(after);
  });

  it('does not use what happened after the end', async () => {
    const { runId, actor } = await createEndedFill();
    const reading = eventOf({ type: 'tire-reading', kpa: 333 }, endMs() + 1);
    await appendEvents(actor, runId, batchOf([reading]));
    const review = await loadReview(actor, runId);
    expect(review.log.map(({ event }) => event.id)).toContain(reading.id);
    expect(review.result?.endKpa).not.toBe(333);
    expect(review.samples.at(-1)?.at).toBe(endMs() / 1000);
  });

  it('follows the end that was stored first', async () => {
    const { runId, actor } = await createFillFor(await createOpenRound(), { setup });
    await endFillAt(actor, runId, 9000, 'stopped');
    await endFillAt(actor, runId, 5000, 'done');
    await resultsSettled();
    const { result } = await loadReview(actor, runId);
    expect(result).toMatchObject({ outcome: 'stopped', seconds: 9, timesOn: 0, lastSeq: 2 });
  });

  it('is computed at the first view when it is missing', async () => {
    const { runId, actor } = await createEndedFill();
    await RunResult.destroy({ where: { runId } });
    const { result } = await loadReview(actor, runId);
    expect(result?.lastSeq).toBe((await Run.findByPk(runId))?.lastSeq);
    expect(await resultsOf(runId)).toHaveLength(1);
  });

  it('is computed at the first view when it is older than the log', async () => {
    const { runId, actor } = await createEndedFill();
    const [first] = await resultsOf(runId);
    const event = eventOf({ type: 'tire-reading', kpa: 717 }, endMs());
    // As if the server had been killed between storing the event and computing: past the command.
    const stamp = { ...event, body: { kpa: 717 }, deviceTime: new Date(event.deviceTime) };
    const seq = (first?.lastSeq ?? 0) + 1;
    await Run.update({ lastSeq: seq }, { where: { id: runId } });
    await RunEvent.create({ runId, ...stamp, seq, side: 'wheel', deviceId: randomUUID() });
    const { result } = await loadReview(actor, runId);
    expect(result).toMatchObject({ lastSeq: seq, endKpa: 717 });
    expect(await resultsOf(runId)).toHaveLength(2);
  });

  it('is not there while the fill is open, and the trace goes up to the last tap', async () => {
    const { runId, actor } = await createFillFor(await createOpenRound(), { setup });
    await appendEvents(actor, runId, batchOf([eventOf({ type: 'cut-out' }, 12_000)]));
    const review = await loadReview(actor, runId);
    expect(review.result).toBeNull();
    expect(review.samples.at(-1)?.at).toBe(12);
    expect(await resultsOf(runId)).toEqual([]);
  });

  it('is shown to a viewer, refused to a helper and hidden from a stranger', async () => {
    const { runId, coachId } = await createFillFor(await createOpenRound(), { setup });
    const as = async (role: 'viewer' | 'helper') =>
      loadReview(await addMember(coachId, (await createUser()).id, role), runId);
    expect((await as('viewer')).id).toBe(runId);
    await expect(as('helper')).rejects.toMatchObject({ status: 403 });
    const { actor: stranger } = await createOpenRound();
    await expect(loadReview(stranger, runId)).rejects.toMatchObject({ status: 404 });
  });
});

describe('what a fill teaches', () => {
  it('is the prior of the next fill with the same hose, chuck and gauge', async () => {
    const { runId, coachId } = await createEndedFill();
    const row = await AirProfileRow.findOne({ where: { runId } });
    expect(row).toMatchObject({ coachId, rigKey: 'Grey hose, 15 m|Closed clip-on|Tee gauge' });
    expect((await loadCoachBasis(coachId)).profile).toEqual(row?.profile);
  });

  it('is nothing when it overlapped another fill', async () => {
    const place = await createOpenRound();
    const fill = await createFillFor(place, { setup });
    await Run.update({ overlapping: true }, { where: { id: fill.runId } });
    await endFillAt(fill.actor, fill.runId, 3000);
    await resultsSettled();
    expect(await resultsOf(fill.runId)).toHaveLength(1);
    expect(await AirProfileRow.count({ where: { coachId: place.coachId } })).toBe(0);
  });
});

describe('a reload in the middle', () => {
  it('gives byte-identical advice from the server’s log, whatever order it came in', async () => {
    const place = await createOpenRound();
    const { runId, actor } = await createFillFor(place, { setup });
    const events = freshEvents().slice(0, 25);
    const batches = [events.slice(15), events.slice(0, 7), events.slice(7, 15)];
    for (const batch of batches) await appendEvents(actor, runId, batchOf(batch));
    const phone = createFill(setup);
    const own = events.map((event, seq) => ({ event, seq, deviceId: '', side: 'wheel' as const }));
    for (const event of fillEventsOf(mergeLog([], own))) phone.apply(event);
    const { run } = await loadFill(actor, runId);
    const reloaded = createFill(run.setup);
    for (const event of fillEventsOf(run.log)) reloaded.apply(event);
    for (const at of [0, 3.25, 17.5, 31.125, 60, 75.75]) {
      expect(JSON.stringify(reloaded.advise(at))).toBe(JSON.stringify(phone.advise(at)));
    }
  });
});

const pick = ({ engineVersion, lastSeq }: RunResult) => ({ engineVersion, lastSeq });
